import type { Shape, Stroke } from './shapes.js';
import type { Theme } from './theme.js';

/** Axes with the one towards the reader as a dot in a circle. */
export function axes(x: number, y: number, theme: Theme): Shape[] {
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
export function tiltInset(x: number, y: number, theme: Theme): Shape[] {
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
