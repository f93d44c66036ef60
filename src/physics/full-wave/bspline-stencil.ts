/**
 * Averages of a smooth function over the linear or the cubic B-spline of a uniform grid, from its samples on that grid,
 * by a symmetric stencil that is exact for polynomials of degree 9.
 */
import { factoriseReal, solveReal } from '../../numerics/real-lu.js';

/** Samples to either side that a stencil takes. */
export const STENCIL_REACH = 4;

/** Linear B-spline, the triangle, at t steps from its middle. */
export function linearSpline(t: number): number {
  return Math.max(0, 1 - Math.abs(t));
}

/** Cubic B-spline at t steps from its middle (de Boor 1978): the correlation of two triangles. */
export function cubicSpline(t: number): number {
  const a = Math.abs(t);
  if (a >= 2) return 0;
  return a < 1 ? 2 / 3 - a * a * (1 - a / 2) : (2 - a) ** 3 / 6;
}

/** Weights of the middle sample and of the pairs beside it, from the even moments of the spline of degree 1 or 3. */
export function splineStencil(degree: 1 | 3): Float64Array {
  const n = STENCIL_REACH + 1;
  const matrix = new Float64Array(n * n);
  const weights = new Float64Array(n);
  for (let row = 0; row < n; row++) {
    for (let m = 0; m < n; m++) matrix[row * n + m] = m === 0 ? Number(row === 0) : 2 * m ** (2 * row);
    weights[row] = splineMoment(degree, 2 * row);
  }
  solveReal(factoriseReal(matrix, n), weights);
  return weights;
}

/** ∫ t^p B(t) dt for even p: a central difference of the (degree + 1)-fold integral of t^p (Peano kernel). */
export function splineMoment(degree: 1 | 3, p: number): number {
  const order = degree + 1;
  let divisor = 1;
  for (let q = 1; q <= order; q++) divisor *= p + q;
  const difference = degree === 1 ? 2 : 2 * 2 ** (p + order) - 8;
  return difference / divisor;
}

/** A field sampled over a quadrant, even in both directions, margin included: index j·width + i. */
export interface QuadrantSamples {
  readonly re: Float64Array;
  readonly im: Float64Array;
  readonly width: number;
  readonly height: number;
}

/** Averages along x: a quadrant narrower by the reach of the stencil. */
export function averageAlongX({ re, im, width, height }: QuadrantSamples, stencil: Float64Array): QuadrantSamples {
  const narrow = width - STENCIL_REACH;
  const out = { re: new Float64Array(narrow * height), im: new Float64Array(narrow * height), width: narrow, height };
  const line = new Float64Array(width + STENCIL_REACH);
  for (const [from, to] of [
    [re, out.re],
    [im, out.im],
  ]) {
    for (let j = 0; j < height; j++) {
      for (let m = 1; m <= STENCIL_REACH; m++) line[STENCIL_REACH - m] = from[j * width + m];
      for (let i = 0; i < width; i++) line[STENCIL_REACH + i] = from[j * width + i];
      const [w0, w1, w2, w3, w4] = stencil;
      for (let i = 0, c = STENCIL_REACH, p = j * narrow; i < narrow; i++, c++, p++)
        to[p] =
          w0 * line[c] +
          w1 * (line[c - 1] + line[c + 1]) +
          w2 * (line[c - 2] + line[c + 2]) +
          w3 * (line[c - 3] + line[c + 3]) +
          w4 * (line[c - 4] + line[c + 4]);
    }
  }
  return out;
}

/** Averages along y, times a factor, written to two arrays of width × (height − reach). */
export function averageAlongY(
  { re, im, width, height }: QuadrantSamples,
  stencil: Float64Array,
  factor: number,
  outRe: Float64Array,
  outIm: Float64Array,
): void {
  const [w0, w1, w2, w3, w4] = stencil.map((w) => w * factor);
  for (const [from, to] of [
    [re, outRe],
    [im, outIm],
  ]) {
    for (let j = 0; j < height - STENCIL_REACH; j++) {
      const row = (m: number): number => Math.abs(j + m) * width;
      const [c, a1, b1, a2, b2] = [row(0), row(-1), row(1), row(-2), row(2)];
      const [a3, b3, a4, b4] = [row(-3), row(3), row(-4), row(4)];
      for (let i = 0, p = c; i < width; i++, p++)
        to[p] =
          w0 * from[p] +
          w1 * (from[a1 + i] + from[b1 + i]) +
          w2 * (from[a2 + i] + from[b2 + i]) +
          w3 * (from[a3 + i] + from[b3 + i]) +
          w4 * (from[a4 + i] + from[b4 + i]);
    }
  }
}
