import * as vega from 'vega';
import { drawing } from '../../chart/drawing.js';
import { arrowHead, type Drawing, hatchLines, type Shape, type Stroke } from '../../chart/shapes.js';
import { chartSpec } from '../../chart/spec.js';
import { theme } from '../../chart/theme.js';
import { prepareView } from '../../chart/view.js';
import type { FigureBlock } from '../../dossier/document.js';
import { CanvasContext } from './canvas-context.js';
import type { Press } from './press.js';

/** A chart or drawing ready to be painted at any place and scale. */
export interface Picture {
  readonly width: number;
  readonly height: number;
  /** Paints it with its top left corner at (x, y). */
  readonly paint: (press: Press, x: number, y: number, scale: number) => void;
  readonly finalize: () => void;
}

interface Renderer {
  initialize(
    element: null,
    width: number,
    height: number,
    origin: readonly [number, number],
    scale: number,
    options: { readonly externalContext: unknown },
  ): Renderer;
  background(colour: string): Renderer;
  render(scene: unknown): Renderer;
}
/** Exported by the package, missing from its types. */
const { CanvasRenderer } = vega as unknown as { readonly CanvasRenderer: new (loader: unknown) => Renderer };

const printTheme = { ...theme, figure: { ...theme.figure, paper: '#ffffff' } };

/** Pictures are prepared before the first page, because charts compute asynchronously and layout does not. */
export async function preparePicture(figure: FigureBlock): Promise<Picture> {
  const { content } = figure;
  if ('drawing' in content) {
    const list = drawing(content, { title: figure.title, desc: figure.alt }, printTheme);
    return {
      width: list.width,
      height: list.height,
      paint: (press, x, y, scale) => paintDrawing(press, list, x, y, scale),
      finalize: () => undefined,
    };
  }
  const view = await prepareView(chartSpec(content, printTheme));
  const padding = view.padding();
  const sides =
    typeof padding === 'number' ? { left: padding, right: padding, top: padding, bottom: padding } : padding;
  const { left = 0, right = 0, top = 0, bottom = 0 } = sides;
  const width = view.width() + left + right;
  const height = view.height() + top + bottom;
  const [originX, originY] = view.origin();
  return {
    width,
    height,
    paint: (press, x, y, scale) => {
      const context = new CanvasContext(press, x, y, scale);
      context.save();
      new CanvasRenderer(view.loader())
        .initialize(null, width, height, [left + originX, top + originY], 1, { externalContext: context })
        .background(printTheme.figure.paper)
        .render((view.scenegraph() as unknown as { readonly root: unknown }).root);
      context.restore();
    },
    finalize: () => {
      view.finalize();
    },
  };
}

/** The display list, in points scaled by `scale`. */
function paintDrawing(press: Press, list: Drawing, x: number, y: number, scale: number): void {
  const { doc } = press;
  doc.save();
  doc.translate(x, y).scale(scale);
  for (const shape of list.shapes) paintShape(press, shape);
  doc.restore();
}

function setStroke(doc: PDFKit.PDFDocument, stroke: Stroke): void {
  doc.lineWidth(stroke.width);
  if (stroke.dash?.some((length) => length > 0)) {
    doc.dash(stroke.dash.map((length) => Math.max(length, 0.01)));
  } else {
    doc.undash();
  }
}

function paintPolyline(press: Press, points: readonly (readonly [number, number])[], closed: boolean): void {
  points.forEach(([x, y], i) => {
    if (i === 0) press.doc.moveTo(x, y);
    else press.doc.lineTo(x, y);
  });
  if (closed) press.doc.closePath();
}

/** Fills, strokes or both; a path with neither would stay open on the page. */
function finish(doc: PDFKit.PDFDocument, fill: string | undefined, stroke: Stroke | undefined): void {
  if (stroke !== undefined) setStroke(doc, stroke);
  if (fill !== undefined && stroke !== undefined) doc.fillAndStroke(fill, stroke.color);
  else if (fill !== undefined) doc.fill(fill);
  else if (stroke !== undefined) doc.stroke(stroke.color);
}

function paintShape(press: Press, shape: Shape): void {
  const { doc } = press;
  switch (shape.shape) {
    case 'rect':
      if (shape.fill !== undefined || shape.stroke !== undefined) {
        doc.rect(shape.x, shape.y, shape.width, shape.height);
        finish(doc, shape.fill, shape.stroke);
      }
      for (const line of hatchLines(shape)) paintShape(press, line);
      return;
    case 'line':
      paintPolyline(press, [shape.from, shape.to], false);
      finish(doc, undefined, shape.stroke);
      return;
    case 'polyline':
      if (shape.points.length < 2 || (shape.fill === undefined && shape.stroke === undefined)) return;
      paintPolyline(press, shape.points, shape.closed === true);
      finish(doc, shape.fill, shape.stroke);
      return;
    case 'arrow': {
      paintPolyline(press, [shape.from, shape.to], false);
      finish(doc, undefined, shape.stroke);
      const heads = [arrowHead(shape.from, shape.to, shape.head)];
      if (shape.both) heads.push(arrowHead(shape.to, shape.from, shape.head));
      for (const head of heads) {
        paintPolyline(press, head, true);
        finish(doc, shape.stroke.color, undefined);
      }
      return;
    }
    case 'text': {
      const parts = press.glyphs(shape.text, shape.bold ? 'bold' : 'sans');
      const width = parts.reduce((sum, part) => sum + press.widthOf(part.text, part.face, shape.size), 0);
      let left = shape.anchor === 'middle' ? -width / 2 : shape.anchor === 'end' ? -width : 0;
      doc.save();
      doc.translate(shape.x, shape.y);
      if (shape.rotate) doc.rotate(shape.rotate);
      for (const part of parts) {
        press.paintText(part.text, part.face, shape.size, shape.color, left, 0);
        left += press.widthOf(part.text, part.face, shape.size);
      }
      doc.restore();
      return;
    }
  }
}
