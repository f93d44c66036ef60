export type { SizedColumn, SizingRequest } from './request.js';
export { correctSizing, type FoundColumn, sizeColumn } from './size-column.js';
export { goalNotes, limitNotes, type SizedFigures, shortfall } from './sizing-notes.js';
