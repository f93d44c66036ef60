import type { Run } from './section-mesh.js';

/**
 * Straight elements of charge in a section over ground, mirrored at y = 0. Structure of arrays: the assembly over them
 * takes most of the time of a cross-section.
 *
 * An element near a corner of the strip carries the corner's own density r^−a, as a stair of pieces.
 */
export interface Elements {
  readonly count: number;
  /** Start, unit vector along, length of each element. */
  readonly y: Float64Array;
  readonly z: Float64Array;
  readonly uy: Float64Array;
  readonly uz: Float64Array;
  readonly length: Float64Array;
  /** Mean square of the density over its squared mean; 1 where it is even. */
  readonly peaking: Float64Array;
  /** Pieces of element j are `firstPiece[j]` to `firstPiece[j + 1]` − 1: start from the element's, length, density over the mean. */
  readonly firstPiece: Int32Array;
  readonly pieceStart: Float64Array;
  readonly pieceLength: Float64Array;
  readonly pieceDensity: Float64Array;
}

/** Pieces of an element that reaches the corner, each this much closer than the one before, and the shrinking factor of the rest. */
const PIECES_AT_CORNER = 8;
const SHRINK = 0.35;
/** An element whose far end is less than this times as far from the corner as its near end is taken as even. */
const EVEN_BELOW = 1.6;

export function elementsOf(runs: readonly Run[]): Elements {
  const count = runs.reduce((n, run) => n + run.nodes.length - 1, 0);
  const make = () => new Float64Array(count);
  const e = { count, y: make(), z: make(), uy: make(), uz: make(), length: make(), peaking: make().fill(1) };
  const firstPiece = new Int32Array(count + 1);
  const pieces: Piece[] = [];
  let i = 0;
  for (const { nodes, cornerStart, cornerEnd } of runs) {
    const distance = (a: readonly [number, number], b: readonly [number, number]) =>
      Math.hypot(b[0] - a[0], b[1] - a[1]);
    const [start, end] = [nodes[0], nodes[nodes.length - 1]];
    const whole = distance(start, end);
    for (let k = 0; k + 1 < nodes.length; k++, i++) {
      const [a, b] = [nodes[k], nodes[k + 1]];
      const length = distance(a, b);
      e.y[i] = a[0];
      e.z[i] = a[1];
      e.uy[i] = (b[0] - a[0]) / length;
      e.uz[i] = (b[1] - a[1]) / length;
      e.length[i] = length;
      const backwards = distance(start, a) + distance(start, b) > whole;
      const near = k === 0 || k + 2 === nodes.length ? 0 : backwards ? distance(b, end) : distance(start, a);
      const exponent = backwards ? cornerEnd : cornerStart;
      if (exponent > 0) e.peaking[i] = peaking(near, near + length, exponent);
      firstPiece[i] = pieces.length;
      for (const piece of stair(near, length, exponent))
        pieces.push(backwards ? { ...piece, start: length - piece.start - piece.length } : piece);
    }
  }
  firstPiece[count] = pieces.length;
  return {
    ...e,
    firstPiece,
    pieceStart: Float64Array.from(pieces, (p) => p.start),
    pieceLength: Float64Array.from(pieces, (p) => p.length),
    pieceDensity: Float64Array.from(pieces, (p) => p.density),
  };
}

interface Piece {
  readonly start: number;
  readonly length: number;
  readonly density: number;
}

/** The density r^−a of an element from r = near on, in even pieces of the same charge; lengths from its near end. */
function stair(near: number, length: number, a: number): Piece[] {
  const far = near + length;
  if (a === 0 || far < EVEN_BELOW * near) return [{ start: 0, length, density: 1 }];
  const nodes: number[] = [far];
  if (near > 0) {
    const count = Math.ceil(Math.log(far / near) / -Math.log(SHRINK)) + 1;
    for (let i = 1; i < count; i++) nodes.push(far * (near / far) ** (i / count));
  } else for (let i = 1; i < PIECES_AT_CORNER; i++) nodes.push(far * SHRINK ** i);
  nodes.push(near);
  nodes.reverse();
  const charge = (r1: number, r2: number): number => r2 ** (1 - a) - r1 ** (1 - a);
  const mean = charge(near, far) / length;
  return nodes.slice(1).map((r, i) => ({
    start: nodes[i] - near,
    length: r - nodes[i],
    density: charge(nodes[i], r) / (r - nodes[i]) / mean,
  }));
}

