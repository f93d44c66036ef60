/**
 * Self and mutual admittances of all patch edges through the slab: uniform magnetic currents along y, each pair a line
 * integral of the potentials,
 *   Y = s_m s_n { jω ∫ C(v) F(r) dv + (1/jω) Σ ± M(r) },
 * C the overlap of the two widths, the sum over the charges at their ends. Of an edge on itself only the conductance is
 * taken: its susceptance is the open-end length of the line. Which distances occur depends on the layout alone and is
 * found once (`edgePlan`).
 */
import type { ComplexMatrix } from '../../numerics/complex-lu.js';
import { gaussLegendre } from '../../numerics/gauss-legendre.js';
import type { RadiatingEdge } from './engine.js';
import type { SlabKernel } from './slab-kernel.js';

/** One combination of two pulse widths at an offset: quadrature distances with weights, and end-charge distances. */
interface PulsePair {
  readonly r: Float64Array;
  readonly weight: Float64Array;
  readonly chargeR: Float64Array;
  readonly chargeSign: Float64Array;
  readonly self: boolean;
}

export interface EdgePlan {
  /** Distinct pulse pairs of the layout. */
  readonly pairs: readonly PulsePair[];
  /** For edges m ≥ n: indices into `pairs` for pulses (m0,n0), (m0,n1), (m1,n0), (m1,n1), −1 where a pulse is absent. */
  readonly index: Int32Array;
  readonly count: number;
}

/** Positions closer than this are the same, m. */
const GRAIN = 1e-10;

export function edgePlan(edges: readonly RadiatingEdge[]): EdgePlan {
  const count = edges.length;
  const pairs: PulsePair[] = [];
  const known = new Map<string, number>();
  const index = new Int32Array(((count * (count + 1)) / 2) * 4).fill(-1);
  for (let m = 0, q = 0; m < count; m++) {
    for (let n = 0; n <= m; n++, q += 4) {
      const dx = Math.round(Math.abs(edges[m].x - edges[n].x) / GRAIN);
      const dy = Math.round(Math.abs(edges[m].y - edges[n].y) / GRAIN);
      edges[m].pulses.forEach((a, i) => {
        edges[n].pulses.forEach((b, k) => {
          const [p, s] = [Math.round(a.width / GRAIN), Math.round(b.width / GRAIN)];
          const key = `${Math.min(p, s)} ${Math.max(p, s)} ${dx} ${dy}`;
          let found = known.get(key);
          if (found === undefined) {
            found = pairs.length;
            known.set(key, found);
            pairs.push(pulsePair(a.width, b.width, dx * GRAIN, dy * GRAIN));
          }
          index[q + 2 * i + k] = found;
        });
      });
    }
  }
  return { pairs, index, count };
}

function pulsePair(a: number, b: number, dx: number, dy: number): PulsePair {
  const self = dx === 0 && dy === 0;
  const outer = (a + b) / 2;
  const inner = Math.abs(a - b) / 2;
  const height = Math.min(a, b);
  const distance = Math.hypot(dx, dy);
  // Smooth integrands: few points suffice once the edges are further apart than they are wide.
  const order = distance > 4 * outer ? 3 : distance > 1.5 * outer ? 4 : 8;
  const rule = gaussLegendre(order);
  const r: number[] = [];
  const weight: number[] = [];
  const piece = (from: number, to: number, times: number): void => {
    if (to - from < GRAIN) return;
    for (let i = 0; i < order; i++) {
      const v = (from + to) / 2 + ((to - from) / 2) * rule.nodes[i];
      const overlap = Math.abs(v) <= inner ? height : outer - Math.abs(v);
      r.push(Math.hypot(dx, dy + v));
      weight.push(((times * (to - from)) / 2) * rule.weights[i] * overlap);
    }
  };
  // Mirror halves where there is no offset across.
  if (dy === 0) {
    piece(0, inner, 2);
    piece(inner, outer, 2);
  } else {
    piece(-outer, -inner, 1);
    piece(-inner, inner, 1);
    piece(inner, outer, 1);
  }
  const near = (a - b) / 2;
  const offsets = [dy + near, dy - near, dy + outer, dy - outer];
  return {
    r: Float64Array.from(r),
    weight: Float64Array.from(weight),
    chargeR: Float64Array.from(offsets, (v) => Math.hypot(dx, v)),
    chargeSign: Float64Array.of(1, 1, -1, -1),
    self,
  };
}

