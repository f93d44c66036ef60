import type { MatrixDrawing } from '../dossier/document.js';
import { textWidth } from './font.js';
import { printNumber } from './scale.js';
import type { Drawing, Shape } from './shapes.js';
import type { Theme } from './theme.js';

const width = 480;
const top = 44;
const mostCell = 44;
const titleSize = 8;

/** Cells on paper, shaded by level and each with its number: the shade only helps the eye find the largest. */
export function matrixShapes(data: MatrixDrawing, theme: Theme, title: string, desc: string): Drawing {
  const { labels, cells, range } = data;
  const n = Math.max(1, labels.length);
  const rowTitle = `${data.rowTitle} ↓`;
  const left = Math.ceil(textWidth(rowTitle, titleSize)) + 18;
  const cell = Math.min(mostCell, (width - left - 12) / n);
  const high = Math.min(cell, 26);
  const size = Math.max(4.5, Math.min(8, cell * 0.26));
  const ink = theme.figure.ink;
  const text = (x: number, y: number, words: string, anchor: 'start' | 'middle' | 'end', at = size): Shape => ({
    shape: 'text',
    x,
    y,
    text: words,
    size: at,
    anchor,
    color: ink,
  });
  const shapes: Shape[] = [
    text(left, 14, `${data.columnTitle} →`, 'start', titleSize),
    text(left - 10, top - 6, rowTitle, 'end', titleSize),
    ...labels.flatMap((label, i) => [
      text(left + (i + 0.5) * cell, top - 6, label, 'middle'),
      text(left - 6, top + (i + 0.5) * high + size * 0.35, label, 'end'),
    ]),
  ];
  for (let i = 0; i < n * n; i++) {
    const [row, column] = [Math.floor(i / n), i % n];
    const found = cells.find((entry) => entry.row === row && entry.column === column);
    const box = { x: left + column * cell, y: top + row * high, width: cell, height: high };
    shapes.push({
      shape: 'rect',
      ...box,
      fill: found === undefined ? theme.figure.paper : shade(theme, (found.value - range[0]) / (range[1] - range[0])),
      stroke: { color: theme.figure.muted, width: 0.4 },
    });
    if (found !== undefined)
      shapes.push(text(box.x + cell / 2, box.y + high / 2 + size * 0.35, printNumber(found.value, 1), 'middle'));
  }
  for (const [i, j] of data.outlined ?? []) {
    shapes.push({
      shape: 'rect',
      x: left + j * cell + 1.2,
      y: top + i * high + 1.2,
      width: cell - 2.4,
      height: high - 2.4,
      stroke: { color: ink, width: 1.1, dash: [3, 1.5] },
    });
  }
  const height = top + n * high + 22;
  shapes.push(text(left, height - 7, `Numbers in ${data.unit}; darker is larger`, 'start', 7.5));
  return {
    width,
    height,
    title,
    desc,
    shapes: [{ shape: 'rect', x: 0, y: 0, width, height, fill: theme.figure.paper }, ...shapes],
  };
}

/** From paper to the band's ground: ink stays readable on all of it. */
function shade({ figure: { paper, copper } }: Theme, level: number): string {
  const share = Math.max(0, Math.min(1, level));
  const channel = (at: number): string => {
    const [from, to] = [paper, copper].map((colour) => Number.parseInt(colour.slice(at, at + 2), 16));
    return Math.round(from + (to - from) * share)
      .toString(16)
      .padStart(2, '0');
  };
  return `#${channel(1)}${channel(3)}${channel(5)}`;
}
