/**
 * The engine without the site: read a pack, study its boards, judge them; or call the physics alone. No file is
 * touched from here: `loadPack` gets its files through an interface. Each layer is described in DEVELOPERS.md.
 */
export * as evidence from './evidence/index.js';
export {
  formatProblem,
  type LoadResult,
  loadPack,
  manifestSchemas,
  type PackFiles,
  type Problem,
} from './manifest/index.js';
export type { Analysis, Board, Pack, Requirement, RequirementSet } from './manifest/model.js';
export * as array from './physics/array/index.js';
export * as column from './physics/column/index.js';
export * as feed from './physics/feed/index.js';
export * as fullWave from './physics/full-wave/index.js';
export * as line from './physics/line/index.js';
export * as material from './physics/material/index.js';
export * as pattern from './physics/pattern/index.js';
export * as roughness from './physics/roughness/index.js';
export * as sizing from './physics/sizing/index.js';
export * as taper from './physics/taper/index.js';
export * as texture from './physics/texture/index.js';
export type { ValidityFlag } from './physics/validity.js';
export { assembleStudy, type BoardStudy, planBoard, runTask, studyBoard } from './study/index.js';
export { type BoardVerdict, judgeBoard, judgePack, type RequirementVerdict } from './verdict/index.js';
