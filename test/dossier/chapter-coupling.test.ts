import { describe, expect, it } from 'vitest';
import { couplingChapter } from '../../src/dossier/chapter-coupling.js';
import { boardContexts } from '../../src/dossier/context.js';
import type { Board } from '../../src/manifest/model.js';
import { isolation } from '../../src/physics/array/index.js';
import { board } from './board-fixture.js';
import { inputOf, plain } from './pack-fixture.js';
import { pointOf, studyOf } from './study-fixture.js';

const chapterOf = (subject: Board) => {
  const [context] = boardContexts(inputOf([studyOf(subject)]));
  return couplingChapter(context)[0]?.blocks ?? [];
};
const blockOf = (subject: Board, id: string) => chapterOf(subject).find((b) => 'id' in b && b.id === id);

const groups = [
  { id: 'tx', columns: [0] },
  { id: 'rx', columns: [1, 2] },
];

describe('coupling chapter', () => {
  it('says nothing of a board of one column', () => {
    const { columns, feed } = board('qb-1');
    expect(chapterOf(board('qb-1', { columns: columns.slice(0, 1), feed: feed.slice(0, 1) }))).toEqual([]);
  });

  it('prints every pair in the drawing and the whole matrix in the table', () => {
    const subject = board('qb-1');
    const figure = blockOf(subject, 'coupling-matrix');
    if (figure?.kind !== 'figure' || !('drawing' in figure.content) || figure.content.drawing !== 'matrix')
      throw new Error('no matrix');
    expect(figure.content.cells).toHaveLength(6);
    expect(figure.content.outlined).toBeUndefined();
    const { scattering = [] } = pointOf(subject, 76.5e9, 25);
    const table = blockOf(subject, 'coupling-table');
    if (table?.kind !== 'table') throw new Error('no table');
    expect(table.rows.map((row) => row.length)).toEqual([4, 4, 4]);
    const printed = Number(plain(table.rows[2][1].content[0]).replace('−', '-'));
    expect(printed).toBeCloseTo(20 * Math.log10(Math.hypot(scattering[2][0].re, scattering[2][0].im)), 0);
  });

  it('outlines pairs of different groups and gives the worst isolation between them', () => {
    const subject = board('qb-1', { groups });
    const figure = blockOf(subject, 'coupling-matrix');
    expect(figure).toMatchObject({
      content: {
        outlined: [
          [0, 1],
          [0, 2],
          [1, 0],
          [2, 0],
        ],
      },
    });
    const table = blockOf(subject, 'isolation-table');
    if (table?.kind !== 'table') throw new Error('no table');
    const { scattering = [] } = pointOf(subject, 76.5e9, 25);
    const { isolationDb } = isolation(scattering, [0], [1, 2]);
    expect(table.rows).toHaveLength(1);
    expect(plain(table.rows[0][1].content[0])).toBe(`${isolationDb.toFixed(2)} dB`);
  });

  it('follows active reflection over scan, with the limit drawn in', () => {
    const angle = Math.PI / 6;
    expect(blockOf(board('qb-1'), 'scan-reflection')).toBeUndefined();
    const figure = blockOf(board('qb-1', { scan: { low: -angle, high: angle } }), 'scan-reflection');
    if (figure?.kind !== 'figure' || !('chart' in figure.content) || figure.content.chart !== 'lines')
      throw new Error('no chart');
    const [envelope, worst] = figure.content.series;
    expect(envelope.points[0][0]).toBe(-30);
    expect(envelope.points.at(-1)?.[0]).toBe(30);
    envelope.points.forEach(([, y], i) => {
      expect(y).toBeGreaterThanOrEqual(worst.points[i][1]);
    });
    expect(Math.max(...envelope.points.map(([, y]) => y))).toBe(Math.max(...worst.points.map(([, y]) => y)));
    expect(figure.content.limits?.map(({ level }) => level)).toEqual([-10]);
  });

  it('never steers columns that are not driven', () => {
    const { columns } = board('qb-1');
    const dummy = columns.map((column, i) => (i === 0 ? { ...column, dummy: true as const } : column));
    const table = blockOf(board('qb-1', { columns: dummy, scan: { low: -0.5, high: 0.5 } }), 'scan-table');
    if (table?.kind !== 'table') throw new Error('no table');
    expect(table.rows.map(([name]) => plain(name.content[0]))).toEqual(['2', '3']);
  });
});
