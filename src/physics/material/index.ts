export {
  ANNEALED_COPPER_CONDUCTIVITY,
  COPPER_TEMPERATURE_COEFFICIENT,
  conductivityAt,
  halfSpaceImpedance,
  sheetImpedance,
  skinDepth,
  surfaceResistance,
} from './copper.js';
export {
  type DebyeCorners,
  debyePermittivity,
  type LaminateCoefficients,
  type LaminateConditions,
  type LaminateState,
  laminateAt,
  type StatedDielectric,
  WIDEBAND_CORNERS,
  type WidebandDebye,
  widebandDebye,
} from './laminate.js';
export { type MetalLayer, platedImpedance } from './plating.js';
