export { type CalibrationProgress, calibrate } from './calibrate.js';
export { CALIBRATION_RANGE } from './range.js';
