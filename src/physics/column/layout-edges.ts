/** Radiating edges of a layout: the pulses of their magnetic current (correction 2 of the edge network). */
import type { RadiatingEdge } from './engine.js';
import type { LayoutCircuit } from './layout-circuit.js';
import type { NetworkConstants } from './network-constants.js';

/**
 * @param height         slab, m
 * @param effectiveWidth effective width of a microstrip of the given width on this slab, m
 */
export function layoutEdges(
  circuit: LayoutCircuit,
  height: number,
  constants: NetworkConstants,
  effectiveWidth: (width: number) => number,
): RadiatingEdge[] {
  const fringe = height / 2;
  return circuit.edges.map(({ patch, x, y, sign, width, covered }): RadiatingEdge => {
    const wide = width + fringe;
    const pulses = [{ width: wide, density: (constants.edgeMoment * effectiveWidth(width)) / wide }];
    if (covered > 0) {
      const narrow = covered + fringe;
      pulses.push({ width: narrow, density: (-constants.coveredMoment * effectiveWidth(covered)) / narrow });
    }
    const { column, patch: number } = circuit.patches[patch];
    return { column, patch: number, x, y, sign, pulses };
  });
}
