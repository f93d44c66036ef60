export { type CalibrationProgress, calibrate } from './calibrate.js';
export { CALIBRATION_RANGE, MIDDLE_RANGE } from './range.js';
