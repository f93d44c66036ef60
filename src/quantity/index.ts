export { decimalsFor, type FormatOptions, formatNumber, formatQuantity, formatSpread } from './format.js';
export {
  type PlausibleRange,
  parseQuantity,
  type QuantityProblem,
  type QuantityResult,
  quantityPattern,
  quoted,
  splitQuantity,
  visible,
} from './parse.js';
export {
  DB_PER_NEPER,
  DIMENSIONS,
  type Dimension,
  type DimensionInfo,
  dbFromNepers,
  fromBase,
  nepersFromDb,
  toBase,
  type Unit,
  unitNamed,
} from './units.js';
