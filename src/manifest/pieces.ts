import type { ArrayDocument } from './documents/array-document.js';
import { si } from './figures.js';
import type { Path } from './problem.js';
import { exactlyOneOf, type RuleReport } from './rules.js';

/** Patches or links of a column as written: each one, or a short form. */
type Patches = NonNullable<ArrayDocument['patches']>;
type Pieces = Patches | NonNullable<ArrayDocument['links']>;
type Row = Exclude<Pieces, readonly unknown[]>;
export interface Piece {
  readonly width: number;
  readonly length: number;
}

export function patchCount(patches: Patches): number {
  return Array.isArray(patches) ? patches.length : (patches as { count: number }).count;
}

/** Values of a short form in order from the feed: one for all, a list, or half a list mirrored. */
function values(row: Row, one: 'width' | 'length', many: 'widths' | 'lengths', count: number): number[] {
  const list = row[many];
  if (list === undefined) return new Array(count).fill(si(row[one]!, 'length'));
  const half = list.map((item) => si(item, 'length'));
  if (row.mirrored !== true) return half;
  return Array.from({ length: count }, (_, i) => half[Math.min(i, count - 1 - i)]!);
}

/** Checked pieces, each with its width and length in m. */
export function expandPieces(pieces: Pieces, count: number): readonly Piece[] {
  if (Array.isArray(pieces)) {
    return pieces.map((p) => ({ width: si(p.width, 'length'), length: si(p.length, 'length') }));
  }
  const widths = values(pieces as Row, 'width', 'widths', count);
  const lengths = values(pieces as Row, 'length', 'lengths', count);
  return widths.map((width, i) => ({ width, length: lengths[i]! }));
}

/** Whether a list or short form gives exactly `count` pieces. */
export function piecesRules(report: RuleReport, path: Path, pieces: Pieces, count: number, why: string): boolean {
  if (Array.isArray(pieces)) {
    if (pieces.length === count) return true;
    report.at(path, `${pieces.length} entries`, `${count} here: ${why}`);
    return false;
  }
  const row = pieces as Row;
  const one = exactlyOneOf(report, path, row, ['width', 'widths']);
  const two = exactlyOneOf(report, path, row, ['length', 'lengths']);
  let fits = one && two;
  const wanted = row.mirrored === true ? Math.ceil(count / 2) : count;
  for (const key of ['widths', 'lengths'] as const) {
    const given = row[key]?.length;
    if (given === undefined || given === wanted) continue;
    fits = false;
    const half = row.mirrored === true ? `the half next to the feed, with the middle, of ${count}` : why;
    const fix = row.mirrored !== true && given === Math.ceil(count / 2) ? 'Did you forget mirrored: true?' : undefined;
    report.at([...path, key], `${given} entries`, `${wanted} here: ${half}`, fix);
  }
  return fits;
}
