import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { renderPdf } from '../../../src/render/pdf/index.js';
import { hostileDocument } from '../hostile-document.js';
import { pageOf, pdfContext } from './words.js';

/** Checks by programs from outside the project; CI installs them, and BOARDCASE_REQUIRE_PDF_TOOLS demands them. */
let folder: string;
const files: string[] = [];
beforeAll(async () => {
  folder = mkdtempSync(join(tmpdir(), 'boardcase-pdf-'));
  const data = new TextEncoder().encode('{}');
  const attachments = [{ name: 'board.json', type: 'application/json', description: 'Figures', data }];
  const documents = [pageOf('board/qb-1'), pageOf('overview'), hostileDocument.pages[1]];
  for (const [i, document] of documents.entries()) {
    const path = join(folder, `${i}.pdf`);
    writeFileSync(path, await renderPdf(document, { ...pdfContext, attachments }));
    files.push(path);
  }
});
afterAll(() => rmSync(folder, { recursive: true }));

/** Output of a program over each file, or nothing, said aloud, where it is not installed. */
function run(program: string, ...args: readonly string[]): { readonly status: number; readonly output: string }[] {
  if (spawnSync(program, ['--version']).error !== undefined) {
    if (process.env.BOARDCASE_REQUIRE_PDF_TOOLS === '1') throw new Error(`${program} is not installed`);
    process.stderr.write(`LEFT OUT: ${program} is not installed, its check of the PDF files did not run\n`);
    return [];
  }
  return files.map((file) => {
    const { status, stdout, stderr } = spawnSync(program, [...args, file], { encoding: 'utf8' });
    return { status: status ?? -1, output: stdout + stderr };
  });
}

describe('programs from outside', () => {
  it('find no fault in the file (qpdf)', () => {
    for (const { status, output } of run('qpdf', '--check')) {
      expect(output).toContain('No syntax or stream encoding errors found');
      expect(status).toBe(0);
    }
  });

  it('find every font embedded, in a subset, with its way back to text (pdffonts)', () => {
    for (const { output } of run('pdffonts')) {
      const fonts = output.trim().split('\n').slice(2);
      expect(fonts.length).toBeGreaterThan(0);
      for (const font of fonts) expect(font).toMatch(/^[A-Z]{6}\+DejaVuSans\S* +CID TrueType +Identity-H +yes yes yes/);
    }
  });

  it('read the structure in order (pdfinfo -struct-text)', () => {
    const [first] = run('pdfinfo', '-struct-text');
    if (first === undefined) return;
    expect(first.output).not.toMatch(/error|warning/i);
    const marks = ['Document', 'H1 (block)', 'TOC', 'H2 (block)', 'Table', 'Caption', 'TH', 'TD', 'Figure'];
    let at = -1;
    for (const mark of marks) {
      const next = first.output.indexOf(mark, at + 1);
      expect(next, mark).toBeGreaterThan(at);
      at = next;
    }
    expect(first.output).not.toContain('page 1 of');
  });

  it('list the attachment (pdfdetach)', () => {
    for (const { output } of run('pdfdetach', '-list')) expect(output).toContain('board.json');
  });
});
