/**
 * Zeroth-order Hankel transforms of several spectra at fixed distances: the Bessel functions are worked out once, each
 * set of spectra then costs one product of a matrix and a vector.
 */
import { besselJ0 } from '../../numerics/bessel.js';
import { complexBesselJ0 } from '../../numerics/complex-bessel.js';
import type { SommerfeldPath } from './sommerfeld-path.js';

/** Two spectra at once at a wavenumber: out = [Re A, Im A, Re Q, Im Q]. */
export type SpectrumPair = (kRe: number, kIm: number, out: Float64Array) => void;

/** Columns of values at the distances of a table. */
export interface TransformPair {
  readonly aRe: Float64Array;
  readonly aIm: Float64Array;
  readonly qRe: Float64Array;
  readonly qIm: Float64Array;
}

/** @returns a function that writes the transforms of a pair at all `distances` to `out` from index `first` on */
export function hankelTable(
  path: SommerfeldPath,
  distances: Float64Array,
): (spectra: SpectrumPair, out: TransformPair, first: number) => void {
  const [bent, straight] = [path.re.length, path.real.length];
  const bentRe = new Float64Array(distances.length * bent);
  const bentIm = new Float64Array(distances.length * bent);
  const real = new Float64Array(distances.length * straight);
  const value = new Float64Array(4);
  for (let d = 0; d < distances.length; d++) {
    const rho = distances[d];
    for (let m = 0; m < bent; m++) {
      complexBesselJ0(path.re[m] * rho, path.im[m] * rho, value);
      bentRe[d * bent + m] = value[0];
      bentIm[d * bent + m] = value[1];
    }
    for (let m = 0; m < straight; m++) real[d * straight + m] = besselJ0(path.real[m] * rho);
  }
  // Spectra times weight, [Re A, Im A, Re Q, Im Q] for each node.
  const onBent = new Float64Array(4 * bent);
  const onStraight = new Float64Array(4 * straight);

  return (spectra, out, first) => {
    for (let m = 0; m < bent; m++) {
      spectra(path.re[m], path.im[m], value);
      const [wr, wi] = [path.weightRe[m], path.weightIm[m]];
      for (let q = 0; q < 4; q += 2) {
        onBent[4 * m + q] = value[q] * wr - value[q + 1] * wi;
        onBent[4 * m + q + 1] = value[q] * wi + value[q + 1] * wr;
      }
    }
    for (let m = 0; m < straight; m++) {
      spectra(path.real[m], 0, value);
      for (let q = 0; q < 4; q++) onStraight[4 * m + q] = value[q] * path.weight[m];
    }
    for (let d = 0; d < distances.length; d++) {
      let [aRe, aIm, qRe, qIm] = [0, 0, 0, 0];
      for (let m = 0, b = d * bent, s = 0; m < bent; m++, b++, s += 4) {
        const [jr, ji] = [bentRe[b], bentIm[b]];
        aRe += onBent[s] * jr - onBent[s + 1] * ji;
        aIm += onBent[s] * ji + onBent[s + 1] * jr;
        qRe += onBent[s + 2] * jr - onBent[s + 3] * ji;
        qIm += onBent[s + 2] * ji + onBent[s + 3] * jr;
      }
      for (let m = 0, b = d * straight, s = 0; m < straight; m++, b++, s += 4) {
        const j = real[b];
        aRe += onStraight[s] * j;
        aIm += onStraight[s + 1] * j;
        qRe += onStraight[s + 2] * j;
        qIm += onStraight[s + 3] * j;
      }
      out.aRe[first + d] = aRe;
      out.aIm[first + d] = aIm;
      out.qRe[first + d] = qRe;
      out.qIm[first + d] = qIm;
    }
  };
}
