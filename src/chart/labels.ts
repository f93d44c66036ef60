import { textWidth } from './font.js';

/** Placing labels so that none lies on another. All lengths in pixels. */

/** Cuts a text to a width, ending it with an ellipsis. */
export function shorten(text: string, size: number, limit: number): string {
  if (textWidth(text, size) <= limit) return text;
  const signs = Array.from(text);
  while (signs.length > 1 && textWidth(`${signs.join('')}…`, size) > limit) signs.pop();
  return `${signs.join('').trimEnd()}…`;
}

/**
 * Heights as near as possible to the wanted ones, at least `gap` apart and in the same order, inside [low, high]
 * while there is room. Neighbours that want the same place share it around their mean.
 */
export function spread(wanted: readonly number[], gap: number, low: number, high: number): number[] {
  const order = wanted.map((_, index) => index).sort((a, b) => wanted[a] - wanted[b] || a - b);
  // Clusters of touching labels: centre of the first label and number of labels, merged until none overlap.
  const clusters: { first: number; sum: number; members: number[] }[] = [];
  const settle = (cluster: { first: number; sum: number; members: number[] }) => {
    const count = cluster.members.length;
    const ideal = cluster.sum / count - ((count - 1) * gap) / 2;
    cluster.first = Math.max(low, Math.min(ideal, high - (count - 1) * gap));
  };
  for (const index of order) {
    let cluster = { first: 0, sum: wanted[index], members: [index] };
    settle(cluster);
    for (;;) {
      const before = clusters.at(-1);
      if (before === undefined || before.first + before.members.length * gap <= cluster.first + 1e-9) break;
      clusters.pop();
      cluster = { first: 0, sum: before.sum + cluster.sum, members: [...before.members, ...cluster.members] };
      settle(cluster);
    }
    clusters.push(cluster);
  }
  const placed = new Array<number>(wanted.length);
  for (const cluster of clusters) {
    cluster.members.forEach((index, n) => {
      placed[index] = cluster.first + n * gap;
    });
  }
  return placed;
}

export interface FlagLabel {
  readonly text: string;
  readonly at: number;
  /** 0 is the row next to the plot. */
  readonly row: number;
  /** Text starts right of its line, or ends left of it where the right edge is near. */
  readonly align: 'left' | 'right';
}

/**
 * Rows of labels over vertical marks, each beside the line that it names. A line that rises to a higher row counts as
 * taken in the rows that it passes.
 */
export function stackFlags(
  flags: readonly { readonly text: string; readonly at: number }[],
  size: number,
  rightEdge: number,
): FlagLabel[] {
  const taken: [number, number][][] = [];
  const free = (row: number, from: number, to: number) => (taken[row] ?? []).every(([a, b]) => to < a || from > b);
  const take = (row: number, from: number, to: number) => {
    taken[row] = [...(taken[row] ?? []), [from, to]];
  };
  // From right to left, so that texts grow away from the lines still to come.
  const order = flags.map((_, index) => index).sort((a, b) => flags[b].at - flags[a].at || a - b);
  const result = new Array<FlagLabel>(flags.length);
  for (const index of order) {
    const { text, at } = flags[index];
    const width = textWidth(text, size) + 8;
    const align = at + width > rightEdge ? 'right' : 'left';
    const [from, to] = align === 'left' ? [at - 1, at + width] : [at - width, at + 1];
    let row = 0;
    while (!free(row, from, to)) row += 1;
    take(row, from, to);
    for (let below = 0; below < row; below += 1) take(below, at - 1, at + 1);
    result[index] = { text, at, row, align };
  }
  return result;
}

export interface Box {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

const overlap = (a: Box, b: Box) =>
  a.x < b.x + b.width && b.x < a.x + a.width && a.y < b.y + b.height && b.y < a.y + a.height;

/** A line as points close enough together that none passes through a label unseen. */
export function alongLine(points: readonly (readonly [number, number])[]): (readonly [number, number])[] {
  return points.flatMap((to, i) => {
    const from = points[i - 1] ?? to;
    const count = Math.max(1, Math.ceil(Math.hypot(to[0] - from[0], to[1] - from[1]) / 4));
    return Array.from({ length: count }, (_, n) => {
      const t = (n + 1) / count;
      return [from[0] + (to[0] - from[0]) * t, from[1] + (to[1] - from[1]) * t] as const;
    });
  });
}

/** The box that touches no box taken and the fewest points; the first of equals. */
export function choosePlace(
  candidates: readonly Box[],
  taken: readonly Box[],
  points: readonly (readonly [number, number])[],
): Box {
  const cost = (box: Box) =>
    taken.filter((other) => overlap(box, other)).length * 1e6 +
    points.filter(([x, y]) => x >= box.x && x <= box.x + box.width && y >= box.y && y <= box.y + box.height).length;
  let best = candidates[0];
  let bestCost = Number.POSITIVE_INFINITY;
  for (const box of candidates) {
    const value = cost(box);
    if (value < bestCost) [best, bestCost] = [box, value];
  }
  return best;
}
