import type { Complex } from '../../numerics/complex.js';
import { hurayImpedance } from './huray.js';

/** Ball radius over Rz. */
export const CANNONBALL_RADIUS_OVER_RZ = 0.06;
const BALLS = 14;

/**
 * Surface impedance by cannonball stacking, K + jX in units of the smooth surface resistance: the formula of Huray with
 * 14 equal balls of radius 0.06 Rz (a pyramid of 9, 4 and 1) on a tile of 36 radii squared, A0 = 1. Its ceiling is 8.33.
 *
 * Source: L. Simonovich, "Practical method for modeling conductor roughness using cubic close-packing of equal spheres",
 * 2015–2019 (from memory); causal form as for `hurayImpedance`. It is a calibration rather than a geometry: the pile itself,
 * solved, loses a half to a third as much (1.84 against 3.93 at a radius of one skin depth). The plane is not stated; it is
 * taken as the mean plane, without electrostatic shift.
 *
 * @param rz    maximum height of the profile, m, > 0
 * @param delta skin depth, m, > 0
 */
export function cannonball(rz: number, delta: number): Complex {
  const radius = CANNONBALL_RADIUS_OVER_RZ * rz;
  return hurayImpedance([{ radius, perArea: BALLS / (36 * radius * radius) }], delta);
}
