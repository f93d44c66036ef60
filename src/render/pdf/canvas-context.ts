import { color as parseColour } from 'd3-color';
import type { Face, Press } from './press.js';

type Matrix = readonly [number, number, number, number, number, number];
type Command = { readonly kind: 'M' | 'L' | 'C' | 'Z'; readonly points: readonly number[] };

interface State {
  matrix: Matrix;
  fillStyle: string;
  strokeStyle: string;
  globalAlpha: number;
  lineWidth: number;
  lineCap: 'butt' | 'round' | 'square';
  lineJoin: 'miter' | 'round' | 'bevel';
  miterLimit: number;
  dash: readonly number[];
  lineDashOffset: number;
  font: string;
  textAlign: string;
}

/**
 * The Canvas 2D calls that the chart painter uses, written to a page as vectors and text.
 *
 * It keeps its own matrix and a path in page coordinates, since the painter moves the origin back before it fills or
 * strokes, and fills and strokes one path. Gradients and images are refused aloud: no chart here has any.
 */
export class CanvasContext {
  pixelRatio = 1;
  globalCompositeOperation = 'source-over';
  textBaseline = 'alphabetic';
  private state: State;
  private readonly stack: State[] = [];
  private path: Command[] = [];

  /** @param scale points on the page per pixel of the chart; its top left corner stands at (x, y) */
  constructor(
    private readonly press: Press,
    x: number,
    y: number,
    scale: number,
  ) {
    this.state = {
      matrix: [scale, 0, 0, scale, x, y],
      fillStyle: '#000',
      strokeStyle: '#000',
      globalAlpha: 1,
      lineWidth: 1,
      lineCap: 'butt',
      lineJoin: 'miter',
      miterLimit: 10,
      dash: [],
      lineDashOffset: 0,
      font: '10px sans-serif',
      textAlign: 'start',
    };
  }

  // ------------------------------------------------------------------ state

  set fillStyle(value: string) {
    this.state.fillStyle = value;
  }
  set strokeStyle(value: string) {
    this.state.strokeStyle = value;
  }
  set globalAlpha(value: number) {
    this.state.globalAlpha = value;
  }
  set lineWidth(value: number) {
    this.state.lineWidth = value;
  }
  set lineCap(value: State['lineCap']) {
    this.state.lineCap = value;
  }
  set lineJoin(value: State['lineJoin']) {
    this.state.lineJoin = value;
  }
  set miterLimit(value: number) {
    this.state.miterLimit = value;
  }
  set lineDashOffset(value: number) {
    this.state.lineDashOffset = value;
  }
  set font(value: string) {
    this.state.font = value;
  }
  set textAlign(value: string) {
    this.state.textAlign = value;
  }
  setLineDash(dash: readonly number[]): void {
    this.state.dash = dash;
  }

  save(): void {
    this.stack.push({ ...this.state });
    this.press.doc.save();
  }
  restore(): void {
    const before = this.stack.pop();
    if (before === undefined) return;
    this.state = before;
    this.press.doc.restore();
  }

  transform(a: number, b: number, c: number, d: number, e: number, f: number): void {
    const [m0, m1, m2, m3, m4, m5] = this.state.matrix;
    this.state.matrix = [
      m0 * a + m2 * b,
      m1 * a + m3 * b,
      m0 * c + m2 * d,
      m1 * c + m3 * d,
      m0 * e + m2 * f + m4,
      m1 * e + m3 * f + m5,
    ];
  }
  translate(x: number, y: number): void {
    this.transform(1, 0, 0, 1, x, y);
  }
  scale(x: number, y: number): void {
    this.transform(x, 0, 0, y, 0, 0);
  }
  rotate(angle: number): void {
    this.transform(Math.cos(angle), Math.sin(angle), -Math.sin(angle), Math.cos(angle), 0, 0);
  }

  // ------------------------------------------------------------------ path

