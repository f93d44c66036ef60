import type { HeightMap } from './surface.js';

/**
 * Slope by the seven-point formula of ISO 21920-2, over 60 spacings:
 * z₊₃ − 9z₊₂ + 45z₊₁ − 45z₋₁ + 9z₋₂ − z₋₃. Exact to the sixth order; at five points per wave it sees 98 % of the slope.
 * NaN where one of the points was not measured.
 */
export function slopeAt(z: Float64Array, i: number, stride: number, spacing: number): number {
  return (
    (z[i + 3 * stride] -
      9 * z[i + 2 * stride] +
      45 * z[i + stride] -
      45 * z[i - stride] +
      9 * z[i - 2 * stride] -
      z[i - 3 * stride]) /
    (60 * spacing)
  );
}

export interface AreaFigures {
  /** Root-mean-square gradient Sdq. */
  readonly sdq: number;
  /** Developed interfacial area ratio Sdr from the same slopes, as a ratio: 0.1 for 10 %. */
  readonly sdr: number;
  /** Sdr of the grid's own triangles (mean of both ways to split a cell); less than `sdr` where the grid is coarse. */
  readonly sdrTriangles: number;
}

/** Slopes of a map in its interior; ISO 25178-2. */
export function areaFigures({ columns, rows, spacingX, spacingY, heights: z }: HeightMap): AreaFigures {
  let [n, square, excess] = [0, 0, 0];
  for (let r = 3; r < rows - 3; r++)
    for (let c = 3; c < columns - 3; c++) {
      const i = r * columns + c;
      const g = slopeAt(z, i, 1, spacingX) ** 2 + slopeAt(z, i, columns, spacingY) ** 2;
      if (Number.isNaN(g)) continue;
      n++;
      square += g;
      excess += g / (Math.sqrt(1 + g) + 1);
    }
  let [cells, area] = [0, 0];
  for (let r = 0; r + 1 < rows; r++)
    for (let c = 0; c + 1 < columns; c++) {
      const i = r * columns + c;
      const [a, b, d, e] = [z[i], z[i + 1], z[i + columns], z[i + columns + 1]];
      // Four triangles, two of either split; each has a slope along one side of the cell in x and one in y.
      const [top, bottom] = [(b - a) / spacingX, (e - d) / spacingX];
      const [left, right] = [(d - a) / spacingY, (e - b) / spacingY];
      const stretch = (x: number, y: number): number => (x * x + y * y) / (Math.sqrt(1 + x * x + y * y) + 1);
      const sum = stretch(top, left) + stretch(bottom, right) + stretch(top, right) + stretch(bottom, left);
      if (Number.isNaN(sum)) continue;
      cells++;
      area += sum / 4;
    }
  return { sdq: Math.sqrt(square / n), sdr: excess / n, sdrTriangles: area / cells };
}
