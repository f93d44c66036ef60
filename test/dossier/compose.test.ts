import { describe, expect, it } from 'vitest';
import { composePack } from '../../src/dossier/index.js';
import { requirement, requirements } from './board-fixture.js';
import { allBlocks, blocksOf, inlinesOf, inputOf, pageOf, studies, textOf } from './pack-fixture.js';

const document = composePack(inputOf(studies()));

describe('pages of a pack', () => {
  it('are the overview, a dossier per board, a page per pair, a page per requirement, evidence and definitions', () => {
    expect(document.pages.map((page) => page.id)).toEqual([
      'overview',
      'board/qb-1',
      'board/qb-2',
      'board/qb-3',
      'compare/qb-1--qb-2',
      'compare/qb-1--qb-3',
      'compare/qb-2--qb-3',
      ...requirements.map((r) => `requirement/${r.id}`),
      'evidence',
      'definitions',
    ]);
  });

  it('have ids of chapters and blocks that are unique on their page', () => {
    for (const page of document.pages) {
      const ids = page.chapters.flatMap((chapter) => [
        chapter.id,
        ...chapter.blocks.flatMap((block) => ('id' in block ? [block.id] : [])),
      ]);
      expect(new Set(ids).size, page.id).toBe(ids.length);
      for (const id of ids) expect(id).toMatch(/^[a-z0-9]+(-[a-z0-9]+)*$/);
    }
  });

  it('link only to pages and anchors that exist', () => {
    const anchors = new Map(
      document.pages.map((page) => [
        page.id,
        new Set(page.chapters.flatMap((c) => [c.id, ...c.blocks.flatMap((b) => ('id' in b ? [b.id] : []))])),
      ]),
    );
    let links = 0;
    for (const block of allBlocks(document)) {
      for (const part of inlinesOf(block)) {
        if (typeof part === 'string' || !('page' in part)) continue;
        links += 1;
        expect([...anchors.keys()]).toContain(part.page);
        if (part.anchor !== undefined) expect([...(anchors.get(part.page) ?? [])]).toContain(part.anchor);
      }
    }
    expect(links).toBeGreaterThan(50);
  });

  it('are all reached from the overview', () => {
    const reached = new Set(
      blocksOf(pageOf(document, 'overview'))
        .flatMap(inlinesOf)
        .flatMap((part) => (typeof part === 'object' && 'page' in part ? [part.page] : [])),
    );
    for (const page of document.pages) if (page.id !== 'overview') expect([...reached]).toContain(page.id);
  });

  it('give every figure a title, a reading with a number and a text for those who do not see it', () => {
    const figures = allBlocks(document).filter((block) => block.kind === 'figure');
    expect(figures.length).toBeGreaterThanOrEqual(2 * 9);
    for (const figure of figures) {
      expect(figure.title.length).toBeGreaterThan(10);
      expect(figure.reading).toMatch(/\d.*\.$/);
      expect(figure.alt).toMatch(/^[A-Z].{30,}\.$/);
    }
  });

  it('never print a number that is none', () => {
    for (const page of document.pages) expect(textOf(page)).not.toMatch(/\bNaN\b|undefined|Infinity|∞|\[object|null/);
  });

  it('hold only finite numbers in charts', () => {
    const walk = (value: unknown): void => {
      if (typeof value === 'number') expect(Number.isFinite(value)).toBe(true);
      else if (Array.isArray(value)) value.forEach(walk);
      else if (typeof value === 'object' && value !== null) Object.values(value).forEach(walk);
    };
    for (const block of allBlocks(document)) if (block.kind === 'figure') walk(block.content);
  });

  it('have as many cells in every row as columns', () => {
    for (const block of allBlocks(document)) {
      if (block.kind !== 'table') continue;
      expect(block.rows.length, block.id).toBeGreaterThan(0);
      for (const row of block.rows) expect(row.length, block.id).toBe(block.columns.length);
    }
  });

  it('carry the cautions: on every page as notices, and in full in a chapter', () => {
    for (const page of document.pages) {
      const notices = page.notices.join(' ');
      expect(notices).toContain('invented');
      expect(notices).toContain('not a declaration of conformity, radio approval or RF-exposure assessment');
      expect(notices).toContain('No board of this build has been measured.');
      const text = textOf(page);
      expect(text).toContain('can cause missed or false targets');
      expect(text).toContain('Export class not assessed');
      expect(text).toContain('accredited laboratories');
    }
  });

  it('are the same for the same input', () => {
    expect(JSON.stringify(composePack(inputOf(studies())))).toBe(JSON.stringify(document));
  });

  it('pass hostile text through as text', () => {
    const hostile = '<script>alert(1)</script>{{x}} "\'&|#\u202e=cmd()';
    const [first] = studies();
    const poisoned = { ...first, board: { ...first.board, title: hostile, description: hostile } };
    const pages = composePack(
      inputOf([poisoned], {
        title: hostile,
        requirements: {
          id: 'rs',
          title: hostile,
          file: 'r.yaml',
          invented: true,
          requirements: [
            requirement('r-1', { quantity: 'gain', limit: { direction: 'at_least', value: 1 }, text: hostile }),
          ],
        },
      }),
    );
    expect(pageOf(pages, 'board/qb-1').title).toBe(`qb-1: ${hostile}`);
    expect(textOf(pageOf(pages, 'board/qb-1'))).toContain(hostile);
    const matrix = blocksOf(pageOf(pages, 'overview')).find((b) => b.kind === 'table' && b.id === 'matrix');
    expect(matrix).toMatchObject({ rows: [[{ content: [{ text: 'qb-1', page: 'board/qb-1' }] }, {}, {}]] });
    // A title that looks like the marks of our own column notation stays what it is.
    const titled = { ...first, board: { ...first.board, title: '#5|2' } };
    const second = studies()[1];
    const compared = blocksOf(pageOf(composePack(inputOf([titled, second])), 'overview')).find(
      (b) => b.kind === 'table' && b.id === 'difference-table',
    );
    expect(compared).toHaveProperty('columns.1.title', 'qb-1: #5|2');
  });

  it('refuse an id that could not name a page', () => {
    const [first] = studies();
    const escaped = { ...first, board: { ...first.board, id: '../up' } };
    expect(() => composePack(inputOf([escaped]))).toThrow(RangeError);
  });

  it('refuse a board without a verdict', () => {
    expect(() => composePack({ ...inputOf(studies()), verdicts: [] })).toThrow('was not studied and judged');
  });
});
