export { type CurrentCrowding, crowdedFaceWeights, currentCrowding } from './current-crowding.js';
export { dielectricFilling } from './dielectric-filling.js';
export { type MicrostripStatic, microstripStatic } from './hammerstad-jensen.js';
export { type ImpedanceDispersion, type MicrostripDispersive, microstripDispersive } from './kirschning-jansen.js';
export type { MicrostripGeometry } from './microstrip-geometry.js';
export {
  type FaceImpedances,
  type MicrostripLine,
  type MicrostripLineInput,
  microstripLine,
} from './microstrip-line.js';
export { openEndExtension, thicknessEndExtension } from './open-end.js';
export { type RectangularGuide, type RectangularGuideInput, rectangularGuide } from './rectangular-guide.js';
export { type FaceWeights, sheetFaceWeights, wheelerFaceWeights } from './wheeler.js';
