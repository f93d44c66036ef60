/** Radiating edges of a layout: positions, orientation and the pulses of their magnetic current (correction 2). */
import type { ColumnGeometry, RadiatingEdge } from './engine.js';
import { NETWORK_CONSTANTS } from './network-constants.js';

/** Width of the line attached to each edge, in the order of the edges (near, far of each patch); 0 at the open end. */
export function attachedLineWidths(column: ColumnGeometry): number[] {
  return column.patches.flatMap((_, p) => [
    p === 0 ? column.feedLineWidth : column.links[p - 1].width,
    p === column.patches.length - 1 ? 0 : column.links[p].width,
  ]);
}

/**
 * @param height         slab, m
 * @param effectiveWidth effective width of a microstrip of the given width on this slab, m
 */
export function layoutEdges(
  columns: readonly ColumnGeometry[],
  height: number,
  effectiveWidth: (width: number) => number,
): RadiatingEdge[] {
  const fringe = height / 2;
  return columns.flatMap((column, c) => {
    const attached = attachedLineWidths(column);
    let x = column.x;
    return column.patches.flatMap((patch, p) =>
      [0, 1].map((side): RadiatingEdge => {
        if (side === 1) x += patch.length;
        else if (p > 0) x += column.links[p - 1].length;
        const wide = patch.width + fringe;
        const pulses = [{ width: wide, density: (NETWORK_CONSTANTS.edgeMoment * effectiveWidth(patch.width)) / wide }];
        const line = attached[2 * p + side];
        if (line > 0) {
          const narrow = line + fringe;
          pulses.push({ width: narrow, density: (-NETWORK_CONSTANTS.coveredMoment * effectiveWidth(line)) / narrow });
        }
        return { column: c, patch: p, x, y: column.y, sign: side === 0 ? -1 : 1, pulses };
      }),
    );
  });
}
