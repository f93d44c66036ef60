import type { ArrayDrawing, DrawingData, MatrixDrawing, StackUpDrawing, ToothDrawing } from '../dossier/document.js';
import { arrayShapes } from './array.js';
import { matrixShapes } from './matrix.js';
import type { Drawing } from './shapes.js';
import { stackUpShapes } from './stack-up.js';
import { theme as quiet, type Theme } from './theme.js';
import { toothShapes } from './tooth.js';

/** Words for those who cannot see the picture; the page gives its own. */
export interface Words {
  readonly title: string;
  readonly desc: string;
}

export function drawStackUp(
  data: StackUpDrawing,
  words: Words = { title: 'Stack-up', desc: data.layers.map((layer) => layer.label).join('; ') },
  theme: Theme = quiet,
): Drawing {
  return stackUpShapes(data, theme, words.title, words.desc);
}

export function drawArray(
  data: ArrayDrawing,
  words: Words = { title: 'Array', desc: data.columns.map((column) => column.label).join('; ') },
  theme: Theme = quiet,
): Drawing {
  return arrayShapes(data, theme, words.title, words.desc);
}

export function drawTooth(
  data: ToothDrawing,
  words: Words = { title: 'Tooth', desc: data.faces.map((face) => `${face.label}: ${face.note}`).join('; ') },
  theme: Theme = quiet,
): Drawing {
  return toothShapes(data, theme, words.title, words.desc);
}

export function drawMatrix(
  data: MatrixDrawing,
  words: Words = { title: 'Matrix', desc: `${data.rowTitle}; ${data.columnTitle}` },
  theme: Theme = quiet,
): Drawing {
  return matrixShapes(data, theme, words.title, words.desc);
}

export function drawing(data: DrawingData, words?: Words, theme: Theme = quiet): Drawing {
  switch (data.drawing) {
    case 'stack-up':
      return drawStackUp(data, words, theme);
    case 'array':
      return drawArray(data, words, theme);
    case 'tooth':
      return drawTooth(data, words, theme);
    case 'matrix':
      return drawMatrix(data, words, theme);
  }
}
