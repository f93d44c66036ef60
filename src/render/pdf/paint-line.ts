import { baseline, type TypeSize } from './layout.js';
import type { Line, Piece } from './lines.js';
import { shapeAdvance } from './lines.js';
import type { Element, Press } from './press.js';
import { paintStatusShape } from './status-shape.js';

function paintShapes(press: Press, line: Line, type: TypeSize, x: number, top: number): void {
  for (const piece of line.pieces) {
    if (piece.shape === undefined) continue;
    const size = 0.92 * type.size;
    paintStatusShape(press.doc, piece.shape, x + piece.x, top + baseline(type) - 0.365 * type.size - size / 2, size);
  }
}

function paintPiece(press: Press, piece: Piece, type: TypeSize, x: number, top: number): void {
  const left = x + piece.x + (piece.shape === undefined ? 0 : shapeAdvance * type.size);
  press.paintText(piece.text, piece.face, type.size, piece.colour, left, top + baseline(type));
}

/** A line of tagged text, its left end at `x`: the shapes of statuses are artifacts, since the word says the same. */
export function paintLine(
  press: Press,
  line: Line,
  type: TypeSize,
  x: number,
  top: number,
  element: Element,
  tag: string,
): void {
  if (line.pieces.some((piece) => piece.shape !== undefined)) {
    press.artifact('Layout', () => paintShapes(press, line, type, x, top));
  }
  let group: Piece[] = [];
  const flush = () => {
    if (group.length === 0) return;
    const pieces = group;
    const paint = () => {
      for (const piece of pieces) paintPiece(press, piece, type, x, top);
    };
    const { target } = pieces[0];
    if (target === undefined) {
      press.tagged(element, tag, paint);
    } else {
      const first = pieces[0];
      const last = pieces[pieces.length - 1];
      const area = { x: x + first.x, y: top, width: last.x + last.width - first.x, height: type.leading };
      const label = pieces
        .map((piece) => piece.text)
        .join('')
        .trim();
      press.link(element, target, label, area, paint);
    }
    group = [];
  };
  for (const piece of line.pieces) {
    if (group.length > 0 && group[0].target !== piece.target) flush();
    group.push(piece);
  }
  flush();
}

/** The same line inside an artifact that the caller has opened. */
export function paintBareLine(press: Press, line: Line, type: TypeSize, x: number, top: number): void {
  paintShapes(press, line, type, x, top);
  for (const piece of line.pieces) paintPiece(press, piece, type, x, top);
}
