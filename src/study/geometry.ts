/** A board's copper as the column solvers want it, grown or shrunk by etching. */
import type { Board } from '../manifest/model.js';
import type { ColumnGeometry } from '../physics/column/index.js';

/** @param etch total growth of every outline in width and in length, m (negative: over-etched) */
export function columnGeometry(board: Board, etch: number): ColumnGeometry[] {
  return board.columns.map((column) => ({
    x: column.x - etch / 2,
    y: column.y,
    feedLineWidth: column.feedLine.width + etch,
    patches: column.patches.map((p) => ({ width: p.width + etch, length: p.length + etch })),
    links: column.links.map((l) => ({ width: l.width + etch, length: l.length - etch })),
  }));
}
