/**
 * Figures of a driven array: directivity, gain, reflection and cuts from the solved board, whichever engine solved it.
 *
 * Directivity is the peak power per solid angle over the power radiated (circuit); gain is directivity times the
 * circuit's efficiency: network and far field keep one normalisation, so the two agree within a thousandth.
 */
import { abs2, type Complex, complex, div, ZERO } from '../../numerics/complex.js';
import type { ColumnSolution, ExcitedArray } from '../column/index.js';
import { type CutShape, climb, cutShape, intensity } from '../pattern/index.js';

export interface ArrayFigures {
  /** Linear. */
  readonly directivity: number;
  /** Radiated power over the sum of all sinks: what a solver's balance misses is left out of both. */
  readonly radiationEfficiency: number;
  /** 1 − reflected over incident power, all columns driven. */
  readonly mismatch: number;
  /** Each column driven alone, the others terminated in their reference impedance. */
  readonly passiveReflection: readonly Complex[];
  /** All driven; 0 at a column that gets no wave. */
  readonly activeReflection: readonly Complex[];
  readonly elevation: CutShape;
  readonly azimuth: CutShape;
  /** (accepted − sum of sinks)/incident. */
  readonly powerResidual: number;
  readonly excited: ExcitedArray;
}

/** @param incident wave at each column, √W peak, not all zero */
export function arrayFigures(solution: ColumnSolution, incident: readonly Complex[]): ArrayFigures {
  const excited = solution.excite(incident);
  const { power } = excited;
  if (!(power.incident > 0)) throw new RangeError('arrayFigures: no column is driven');
  const elevation = cutShape(excited.field.cut('elevation'));
  const azimuth = cutShape(excited.field.cut('azimuth'));
  const peak = peakIntensity(excited, Math.sin(elevation.beamDirection), Math.sin(azimuth.beamDirection));
  const sinks =
    power.radiated +
    power.surfaceWave +
    power.underside +
    power.top +
    power.edges +
    power.ground +
    power.dielectric +
    power.load;
  return {
    directivity: (4 * Math.PI * peak) / power.radiated,
    radiationEfficiency: power.radiated / sinks,
    mismatch: power.accepted / power.incident,
    passiveReflection: solution.scattering.map((row, c) => row[c]),
    activeReflection: incident.map((wave, c) => (abs2(wave) > 0 ? div(excited.reflected[c], wave) : ZERO)),
    elevation,
    azimuth,
    powerResidual: (power.accepted - sinks) / power.incident,
    excited,
  };
}

/** Maximum over the half space by a shrinking pattern search from the maxima of the principal cuts, to 1e-4 in u and v: 1e-5 of a wide board's intensity. */
function peakIntensity(excited: ExcitedArray, u0: number, v0: number): number {
  const power = intensity(excited.field);
  let [u, v] = [u0, v0];
  let best = power(u, v);
  for (const [a, b] of [
    [u0, 0],
    [0, v0],
  ]) {
    const value = power(a, b);
    if (value > best) [best, u, v] = [value, a, b];
  }
  return climb(power, u, v, 0.02, 1e-4)[0];
}

/** Waves from amplitudes and phases (rad), scaled to one watt in all. */
export function incidentWaves(weights: readonly { readonly amplitude: number; readonly phase: number }[]): Complex[] {
  const total = weights.reduce((sum, w) => sum + w.amplitude * w.amplitude, 0);
  if (!(total > 0)) throw new RangeError('incidentWaves: every weight is zero');
  const k = Math.sqrt(2 / total);
  return weights.map((w) => complex(k * w.amplitude * Math.cos(w.phase), k * w.amplitude * Math.sin(w.phase)));
}
