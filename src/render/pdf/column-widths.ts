/** What a column asks for, in points, padding included. */
export interface ColumnWish {
  /** Its widest unbreakable piece. */
  readonly least: number;
  /** Each of its cells set in one line, from the head down. */
  readonly cells: readonly number[];
  /** Relative hint of the author: how much more its lines count. */
  readonly hint: number;
}

const steps = 60;
/** A row is about as high as its highest cell; a soft maximum lets every step of a width count. */
const softness = 6;

/**
 * Widths of columns that fill a room.
 *
 * Every column gets its least width. What is left is given away in small steps, each to the column that shortens the
 * table most by it, up to the longest cell; what is left then is spread in proportion. Without room even for the least
 * widths the widest shrink, and words break: a broken figure would be worse than a broken sentence.
 */
export function columnWidths(wishes: readonly ColumnWish[], room: number): number[] {
  const widths = wishes.map((wish) => wish.least);
  const rest = room - sum(widths);
  if (rest <= 0) {
    const cap = narrowest(widths, room);
    return widths.map((width) => Math.min(width, cap));
  }
  const longest = wishes.map((wish) => Math.max(wish.least, ...wish.cells));
  const wanted = longest.map((most, i) => most - widths[i]);
  if (sum(wanted) <= rest) for (const [i, most] of longest.entries()) widths[i] = most;
  else shareOut(wishes, longest, widths, rest);
  const filled = sum(widths);
  return widths.map((width) => (width * room) / filled);
}

const sum = (values: readonly number[]) => values.reduce((total, value) => total + value, 0);

/** Gives a rest away, step by step, to where it shortens the rows most. */
function shareOut(wishes: readonly ColumnWish[], longest: readonly number[], widths: number[], rest: number): void {
  const rows = Math.max(...wishes.map((wish) => wish.cells.length));
  const lines = (i: number, row: number, width: number) => Math.max(1, (wishes[i].cells[row] ?? 0) / width) ** softness;
  const totals = Array.from({ length: rows }, (_, row) => sum(wishes.map((_, i) => lines(i, row, widths[i]))));
  let left = rest;
  while (left > 1e-6) {
    let best: { readonly i: number; readonly step: number; readonly gain: number } | undefined;
    for (const [i, { hint }] of wishes.entries()) {
      const step = Math.min(rest / steps, left, longest[i] - widths[i]);
      if (step <= 1e-9) continue;
      let gain = 0;
      for (let row = 0; row < rows; row += 1) {
        const changed = totals[row] - lines(i, row, widths[i]) + lines(i, row, widths[i] + step);
        gain += totals[row] ** (1 / softness) - changed ** (1 / softness);
      }
      gain = (gain * hint) / step;
      if (best === undefined || gain > best.gain) best = { i, step, gain };
    }
    if (best === undefined) return;
    const { i, step } = best;
    for (let row = 0; row < rows; row += 1) {
      totals[row] += lines(i, row, widths[i] + step) - lines(i, row, widths[i]);
    }
    widths[i] += step;
    left -= step;
  }
}

/** The cap that makes capped widths sum to the room. */
function narrowest(widths: readonly number[], room: number): number {
  const sorted = [...widths].sort((a, b) => a - b);
  let left = room;
  for (const [i, width] of sorted.entries()) {
    const share = left / (sorted.length - i);
    if (width >= share) return share;
    left -= width;
  }
  return Number.POSITIVE_INFINITY;
}
