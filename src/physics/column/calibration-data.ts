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
    stepReactance: 0.6225,
    edgeMoment: 0.9842,
    coveredMoment: 1.147,
    modeConductance: 0.9019,
    openEnd: 1.123,
    coveredSusceptance: 1.245,
  },
  fittedResiduals: {
    gapResonance: 0.01363,
    gapQuality: 0.1915,
    edgeResonance: 0.002365,
    edgeResistance: 0.08106,
    edgeQuality: 0.0746,
    reflection: 0.02537,
  },
  residuals: {
    gapResonance: 0.01519,
    gapQuality: 0.2218,
    edgeResonance: 0.002837,
    edgeResistance: 0.09365,
    edgeQuality: 0.08374,
    reflection: 0.02958,
  },
  floor: {
    gapResonance: 0.0008814,
    gapQuality: 0.01925,
    edgeResonance: 0.001083,
    edgeResistance: 0.0646,
    edgeQuality: 0.0736,
    reflection: 0.01177,
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
    stepReactance: 0.5846,
    edgeMoment: 0.9828,
    coveredMoment: 1.134,
    modeConductance: 0.899,
    openEnd: 1.115,
    coveredSusceptance: 1.235,
  },
  fittedResiduals: {
    gapResonance: 0.003728,
    gapQuality: 0.06437,
    edgeResonance: 0.001018,
    edgeResistance: 0.04218,
    edgeQuality: 0.0439,
    reflection: 0.01409,
  },
  residuals: {
    gapResonance: 0.005906,
    gapQuality: 0.09816,
    edgeResonance: 0.001481,
    edgeResistance: 0.04821,
    edgeQuality: 0.04531,
    reflection: 0.01317,
  },
  floor: {
    gapResonance: 0.000124,
    gapQuality: 0.004991,
    edgeResonance: 0.0005788,
    edgeResistance: 0.05212,
    edgeQuality: 0.05653,
    reflection: 0.00708,
  },
};
