/**
 * Co- and cross-polar field after Ludwig's third definition, the one that a far-field range with the roll axis at
 * boresight measures: co along x, the polarisation of a column.
 *
 * A. C. Ludwig, IEEE Trans. Antennas Propag. 21(1), 1973, definition 3 (from memory):
 *   E_co = Eθ cos φ − Eφ sin φ,  E_cross = Eθ sin φ + Eφ cos φ.
 */
import type { FarField } from '../column/engine.js';
import { ETA0 } from '../constants.js';

/** r e^{jk0r} E at direction cosines u, v as [Re co, Im co, Re cross, Im cross], V peak; zero beyond the horizon. */
export type PolarField = (u: number, v: number, out: Float64Array) => void;

export function polarised(field: FarField): PolarField {
  const e = new Float64Array(4);
  return (u, v, out) => {
    field.at(u, v, e);
    // At the zenith φ is 0 by agreement, here as in the field itself.
    const sine = Math.hypot(u, v);
    const [c, s] = sine === 0 ? [1, 0] : [u / sine, v / sine];
    out[0] = c * e[0] - s * e[2];
    out[1] = c * e[1] - s * e[3];
    out[2] = s * e[0] + c * e[2];
    out[3] = s * e[1] + c * e[3];
  };
}

/** Power per solid angle of either polarisation, W/sr: out = [co, cross]. */
export function polarIntensity(field: FarField): (u: number, v: number, out: Float64Array) => void {
  const at = polarised(field);
  const e = new Float64Array(4);
  return (u, v, out) => {
    at(u, v, e);
    out[0] = (e[0] * e[0] + e[1] * e[1]) / (2 * ETA0);
    out[1] = (e[2] * e[2] + e[3] * e[3]) / (2 * ETA0);
  };
}
