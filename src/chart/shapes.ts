/**
 * Display list of a drawing: the few shapes that a stack-up or an array needs, placed in points (1/72 inch) with the
 * origin at the top left and y downwards. SVG and PDF draw the same list, so that they cannot differ.
 */
export interface Stroke {
  /** `#rrggbb` */
  readonly color: string;
  readonly width: number;
  /** On and off lengths in points; solid when absent. */
  readonly dash?: readonly number[];
}

/** Parallel lines over a filled rectangle: tells materials apart without colour. */
export interface Hatch {
  readonly color: string;
  readonly width: number;
  /** Distance between neighbouring lines, measured across them. */
  readonly spacing: number;
  /** Direction of the lines: 45 rises to the right, -45 falls to the right. */
  readonly angle: 45 | -45;
}

export interface RectShape {
  readonly shape: 'rect';
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
  readonly fill?: string;
  readonly stroke?: Stroke;
  readonly hatch?: Hatch;
}

export interface LineShape {
  readonly shape: 'line';
  readonly from: readonly [number, number];
  readonly to: readonly [number, number];
  readonly stroke: Stroke;
}

export interface PolylineShape {
  readonly shape: 'polyline';
  readonly points: readonly (readonly [number, number])[];
  readonly closed?: boolean;
  readonly fill?: string;
  readonly stroke?: Stroke;
}

/** A line with a filled head at `to`, and at `from` as well when `both`. `arrowHead` gives the corners. */
export interface ArrowShape {
  readonly shape: 'arrow';
  readonly from: readonly [number, number];
  readonly to: readonly [number, number];
  readonly both?: boolean;
  /** Length of the head in points. */
  readonly head: number;
  readonly stroke: Stroke;
}

export interface TextShape {
  readonly shape: 'text';
  /** The anchor point on the baseline. */
  readonly x: number;
  readonly y: number;
  readonly text: string;
  readonly size: number;
  readonly anchor: 'start' | 'middle' | 'end';
  readonly color: string;
  readonly bold?: boolean;
  /** Degrees clockwise about the anchor point (as in SVG); 0 when absent. */
  readonly rotate?: number;
}

export type Shape = RectShape | LineShape | PolylineShape | ArrowShape | TextShape;

export interface Drawing {
  readonly width: number;
  readonly height: number;
  readonly title: string;
  readonly desc: string;
  /** In painting order. */
  readonly shapes: readonly Shape[];
}

/** The hatch of a rectangle as plain lines, cut to its outline: no clipping or pattern is needed to draw it. */
export function hatchLines(rect: RectShape): readonly LineShape[] {
  const { hatch, x, y, width, height } = rect;
  if (hatch === undefined) return [];
  const step = hatch.spacing * Math.SQRT2;
  const lines: LineShape[] = [];
  // Lines u = s − v in the frame of the rectangle (rising), mirrored in u for falling ones; half a step of offset
  // keeps the first line out of the corner.
  for (let s = step / 2; s < width + height; s += step) {
    const u0 = Math.max(0, s - height);
    const u1 = Math.min(width, s);
    const place = (u: number): readonly [number, number] => [hatch.angle === 45 ? x + u : x + width - u, y + s - u];
    lines.push({ shape: 'line', from: place(u0), to: place(u1), stroke: { color: hatch.color, width: hatch.width } });
  }
  return lines;
}

/** Corners of the head of an arrow whose tip is `to`: tip, then the two barbs. */
export function arrowHead(
  from: readonly [number, number],
  to: readonly [number, number],
  head: number,
): readonly [readonly [number, number], readonly [number, number], readonly [number, number]] {
  const length = Math.hypot(to[0] - from[0], to[1] - from[1]) || 1;
  const ux = (to[0] - from[0]) / length;
  const uy = (to[1] - from[1]) / length;
  const bx = to[0] - ux * head;
  const by = to[1] - uy * head;
  const half = head * 0.36;
  return [to, [bx - uy * half, by + ux * half], [bx + uy * half, by - ux * half]];
}
