/** Metal drawn on a uniform grid: cells, currents across the edges between them, and how far true edges lie off the lines. */
import type { EdgeTrim, EdgeTrims } from './edge-trim.js';
import { drawEdge, type Grid } from './grid.js';
import type { MetalRectangle } from './outline.js';

/** A rectangle in cells, [i0, i1) × [j0, j1), with the inward distances of its true edges in cells. */
export interface DrawnRectangle {
  readonly metal: MetalRectangle;
  readonly i0: number;
  readonly i1: number;
  readonly j0: number;
  readonly j1: number;
  readonly inwards: { readonly x0: number; readonly x1: number; readonly y0: number; readonly y1: number };
  readonly trims: { readonly x0: EdgeTrim; readonly x1: EdgeTrim; readonly y0: EdgeTrim; readonly y1: EdgeTrim };
}

export interface Mesh {
  readonly grid: Grid;
  /** Cells of the box around the metal; x0, y0 of `grid` are moved to its corner. */
  readonly nx: number;
  readonly ny: number;
  readonly rectangles: readonly DrawnRectangle[];
  /** Unknown through the edge between cell (i, j) and (i + 1, j), or −1; index j·nx + i. */
  readonly xEdge: Int32Array;
  /** The same between (i, j) and (i, j + 1). */
  readonly yEdge: Int32Array;
  /** Cell of lower index beside each unknown: j·nx + i; unknowns below `xCount` flow along x. */
  readonly cellOf: Int32Array;
  readonly xCount: number;
  readonly unknowns: number;
  /** Metal cells: place, rectangle, the four unknowns (low x, high x, low y, high y; −1 where none), edge trims. */
  readonly cells: {
    readonly place: Int32Array;
    readonly rectangle: Int32Array;
    readonly edges: Int32Array;
    /** Σ κ of free edges that run along x, and along y: for the current along them, and for the charge. */
    readonly currentX: Float64Array;
    readonly currentY: Float64Array;
    readonly chargeX: Float64Array;
    readonly chargeY: Float64Array;
  };
}

const SAME = 1e-9;
const NO_TRIM: EdgeTrim = { charge: 0, current: 0 };

/**
 * The current of a patch does not keep the sections' spread near its ends, where its charge gathers at the corners: trims
 * of its sides take this much more on currents and less on charges, so that patches of one width resonate alike on all grids.
 */
const CORNER_SHARE = 0.05;

/** Grid indices of both ends of every rectangle along one axis; where two meet, the wider one's rule holds. */
function drawAxis(
  spans: readonly { low: number; high: number; crossLow: number; crossHigh: number }[],
  origin: number,
  step: number,
  beyond = 0,
): { low: number; high: number }[] {
  const index = (at: number, outwards: 1 | -1): number => drawEdge(at, origin, step, outwards, beyond).index;
  const across = (s: (typeof spans)[number]): number => s.crossHigh - s.crossLow;
  return spans.map((span) => {
    const ruled = (at: number, outwards: 1 | -1): number => {
      let widest = across(span);
      let sign = outwards;
      for (const other of spans) {
        const meets = Math.abs((outwards === 1 ? other.low : other.high) - at) < SAME;
        const overlaps = other.crossLow < span.crossHigh - SAME && other.crossHigh > span.crossLow + SAME;
        if (meets && overlaps && across(other) > widest + SAME) {
          widest = across(other);
          sign = outwards === 1 ? -1 : 1;
        }
      }
      // Of two equally wide ones that meet, both must take one rule: that of the lower side.
      if (sign === outwards && outwards === -1)
        for (const other of spans)
          if (Math.abs(other.high - at) < SAME && Math.abs(across(other) - across(span)) <= SAME) sign = 1;
      return index(at, sign);
    };
    return { low: ruled(span.low, -1), high: ruled(span.high, 1) };
  });
}

/** Whether a piece of a patch is narrower than another of the same. */
const isWing = (piece: MetalRectangle, other: MetalRectangle): boolean =>
  other.column === piece.column && other.patch === piece.patch && other.width > piece.width + SAME;

