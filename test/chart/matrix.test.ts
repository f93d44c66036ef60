import { describe, expect, it } from 'vitest';
import { drawMatrix } from '../../src/chart/drawing.js';
import { theme } from '../../src/chart/theme.js';
import type { MatrixDrawing } from '../../src/dossier/document.js';
import { expectReadable, texts } from './readable.js';

const matrix = (n: number): MatrixDrawing => ({
  drawing: 'matrix',
  rowTitle: 'Leaving column',
  columnTitle: 'Driven column',
  unit: 'dB',
  labels: Array.from({ length: n }, (_, i) => `${i + 1}`),
  cells: Array.from({ length: n * n }, (_, i) => ({ row: Math.floor(i / n), column: i % n }))
    .filter(({ row, column }) => row !== column)
    .map(({ row, column }) => ({ row, column, value: -20 - 6 * Math.abs(row - column) - 0.1 * row })),
  range: [-20 - 6.1 * n, -26],
});

const luminance = (colour: string): number => {
  const [r, g, b] = [1, 3, 5].map((at) => {
    const c = Number.parseInt(colour.slice(at, at + 2), 16) / 255;
    return c <= 0.04045 ? c / 12.92 : ((c + 0.055) / 1.055) ** 2.4;
  });
  return 0.2126 * r + 0.7152 * g + 0.0722 * b;
};

describe('matrix', () => {
  it('prints every number, readably, for two and for sixteen columns', () => {
    for (const n of [2, 5, 16]) {
      const list = drawMatrix(matrix(n));
      expectReadable(list);
      expect(texts(list).filter(({ text }) => /^−\d+\.\d$/.test(text))).toHaveLength(n * (n - 1));
    }
  });

  it('is darker for the larger level, and leaves its numbers readable on the darkest', () => {
    const { shapes } = drawMatrix(matrix(3));
    const cells = shapes.flatMap((s) => (s.shape === 'rect' && s.stroke?.width === 0.4 ? [s.fill ?? ''] : []));
    expect(cells).toHaveLength(9);
    const shade = (row: number, column: number) => luminance(cells[3 * row + column]);
    expect(shade(0, 1)).toBeLessThan(shade(0, 2));
    expect(shade(1, 1)).toBe(luminance(theme.figure.paper));
    const ink = luminance(theme.figure.ink);
    for (const fill of cells) expect((luminance(fill) + 0.05) / (ink + 0.05)).toBeGreaterThan(4.5);
  });

  it('outlines pairs of groups with a dashed line inside their cells', () => {
    const { shapes } = drawMatrix({ ...matrix(3), outlined: [[0, 1]] });
    const outlines = shapes.filter((s) => s.shape === 'rect' && s.stroke?.dash !== undefined);
    expect(outlines).toHaveLength(1);
  });
});
