/**
 * Made by `npm run calibrate`: the edge network against the full wave of single patches, without lines, at the end of a
 * line and between two lines; never columns. Not to be edited.
 */
import type { CalibrationRecord } from './calibration-record.js';

export const CALIBRATION: CalibrationRecord = {
  cases: 16,
  range: {
    electricalHeight: [0.05, 0.43],
    permittivity: [2.2, 4],
    patchWidth: [0.0003, 0.0016],
    lineWidthOverHeight: [0.4, 2],
  },
  fitted: {
    stepReactance: 0.6623,
    edgeMoment: 1.006,
    coveredMoment: 1.147,
    modeConductance: 0.8648,
    openEnd: 1.122,
    coveredSusceptance: 1.214,
  },
  fittedResiduals: {
    gapResonance: 0.01265,
    gapQuality: 0.2144,
    edgeResonance: 0.002785,
    edgeResistance: 0.08585,
    edgeQuality: 0.06787,
    reflection: 0.02852,
  },
  residuals: {
    gapResonance: 0.01519,
    gapQuality: 0.2218,
    edgeResonance: 0.003522,
    edgeResistance: 0.1129,
    edgeQuality: 0.08059,
    reflection: 0.03666,
  },
  floor: {
    gapResonance: 0.0008814,
    gapQuality: 0.01925,
    edgeResonance: 0.0006435,
    edgeResistance: 0.09306,
    edgeQuality: 0.1105,
    reflection: 0.01187,
  },
};

/** The same over the middle of the range, where columns were compared too. */
export const MIDDLE_CALIBRATION: CalibrationRecord = {
  cases: 16,
  range: {
    electricalHeight: [0.16, 0.33],
    permittivity: [2.9, 3.6],
    patchWidth: [0.0005, 0.00145],
    lineWidthOverHeight: [0.6, 1.7],
  },
  fitted: {
    stepReactance: 0.6214,
    edgeMoment: 0.9931,
    coveredMoment: 1.147,
    modeConductance: 0.8491,
    openEnd: 1.115,
    coveredSusceptance: 1.212,
  },
  fittedResiduals: {
    gapResonance: 0.003434,
    gapQuality: 0.1164,
    edgeResonance: 0.001055,
    edgeResistance: 0.04948,
    edgeQuality: 0.03312,
    reflection: 0.01587,
  },
  residuals: {
    gapResonance: 0.005906,
    gapQuality: 0.09816,
    edgeResonance: 0.001632,
    edgeResistance: 0.1098,
    edgeQuality: 0.05189,
    reflection: 0.01879,
  },
  floor: {
    gapResonance: 0.000124,
    gapQuality: 0.004991,
    edgeResonance: 0.001168,
    edgeResistance: 0.08037,
    edgeQuality: 0.1033,
    reflection: 0.009907,
  },
};
