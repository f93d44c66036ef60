import type { Dimension, PlausibleRange } from '../quantity/index.js';
import type { QuantityName } from './model.js';

/** How a requirement quantity is written: the dimension of its limit, the unit in the model, and whether it has a cut. */
export interface QuantityRule {
  /** Undefined for `pattern_mask` (its pieces are the limit) and `declared` (the property brings its own unit). */
  readonly limit?: {
    readonly dimension: Dimension;
    /** Unit of `Requirement.limit.value`; `1` for a ratio. */
    readonly unit: 'dBi' | 'dB' | 'deg' | 'dB/cm' | '1';
    readonly range: PlausibleRange;
  };
  readonly cut: boolean;
  /** Where only one side of the limit has a meaning. */
  readonly direction?: 'at_least' | 'at_most';
}

const limit = (
  dimension: Dimension,
  unit: 'dBi' | 'dB' | 'deg' | 'dB/cm' | '1',
  low: number,
  high: number,
  subject: string,
): QuantityRule['limit'] => ({ dimension, unit, range: { low, high, subject, unit } });

const HALF_TURN = Math.PI;
const dbi = (subject: string) => limit('gain', 'dBi', -60, 80, subject);

export const REQUIREMENT_QUANTITIES: Readonly<Record<QuantityName, QuantityRule>> = {
  gain: { limit: dbi('a gain'), cut: false },
  realized_gain: { limit: dbi('a realized gain'), cut: false },
  directivity: { limit: dbi('a directivity'), cut: false },
  radiation_efficiency: { limit: limit('ratio', '1', 0, 1, 'a radiation efficiency'), cut: false },
  reflection: { limit: limit('level', 'dB', -80, 0, 'a reflection'), cut: false },
  active_reflection: { limit: limit('level', 'dB', -80, 20, 'an active reflection'), cut: false },
  half_power_beamwidth: { limit: limit('angle', 'deg', 0, HALF_TURN, 'a half-power beamwidth'), cut: true },
  sidelobe_level: { limit: limit('level', 'dB', -80, 0, 'a sidelobe level'), cut: true },
  beam_direction: { limit: limit('angle', 'deg', -HALF_TURN / 2, HALF_TURN / 2, 'a beam direction'), cut: true },
  pattern_mask: { cut: true },
  isolation: { limit: limit('level', 'dB', 0, 120, 'an isolation'), cut: false, direction: 'at_least' },
  line_loss: { limit: limit('loss_per_length', 'dB/cm', 0, 10000, 'a line loss'), cut: false },
  declared: { cut: false },
};

export const QUANTITY_NAMES = Object.keys(REQUIREMENT_QUANTITIES) as QuantityName[];
