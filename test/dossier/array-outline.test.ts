import { describe, expect, it } from 'vitest';
import { drawnColumn } from '../../src/dossier/array-outline.js';
import { layoutTables } from '../../src/dossier/layout-tables.js';
import { board } from './board-fixture.js';
import { inlinesOf, plain } from './pack-fixture.js';

const subject = board('qb-1');
const [column] = subject.columns;
type Rectangles = ReturnType<typeof drawnColumn>['rectangles'];
const ends = (rectangles: Rectangles) => [
  Math.min(...rectangles.map(({ x }) => x)),
  Math.max(...rectangles.map(({ x, length }) => x + length)),
];

describe('outline of a column', () => {
  it('is one row of metal without gaps from the feed to the open end', () => {
    const { rectangles, feed } = drawnColumn(column, 0);
    const row = [...rectangles].sort((a, b) => a.x - b.x);
    row.slice(1).forEach((next, i) => {
      expect(next.x).toBeCloseTo(row[i].x + row[i].length, 6);
    });
    expect(feed).toEqual({ x: row[0].x, y: -2.2, towards: '+x' });
  });

  it('mirrors about the edge of its first patch when it runs the other way', () => {
    const forward = drawnColumn(column, 0);
    const reversed = drawnColumn({ ...column, direction: -1 }, 0);
    const edge = column.x * 1e3;
    forward.rectangles.forEach((r, i) => {
      expect(reversed.rectangles[i].x + reversed.rectangles[i].length).toBeCloseTo(2 * edge - r.x, 6);
    });
    expect(reversed.feed.towards).toBe('-x');
    expect(reversed.feed.x).toBeCloseTo(2 * edge - forward.feed.x, 6);
  });

  it('draws matching sections between feed line and first patch, in the order from the feed line on', () => {
    const matching = [
      { width: 0.3e-3, length: 0.6e-3 },
      { width: 0.5e-3, length: 0.5e-3 },
    ];
    const { rectangles } = drawnColumn({ ...column, matching }, 0);
    const row = [...rectangles].sort((a, b) => a.x - b.x);
    expect(row.slice(0, 4).map(({ width }) => width)).toEqual([0.16, 0.3, 0.5, 0.7]);
    expect(row[3].x).toBeCloseTo(column.x * 1e3, 6);
  });

  it('cuts two slots into the first patch beside the line of an inset', () => {
    const { rectangles } = drawnColumn({ ...column, inset: { depth: 0.3e-3, gap: 0.1e-3 } }, 0);
    const slots = rectangles.filter(({ kind }) => kind === 'slot');
    expect(slots).toHaveLength(2);
    const [low, high] = slots.map(({ y, width }) => [y - column.y * 1e3, y + width - column.y * 1e3]);
    expect(low[1]).toBeCloseTo(-0.08, 6);
    expect(high[0]).toBeCloseTo(0.08, 6);
    for (const { x, length } of slots) expect([x, length]).toEqual([2, 0.3]);
  });

  it('joins the line of a side feed to the edge of its link, in the middle', () => {
    for (const side of [1, -1] as const) {
      const { rectangles, feed } = drawnColumn({ ...column, sideFeed: { link: 1, side } }, 0);
      const [line, ...rest] = rectangles;
      const link = rest.filter(({ kind }) => kind === 'line')[1];
      expect(line.x + line.length / 2).toBeCloseTo(link.x + link.length / 2, 4);
      expect(side === 1 ? line.y : line.y + line.width).toBeCloseTo(side === 1 ? link.y + link.width : link.y, 4);
      expect(feed.towards).toBe(side === 1 ? '-y' : '+y');
      expect(ends(rest)[0]).toBe(2);
    }
  });

  it('marks dummies and loads', () => {
    expect(drawnColumn({ ...column, dummy: true }, 4)).toMatchObject({
      label: 'Column 5, dummy',
      feed: { terminated: true },
    });
    const plainEnd = ends(drawnColumn(column, 0).rectangles)[1];
    const { load, rectangles } = drawnColumn({ ...column, termination: { width: 0.2e-3 } }, 0);
    expect(load?.x).toBeCloseTo(ends(rectangles)[1], 6);
    expect(load?.x).toBeGreaterThan(plainEnd);
    expect(drawnColumn(column, 0).load).toBeUndefined();
  });

  it('writes the amplitude of every patch, and none into lines', () => {
    const { rectangles } = drawnColumn(column, 0, [0.2, 0.5, 1, 1, 0.5, 0.204]);
    expect(rectangles.filter(({ kind }) => kind === 'patch').map(({ amplitude }) => amplitude?.text)).toEqual([
      '0.20',
      '0.50',
      '1.00',
      '1.00',
      '0.50',
      '0.20',
    ]);
    expect(rectangles.filter(({ kind }) => kind !== 'patch').every(({ amplitude }) => amplitude === undefined)).toBe(
      true,
    );
  });
});

describe('tables of layouts', () => {
  it('stand once for like columns, whichever way they run, and say in words what a table cannot', () => {
    const alternate = subject.columns.map((c, i) => (i === 1 ? { ...c, direction: -1 as const } : c));
    const [table, words, ...none] = layoutTables({ ...subject, columns: alternate });
    expect(none).toEqual([]);
    expect(table).toMatchObject({ kind: 'table', caption: expect.stringContaining('columns 1, 2, 3') });
    expect(inlinesOf(words).map(plain).join('')).toBe(
      'Fed at the large-x end and running towards −x: column 2. The last patch is open.',
    );
    expect(layoutTables(subject)).toHaveLength(1);
  });

  it('have a row for the feed line and each matching section where there are any', () => {
    const matched = { ...subject, columns: [{ ...column, matching: [{ width: 0.3e-3, length: 0.6e-3 }] }] };
    const [table] = layoutTables(matched);
    if (table.kind !== 'table') throw new Error('no table');
    expect(table.rows.slice(0, 3).map((row) => row.map((cell) => plain(cell.content[0])))).toEqual([
      ['Feed line', '0.16', '2', '–', '–'],
      ['Matching 1', '0.3', '0.6', '–', '–'],
      ['1', '–', '–', '0.7', '1.07'],
    ]);
  });
});
