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
    stepReactance: 0.6426,
    edgeMoment: 1.034,
    coveredMoment: 1.147,
    modeConductance: 0.8968,
    openEnd: 1.125,
    coveredSusceptance: 1.191,
  },
  fittedResiduals: {
    gapResonance: 0.01237,
    gapQuality: 0.1857,
    edgeResonance: 0.002721,
    edgeResistance: 0.09258,
    edgeQuality: 0.08053,
    reflection: 0.03111,
  },
  residuals: {
    gapResonance: 0.01519,
    gapQuality: 0.2218,
    edgeResonance: 0.003883,
    edgeResistance: 0.09655,
    edgeQuality: 0.08162,
    reflection: 0.03158,
  },
  floor: {
    gapResonance: 0.0008814,
    gapQuality: 0.01925,
    edgeResonance: 0.001098,
    edgeResistance: 0.06965,
    edgeQuality: 0.06927,
    reflection: 0.01172,
  },
};
