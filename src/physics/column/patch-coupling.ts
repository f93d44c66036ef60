/**
 * Admittances between all patch edges: within a patch those of its own edges, between patches the reaction of their
 * macro currents, in one normalisation.
 *
 * With G the 2 × 2 conductance of a patch's edges and e = (−1, +1) its cavity mode, what the patch sends into the mode's
 * field for edge voltages v is a = uᵀv, u = G e/√(eᵀG e); the amplitude's square is twice the power. Two patches then meet
 * in u ρ u'ᵀ, ρ = Z/√(R R') of their macro currents. G − u uᵀ and Re ρ are positive (Cauchy–Schwarz; power of any
 * currents), so that the board is passive whatever the constants of the edges.
 */
import type { ComplexMatrix } from '../../numerics/complex-lu.js';
import type { EdgeAdmittance } from './edge-admittance.js';
import type { CircuitEdge } from './layout-circuit.js';
import type { Reaction } from './patch-currents.js';

export interface PatchCoupling {
  readonly patches: number;
  /** u of every patch: near, far, √S. */
  readonly projection: Float64Array;
  readonly admittance: EdgeAdmittance;
  /** ρ, full symmetric, diagonal real 1 and, apart, its part in the guided wave. */
  readonly re: Float64Array;
  readonly im: Float64Array;
  readonly guided: Float64Array;
  /** R of every patch's macro current, ohm. */
  readonly resistance: Float64Array;
}

export function patchCoupling(
  edges: readonly CircuitEdge[],
  admittance: EdgeAdmittance,
  reaction: Reaction,
): PatchCoupling {
  const { n } = reaction;
  const projection = new Float64Array(2 * n);
  const resistance = new Float64Array(n);
  for (let p = 0; p < n; p++) {
    const [a, b, d] = [admittance.re[3 * p], admittance.re[3 * p + 1], admittance.re[3 * p + 2]];
    const s = edges[2 * p].sign;
    const t = edges[2 * p + 1].sign;
    const [near, far] = [a * s + b * t, b * s + d * t];
    const mode = Math.sqrt(near * s + far * t);
    projection[2 * p] = near / mode;
    projection[2 * p + 1] = far / mode;
    resistance[p] = reaction.re[p * n + p];
  }
  const size = n * n;
  const out = { re: new Float64Array(size), im: new Float64Array(size), guided: new Float64Array(size) };
  for (let m = 0, q = 0; m < n; m++)
    for (let k = 0; k < n; k++, q++) {
      const scale = 1 / Math.sqrt(resistance[m] * resistance[k]);
      out.re[q] = reaction.re[q] * scale;
      out.im[q] = reaction.im[q] * scale;
      out.guided[q] = reaction.guided[q] * scale;
    }
  return { patches: n, projection, admittance, resistance, ...out };
}

/** Adds everything to a nodal matrix. */
export function addCoupling(target: ComplexMatrix, edges: readonly CircuitEdge[], coupling: PatchCoupling): void {
  const { patches, projection: u, admittance } = coupling;
  const { n, re, im } = target;
  for (let p = 0; p < patches; p++) {
    const [i, j] = [edges[2 * p].node, edges[2 * p + 1].node];
    re[i * n + i] += admittance.re[3 * p];
    re[j * n + j] += admittance.re[3 * p + 2];
    re[i * n + j] += admittance.re[3 * p + 1];
    re[j * n + i] += admittance.re[3 * p + 1];
    im[i * n + j] += admittance.im[3 * p + 1];
    im[j * n + i] += admittance.im[3 * p + 1];
  }
  for (let p = 0; p < patches; p++) {
    for (let r = 0; r < patches; r++) {
      if (r === p) continue;
      const [yr, yi] = [coupling.re[p * patches + r], coupling.im[p * patches + r]];
      for (let a = 0; a < 2; a++) {
        const row = edges[2 * p + a].node * n;
        for (let b = 0; b < 2; b++) {
          const q = row + edges[2 * r + b].node;
          const w = u[2 * p + a] * u[2 * r + b];
          re[q] += w * yr;
          im[q] += w * yi;
        }
      }
    }
  }
}

export interface EdgePower {
  readonly radiated: number;
  readonly surfaceWave: number;
  /** a of every patch, √W peak. */
  readonly re: Float64Array;
  readonly im: Float64Array;
}

/** Power of all edges by the same matrix that the circuit was solved with, W, from the node voltages. */
export function edgePower(
  edges: readonly CircuitEdge[],
  coupling: PatchCoupling,
  re: Float64Array,
  im: Float64Array,
): EdgePower {
  const { patches: n, projection: u, admittance } = coupling;
  const ar = new Float64Array(n);
  const ai = new Float64Array(n);
  let [total, guided] = [0, 0];
  for (let p = 0; p < n; p++) {
    const [i, j] = [edges[2 * p].node, edges[2 * p + 1].node];
    ar[p] = u[2 * p] * re[i] + u[2 * p + 1] * re[j];
    ai[p] = u[2 * p] * im[i] + u[2 * p + 1] * im[j];
    const own =
      admittance.re[3 * p] * (re[i] * re[i] + im[i] * im[i]) +
      admittance.re[3 * p + 2] * (re[j] * re[j] + im[j] * im[j]) +
      2 * admittance.re[3 * p + 1] * (re[i] * re[j] + im[i] * im[j]);
    // What is not the mode's goes into the guided wave in the mode's own share.
    const rest = own - ar[p] * ar[p] - ai[p] * ai[p];
    total += rest;
    guided += rest * coupling.guided[p * n + p];
  }
  for (let p = 0, q = 0; p < n; p++)
    for (let r = 0; r < n; r++, q++) {
      const product = ar[p] * ar[r] + ai[p] * ai[r];
      total += coupling.re[q] * product;
      guided += coupling.guided[q] * product;
    }
  return { radiated: (total - guided) / 2, surfaceWave: guided / 2, re: ar, im: ai };
}
