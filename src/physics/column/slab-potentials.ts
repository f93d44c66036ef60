/**
 * Potentials of a slab in space, times distance, at the tabulated distances; and interpolation as weights on the table,
 * so that any integral over distances that a layout asks for is a fixed weighted sum of it.
 */
import { besselJ0 } from '../../numerics/bessel.js';
import type { IntegralGroup, SlabIntegrals } from './slab-integrals.js';
import { slabSpectrum } from './slab-spectrum.js';
import { POTENTIALS, type SurfaceSpectrum, surfaceSpectrum } from './surface-spectrum.js';

/**
 * r times each potential at every distance, the magnetic ones up to a reach of their own (nought beyond); the guided parts are those of the TM0 pole, imaginary and so given
 * real.
 */
export interface SlabPotentials {
  readonly omega: number;
  /** [Re, Im] of r·G_A, r·G_q, r·F, r·M. */
  readonly re: readonly Float64Array[];
  readonly im: readonly Float64Array[];
  /** Imaginary part that the guided wave has in r·G_A (none), r·G_q, r·F, r·M. */
  readonly guided: readonly Float64Array[];
}

/**
 * @param frequency    Hz
 * @param permittivity relative, lossless
 * @param height       m
 * @param edgeReach    largest distance at which F and M are asked for, m
 * @throws RangeError where a second surface wave propagates, or above the frequency of the integrals
 */
export function slabPotentials(
  frequency: number,
  permittivity: number,
  height: number,
  integrals: SlabIntegrals,
  edgeReach = Number.POSITIVE_INFINITY,
): SlabPotentials {
  if (frequency > integrals.maximumFrequency * (1 + 1e-9))
    throw new RangeError(`slabPotentials: ${frequency} Hz is above the ${integrals.maximumFrequency} Hz prepared for`);
  const slab = slabSpectrum(frequency, permittivity, height);
  const spectrum = surfaceSpectrum(slab, permittivity, height);
  const { distance, groups } = integrals;
  const count = distance.length;
  const make = (): Float64Array[] => Array.from({ length: POTENTIALS }, () => new Float64Array(count));
  const [re, im, guided] = [make(), make(), make()];
  let near = 0;
  while (near < count && (near < 4 || distance[near - 3] <= edgeReach)) near++;
  const rows = [count, count, near, near];
  for (const group of groups) integrate(group, rows, spectrum.remainder, re, im);
  const residues = [0, slab.residueQ, slab.residueF, slab.residueM];
  for (let d = 0; d < count; d++) {
    const r = distance[d];
    const wave = (-r / 4) * besselJ0(slab.kp * r);
    for (let p = 0; p < POTENTIALS && d < rows[p]; p++) {
      // 1/u is 2·e^{−jkr}/(4πr) in space.
      const c = spectrum.closedFactor[p] / (2 * Math.PI);
      re[p][d] = re[p][d] * r + c * Math.cos(spectrum.closedK[p] * r);
      im[p][d] = im[p][d] * r - c * Math.sin(spectrum.closedK[p] * r);
      guided[p][d] = residues[p] * wave;
    }
  }
  return { omega: slab.omega, re, im, guided };
}

function integrate(
  group: IntegralGroup,
  rows: readonly number[],
  remainder: SurfaceSpectrum['remainder'],
  re: readonly Float64Array[],
  im: readonly Float64Array[],
): void {
  const { first, last, kRe, kIm, ellipseRe, ellipseIm, tailK, tail } = group;
  const [n, m] = [kRe.length, tailK.length];
  const potentials = rows[POTENTIALS - 1] > first ? 4 : 2;
  const value = new Float64Array(2 * POTENTIALS);
  const low = Array.from({ length: 2 * POTENTIALS }, () => new Float64Array(n));
  for (let i = 0; i < n; i++) {
    remainder(kRe[i], kIm[i], potentials, value);
    for (let p = 0; p < 2 * potentials; p++) low[p][i] = value[p];
  }
  const high = Array.from({ length: POTENTIALS }, () => new Float64Array(m));
  for (let i = 0; i < m; i++) {
    remainder(tailK[i], 0, potentials, value);
    for (let p = 0; p < potentials; p++) high[p][i] = value[2 * p];
  }
  for (let p = 0; p < potentials; p++) {
    const [fr, fi, g] = [low[2 * p], low[2 * p + 1], high[p]];
    for (let d = first, q = 0, s = 0; d < Math.min(last, rows[p]); d++) {
      let [a, b] = [0, 0];
      for (let i = 0; i < n; i++, q++) {
        a += fr[i] * ellipseRe[q] - fi[i] * ellipseIm[q];
        b += fr[i] * ellipseIm[q] + fi[i] * ellipseRe[q];
      }
      for (let i = 0; i < m; i++, s++) a += g[i] * tail[s];
      re[p][d] = a;
      im[p][d] = b;
    }
  }
}

/**
 * Adds `a` and `b` times the cubic through the four tabulated values around r to two sets of weights on the table.
 * Nearer than the first distance it is the first.
 */
export function addWeights(
  distance: Float64Array,
  r: number,
  a: number,
  aWeights: Float64Array,
  b: number,
  bWeights: Float64Array,
): void {
  const at = Math.max(r, distance[0]);
  let [low, high] = [0, distance.length - 1];
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if (distance[middle] > at) high = middle;
    else low = middle;
  }
  const base = Math.min(Math.max(low - 1, 0), distance.length - 4);
  for (let i = 0; i < 4; i++) {
    let w = 1 / at;
    for (let j = 0; j < 4; j++) if (j !== i) w *= (at - distance[base + j]) / (distance[base + i] - distance[base + j]);
    aWeights[base + i] += a * w;
    bWeights[base + i] += b * w;
  }
}
