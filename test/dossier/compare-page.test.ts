import { describe, expect, it } from 'vitest';
import { comparisonPage } from '../../src/dossier/compare-page.js';
import { comparisonLinks, comparisonsOf, MOST_COMPARISONS } from '../../src/dossier/comparisons.js';
import { type BoardContext, boardContexts } from '../../src/dossier/context.js';
import { differencesBetween } from '../../src/dossier/differences.js';
import type { TableBlock } from '../../src/dossier/document.js';
import { composePack } from '../../src/dossier/index.js';
import { blocksOf, inlinesOf, inputOf, pageOf, plain, studies, textOf } from './pack-fixture.js';

const input = inputOf(studies());
const contexts = boardContexts(input);
const [first, second, third] = contexts as [BoardContext, BoardContext, BoardContext];
const document = composePack(input);
const page = pageOf(document, 'compare/qb-1--qb-2');

const tableOf = (id: string, of = page): TableBlock => {
  const found = blocksOf(of).find((block) => block.kind === 'table' && block.id === id);
  if (found?.kind !== 'table') throw new Error(`no table ${id}`);
  return found;
};
const rowsOf = (table: TableBlock) => table.rows.map((row) => row.map((cell) => cell.content.map(plain).join('')));
const number = (text: string) => Number.parseFloat(text.replace('−', '-'));

describe('two boards side by side', () => {
  it('lists every field in which they differ, and no other', () => {
    const rows = rowsOf(tableOf('fields-table'));
    expect(rows).toEqual(
      differencesBetween([first.board, second.board]).map(({ label, values }) =>
        [label, ...values].map((text) => text.replaceAll('\u00a0', ' ')),
      ),
    );
    expect(rows.length).toBeGreaterThan(2);
  });

  it('sets every verdict of one beside that of the other, with the change of the margin', () => {
    const rows = rowsOf(tableOf('verdicts-table'));
    expect(rows).toHaveLength(first.judged.length);
    first.judged.forEach(({ requirement, verdict }, i) => {
      const other = second.judged[i]!.verdict;
      const row = rows[i]!;
      expect(row[0]).toContain(requirement.id);
      expect(row[7]).toContain(verdict.status);
      expect(row[8]).toContain(other.status);
      if (verdict.margin === undefined || other.margin === undefined) expect(row[6]).toBe('–');
      // Half a unit of the last digit printed, in any of the units.
      else expect(Math.abs(number(row[6]!) - (other.margin - verdict.margin))).toBeLessThan(0.051);
    });
  });

  it('sets the gain budgets side by side, and each closes', () => {
    const rows = rowsOf(tableOf('budget-table')).map(([label, ...rest]) => ({ label, values: rest.map(number) }));
    for (const column of [0, 1]) {
      const steps = rows.slice(0, -1).reduce((sum, row) => sum + row.values[column]!, 0);
      expect(steps).toBeCloseTo(rows.at(-1)!.values[column]!, 6);
    }
    for (const { values } of rows) expect(values[1]! - values[0]!).toBeCloseTo(values[2]!, 6);
    const gained = rows.at(-1)!.values[2]!;
    expect(textOf(page)).toContain(`${Math.abs(gained).toFixed(2)} dB ${gained < 0 ? 'less' : 'more'} realized gain`);
  });

  it('names the requirements whose status differs', () => {
    const flipped = first.judged
      .filter(({ verdict }, i) => verdict.status !== second.judged[i]!.verdict.status)
      .map(({ requirement }) => requirement.id);
    expect(flipped.length).toBeGreaterThan(0);
    for (const id of flipped) expect(textOf(page)).toMatch(new RegExp(`status differs on [^.]*${id}`));
  });

  it('says what is missing where one of them was not calculated', () => {
    const gap = comparisonPage(input, [first, third]);
    expect(textOf(gap)).toContain('Nothing was computed for qb-3.');
    expect(gap.chapters.map((chapter) => chapter.id)).not.toContain('curves');
  });

  it('says so where nothing differs', () => {
    const twin: BoardContext = { ...first, board: { ...first.board, id: 'qb-9' } };
    const text = textOf(comparisonPage(input, [first, twin]));
    expect(text).toContain('do not differ in any field');
    expect(text).toContain('the same status on both');
  });
});

describe('pairs of boards', () => {
  const many = (count: number): readonly BoardContext[] =>
    Array.from({ length: count }, (_, i) => ({ ...first, board: { ...first.board, id: `b-${i}` } }));

  it('are all there up to a number that is still read, and then those with the first board', () => {
    expect(comparisonsOf(many(10)).pairs).toHaveLength(MOST_COMPARISONS);
    const eleven = comparisonsOf(many(11));
    expect(eleven.all).toBe(false);
    expect(eleven.pairs.map(([a, b]) => `${a.board.id}/${b.board.id}`)).toEqual(
      Array.from({ length: 10 }, (_, i) => `b-0/b-${i + 1}`),
    );
    expect(comparisonsOf(many(1)).pairs).toEqual([]);
  });

  it('are linked from the overview, which says what is left out', () => {
    const links = blocksOf(pageOf(document, 'overview'))
      .flatMap(inlinesOf)
      .flatMap((part) => (typeof part === 'object' && 'page' in part ? [part.page] : []));
    for (const pair of ['qb-1--qb-2', 'qb-1--qb-3', 'qb-2--qb-3']) expect(links).toContain(`compare/${pair}`);
    const words = comparisonLinks(many(11)).flatMap(inlinesOf).map(plain).join('');
    expect(words).toContain('compared with the first board only');
    expect(comparisonLinks(many(10)).flatMap(inlinesOf).map(plain).join('')).not.toContain('first board only');
    expect(comparisonLinks(many(1))).toEqual([]);
  });
});
