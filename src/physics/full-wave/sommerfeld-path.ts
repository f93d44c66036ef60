/**
 * Paths of integration for (1/2π) ∫ F(k) J0(kρ) k dk, 0 to infinity, where F has its poles and its branch points on or
 * below the real axis up to `end`: half an ellipse above them, then the real axis (Michalski & Mosig 1997).
 *
 * The ellipse is no higher than 4/ρ, since |J0| grows as e^{Im k ρ}. On the real axis either F has fallen off, or a
 * smooth window ends it: beyond `end` F is smooth on the scale 1/ρ, and what a window of Gaussian slope much wider than
 * that cuts off integrates to nothing.
 */
import { gaussLegendre } from '../../numerics/gauss-legendre.js';
import { normalCdf } from '../../numerics/normal.js';

export interface SommerfeldPath {
  /** Nodes and weights times k/2π of the ellipse. */
  readonly re: Float64Array;
  readonly im: Float64Array;
  readonly weightRe: Float64Array;
  readonly weightIm: Float64Array;
  /** The same on the real axis. */
  readonly real: Float64Array;
  readonly weight: Float64Array;
}

const POINTS = 14;
/** What a panel of that many points bears of the phase kρ, rad. */
const PHASE = 14;
/** Standard deviations from the middle of the window to either end: 4e-11 is left there. */
const WINDOW = 6.5;

/**
 * @param end   just past the largest wavenumber of the layers, 1/m
 * @param reach largest ρ, m
 * @param fall  wavenumber by which F has fallen off, 1/m
 */
export function fallingPath(end: number, reach: number, fall: number): SommerfeldPath {
  const top = Math.max(fall, 2 * end);
  return { ...ellipse(end, reach), ...realAxis(end, top, PHASE / reach, () => 1) };
}

/**
 * For an F that does not fall off, or falls slowly beside J0.
 *
 * @param nearest smallest ρ, m: sets the width of the window
 */
export function windowedPath(end: number, nearest: number, reach: number): SommerfeldPath {
  const deviation = 7 / nearest;
  const middle = end + WINDOW * deviation;
  const window = (k: number): number => normalCdf((middle - k) / deviation);
  return {
    ...ellipse(end, reach),
    ...realAxis(end, middle + WINDOW * deviation, Math.min(PHASE / reach, deviation), window),
  };
}

function ellipse(end: number, reach: number): Pick<SommerfeldPath, 're' | 'im' | 'weightRe' | 'weightIm'> {
  const height = Math.min(0.35 * end, 4 / reach);
  // Poles lie as far below the middle of the ellipse as it is high: panels no longer than twice that.
  const panels = Math.max(4, Math.ceil((0.8 * end) / height));
  const rule = gaussLegendre(POINTS);
  const count = panels * POINTS;
  const path = {
    re: new Float64Array(count),
    im: new Float64Array(count),
    weightRe: new Float64Array(count),
    weightIm: new Float64Array(count),
  };
  const half = Math.PI / panels / 2;
  for (let p = 0, m = 0; p < panels; p++) {
    for (let i = 0; i < POINTS; i++, m++) {
      const angle = (2 * p + 1 + rule.nodes[i]) * half;
      const k = { re: (end / 2) * (1 - Math.cos(angle)), im: height * Math.sin(angle) };
      const slope = { re: (end / 2) * Math.sin(angle), im: height * Math.cos(angle) };
      const w = (half * rule.weights[i]) / (2 * Math.PI);
      path.re[m] = k.re;
      path.im[m] = k.im;
      path.weightRe[m] = w * (k.re * slope.re - k.im * slope.im);
      path.weightIm[m] = w * (k.re * slope.im + k.im * slope.re);
    }
  }
  return path;
}

/** Panels that grow with the distance from the poles up to a length. */
function realAxis(
  start: number,
  top: number,
  longest: number,
  window: (k: number) => number,
): Pick<SommerfeldPath, 'real' | 'weight'> {
  const edges = [start];
  while (edges[edges.length - 1] < top) {
    const k = edges[edges.length - 1];
    edges.push(Math.min(top, k + Math.min(longest, 0.4 * k)));
  }
  const rule = gaussLegendre(POINTS);
  const count = (edges.length - 1) * POINTS;
  const real = new Float64Array(count);
  const weight = new Float64Array(count);
  for (let p = 0, m = 0; p + 1 < edges.length; p++) {
    const half = (edges[p + 1] - edges[p]) / 2;
    for (let i = 0; i < POINTS; i++, m++) {
      const k = edges[p] + half * (1 + rule.nodes[i]);
      real[m] = k;
      weight[m] = (half * rule.weights[i] * k * window(k)) / (2 * Math.PI);
    }
  }
  return { real, weight };
}
