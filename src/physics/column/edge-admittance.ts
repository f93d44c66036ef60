/**
 * Self and mutual admittances of the two edges of one patch through the slab: uniform magnetic currents along y, each
 * pair a line integral of the potentials,
 *   Y = s_m s_n { jω ∫ C(v) F(r) dv + (1/jω) Σ ± M(r) },
 * C the overlap of the two widths, the sum over the charges at their ends. Of an edge on itself only the conductance is
 * taken: its susceptance is the open-end length of the line. Which distances occur depends on the layout alone, so each
 * pair of pulses is a row of weights on the table of the potentials.
 */
import { gaussLegendre } from '../../numerics/gauss-legendre.js';
import type { RadiatingEdge } from './engine.js';
import type { SlabIntegrals } from './slab-integrals.js';
import { addWeights, type SlabPotentials } from './slab-potentials.js';

export interface EdgePlan {
  /** Weights on r·F and r·M of the distinct pulse pairs. */
  readonly pairs: readonly { readonly vector: Float64Array; readonly charge: Float64Array }[];
  /** For each patch, edges (near, near), (near, far), (far, far): indices into `pairs` for pulses 00, 01, 10, 11; −1 where absent. */
  readonly index: Int32Array;
}

/** Positions closer than this are the same, m. */
const GRAIN = 1e-10;

const EDGE_PAIRS = [
  [0, 0],
  [0, 1],
  [1, 1],
] as const;

/** Largest distance between points of one patch's edges, m. */
export function edgeReach(edges: readonly RadiatingEdge[]): number {
  let reach = 0;
  for (let m = 0; m < edges.length; m += 2)
    reach = Math.max(
      reach,
      Math.hypot(
        edges[m].x - edges[m + 1].x,
        Math.max(...edges[m].pulses.map((p) => p.width), ...edges[m + 1].pulses.map((p) => p.width)),
      ),
    );
  return reach;
}

/** @param edges near and far edge of every patch in turn */
export function edgePlan(edges: readonly RadiatingEdge[], integrals: SlabIntegrals): EdgePlan {
  const pairs: EdgePlan['pairs'][number][] = [];
  const known = new Map<string, number>();
  const index = new Int32Array(6 * edges.length).fill(-1);
  for (let m = 0; m < edges.length; m += 2) {
    const dx = Math.round(Math.abs(edges[m].x - edges[m + 1].x) / GRAIN);
    EDGE_PAIRS.forEach(([i, j], which) => {
      edges[m + i].pulses.forEach((a, s) => {
        edges[m + j].pulses.forEach((b, t) => {
          const apart = i === j ? 0 : dx;
          const widths = [Math.round(a.width / GRAIN), Math.round(b.width / GRAIN)];
          const key = `${Math.min(...widths)} ${Math.max(...widths)} ${apart}`;
          let found = known.get(key);
          if (found === undefined) {
            found = pairs.length;
            known.set(key, found);
            pairs.push(pulsePair(a.width, b.width, apart * GRAIN, integrals.distance));
          }
          index[6 * m + 4 * which + 2 * s + t] = found;
        });
      });
    });
  }
  return { pairs, index };
}

function pulsePair(a: number, b: number, dx: number, distance: Float64Array): EdgePlan['pairs'][number] {
  const outer = (a + b) / 2;
  const inner = Math.abs(a - b) / 2;
  const rule = gaussLegendre(12);
  const vector = new Float64Array(distance.length);
  const charge = new Float64Array(distance.length);
  // Mirror halves: offsets v and −v are the same distance.
  for (const [from, to] of [
    [0, inner],
    [inner, outer],
  ]) {
    if (to - from < GRAIN) continue;
    for (let i = 0; i < rule.nodes.length; i++) {
      const v = (from + to) / 2 + ((to - from) / 2) * rule.nodes[i];
      const overlap = v <= inner ? Math.min(a, b) : outer - v;
      addWeights(distance, Math.hypot(dx, v), (to - from) * rule.weights[i] * overlap, vector, 0, charge);
    }
  }
  addWeights(distance, Math.hypot(dx, inner), 0, vector, 2, charge);
  addWeights(distance, Math.hypot(dx, outer), 0, vector, -2, charge);
  const last = Math.max(
    vector.findLastIndex((w) => w !== 0),
    charge.findLastIndex((w) => w !== 0),
  );
  return { vector: vector.slice(0, last + 1), charge: charge.slice(0, last + 1) };
}

/** For each patch Y of (near, near), (near, far), (far, far), S; diagonal ones are real. */
export interface EdgeAdmittance {
  readonly re: Float64Array;
  readonly im: Float64Array;
}

export function edgeAdmittance(edges: readonly RadiatingEdge[], plan: EdgePlan, slab: SlabPotentials): EdgeAdmittance {
  const { omega } = slab;
  const count = plan.pairs.length;
  const pr = new Float64Array(count);
  const pi = new Float64Array(count);
  plan.pairs.forEach(({ vector, charge }, p) => {
    let [fr, fi, mr, mi] = [0, 0, 0, 0];
    for (let d = 0; d < vector.length; d++) {
      fr += vector[d] * slab.re[2][d];
      fi += vector[d] * slab.im[2][d];
      mr += charge[d] * slab.re[3][d];
      mi += charge[d] * slab.im[3][d];
    }
    pr[p] = -omega * fi + mi / omega;
    pi[p] = omega * fr - mr / omega;
  });
  const out = { re: new Float64Array((3 * edges.length) / 2), im: new Float64Array((3 * edges.length) / 2) };
  for (let m = 0, q = 0; m < edges.length; m += 2) {
    for (let which = 0; which < 3; which++, q++) {
      const [a, b] = [edges[m + EDGE_PAIRS[which][0]], edges[m + EDGE_PAIRS[which][1]]];
      for (let s = 0; s < a.pulses.length; s++) {
        for (let t = 0; t < b.pulses.length; t++) {
          const p = plan.index[6 * m + 4 * which + 2 * s + t];
          const density = a.sign * b.sign * a.pulses[s].density * b.pulses[t].density;
          out.re[q] += density * pr[p];
          if (which === 1) out.im[q] += density * pi[p];
        }
      }
    }
  }
  return out;
}
