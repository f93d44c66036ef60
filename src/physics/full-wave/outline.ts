/** The metal of a board as axis-aligned rectangles with their true edges, and the ports that drive it. */
import type { ColumnGeometry } from '../column/engine.js';

export interface MetalRectangle {
  readonly x0: number;
  readonly x1: number;
  readonly y0: number;
  readonly y1: number;
  /** `feed`: beyond the reference plane, not part of the board whose power is balanced. */
  readonly kind: 'patch' | 'line' | 'feed';
  /** Width across the current, m: that of the patch, of a wing beside the slots of an inset feed, or of the line. */
  readonly width: number;
  readonly column: number;
  /** Index of the patch, or −1. */
  readonly patch: number;
}

/** A feed line with a gap in it that drives it; waves are told apart between gap and reference plane. */
export interface PortLine {
  readonly column: number;
  /** Along which axis the line runs, and the sign of the direction into the board. */
  readonly axis: 'x' | 'y';
  readonly into: 1 | -1;
  readonly width: number;
  /** Coordinate of the line's centre across. */
  readonly across: number;
  /** Along the axis: reference plane, and the gap. */
  readonly plane: number;
  readonly gap: number;
  /** What it ends: driven from outside, or a termination that sends nothing back. */
  readonly terminated: boolean;
}

export interface Outline {
  readonly rectangles: readonly MetalRectangle[];
  readonly ports: readonly PortLine[];
}

/** Lengths of the parts of a feed line, m. */
export interface FeedLengths {
  /** From the reference plane to the gap. */
  readonly run: number;
  /** Open stub behind the gap. */
  readonly stub: number;
}

/** @throws RangeError on a column that has no patches, another number of links than one fewer, or a feed with no place */
export function outlineOf(columns: readonly ColumnGeometry[], feed: FeedLengths): Outline {
  const rectangles: MetalRectangle[] = [];
  const ports: PortLine[] = [];
  columns.forEach((column, c) => {
    const drawn = columnOutline(column, c, feed);
    rectangles.push(...drawn.rectangles);
    ports.push(...drawn.ports);
  });
  // Driven ports first, in the order of the columns.
  ports.sort((a, b) => Number(a.terminated) - Number(b.terminated));
  return { rectangles, ports };
}

function columnOutline(geometry: ColumnGeometry, column: number, feed: FeedLengths): Outline {
  const { patches, links, matching = [], inset, termination, sideFeed } = geometry;
  if (patches.length === 0 || links.length !== patches.length - 1)
    throw new RangeError('fullWave: a column needs at least one patch, and one link fewer than patches');
  if (sideFeed && !links[sideFeed.link])
    throw new RangeError(`fullWave: side feed at link ${sideFeed.link} of a column with ${links.length} links`);
  if (sideFeed && (inset || matching.length > 0))
    throw new RangeError('fullWave: a column fed from the side has neither inset nor matching sections');
  const direction = geometry.direction ?? 1;
  const rectangles: MetalRectangle[] = [];
  const ports: PortLine[] = [];
  // Distances s along the column from the first patch's near edge; mirrored into x at the end.
  const at = (s: number): number => geometry.x + direction * s;
  const put = (
    s0: number,
    s1: number,
    y0: number,
    y1: number,
    rest: Pick<MetalRectangle, 'kind' | 'width' | 'patch'>,
  ) =>
    rectangles.push({
      x0: Math.min(at(s0), at(s1)),
      x1: Math.max(at(s0), at(s1)),
      y0: geometry.y + y0,
      y1: geometry.y + y1,
      column,
      ...rest,
    });
  const line = (s0: number, s1: number, width: number, kind: 'line' | 'feed'): void => {
    put(s0, s1, -width / 2, width / 2, { kind, width, patch: -1 });
  };
  let s = 0;
  patches.forEach((patch, p) => {
    const half = patch.width / 2;
    const rest = { kind: 'patch', width: patch.width, patch: p } as const;
    if (p === 0 && inset) {
      const entry = matching[matching.length - 1]?.width ?? geometry.feedLineWidth;
      const inner = entry / 2 + inset.gap;
      if (!(inset.depth > 0 && inset.depth < patch.length && inset.gap > 0 && inner < half))
        throw new RangeError('fullWave: the slots of an inset feed must lie within the first patch');
      const wing = { ...rest, width: half - inner };
      put(inset.depth, patch.length, -half, half, rest);
      put(0, inset.depth, -half, -inner, wing);
      put(0, inset.depth, inner, half, wing);
      line(0, inset.depth, entry, 'line');
    } else put(s, s + patch.length, -half, half, rest);
    s += patch.length;
    const link = links[p];
    if (!link) return;
    line(s, s + link.length, link.width, 'line');
    if (sideFeed?.link === p) {
      const side = sideFeed.side;
      const plane = geometry.y + (side * link.width) / 2;
      const centre = at(s + link.length / 2);
      const far = plane + side * (feed.run + feed.stub);
      rectangles.push({
        x0: centre - geometry.feedLineWidth / 2,
        x1: centre + geometry.feedLineWidth / 2,
        y0: Math.min(plane, far),
        y1: Math.max(plane, far),
        kind: 'feed',
        width: geometry.feedLineWidth,
        column,
        patch: -1,
      });
      ports.push({
        column,
        axis: 'y',
        into: side === 1 ? -1 : 1,
        width: geometry.feedLineWidth,
        across: centre,
        plane,
        gap: plane + side * feed.run,
        terminated: false,
      });
    }
    s += link.length;
  });
  if (termination) {
    line(s, s + feed.run + feed.stub, termination.width, 'feed');
    ports.push({
      column,
      axis: 'x',
      into: direction === 1 ? -1 : 1,
      width: termination.width,
      across: geometry.y,
      plane: at(s),
      gap: at(s + feed.run),
      terminated: true,
    });
  }
  if (!sideFeed) {
    let before = 0;
    for (const section of [...matching].reverse()) {
      line(before - section.length, before, section.width, 'line');
      before -= section.length;
    }
    line(before - feed.run - feed.stub, before, geometry.feedLineWidth, 'feed');
    ports.push({
      column,
      axis: 'x',
      into: direction,
      width: geometry.feedLineWidth,
      across: geometry.y,
      plane: at(before),
      gap: at(before - feed.run),
      terminated: false,
    });
  }
  return { rectangles, ports };
}
