/** The mesh cut into blocks, a patch with half of each neighbouring line, for a preconditioner of dense inverses. */
import type { DrawnRectangle, Mesh } from './mesh.js';

export interface Block {
  /** Unknowns solved for, and which of them the block answers for: the others overlap its neighbours. */
  readonly unknowns: Int32Array;
  readonly own: Uint8Array;
  /** Position within `unknowns` of the mirror image about the column's centre line; absent where there is none. */
  readonly mirror?: Int32Array;
  /** Equal for blocks whose matrices are equal. */
  readonly key: string;
}

/** Cells between two edges for which one inverse is taken: it only has to be near. */
const SAME_TRIM = 0.15;

/** @param overlap cells by which a block reaches into its neighbours */
export function cutBlocks(mesh: Mesh, overlap: number): Block[] {
  const columns = Math.max(...mesh.rectangles.map((r) => r.metal.column)) + 1;
  const columnOf = columnsOfCells(mesh);
  const blocks: Block[] = [];
  for (let c = 0; c < columns; c++) {
    const rectangles = mesh.rectangles.filter((r) => r.metal.column === c);
    const straight = rectangles.filter((r) => !isSide(r, rectangles));
    const side = rectangles.filter((r) => isSide(r, rectangles));
    const cuts = cutsAlong(straight);
    for (let k = 0; k + 1 < cuts.length; k++)
      blocks.push(blockOf(mesh, columnOf, c, straight, side, cuts[k], cuts[k + 1], overlap));
    if (side.length > 0) blocks.push(sideBlock(mesh, columnOf, c, side));
  }
  return blocks.filter((b) => b.unknowns.length > 0);
}

/** A feed that runs across the column. */
const isSide = (r: DrawnRectangle, all: readonly DrawnRectangle[]): boolean => {
  const patch = all.find((p) => p.metal.kind === 'patch') ?? r;
  const middle = (p: DrawnRectangle): number => p.metal.y0 + p.metal.y1;
  return r.metal.kind === 'feed' && Math.abs(middle(r) - middle(patch)) > r.metal.width;
};

function columnsOfCells(mesh: Mesh): Int32Array {
  const of = new Int32Array(mesh.nx * mesh.ny).fill(-1);
  mesh.cells.place.forEach((place, n) => {
    of[place] = mesh.rectangles[mesh.cells.rectangle[n]].metal.column;
  });
  return of;
}

/** In the middle of every line between patches; a feed line keeps half a patch of itself with the patch it feeds. */
function cutsAlong(rectangles: readonly DrawnRectangle[]): number[] {
  const patches = rectangles.filter((r) => r.metal.kind === 'patch');
  const spans = new Map<number, { i0: number; i1: number }>();
  for (const p of patches) {
    const known = spans.get(p.metal.patch);
    spans.set(p.metal.patch, { i0: Math.min(known?.i0 ?? p.i0, p.i0), i1: Math.max(known?.i1 ?? p.i1, p.i1) });
  }
  const list = [...spans.values()].sort((a, b) => a.i0 - b.i0);
  const low = Math.min(...rectangles.map((r) => r.i0));
  const high = Math.max(...rectangles.map((r) => r.i1));
  const size = list[0].i1 - list[0].i0;
  const cuts = [low];
  for (let at = list[0].i0 - Math.round(size / 2); at > low + size; at -= 2 * size) cuts.push(at);
  for (let k = 0; k + 1 < list.length; k++) cuts.push(Math.round((list[k].i1 + list[k + 1].i0) / 2));
  for (let at = list[list.length - 1].i1 + Math.round(size / 2); at < high - size; at += 2 * size) cuts.push(at);
  cuts.push(high);
  return cuts.sort((a, b) => a - b);
}

function blockOf(
  mesh: Mesh,
  columnOf: Int32Array,
  column: number,
  rectangles: readonly DrawnRectangle[],
  side: readonly DrawnRectangle[],
  from: number,
  to: number,
  overlap: number,
): Block {
  const unknowns: number[] = [];
  const own: number[] = [];
  const centre = rectangles[0].j0 + rectangles[0].j1;
  // The beginning of a feed from the side, where it joins this block.
  const joined = side
    .filter((r) => r.i1 > from - overlap && r.i0 < to + overlap)
    .map((r) => (r.j0 + r.j1 > centre ? { ...r, j1: r.j0 + overlap } : { ...r, j0: r.j1 - overlap }));
  for (let u = 0; u < mesh.unknowns; u++) {
    const place = mesh.cellOf[u];
    if (columnOf[place] !== column) continue;
    const i = place % mesh.nx;
    const j = (place - i) / mesh.nx;
    if (i < from - overlap || i >= to + overlap) continue;
    const straight = within(rectangles, i, j);
    if (!straight && !within(joined, i, j)) continue;
    unknowns.push(u);
    own.push(straight && i >= from && i < to ? 1 : 0);
  }
  const key = [...rectangles, ...joined]
    .filter((r) => r.i1 >= from - overlap && r.i0 <= to + overlap)
    .map((r) =>
      [
        Math.max(r.i0 - from, -overlap - 1),
        Math.min(r.i1 - from, to - from + overlap + 1),
        2 * r.j0 - centre,
        2 * r.j1 - centre,
        r.metal.width.toExponential(9),
        ...Object.values(r.inwards).map((d) => Math.round(d / SAME_TRIM)),
      ].join(' '),
    )
    .join(';');
  const mirror = joined.length > 0 ? undefined : mirrorOf(mesh, unknowns, centre);
  return {
    unknowns: Int32Array.from(unknowns),
    own: Uint8Array.from(own),
    ...(mirror && { mirror }),
    key: `${to - from} ${overlap} ${key}`,
  };
}

const within = (rectangles: readonly DrawnRectangle[], i: number, j: number): boolean =>
  rectangles.some((r) => i >= r.i0 && i < r.i1 && j >= r.j0 && j < r.j1);

function sideBlock(mesh: Mesh, columnOf: Int32Array, column: number, side: readonly DrawnRectangle[]): Block {
  const unknowns: number[] = [];
  for (let u = 0; u < mesh.unknowns; u++) {
    const place = mesh.cellOf[u];
    const i = place % mesh.nx;
    if (columnOf[place] === column && within(side, i, (place - i) / mesh.nx)) unknowns.push(u);
  }
  return {
    unknowns: Int32Array.from(unknowns),
    own: new Uint8Array(unknowns.length).fill(1),
    key: `side ${column}`,
  };
}

/** @param centre sum of the first and the last row's ends, in cells: twice the centre line */
export function mirrorOf(mesh: Mesh, unknowns: readonly number[], centre: number): Int32Array | undefined {
  const at = new Map(unknowns.map((u, n) => [u, n]));
  const mirror = new Int32Array(unknowns.length);
  for (let n = 0; n < unknowns.length; n++) {
    const u = unknowns[n];
    const along = u < mesh.xCount;
    const i = mesh.cellOf[u] % mesh.nx;
    const j = (mesh.cellOf[u] - i) / mesh.nx;
    // A cell j has its image at centre − 1 − j; the edge above it that below the image.
    const image = along ? centre - 1 - j : centre - 2 - j;
    if (image < 0 || image >= mesh.ny) return undefined;
    const v = (along ? mesh.xEdge : mesh.yEdge)[image * mesh.nx + i];
    const found = v < 0 ? undefined : at.get(v);
    if (found === undefined) return undefined;
    mirror[n] = found;
  }
  return mirror;
}
