import type { AccuracyClaim } from './accuracy-claim.js';
import { columnAccuracy } from './accuracy-columns.js';
import { copperAccuracy } from './accuracy-copper.js';
import { lineAccuracy } from './accuracy-lines.js';

/** One line of the accuracy table. */
export interface Accuracy extends Omit<AccuracyClaim, 'deviations'> {
  /** Largest magnitude of the deviations. */
  readonly reached: number;
  readonly cases: number;
  readonly met: boolean;
}

export const accuracyClaims: readonly AccuracyClaim[] = [...lineAccuracy, ...copperAccuracy, ...columnAccuracy];

/**
 * How close the solvers come to what is better than they are, worked out anew with every call: refined solutions of their
 * own, independent solutions, full wave, the formulas' authors' claims. A deviation that is not a number does not meet.
 *
 * About two seconds the first time; comparisons that checks share are kept.
 */
export function accuracyTable(claims: readonly AccuracyClaim[] = accuracyClaims): readonly Accuracy[] {
  return claims.map(({ deviations, ...claim }) => {
    const sizes = deviations().map(Math.abs);
    const reached = sizes.some(Number.isNaN) ? Number.NaN : Math.max(...sizes);
    return { ...claim, reached, cases: sizes.length, met: reached <= claim.target };
  });
}
