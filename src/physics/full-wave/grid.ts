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
  /** Cells across by which thick metal acts beyond its true sides: lines are drawn so that trims need not reach outwards. */
  readonly beyond: number;
}

/**
 * Grid index of the line that draws an edge, and how far inside it the true edge lies, in cells. Without a further term
 * metal acts as if it ended NATURAL_EDGE inside: the line is chosen with that in mind.
 *
 * @param outwards +1 for an edge that ends metal towards larger coordinates
 * @param beyond   cells by which the metal acts beyond its true edge
 */
export function drawEdge(
  edge: number,
  origin: number,
  step: number,
  outwards: 1 | -1,
  beyond = 0,
): { index: number; inwards: number } {
  const place = (edge - origin) / step;
  const index = Math.round(place + outwards * (NATURAL_EDGE + beyond));
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
  thickness: number,
): Grid {
  const along = alongGrid(columns, cellsPerPatch, finest);
  const across = acrossGrid(columns, rectangles, cellsPerLine, thickness);
  return {
    dx: along.step,
    x0: along.origin,
    dy: across.step,
    y0: across.origin,
    beyond: beyondOf(thickness, across.step),
  };
}

/** A side of thickness t adds about 0.5 to 0.7 t of width (Wheeler 1977; Hammerstad and Jensen 1980; from memory). */
const beyondOf = (thickness: number, step: number): number => Math.min(0.4, (0.7 * thickness) / step);

/** The columns with their centre lines where the grid has them: whole steps apart, so that equal columns are drawn alike. */
export function drawnColumns(columns: readonly ColumnGeometry[], grid: Grid): ColumnGeometry[] {
  const first = Math.min(...columns.map((c) => c.y));
  return columns.map((c) => ({ ...c, y: first + Math.round((c.y - first) / grid.dy) * grid.dy }));
}

function alongGrid(
  columns: readonly ColumnGeometry[],
  cellsPerPatch: number,
  finest: number,
): { step: number; origin: number } {
  const patches = columns.flatMap((c) => c.patches);
  const length = patches.reduce((sum, p) => sum + p.length, 0) / patches.length;
  const edges = new Map<string, { at: number; outwards: 1 | -1; count: number }>();
  const note = (at: number, outwards: 1 | -1): void => {
    const key = `${outwards} ${at.toExponential(9)}`;
    const known = edges.get(key);
    if (known) known.count++;
    else edges.set(key, { at, outwards, count: 1 });
  };
  for (const { x, direction = 1, patches, links, inset } of columns) {
    const back = direction === 1 ? -1 : 1;
    if (inset) note(x + direction * inset.depth, back);
    let s = 0;
    patches.forEach((patch, p) => {
      note(x + direction * s, back);
      s += patch.length;
      note(x + direction * s, direction);
      s += links[p]?.length ?? 0;
    });
  }
  const list = [...edges.values()];
  // A column that runs the other way is drawn as its mirror image.
  const forth = columns[0].direction ?? 1;
  let best = { step: length / cellsPerPatch, origin: columns[0].x, cost: Number.POSITIVE_INFINITY };
  for (let i = 0; i < STEPS_ALONG; i++) {
    const finer = 0.85 + (i / (STEPS_ALONG - 1)) * (finest - 0.85);
    const step = length / (cellsPerPatch * finer);
    for (let k = 0; k < OFFSETS; k++) {
      const origin = columns[0].x + ((forth * k) / OFFSETS) * step;
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
  thickness: number,
): { step: number; origin: number } {
  const fromCentre = (r: MetalRectangle): [number, number] => [r.y0 - columns[r.column].y, r.y1 - columns[r.column].y];
  const centred = rectangles.filter((r) => Math.abs(fromCentre(r)[0] + fromCentre(r)[1]) < 1e-9);
  const widths = [...new Set(centred.map((r) => r.width))];
  /** Sides of slots that an inset feed has beside its line, from the column's centre line. */
  const slots = new Set(
    rectangles
      .filter((r) => r.kind === 'patch' && !centred.includes(r))
      .map((r) => Math.min(...fromCentre(r).map(Math.abs))),
  );
  const lines = rectangles.filter((r) => r.kind !== 'patch').map((r) => r.width);
  const nominal = Math.min(...lines) / (cellsPerLine - 2 * NATURAL_EDGE);
  const centres = [...new Set(columns.map((c) => c.y))].sort((a, b) => a - b);
  const pitches = centres.slice(1).map((y, c) => y - centres[c]);
  let best = { step: nominal, origin: centres[0], cost: Number.POSITIVE_INFINITY };
  for (const step of stepsAcross(nominal, pitches)) {
    const beyond = beyondOf(thickness, step);
    // The centre of every column on a grid line, or between two.
    for (const shift of [0, 0.5]) {
      let cost = 0;
      for (const width of widths) {
        const off = drawEdge(width / 2, shift * step, step, 1, beyond).inwards - NATURAL_EDGE - beyond;
        // A trim of a patch's side moves its resonance a little; a line's holds what it should.
        cost += lines.includes(width) ? 0.1 * ((2 * off * step) / width) ** 2 : off * off;
      }
      for (const slot of slots) {
        const off = drawEdge(slot, shift * step, step, -1, beyond).inwards - NATURAL_EDGE - beyond;
        cost += off * off;
      }
      for (const pitch of pitches) {
        const cells = pitch / step;
        cost += (40 * (cells - Math.round(cells)) ** 2 * (step / pitch) ** 2) / centres.length;
      }
      if (cost < best.cost - 1e-12) best = { step, origin: centres[0] + shift * step, cost };
    }
  }
  return best;
}

/** Cell widths to choose from, those of which the least pitch is a whole number. */
function stepsAcross(nominal: number, pitches: readonly number[]): number[] {
  const [low, high] = [0.8 * nominal, 1.15 * nominal];
  if (pitches.length === 0) return Array.from({ length: STEPS }, (_, i) => low + ((high - low) * i) / (STEPS - 1));
  const pitch = Math.min(...pitches);
  const steps: number[] = [];
  for (let n = Math.ceil(pitch / high - 1e-9); n <= pitch / low; n++) steps.push(pitch / n);
  return steps.length > 0 ? steps : [pitch / Math.max(1, Math.round(pitch / nominal))];
}
