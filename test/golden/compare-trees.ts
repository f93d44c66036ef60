import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { filesUnder, realDisk } from '../../src/publish/index.js';
import { readPdf } from '../render/pdf/reading.js';

/** `bytes`: the same file. `text`: the same words on the same pages, for engines whose last bit of a sine differs. */
export type PdfComparison = 'bytes' | 'text';

/** How a tree differs from the one expected: one line per file, sorted; no line where they are the same. */
export async function compareTrees(expected: string, actual: string, pdfs: PdfComparison): Promise<string[]> {
  const [wanted, found] = [expected, actual].map((folder) => new Set(filesUnder(realDisk, folder)));
  const lines: string[] = [];
  for (const path of new Set([...wanted, ...found])) {
    if (!found.has(path)) lines.push(`missing: ${path}`);
    else if (!wanted.has(path)) lines.push(`not expected: ${path}`);
    else if (!(await sameFile(join(expected, path), join(actual, path), pdfs))) lines.push(`different: ${path}`);
  }
  return lines.sort();
}

async function sameFile(expected: string, actual: string, pdfs: PdfComparison): Promise<boolean> {
  const [one, two] = [readFileSync(expected), readFileSync(actual)];
  if (one.equals(two)) return true;
  if (pdfs === 'bytes' || !expected.endsWith('.pdf')) return false;
  const [words, otherWords] = [await pagesOf(one), await pagesOf(two)];
  return JSON.stringify(words) === JSON.stringify(otherWords);
}

async function pagesOf(pdf: Uint8Array): Promise<string[]> {
  // The reader takes the bytes away from whoever hands them over.
  const { pages } = await readPdf(Uint8Array.from(pdf));
  return pages.map((page) => `${page.text}\n${page.artifacts}`);
}