/** Mean square over squared mean of r^−a between r = near and far; a < 1/2. */
function peaking(near: number, far: number, a: number): number {
  const mean = (far ** (1 - a) - near ** (1 - a)) / (1 - a);
  const square = (far ** (1 - 2 * a) - near ** (1 - 2 * a)) / (1 - 2 * a);
  return (square * (far - near)) / (mean * mean);
}

/**
 * Potential × ε0 at (y, z) of element j with a mean density of one, its mirror at y = 0 and the negative images of both in
 * the ground z = 0: −(1/2π) ∫ ln r, exact for each piece.
 */
export function elementPotential(e: Elements, j: number, y: number, z: number): number {
  let sum = 0;
  const [uy, uz] = [e.uy[j], e.uz[j]];
  for (let p = e.firstPiece[j]; p < e.firstPiece[j + 1]; p++) {
    const y0 = e.y[j] + e.pieceStart[p] * uy;
    const z0 = e.z[j] + e.pieceStart[p] * uz;
    const length = e.pieceLength[p];
    const near = logIntegral(y0 - y, z0 - z, uy, uz, length) + logIntegral(y0 + y, z0 - z, uy, uz, length);
    const image = logIntegral(y0 - y, z0 + z, uy, uz, length) + logIntegral(y0 + y, z0 + z, uy, uz, length);
    sum += e.pieceDensity[p] * (near - image);
  }
  return -sum / (2 * Math.PI);
}

/** ∫ ln r along a piece that starts at (dy, dz) from the observer, less its length, which cancels between the four. */
function logIntegral(dy: number, dz: number, uy: number, uz: number, length: number): number {
  const from = dy * uy + dz * uz;
  const to = from + length;
  const away = Math.abs(dy * uz - dz * uy);
  const r1 = from * from + away * away;
  const r2 = to * to + away * away;
  const sum = 0.5 * ((r2 > 0 ? to * Math.log(r2) : 0) - (r1 > 0 ? from * Math.log(r1) : 0));
  return away > 0 ? sum + away * Math.atan2(away * length, away * away + from * to) : sum;
}

/** Field × ε0 along (ny, nz) at (y, z) of element j and its three images; no point of the element itself has any. */
export function elementField(e: Elements, j: number, y: number, z: number, ny: number, nz: number): number {
  let [fy, fz] = [0, 0];
  const [uy, uz] = [e.uy[j], e.uz[j]];
  for (let p = e.firstPiece[j]; p < e.firstPiece[j + 1]; p++) {
    const y0 = e.y[j] + e.pieceStart[p] * uy;
    const z0 = e.z[j] + e.pieceStart[p] * uz;
    const density = e.pieceDensity[p];
    for (let image = 0; image < 4; image++) {
      const sy = image & 1 ? -1 : 1;
      const sz = image & 2 ? -1 : 1;
      const dy = y0 - sy * y;
      const dz = z0 - sz * z;
      const from = dy * uy + dz * uz;
      const to = from + e.pieceLength[p];
      const cross = dy * uz - dz * uy;
      const along = 0.5 * Math.log((to * to + cross * cross) / (from * from + cross * cross));
      // On its own line, to rounding, an element has no field across: its jump stands on the diagonal.
      const across =
        Math.abs(cross) < 1e-9 * e.pieceLength[p] ? 0 : Math.atan2(cross * e.pieceLength[p], cross * cross + from * to);
      fy -= density * sz * sy * (uy * along + uz * across);
      fz -= density * (uz * along - uy * across);
    }
  }
  return (ny * fy + nz * fz) / (2 * Math.PI);
}
