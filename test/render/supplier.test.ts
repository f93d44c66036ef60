import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { beforeAll, describe, expect, it } from 'vitest';
import { sheetContent } from '../../src/dossier/supplier-allowed-fields.js';
import { type SupplierSheet, supplierSheet } from '../../src/dossier/supplier-sheet.js';
import { csvText } from '../../src/render/csv.js';
import { renderSupplierPage } from '../../src/render/html/index.js';
import { renderSupplierPdf } from '../../src/render/pdf/index.js';
import { askingPack } from '../manifest/procurement-fixture.js';
import { hostileText } from './hostile-document.js';
import { idsOf, skeleton, tagsOf } from './html/markup.js';
import { flatten, type ReadPdf, readPdf, squeeze } from './pdf/reading.js';

const pack = askingPack();
const sheets = pack.procurement!.recipients.map((recipient) => supplierSheet(sheetContent(pack, recipient, new Map())));
const [, , fabrication] = sheets;
const date = new Date('2026-11-02T00:00:00Z');

const KEPT = new Set(['kind', 'id']);
/** Hostile text behind every string that a user may have written. */
function poison<T>(value: T, key = ''): T {
  if (typeof value === 'string') return (KEPT.has(key) ? value : value + hostileText) as T;
  if (Array.isArray(value)) return value.map((entry) => poison(entry, key)) as T;
  if (typeof value !== 'object' || value === null) return value;
  return Object.fromEntries(Object.entries(value).map(([name, entry]) => [name, poison(entry, name)])) as T;
}
const hostile: SupplierSheet = poison(fabrication);

describe('a supplier sheet as a page', () => {
  it('stands alone: style inside, no script, no link but to its own content', async () => {
    for (const sheet of sheets) {
      const page = await renderSupplierPage(sheet);
      const tags = tagsOf(page.replace(/<style>[\s\S]*?<\/style>/, ''));
      expect(tags.some(({ name }) => ['script', 'link', 'img', 'iframe', 'nav'].includes(name))).toBe(false);
      expect(tags.flatMap(({ attributes }) => attributes.href ?? [])).toEqual(['#main']);
      expect(page).toContain(`<title>${sheet.title}</title>`);
      const ids = idsOf(page);
      expect(new Set(ids).size).toBe(ids.length);
    }
  });

  it('prints what anyone may write as text', async () => {
    const page = await renderSupplierPage(hostile);
    expect(page).not.toContain('<script>globalThis');
    expect(skeleton(page)).toEqual(skeleton(await renderSupplierPage(fabrication)));
  });

  it('refuses a sheet that links into the pack', async () => {
    const linking = {
      ...fabrication,
      chapters: [{ id: 'x', title: 'x', blocks: [{ kind: 'prose', content: [{ text: 'x', page: 'overview' }] }] }],
    };
    await expect(renderSupplierPage(linking as SupplierSheet)).rejects.toThrow('links to page overview');
  });
});

describe('a supplier sheet as PDF', () => {
  let bytes: Uint8Array;
  let pdf: ReadPdf;
  beforeAll(async () => {
    bytes = await renderSupplierPdf(fabrication, date);
    pdf = await readPdf(bytes);
  });

  it('says the same as the page', async () => {
    const page = (await renderSupplierPage(fabrication))
      .replace(/<style>[\s\S]*?<\/style>/, '')
      .replace(/<[^>]+>/g, ' ');
    const text = squeeze(pdf.pages.map((p) => p.text).join(''));
    for (const chapter of fabrication.chapters) {
      expect(text).toContain(squeeze(chapter.title));
      expect(squeeze(page)).toContain(squeeze(chapter.title));
    }
    for (const [, id] of fabrication.answerTable.slice(1)) expect(text).toContain(squeeze(id));
  });

  it('is tagged throughout, with language, outline and numbered pages', () => {
    expect(pdf.pages.map(({ untagged }) => untagged)).toEqual(pdf.pages.map(() => 0));
    expect(pdf.outline.map(({ title }) => title)).toEqual(fabrication.chapters.map(({ title }) => title));
    const raw = Buffer.from(bytes).toString('latin1');
    expect(raw).toContain('/Marked true');
    expect(raw).toContain('/Lang (en)');
    const elements = pdf.pages.flatMap(({ structure }) => flatten(structure));
    expect(elements.filter(({ role }) => role === 'Table').length).toBeGreaterThan(0);
    expect(elements.filter(({ role }) => role === 'H1')).toHaveLength(1);
    pdf.pages.forEach(({ artifacts }, i) => {
      expect(artifacts).toContain(`page ${i + 1} of ${pdf.pages.length}`);
      expect(artifacts).toContain('RFQ NF-RFQ-7');
      expect(artifacts).toContain('The purchase order and the drawing prevail');
      expect(artifacts).not.toContain('internal');
    });
  });

  it('has nothing attached, no link and, in its metadata, only what is printed', () => {
    expect(pdf.attachments).toEqual({});
    expect(pdf.pages.flatMap(({ links }) => links)).toEqual([]);
    expect(pdf.info).toMatchObject({
      Title: fabrication.title,
      Author: 'Purchasing (role)',
      Subject: 'RFQ NF-RFQ-7, reply by 2026-12-01',
    });
  });

  it('is the same byte for byte, as are page and table', async () => {
    expect(Buffer.from(await renderSupplierPdf(fabrication, date)).equals(bytes)).toBe(true);
    expect(await renderSupplierPage(fabrication)).toBe(await renderSupplierPage(fabrication));
    expect(csvText(fabrication.answerTable)).toBe(csvText(fabrication.answerTable));
  });

  it('takes whatever anyone may write', async () => {
    const read = await readPdf(await renderSupplierPdf(hostile, date));
    expect(read.pages.length).toBeGreaterThanOrEqual(pdf.pages.length);
    expect(read.pages.map(({ untagged }) => untagged)).toEqual(read.pages.map(() => 0));
    expect(Buffer.from(await renderSupplierPdf(hostile, date)).toString('latin1')).not.toMatch(/\/URI|\/JavaScript/);
  });

  it('has no fault for a program from outside (qpdf)', () => {
    if (spawnSync('qpdf', ['--version']).error !== undefined) {
      expect(process.env.BOARDCASE_REQUIRE_PDF_TOOLS).not.toBe('1');
      process.stderr.write('LEFT OUT: qpdf is not installed, its check of supplier sheets did not run\n');
      return;
    }
    const folder = mkdtempSync(join(tmpdir(), 'boardcase-supplier-'));
    try {
      const file = join(folder, 'sheet.pdf');
      writeFileSync(file, bytes);
      const { status, stdout } = spawnSync('qpdf', ['--check', file], { encoding: 'utf8' });
      expect(stdout).toContain('No syntax or stream encoding errors found');
      expect(status).toBe(0);
    } finally {
      rmSync(folder, { recursive: true });
    }
  });
});
