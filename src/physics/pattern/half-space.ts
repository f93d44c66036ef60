/** The whole half space on a grid, for charts, and its strongest direction. */
import type { FarField } from '../column/engine.js';
import { polarIntensity } from './polarisation.js';
import { intensity } from './radiated-power.js';
import { electricalExtent } from './sampling.js';

/** Both polarisations over direction cosines; index row · size + column, row along v, column along u; NaN beyond the horizon. */
export interface DirectionGrid {
  readonly size: number;
  /** −1 to 1, shared by u and v. */
  readonly cosine: Float64Array;
  /** W/sr */
  readonly co: Float64Array;
  readonly cross: Float64Array;
}

/**
 * @param size points along u and along v; an odd number puts one on the zenith
 * @throws RangeError on fewer than three points
 */
export function directionGrid(field: FarField, size: number): DirectionGrid {
  if (!Number.isInteger(size) || size < 3)
    throw new RangeError(`directionGrid: ${size} points, three or more are needed`);
  const at = polarIntensity(field);
  const both = new Float64Array(2);
  const cosine = Float64Array.from({ length: size }, (_, i) => -1 + (2 * i) / (size - 1));
  const co = new Float64Array(size * size).fill(Number.NaN);
  const cross = new Float64Array(size * size).fill(Number.NaN);
  for (let row = 0; row < size; row++)
    for (let column = 0; column < size; column++) {
      if (cosine[column] ** 2 + cosine[row] ** 2 >= 1) continue;
      at(cosine[column], cosine[row], both);
      co[row * size + column] = both[0];
      cross[row * size + column] = both[1];
    }
  return { size, cosine, co, cross };
}

export interface StrongestDirection {
  readonly u: number;
  readonly v: number;
  /** From the zenith, rad. */
  readonly theta: number;
  /** From +x towards +y, rad, in (−π, π]; 0 at the zenith. */
  readonly phi: number;
  /** Both polarisations, W/sr. */
  readonly intensity: number;
}

/**
 * Direction of the highest power per solid angle anywhere above the board: a grid of four points to the narrowest lobe,
 * then a shrinking pattern search to 1e-6 in u and v.
 *
 * For patterns whose maximum may lie off both principal cuts; a board near broadside has it cheaper from its cuts.
 */
export function strongestDirection(field: FarField): StrongestDirection {
  const power = intensity(field);
  const { x, y } = electricalExtent(field);
  // A lobe is 2π/extent wide in u or v.
  const [nu, nv] = [x, y].map((extent) => 2 * Math.ceil(2 + (2 * extent) / Math.PI / 2) + 1);
  let [u, v, best] = [0, 0, 0];
  for (let i = 0; i < nu; i++)
    for (let j = 0; j < nv; j++) {
      const [a, b] = [-1 + (2 * i + 1) / nu, -1 + (2 * j + 1) / nv];
      const value = power(a, b);
      if (value > best) [best, u, v] = [value, a, b];
    }
  [best, u, v] = climb(power, u, v, Math.min(1 / nu, 1 / nv), 1e-6);
  const theta = Math.asin(Math.min(1, Math.hypot(u, v)));
  return { u, v, theta, phi: theta < 1e-6 ? 0 : Math.atan2(v, u), intensity: best };
}

/**
 * Pattern search for a maximum from (u, v): steps along both axes, halved whenever none gains (Hooke and Jeeves 1961,
 * exploratory moves alone).
 *
 * @returns [value, u, v]
 */
export function climb(
  f: (u: number, v: number) => number,
  u: number,
  v: number,
  firstStep: number,
  lastStep: number,
): [number, number, number] {
  let best = f(u, v);
  for (let step = firstStep; step > lastStep; ) {
    let moved = false;
    for (let side = 0; side < 4; side++) {
      const a = u + (side === 0 ? step : side === 1 ? -step : 0);
      const b = v + (side === 2 ? step : side === 3 ? -step : 0);
      const value = f(a, b);
      if (value > best) {
        [best, u, v] = [value, a, b];
        moved = true;
      }
    }
    if (!moved) step /= 2;
  }
  return [best, u, v];
}
