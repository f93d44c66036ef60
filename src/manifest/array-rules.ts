import { formatQuantity } from '../quantity/index.js';
import { columnFormRules } from './column-form-rules.js';
import { columnOutline, sideLine, touches } from './column-outline.js';
import type { BoardDocument } from './documents/board-document.js';
import { etchRules } from './etch-rules.js';
import { si } from './figures.js';
import { groupRules } from './group-rules.js';
import type { ColumnLayout } from './model.js';
import { patchCount, piecesRules } from './pieces.js';
import { drawnColumns } from './resolve-array.js';
import { perColumn, type RuleReport } from './rules.js';
import { sizingRules } from './sizing-rules.js';

/** What ties the parts of an array together, and what could not be made. */
export function arrayRules(report: RuleReport, board: BoardDocument): void {
  const { array } = board;
  perColumn(report, ['array', 'offset_x'], array.offset_x, array.columns);
  if (array.offset_x && array.stagger !== undefined) {
    report.clash(['array'], ['offset_x', 'stagger'], 'the offset of every column, or one for every second');
  }
  groupRules(report, board);
  if (array.sized_for) sizingRules(report, board);
  if (!drawnRules(report, board) || array.patches === undefined) return;
  if (array.offset_x && array.offset_x.length !== array.columns) return;
  const columns = drawnColumns(array);
  columnFormRules(report, array, columns[0]!);
  etchRules(report, board, columns[0]!);
  apartRules(report, board, columns);
}

/** Whether patches and links are given in full. */
function drawnRules(report: RuleReport, { array }: BoardDocument): boolean {
  const { patches: drawn, links, sized_for: sizedFor } = array;
  if (sizedFor) return false;
  if (drawn === undefined) {
    report.at(['array', 'patches'], 'neither patches nor sized_for', 'exactly one of patches, sized_for is needed');
    return false;
  }
  const patches = patchCount(drawn);
  const whole = piecesRules(report, ['array', 'patches'], drawn, patches, 'one per patch');
  if (links !== undefined) {
    const fit = piecesRules(report, ['array', 'links'], links, patches - 1, `one fewer than the ${patches} patches`);
    return whole && fit;
  }
  if (patches > 1)
    report.at(['array', 'links'], 'no links', `${patches} patches have ${patches - 1} links between them`);
  return whole && patches === 1;
}

/** No metal of a column touches another's. */
function apartRules(report: RuleReport, { array }: BoardDocument, columns: readonly ColumnLayout[]): void {
  const outlines = columns.map(columnOutline);
  const metOutline = (rectangle: (typeof outlines)[number][number], except: number): number =>
    outlines.findIndex((other, j) => j !== except && other.some((piece) => touches(rectangle, piece)));
  if (outlines.some((outline, i) => outline.some((piece) => metOutline(piece, i) >= 0))) {
    const widest = Math.max(...columns[0]!.patches.map((p) => p.width));
    const allowed = `columns of patches ${formatQuantity(widest, 'length')} wide overlap at this pitch`;
    return void report.at(['array', 'pitch'], report.written(['array', 'pitch']), allowed);
  }
  for (const [i, column] of columns.entries()) {
    const line = sideLine(column);
    const met = line ? metOutline(line, i) : -1;
    if (met < 0) continue;
    const long = formatQuantity(si(array.feed_line.length, 'length'), 'length');
    const found = `a feed line of column ${i + 1}, ${long} long, that meets column ${met + 1}`;
    return void report.at(
      ['array', 'side_feed'],
      found,
      'feed lines from the side reach no other column',
      columns.length === 2 ? 'Write side: outward.' : undefined,
    );
  }
}
