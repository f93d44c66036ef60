/** Reactions of the grid as spectra of a circulant, twice the grid long: what a product multiplies by. */
import { laneFft, smoothLengthFrom } from '../../numerics/fft-lanes.js';
import type { SlabReactions } from './slab-reactions.js';

/** Even in both directions: a quarter is kept, element l·(columns/2 + 1) + k for wavenumber index (k, l). */
export interface ReactionSpectrum {
  /** Lengths of the circulant. */
  readonly columns: number;
  readonly rows: number;
  readonly axRe: Float64Array;
  readonly axIm: Float64Array;
  readonly ayRe: Float64Array;
  readonly ayIm: Float64Array;
  readonly qRe: Float64Array;
  readonly qIm: Float64Array;
}

/** Circulant lengths for a grid of nx × ny cells: no wrap of any distance that occurs. */
export const circulantSize = (nx: number, ny: number): { columns: number; rows: number } => ({
  columns: smoothLengthFrom(2 * nx - 1),
  rows: smoothLengthFrom(2 * ny - 1),
});

/** @param reactions on nx × ny offsets, nx and ny those of the mesh */
export function reactionSpectrum(reactions: SlabReactions, nx: number, ny: number): ReactionSpectrum {
  const { columns, rows } = circulantSize(nx, ny);
  const plans = { along: laneFft(columns, LANES), across: laneFft(rows, LANES) };
  // Divided by the count of points once here, so that the inverse needs no scaling.
  const of = (re: Float64Array, im: Float64Array) => evenTransform(re, im, nx, ny, columns, rows, plans);
  const [axRe, axIm] = of(reactions.axRe, reactions.axIm);
  const [ayRe, ayIm] = of(reactions.ayRe, reactions.ayIm);
  const [qRe, qIm] = of(reactions.qRe, reactions.qIm);
  return { columns, rows, axRe, axIm, ayRe, ayIm, qRe, qIm };
}

export const LANES = 8;

function evenTransform(
  re: Float64Array,
  im: Float64Array,
  nx: number,
  ny: number,
  columns: number,
  rows: number,
  plans: { readonly along: ReturnType<typeof laneFft>; readonly across: ReturnType<typeof laneFft> },
): [Float64Array, Float64Array] {
  const half = Math.floor(columns / 2) + 1;
  const tall = Math.floor(rows / 2) + 1;
  const midRe = new Float64Array(half * ny);
  const midIm = new Float64Array(half * ny);
  const a = new Float64Array(columns * LANES);
  const b = new Float64Array(columns * LANES);
  for (let j0 = 0; j0 < ny; j0 += LANES) {
    a.fill(0);
    b.fill(0);
    const lanes = Math.min(LANES, ny - j0);
    for (let q = 0; q < lanes; q++)
      for (let i = 0; i < nx; i++) {
        const from = (j0 + q) * nx + i;
        const p = i * LANES + q;
        a[p] = re[from];
        b[p] = im[from];
        if (i > 0) {
          a[(columns - i) * LANES + q] = re[from];
          b[(columns - i) * LANES + q] = im[from];
        }
      }
    plans.along.transform(a, b);
    for (let q = 0; q < lanes; q++)
      for (let k = 0; k < half; k++) {
        midRe[(j0 + q) * half + k] = a[k * LANES + q];
        midIm[(j0 + q) * half + k] = b[k * LANES + q];
      }
  }
  const outRe = new Float64Array(half * tall);
  const outIm = new Float64Array(half * tall);
  const c = new Float64Array(rows * LANES);
  const d = new Float64Array(rows * LANES);
  const scale = 1 / (columns * rows);
  for (let k0 = 0; k0 < half; k0 += LANES) {
    c.fill(0);
    d.fill(0);
    const lanes = Math.min(LANES, half - k0);
    for (let j = 0; j < ny; j++)
      for (let q = 0; q < lanes; q++) {
        const from = j * half + k0 + q;
        c[j * LANES + q] = midRe[from];
        d[j * LANES + q] = midIm[from];
        if (j > 0) {
          c[(rows - j) * LANES + q] = midRe[from];
          d[(rows - j) * LANES + q] = midIm[from];
        }
      }
    plans.across.transform(c, d);
    for (let l = 0; l < tall; l++)
      for (let q = 0; q < lanes; q++) {
        outRe[l * half + k0 + q] = c[l * LANES + q] * scale;
        outIm[l * half + k0 + q] = d[l * LANES + q] * scale;
      }
  }
  return [outRe, outIm];
}
