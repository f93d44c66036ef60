export type { CoplanarFace, CoplanarGeometry } from './coplanar-geometry.js';
export { type CoplanarStatic, coplanarMapping } from './coplanar-mapping.js';
export { type CoplanarSection, coplanarSection } from './coplanar-section.js';
export { type CrossSection, crossSection } from './cross-section.js';
export { type CurrentCrowding, crowdedFaceWeights, currentCrowding } from './current-crowding.js';
export { dielectricFilling } from './dielectric-filling.js';
export { type DistributedCircuit, type DistributedCircuitInput, distributedCircuit } from './distributed-circuit.js';
export {
  type CoplanarFaceImpedances,
  type GroundedCoplanarInput,
  type GroundedCoplanarLine,
  groundedCoplanarLine,
} from './grounded-coplanar.js';
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
export {
  type GuideWall,
  type RectangularGuide,
  type RectangularGuideInput,
  rectangularGuide,
} from './rectangular-guide.js';
export {
  type SiwGeometry,
  type SiwInput,
  type SiwLine,
  type SiwWidthRule,
  siwEquivalentWidth,
  siwLine,
} from './siw.js';
export { type SolvedMicrostripInput, solvedMicrostrip } from './solved-microstrip.js';
export {
  type SheetSquares,
  type SpectralLine,
  type SpectralProblem,
  spectralLine,
} from './spectral-line.js';
export type { CoverCoat, StripSection } from './strip-section.js';
export {
  dispersedWeights,
  type StillStrip,
  type StripSolution,
  stillStrip,
  stripAt,
  stripFlags,
} from './strip-solution.js';
export {
  type StriplineFace,
  type StriplineGeometry,
  type StriplineInput,
  type StriplineLine,
  stripline,
  striplineFaceWeights,
  striplineImpedance,
  thinStriplineImpedance,
} from './stripline.js';
export { type FaceWeights, sheetFaceWeights, wheelerFaceWeights } from './wheeler.js';
