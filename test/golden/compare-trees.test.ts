import { writeFileSync } from 'node:fs';
import { join } from 'node:path';
import PDFDocument from 'pdfkit';
import { expect, it } from 'vitest';
import { temporaryFolder, writeTree } from '../publish/temporary-folder.js';
import { compareTrees } from './compare-trees.js';

function folderWith(files: Readonly<Record<string, string>>): string {
  const folder = temporaryFolder();
  writeTree(folder, files);
  return folder;
}

it('finds no difference between equal trees, and each kind of difference by name', async () => {
  const expected = folderWith({ 'index.html': 'a', 'p/A/x.html': 'x', 'p/A/y.html': 'y', '.marker': 'm' });
  expect(await compareTrees(expected, folderWith({ 'index.html': 'a', 'p/A/x.html': 'x', 'p/A/y.html': 'y', '.marker': 'm' }), 'bytes')).toEqual([]);
  expect(await compareTrees(expected, folderWith({ 'index.html': 'a', 'p/A/x.html': 'X', 'p/A/z.html': 'z', '.marker': 'm' }), 'bytes')).toEqual([
    'different: p/A/x.html',
    'missing: p/A/y.html',
    'not expected: p/A/z.html',
  ]);
});

it('finds everything missing or unexpected where one tree is empty or not there', async () => {
  const full = folderWith({ a: '1' });
  expect(await compareTrees(full, temporaryFolder(), 'bytes')).toEqual(['missing: a']);
  expect(await compareTrees(join(temporaryFolder(), 'nothing'), full, 'bytes')).toEqual(['not expected: a']);
});

it('compares PDFs by their words only when asked to', async () => {
  const [one, sameWords, otherWords] = [temporaryFolder(), temporaryFolder(), temporaryFolder()];
  writeFileSync(join(one, 'a.pdf'), await pdf('gain 12.3 dBi', 72));
  writeFileSync(join(sameWords, 'a.pdf'), await pdf('gain 12.3 dBi', 73));
  writeFileSync(join(otherWords, 'a.pdf'), await pdf('gain 12.4 dBi', 72));
  expect(await compareTrees(one, sameWords, 'bytes')).toEqual(['different: a.pdf']);
  expect(await compareTrees(one, sameWords, 'text')).toEqual([]);
  expect(await compareTrees(one, otherWords, 'text')).toEqual(['different: a.pdf']);
});

function pdf(text: string, left: number): Promise<Buffer> {
  const document = new PDFDocument({ tagged: true });
  const chunks: Buffer[] = [];
  document.on('data', (chunk: Buffer) => chunks.push(chunk));
  document.addStructure(document.struct('P', {}, () => void document.text(text, left, 72)));
  document.end();
  return new Promise((resolve) => document.on('end', () => resolve(Buffer.concat(chunks))));
}
