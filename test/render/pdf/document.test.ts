import { beforeAll, describe, expect, it } from 'vitest';
import { renderPdf } from '../../../src/render/pdf/index.js';
import { packDocument } from '../fixture-document.js';
import { flatten, type ReadPdf, type Role, readPdf, squeeze } from './reading.js';
import { pageOf, pdfContext } from './words.js';

const dossier = pageOf('board/qb-1');
let bytes: Uint8Array;
let pdf: ReadPdf;
let raw: string;
let elements: Role[];
beforeAll(async () => {
  bytes = await renderPdf(dossier, pdfContext);
  pdf = await readPdf(bytes);
  raw = Buffer.from(bytes).toString('latin1');
  elements = pdf.pages.flatMap((page) => flatten(page.structure));
});
const count = (role: string) => elements.filter((element) => element.role === role).length;

describe('a dossier as PDF', () => {
  it('numbers its pages and names document, revision, status and what it is on each', () => {
    pdf.pages.forEach((page, i) => {
      expect(page.artifacts).toContain(`page ${i + 1} of ${pdf.pages.length}`);
      expect(page.artifacts).toContain('NF-QB-0101');
      expect(page.artifacts).toContain('revision B · released for review');
      expect(page.artifacts).toContain('Calculated design evidence');
      expect(squeeze(page.artifacts)).toContain(squeeze(dossier.notices[0]));
    });
    expect(squeeze(pdf.pages[0].text)).toContain(`Sheet1of${pdf.pages.length}`);
  });

  it('has an open outline entry for each chapter, on the page where its heading stands', () => {
    expect(pdf.outline.map((entry) => entry.title)).toEqual(dossier.chapters.map((chapter) => chapter.title));
    for (const { title, page } of pdf.outline) expect(pdf.pages[page - 1].text).toContain(title);
    expect(raw).toMatch(new RegExp(`/Count ${dossier.chapters.length}\\b`));
  });

  it('lists its chapters with links that lead to them and with their page', () => {
    const links = pdf.pages[0].links;
    for (const [i, chapter] of dossier.chapters.entries()) {
      const own = links.filter((link) => link.contents === chapter.title);
      expect(own).toHaveLength(1);
      const page = pdf.places.get(own[0].dest);
      expect(page).toBe(pdf.outline[i].page);
      expect(pdf.pages[0].text).toMatch(new RegExp(`${chapter.title}\\s+${page}`));
    }
  });

  it('marks every stroke and letter as content or artifact', () => {
    expect(pdf.pages.map((page) => page.untagged)).toEqual(pdf.pages.map(() => 0));
    expect(raw).toContain('/Marked true');
    expect(raw).toContain('/Lang (en)');
    expect(raw).toContain('/DisplayDocTitle true');
    expect(raw.match(/\/Tabs \/S/g)).toHaveLength(pdf.pages.length);
  });

  it('orders its headings: one title, no level left out', () => {
    const levels = elements.filter((element) => /^H\d$/.test(element.role)).map((element) => Number(element.role[1]));
    expect(levels.filter((level) => level === 1)).toHaveLength(1);
    expect(levels[0]).toBe(1);
    levels.slice(1).forEach((level, i) => {
      expect(level - levels[i]).toBeLessThanOrEqual(1);
    });
    expect(count('H2')).toBe(dossier.chapters.length + 2); // and the notices and the contents
  });

  it('gives each figure its words and its bounds, and keeps title, picture and reading on one page', () => {
    const figures = dossier.chapters.flatMap((chapter) => chapter.blocks).filter((block) => block.kind === 'figure');
    const found = elements.filter((element) => element.role === 'Figure');
    expect(found.map((element) => element.alt)).toEqual(figures.map((figure) => figure.alt));
    for (const { bbox } of found) {
      const [left, bottom, right, top] = bbox!;
      expect(left).toBeGreaterThanOrEqual(50);
      expect(right).toBeLessThanOrEqual(545);
      expect(bottom).toBeGreaterThan(60);
      expect(top).toBeLessThan(800);
    }
    for (const figure of figures) {
      const home = pdf.pages.filter((page) => flatten(page.structure).some((element) => element.alt === figure.alt));
      expect(home).toHaveLength(1);
      expect(squeeze(home[0].text)).toContain(squeeze(figure.title));
      expect(squeeze(home[0].text)).toContain(squeeze(figure.reading));
    }
  });

  it('draws charts as vectors whose text stays text', () => {
    const text = pdf.pages.map((page) => page.text).join('\n');
    for (const label of ['Strip underside', 'Azimuth angle (degrees)', 'Hammerstad', 'Laminate Tarn 300']) {
      expect(text).toContain(label);
    }
    expect(raw).not.toContain('/Subtype /Image');
  });

  it('builds tables of rows, heads with a scope and cells', () => {
    const tables = dossier.chapters.flatMap((chapter) => chapter.blocks).filter((block) => block.kind === 'table');
    expect(new Set(elements.filter((e) => e.role === 'Table')).size).toBeGreaterThanOrEqual(tables.length);
    const columns = tables.reduce((sum, table) => sum + table.columns.length, 0);
    const rows = tables.reduce((sum, table) => sum + table.rows.length, 0);
    expect(raw.match(/\/Scope \/Column/g)).toHaveLength(columns);
    expect(raw.match(/\/Scope \/Row/g)).toHaveLength(rows);
    const cells = tables.reduce((sum, table) => sum + table.rows.length * (table.columns.length - 1), 0);
    expect(raw.match(/\/S \/TD/g)).toHaveLength(cells);
    expect(raw.match(/\/S \/TR/g)).toHaveLength(rows + tables.length);
  });

  it('repeats the head of a table on each page that it runs over, outside of the structure', () => {
    const inputs = pdf.pages.filter((page) => squeeze(page.text).includes('Materialfigure'));
    expect(inputs.length).toBeGreaterThan(1);
    for (const page of inputs.slice(1)) expect(page.artifacts).toContain('Figure Value Basis Method Document');
    expect(inputs[0].artifacts).not.toContain('Figure Value Basis Method Document');
  });

  it('embeds DejaVu and nothing else', () => {
    for (const name of pdf.pages.flatMap((page) => page.fonts)) expect(name).toMatch(/^[A-Z]{6}\+DejaVuSans/);
    expect(raw).not.toMatch(/Helvetica|Times|Courier/);
  });

  it('says who made it and when, in the dictionary and in the packet alike', () => {
    expect(pdf.info).toMatchObject({
      Title: 'NF-QB-0101 Board QB-1, revision B',
      Author: 'R. Tamsin',
      Producer: 'Boardcase',
      Creator: 'Boardcase',
      CreationDate: 'D:20261116000000Z',
      ModDate: 'D:20261116000000Z',
    });
    expect(raw).toContain('<xmp:CreateDate>2026-11-16T00:00:00Z</xmp:CreateDate>');
  });

  it('says the verdict on the front page and shows it with its table on one page', () => {
    expect(pdf.pages[0].text).toContain('open until measured');
    const verdict = pdf.pages[pdf.outline[0].page - 1];
    for (const title of ['Requirements, worst margin first', 'Realized gain over the', 'Gain after 1,000']) {
      expect(squeeze(verdict.text)).toContain(squeeze(title));
    }
  });
});

