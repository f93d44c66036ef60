import { describe, expect, it } from 'vitest';
import { drawArray } from '../../src/chart/drawing.js';
import type { Drawing } from '../../src/chart/shapes.js';
import { theme } from '../../src/chart/theme.js';
import type { ArrayDrawing } from '../../src/dossier/document.js';
import * as fixture from '../render/fixture-charts.js';
import { expectReadable, texts } from './readable.js';

type Column = ArrayDrawing['columns'][number];
const [plain] = fixture.array.columns;

const withColumns = (change: (column: Column, i: number) => Partial<Column>): ArrayDrawing => ({
  ...fixture.array,
  columns: fixture.array.columns.map((column, i) => ({ ...column, ...change(column, i) })),
});

const shapesOf = <S extends Drawing['shapes'][number]['shape']>({ shapes }: Drawing, kind: S) =>
  shapes.filter((shape): shape is Extract<typeof shape, { shape: S }> => shape.shape === kind);
/** Arrows into columns: not those of axes, polarisation and tilt. */
const feedArrows = (list: Drawing) =>
  shapesOf(list, 'arrow').filter(({ stroke, head }) => head === 5 && stroke.width === 0.8);
const resistors = (list: Drawing) =>
  shapesOf(list, 'rect').filter(({ width, height, fill }) => width * height === 32 && fill === theme.figure.paper);

describe('feeds of the array', () => {
  it('point into the columns from the side they are fed from', () => {
    const towards = ['+x', '-x', '+y', '-y', '+x'] as const;
    const arrows = feedArrows(drawArray(withColumns(({ feed }, i) => ({ feed: { ...feed, towards: towards[i] } }))));
    const steps = arrows.map(({ from, to }) => [Math.sign(to[0] - from[0]), Math.sign(to[1] - from[1])]);
    // The page counts downwards.
    expect(steps).toEqual([
      [1, 0],
      [-1, 0],
      [0, -1],
      [0, 1],
      [1, 0],
    ]);
  });

  it('end in a resistor where a column is never driven, and so does a travelling wave', () => {
    const open = drawArray(fixture.array);
    expect(resistors(open)).toHaveLength(0);
    const dummies = drawArray(withColumns(({ feed }, i) => (i === 0 ? { feed: { ...feed, terminated: true } } : {})));
    expect(feedArrows(dummies)).toHaveLength(feedArrows(open).length - 1);
    expect(resistors(dummies)).toHaveLength(1);
    expect(resistors(drawArray(withColumns(({ feed }) => ({ load: { x: 20, y: feed.y } }))))).toHaveLength(5);
  });

  it('join pairs level by level down to one input, with room for it', () => {
    for (const driven of [[0], [0, 1], [0, 1, 2], [0, 1, 2, 3, 4]]) {
      const list = drawArray({ ...fixture.array, network: { label: 'Feed network: schematic, not to scale', driven } });
      const inputs = shapesOf(list, 'arrow').filter(({ stroke, head }) => head === 5 && stroke.width === 0.9);
      // One input, and the arrow of the x axis beside the sign of tilt.
      expect(inputs).toHaveLength(2);
      expectReadable(list);
      for (const { from } of shapesOf(list, 'line')) expect(from[0]).toBeGreaterThanOrEqual(0);
      expect(texts(list).map(({ text }) => text)).toContain('Feed network: schematic, not to scale');
    }
  });

  it('leave room for long names of columns', () => {
    expectReadable(drawArray(withColumns((_, i) => ({ label: `Column ${i + 1}, dummy` }))));
  });
});

describe('slots and amplitudes', () => {
  it('lie over the copper of their patch', () => {
    const slot = { kind: 'slot' as const, x: 1, y: plain.rectangles[1].y, length: 0.3, width: 0.1 };
    const list = drawArray(withColumns(({ rectangles }, i) => (i === 0 ? { rectangles: [slot, ...rectangles] } : {})));
    const filled = shapesOf(list, 'rect');
    const copper = filled.flatMap(({ fill }, i) => (fill === theme.figure.copper ? [i] : []));
    const slots = filled.findLastIndex(({ fill }) => fill === theme.figure.dielectric);
    // The last copper is the board in the side view of the tilt.
    expect(copper.filter((i) => i > slots)).toHaveLength(1);
  });

  const weighted = (columns: number): ArrayDrawing => ({
    ...fixture.array,
    columns: Array.from({ length: columns }, (_, i) => ({
      ...plain,
      label: `Column ${i + 1}`,
      rectangles: plain.rectangles.map((r, j) => ({
        ...r,
        y: r.y + i * 2.15,
        ...(r.kind === 'patch' ? { amplitude: { share: j / 19, text: (j / 19).toFixed(2) } } : {}),
      })),
    })),
    extent: { x: [-1, 23.9], y: [-5, -5 + 2.15 * columns] },
  });

  it('print a number inside every patch where it fits', () => {
    const list = drawArray(weighted(3));
    const numbers = texts(list).filter(({ text }) => /^\d\.\d\d$/.test(text));
    expect(numbers).toHaveLength(30);
    expectReadable(list);
  });

  it('draw bars as high as the share of the patch where numbers do not fit', () => {
    const list = drawArray(weighted(40));
    expect(texts(list).some(({ text }) => /^\d\.\d\d$/.test(text))).toBe(false);
    const bars = shapesOf(list, 'rect').filter(({ fill }) => fill === theme.figure.ink);
    const patches = shapesOf(list, 'rect').filter(
      ({ fill, stroke }) => fill === theme.figure.copper && stroke?.width === 0.4,
    );
    expect(bars).toHaveLength(400);
    bars.forEach((bar, i) => {
      const j = 2 * (i % 10) + 1;
      expect(bar.height / patches[i].height).toBeCloseTo(j / 19, 6);
    });
  });
});
