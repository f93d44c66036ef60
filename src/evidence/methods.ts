import type { Method } from './method.js';
import { arraysMethods, fullWaveMethods } from './methods-arrays.js';
import { columnsMethods, suppliersMethods } from './methods-boards.js';
import { linesMethods } from './methods-lines.js';
import { copperMethods, laminatesMethods, textureMethods } from './methods-materials.js';

export type { Method } from './method.js';

/** Every method in the program, grouped copper, texture, laminates, lines, columns, arrays, what is asked of suppliers. */
export const methods: readonly Method[] = [
  ...copperMethods,
  ...textureMethods,
  ...laminatesMethods,
  ...linesMethods,
  ...columnsMethods,
  ...fullWaveMethods,
  ...arraysMethods,
  ...suppliersMethods,
];
