export {
  ANNEALED_COPPER_CONDUCTIVITY,
  COPPER_TEMPERATURE_COEFFICIENT,
  conductivityAt,
  halfSpaceImpedance,
  sheetImpedance,
  skinDepth,
  surfaceResistance,
} from './copper.js';
export { type MetalLayer, platedImpedance } from './plating.js';
