import { add, type Complex, complex, scale } from '../../numerics/complex.js';
import { exactSphereTerm, publishedSphereTerm } from './sphere.js';

export interface Balls {
  /** m, > 0 */
  readonly radius: number;
  /** Balls per area of the face, 1/m², ≥ 0. */
  readonly perArea: number;
}

/** Radius in skin depths and pitch in radii from which the published formula holds. */
export const HURAY_LOWEST_RADIUS = 2;
export const HURAY_LOWEST_PITCH = 4;

/**
 * Surface impedance of balls over a flat base, Huray in causal form, K + jX in units of the smooth surface resistance:
 * (1 + j) [A0 + Σ 1.5 · 4πa² n /(1 + (1 − j) δ/(2a))]. The real part is `hurayLossFactor`.
 *
 * Source: P. G. Huray, The Foundations of Signal Integrity, 2010; causal form J. E. Bracken, DesignCon 2012 (from memory).
 * Radius from two skin depths and pitch from four radii: within 9 % of solved stacks; dense or small balls are overstated
 * up to threefold and far beyond. The source states no plane; it is taken as the mean plane, without electrostatic shift.
 * X is 1.3 to 2.4 times K there and not confirmed: solved balls push flux out and have less.
 *
 * @param delta     skin depth, m, > 0
 * @param flatShare A0, area of the flat base over tile area
 * @param term      the published term of a ball or the exact one of a free ball
 * @example
 * hurayImpedance([{ radius: 0.5e-6, perArea: 2.5e11 }], 0.238e-6).re; // K
 */
export function hurayImpedance(
  balls: readonly Balls[],
  delta: number,
  flatShare = 1,
  term: 'published' | 'exact' = 'published',
): Complex {
  const sphere = term === 'published' ? publishedSphereTerm : exactSphereTerm;
  return balls.reduce(
    (sum, { radius, perArea }) => {
      if (!(perArea >= 0)) throw new RangeError(`balls per area must be 0 or more, got ${perArea}`);
      return add(sum, scale(sphere(radius, delta), 6 * Math.PI * radius * radius * perArea));
    },
    complex(flatShare, flatShare),
  );
}

/** Loss factor of balls over a flat base, Huray in real form: A0 + Σ 1.5 · 4πa² n/(1 + δ/a + δ²/(2a²)). */
export const hurayLossFactor = (balls: readonly Balls[], delta: number, flatShare = 1): number =>
  balls.reduce((sum, { radius, perArea }) => {
    const inverse = delta / radius;
    return sum + (6 * Math.PI * radius * radius * perArea) / (1 + inverse + 0.5 * inverse * inverse);
  }, flatShare);
