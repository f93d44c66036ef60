/** What a column asks for, in points, padding included. */
export interface ColumnWish {
  /** Its widest unbreakable piece. */
  readonly least: number;
  /** Its longest cell in one line. */
  readonly most: number;
  /** Relative hint of the author. */
  readonly hint: number;
}

/**
 * Widths of columns that fill a room.
 *
 * Every column gets its least width; what is left goes to where text would wrap, by the hints, up to the longest cell;
 * what is left then is spread in proportion. Without room even for the least widths they shrink in proportion, and
 * words break.
 */
export function columnWidths(wishes: readonly ColumnWish[], room: number): number[] {
  const sum = (values: readonly number[]) => values.reduce((total, value) => total + value, 0);
  const widths = wishes.map((wish) => wish.least);
  const least = sum(widths);
  if (least >= room) {
    // Narrow columns keep their width, since a broken figure is worse than a broken sentence.
    const cap = narrowest(widths, room);
    return widths.map((width) => Math.min(width, cap));
  }
  let rest = room - least;
  for (let round = 0; round < wishes.length + 1 && rest > 0.01; round += 1) {
    const weights = wishes.map((wish, i) =>
      widths[i] < wish.most - 0.01 ? (wish.most - widths[i]) ** 0.5 * wish.hint : 0,
    );
    const total = sum(weights);
    if (total === 0) break;
    const share = rest;
    for (const [i, wish] of wishes.entries()) {
      const grant = Math.min(wish.most - widths[i], (share * weights[i]) / total);
      if (grant > 0) {
        widths[i] += grant;
        rest -= grant;
      }
    }
  }
  const filled = sum(widths);
  return filled >= room - 0.01 ? widths : widths.map((width) => (width * room) / filled);
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