/** @throws RangeError where a rectangle is thinner than a cell */
export function drawMesh(metal: readonly MetalRectangle[], grid: Grid, edges: EdgeTrims): Mesh {
  const xs = drawAxis(
    metal.map((r) => ({ low: r.x0, high: r.x1, crossLow: r.y0, crossHigh: r.y1 })),
    grid.x0,
    grid.dx,
  );
  const ys = drawAxis(
    metal.map((r) => ({ low: r.y0, high: r.y1, crossLow: r.x0, crossHigh: r.x1 })),
    grid.y0,
    grid.dy,
    grid.beyond,
  );
  const left = Math.min(...xs.map((x) => x.low));
  const below = Math.min(...ys.map((y) => y.low));
  // One cell to spare, so that every difference of reactions that occurs is on the grid.
  const nx = Math.max(...xs.map((x) => x.high)) - left + 1;
  const ny = Math.max(...ys.map((y) => y.high)) - below + 1;
  const rectangles = metal.map((r, k): DrawnRectangle => {
    if (xs[k].high <= xs[k].low || ys[k].high <= ys[k].low)
      throw new RangeError(`fullWave: a piece of metal ${r.x1 - r.x0} by ${r.y1 - r.y0} m is smaller than a cell`);
    const gap = (index: number, at: number, origin: number, step: number): number => index - (at - origin) / step;
    const inwards = {
      x0: -gap(xs[k].low, r.x0, grid.x0, grid.dx),
      x1: gap(xs[k].high, r.x1, grid.x0, grid.dx),
      y0: -gap(ys[k].low, r.y0, grid.y0, grid.dy),
      y1: gap(ys[k].high, r.y1, grid.y0, grid.dy),
    };
    const [wide, tall] = [xs[k].high - xs[k].low, ys[k].high - ys[k].low];
    const side = r.kind === 'feed' && r.y1 - r.y0 > r.width * 1.001;
    // Across a column both edges share what is off, so that it stays symmetric: its place is a whole number of cells. Wings
    // beside the slots of an inset feed have one side that is the patch's and one that is the slot's.
    const wing = r.kind === 'patch' && metal.some((p) => p.kind === 'patch' && isWing(r, p));
    const across = (off: number): EdgeTrim => {
      if (side) return NO_TRIM;
      const whole = edges.of(tall, grid.dy, r.y1 - r.y0, off);
      return r.kind === 'patch'
        ? { charge: whole.charge * (1 - CORNER_SHARE), current: whole.current * (1 + CORNER_SHARE) }
        : whole;
    };
    const shared = (inwards.y0 + inwards.y1) / 2;
    return {
      metal: r,
      i0: xs[k].low - left,
      i1: xs[k].high - left,
      j0: ys[k].low - below,
      j1: ys[k].high - below,
      inwards,
      trims: {
        // Where a stub ends exactly does not matter.
        x0: r.kind === 'feed' && !side ? NO_TRIM : edges.of(wide, grid.dx, r.x1 - r.x0, inwards.x0),
        x1: r.kind === 'feed' && !side ? NO_TRIM : edges.of(wide, grid.dx, r.x1 - r.x0, inwards.x1),
        y0: across(wing ? inwards.y0 : shared),
        y1: across(wing ? inwards.y1 : shared),
      },
    };
  });
  const moved: Grid = { ...grid, x0: grid.x0 + left * grid.dx, y0: grid.y0 + below * grid.dy };
  return { grid: moved, nx, ny, rectangles, ...occupy(rectangles, nx, ny) };
}

function occupy(rectangles: readonly DrawnRectangle[], nx: number, ny: number) {
  const owner = new Int32Array(nx * ny).fill(-1);
  rectangles.forEach((r, k) => {
    for (let j = r.j0; j < r.j1; j++)
      for (let i = r.i0; i < r.i1; i++) if (owner[j * nx + i] < 0) owner[j * nx + i] = k;
  });
  const metal = (i: number, j: number): boolean => i >= 0 && j >= 0 && i < nx && j < ny && owner[j * nx + i] >= 0;
  const xEdge = new Int32Array(nx * ny).fill(-1);
  const yEdge = new Int32Array(nx * ny).fill(-1);
  const cellOf: number[] = [];
  for (let j = 0; j < ny; j++)
    for (let i = 0; i < nx; i++) if (metal(i, j) && metal(i + 1, j)) xEdge[j * nx + i] = cellOf.push(j * nx + i) - 1;
  const xCount = cellOf.length;
  for (let j = 0; j < ny; j++)
    for (let i = 0; i < nx; i++) if (metal(i, j) && metal(i, j + 1)) yEdge[j * nx + i] = cellOf.push(j * nx + i) - 1;
  const place: number[] = [];
  for (let c = 0; c < nx * ny; c++) if (owner[c] >= 0) place.push(c);
  const count = place.length;
  const edges = new Int32Array(4 * count);
  const column = (): Float64Array => new Float64Array(count);
  const sums = { currentX: column(), currentY: column(), chargeX: column(), chargeY: column() };
  place.forEach((c, n) => {
    const i = c % nx;
    const j = (c - i) / nx;
    const { trims } = rectangles[owner[c]];
    edges[4 * n] = i > 0 ? xEdge[c - 1] : -1;
    edges[4 * n + 1] = xEdge[c];
    edges[4 * n + 2] = j > 0 ? yEdge[c - nx] : -1;
    edges[4 * n + 3] = yEdge[c];
    const note = (axis: 'X' | 'Y', trim: EdgeTrim): void => {
      sums[`current${axis}`][n] += trim.current;
      sums[`charge${axis}`][n] += trim.charge;
    };
    if (!metal(i, j - 1)) note('X', trims.y0);
    if (!metal(i, j + 1)) note('X', trims.y1);
    if (!metal(i - 1, j)) note('Y', trims.x0);
    if (!metal(i + 1, j)) note('Y', trims.x1);
  });
  return {
    xEdge,
    yEdge,
    cellOf: Int32Array.from(cellOf),
    xCount,
    unknowns: cellOf.length,
    cells: {
      place: Int32Array.from(place),
      rectangle: Int32Array.from(place, (c) => owner[c]),
      edges,
      ...sums,
    },
  };
}
