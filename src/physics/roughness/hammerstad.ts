/** A loss factor: power lost in the rough surface over that lost in a smooth one. It carries no phase of its own. */
export interface LossFactor {
  /** ≥ 1 */
  readonly factor: number;
  /** Within 5 % of the model's ceiling: it can no longer tell foils apart. */
  readonly saturated: boolean;
}

export const CEILING = 2;
export const isSaturated = (factor: number): boolean => factor >= 0.95 * CEILING;

/** @throws RangeError on a negative or non-finite height or a skin depth that is not positive */
export function roughnessRatio(rq: number, delta: number): number {
  if (!(Number.isFinite(rq) && rq >= 0)) throw new RangeError(`Rq must be 0 m or more, got ${rq}`);
  if (!(Number.isFinite(delta) && delta > 0)) throw new RangeError(`skin depth must be positive, got ${delta}`);
  return rq / delta;
}

/**
 * Loss factor of a rough conductor, Hammerstad: K = 1 + (2/π) atan(1.4 (Rq/δ)²).
 *
 * Source: E. O. Hammerstad and F. Bekkadal, "Microstrip Handbook", ELAB report STF44 A74169, 1975, a fit to
 * S. P. Morgan's computed grooves (J. Appl. Phys. 20, 1949); also in Hammerstad and Jensen 1980 (from memory).
 * Holds for 60° triangular grooves across the current, within 2 % up to Rq/δ of 1.2 and 5 % beyond. Its ceiling of 2
 * belongs to that shape, not to copper; above Rq/δ of 2.1 it is within 5 % of it and cannot tell foils apart.
 * No reference plane: loss only.
 *
 * @param rq    root-mean-square height of the profile, m, ≥ 0
 * @param delta skin depth, m, > 0
 */
export function hammerstad(rq: number, delta: number): LossFactor {
  const r = roughnessRatio(rq, delta);
  const factor = 1 + (2 / Math.PI) * Math.atan(1.4 * r * r);
  return { factor, saturated: isSaturated(factor) };
}
