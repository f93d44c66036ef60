/** The numbers that sizing turns, and the column that they stand for. */
import type { ColumnGeometry } from '../column/index.js';
import type { SizingRequest } from './request.js';
import { type ColumnGuess, halfWave, resonantLength, widthFor, widthLimits } from './starting-layout.js';

export interface ColumnUnknowns {
  readonly start: Float64Array;
  readonly step: Float64Array;
  readonly low: Float64Array;
  readonly high: Float64Array;
  geometry(x: Float64Array): ColumnGeometry;
}

/**
 * Unknowns: logarithm of each patch width, length of each link in half waves, and one factor on the resonant length of all
 * patches. As many as there are figures to meet: amplitude and phase of each patch against its neighbour, and the match.
 *
 * Widths come out as mirror images for a symmetric taper, but for what loss takes along the way and for the last patch,
 * which is narrower: no line silences part of its far edge.
 */
export function columnUnknowns(
  request: SizingRequest,
  amplitudes: readonly number[],
  guess: ColumnGuess = PLAIN_GUESS,
): ColumnUnknowns {
  const { feedLineWidth, linkWidth = feedLineWidth } = request;
  const patches = amplitudes.length;
  const links = patches - 1;
  const half = halfWave(request, linkWidth);
  const [least, greatest] = widthLimits(request);

  function geometry(x: Float64Array): ColumnGeometry {
    return {
      x: 0,
      y: 0,
      feedLineWidth,
      patches: Array.from({ length: patches }, (_, p) => {
        const width = Math.exp(x[p]);
        return { width, length: x[patches + links] * resonantLength(request, width) };
      }),
      links: Array.from({ length: links }, (_, l) => ({ width: linkWidth, length: x[patches + l] * half })),
    };
  }

  const start = new Float64Array(patches + links + 1);
  for (let p = 0; p < patches; p++) start[p] = Math.log(widthFor(request, guess.unitMoment, p, amplitudes));
  for (let l = 0; l < links; l++) start[patches + l] = guess.link((l + 0.5) / links);
  start[patches + links] = guess.lengthFactor;
  const filled = (ofWidth: number, ofLength: number): Float64Array =>
    new Float64Array(start.length).fill(ofWidth, 0, patches).fill(ofLength, patches);
  return {
    start,
    step: filled(1e-2, 2e-3),
    low: filled(Math.log(least), 0.6),
    high: filled(Math.log(greatest), 1.3),
    geometry,
  };
}

/** Where no start is needed. */
const PLAIN_GUESS: ColumnGuess = { unitMoment: 1e-3, lengthFactor: 1, link: () => 1 };

/** Unknowns of a column that was sized before. */
export function unknownsOf(request: SizingRequest, { patches, links }: ColumnGeometry): Float64Array {
  const half = halfWave(request, links[0].width);
  const factor = patches.reduce((sum, p) => sum + p.length / resonantLength(request, p.width), 0) / patches.length;
  return Float64Array.from([...patches.map((p) => Math.log(p.width)), ...links.map((l) => l.length / half), factor]);
}
