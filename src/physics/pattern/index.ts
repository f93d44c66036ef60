export {
  beamEfficiency,
  crossPolarDiscrimination,
  halfPowerShare,
  type Polarisation,
  type Squint,
  squint,
} from './beam.js';
export { type CutShape, cutShape } from './cut-figures.js';
export { cutThrough, type PolarCut } from './cut-through.js';
export { climb, type DirectionGrid, directionGrid, type StrongestDirection, strongestDirection } from './half-space.js';
export { againstMask, type CutLobes, cutLobes, type Lobe, type MaskBreach, type MaskSegment } from './lobes.js';
export { type PolarField, polarIntensity, polarised } from './polarisation.js';
export { farFieldPower, intensity, overHalfSpace } from './radiated-power.js';
export { cutSamples, electricalExtent } from './sampling.js';
