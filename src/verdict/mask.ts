import type { MaskPiece } from '../manifest/model.js';
import type { Cut } from '../study/results.js';

/** Level at an angle between samples: linear in dB; next to a null (−Infinity) the higher neighbour, which is on the safe side. */
function between(lower: number, upper: number, weight: number): number {
  if (!Number.isFinite(lower) || !Number.isFinite(upper)) return Math.max(lower, upper);
  return lower + (upper - lower) * weight;
}

/** Level of the cut at one angle; NaN outside the sampled range. */
export function levelAt(cut: Cut, angle: number): number {
  const { angle: angles, gainDbi } = cut;
  const last = angles.length - 1;
  // Limits of ±90 degrees arrive from conversions and may differ from the samples in the last digits.
  const slack = 1e-9;
  if (last < 0 || angle < angles[0] - slack || angle > angles[last] + slack) return Number.NaN;
  let upper = angles.findIndex((a) => a >= angle);
  if (upper < 0) upper = last;
  if (upper === 0) return gainDbi[0];
  const lower = upper - 1;
  return between(gainDbi[lower], gainDbi[upper], (angle - angles[lower]) / (angles[upper] - angles[lower]));
}

/**
 * Largest excess in dB of a cut over the pieces of a mask, relative to the cut's own maximum. The ends of each piece
 * are interpolated, so that a piece counts in full whatever the angle step. A shift moves the pattern by that angle;
 * what it moves beyond the sampled range takes the level of the last sample.
 *
 * @returns NaN when a piece reaches outside the sampled angles or the cut holds no finite maximum
 */
export function highestExcess(cut: Cut, mask: readonly MaskPiece[], shift = 0): number {
  const maximum = cut.gainDbi.reduce((a, b) => (Number.isNaN(a) || Number.isNaN(b) ? Number.NaN : Math.max(a, b)));
  if (!Number.isFinite(maximum)) return Number.NaN;
  const first = cut.angle[0];
  const last = cut.angle[cut.angle.length - 1];
  let excess = Number.NEGATIVE_INFINITY;
  for (const piece of mask) {
    if (Number.isNaN(levelAt(cut, piece.from)) || Number.isNaN(levelAt(cut, piece.to))) return Number.NaN;
    // The pattern moved by +shift at angle a is the pattern as computed at a − shift.
    const from = Math.max(piece.from - shift, first);
    const to = Math.min(piece.to - shift, last);
    const ends = [levelAt(cut, Math.min(from, last)), levelAt(cut, Math.max(to, first))];
    for (const level of ends) excess = Math.max(excess, level - maximum - piece.levelDb);
    cut.angle.forEach((angle, i) => {
      if (angle >= from && angle <= to) excess = Math.max(excess, cut.gainDbi[i] - maximum - piece.levelDb);
    });
  }
  return excess;
}
