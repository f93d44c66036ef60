import type { CalibrationRange } from '../column/calibration-record.js';

/** Over which the network is compared with full wave: laminates and layouts of boards at 76 to 81 GHz, with some to spare. */
export const CALIBRATION_RANGE: CalibrationRange = {
  electricalHeight: [0.05, 0.43],
  permittivity: [2.2, 4],
  patchWidth: [0.3e-3, 1.6e-3],
  lineWidthOverHeight: [0.4, 2],
};

/** The middle of it, where the network is compared with full wave of whole columns too. */
export const MIDDLE_RANGE: CalibrationRange = {
  electricalHeight: [0.16, 0.33],
  permittivity: [2.9, 3.6],
  patchWidth: [0.5e-3, 1.45e-3],
  lineWidthOverHeight: [0.6, 1.7],
};

/** Hz; electrical heights are meant here. */
export const CALIBRATION_FREQUENCY = 77e9;
