import { CALIBRATION } from './calibration-data.js';
import type { CalibrationRange } from './calibration-record.js';

/**
 * Constants of the edge network: found by fitting independent full-wave solutions of isolated patches and one-patch
 * two-ports, and compared with this project's own full wave over `range`. What that comparison left, and the constants
 * that it would have chosen, stand in `calibration-data.ts`.
 */
export interface NetworkConstants {
  readonly source: string;
  readonly stepReactance: number;
  readonly cavityWidening: number;
  readonly edgeMoment: number;
  readonly coveredMoment: number;
  readonly modeConductance: number;
  readonly openEnd: number;
  readonly coveredSusceptance: number;
  readonly range: CalibrationRange;
}

export const NETWORK_CONSTANTS: NetworkConstants = {
  source: 'fit to independent full-wave solutions of single patches and one-patch two-ports, 71 to 83 GHz, 2026',
  /** Step reactance over that of the planar-cavity sum of higher modes. */
  stepReactance: 0.59,
  /** Weight of the patch's effective width in the cavity width: We = W + 0.4 (weff − W). */
  cavityWidening: 0.4,
  /** Magnetic moment of an edge over its effective width, before the mode sets the level. */
  edgeMoment: 0.893,
  /** Part of the attached line's effective width that it silences. */
  coveredMoment: 0.956,
  /**
   * Conductance of a patch's cavity mode over that of its macro current: from the resistance and Q of three edge-fed
   * patches on 0.1 to 0.2 mm. The same patches driven at a gap, without lines, gave 0.90 to 0.95.
   */
  modeConductance: 0.88,
  /**
   * Open-end length over that of Kirschning, Jansen and Koster. A first fit on isolated patches gave 1.094; 1.115, found on
   * columns of two laminates, held on laminates and layouts kept apart, and on the single patches of the calibration.
   */
  openEnd: 1.115,
  /** Part of the open-end susceptance that an attached line removes, per effective width ratio. */
  coveredSusceptance: 1.249,
  range: CALIBRATION.range,
};
