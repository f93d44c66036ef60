export { ASSUMED_RZ_OVER_RQ } from '../texture/conversion.js';
export { ballPile } from './ball-pile.js';
export { type BandEstimate, type BandEstimates, GENTLE_LENGTH_OVER_RQ, roughnessEstimates } from './band.js';
export { areaRatiosOf } from './band-lateral.js';
export { cannonball } from './cannonball.js';
export { causalReactance, groissImpedance, hammerstadImpedance } from './causal-reactance.js';
export type { FaceConditions, ReferencePlane, RoughFaceInput, RoughnessModel } from './face-model.js';
export { gradient, gradientPlaneShift } from './gradient.js';
export { groiss } from './groiss.js';
export { type HallFactor, hallHemispheres } from './hall.js';
export { hammerstad, type LossFactor } from './hammerstad.js';
export { type Balls, hurayImpedance, hurayLossFactor } from './huray.js';
export { type LengthConversion, lengthConversion } from './length-conversion.js';
export { type Narrowing, type RoughnessBand, roughnessBand } from './narrowing.js';
export { type NoduleFace, noduleStacks } from './nodules.js';
export {
  applicableModels,
  type ElectrostaticFace,
  overFlatImpedance,
  type RoughFace,
  referToElectrostaticPlane,
  roughFace,
  roughPlatedFace,
} from './rough-face.js';
export { saturationRq, saturationStatement } from './saturation.js';
export {
  permittivityRise,
  resonanceShift,
  SLOW_WAVE_SHARE,
  slowWaveExcess,
  slowWaveLength,
  tiltShift,
} from './slow-wave.js';
export {
  areaLimitedPerturbation,
  correlationLengthFromAreaRatio,
  type HeightSpectrum,
  type Perturbed,
  type RandomTexture,
  smallPerturbation,
} from './small-perturbation.js';
export { exactSphereTerm, publishedSphereTerm, sphereOverstatement } from './sphere.js';
export {
  areaRatio,
  correlationLengthFromSal,
  gradientFromAreaRatio,
  isotropicAreaRatio,
  type Lay,
  type NoduleKnowledge,
  profileLengthRatio,
  type TextureKnowledge,
} from './texture.js';
