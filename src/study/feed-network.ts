/** A board's feed network under the conditions of a point: waves into the columns, and what stays in the feed. */
import type { Board } from '../manifest/model.js';
import { abs2, type Complex, exp, mul, scale } from '../numerics/complex.js';
import { type CorporateFeed, corporateFeed, feedOnBoard } from '../physics/feed/index.js';
import type { ValidityFlag } from '../physics/validity.js';
import { boardLine } from './board-line.js';
import { bandCentre } from './conditions.js';
import { wavesLeaving } from './correction.js';
import { nominalValues } from './nominal-values.js';
import type { FeedFigures } from './results.js';
import { type Surfaces, surfaces } from './surfaces.js';
import type { BoardValues } from './values.js';

export interface FedColumns {
  /** Into each column at the edge of its first patch, √W peak, for 1 W available at the input. */
  readonly waves: readonly Complex[];
  readonly figures: FeedFigures;
  /** 1 − reflected over incident power at the input. */
  readonly mismatch: number;
  readonly flags: readonly ValidityFlag[];
}

/** Drawing a network takes as long as dozens of points, and all sweeps of a board share it. */
const drawn = new Map<string, CorporateFeed>();
const DRAWN_KEPT = 4;

/** The network as drawn for the nominal board at the band centre, smooth copper. */
export function boardFeed(board: Board): CorporateFeed {
  const { feedNetwork } = board;
  if (!feedNetwork) throw new RangeError(`board ${board.id} has no feed network`);
  const { divider, lineWidth, trunkLength, levelLength } = feedNetwork;
  const designFrequency = bandCentre(board);
  const driven = drivenColumns(board);
  const spec = {
    divider,
    lineWidth,
    trunkLength,
    levelLength,
    designFrequency,
    weights: driven.map((c) => ({ amplitude: board.feed[c].amplitude, phase: board.feed[c].phase })),
    positions: driven.map((c) => board.columns[c].y),
  };
  const state = surfaces(board, nominalValues(board), 'smooth', designFrequency, board.temperature.nominalC);
  const key = JSON.stringify([spec, state.slab, state.stripThickness]);
  const feed = drawn.get(key) ?? corporateFeed(spec, state);
  drawn.delete(key);
  drawn.set(key, feed);
  for (const old of [...drawn.keys()].slice(0, -DRAWN_KEPT)) drawn.delete(old);
  return feed;
}

const drivenColumns = ({ feed }: Board): number[] => feed.map((_, c) => c).filter((c) => feed[c].amplitude > 0);

/**
 * Network, the feed line of each column and the columns as one circuit.
 *
 * @param columns  S-matrix at the edges of the first patches, as it is to count: corrected where there is a correction
 */
export function fedColumns(
  board: Board,
  values: BoardValues,
  state: Surfaces,
  frequency: number,
  columns: { readonly scattering: readonly (readonly Complex[])[]; readonly referenceImpedance: readonly number[] },
): FedColumns {
  const transition = board.feedNetwork?.transition;
  const driven = drivenColumns(board);
  const line = (width: number) => boardLine(board, state, values, width, frequency);
  const feed = boardFeed(board).at({
    ...state,
    frequency,
    line,
    inputReference: transition?.referenceImpedance,
    outputReferences: driven.map((c) => columns.referenceImpedance[c]),
  });
  // Each column's own feed line, matched to its reference as the board's S-matrix has it.
  const along = board.columns.map(({ feedLine }) => exp(scale(line(feedLine.width).gamma, -feedLine.length)));
  const seen = columns.scattering.map((row, i) => row.map((s, j) => mul(mul(along[i], s), along[j])));
  const { referenceImpedance } = columns;
  const fed = feedOnBoard(feed, { scattering: seen, referenceImpedance }, driven, transition);
  const waves = fed.incident.map((wave, c) => mul(wave, along[c]));
  const power = (list: readonly Complex[]): number => list.reduce((sum, wave) => sum + abs2(wave), 0) / 2;
  const mismatch = 1 - abs2(fed.inputReflection);
  return {
    waves,
    mismatch,
    figures: {
      inputReflection: fed.inputReflection,
      transmission: (power(waves) - power(wavesLeaving(columns.scattering, waves))) / mismatch,
      burnt: fed.burnt / mismatch,
    },
    flags: fed.flags,
  };
}
