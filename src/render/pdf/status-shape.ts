import { statusShapeBox, statusShapes } from '../../chart/status-shapes.js';
import type { Status } from '../../dossier/document.js';
import { colours } from './layout.js';

/** The shape of a status in its colour, its top left corner at a point. */
export function paintStatusShape(doc: PDFKit.PDFDocument, status: Status, x: number, top: number, size: number): void {
  doc.save();
  doc.translate(x, top).scale(size / statusShapeBox);
  doc.path(statusShapes[status]).fill(colours.status[status], 'even-odd');
  doc.restore();
}
