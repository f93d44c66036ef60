import { describe, expect, it } from 'vitest';
import { drawArray, drawing, drawStackUp } from '../../src/chart/drawing.js';
import { arrowHead, type Drawing, hatchLines, type RectShape } from '../../src/chart/shapes.js';
import { shapesToSvg } from '../../src/chart/svg.js';
import { theme } from '../../src/chart/theme.js';
import type { StackUpDrawing } from '../../src/dossier/document.js';
import * as fixture from '../render/fixture-charts.js';
import { expectReadable, texts } from './readable.js';

const rects = (list: Drawing) => list.shapes.filter((shape) => shape.shape === 'rect');

describe('stack-up', () => {
  const list = drawStackUp(fixture.stackUp);

  it('is to scale in thickness', () => {
    const copper = rects(list).filter((rect) => rect.fill === theme.figure.copper);
    const laminate = rects(list).find((rect) => rect.fill === theme.figure.dielectric)!;
    for (const rect of copper) expect(rect.height / laminate.height).toBeCloseTo(18 / 127, 9);
    const bar = texts(list).find((text) => text.text === '100 µm' && text.rotate)!;
    const stroke = list.shapes.find((shape) => shape.shape === 'line' && shape.from[0] === 20 && shape.to[0] === 20);
    expect(bar).toBeDefined();
    expect(stroke?.shape === 'line' ? stroke.to[1] - stroke.from[1] : 0).toBeCloseTo((100 / 127) * laminate.height, 9);
  });

  it('says which layers are drawn broken', () => {
    const words = texts(list)
      .map((text) => text.text)
      .join(' ');
    expect(words.match(/not to scale\)/g)).toHaveLength(2);
  });

  it('keeps texts apart, also with thin copper, a cover and many layers', () => {
    expectReadable(list);
    const many: StackUpDrawing = {
      drawing: 'stack-up',
      layers: [
        { label: 'Cover film', detail: '25 µm', thicknessUm: 25, material: 'cover', computed: false },
        ...fixture.stackUp.layers
          .slice(0, 3)
          .map((layer) => ({ ...layer, thicknessUm: layer.material === 'dielectric' ? 254 : 9 })),
        ...Array.from({ length: 5 }, (_, i) => ({ ...fixture.stackUp.layers[3], label: `Layer ${i + 5}` })),
      ],
    };
    expectReadable(drawStackUp(many));
  });
});

describe('array', () => {
  const list = drawArray(fixture.array);

  it('has one scale for both directions', () => {
    const patches = rects(list).filter((rect) => rect.fill === theme.figure.copper && rect.stroke !== undefined);
    const given = fixture.array.columns.flatMap((column) => column.rectangles.filter((r) => r.kind === 'patch'));
    const scale = patches[0].width / given[0].length;
    given.forEach((patch, i) => {
      expect(patches[i].width).toBeCloseTo(patch.length * scale, 6);
      expect(patches[i].height).toBeCloseTo(patch.width * scale, 6);
    });
  });

  it('turns y upwards', () => {
    const words = texts(list);
    const first = words.find((text) => text.text === 'Column 1')!;
    const last = words.find((text) => text.text === 'Column 5')!;
    expect(first.y).toBeGreaterThan(last.y);
  });

  it('prints axes, cuts, polarisation and the sign of tilt, readably', () => {
    const words = texts(list).map((text) => text.text);
    for (const note of Object.values(fixture.array.axisNotes)) expect(words.join(' ')).toContain(note);
    expect(words).toEqual(expect.arrayContaining(['x', 'y', 'z', 'E', '+ tilt', 'x–z', 'y–z cut', '5 mm', 'feed']));
    expectReadable(list);
  });

  it('stays readable with eight narrow columns', () => {
    const columns = Array.from({ length: 8 }, (_, i) => ({
      label: `Column ${i + 1}`,
      feed: { x: -1, y: -4.3 + i * 1.9, towards: '+x' as const },
      rectangles: fixture.array.columns[0].rectangles.map((r) => ({ ...r, y: r.y + i * 1.9 })),
    }));
    expectReadable(drawArray({ ...fixture.array, columns, extent: { x: [-1, 24], y: [-6, 11] } }));
  });
});

describe('display lists', () => {
  it('hatch a rectangle inside its outline', () => {
    for (const angle of [45, -45] as const) {
      const rect: RectShape = {
        shape: 'rect',
        x: 10,
        y: 20,
        width: 70,
        height: 9,
        hatch: { color: '#000000', width: 0.4, spacing: 3, angle },
      };
      const lines = hatchLines(rect);
      expect(lines.length).toBeGreaterThan(10);
      for (const { from, to } of lines) {
        for (const [x, y] of [from, to]) {
          expect(x).toBeGreaterThanOrEqual(10 - 1e-9);
          expect(x).toBeLessThanOrEqual(80 + 1e-9);
          expect(y).toBeGreaterThanOrEqual(20 - 1e-9);
          expect(y).toBeLessThanOrEqual(29 + 1e-9);
        }
        // Rising lines go up to the right on a page whose y goes down.
        expect((to[1] - from[1]) / (to[0] - from[0])).toBeCloseTo(angle === 45 ? -1 : 1, 9);
      }
    }
    expect(hatchLines({ shape: 'rect', x: 0, y: 0, width: 1, height: 1 })).toEqual([]);
  });

  it('point an arrow at its end', () => {
    const [tip, left, right] = arrowHead([0, 0], [10, 0], 5);
    expect(tip).toEqual([10, 0]);
    expect(left[0]).toBe(5);
    expect(left[1]).toBeCloseTo(-right[1], 12);
  });

  it('become SVG with words and no bare user text', () => {
    const hostile = '<script>"\'&]]>{{x}}\u0000\u202e';
    const data: StackUpDrawing = {
      ...fixture.stackUp,
      layers: fixture.stackUp.layers.map((layer) => ({ ...layer, label: hostile, detail: hostile })),
    };
    const svg = shapesToSvg(drawing(data, { title: hostile, desc: hostile }), 'fig-x');
    expect(svg).toContain('role="img"');
    expect(svg).toContain('aria-labelledby="fig-x__title fig-x__desc"');
    expect(svg).not.toContain('<script');
    expect(svg).not.toContain('\u0000');
    expect(svg).toContain('&lt;script&gt;&quot;&#39;&amp;]]&gt;{{x}}\ufffd');
    expect(shapesToSvg(drawing(data), 'a')).toBe(shapesToSvg(drawing(data), 'a'));
  });
});
