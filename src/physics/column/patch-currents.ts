/**
 * Reaction of the patches' macro currents on each other through the slab,
 *   Z = jω ∫∫ G_A J·J' + (1/jω) ∫∫ G_q ρ ρ',  ρ = dJ/dx
 * (Pozar 1982, Newman & Tulyathan 1981 for patches; from memory). Points and distances depend on the layout alone, so
 * each distinct pair becomes rows of weights on the table of the potentials.
 */
import type { MacroPatch } from './engine.js';
import { type CurrentPoints, currentExtent, linePoints, patchPoints, sameShape } from './macro-current.js';
import type { SlabIntegrals } from './slab-integrals.js';
import { addWeight, type SlabPotentials } from './slab-potentials.js';

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
  /**
   * Resistance by the whole currents; reactance likewise between columns, but by the patches alone within one: there the
   * lines' near fields belong to the lines and junctions of the circuit.
   */
  readonly rows: readonly { readonly resistance: Weights; readonly reactance: Weights }[];
}

/** Lengths closer than this are the same, m. */
const GRAIN = 1e-9;

/** Largest distance between two points of the currents, m. */
export function patchReach(patches: readonly MacroPatch[]): number {
  const extents = patches.map(currentExtent);
  let reach = 0;
  patches.forEach((a, i) => {
    patches.forEach((b, k) => {
      const x = Math.abs(a.x - b.x) + extents[i].x + extents[k].x;
      const y = Math.abs(a.y - b.y) + extents[i].y + extents[k].y;
      reach = Math.max(reach, Math.hypot(x, y));
    });
  });
  return reach;
}

export function reactionPlan(patches: readonly MacroPatch[], integrals: SlabIntegrals): ReactionPlan {
  const count = patches.length;
  const row = new Int32Array((count * (count + 1)) / 2);
  const rows: ReactionPlan['rows'][number][] = [];
  const known = new Map<string, number>();
  const shapes: MacroPatch[] = [];
  const shape = patches.map((patch) => {
    const found = shapes.findIndex((other) => sameShape(patch, other));
    return found < 0 ? shapes.push(patch) - 1 : found;
  });
  const grains = (v: number): number => Math.round(v / GRAIN);
  for (let m = 0, q = 0; m < count; m++) {
    for (let n = 0; n <= m; n++, q++) {
      const [a, b] = shape[m] <= shape[n] ? [m, n] : [n, m];
      // Of one shape, either may lie on either side (reciprocity).
      const dx = grains(patches[b].x - patches[a].x);
      const apart = shape[a] === shape[b] ? Math.abs(dx) : dx;
      const one = patches[a].column === patches[b].column;
      const key = `${shape[a]} ${shape[b]} ${apart} ${grains(Math.abs(patches[a].y - patches[b].y))} ${one}`;
      let found = known.get(key);
      if (found === undefined) {
        found = rows.length;
        known.set(key, found);
        rows.push(pair(patches[a], patches[b], one, integrals.distance));
      }
      row[q] = found;
    }
  }
  return { count, row, rows };
}

function pair(a: MacroPatch, b: MacroPatch, one: boolean, distance: Float64Array): ReactionPlan['rows'][number] {
  const apart = Math.hypot(a.x - b.x, a.y - b.y);
  const size = Math.max(a.length, a.width, b.length, b.width);
  // Smooth integrands from afar; different orders keep the points of a current and itself apart.
  const [along, across, thin] = apart > 4 * size ? [5, 3, 1] : apart > 1.8 * size ? [6, 4, 1] : [10, 7, 2];
  const self = apart === 0 ? 1 : 0;
  const [pa, pb] = [patchPoints(a, along, across), patchPoints(b, along + self, across + self)];
  const [la, lb] = [linePoints(a, along, thin), linePoints(b, along + self, thin + self)];
  const patchesOnly = empty(distance);
  react(pa, pb, distance, patchesOnly);
  const whole = { vector: patchesOnly.vector.slice(), charge: patchesOnly.charge.slice() };
  for (const line of lb) react(pa, line, distance, whole);
  for (const line of la) for (const other of [pb, ...lb]) react(line, other, distance, whole);
  const resistance = trim(whole);
  return { resistance, reactance: one ? trim(patchesOnly) : resistance };
}

const empty = (distance: Float64Array): { vector: Float64Array; charge: Float64Array } => ({
  vector: new Float64Array(distance.length),
  charge: new Float64Array(distance.length),
});

function react(p: CurrentPoints, q: CurrentPoints, distance: Float64Array, out: ReturnType<typeof empty>): void {
  for (let i = 0; i < p.x.length; i++)
    for (let k = 0; k < q.x.length; k++) {
      const r = Math.hypot(p.x[i] - q.x[k], p.y[i] - q.y[k]);
      addWeight(distance, r, p.current[i] * q.current[k], out.vector);
      addWeight(distance, r, p.charge[i] * q.charge[k], out.charge);
    }
}

function trim({ vector, charge }: ReturnType<typeof empty>): Weights {
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
  /** Resistance of each patch without its lines, ohm. */
  readonly bare: Float64Array;
}

/** Σ of weights on a table from their first entry on. */
function weigh(weights: Float64Array, first: number, table: Float64Array): number {
  let sum = 0;
  for (let i = 0; i < weights.length; i++) sum += weights[i] * table[first + i];
  return sum;
}

/** Of a current on itself only the resistance is given: its reactance is singular and belongs to the line. */
export function patchReaction(plan: ReactionPlan, slab: SlabPotentials): Reaction {
  const { omega } = slab;
  const rows = plan.rows.length;
  const zr = new Float64Array(rows);
  const zi = new Float64Array(rows);
  const zg = new Float64Array(rows);
  plan.rows.forEach(({ resistance: r, reactance: x }, p) => {
    zr[p] = -omega * weigh(r.vector, r.first, slab.im[0]) + weigh(r.charge, r.first, slab.im[1]) / omega;
    zi[p] = omega * weigh(x.vector, x.first, slab.re[0]) - weigh(x.charge, x.first, slab.re[1]) / omega;
    zg[p] = weigh(r.charge, r.first, slab.guided[1]) / omega;
  });
  const n = plan.count;
  const bare = Float64Array.from({ length: n }, (_, m) => {
    const { reactance: x } = plan.rows[plan.row[(m * (m + 3)) / 2]];
    return -omega * weigh(x.vector, x.first, slab.im[0]) + weigh(x.charge, x.first, slab.im[1]) / omega;
  });
  const out = { n, bare, re: new Float64Array(n * n), im: new Float64Array(n * n), guided: new Float64Array(n * n) };
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
