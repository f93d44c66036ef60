import type { FarField } from '../physics/column/index.js';
import { ETA0, SPEED_OF_LIGHT } from '../physics/constants.js';

const FREQUENCY = 77e9;

/** Elements in phase along x that each radiate 1 W/sr per squared amplitude in every direction above: the array factor as a field. */
export function isotropicRow(amplitudes: readonly number[], spacing: number): FarField {
  const wavelength = SPEED_OF_LIGHT / FREQUENCY;
  const at = (u: number): readonly [number, number] => {
    let [re, im] = [0, 0];
    amplitudes.forEach((a, i) => {
      re += a * Math.cos(2 * Math.PI * spacing * i * u);
      im += a * Math.sin(2 * Math.PI * spacing * i * u);
    });
    return [re, im];
  };
  return {
    frequency: FREQUENCY,
    extent: { x: (amplitudes.length - 1) * spacing * wavelength, y: 0 },
    at(u, v, out) {
      out.fill(0);
      if (u * u + v * v >= 1) return;
      const [re, im] = at(u);
      const k = Math.sqrt(2 * ETA0);
      out[0] = k * re;
      out[1] = k * im;
    },
    cut: (plane) => (angle) => {
      const [re, im] = at(plane === 'elevation' ? Math.sin(angle) : 0);
      return re * re + im * im;
    },
  };
}
