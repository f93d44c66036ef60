export {
  type MapAutocorrelation,
  mapAutocorrelation,
  type ProfileAutocorrelation,
  profileAutocorrelation,
} from './autocorrelation.js';
export {
  ASSUMED_RZ_OVER_RQ,
  type HeightParameter,
  normalRange,
  RQ_CONVERSIONS,
  RQ_OVER_RA,
  type RqConversion,
} from './conversion.js';
export { type MapDecay, mapDecayLengths, profileDecayLength, STANDARD_FALL } from './decay-length.js';
export { type DefaultSettings, defaultSettings } from './default-settings.js';
export {
  type EvaluatedMap,
  type EvaluatedProfile,
  evaluateMap,
  evaluateProfile,
  runIn,
  type TextureConditions,
} from './evaluate.js';
export { withoutMeanLine, withoutMeanPlane } from './form.js';
export { GAUSSIAN_ALPHA, gaussianMeanLine, gaussianMeanSurface, gaussianTransmission } from './gaussian-filter.js';
export { type MapParameters, mapParameters, type ProfileParameters, profileParameters } from './parameters.js';
export { type HeightMap, measuredShare, type Profile, withoutEnds, withoutRim } from './surface.js';
