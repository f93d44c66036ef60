import { getDocument, VerbosityLevel } from 'pdfjs-dist/legacy/build/pdf.mjs';
import { expect, it } from 'vitest';
import type { DocumentPage } from '../../../src/dossier/document.js';
import { renderPdf } from '../../../src/render/pdf/index.js';
import { readPdf } from './reading.js';
import { pageOf, pdfContext } from './words.js';

const blank = { content: [], signature: true };
const text = (words: string) => ({ content: [words] });
const signatories = ['RF lead', 'Quality engineer', 'Systems lead'];
const document: DocumentPage = {
  ...pageOf('board/qb-1'),
  marking: 'internal: not for suppliers',
  chapters: [
    {
      id: 'signing',
      title: 'Signatures',
      blocks: [
        {
          kind: 'table',
          id: 'signing-table',
          caption: 'Who signs',
          rowHeaders: true,
          columns: [{ title: 'Role' }, { title: 'Date' }, { title: 'Signature', width: 2 }, { title: 'Attests' }],
          rows: signatories.map((role) => [text(role), blank, blank, text('yes')]),
        },
      ],
    },
  ],
};

interface Placed {
  readonly str: string;
  readonly transform: readonly number[];
}

it('leaves room to sign by hand: three lines high, and as wide as the hint of the column says', async () => {
  const pdf = await getDocument({ data: await renderPdf(document, pdfContext), verbosity: VerbosityLevel.ERRORS })
    .promise;
  const items: Placed[] = [];
  for (let n = 1; n <= pdf.numPages; n++) {
    const content = await (await pdf.getPage(n)).getTextContent();
    items.push(...content.items.flatMap((item) => ('str' in item ? [item] : [])));
  }
  const placeOf = (words: string) => {
    const [, , , , x, y] = items.find((item) => item.str === words)?.transform ?? [];
    return { x, y };
  };
  // Points: 56 for a hint of 1, less nothing; three lines of table type with their padding are 38.4.
  expect(placeOf('Signature').x - placeOf('Date').x).toBeGreaterThanOrEqual(56);
  expect(placeOf('Attests').x - placeOf('Signature').x).toBeGreaterThanOrEqual(2 * 56);
  const tops = signatories.map((role) => placeOf(role).y);
  expect(tops[0] - tops[1]).toBeGreaterThan(38);
  expect(tops[1] - tops[2]).toBeGreaterThan(38);
});

it('carries the marking at the head of every page, all strokes marked', async () => {
  const long = { ...pageOf('board/qb-1'), marking: 'internal: not for suppliers' };
  for (const of of [document, long]) {
    const { pages } = await readPdf(await renderPdf(of, pdfContext));
    for (const page of pages) {
      expect(page.artifacts).toContain('internal: not for suppliers');
      expect(page.untagged).toBe(0);
    }
  }
});
