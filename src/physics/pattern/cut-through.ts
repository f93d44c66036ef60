/** A cut at any azimuth, both polarisations. */
import type { FarField } from '../column/engine.js';
import { polarIntensity } from './polarisation.js';
import { cutSamples } from './sampling.js';

/** Power per solid angle over a signed angle. */
export interface PolarCut {
  /** Azimuth of the half plane of positive angles, rad. */
  readonly phi: number;
  /** θ with the sign of its side, rad, ascending from −π/2 to π/2. */
  readonly angle: Float64Array;
  /** Ludwig's third definition, W/sr. */
  readonly co: Float64Array;
  readonly cross: Float64Array;
}

/**
 * @param phi   azimuth in rad: 0 is the E plane of a column, π/2 its H plane, π/4 where cross polarisation peaks
 * @param steps samples including both ends; by default as fine as the extent of the sources asks
 * @throws RangeError on fewer than two samples or an azimuth that is no number
 */
export function cutThrough(field: FarField, phi: number, steps = cutSamples(field, phi)): PolarCut {
  if (!Number.isFinite(phi)) throw new RangeError(`cutThrough: azimuth ${phi}`);
  if (!Number.isInteger(steps) || steps < 2)
    throw new RangeError(`cutThrough: ${steps} samples, two or more are needed`);
  const at = polarIntensity(field);
  const both = new Float64Array(2);
  const [c, s] = [Math.cos(phi), Math.sin(phi)];
  const angle = new Float64Array(steps);
  const co = new Float64Array(steps);
  const cross = new Float64Array(steps);
  for (let i = 0; i < steps; i++) {
    angle[i] = -Math.PI / 2 + (Math.PI * i) / (steps - 1);
    const sine = Math.sin(angle[i]);
    at(sine * c, sine * s, both);
    co[i] = both[0];
    cross[i] = both[1];
  }
  return { phi, angle, co, cross };
}
