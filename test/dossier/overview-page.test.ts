import { describe, expect, it } from 'vitest';
import { composePack } from '../../src/dossier/index.js';
import { requirements } from './board-fixture.js';
import { blocksOf, inputOf, pageOf, plain, studies, textOf } from './pack-fixture.js';

const input = inputOf(studies());
const overview = pageOf(composePack(input), 'overview');
const tableOf = (id: string) => {
  const found = blocksOf(overview).find((b) => b.kind === 'table' && b.id === id);
  if (found?.kind !== 'table') throw new Error(`no table ${id}`);
  return found;
};
const texts = (id: string) => tableOf(id).rows.map((row) => row.map((c) => c.content.map(plain).join('')));

describe('overview', () => {
  it('shows every board against every requirement, with the overall status', () => {
    const rows = texts('matrix');
    expect(rows.map((row) => row.slice(0, 2))).toEqual([
      ['qb-1', 'undecided'],
      ['qb-2', 'undecided'],
      ['qb-3', 'incomplete'],
    ]);
    expect(tableOf('matrix').columns).toHaveLength(2 + requirements.length);
    expect(rows[0][2 + titles().indexOf('r-gain')]).toMatch(/^meets \+\d\.\d\d dB$/);
    expect(rows[2][2 + titles().indexOf('r-gain')]).toBe('not evaluated');
  });

  const titles = () =>
    tableOf('matrix')
      .columns.slice(2)
      .map((c) => c.title.replace(' (target)', ''));

  it('orders requirements by the worst margin against its uncertainty', () => {
    const two = pageOf(composePack(inputOf(studies().slice(0, 2))), 'overview');
    const matrix = blocksOf(two).find((b) => b.kind === 'table' && b.id === 'matrix');
    const order = matrix?.kind === 'table' ? matrix.columns.slice(2).map((c) => c.title.replace(' (target)', '')) : [];
    const verdicts = input.verdicts.slice(0, 2);
    const ratio = (id: string) =>
      Math.min(
        ...verdicts.map((v) => {
          const r = v.requirements.find((x) => x.requirementId === id);
          if (r?.margin === undefined || !r.adverse) return Number.POSITIVE_INFINITY;
          return r.margin / r.adverse;
        }),
      );
    const ratios = order.map(ratio);
    expect(ratios).toEqual([...ratios].sort((a, b) => (a === b ? 0 : a - b)));
    expect(order[0]).toBe('r-match');
  });

  it('counts what was not evaluated and gives each reason', () => {
    const text = textOf(overview);
    expect(text).toContain('7 requirements over all boards');
    expect(text).toContain('the board has a cover layer');
  });

  it('sets the cost beside the tightest margin', () => {
    const [first] = texts('standings');
    expect(first[3]).toBe('r-match');
    expect(first[6]).toBe('3.40 EUR');
  });

  it('says what differs between the boards, and only that', () => {
    const rows = texts('difference-table');
    expect(rows.find((row) => row[0] === 'Permittivity')).toEqual([
      'Permittivity',
      '3.00 ± 0.04 (bulk)',
      '3.30 ± 0.04 (bulk)',
      '3.00 ± 0.04 (bulk)',
    ]);
    expect(rows.map((row) => row[0])).not.toContain('Finish');
  });

  it('counts the figures a verdict rests on without a guarantee', () => {
    const [first] = texts('assumption-counts');
    expect(first.slice(1, 4)).toEqual(['2', '3', '3']);
  });
});
