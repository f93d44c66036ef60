/** A board's copper as the column solvers want it, grown or shrunk by etching. */
import type { Board } from '../manifest/model.js';
import type { ColumnGeometry } from '../physics/column/index.js';

/**
 * Copper grows into slots and gaps; the near edge of the first patch moves against the direction of the column.
 *
 * @param etch total growth of every outline in width and in length, m (negative: over-etched)
 */
export function columnGeometry(board: Board, etch: number): ColumnGeometry[] {
  const wider = <P extends { readonly width: number }>(piece: P): P => ({ ...piece, width: piece.width + etch });
  return board.columns.map(({ x, y, feedLine, patches, links, direction = 1, ...extra }) => ({
    x: x - (direction * etch) / 2,
    y,
    feedLineWidth: feedLine.width + etch,
    patches: patches.map((p) => ({ width: p.width + etch, length: p.length + etch })),
    links: links.map((l) => ({ width: l.width + etch, length: l.length - etch })),
    ...(direction === -1 ? { direction } : {}),
    ...(extra.matching ? { matching: extra.matching.map(wider) } : {}),
    ...(extra.inset ? { inset: { depth: extra.inset.depth, gap: extra.inset.gap - etch } } : {}),
    ...(extra.termination ? { termination: wider(extra.termination) } : {}),
    ...(extra.sideFeed ? { sideFeed: extra.sideFeed } : {}),
  }));
}
