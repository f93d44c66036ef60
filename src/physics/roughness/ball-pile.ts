import { type Complex, complex } from '../../numerics/complex.js';
import { monotoneCubic } from '../../numerics/monotone-cubic.js';
import { roughnessRatio } from './hammerstad.js';

/** Rq/δ of the solved piles: ball radii of 0.25, 0.5, 1, 2 and 3 skin depths, Rq of the pile being 1.19 radii. */
const RATIO = [0, 0.295, 0.595, 1.19, 2.389, 3.57];
const LOSS = [1, 1.153, 1.46, 1.79, 2.009, 2.14];
const REACTANCE = [1, 1.203, 1.03, 0.12, -1.75, -3.75];
/** Electrostatic plane above the mean plane over Rq: 1.50 to 1.53 for all of them. */
const PLANE = 1.51;

/** Rq over ball radius of the pile. */
export const BALL_PILE_RADIUS_RATIO = 1.19;
export const BALL_PILE_HIGHEST_RATIO = 3.57;

/**
 * Surface impedance of a pile of touching balls by its height alone, K + jX to the mean plane in units of the smooth surface
 * resistance, and its electrostatic plane: interpolated in solved three-dimensional surfaces, the middle of what compact
 * textures of one Rq show. Hammerstad lies 3 to 13 % below its loss, Groiss within 9 %.
 *
 * Source: independent three-dimensional eddy-current solutions made for this project, not measured; 2 to 3 % in K. Rq/δ up
 * to 3.57; beyond, K is held and X carried on as a fixed depth.
 */
export function ballPile(rq: number, delta: number): { readonly impedance: Complex; readonly planeShift: number } {
  const r = roughnessRatio(rq, delta);
  const last = RATIO.length - 1;
  // Below the first solved pile the excess loss falls with the square of the height.
  const loss = r < RATIO[1] ? 1 + (LOSS[1] - 1) * (r / RATIO[1]) ** 2 : monotoneCubic(RATIO, LOSS, r);
  const depth = (REACTANCE[last] - REACTANCE[last - 1]) / (RATIO[last] - RATIO[last - 1]);
  const beyond = Math.max(0, r - RATIO[last]);
  return {
    impedance: complex(loss, monotoneCubic(RATIO, REACTANCE, r) + depth * beyond),
    planeShift: PLANE * rq,
  };
}
