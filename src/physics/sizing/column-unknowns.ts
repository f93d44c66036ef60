/** The numbers that sizing turns, and the column that they stand for. */
import { SPEED_OF_LIGHT } from '../constants.js';
import type { ColumnGeometry } from '../column/index.js';
import type { SizingRequest } from './request.js';
import { type ColumnGuess, halfWave, resonantLength } from './starting-layout.js';

export interface ColumnUnknowns {
  readonly start: Float64Array;
  readonly step: Float64Array;
  readonly low: Float64Array;
  readonly high: Float64Array;
  geometry(x: Float64Array): ColumnGeometry;
  /** Unknowns of a column that was sized before. */
  of(geometry: ColumnGeometry): Float64Array;
}

/**
 * Unknowns: logarithm of each patch width (one for a pair of mirror patches where the taper is symmetric), length of each
 * link in half waves, and one factor on the resonant length of all patches.
 */
export function columnUnknowns(
  request: SizingRequest,
  amplitudes: readonly number[],
  guess: ColumnGuess,
): ColumnUnknowns {
  const { feedLineWidth, linkWidth = feedLineWidth } = request;
  const patches = amplitudes.length;
  const symmetric = false;
  const groups = symmetric ? Math.ceil(patches / 2) : patches;
  const groupOf = (patch: number): number => (symmetric ? Math.min(patch, patches - 1 - patch) : patch);
  const half = halfWave(request, linkWidth);
  const [least, greatest] = widthLimits(request);
  const width = (x: Float64Array, patch: number): number => clamp(Math.exp(x[groupOf(patch)]), least, greatest);
  const links = patches - 1;
  const scaleAt = groups + links;

  function geometry(x: Float64Array): ColumnGeometry {
    return {
      x: 0,
      y: 0,
      feedLineWidth,
      patches: Array.from({ length: patches }, (_, p) => {
        const w = width(x, p);
        return { width: w, length: x[scaleAt] * resonantLength(request, w) };
      }),
      links: Array.from({ length: links }, (_, l) => ({
        width: linkWidth,
        length: Math.max(request.leastGap, x[groups + l] * half),
      })),
    };
  }
  function of({ patches: found, links: between }: ColumnGeometry): Float64Array {
    const x = new Float64Array(scaleAt + 1);
    for (let g = 0; g < groups; g++) x[g] = Math.log(found[g].width);
    for (let l = 0; l < links; l++) x[groups + l] = between[l].length / half;
    x[scaleAt] = found.reduce((sum, p) => sum + p.length / resonantLength(request, p.width), 0) / patches;
    return x;
  }

  const start = new Float64Array(scaleAt + 1);
  for (let g = 0; g < groups; g++) start[g] = Math.log(clamp(guess.unitWidth * amplitudes[g], least, greatest));
  for (let l = 0; l < links; l++) start[groups + l] = guess.link((l + 0.5) / links);
  start[scaleAt] = guess.lengthFactor;
  const filled = (ofWidth: number, ofLength: number): Float64Array =>
    new Float64Array(scaleAt + 1).fill(ofWidth, 0, groups).fill(ofLength, groups);
  return {
    start,
    step: filled(1e-2, 2e-3),
    low: filled(Math.log(least), 0.6),
    high: filled(Math.log(greatest), 1.3),
    geometry,
    of,
  };
}

/** A patch is wider than the line that enters it, and narrower than half a wave in air. */
export function widthLimits(request: SizingRequest): readonly [number, number] {
  const { frequency, feedLineWidth, linkWidth = feedLineWidth, leastWidth, greatestWidth } = request;
  const half = SPEED_OF_LIGHT / (2 * frequency);
  return [Math.max(leastWidth, 1.2 * feedLineWidth, 1.2 * linkWidth), Math.min(half, greatestWidth ?? half)];
}

const clamp = (value: number, low: number, high: number): number => Math.min(high, Math.max(low, value));