/** Largest distance that the plan asks the kernel for, m. */
export function planReach(plan: EdgePlan): number {
  return plan.pairs.reduce((reach, pair) => Math.max(reach, ...pair.chargeR, ...pair.r), 0);
}

export interface EdgeAdmittance {
  readonly n: number;
  /** Full symmetric matrices, row-major: admittance and, apart, the conductances of all power and of the guided wave. */
  readonly re: Float64Array;
  readonly im: Float64Array;
  readonly guided: Float64Array;
}

/** Fills the admittance matrix of all edges at the kernel's frequency, S. */
export function edgeAdmittance(edges: readonly RadiatingEdge[], plan: EdgePlan, kernel: SlabKernel): EdgeAdmittance {
  const n = plan.count;
  const omega = kernel.spectrum.omega;
  const count = plan.pairs.length;
  const pr = new Float64Array(count);
  const pi = new Float64Array(count);
  const pg = new Float64Array(count);
  const value = new Float64Array(4);
  const lossy = new Float64Array(4);
  plan.pairs.forEach((pair, p) => {
    let [re, im, guided] = [0, 0, 0];
    for (let i = 0; i < pair.r.length; i++) {
      kernel.evaluatePower(pair.r[i], lossy);
      const w = pair.weight[i] * omega;
      guided -= w * lossy[2];
      if (pair.self) {
        re -= w * lossy[0];
        continue;
      }
      kernel.evaluate(pair.r[i], value);
      re -= w * value[1];
      im += w * value[0];
    }
    for (let i = 0; i < 4; i++) {
      kernel.evaluatePower(pair.chargeR[i], lossy);
      const w = pair.chargeSign[i] / omega;
      guided += w * lossy[3];
      if (pair.self) {
        re += w * lossy[1];
        continue;
      }
      kernel.evaluate(pair.chargeR[i], value);
      re += w * value[3];
      im -= w * value[2];
    }
    pr[p] = re;
    pi[p] = im;
    pg[p] = guided;
  });
  const result = { n, re: new Float64Array(n * n), im: new Float64Array(n * n), guided: new Float64Array(n * n) };
  for (let m = 0, q = 0; m < n; m++) {
    for (let k = 0; k <= m; k++, q += 4) {
      let [re, im, guided] = [0, 0, 0];
      for (let i = 0; i < edges[m].pulses.length; i++) {
        for (let j = 0; j < edges[k].pulses.length; j++) {
          const p = plan.index[q + 2 * i + j];
          const d = edges[m].pulses[i].density * edges[k].pulses[j].density;
          re += d * pr[p];
          im += d * pi[p];
          guided += d * pg[p];
        }
      }
      const sign = edges[m].sign * edges[k].sign;
      result.re[m * n + k] = result.re[k * n + m] = sign * re;
      result.im[m * n + k] = result.im[k * n + m] = sign * im;
      result.guided[m * n + k] = result.guided[k * n + m] = sign * guided;
    }
  }
  return result;
}

/** ½ V^H G V for a real symmetric G, W. */
export function quadraticForm(matrix: Float64Array, n: number, re: Float64Array, im: Float64Array): number {
  let sum = 0;
  for (let m = 0; m < n; m++) {
    let [r, i] = [0, 0];
    for (let k = 0, q = m * n; k < n; k++, q++) {
      r += matrix[q] * re[k];
      i += matrix[q] * im[k];
    }
    sum += re[m] * r + im[m] * i;
  }
  return sum / 2;
}

/** Adds the edge admittances to a nodal matrix of the same order. */
export function addTo(target: ComplexMatrix, source: EdgeAdmittance): void {
  for (let q = 0; q < source.re.length; q++) {
    target.re[q] += source.re[q];
    target.im[q] += source.im[q];
  }
}
