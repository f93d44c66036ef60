import type { QuantityName } from '../manifest/model.js';
import { both, ratioSpread, realizedGainSpread, reflectionSpread, sidelobeSpread } from './accuracy-spread.js';
import type { EngineAccuracy } from './engine-accuracy.js';

/**
 * How far the full wave may be from the truth, by quantity: what stays uncertain at a frequency where it ran. Same layouts and
 * laminates as for the network (`engine-accuracy.ts`), against solutions by another program written for this project from the
 * same published method, with its own mesh. The figures hold what was found (reflection 0.01, gain 0.05 dB, beam direction
 * 0.2 deg, sidelobes 0.1 dB) and what those solutions are themselves known to (0.02, 0.1 dB, 0.5 deg grid, 0.5 dB); on the
 * thickest laminate compared, 0.2 mm, they are known to 0.03.
 */
const COMPARED = 'own comparison with independent full-wave solutions of series-fed columns';

const REFLECTION_ERROR = 0.03;
const GAIN_ERROR_DB = 0.15;

export const FULL_WAVE_ACCURACY: readonly EngineAccuracy[] = [
  {
    quantity: 'reflection',
    statement: '±0.03 as a complex number, turned into dB at the value found',
    ground: 'compared',
    source: COMPARED,
    spread: (value) => reflectionSpread(value, REFLECTION_ERROR),
  },
  {
    quantity: 'active_reflection',
    statement: '±0.03 as a complex number, turned into dB at the value found',
    ground: 'argued',
    source: 'passive figure; couplings of 0.06 known to 0.5 dB add 0.004 each',
    spread: (value) => reflectionSpread(value, REFLECTION_ERROR),
  },
  {
    quantity: 'beam_direction',
    statement: '±0.5 deg',
    ground: 'compared',
    source: COMPARED,
    spread: () => both(0.5),
  },
  {
    quantity: 'half_power_beamwidth',
    statement: '±0.25 deg or ±2 %, whichever is larger',
    ground: 'argued',
    source: 'sidelobe errors half as large as those of the network mean half the error of the aperture distribution',
    spread: (value) => both(Math.max(0.25, 0.02 * Math.abs(value))),
  },
  {
    quantity: 'sidelobe_level',
    statement: '±0.5 dB down to −20 dB, ±1.0 dB at −25 dB, linear between and below',
    ground: 'compared',
    source: COMPARED,
    spread: (value) => sidelobeSpread(value, 0.5),
  },
  {
    quantity: 'pattern_mask',
    statement:
      'as sidelobe level at the lowest piece of the mask; besides, the pattern is moved by ±0.5 deg and compared again',
    ground: 'argued',
    source: 'figures of sidelobe level and beam direction',
    spread: (lowestPiece) => sidelobeSpread(lowestPiece, 0.5),
  },
  {
    quantity: 'directivity',
    statement: '±0.1 dB',
    ground: 'argued',
    source: 'part of the figure of gain',
    spread: () => both(0.1),
  },
  {
    quantity: 'gain',
    statement: '±0.15 dB',
    ground: 'compared',
    source: COMPARED,
    spread: () => both(GAIN_ERROR_DB),
  },
  {
    quantity: 'realized_gain',
    statement: '±0.15 dB of gain with the effect of ±0.03 of reflection on the mismatch, root sum of squares',
    ground: 'argued',
    source: 'figures of gain and reflection',
    spread: (_, { reflection }) => realizedGainSpread(reflection, GAIN_ERROR_DB, REFLECTION_ERROR),
  },
  {
    quantity: 'radiation_efficiency',
    statement: '±0.15 dB of the value, that is +3.5 % and −3.4 %',
    ground: 'argued',
    source: 'figure of gain, which is directivity times efficiency',
    spread: (value) => ratioSpread(value, GAIN_ERROR_DB),
  },
  {
    quantity: 'isolation',
    statement: '±1 dB',
    ground: 'compared',
    source:
      'own comparison with independent full-wave solutions of two neighbouring columns (0.2 dB), and what the length of the radiating feed lines moves',
    spread: () => both(1),
  },
];

/** Undefined for a quantity that the full wave does not give. */
export const fullWaveAccuracyOf = (quantity: QuantityName): EngineAccuracy | undefined =>
  FULL_WAVE_ACCURACY.find((entry) => entry.quantity === quantity);
