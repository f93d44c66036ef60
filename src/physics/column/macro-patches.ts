/** What of the lines' currents goes with each patch of a board. */
import { SPEED_OF_LIGHT } from '../constants.js';
import { microstripLine } from '../line/index.js';
import type { ColumnProblem, MacroPatch } from './engine.js';
import type { CircuitPatch } from './layout-circuit.js';

/**
 * A patch and a line at its edge share the voltage there, and both are half a wave long: the crests of their currents are
 * as their admittances. Feed lines and terminated lines, which no patch follows, are given half a wavelength.
 *
 * @param frequency Hz, about where the board works: shares hang on it by a few parts in a thousand
 */
export function macroPatches(patches: readonly CircuitPatch[], problem: ColumnProblem, frequency: number): MacroPatch[] {
  const { slab, stripThickness: thickness } = problem;
  const zero = { re: 0, im: 0 };
  const faces = { underside: zero, top: zero, edges: zero, ground: zero };
  const known = new Map<number, { impedance: number; halfWave: number }>();
  const line = (width: number): { impedance: number; halfWave: number } => {
    let found = known.get(width);
    if (!found) {
      const geometry = { width, height: slab.height, thickness, permittivity: slab.permittivity };
      const { impedance, effectivePermittivity } = microstripLine({ geometry, frequency, lossTangent: 0, faces });
      found = { impedance, halfWave: SPEED_OF_LIGHT / (2 * frequency * Math.sqrt(effectivePermittivity)) };
      known.set(width, found);
    }
    return found;
  };
  return patches.map((patch) => ({
    ...patch,
    lines: patch.lines.map(({ side, width, length }) => ({
      side,
      width,
      length: length > 0 ? length : line(width).halfWave,
      share: Number(process.env.SHARE ?? 1)*line(patch.width).impedance / line(width).impedance,
    })),
  }));
}
