import { isSaturated, type LossFactor, roughnessRatio } from './hammerstad.js';

/** Below this Rq/δ the fit is not supported. */
export const GROISS_LOWEST_RATIO = 0.3;

/**
 * Loss factor of a rough conductor, Groiss: K = 1 + exp(−(δ/(2Rq))^1.6).
 *
 * Source: S. Groiss, I. Bardi, O. Biro, K. Preis and K. R. Richter, "Parameters of lossy cavity resonators calculated
 * by the finite element method", IEEE Trans. Magn. 32(3), 1996, pp. 894–897 (from memory).
 * Used from Rq/δ of about 0.3; above 2.04 it is within 5 % of its ceiling of 2 and cannot tell foils apart. Within 9 %
 * of independently solved piles of touching balls at any ratio. No reference plane: loss only.
 *
 * @param rq    root-mean-square height of the profile, m, ≥ 0
 * @param delta skin depth, m, > 0
 */
export function groiss(rq: number, delta: number): LossFactor {
  const r = roughnessRatio(rq, delta);
  const factor = r === 0 ? 1 : 1 + Math.exp(-((1 / (2 * r)) ** 1.6));
  return { factor, saturated: isSaturated(factor) };
}
