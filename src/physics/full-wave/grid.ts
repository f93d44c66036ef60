/** The uniform grid on which the metal of a board is drawn. */
import type { ColumnGeometry } from '../column/engine.js';
import { NATURAL_EDGE } from './edge-trim.js';
import type { MetalRectangle } from './outline.js';

export interface Grid {
  readonly dx: number;
  readonly dy: number;
  /** Position of the grid line with index 0, m. */
  readonly x0: number;
  readonly y0: number;
}

/**
 * Grid index of the line that draws an edge, and how far inside it the true edge lies, in cells. Without a further term
 * metal acts as if it ended NATURAL_EDGE inside: the line is chosen with that in mind.
 *
 * @param outwards +1 for an edge that ends metal towards larger coordinates
 */
export function drawEdge(
  edge: number,
  origin: number,
  step: number,
  outwards: 1 | -1,
): { index: number; inwards: number } {
  const place = (edge - origin) / step;
  const index = Math.round(place + outwards * NATURAL_EDGE);
  return { index, inwards: outwards * (index - place) };
}

/** Steps of the scans: finer brings no less misfit worth the time. */
const STEPS = 241;
const OFFSETS = 40;
const STEPS_ALONG = 501;
/** Squared cells of misfit of an edge that a grid twice as fine as asked for is worth. */
const FINENESS = 0.006;

/**
 * Cell size and origin at which the true edges come to lie best: along, the ends of all patches; across, the
 * patches' sides above all, then the columns' distances, then the lines.
 *
 * @param finest times more cells along than asked for that are allowed, if edges then lie better
 */
export function chooseGrid(
  columns: readonly ColumnGeometry[],
  rectangles: readonly MetalRectangle[],
  cellsPerPatch: number,
  cellsPerLine: number,
  finest: number,
): Grid {
  const along = alongGrid(rectangles, cellsPerPatch, finest);
  const across = acrossGrid(columns, rectangles, cellsPerLine);
  return { dx: along.step, x0: along.origin, dy: across.step, y0: across.origin };
}

function alongGrid(
  rectangles: readonly MetalRectangle[],
  cellsPerPatch: number,
  finest: number,
): { step: number; origin: number } {
  const patches = rectangles.filter((r) => r.kind === 'patch');
  const length = patches.reduce((sum, r) => sum + r.x1 - r.x0, 0) / patches.length;
  const edges = new Map<string, { at: number; outwards: 1 | -1; count: number }>();
  const note = (at: number, outwards: 1 | -1): void => {
    const key = `${outwards} ${at.toExponential(9)}`;
    const known = edges.get(key);
    if (known) known.count++;
    else edges.set(key, { at, outwards, count: 1 });
  };
  for (const r of patches) {
    note(r.x0, -1);
    note(r.x1, 1);
  }
  const list = [...edges.values()];
  let best = { step: length / cellsPerPatch, origin: list[0].at, cost: Number.POSITIVE_INFINITY };
  for (let i = 0; i < STEPS_ALONG; i++) {
    const finer = 0.85 + (i / (STEPS_ALONG - 1)) * (finest - 0.85);
    const step = length / (cellsPerPatch * finer);
    for (let k = 0; k < OFFSETS; k++) {
      const origin = list[0].at + (k / OFFSETS) * step;
      let cost = FINENESS * patches.length * (finer - 1) ** 2;
      for (const { at, outwards, count } of list) {
        const off = drawEdge(at, origin, step, outwards).inwards - NATURAL_EDGE;
        cost += count * off * off;
      }
      if (cost < best.cost - 1e-9) best = { step, origin, cost };
    }
  }
  return best;
}

function acrossGrid(
  columns: readonly ColumnGeometry[],
  rectangles: readonly MetalRectangle[],
  cellsPerLine: number,
): { step: number; origin: number } {
  const widths = [...new Set(rectangles.map((r) => r.width))];
  const lines = rectangles.filter((r) => r.kind !== 'patch').map((r) => r.width);
  const nominal = Math.min(...lines) / (cellsPerLine - 2 * NATURAL_EDGE);
  const centres = [...new Set(columns.map((c) => c.y))].sort((a, b) => a - b);
  let best = { step: nominal, origin: centres[0], cost: Number.POSITIVE_INFINITY };
  for (let i = 0; i < STEPS; i++) {
    const step = nominal * (0.8 + (0.35 * i) / (STEPS - 1));
    // The centre of every column on a grid line, or between two.
    for (const shift of [0, 0.5]) {
      let cost = 0;
      for (const width of widths) {
        const off = drawEdge(width / 2, shift * step, step, 1).inwards - NATURAL_EDGE;
        // A trim of a patch's side moves its resonance a little; a line's holds what it should.
        cost += lines.includes(width) ? 0.1 * ((2 * off * step) / width) ** 2 : off * off;
      }
      for (let c = 1; c < centres.length; c++) {
        const pitch = (centres[c] - centres[c - 1]) / step;
        cost += (40 * (pitch - Math.round(pitch)) ** 2 * (step / (centres[c] - centres[c - 1])) ** 2) / centres.length;
      }
      if (cost < best.cost - 1e-12) best = { step, origin: centres[0] + shift * step, cost };
    }
  }
  return best;
}
