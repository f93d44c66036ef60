/** What the lines at its edges take away from each patch's macro current. */
import { microstripLine } from '../line/index.js';
import type { ColumnProblem, MacroPatch } from './engine.js';
import { effectiveWidth } from './junction.js';
import type { LayoutCircuit } from './layout-circuit.js';
import type { NetworkConstants } from './network-constants.js';

/** No more of a patch's current than this is taken away: a line as wide as its patch leaves something of the patch. */
const LARGEST_SHARE = 0.4;

/**
 * Each edge carries half of the moment; a line takes from its edge what it silences of the magnetic moment.
 *
 * @param frequency Hz, about where the board works: shares hang on it by a few parts in a thousand
 */
export function macroPatches(
  circuit: LayoutCircuit,
  problem: ColumnProblem,
  frequency: number,
  constants: NetworkConstants,
): MacroPatch[] {
  const { slab, stripThickness: thickness } = problem;
  const zero = { re: 0, im: 0 };
  const faces = { underside: zero, top: zero, edges: zero, ground: zero };
  const known = new Map<number, number>();
  const wide = (width: number): number => {
    let found = known.get(width);
    if (found === undefined) {
      const geometry = { width, height: slab.height, thickness, permittivity: slab.permittivity };
      const { impedance, effectivePermittivity } = microstripLine({ geometry, frequency, lossTangent: 0, faces });
      found = effectiveWidth(slab.height, impedance, effectivePermittivity);
      known.set(width, found);
    }
    return found;
  };
  return circuit.patches.map((patch, p) => ({
    ...patch,
    lines: [circuit.edges[2 * p], circuit.edges[2 * p + 1]]
      .filter(({ covered }) => covered > 0)
      .map(({ covered, width }) => ({
        width: covered,
        share: Math.min(
          LARGEST_SHARE,
          (constants.coveredMoment * wide(covered)) / (2 * constants.edgeMoment * wide(width)),
        ),
      })),
  }));
}