describe('bytes', () => {
  it('are the same for the same input, whatever was written between', async () => {
    await renderPdf(pageOf('overview'), pdfContext);
    const again = await renderPdf(dossier, pdfContext);
    expect(Buffer.compare(Buffer.from(again), Buffer.from(bytes))).toBe(0);
  });

  it('are the same when two documents are written at once', async () => {
    const [first, second] = await Promise.all([renderPdf(dossier, pdfContext), renderPdf(dossier, pdfContext)]);
    expect(Buffer.compare(Buffer.from(first), Buffer.from(bytes))).toBe(0);
    expect(Buffer.compare(Buffer.from(second), Buffer.from(bytes))).toBe(0);
  });

  it('hold attachments with the date of the document', async () => {
    const data = new TextEncoder().encode('{"gain": 16.62}');
    const attachments = [{ name: 'board.json', type: 'application/json', description: 'Figures (data)', data }];
    const file = await renderPdf(pageOf('definitions'), { ...pdfContext, attachments });
    const read = await readPdf(file);
    expect(new Uint8Array(read.attachments['board.json'].content)).toEqual(data);
    expect(Buffer.from(file).toString('latin1')).toContain('/AFRelationship /Data');
    const again = await renderPdf(pageOf('definitions'), { ...pdfContext, attachments });
    expect(Buffer.compare(Buffer.from(again), Buffer.from(file))).toBe(0);
  });
});

describe('links', () => {
  const block = (page: string, anchor?: string) => ({
    ...pageOf('definitions'),
    chapters: [
      {
        id: 'a',
        title: 'First',
        blocks: [{ kind: 'prose' as const, content: ['See ', { text: 'that place', page, anchor }, '.'] }],
      },
      { id: 'b', title: 'Second', blocks: [{ kind: 'prose' as const, content: ['Here.'] }] },
    ],
  });
  const linked = async (page: string, anchor?: string) => {
    const read = await readPdf(await renderPdf(block(page, anchor), pdfContext));
    return { read, links: read.pages[0].links.filter((link) => link.contents === 'that place') };
  };

  it('lead to a place of the same document', async () => {
    const { read, links } = await linked('definitions', 'b');
    expect(links).toHaveLength(1);
    expect(read.places.has(links[0].dest)).toBe(true);
    expect((await linked('definitions')).links).toHaveLength(1);
  });

  it('become plain words that name the page when they lead to another file', async () => {
    const { read, links } = await linked('overview', 'result');
    expect(links).toHaveLength(0);
    expect(squeeze(read.pages[0].text)).toContain(squeeze(`that place (see “${packDocument.pages[0].title}”)`));
  });

  it('become plain words when the place does not exist', async () => {
    expect((await linked('definitions', 'nowhere')).links).toHaveLength(0);
  });
});
