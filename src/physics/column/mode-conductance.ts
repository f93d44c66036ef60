/**
 * What the edge network's conductances are scaled to: the cavity mode of each patch without lines, by its macro current.
 *
 * The mode's current is that of a patch longer by both open ends, cut at the metal: its moment is (Le/L) sin(πL/2Le) times
 * that of cos(πx/L), Le = L + 2Δl. Against the resistance of gap-driven patches in independent full-wave solutions this is
 * 5 to 11 % high on 0.1 to 0.2 mm; the uniform magnetic edges are 6 % low to 13 % high there, so that they give the
 * interplay of the edges, and the mode gives the level.
 */
import type { EdgeAdmittance } from './edge-admittance.js';
import type { MacroPatch } from './engine.js';
import type { LineTable } from './line-table.js';
import type { NetworkConstants } from './network-constants.js';

/** The patches without their lines, one of each size, and which of them every patch is. */
export function bareSizes(patches: readonly MacroPatch[]): { sizes: MacroPatch[]; which: Int32Array } {
  const sizes: MacroPatch[] = [];
  const which = Int32Array.from(patches, ({ length, width }, p) => {
    const found = sizes.findIndex((other) => other.length === length && other.width === width);
    // Apart along x as they are on the board: only their own resistance is asked for.
    return found >= 0 ? found : sizes.push({ ...patches[p], lines: [] }) - 1;
  });
  return { sizes, which };
}

/**
 * Factor on the conductances of a patch's edges.
 *
 * @param bare       admittances of its edges without lines, at `index`
 * @param resistance of its macro current without lines, ohm
 */
export function conductanceFactor(
  patch: MacroPatch,
  bare: EdgeAdmittance,
  index: number,
  resistance: number,
  lines: LineTable,
  constants: NetworkConstants,
): number {
  const longer = patch.length + 2 * constants.openEnd * lines.openEnd(patch.width);
  const moment = (longer / patch.length) * Math.sin((Math.PI * patch.length) / (2 * longer));
  // V at the edges over the current in the middle.
  const voltage = lines.line(patch.width).impedance * Math.sin((lines.phaseConstant(patch.width) * patch.length) / 2);
  const mode = (constants.modeConductance * resistance * moment * moment) / (voltage * voltage);
  const edges = bare.re[3 * index] + bare.re[3 * index + 2] - 2 * bare.re[3 * index + 1];
  return mode / edges;
}

/**
 * Admittances with the conductances of each patch times its factor. The susceptance between its edges stays: it tunes the
 * patch, and was fitted with the open ends.
 */
export function scaleConductances(edges: EdgeAdmittance, factor: (patch: number) => number): EdgeAdmittance {
  return { re: edges.re.map((g, q) => g * factor(Math.floor(q / 3))), im: edges.im };
}
