import type { ArrayDrawing } from '../dossier/document.js';
import { textWidth } from './font.js';
import type { Shape } from './shapes.js';
import type { Theme } from './theme.js';

type Rectangle = ArrayDrawing['columns'][number]['rectangles'][number];

const largest = 6.5;
const smallest = 4;

/** Amplitude of each patch as a number where it fits, else as a bar whose height is the share of the patch's width. */
export function amplitudeMarks(
  rectangles: readonly Rectangle[],
  px: (x: number) => number,
  py: (y: number) => number,
  theme: Theme,
): Shape[] {
  const weighted = rectangles.flatMap(({ amplitude, ...box }) => (amplitude === undefined ? [] : [{ amplitude, box }]));
  const boxes = weighted.map(({ box }) => ({
    x: px(box.x),
    y: py(box.y + box.width),
    width: px(box.x + box.length) - px(box.x),
    height: py(box.y) - py(box.y + box.width),
  }));
  const sizes = weighted.map(({ amplitude }, i) =>
    Math.min((boxes[i].width - 1.5) / textWidth(amplitude.text, 1), boxes[i].height * 0.8, largest),
  );
  const size = Math.min(...sizes);
  return weighted.map(({ amplitude }, i): Shape => {
    const { x, y, width, height } = boxes[i];
    if (size >= smallest)
      return {
        shape: 'text',
        x: x + width / 2,
        y: y + height / 2 + size * 0.36,
        text: amplitude.text,
        size,
        anchor: 'middle',
        color: theme.figure.ink,
      };
    const bar = height * amplitude.share;
    return {
      shape: 'rect',
      x: x + width / 4,
      y: y + height - bar,
      width: width / 2,
      height: bar,
      fill: theme.figure.ink,
    };
  });
}
