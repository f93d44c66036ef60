/** Dense inverses of the blocks of a mesh, one factorisation for all that are equal. */
import {
  type ComplexLu,
  type ComplexMatrix,
  complexMatrix,
  factorise,
  solveInPlace,
} from '../../numerics/complex-lu.js';
import type { LinearMap } from '../../numerics/gmres.js';
import type { Block } from './blocks.js';
import type { LocalMatrix } from './local-terms.js';
import type { Mesh } from './mesh.js';
import type { SlabReactions } from './slab-reactions.js';

/** Currents even and odd about the column's centre line do not meet: two systems of half the size. */
interface Split {
  /** Pairs (u, mirror) as positions in the block, u ≤ mirror; where both are one the pair is single. */
  readonly first: Int32Array;
  readonly second: Int32Array;
  /** Factorised when first asked for: a symmetric column fed along its axis never has odd currents. */
  readonly even: () => ComplexLu;
  readonly odd: () => ComplexLu;
  /** Pairs that the even, and the odd, system has; index into `first`. */
  readonly inEven: Int32Array;
  readonly inOdd: Int32Array;
}

type Inverse = { readonly whole: ComplexLu } | { readonly split: Split };

/**
 * Each block is solved alone and answers for its own unknowns (restricted additive Schwarz: X.-C. Cai and M. Sarkis, SIAM
 * J. Sci. Comput. 21(2), 1999).
 */
export function blockInverse(
  mesh: Mesh,
  blocks: readonly Block[],
  reactions: SlabReactions,
  local: LocalMatrix,
): LinearMap {
  const known = new Map<string, Inverse>();
  const inverses = blocks.map((block) => {
    let found = known.get(block.key);
    if (!found) {
      const matrix = blockMatrix(mesh, block, reactions, local);
      found = block.mirror ? { split: splitMatrix(mesh, block, block.mirror, matrix) } : { whole: factorise(matrix) };
      known.set(block.key, found);
    }
    return found;
  });
  const most = Math.max(...blocks.map((b) => b.unknowns.length));
  const re = new Float64Array(most);
  const im = new Float64Array(most);
  return (x, y) => {
    blocks.forEach((block, b) => {
      const { unknowns, own } = block;
      const n = unknowns.length;
      for (let k = 0; k < n; k++) {
        re[k] = x.re[unknowns[k]];
        im[k] = x.im[unknowns[k]];
      }
      const inverse = inverses[b];
      if ('whole' in inverse) solveInPlace(inverse.whole, re.subarray(0, n), im.subarray(0, n));
      else solveSplit(mesh, block, inverse.split, re, im);
      for (let k = 0; k < n; k++)
        if (own[k]) {
          y.re[unknowns[k]] = re[k];
          y.im[unknowns[k]] = im[k];
        }
    });
  };
}

function blockMatrix(mesh: Mesh, block: Block, r: SlabReactions, local: LocalMatrix): ComplexMatrix {
  const { unknowns } = block;
  const n = unknowns.length;
  const { nx, cellOf, xCount } = mesh;
  const matrix = complexMatrix(n);
  const i = Int32Array.from(unknowns, (u) => cellOf[u] % nx);
  const j = Int32Array.from(unknowns, (u) => Math.floor(cellOf[u] / nx));
  const at = (a: number, b: number): number => Math.abs(b) * nx + Math.abs(a);
  for (let a = 0; a < n; a++) {
    const alongA = unknowns[a] < xCount;
    for (let b = a; b < n; b++) {
      const di = i[b] - i[a];
      const dj = j[b] - j[a];
      const alongB = unknowns[b] < xCount;
      const p = a * n + b;
      const o = at(di, dj);
      if (alongA && alongB) {
        const m = at(di - 1, dj);
        const q = at(di + 1, dj);
        matrix.re[p] = r.axRe[o] + 2 * r.qRe[o] - r.qRe[m] - r.qRe[q];
        matrix.im[p] = r.axIm[o] + 2 * r.qIm[o] - r.qIm[m] - r.qIm[q];
      } else if (!alongA && !alongB) {
        const m = at(di, dj - 1);
        const q = at(di, dj + 1);
        matrix.re[p] = r.ayRe[o] + 2 * r.qRe[o] - r.qRe[m] - r.qRe[q];
        matrix.im[p] = r.ayIm[o] + 2 * r.qIm[o] - r.qIm[m] - r.qIm[q];
      } else {
        // Charges: + in the lower cell of each, − in the upper.
        const sx = alongA ? -1 : 1;
        const sy = alongA ? 1 : -1;
        const u = at(di + sx, dj);
        const v = at(di, dj + sy);
        const w = at(di + sx, dj + sy);
        matrix.re[p] = r.qRe[o] - r.qRe[u] - r.qRe[v] + r.qRe[w];
        matrix.im[p] = r.qIm[o] - r.qIm[u] - r.qIm[v] + r.qIm[w];
      }
      matrix.re[b * n + a] = matrix.re[p];
      matrix.im[b * n + a] = matrix.im[p];
    }
  }
  const position = new Map<number, number>();
  unknowns.forEach((u, k) => {
    position.set(u, k);
  });
  for (let k = 0; k < n; k++) {
    const u = unknowns[k];
    for (let e = local.start[u]; e < local.start[u + 1]; e++) {
      const c = position.get(local.column[e]);
      if (c === undefined) continue;
      matrix.re[k * n + c] += local.re[e];
      matrix.im[k * n + c] += local.im[e];
    }
  }
  return matrix;
}

