export { composePack } from './compose.js';
export type { PackInput } from './context.js';
export { packData } from './data.js';
export { type BoardData, dataSchemas, type PackData } from './data-schema.js';
export type * from './document.js';
