import type { ArrayDrawing, DrawingData, StackUpDrawing } from '../dossier/document.js';
import { arrayShapes } from './array.js';
import type { Drawing } from './shapes.js';
import { stackUpShapes } from './stack-up.js';
import { theme as quiet, type Theme } from './theme.js';

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

export function drawing(data: DrawingData, words?: Words, theme: Theme = quiet): Drawing {
  return data.drawing === 'stack-up' ? drawStackUp(data, words, theme) : drawArray(data, words, theme);
}
