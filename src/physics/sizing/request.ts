import type { ColumnGeometry, Slab } from '../column/index.js';
import type { FaceImpedances } from '../line/index.js';
import type { Taper } from '../taper/index.js';

/** A series-fed column to be worked out: beam at broadside, matched to its feed line, with the amplitudes of a taper. */
export interface SizingRequest {
  readonly frequency: number;
  /** 2 or more. */
  readonly patches: number;
  readonly taper: Taper;
  readonly slab: Slab;
  readonly stripThickness: number;
  readonly faces: FaceImpedances;
  /** Given with the board: the match is made for this line. */
  readonly feedLineWidth: number;
  /** Of the lines between patches; default: the feed line's width, or a narrower one where that is wide for the slab. */
  readonly linkWidth?: number;
  /** What the board maker can hold: narrowest metal and narrowest gap, and the grid of all dimensions, m. */
  readonly leastWidth: number;
  readonly leastGap: number;
  readonly grid: number;
  /** Widest patch, m, such as pitch less gap; half a free-space wave at most, and by default. */
  readonly greatestWidth?: number;
}

/** Links wider than this over the slab's height leave an end's narrow patch little to radiate with. */
const WIDE_LINK = 1.8;
/** Width over the slab's height of links that do not have the feed line's. */
const NARROW_LINK = 1.2;

/** With a width for the links; where it is not the feed line's, a section before the first patch makes the match. */
export function withLinks(request: SizingRequest): SizingRequest & { readonly linkWidth: number } {
  const { feedLineWidth, leastWidth, slab } = request;
  const narrow = Math.min(feedLineWidth, Math.max(leastWidth, NARROW_LINK * slab.height));
  const { linkWidth = feedLineWidth > WIDE_LINK * slab.height ? narrow : feedLineWidth } = request;
  return { ...request, linkWidth };
}

/** @throws RangeError naming the quantity and the value received */
export function requireRequest(request: SizingRequest): void {
  if (!(Number.isInteger(request.patches) && request.patches >= 2))
    throw new RangeError(`sizeColumn: a column has 2 patches or more, got ${request.patches}`);
  for (const name of ['frequency', 'feedLineWidth', 'leastWidth', 'leastGap', 'grid'] as const)
    if (!(Number.isFinite(request[name]) && request[name] > 0))
      throw new RangeError(`sizeColumn: ${name} must be positive, got ${request[name]}`);
  if (request.feedLineWidth < request.leastWidth * (1 - 1e-9))
    throw new RangeError(
      `sizeColumn: the feed line of ${request.feedLineWidth} m is narrower than the least width ${request.leastWidth}`,
    );
}

/** A column as worked out, and what the network says of it after all dimensions went to the grid. */
export interface SizedColumn {
  /** Near edge of the first patch at x = 0, centre line at y = 0. */
  readonly geometry: ColumnGeometry;
  /** At the port, referred to the feed line. */
  readonly reflection: { readonly re: number; readonly im: number };
  /** rad */
  readonly beamDirection: number;
  /** Highest sidelobe in the plane of the column, dB. */
  readonly sidelobeDb: number;
  /** Current of each patch over that asked for, scaled to a mean of 1. */
  readonly excitationError: readonly { readonly re: number; readonly im: number }[];
  /** Which limits bind, and what was not reached; empty where all is as asked for. */
  readonly notes: readonly string[];
  /** Networks solved. */
  readonly solves: number;
}
