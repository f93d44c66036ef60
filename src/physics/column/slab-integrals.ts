/**
 * Distances and integration paths of the slab's potentials, shared by all frequencies and slabs of one board.
 *
 * The Sommerfeld integral of every potential runs over a half ellipse above all poles and branch points and then along
 * the real axis (Gay-Balmaz & Mosig 1997; from memory). Distances go in octaves: the ellipse is lower the further away
 * (Im k · r ≤ 4), and what the real axis adds is faded out by an error function once it oscillates, which leaves
 * e^{−(σr/2)²} of an integrand that is smooth there. J0 hangs on path and distance alone: with it tabulated, a frequency
 * costs one sum per distance and potential.
 */
import { gaussLegendre } from '../../numerics/gauss-legendre.js';
import { SPEED_OF_LIGHT } from '../constants.js';
import { besselJ0Complex } from './bessel-complex.js';

/** Distances from `first` (inclusive) to `last` (exclusive) with their common path. */
export interface IntegralGroup {
  readonly first: number;
  readonly last: number;
  /** Ellipse: wavenumbers, and k J0(kr) dk/2π for every distance, row by row. */
  readonly kRe: Float64Array;
  readonly kIm: Float64Array;
  readonly ellipseRe: Float64Array;
  readonly ellipseIm: Float64Array;
  /** Real axis: the same, window included. */
  readonly tailK: Float64Array;
  readonly tail: Float64Array;
}

export interface SlabIntegrals {
  /** Distances, m: in steps of an eighth of themselves, then of a thirtieth of a wavelength. */
  readonly distance: Float64Array;
  readonly groups: readonly IntegralGroup[];
  readonly maximumFrequency: number;
}

/** Slabs of a board's conditions may have this much more permittivity than the one prepared for. */
const PERMITTIVITY_MARGIN = 1.25;
const NEAREST = 10e-6;

/**
 * @param maximumFrequency Hz; potentials on these paths are for this frequency and below
 * @param permittivity     relative
 * @param height           m
 * @param reach            largest distance between two points of the board's metal, m
 */
export function slabIntegrals(
  maximumFrequency: number,
  permittivity: number,
  height: number,
  reach: number,
): SlabIntegrals {
  const k0 = (2 * Math.PI * maximumFrequency) / SPEED_OF_LIGHT;
  const distance = distances((2 * Math.PI) / k0 / 30, reach);
  const end = 1.1 * k0 * Math.sqrt(PERMITTIVITY_MARGIN * permittivity);
  const groups: IntegralGroup[] = [];
  const near = Math.max(4 * height, 0.4e-3);
  for (let first = 0, from = 0; first < distance.length; ) {
    const to = from === 0 ? near : 2 * from;
    let last = first;
    while (last < distance.length && distance[last] <= to) last++;
    if (last > first) groups.push(group(distance, first, last, from, end, 9 / height));
    first = last;
    from = to;
  }
  return { distance, groups, maximumFrequency };
}

function distances(step: number, reach: number): Float64Array {
  const list = [NEAREST];
  // Two more than the farthest, for the four-point interpolation.
  for (let beyond = 0; beyond < 3; ) {
    const r = list[list.length - 1];
    list.push(r + Math.min(step, r / 8));
    if (r > reach) beyond++;
  }
  return Float64Array.from(list);
}

function group(
  distance: Float64Array,
  first: number,
  last: number,
  from: number,
  end: number,
  top: number,
): IntegralGroup {
  const rows = last - first;
  const far = distance[last - 1];
  const height = Math.min(0.3 * end, 4 / far);
  const rule = gaussLegendre(Math.ceil(36 + 0.55 * end * far + (1.6 * end) / height));
  const n = rule.nodes.length;
  const kRe = new Float64Array(n);
  const kIm = new Float64Array(n);
  const dRe = new Float64Array(n);
  const dIm = new Float64Array(n);
  for (let i = 0; i < n; i++) {
    const t = (Math.PI / 2) * (rule.nodes[i] + 1);
    const w = rule.weights[i] / 4;
    kRe[i] = (end / 2) * (1 - Math.cos(t));
    kIm[i] = height * Math.sin(t);
    // k dk/2π with dt = π/2 · weight.
    const [tr, ti] = [(end / 2) * Math.sin(t), height * Math.cos(t)];
    dRe[i] = w * (kRe[i] * tr - kIm[i] * ti);
    dIm[i] = w * (kRe[i] * ti + kIm[i] * tr);
  }
  const fade = from === 0 ? 0 : 7 / from;
  const stop = Math.max(end * 1.5, from === 0 ? top : Math.min(top, end + 7.5 * fade));
  // Eight points for ten radians of J0: 1e-6 of a panel; four more panels for what J0 does not set.
  const panels = Math.ceil(((stop - end) * far) / 10) + 4;
  const inner = gaussLegendre(8);
  const tailK = new Float64Array(panels * 8);
  const tailWeight = new Float64Array(panels * 8);
  const half = (stop - end) / panels / 2;
  for (let p = 0, m = 0; p < panels; p++) {
    for (let i = 0; i < 8; i++, m++) {
      const k = end + (2 * p + 1 + inner.nodes[i]) * half;
      const window = fade === 0 ? 1 : 0.5 * complementaryError((k - end) / fade - 3.75);
      tailK[m] = k;
      tailWeight[m] = (half * inner.weights[i] * k * window) / (2 * Math.PI);
    }
  }
  const ellipseRe = new Float64Array(rows * n);
  const ellipseIm = new Float64Array(rows * n);
  const tail = new Float64Array(rows * tailK.length);
  const j = new Float64Array(2);
  for (let d = 0, q = 0, s = 0; d < rows; d++) {
    const r = distance[first + d];
    for (let i = 0; i < n; i++, q++) {
      besselJ0Complex(kRe[i] * r, kIm[i] * r, j);
      ellipseRe[q] = dRe[i] * j[0] - dIm[i] * j[1];
      ellipseIm[q] = dRe[i] * j[1] + dIm[i] * j[0];
    }
    for (let m = 0; m < tailK.length; m++, s++) {
      besselJ0Complex(tailK[m] * r, 0, j);
      tail[s] = tailWeight[m] * j[0];
    }
  }
  return { first, last, kRe, kIm, ellipseRe, ellipseIm, tailK, tail };
}

/** erfc to 1e-7 (Abramowitz & Stegun 7.1.26 refined; Press et al., Numerical Recipes, ch. 6; from memory). */
function complementaryError(x: number): number {
  const t = 1 / (1 + 0.5 * Math.abs(x));
  const c = [
    0.17087277, -0.82215223, 1.48851587, -1.13520398, 0.27886807, -0.18628806, 0.09678418, 0.37409196, 1.00002368,
  ];
  let s = 0;
  for (const a of c) s = s * t + a;
  const value = t * Math.exp(-x * x - 1.26551223 + t * s);
  return x >= 0 ? value : 2 - value;
}
