import type { QuantityName } from '../manifest/model.js';
import {
  both,
  ratioSpread,
  realizedGainSpread,
  reflectionSpread,
  type Spread,
  sidelobeSpread,
} from './accuracy-spread.js';

/**
 * How far the column network and the line solver may be from the truth, by quantity. One file, so that a reader can check every number of
 * the uncertainty against its ground.
 *
 * `compared`: from the project's own comparison of the network with independent full-wave solutions of series-fed
 * columns (6 to 12 patches, permittivity 2.9 to 3.6, 0.10 to 0.20 mm laminate, 76 to 81 GHz). `argued`: follows from
 * compared figures by the argument given. Neither is a comparison with a measured board.
 */
export interface EngineAccuracy {
  readonly quantity: QuantityName;
  /** For print: the figure and how it applies. */
  readonly statement: string;
  readonly ground: 'compared' | 'argued';
  readonly source: string;
  /** How far the true value may lie above and below the value found, in the unit of the quantity, both ≥ 0. */
  readonly spread: (value: number, context: AccuracyContext) => Spread;
}

export interface AccuracyContext {
  /** Magnitude of the reflection of the driven array where the worst value occurs. */
  readonly reflection: number;
  /** The board lies outside what the figure was compared on. */
  readonly outside?: boolean;
}

const FULL_WAVE = 'own comparison of the network with independent full-wave solutions of series-fed columns';

/** |ΔS11| found on columns is 0.01 to 0.05; against the own full wave on boards up to 0.1. */
export const REFLECTION_ERROR = 0.1;
/** Two neighbours of about 0.06 each as the network has them, overstated by up to 4 dB: 2 × 0.06 × 0.37, added to the passive figure. */
export const ACTIVE_REFLECTION_ERROR = 0.14;
/** Beam direction and pattern edges, rad. */
export const DIRECTION_ERROR = (0.5 * Math.PI) / 180;

const GAIN_ERROR_DB = 0.35;
/** Of a line's loss, as a share. */
const LINE_ERROR = 0.03;
export const ENGINE_ACCURACY: readonly EngineAccuracy[] = [
  {
    quantity: 'reflection',
    statement: '±0.10 as a complex number, turned into dB at the value found',
    ground: 'compared',
    source: `${FULL_WAVE}: |ΔS11| 0.01 to 0.05; 0.10 for layouts not compared`,
    spread: (value) => reflectionSpread(value, REFLECTION_ERROR),
  },
  {
    quantity: 'active_reflection',
    statement: '±0.14 as a complex number, turned into dB at the value found',
    ground: 'argued',
    source:
      'passive figure of 0.10 plus 0.04: two neighbours coupled by about 0.06 each, the network overstating that by up to 4 dB',
    spread: (value) => reflectionSpread(value, ACTIVE_REFLECTION_ERROR),
  },
  {
    quantity: 'beam_direction',
    statement: '±0.5 deg',
    ground: 'compared',
    source: `${FULL_WAVE}: 0.2 to 0.6 deg`,
    spread: () => both(0.5),
  },
  {
    quantity: 'half_power_beamwidth',
    statement: '±0.5 deg or ±4 %, whichever is larger',
    ground: 'argued',
    source:
      'sidelobe errors of 0.4 to 1 dB mean errors of a few per cent in the aperture distribution, which move the beamwidth by about as much',
    spread: (value) => both(Math.max(0.5, 0.04 * Math.abs(value))),
  },
  {
    quantity: 'sidelobe_level',
    statement: '±1.0 dB down to −20 dB, ±2.0 dB at −25 dB, linear between and below',
    ground: 'compared',
    source: `${FULL_WAVE}: 0.3 to 0.65 dB uniform, up to 1.9 dB tapered; below −25 dB continued by argument`,
    spread: (value) => sidelobeSpread(value),
  },
  {
    quantity: 'pattern_mask',
    statement:
      'as sidelobe level at the lowest piece of the mask; besides, the pattern is moved by ±0.5 deg and compared again',
    ground: 'argued',
    source: 'figures of sidelobe level and beam direction',
    spread: (lowestPiece) => sidelobeSpread(lowestPiece),
  },
  {
    quantity: 'directivity',
    statement: '±0.15 dB',
    ground: 'compared',
    source: `${FULL_WAVE}: 0.05 to 0.15 dB`,
    spread: () => both(0.15),
  },
  {
    quantity: 'gain',
    statement: '±0.35 dB',
    ground: 'compared',
    source: `${FULL_WAVE}: 0.07 dB on two laminates; the 0.35 dB of the network before it is kept for layouts not compared`,
    spread: () => both(GAIN_ERROR_DB),
  },
  {
    quantity: 'realized_gain',
    statement: '±0.35 dB of gain with the effect of ±0.10 of reflection on the mismatch, root sum of squares',
    ground: 'argued',
    source: 'figures of gain and reflection',
    spread: (_, { reflection }) => realizedGainSpread(reflection, GAIN_ERROR_DB, REFLECTION_ERROR),
  },
  {
    quantity: 'radiation_efficiency',
    statement: '±0.35 dB of the value, that is +8.4 % and −7.7 %',
    ground: 'argued',
    source: 'figure of gain, which is directivity times efficiency; directivity is the better known of the two',
    spread: (value) => ratioSpread(value, GAIN_ERROR_DB),
  },
  {
    quantity: 'isolation',
    statement: '±4 dB',
    ground: 'compared',
    source: `${FULL_WAVE}: coupling of neighbouring columns overstated by up to 4 dB`,
    spread: () => both(4),
  },
  {
    quantity: 'line_loss',
    statement: '±3 % of the value; ±6 % outside what the line solver was compared on',
    ground: 'compared',
    source:
      'own comparison of the solved line with independent full-wave solutions at 24 and 77 GHz on 0.1 to 0.25 mm: conductor loss within 0.6 to 2 %, dielectric loss within 0.1 %, effective permittivity within 0.2 %, shares of the faces within 2 % of a refined solution; width and copper as drawn. Outside by argument: twice as much',
    spread: (value, { outside = false }) => both((outside ? 2 : 1) * LINE_ERROR * Math.abs(value)),
  },
];

/**
 * A board that the full wave has not confirmed may lie further from those compared than they do from each other: the figures
 * count half as much again there.
 */
export const UNCONFIRMED_FACTOR = 1.5;

/** @throws RangeError for a quantity that is not computed */
export function engineAccuracyOf(quantity: QuantityName): EngineAccuracy {
  const found = ENGINE_ACCURACY.find((entry) => entry.quantity === quantity);
  if (found === undefined) throw new RangeError(`no engine accuracy for ${quantity}`);
  return found;
}