/** Sign of a mirror image: currents along x keep theirs, those across turn. */
const signOf = (mesh: Mesh, u: number): 1 | -1 => (u < mesh.xCount ? 1 : -1);

const once = <T>(make: () => T): (() => T) => {
  let made: T | undefined;
  return () => {
    made ??= make();
    return made;
  };
};

function splitMatrix(mesh: Mesh, block: Block, mirror: Int32Array, z: ComplexMatrix): Split {
  const first: number[] = [];
  const second: number[] = [];
  mirror.forEach((m, k) => {
    if (k > m) return;
    first.push(k);
    second.push(m);
  });
  // One that is its own image is even along x and odd across.
  const members = (parity: 1 | -1): Int32Array =>
    Int32Array.from(
      first.map((_, p) => p).filter((p) => first[p] !== second[p] || signOf(mesh, block.unknowns[first[p]]) === parity),
    );
  const part = (parity: 1 | -1, list: Int32Array): ComplexLu => {
    const n = list.length;
    const matrix = complexMatrix(n);
    for (let a = 0; a < n; a++)
      for (let b = 0; b < n; b++) {
        const row = first[list[a]] * z.n;
        const k = first[list[b]];
        const m = second[list[b]];
        const alone = first[list[a]] === second[list[a]];
        // Pairs are (u + s m)/√2, single ones as they are.
        if (k === m) {
          const f = alone ? 1 : Math.SQRT2;
          matrix.re[a * n + b] = f * z.re[row + k];
          matrix.im[a * n + b] = f * z.im[row + k];
        } else {
          const s = parity * signOf(mesh, block.unknowns[k]);
          const f = alone ? Math.SQRT1_2 : 1;
          matrix.re[a * n + b] = f * (z.re[row + k] + s * z.re[row + m]);
          matrix.im[a * n + b] = f * (z.im[row + k] + s * z.im[row + m]);
        }
      }
    return factorise(matrix);
  };
  const inEven = members(1);
  const inOdd = members(-1);
  return {
    first: Int32Array.from(first),
    second: Int32Array.from(second),
    even: once(() => part(1, inEven)),
    odd: once(() => part(-1, inOdd)),
    inEven,
    inOdd,
  };
}

/** Below it, relative, a part is what rounding leaves of a current of the other symmetry. */
const ROUNDING = 1e-10;

const size = (re: Float64Array, im: Float64Array): number => {
  let most = 0;
  for (let i = 0; i < re.length; i++) most = Math.max(most, Math.abs(re[i]), Math.abs(im[i]));
  return most;
};

function solveSplit(mesh: Mesh, block: Block, split: Split, re: Float64Array, im: Float64Array): void {
  const { first, second } = split;
  const half = (list: Int32Array, parity: 1 | -1): [Float64Array, Float64Array] => {
    const r = new Float64Array(list.length);
    const i = new Float64Array(list.length);
    for (let p = 0; p < list.length; p++) {
      const k = first[list[p]];
      const m = second[list[p]];
      const s = parity * signOf(mesh, block.unknowns[k]);
      r[p] = k === m ? re[k] : (re[k] + s * re[m]) * Math.SQRT1_2;
      i[p] = k === m ? im[k] : (im[k] + s * im[m]) * Math.SQRT1_2;
    }
    return [r, i];
  };
  const even = half(split.inEven, 1);
  const odd = half(split.inOdd, -1);
  const [evenSize, oddSize] = [size(...even), size(...odd)];
  if (evenSize > ROUNDING * oddSize) solveInPlace(split.even(), ...even);
  if (oddSize > ROUNDING * evenSize) solveInPlace(split.odd(), ...odd);
  const back = (list: Int32Array, parity: 1 | -1, [r, i]: readonly [Float64Array, Float64Array]): void => {
    for (let p = 0; p < list.length; p++) {
      const k = first[list[p]];
      const m = second[list[p]];
      if (k === m) {
        re[k] = r[p];
        im[k] = i[p];
        continue;
      }
      const s = parity * signOf(mesh, block.unknowns[k]);
      // The even part writes, the odd part adds: every pair is in both.
      if (parity === 1) {
        re[k] = r[p] * Math.SQRT1_2;
        im[k] = i[p] * Math.SQRT1_2;
        re[m] = s * re[k];
        im[m] = s * im[k];
      } else {
        re[k] += r[p] * Math.SQRT1_2;
        im[k] += i[p] * Math.SQRT1_2;
        re[m] += s * r[p] * Math.SQRT1_2;
        im[m] += s * i[p] * Math.SQRT1_2;
      }
    }
  };
  back(split.inEven, 1, even);
  back(split.inOdd, -1, odd);
}
