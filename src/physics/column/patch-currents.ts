/**
 * Reaction of the patches' macro currents on each other through the slab,
 *   Z = jω ∫∫ G_A J·J' + (1/jω) ∫∫ G_q ρ ρ',  ρ = dJ/dx
 * (Pozar 1982, Newman & Tulyathan 1981 for patches; from memory). Points and distances depend on the layout alone, so
 * each distinct pair becomes a row of weights on the table of the potentials.
 */
import type { MacroPatch } from './engine.js';
import { currentPoints, NEAR_ACROSS, sameShape } from './macro-current.js';
import type { SlabIntegrals } from './slab-integrals.js';
import { addWeights, type SlabPotentials } from './slab-potentials.js';

/** Weights from table entry `first` on. */
interface Weights {
  readonly first: number;
  readonly vector: Float64Array;
  readonly charge: Float64Array;
}

export interface ReactionPlan {
  readonly count: number;
  /** For patches m ≥ n: row of their pair. */
  readonly row: Int32Array;
  readonly rows: readonly Weights[];
}

/** Lengths closer than this are the same, m. */
const GRAIN = 1e-9;

/** Largest distance between two points of the currents, m. */
export function patchReach(patches: readonly MacroPatch[]): number {
  let reach = 0;
  for (const a of patches)
    for (const b of patches) {
      const x = Math.abs(a.x - b.x) + (a.length + b.length) / 2;
      const y = Math.abs(a.y - b.y) + (a.width + b.width) / 2;
      reach = Math.max(reach, Math.hypot(x, y));
    }
  return reach;
}

export function reactionPlan(patches: readonly MacroPatch[], integrals: SlabIntegrals): ReactionPlan {
  const count = patches.length;
  const row = new Int32Array((count * (count + 1)) / 2);
  const rows: Weights[] = [];
  const known = new Map<string, number>();
  const shapes: MacroPatch[] = [];
  const shape = patches.map((patch) => {
    const found = shapes.findIndex((other) => sameShape(patch, other));
    return found < 0 ? shapes.push(patch) - 1 : found;
  });
  const grains = (v: number): number => Math.round(v / GRAIN);
  for (let m = 0, q = 0; m < count; m++) {
    for (let n = 0; n <= m; n++, q++) {
      const [a, b] = [patches[m], patches[n]];
      const [low, high] = [Math.min(shape[m], shape[n]), Math.max(shape[m], shape[n])];
      const key = `${low} ${high} ${grains(Math.abs(a.x - b.x))} ${grains(Math.abs(a.y - b.y))}`;
      let found = known.get(key);
      if (found === undefined) {
        found = rows.length;
        known.set(key, found);
        rows.push(pairWeights(a, b, integrals.distance));
      }
      row[q] = found;
    }
  }
  return { count, row, rows };
}

function pairWeights(a: MacroPatch, b: MacroPatch, distance: Float64Array): Weights {
  const vector = new Float64Array(distance.length);
  const charge = new Float64Array(distance.length);
  const apart = Math.hypot(a.x - b.x, a.y - b.y);
  const size = Math.max(a.length, a.width, b.length, b.width);
  // Smooth integrands from afar; different orders keep the points of a current and itself apart.
  const [along, across] = apart > 4 * size ? [5, 3] : apart > 1.8 * size ? [6, 4] : [10, NEAR_ACROSS];
  const self = apart === 0 ? 1 : 0;
  const p = currentPoints(a, along, across);
  const q = currentPoints(b, along + self, across + self);
  for (let i = 0; i < p.x.length; i++)
    for (let k = 0; k < q.x.length; k++) {
      const r = Math.hypot(p.x[i] - q.x[k], p.y[i] - q.y[k]);
      addWeights(distance, r, p.current[i] * q.current[k], vector, p.charge[i] * q.charge[k], charge);
    }
  let [first, last] = [0, vector.length - 1];
  while (first < last && vector[first] === 0 && charge[first] === 0) first++;
  while (last > first && vector[last] === 0 && charge[last] === 0) last--;
  return { first, vector: vector.slice(first, last + 1), charge: charge.slice(first, last + 1) };
}

/** Full symmetric matrices, row-major: reactions and, apart, the resistance of the guided wave, ohm. */
export interface Reaction {
  readonly n: number;
  readonly re: Float64Array;
  readonly im: Float64Array;
  readonly guided: Float64Array;
}

/** Of a current on itself only the resistance is given: its reactance is singular and belongs to the line. */
export function patchReaction(plan: ReactionPlan, slab: SlabPotentials): Reaction {
  const { omega } = slab;
  const rows = plan.rows.length;
  const zr = new Float64Array(rows);
  const zi = new Float64Array(rows);
  const zg = new Float64Array(rows);
  plan.rows.forEach(({ first, vector, charge }, p) => {
    let [ar, ai, qr, qi, g] = [0, 0, 0, 0, 0];
    for (let i = 0, d = first; i < vector.length; i++, d++) {
      ar += vector[i] * slab.re[0][d];
      ai += vector[i] * slab.im[0][d];
      qr += charge[i] * slab.re[1][d];
      qi += charge[i] * slab.im[1][d];
      g += charge[i] * slab.guided[1][d];
    }
    zr[p] = -omega * ai + qi / omega;
    zi[p] = omega * ar - qr / omega;
    zg[p] = g / omega;
  });
  const n = plan.count;
  const out = { n, re: new Float64Array(n * n), im: new Float64Array(n * n), guided: new Float64Array(n * n) };
  for (let m = 0, q = 0; m < n; m++) {
    for (let k = 0; k <= m; k++, q++) {
      const p = plan.row[q];
      out.re[m * n + k] = out.re[k * n + m] = zr[p];
      out.im[m * n + k] = out.im[k * n + m] = m === k ? 0 : zi[p];
      out.guided[m * n + k] = out.guided[k * n + m] = zg[p];
    }
  }
  return out;
}
