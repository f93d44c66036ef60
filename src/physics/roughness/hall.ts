import { add, type Complex, complex, scale } from '../../numerics/complex.js';
import { publishedSphereTerm } from './sphere.js';

/** Radius in skin depths and pitch in radii from which the hemispheres are close to solved ones. */
export const HALL_LOWEST_RADIUS = 1.5;
export const HALL_LOWEST_PITCH = 3;

export interface HallFactor {
  /** ≥ 1: the published formula is clipped there. */
  readonly factor: number;
  /** The formula fell below 1: the base covered by the bosses was taken off and the small bosses carry next to nothing. */
  readonly clipped: boolean;
  /** K + jX before clipping, causal. */
  readonly impedance: Complex;
}

/**
 * Loss factor of hemispherical bosses on a square lattice, Hall:
 * 1 − πa²/p² + (3πa²/p²)/(1 + δ/a + δ²/(2a²)), not below 1. The electric dipole's share, below 1e-5 for bosses of
 * micrometres at 77 GHz, is left out; the reactance is completed as for the sphere term, which is causal.
 *
 * Source: S. Hall, S. G. Pytel, P. G. Huray et al., "Multigigahertz causal transmission line modeling methodology using a
 * 3-D hemispherical surface roughness approach", IEEE Trans. Microwave Theory Tech. 55(12), 2007 (from memory).
 * Radius from 1.5 skin depths, pitch from 3 radii: at that pitch 3 % low to 9 % high against solved hemispheres. Its plane is
 * not stated; taken as the mean plane, without electrostatic shift.
 *
 * @param radius m, > 0
 * @param pitch  m, ≥ 2 radii
 * @param delta  skin depth, m, > 0
 */
export function hallHemispheres(radius: number, pitch: number, delta: number): HallFactor {
  if (!(pitch >= 2 * radius)) throw new RangeError(`pitch ${pitch} m is below two radii of ${radius} m`);
  const base = (Math.PI * radius * radius) / (pitch * pitch);
  const impedance = add(complex(1 - base, 1 - base), scale(publishedSphereTerm(radius, delta), 3 * base));
  return { factor: Math.max(1, impedance.re), clipped: impedance.re < 1, impedance };
}
