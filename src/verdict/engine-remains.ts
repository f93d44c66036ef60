/**
 * What stays uncertain of a figure of the network once it is corrected by the full wave: the difference of the engines is known
 * at a few frequencies in the nominal state and is wanted between them and in other states.
 */
import type { Board, Requirement } from '../manifest/model.js';
import { abs2 } from '../numerics/complex.js';
import type { Correction, EngineDifference } from '../study/index.js';
import { unexplainedShare } from '../study/index.js';
import { both, ratioSpread, realizedGainSpread, reflectionSpread, type Spread } from './accuracy-spread.js';
import { columnPairs } from './column-pairs.js';
import type { WorstValue } from './worst.js';

/**
 * Least share of the whole that remains, also at a compared frequency: temperature and tolerances move a column by some 0.2 GHz,
 * against compared frequencies 2 to 2.5 GHz apart.
 */
const LEAST_SHARE = 0.35;
const DEGREES = 180 / Math.PI;
const DB_PER_LN = 10 / Math.LN10;

/** In the unit of the quantity; undefined for what does not come from the columns. */
export function remainsOf(
  correction: Correction,
  board: Board,
  { quantity, cut = 'elevation', between }: Pick<Requirement, 'quantity' | 'cut' | 'between'>,
  { value, where, mismatch }: WorstValue,
): Spread | undefined {
  const { frequency } = where;
  const along = (read: (d: EngineDifference) => number): number => variation(correction, frequency, read);
  const gainDb = (d: EngineDifference): number => d.directivityDb + DB_PER_LN * d.shares.radiated;
  switch (quantity) {
    case 'reflection':
      return reflectionSpread(value, turning(correction, frequency, 'reflection'));
    case 'active_reflection':
      return reflectionSpread(value, turning(correction, frequency, 'activeReflection'));
    case 'directivity':
      return both(along((d) => d.directivityDb));
    case 'gain':
      return both(along(gainDb));
    case 'realized_gain':
      return realizedGainSpread(
        Math.sqrt(Math.max(0, 1 - mismatch)),
        along(gainDb),
        turning(correction, frequency, 'activeReflection'),
      );
    case 'radiation_efficiency':
      return ratioSpread(
        value,
        along((d) => DB_PER_LN * d.shares.radiated),
      );
    case 'half_power_beamwidth':
      return both(Math.abs(value) * along((d) => d[cut].width));
    case 'beam_direction':
      return both(DEGREES * directionRemains(correction, cut, frequency));
    case 'sidelobe_level':
    case 'pattern_mask':
      return both(along((d) => d[cut].sidelobeDb));
    case 'isolation': {
      const pairs = columnPairs(board, between).map(([m, n]) => along((d) => 2 * DB_PER_LN * d.coupling[m][n].re));
      return both(Math.max(0, ...pairs));
    }
    case 'line_loss':
    case 'declared':
      return undefined;
  }
}

/** rad */
export const directionRemains = (correction: Correction, cut: 'azimuth' | 'elevation', frequency: number): number =>
  variation(correction, frequency, (d) => d[cut].direction);

/**
 * Of a difference that is carried along straight lines. How far it strays from them is seen where one compared frequency is left
 * out and predicted from its neighbours; half the largest step between neighbours where that is more, because a single frequency
 * left out may fall well by chance. Grows from a compared frequency to the middle between two as a bridge between fixed ends.
 */
function variation(
  { differences }: Correction,
  frequency: number,
  read: (difference: EngineDifference) => number,
): number {
  const at = differences.map((d) => d.frequency);
  const value = differences.map(read);
  let most = 0;
  for (let i = 1; i < value.length; i++) most = Math.max(most, Math.abs(value[i] - value[i - 1]) / 2);
  for (let i = 1; i < value.length - 1; i++) {
    const part = (at[i] - at[i - 1]) / (at[i + 1] - at[i - 1]);
    most = Math.max(most, Math.abs(value[i] - (1 - part) * value[i - 1] - part * value[i + 1]));
  }
  const upper = at.findIndex((f) => f >= frequency);
  const part = upper < 1 ? 0 : (frequency - at[upper - 1]) / (at[upper] - at[upper - 1]);
  return most * Math.max(LEAST_SHARE, Math.sqrt(4 * part * (1 - part)));
}

/** Of reflections, complex: root mean square of the largest column's, as far as the neighbours do not explain it. */
function turning({ differences, reach }: Correction, frequency: number, of: 'reflection' | 'activeReflection'): number {
  const squares = differences[0][of].map((_, c) => differences.reduce((sum, d) => sum + abs2(d[of][c]), 0));
  const whole = Math.sqrt(Math.max(...squares) / differences.length);
  const known = differences.map((d) => d.frequency);
  return whole * Math.max(LEAST_SHARE, Math.sqrt(unexplainedShare(known, frequency, reach)));
}
