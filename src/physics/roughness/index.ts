export { gradient, gradientPlaneShift } from './gradient.js';
export { groiss } from './groiss.js';
export { hammerstad, type LossFactor } from './hammerstad.js';
export {
  type ElectrostaticFace,
  type RoughFace,
  type RoughFaceInput,
  type RoughnessModel,
  referToElectrostaticPlane,
  roughFace,
  roughPlatedFace,
} from './rough-face.js';