  private at(x: number, y: number): [number, number] {
    const [a, b, c, d, e, f] = this.state.matrix;
    return [a * x + c * y + e, b * x + d * y + f];
  }
  beginPath(): void {
    this.path = [];
  }
  moveTo(x: number, y: number): void {
    this.path.push({ kind: 'M', points: this.at(x, y) });
  }
  lineTo(x: number, y: number): void {
    this.path.push({ kind: this.path.length === 0 ? 'M' : 'L', points: this.at(x, y) });
  }
  bezierCurveTo(x1: number, y1: number, x2: number, y2: number, x: number, y: number): void {
    if (this.path.length === 0) this.moveTo(x1, y1);
    this.path.push({ kind: 'C', points: [...this.at(x1, y1), ...this.at(x2, y2), ...this.at(x, y)] });
  }
  /** Raised to a cubic: the operator of that name in pdfkit draws another curve. */
  quadraticCurveTo(cx: number, cy: number, x: number, y: number): void {
    if (this.path.length === 0) this.moveTo(cx, cy);
    const [px, py] = this.path[this.path.length - 1].points.slice(-2);
    const [qx, qy] = this.at(cx, cy);
    const [ex, ey] = this.at(x, y);
    const third = (from: number, control: number) => from + (2 / 3) * (control - from);
    this.path.push({ kind: 'C', points: [third(px, qx), third(py, qy), third(ex, qx), third(ey, qy), ex, ey] });
  }
  closePath(): void {
    if (this.path.length > 0) this.path.push({ kind: 'Z', points: [] });
  }
  rect(x: number, y: number, width: number, height: number): void {
    this.moveTo(x, y);
    this.lineTo(x + width, y);
    this.lineTo(x + width, y + height);
    this.lineTo(x, y + height);
    this.closePath();
  }
  /** By cubic pieces of at most a quarter turn (error below 3e-4 of the radius). */
  arc(cx: number, cy: number, radius: number, start: number, end: number, counterclockwise = false): void {
    const full = 2 * Math.PI;
    let sweep = end - start;
    if (counterclockwise) sweep = sweep <= -full ? -full : ((sweep % full) - full) % full;
    else sweep = sweep >= full ? full : ((sweep % full) + full) % full;
    const pieces = Math.max(1, Math.ceil(Math.abs(sweep) / (Math.PI / 2) - 1e-9));
    const step = sweep / pieces;
    const handle = (4 / 3) * Math.tan(step / 4) * radius;
    const point = (angle: number): [number, number] => [cx + radius * Math.cos(angle), cy + radius * Math.sin(angle)];
    this.lineTo(...point(start));
    for (let i = 0; i < pieces; i += 1) {
      const [from, to] = [start + i * step, start + (i + 1) * step];
      const [x0, y0] = point(from);
      const [x1, y1] = point(to);
      this.bezierCurveTo(
        x0 - handle * Math.sin(from),
        y0 + handle * Math.cos(from),
        x1 + handle * Math.sin(to),
        y1 - handle * Math.cos(to),
        x1,
        y1,
      );
    }
  }

  private trace(): void {
    const { doc } = this.press;
    for (const { kind, points: p } of this.path) {
      if (kind === 'M') doc.moveTo(p[0], p[1]);
      else if (kind === 'L') doc.lineTo(p[0], p[1]);
      else if (kind === 'C') doc.bezierCurveTo(p[0], p[1], p[2], p[3], p[4], p[5]);
      else doc.closePath();
    }
  }

  // ------------------------------------------------------------------ painting

  /** Colour as 0 to 255, and how much of it covers. */
  private ink(style: string): { readonly rgb: [number, number, number]; readonly alpha: number } {
    const parsed = typeof style === 'string' ? parseColour(style)?.rgb() : undefined;
    if (parsed === undefined) throw new Error(`chart: "${String(style)}" is not a plain colour`);
    const { r, g, b, opacity } = parsed;
    return { rgb: [r, g, b], alpha: (Number.isNaN(r) ? 0 : opacity) * this.state.globalAlpha };
  }

