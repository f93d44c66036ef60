import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { columnLength, withPieces } from '../../src/manifest/column-outline.js';
import { boardOf, boardsOf } from './array-fixture.js';
import { edited, load, packOf } from './fixture.js';

/** Of the example: patches and links from the near edge of the first to the far edge of the last. */
const LENGTH = 4 * 1.06e-3 + 3 * 1.24e-3;

describe('layouts of columns', () => {
  it('say nothing new of a column fed at its near end and open at the other', () => {
    const { columns, groups, scan, sizedFor, feedNetwork } = boardOf({});
    expect(Object.keys(columns[0]!).sort()).toEqual(['feedLine', 'links', 'patches', 'x', 'y']);
    expect([groups, scan, sizedFor, feedNetwork]).toEqual([undefined, undefined, undefined, undefined]);
    expect(boardOf({ array: '  direction: forward\n' }).columns).toEqual(columns);
  });

  it('turn every column, or every second, without moving them along the board', () => {
    const forward = boardOf({}).columns;
    const reversed = boardOf({ array: '  direction: reversed\n' }).columns;
    expect(reversed.map((c) => c.direction)).toEqual([-1, -1, -1]);
    for (const { x } of reversed) expect(x).toBeCloseTo(LENGTH, 12);
    expect(reversed.map(({ patches, links, y }) => [patches, links, y])).toEqual(
      forward.map(({ patches, links, y }) => [patches, links, y]),
    );
    const alternate = boardOf({ array: '  direction: alternate\n' }).columns;
    expect(alternate.map((c) => c.direction)).toEqual([undefined, -1, undefined]);
    expect(alternate.map((c) => c.x)).toEqual([0, reversed[1]!.x, 0]);
  });

  it('stagger every second column, turned or not', () => {
    expect(boardOf({ array: '  stagger: -0.4 mm\n' }).columns.map((c) => c.x)).toEqual([0, -0.4e-3, 0]);
    const [, second] = boardOf({ array: '  stagger: 0.4 mm\n  direction: alternate\n' }).columns;
    expect(second!.x).toBeCloseTo(LENGTH + 0.4e-3, 12);
    expect(boardOf({ array: '  offset_x: [1 mm, 0 mm, 2 mm]\n' }).columns.map((c) => c.x)).toEqual([1e-3, 0, 2e-3]);
  });

  it('name dummy columns by how many at each side or by number', () => {
    const dummies = (written: string, amplitude: string) =>
      boardOf({ columns: 5, array: `  dummy_columns: ${written}\n`, amplitude }).columns.map((c) => c.dummy ?? false);
    expect(dummies('1', '[0, 1, 1, 1, 0]')).toEqual([true, false, false, false, true]);
    expect(dummies('2', '[0, 0, 1, 0, 0]')).toEqual([true, true, false, true, true]);
    expect(dummies('[2, 5]', '[1, 0, 1, 1, 0]')).toEqual([false, true, false, false, true]);
  });

  it('carry matching sections, an inset, a termination and a side feed', () => {
    const matched = boardOf({
      array:
        '  matching: [{ width: 0.3 mm, length: 0.6 mm }, { width: 0.2 mm, length: 0.55 mm }]\n  inset: { depth: 0.2 mm, gap: 90 um }\n',
    });
    for (const column of matched.columns) {
      expect(column.matching).toEqual([
        { width: 0.3e-3, length: 0.6e-3 },
        { width: 0.2e-3, length: 0.55e-3 },
      ]);
      expect(column.inset).toEqual({ depth: 0.2e-3, gap: 90e-6 });
    }
    const travelling = boardOf({ array: '  termination: { width: 0.15 mm }\n' });
    expect(travelling.columns.map((c) => c.termination)).toEqual(new Array(3).fill({ width: 0.15e-3 }));
    expect(
      boardOf({ columns: 2, array: '  side_feed: { link: 2, side: outward }\n' }).columns.map((c) => c.sideFeed),
    ).toEqual([
      { link: 1, side: -1 },
      { link: 1, side: 1 },
    ]);
    const one = (written: string) => boardOf({ columns: 1, array: `  side_feed: { link: 3, side: ${written} }\n` });
    expect(one('+y').columns[0]!.sideFeed).toEqual({ link: 2, side: 1 });
    expect(one('-y').columns[0]!.sideFeed).toEqual({ link: 2, side: -1 });
  });

  it('let staggered columns lie closer than a patch is wide, where no metal meets', () => {
    const close = (array: string) =>
      load(edited('boards/qs-1.yaml', '  pitch: 2.15 mm\n', `  pitch: 0.7 mm\n${array}`));
    expect('problems' in close('')).toBe(true);
    // A patch of 1.06 mm lies beside a link of 1.24 mm.
    expect(packOf(close('  stagger: 1.15 mm\n')).boards[0]!.columns[1]!.x).toBe(1.15e-3);
  });

  it('group columns by number from 1 and give beam directions', () => {
    const board = boardOf({
      columns: 5,
      amplitude: '[1, 1, 0, 0, 0]',
      array:
        '  groups: [{ id: tx, columns: [1, 2] }, { id: rx, columns: [4, 5] }]\n  scan: { low: -30 deg, high: 45 deg }\n',
    });
    expect(board.groups).toEqual([
      { id: 'tx', columns: [0, 1] },
      { id: 'rx', columns: [3, 4] },
    ]);
    expect(board.scan!.low).toBeCloseTo(-Math.PI / 6, 12);
    expect(board.scan!.high).toBeCloseTo(Math.PI / 4, 12);
  });

  it('are inherited, overridden and dropped like any other key', () => {
    const array = '  direction: alternate\n  matching: [{ width: 0.3 mm, length: 0.6 mm }]\n  dummy_columns: 1\n';
    const variant = (keys: string) =>
      boardsOf(
        { array, amplitude: '[0, 1, 0]' },
        { 'boards/qs-2.yaml': `id: qs-2\ntitle: Variant\nbased_on: qs-1\n${keys}` },
      )[1]!;
    const [parent] = boardsOf({ array, amplitude: '[0, 1, 0]' });
    expect(variant('').columns).toEqual(parent!.columns);
    const changed = variant(
      'array: { direction: forward, matching: ~, dummy_columns: ~ }\nfeed: { amplitude: [1, 1, 1] }\n',
    );
    expect(changed.columns).toEqual(boardOf({}).columns);
    const staggered = (keys: string) =>
      boardsOf(
        { array: '  offset_x: [0 mm, 1 mm, 2 mm]\n' },
        { 'boards/qs-2.yaml': `id: qs-2\ntitle: Variant\nbased_on: qs-1\narray: { ${keys} }\n` },
      )[1]!;
    expect(staggered('stagger: 0.5 mm').columns.map((c) => c.x)).toEqual([0, 0.5e-3, 0]);
    expect(staggered('stagger: ~').columns.map((c) => c.x)).toEqual([0, 1e-3, 2e-3]);
    expect(changed.overrides).toEqual(['array.direction', 'array.matching', 'array.dummy_columns', 'feed.amplitude']);
  });

  it('come back as written, whatever is combined', () => {
    const micrometres = (low: number, high: number) => fc.integer({ min: low, max: high });
    fc.assert(
      fc.property(
        fc.record({
          columns: fc.integer({ min: 1, max: 6 }),
          direction: fc.constantFrom('forward', 'reversed', 'alternate'),
          stagger: micrometres(-300, 300),
          matching: fc.array(fc.record({ width: micrometres(100, 600), length: micrometres(100, 900) }), {
            minLength: 1,
            maxLength: 3,
          }),
          inset: fc.record({ depth: micrometres(20, 500), gap: micrometres(20, 40) }),
        }),
        ({ columns, direction, stagger, matching, inset }) => {
          const steps = matching.map(({ width, length }) => `{ width: ${width} um, length: ${length} um }`).join(', ');
          const array = `  direction: ${direction}\n  stagger: ${stagger} um\n  matching: [${steps}]\n  inset: { depth: ${inset.depth} um, gap: ${inset.gap} um }\n`;
          const board = boardOf({ columns, array });
          expect(board.columns).toHaveLength(columns);
          board.columns.forEach((column, i) => {
            expect(column.matching!.map((m) => [m.width, m.length].map((v) => Math.round(v * 1e9)))).toEqual(
              matching.map((m) => [m.width * 1e3, m.length * 1e3]),
            );
            expect(Math.round(column.inset!.depth * 1e9)).toBe(inset.depth * 1e3);
            expect(Math.round(column.inset!.gap * 1e9)).toBe(inset.gap * 1e3);
            const turned = direction === 'reversed' || (direction === 'alternate' && i % 2 === 1);
            expect(column.direction ?? 1).toBe(turned ? -1 : 1);
            const low = turned ? column.x - columnLength(column) : column.x;
            expect(low).toBeCloseTo(i % 2 === 1 ? stagger * 1e-6 : 0, 12);
          });
        },
      ),
      { numRuns: 40 },
    );
  }, 20_000);
});

describe('withPieces', () => {
  it('keeps the end at small x where it is, whichever way a column runs', () => {
    const longer = { patches: [{ width: 1e-3, length: 2e-3 }], links: [] };
    for (const column of boardOf({ array: '  direction: alternate\n' }).columns) {
      const lowEnd = (c: typeof column) => (c.direction === -1 ? c.x - columnLength(c) : c.x);
      const changed = withPieces(column, longer);
      expect(lowEnd(changed)).toBeCloseTo(lowEnd(column), 12);
      expect(changed).toEqual({ ...column, ...longer, x: changed.x });
    }
  });
});
