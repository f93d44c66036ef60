import { describe, expect, it } from 'vitest';
import { drawing, drawTooth } from '../../src/chart/drawing.js';
import type { Drawing, PolylineShape } from '../../src/chart/shapes.js';
import { theme } from '../../src/chart/theme.js';
import type { ToothDrawing } from '../../src/dossier/document.js';
import { expectReadable, texts } from './readable.js';

const profile = { intervalUm: 0.1, heightsUm: Array.from({ length: 121 }, (_, i) => 0.6 * Math.sin(i / 5)) };
const face: ToothDrawing['faces'][number] = {
  label: 'Strip, dielectric face',
  note: 'Sketch from stated figures, not a measurement',
  above: 'laminate',
  skinDepthUm: 0.238,
  rqUm: 0.42,
  rz: { um: 2.31, assumed: true },
  profile,
};
const data: ToothDrawing = {
  drawing: 'tooth',
  widthUm: 12,
  faces: [
    face,
    {
      ...face,
      label: 'Ground, dielectric face',
      rz: { um: 1.9, assumed: false },
      nodules: {
        radiusUm: 0.25,
        centres: [
          [2, 0.6],
          [4, 0.7],
        ],
      },
    },
  ],
};
const polylines = (list: Drawing) => list.shapes.filter((shape): shape is PolylineShape => shape.shape === 'polyline');
const span = (values: readonly number[]) => Math.max(...values) - Math.min(...values);

describe('tooth', () => {
  const list = drawTooth(data);
  /** Points per µm along the profile. */
  const scale = (() => {
    const [line] = polylines(list).filter((shape) => !shape.closed);
    return span(line.points.map(([x]) => x)) / 12;
  })();

  it('has one scale in both directions', () => {
    const [line] = polylines(list).filter((shape) => !shape.closed);
    const heights = line.points.map(([, y]) => y);
    expect(span(heights) / span(profile.heightsUm)).toBeCloseTo(scale, 6);
    const ball = polylines(list).filter((shape) => shape.closed && shape.points.length === 32);
    expect(ball).toHaveLength(2);
    for (const { points } of ball) {
      expect(span(points.map(([x]) => x))).toBeCloseTo(0.5 * scale, 6);
      expect(span(points.map(([, y]) => y))).toBeCloseTo(0.5 * scale, 6);
    }
  });

  it('draws skin depth, Rq and Rz at that scale, the skin depth into the copper', () => {
    const depth = list.shapes.filter((shape) => shape.shape === 'rect' && shape.fill === theme.figure.accent);
    expect(depth).toHaveLength(2);
    for (const bar of depth) expect(bar.shape === 'rect' ? bar.height : 0).toBeCloseTo(0.238 * scale, 6);
    const upright = list.shapes.filter((shape) => shape.shape === 'line' && shape.from[0] === shape.to[0]);
    const lengths = upright.map((shape) => (shape.shape === 'line' ? Math.abs(shape.to[1] - shape.from[1]) : 0));
    for (const wanted of [0.42, 2.31, 1.9]) {
      expect(
        lengths.some((length) => Math.abs(length - wanted * scale) < 1e-6),
        `${wanted} µm`,
      ).toBe(true);
    }
    const mean = list.shapes.find((shape) => shape.shape === 'line' && shape.stroke.dash !== undefined);
    expect(depth[0].shape === 'rect' ? depth[0].y : 0).toBeCloseTo(
      mean?.shape === 'line' ? mean.from[1] : Number.NaN,
      6,
    );
  });

  it('says what is assumed and what is no measurement, readably', () => {
    const words = texts(list).map((text) => text.text);
    expect(words.filter((text) => text === '(5.5 Rq assumed)')).toHaveLength(1);
    expect(words.join(' ')).toContain('not a measurement');
    expect(words).toEqual(expect.arrayContaining(['δ', 'Rq', 'Rz', 'copper', 'laminate', '2 µm']));
    expectReadable(list);
  });

  it('stays readable for smooth copper, tall copper and long names', () => {
    const long = `${face.label}; ${'a foil with a very long name '.repeat(6)}`;
    expectReadable(
      drawTooth({
        ...data,
        widthUm: 40,
        faces: [
          { ...face, rqUm: 0, rz: { um: 0, assumed: true }, profile: { intervalUm: 40, heightsUm: [0, 0] } },
          { ...face, label: long, note: long, above: 'outside' },
          { ...face, rqUm: 2.4, rz: { um: 13.2, assumed: true } },
        ],
      }),
    );
  });

  it('is drawn by its kind, the same every time', () => {
    expect(drawing(data)).toEqual(drawTooth(data));
  });
});