  private get lengthScale(): number {
    const [a, b, c, d] = this.state.matrix;
    return Math.sqrt(Math.abs(a * d - b * c));
  }

  fill(): void {
    const { rgb, alpha } = this.ink(this.state.fillStyle);
    if (alpha <= 0 || this.path.length === 0) return;
    const { doc } = this.press;
    doc.save();
    doc.fillColor(rgb);
    if (alpha < 1) doc.fillOpacity(alpha);
    this.trace();
    doc.fill();
    doc.restore();
  }

  stroke(): void {
    const { rgb, alpha } = this.ink(this.state.strokeStyle);
    if (alpha <= 0 || this.path.length === 0) return;
    const { doc } = this.press;
    const unit = this.lengthScale;
    doc.save();
    doc.strokeColor(rgb);
    if (alpha < 1) doc.strokeOpacity(alpha);
    doc.lineWidth(this.state.lineWidth * unit);
    if (this.state.lineCap !== 'butt') doc.lineCap(this.state.lineCap);
    if (this.state.lineJoin !== 'miter') doc.lineJoin(this.state.lineJoin);
    doc.miterLimit(Math.max(1, this.state.miterLimit));
    const { dash } = this.state;
    // A dash without gaps, such as [1, 0], is a solid line; pdfkit takes no zero length.
    if (dash.some((length, i) => i % 2 === 1 && length > 0) || (dash.length === 1 && dash[0] > 0)) {
      const lengths = dash.map((length) => Math.max(length, 0.01) * unit);
      doc.dash(lengths, { phase: this.state.lineDashOffset * unit });
    }
    this.trace();
    doc.stroke();
    doc.restore();
  }

  clip(): void {
    // An empty path clips everything away.
    if (this.path.length === 0) this.rect(0, 0, 0, 0);
    this.trace();
    this.press.doc.clip();
  }

  fillRect(x: number, y: number, width: number, height: number): void {
    const before = this.path;
    this.path = [];
    this.rect(x, y, width, height);
    this.fill();
    this.path = before;
  }

  fillText(text: string, x: number, y: number): void {
    const { rgb, alpha } = this.ink(this.state.fillStyle);
    if (alpha <= 0) return;
    const { size, face } = fontOf(this.state.font);
    const { press } = this;
    const { doc } = press;
    const parts = press.glyphs(text, face);
    const width = parts.reduce((sum, part) => sum + press.widthOf(part.text, part.face, size), 0);
    const { textAlign } = this.state;
    let left = x - (textAlign === 'center' ? width / 2 : textAlign === 'right' || textAlign === 'end' ? width : 0);
    doc.save();
    doc.transform(...(this.state.matrix as [number, number, number, number, number, number]));
    for (const part of parts) {
      press.paintText(part.text, part.face, size, hex(rgb), left, y);
      left += press.widthOf(part.text, part.face, size);
    }
    doc.restore();
  }

  strokeText(): void {
    throw new Error('chart: outlined text is not drawn');
  }
  createLinearGradient(): never {
    throw new Error('chart: gradients are not drawn');
  }
  createRadialGradient(): never {
    throw new Error('chart: gradients are not drawn');
  }
  drawImage(): never {
    throw new Error('chart: images are not drawn');
  }
}

const hex = (rgb: readonly number[]) =>
  `#${rgb.map((part) => Math.round(part).toString(16).padStart(2, '0')).join('')}`;

/** Size and face of a CSS font such as `bold 11px 'DejaVu Sans', sans-serif`. */
export function fontOf(font: string): { readonly size: number; readonly face: Face } {
  const size = Number(/(\d+(?:\.\d+)?)px/.exec(font)?.[1] ?? 10);
  const head = font.slice(0, font.indexOf('px'));
  if (/mono/i.test(font)) return { size, face: 'mono' };
  return { size, face: /\b(bold|bolder|[6-9]00)\b/.test(head) ? 'bold' : 'sans' };
}
