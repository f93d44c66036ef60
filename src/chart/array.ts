import type { ArrayDrawing } from '../dossier/document.js';
import { niceStep } from './scale.js';
import type { Drawing, Shape, Stroke } from './shapes.js';
import type { Theme } from './theme.js';
import { wrapText } from './wrap.js';

const width = 480;
const left = 64;
const right = 66;
const top = 34;
const mostHeight = 260;

/** Plan of the array to scale: x to the right along the columns, y upwards across them, z towards the reader. */
export function arrayShapes(data: ArrayDrawing, theme: Theme, title: string, desc: string): Drawing {
  const ink = theme.figure.ink;
  const muted = theme.figure.muted;
  const [x0, x1] = data.extent.x;
  const [y0, y1] = data.extent.y;
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
  // Lines first, so that patches lie over their ends.
  for (const kind of ['line', 'patch'] as const) {
    for (const column of data.columns) {
      for (const r of column.rectangles) {
        if (r.kind !== kind) continue;
        shapes.push({
          shape: 'rect',
          x: px(r.x),
          y: py(r.y + r.width),
          width: r.length * scale,
          height: r.width * scale,
          fill: theme.figure.copper,
          ...(kind === 'patch' ? { stroke: line(ink, 0.4) } : {}),
        });
      }
    }
  }

  // Name and feed of each column.
  const middles = data.columns.map((column) => {
    const low = Math.min(...column.rectangles.map((r) => r.y));
    const high = Math.max(...column.rectangles.map((r) => r.y + r.width));
    return (low + high) / 2;
  });
  const pitch = middles.slice(1).reduce((least, y, i) => Math.min(least, Math.abs(y - middles[i]) * scale), 20);
  const labelSize = Math.max(5, Math.min(8, pitch * 0.8));
  data.columns.forEach((column, i) => {
    const y = py(middles[i]);
    shapes.push(text(left + planWidth + 5, y + labelSize * 0.35, column.label, 'start', ink, labelSize), {
      shape: 'arrow',
      from: [left - 18, y],
      to: [left - 2, y],
      head: 5,
      stroke: line(ink, 0.8),
    });
  });
  if (middles.length > 0) shapes.push(text(left - 21, py(Math.max(...middles)) + 2.8, 'feed', 'end', ink));

  // Planes of the cuts through the middle of the array.
  const xm = px((x0 + x1) / 2);
  const ym = py((y0 + y1) / 2);
  const cut = line(theme.figure.accent, 0.9, [6, 2, 1.5, 2]);
  const accent = theme.figure.accent;
  shapes.push(
    { shape: 'line', from: [left - 36, ym], to: [left + planWidth + 2, ym], stroke: cut },
    text(left - 38, ym - 2, 'x–z', 'end', accent),
    text(left - 38, ym + 8, 'cut', 'end', accent),
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

/** Axes with the one towards the reader as a dot in a circle. */
function axes(x: number, y: number, theme: Theme): Shape[] {
  const stroke: Stroke = { color: theme.figure.ink, width: 0.9 };
  const circle = (r: number): [number, number][] =>
    Array.from({ length: 20 }, (_, i) => [x + r * Math.cos((i * Math.PI) / 10), y + r * Math.sin((i * Math.PI) / 10)]);
  const name = (tx: number, ty: number, text: string): Shape => ({
    shape: 'text',
    x: tx,
    y: ty,
    text,
    size: 8.5,
    anchor: 'middle',
    color: theme.figure.ink,
  });
  return [
    { shape: 'arrow', from: [x + 4, y], to: [x + 40, y], head: 6, stroke },
    { shape: 'arrow', from: [x, y - 4], to: [x, y - 40], head: 6, stroke },
    { shape: 'polyline', points: circle(4), closed: true, fill: theme.figure.paper, stroke },
    { shape: 'polyline', points: circle(1.2), closed: true, fill: theme.figure.ink },
    name(x + 47, y + 3, 'x'),
    name(x - 9, y - 34, 'y'),
    name(x - 10, y + 9, 'z'),
  ];
}

/** Side view with a beam on the positive side: shows which way a positive tilt leans. */
function tiltInset(x: number, y: number, theme: Theme): Shape[] {
  const ink = theme.figure.ink;
  const stroke: Stroke = { color: ink, width: 0.9 };
  const base: readonly [number, number] = [x + 44, y + 52];
  const tilt = (25 * Math.PI) / 180;
  const arc: [number, number][] = Array.from({ length: 9 }, (_, i) => [
    base[0] + 26 * Math.sin((tilt * i) / 8),
    base[1] - 26 * Math.cos((tilt * i) / 8),
  ]);
  const label = (tx: number, ty: number, text: string, anchor: 'start' | 'middle' = 'middle'): Shape => ({
    shape: 'text',
    x: tx,
    y: ty,
    text,
    size: 8,
    anchor,
    color: ink,
  });
  return [
    {
      shape: 'rect',
      x: x + 8,
      y: y + 52,
      width: 72,
      height: 4,
      fill: theme.figure.copper,
      stroke: { color: ink, width: 0.4 },
    },
    {
      shape: 'line',
      from: base,
      to: [base[0], y + 8],
      stroke: { color: theme.figure.muted, width: 0.7, dash: [3, 2] },
    },
    { shape: 'arrow', from: base, to: [base[0] + 46 * Math.sin(tilt), base[1] - 46 * Math.cos(tilt)], head: 6, stroke },
    { shape: 'polyline', points: arc, stroke },
    { shape: 'arrow', from: [x + 82, y + 54], to: [x + 98, y + 54], head: 5, stroke },
    label(x + 104, y + 57, 'x'),
    label(base[0] - 7, y + 13, 'z'),
    label(base[0] + 25, y + 8, '+ tilt', 'start'),
  ];
}
