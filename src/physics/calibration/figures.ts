/** Figures of one calibration patch, and where its frequencies lie. */
import type { Complex } from '../../numerics/complex.js';
import type { CalibrationCase } from './cases.js';
import { CALIBRATION_FREQUENCY } from './range.js';
import { parallelResonance, type Resonance, seriesResonance } from './resonance.js';
import type { Solver } from './solver.js';

/** Hz at which a patch is looked at in each of its surroundings. */
export interface Sampling {
  readonly gap: readonly number[];
  readonly edge: readonly number[];
  readonly between: readonly number[];
}

export interface CaseFigures {
  readonly gap: Resonance;
  readonly edge: Resonance;
  readonly between: readonly Complex[];
}

/** Relative distance from the resonance of the outermost frequencies. */
const GAP_SPREAD = 0.02;
const EDGE_SPREAD = [0.006, 0.03] as const;
/** Where the resonance of a patch is looked for at first, relative to the frequency it was sized for. */
const SEARCH = { low: 0.88, high: 1.24, step: 0.015 };
const BETWEEN = [-0.035, 0, 0.035];

export function figuresOf(of: CalibrationCase, sampling: Sampling, solver: Solver): CaseFigures {
  return {
    gap: seriesResonance(sampling.gap, solver.gap(of, sampling.gap)),
    edge: parallelResonance(sampling.edge, solver.edge(of, sampling.edge)),
    between: solver.between(of, sampling.between),
  };
}

/**
 * Frequencies about the resonances that a quick solver finds; kept for both engines and all constants, so that what the
 * rules of `resonance.ts` leave out is left out alike.
 */
export function samplingOf(of: CalibrationCase, quick: Solver): Sampling {
  const around = (centre: number, spread: number, points: number): number[] =>
    Array.from({ length: points }, (_, i) => centre * (1 + spread * ((2 * i) / (points - 1) - 1)));
  let gap = around(CALIBRATION_FREQUENCY, GAP_SPREAD, 3);
  gap = around(seriesResonance(gap, quick.gap(of, gap)).frequency, GAP_SPREAD, 3);
  const search = Array.from(
    { length: Math.round((SEARCH.high - SEARCH.low) / SEARCH.step) + 1 },
    (_, i) => CALIBRATION_FREQUENCY * (SEARCH.low + i * SEARCH.step),
  );
  const seen = quick.edge(of, search);
  const best = search[seen.reduce((most, z, i) => (z.re > seen[most].re ? i : most), 0)];
  let edge = around(best, SEARCH.step, 5);
  for (let i = 0; i < 2; i++) {
    const { frequency, quality } = parallelResonance(edge, quick.edge(of, edge));
    edge = around(frequency, Math.min(EDGE_SPREAD[1], Math.max(EDGE_SPREAD[0], 0.6 / quality)), 5);
  }
  return { gap, edge, between: BETWEEN.map((d) => CALIBRATION_FREQUENCY * (1 + d)) };
}
