import type { ArrayDrawing } from '../dossier/document.js';
import { axes, tiltInset } from './array-axes.js';
import { columnEnds, feedTree, treeWidth } from './array-feed.js';
import { amplitudeMarks } from './array-weights.js';
import { textWidth } from './font.js';
import { niceStep } from './scale.js';
import type { Drawing, Shape, Stroke } from './shapes.js';
import type { Theme } from './theme.js';
import { wrapText } from './wrap.js';

const width = 480;
const nearLeft = 64;
const nearRight = 66;
/** Largest size of the name of a column. */
const nameSize = 8;
/** Room for the arrow of a column that is fed from the large-x side. */
const arrowRoom = 22;
const top = 34;
const mostHeight = 260;

/** Plan of the array to scale: x to the right along the columns, y upwards across them, z towards the reader. */
export function arrayShapes(data: ArrayDrawing, theme: Theme, title: string, desc: string): Drawing {
  const ink = theme.figure.ink;
  const muted = theme.figure.muted;
  const [x0, x1] = data.extent.x;
  const [y0, y1] = data.extent.y;
  const tree = data.network === undefined ? 0 : treeWidth(data.network.driven.length);
  const left = nearLeft + tree;
  const farEnd = data.columns.some(({ feed }) => feed.towards === '-x') ? arrowRoom : 0;
  const names = data.columns.map(({ label }) => textWidth(label, nameSize) + 8);
  const right = Math.max(nearRight, ...names) + farEnd;
  const scale = Math.min((width - left - right) / (x1 - x0), mostHeight / (y1 - y0));
  const planWidth = (x1 - x0) * scale;
  const planHeight = (y1 - y0) * scale;
  const px = (x: number) => left + (x - x0) * scale;
  const py = (y: number) => top + (y1 - y) * scale;
  const line = (color: string, w: number, dash?: readonly number[]): Stroke => ({
    color,
    width: w,
    ...(dash === undefined ? {} : { dash }),
  });
  const text = (
    x: number,
    y: number,
    words: string,
    anchor: 'start' | 'middle' | 'end',
    color = ink,
    size = 8,
  ): Shape => ({
    shape: 'text',
    x,
    y,
    text: words,
    size,
    anchor,
    color,
  });

  const shapes: Shape[] = [
    {
      shape: 'rect',
      x: left,
      y: top,
      width: planWidth,
      height: planHeight,
      fill: theme.figure.dielectric,
      stroke: line(muted, 0.4),
    },
  ];
  // Lines first, so that patches lie over their ends; a slot is cut into both, a line into a slot lies over it.
  for (const kind of ['line', 'patch', 'slot'] as const) {
    for (const column of data.columns) {
      for (const r of column.rectangles) {
        if (r.kind !== kind) continue;
        shapes.push({
          shape: 'rect',
          x: px(r.x),
          y: py(r.y + r.width),
          width: r.length * scale,
          height: r.width * scale,
          fill: kind === 'slot' ? theme.figure.dielectric : theme.figure.copper,
          ...(kind === 'patch' ? { stroke: line(ink, 0.4) } : {}),
        });
      }
    }
  }

  // Name and feed of each column.
  const middles = data.columns.map((column) => {
    const patches = column.rectangles.filter(({ kind }) => kind === 'patch');
    const low = Math.min(...patches.map((r) => r.y));
    const high = Math.max(...patches.map((r) => r.y + r.width));
    return (low + high) / 2;
  });
  const pitch = middles.slice(1).reduce((least, y, i) => Math.min(least, Math.abs(y - middles[i]) * scale), 20);
  const labelSize = Math.max(5, Math.min(nameSize, pitch * 0.8));
  for (const column of data.columns) shapes.push(...amplitudeMarks(column.rectangles, px, py, theme));
  data.columns.forEach((column, i) => {
    const y = py(middles[i]);
    shapes.push(text(left + planWidth + farEnd + 5, y + labelSize * 0.35, column.label, 'start', ink, labelSize));
    shapes.push(...columnEnds(column, px, py, theme));
  });
  if (data.network !== undefined) {
    shapes.push(
      ...feedTree(
        data.network.driven.map((i) => py(middles[i])),
        left - 20,
        theme,
      ),
    );
  }
  const fedAtSmallX = data.columns.flatMap(({ feed }, i) =>
    feed.towards === '+x' && feed.terminated !== true ? [middles[i]] : [],
  );
  if (fedAtSmallX.length > 0 && tree === 0)
    shapes.push(text(left - 21, py(Math.max(...fedAtSmallX)) + 2.8, 'feed', 'end', ink));

  // Planes of the cuts through the middle of the array.
  const xm = px((x0 + x1) / 2);
  const ym = py((y0 + y1) / 2);
  const cut = line(theme.figure.accent, 0.9, [6, 2, 1.5, 2]);
  const accent = theme.figure.accent;
  shapes.push(
    { shape: 'line', from: [left - tree - 36, ym], to: [left + planWidth + 2, ym], stroke: cut },
    text(left - tree - 38, ym - 2, 'x–z', 'end', accent),
    text(left - tree - 38, ym + 8, 'cut', 'end', accent),
    { shape: 'line', from: [xm, top - 10], to: [xm, top + planHeight + 6], stroke: cut },
    text(xm, top - 14, 'y–z cut', 'middle', accent),
  );
  // Polarisation: the electric field, both ways along x.
  shapes.push(
    {
      shape: 'arrow',
      from: [left + 8, top - 12],
      to: [left + 48, top - 12],
      both: true,
      head: 6,
      stroke: line(ink, 1),
    },
    text(left + 54, top - 9, 'E', 'start', ink, 9),
  );
  // Scale bar.
  const bar = niceStep(x1 - x0, 6);
  const barRight = left + planWidth;
  const barY = top - 12;
  shapes.push(
    { shape: 'line', from: [barRight - bar * scale, barY], to: [barRight, barY], stroke: line(ink, 1) },
    {
      shape: 'line',
      from: [barRight - bar * scale, barY - 3],
      to: [barRight - bar * scale, barY + 3],
      stroke: line(ink, 1),
    },
    { shape: 'line', from: [barRight, barY - 3], to: [barRight, barY + 3], stroke: line(ink, 1) },
    text(barRight - (bar * scale) / 2, barY - 4, `${bar} mm`, 'middle'),
  );

  const below = top + planHeight + 16;
  shapes.push(...axes(26, below + 44, theme), ...tiltInset(width - 116, below, theme));
  const notes = [
    data.axisNotes.x,
    data.axisNotes.y,
    'z, towards the reader, away from the board',
    data.axisNotes.cuts,
    data.axisNotes.polarisation,
    data.axisNotes.tilt,
    ...(data.axisNotes.amplitude === undefined ? [] : [data.axisNotes.amplitude]),
    ...(data.network === undefined ? [] : [data.network.label]),
  ].flatMap((note) => wrapText(note, 7.5, width - 116 - 106 - 10));
  notes.forEach((note, i) => {
    shapes.push(text(106, below + 8 + i * 10.5, note, 'start', ink, 7.5));
  });
  const height = below + Math.max(70, notes.length * 10.5 + 8);
  return {
    width,
    height,
    title,
    desc,
    shapes: [{ shape: 'rect', x: 0, y: 0, width, height, fill: theme.figure.paper }, ...shapes],
  };
}
