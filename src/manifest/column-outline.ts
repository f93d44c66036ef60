import type { ColumnLayout, Link } from './model.js';

/** A rectangle of metal on the board, m. */
export interface Rectangle {
  readonly x: readonly [low: number, high: number];
  readonly y: readonly [low: number, high: number];
}

type Along = Pick<ColumnLayout, 'patches' | 'links'>;

/** From the near edge of the first patch to the far edge of the last, m. */
export function columnLength({ patches, links }: Along): number {
  return [...patches, ...links].reduce((sum, { length }) => sum + length, 0);
}

/**
 * The column with other patches and links in the same place: the end at small x stays where it is, also for a column that
 * runs towards −x, whose `x` is the other end.
 */
export function withPieces(column: ColumnLayout, pieces: Along): ColumnLayout {
  const moved = column.direction === -1 ? columnLength(pieces) - columnLength(column) : 0;
  return { ...column, x: column.x + moved, patches: pieces.patches, links: pieces.links };
}

/** A terminated line goes on to the edge of any board. */
const TO_THE_EDGE = 1;

/** Patches, links, sections before and behind them, and the feed line of a column that is fed at its end. */
export function columnOutline(column: ColumnLayout): readonly Rectangle[] {
  const { x, y, direction = 1, patches, links, matching = [], termination, feedLine, sideFeed } = column;
  const pieces: Rectangle[] = [];
  /** @param from  along the column's own direction, from the near edge of its first patch */
  const add = ({ width, length }: Link, from: number): number => {
    const [a, b] = [x + direction * from, x + direction * (from + length)];
    pieces.push({ x: [Math.min(a, b), Math.max(a, b)], y: [y - width / 2, y + width / 2] });
    return from + length;
  };
  let at = 0;
  patches.forEach((patch, i) => {
    at = add(patch, at);
    const link = links[i];
    if (link) at = add(link, at);
  });
  if (termination) add({ width: termination.width, length: TO_THE_EDGE }, at);
  let before = 0;
  for (const section of [...matching].reverse()) {
    before -= section.length;
    add(section, before);
  }
  if (sideFeed === undefined) add(feedLine, before - feedLine.length);
  return pieces;
}

/** The feed line of a column that is fed from its side, from the link outwards; undefined for any other column. */
export function sideLine({
  x,
  y,
  direction = 1,
  patches,
  links,
  feedLine,
  sideFeed,
}: ColumnLayout): Rectangle | undefined {
  const link = sideFeed && links[sideFeed.link];
  if (sideFeed === undefined || link === undefined) return undefined;
  const before = columnLength({ patches: patches.slice(0, sideFeed.link + 1), links: links.slice(0, sideFeed.link) });
  const middle = x + direction * (before + link.length / 2);
  const near = y + (sideFeed.side * link.width) / 2;
  const far = near + sideFeed.side * feedLine.length;
  return {
    x: [middle - feedLine.width / 2, middle + feedLine.width / 2],
    y: [Math.min(near, far), Math.max(near, far)],
  };
}

const overlap = ([a, b]: Rectangle['x'], [c, d]: Rectangle['x']): boolean => a <= d && c <= b;

/** Metal that touches is one piece. */
export const touches = (a: Rectangle, b: Rectangle): boolean => overlap(a.x, b.x) && overlap(a.y, b.y);
