export { askedItems, askedWords } from './asked-items.js';
export { packFor } from './audience.js';
export { audienceOf } from './audience-rules.js';
export { columnLength, withPieces } from './column-outline.js';
export type { FigureDocument } from './documents/fields.js';
export { LARGEST_FILE, type PackFiles } from './files.js';
export { manifestSchemas, schemaText } from './json-schema.js';
export { type LoadResult, loadPack } from './load-pack.js';
export type * from './model.js';
export { offeredBoard, offeredFigure } from './offered-board.js';
export { type PathResult, resolveReference } from './paths.js';
export { formatProblem, type Problem, sortProblems } from './problem.js';
export type * from './procurement-model.js';
export { QUANTITY_NAMES, type QuantityRule, REQUIREMENT_QUANTITIES } from './requirement-quantities.js';
export {
  LARGEST_TEXTURE_FILE,
  type MeasuredHeights,
  readTextureCsv,
  readTextureFile,
  readX3p,
  type TextureFile,
  type TextureFileResult,
} from './texture-files/index.js';
