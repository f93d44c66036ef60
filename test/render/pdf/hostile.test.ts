import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Block, DocumentPage } from '../../../src/dossier/document.js';
import { renderPdf } from '../../../src/render/pdf/index.js';
import { hostileDocument } from '../hostile-document.js';
import { readPdf, squeeze } from './reading.js';
import { expectedTexts, pageOf, pdfContext } from './words.js';

const page = (...blocks: Block[]): DocumentPage => ({
  ...pageOf('definitions'),
  chapters: [{ id: 'only', title: 'Only', blocks }],
});
const cell = (text: string, numeric = false) => ({ content: [text], numeric });
const bodyText = async (document: DocumentPage) => {
  const pdf = await readPdf(await renderPdf(document, pdfContext));
  return { pdf, text: squeeze(pdf.pages.map((p) => p.text).join('')) };
};

describe('hostile text', () => {
  // The reader orders right-to-left words by rules of its own and drops angle brackets beside them.
  const comparable = (text: string) => text.replace(/[\u0590-\u08ff<>]/g, '');

  it.each(['overview', 'board/qb-1', 'requirement/r-gain'])(
    'stands on %s in full',
    async (id) => {
      const document = hostileDocument.pages.find((p) => p.id === id)!;
      const { pdf, text } = await bodyText(document);
      const found = comparable(text);
      for (const expected of expectedTexts(document)) expect(found).toContain(comparable(expected));
      expect(pdf.pages.every((p) => p.untagged === 0)).toBe(true);
      expect(pdf.outline).toHaveLength(document.chapters.length);
    },
    60_000,
  );

  it('is never left out: control signs, half pairs and signs without a glyph are shown as replaced', async () => {
    const text = 'a\u0000b\u0007c\ud800d\u202ee\u4e2df\u{1f9ff}g\u200bh';
    const { text: found } = await bodyText(page({ kind: 'prose', content: [text] }));
    expect(found).toContain('a\ufffdb\ufffdc\ufffdd\ufffde\ufffdf\ufffdg\ufffdh');
  });

  it('falls back to the regular face for a sign that the bold or fixed face lacks', async () => {
    const { text } = await bodyText(page({ kind: 'prose', content: [{ code: 'x\u05d0y' }, { strong: 'µ Ω δ ≤ −' }] }));
    expect(text).toContain('\u05d0');
    expect(text).toContain('µΩδ≤−');
  });

  it('does not break the metadata', async () => {
    const title = 'A & B <rdf:li> (x\\) ]]> \u0000 é Ω';
    const pdf = await readPdf(await renderPdf({ ...page(), title }, pdfContext));
    expect(String(pdf.info.Title)).toContain('A & B <rdf:li> (x\\) ]]> \ufffd é Ω');
  });

  // A letter that nothing else on the page has: what is lost is missing from its count.
  const long = 'ж'.repeat(10_000);
  const count = (text: string) => text.split('ж').length - 1;
  const places: readonly (readonly [string, Block])[] = [
    ['prose', { kind: 'prose', content: [long] }],
    ['a list', { kind: 'list', items: [[long]] }],
    ['the name of a fact', { kind: 'facts', id: 'f', items: [{ label: long, content: ['x'] }] }],
    ['a verdict', { kind: 'verdict', status: 'meets', content: [{ code: long }] }],
    ['a caution', { kind: 'caution', title: long, content: [['x']] }],
    [
      'a row taller than a page',
      {
        kind: 'table',
        id: 't',
        caption: 'c',
        rowHeaders: true,
        columns: [{ title: 'n' }, { title: 'x' }],
        rows: [[cell('n'), cell(long)]],
      },
    ],
    [
      'the head of a table',
      { kind: 'table', id: 't', caption: 'c', rowHeaders: true, columns: [{ title: long }], rows: [[cell('n')]] },
    ],
    [
      'a figure column',
      {
        kind: 'table',
        id: 't',
        caption: 'c',
        rowHeaders: true,
        columns: [{ title: 'n' }, { title: 'x' }],
        rows: [[cell('n'), cell(long, true)]],
      },
    ],
  ];
  it.each(places)('of 10,000 letters without a space stands in full in %s', async (_, block) => {
    const { pdf, text } = await bodyText(page(block));
    // A verdict that leaves no room under the front page is said there as well.
    expect(count(text)).toBe(block.kind === 'verdict' ? 20_000 : 10_000);
    expect(pdf.pages.length).toBeGreaterThan(1);
  });

  it('of 10,000 letters stands in full in titles, notices and the title block', async () => {
    const base = page();
    const document = {
      ...base,
      title: long,
      notices: [long],
      titleBlock: { ...base.titleBlock, legalOwner: long },
      chapters: [{ id: 'only', title: long, blocks: [] }],
    };
    const { text } = await bodyText(document);
    // Title, notice, owner, entry of the contents, heading.
    expect(count(text)).toBe(50_000);
  });

  it('of any kind does no harm', async () => {
    await fc.assert(
      fc.asyncProperty(fc.string({ unit: 'binary', maxLength: 300 }), async (text) => {
        const block: Block = {
          kind: 'table',
          id: text,
          caption: text,
          rowHeaders: true,
          columns: [{ title: text }, { title: 'x', numeric: true }],
          rows: [
            [cell(text), { content: [{ code: text }, { strong: text }, { text, page: 'definitions', anchor: text }] }],
          ],
        };
        const pdf = await readPdf(await renderPdf({ ...page(block), title: text }, pdfContext));
        expect(pdf.pages.every((p) => p.untagged === 0)).toBe(true);
      }),
      { seed: 3, numRuns: 25 },
    );
  });
});

describe('empty and uneven data', () => {
  it('make a document all the same', async () => {
    const table = { kind: 'table' as const, id: 't', caption: 'Nothing', rowHeaders: true, columns: [], rows: [] };
    const uneven = { ...table, id: 'u', columns: [{ title: 'One' }], rows: [[], [cell('a'), cell('b'), cell('over')]] };
    const { text } = await bodyText(
      page(table, uneven, { kind: 'list', items: [] }, { kind: 'facts', id: 'f', items: [] }),
    );
    expect(text).toContain('over');
    const bare = await readPdf(await renderPdf({ ...page(), notices: [], chapters: [] }, pdfContext));
    expect(bare.pages).toHaveLength(1);
  });
});
