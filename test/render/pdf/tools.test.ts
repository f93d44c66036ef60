import { spawnSync } from 'node:child_process';
import { existsSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { renderPdf, renderSupplierPdf } from '../../../src/render/pdf/index.js';
import { hostileDocument } from '../hostile-document.js';
import { sheet } from './sheet.js';
import { pageOf, pdfContext } from './words.js';

/** Checks by programs from outside the project; CI installs them, and BOARDCASE_REQUIRE_PDF_TOOLS demands them. */
let folder: string;
/** Dossier, overview, hostile words; and a supplier sheet, which has no attachment. */
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
  const path = join(folder, 'sheet.pdf');
  writeFileSync(path, await renderSupplierPdf(sheet, pdfContext.date));
  files.push(path);
});
afterAll(() => rmSync(folder, { recursive: true }));

/** Says aloud that a check is left out, or fails where all are demanded. */
function leftOut(program: string): void {
  if (process.env.BOARDCASE_REQUIRE_PDF_TOOLS === '1') throw new Error(`${program} is not installed`);
  process.stderr.write(`LEFT OUT: ${program} is not installed, its check of the PDF files did not run\n`);
}

/** Output of a program over each file, or nothing, said aloud, where it is not installed. */
function run(program: string, ...args: readonly string[]) {
  return runOn(files, program, ...args);
}
function runOn(
  paths: readonly string[],
  program: string,
  ...args: readonly string[]
): { readonly status: number; readonly output: string }[] {
  if (spawnSync(program, ['--version']).error !== undefined) {
    leftOut(program);
    return [];
  }
  return paths.map((file) => {
    const { status, stdout, stderr } = spawnSync(program, [...args, file], { encoding: 'utf8' });
    return { status: status ?? -1, output: stdout + stderr };
  });
}

/**
 * Faults of part 1 of ISO 19005 that part 3 permits, by the codes of the preflight, with its words: part 3 permits
 * attached files (6.8), asks for no set of the glyphs in a subset of a font (6.2.11.4.2), and is named by its number.
 */
const permittedInPart3: Readonly<Record<string, string>> = {
  '1.2.9': 'EmbeddedFile entry is present in a FileSpecification dictionary',
  '1.4.7': 'EmbeddedFile entry is present in the Names dictionary',
  '3.1.11': 'The CIDSet entry is missing for the Composite Subset',
  '7.11.2': 'part must be 1',
};
const ofAttachment = new Set(['1.2.9', '1.4.7']);

/** Where Debian keeps the classes of libpdfbox2-java, libjaxb-api-java and libactivation-java. */
const jars = ['preflight', 'pdfbox2', 'fontbox2', 'xmpbox', 'commons-logging', 'jaxb-api', 'javax.activation'].map(
  (name) => `/usr/share/java/${name}.jar`,
);

interface PreflightFault {
  readonly code: string;
  readonly words: string;
}

/** What the preflight for PDF/A-1b says of each file, or nothing, said aloud, where it is not installed. */
function preflight(paths: readonly string[]): PreflightFault[][] {
  const absent = spawnSync('java', ['-version']).error === undefined ? jars.find((jar) => !existsSync(jar)) : 'java';
  if (absent !== undefined) {
    leftOut(`the preflight of PDF/A-1b (${absent})`);
    return [];
  }
  return paths.map((path) => {
    const args = ['-cp', jars.join(':'), 'org.apache.pdfbox.preflight.Validator_A1b', path];
    const { status, stdout, stderr } = spawnSync('java', args, { encoding: 'utf8' });
    // It ends with −1 where it finds a fault; anything else was no verdict.
    expect(status, stderr).toBe(255);
    expect(stdout + stderr).toContain('is not a valid PDF/A-1b file');
    return [...(stdout + stderr).matchAll(/^(\d+(?:\.\d+)+) : (.*)$/gm)].map(([, code, words]) => ({ code, words }));
  });
}
const codesOf = (faults: readonly PreflightFault[]) => [...new Set(faults.map(({ code }) => code))].sort();

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
    // One file: this program takes a minute for some.
    const [first] = runOn(files.slice(0, 1), 'pdfinfo', '-struct-text');
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

  it('list the attachment, and none of a supplier sheet (pdfdetach)', () => {
    for (const [i, { output }] of run('pdfdetach', '-list').entries()) {
      expect(output).toContain(i < 3 ? 'board.json' : '0 embedded files');
    }
  });

  it('find no fault but those that PDF/A-3 permits and PDF/A-1 does not (preflight of PDF/A-1b)', () => {
    const found = preflight(files);
    found.forEach((faults, i) => {
      expect(codesOf(faults)).toEqual(Object.keys(permittedInPart3).filter((code) => i < 3 || !ofAttachment.has(code)));
      for (const { code, words } of faults) expect(words).toContain(permittedInPart3[code]);
    });
  });

  it('find only the set of glyphs missing in a file without attachment that claims PDF/A-1b', () => {
    const path = join(folder, 'part-1.pdf');
    const text = readFileSync(files[3], 'latin1');
    const claims = text.replace('<pdfaid:part>3<', '<pdfaid:part>1<').replace('conformance>A<', 'conformance>B<');
    // As long as before, so that every offset holds.
    expect(claims.length).toBe(text.length);
    writeFileSync(path, claims, 'latin1');
    for (const faults of preflight([path])) expect(codesOf(faults)).toEqual(['3.1.11']);
  });
});
