/**
 * Potentials of magnetic edge currents on a grounded slab in space, tabulated once per frequency and slab.
 *
 * Sommerfeld integrals along the real axis (lossless slab), the TM0 pole taken off in closed form: with
 * R[1/(k²−kp²) − 1/(k²+kp²)] ↔ (R/2π)[−(jπ/2) H0⁽²⁾(kp r) − K0(kp r)], finite at r = 0. Branch points at k0 and k1 are
 * removed by substitution. Near the source the remainder is splined and the closed terms ε1 e^{−jk1r}/(2πr),
 * e^{−jk1r}/(2πμ0r) added; far from it the total times r e^{jk0r}, which is smooth (Mosig & Gardiol 1985).
 *
 * Conductance is split exactly: k < k0 is space wave, the pole is surface wave.
 */
import { besselJ0, besselK0, besselY0 } from '../../numerics/bessel.js';
import { gaussLegendre } from '../../numerics/gauss-legendre.js';
import { splineSlopes } from '../../numerics/spline.js';
import { EPS0, MU0, SPEED_OF_LIGHT } from '../constants.js';
import { type SlabSpectrum, slabSpectrum } from './slab-spectrum.js';

/** Distances and the tail of the integrals that a family of kernels (one board, all frequencies and slabs near one height) shares. */
export interface KernelGrid {
  readonly near: Float64Array;
  readonly far: Float64Array;
  /** Wavenumbers of the evanescent tail, their weights and J0(k r) for every distance, near then far. */
  readonly tailK: Float64Array;
  readonly tailWeight: Float64Array;
  readonly tailJ0: Float64Array;
  readonly tailStart: number;
}

export interface SlabKernel {
  readonly spectrum: SlabSpectrum;
  /** F(r) and M(r), r > 0: out = [Re F, Im F, Re M, Im M]. */
  evaluate(r: number, out: Float64Array): void;
  /** The parts that carry power, finite at r = 0: out = [Im F, Im M of space wave and pole together, Im F, Im M of the pole]. */
  evaluatePower(r: number, out: Float64Array): void;
}

/**
 * @param maximumFrequency Hz; kernels on this grid are for this frequency and below
 * @param permittivity     largest relative permittivity
 * @param height           smallest slab height, m
 * @param reach            largest distance between two points of the board's edges, m
 */
export function kernelGrid(maximumFrequency: number, permittivity: number, height: number, reach: number): KernelGrid {
  const split = 6 * height;
  const near = Float64Array.from({ length: 49 }, (_, i) => (split * 1.05 * i) / 48);
  const k0 = (2 * Math.PI * maximumFrequency) / SPEED_OF_LIGHT;
  // Geometric steps until they reach a twentieth of a wavelength, equal steps from there.
  const far: number[] = [];
  const step = (2 * Math.PI) / k0 / 20;
  for (let r = split * 0.95; r < reach * 1.02 + step; r += Math.min(step, 0.12 * r)) far.push(r);
  far.push(far[far.length - 1] + step);
  while (far.length < 4) far.push(far[far.length - 1] + step);
  const tailStart = 2.2 * k0 * Math.sqrt(permittivity);
  const tailEnd = Math.max(9 / height, 2 * tailStart);
  const panels = Math.max(12, Math.ceil(((tailEnd - tailStart) * far[far.length - 1]) / 12));
  const rule = gaussLegendre(10);
  const tailK = new Float64Array(panels * 10);
  const tailWeight = new Float64Array(panels * 10);
  const half = (tailEnd - tailStart) / panels / 2;
  for (let p = 0, m = 0; p < panels; p++) {
    const centre = tailStart + (2 * p + 1) * half;
    for (let i = 0; i < 10; i++, m++) {
      tailK[m] = centre + half * rule.nodes[i];
      tailWeight[m] = (half * rule.weights[i] * tailK[m]) / (2 * Math.PI);
    }
  }
  const count = near.length + far.length;
  const tailJ0 = new Float64Array(count * tailK.length);
  for (let d = 0; d < count; d++) {
    const r = d < near.length ? near[d] : far[d - near.length];
    for (let m = 0; m < tailK.length; m++) tailJ0[d * tailK.length + m] = besselJ0(tailK[m] * r);
  }
  return { near, far: Float64Array.from(far), tailK, tailWeight, tailJ0, tailStart };
}

/** Quadrature over [0, k0], [k0, k1] and [k1, tail] with the square-root behaviour at k0 and k1 removed. */
function lowPath(spectrum: SlabSpectrum, tailStart: number, reach: number): { k: Float64Array; weight: Float64Array } {
  const { k0, k1 } = spectrum;
  const oscillation = Math.ceil(k0 * reach);
  const first = gaussLegendre(40 + oscillation);
  const second = gaussLegendre(24 + Math.ceil(0.6 * oscillation));
  const third = gaussLegendre(40 + oscillation);
  const total = first.nodes.length + second.nodes.length + third.nodes.length;
  const k = new Float64Array(total);
  const weight = new Float64Array(total);
  let m = 0;
  for (let i = 0; i < first.nodes.length; i++, m++) {
    const a = (Math.PI / 4) * (first.nodes[i] + 1);
    k[m] = k0 * Math.sin(a);
    weight[m] = ((Math.PI / 4) * first.weights[i] * k0 * k0 * Math.sin(a) * Math.cos(a)) / (2 * Math.PI);
  }
  const gap = k1 * k1 - k0 * k0;
  for (let i = 0; i < second.nodes.length; i++, m++) {
    const a = (Math.PI / 4) * (second.nodes[i] + 1);
    k[m] = Math.sqrt(k0 * k0 + gap * Math.sin(a) ** 2);
    weight[m] = ((Math.PI / 4) * second.weights[i] * gap * Math.sin(a) * Math.cos(a)) / (2 * Math.PI);
  }
  const top = Math.acosh(tailStart / k1);
  for (let i = 0; i < third.nodes.length; i++, m++) {
    const a = (top / 2) * (third.nodes[i] + 1);
    k[m] = k1 * Math.cosh(a);
    weight[m] = ((top / 2) * third.weights[i] * k1 * k1 * Math.sinh(a) * Math.cosh(a)) / (2 * Math.PI);
  }
  return { k, weight };
}

/**
 * @param permittivity relative, lossless
 * @param height       m
 * @throws RangeError when the slab guides more than TM0
 */
export function slabKernel(frequency: number, permittivity: number, height: number, grid: KernelGrid): SlabKernel {
  const spectrum = slabSpectrum(frequency, permittivity, height);
  const { k0, k1, kp, residueF, residueM } = spectrum;
  const reach = grid.far[grid.far.length - 1];
  const path = lowPath(spectrum, grid.tailStart, reach);
  const count = grid.near.length + grid.far.length;
  const tailCount = grid.tailK.length;
  // Integrands less the pole, times weight: real and imaginary parts of F and M.
  const low = sample(path.k, path.weight);
  const tail = sample(grid.tailK, grid.tailWeight);
  const table = [0, 1, 2, 3].map(() => new Float64Array(count));
  const power = [new Float64Array(count), new Float64Array(count)];
  for (let d = 0; d < count; d++) {
    const r = d < grid.near.length ? grid.near[d] : grid.far[d - grid.near.length];
    let [fr, fi, mr, mi] = [0, 0, 0, 0];
    // Weight of the space wave alone: imaginary parts below k0, before the infinite-slab term is taken off.
    let [pf, pm] = [0, 0];
    for (let m = 0; m < path.k.length; m++) {
      const j = besselJ0(path.k[m] * r);
      fr += low[0][m] * j;
      fi += low[1][m] * j;
      mr += low[2][m] * j;
      mi += low[3][m] * j;
      pf += low[4][m] * j;
      pm += low[5][m] * j;
    }
    for (let m = 0, q = d * tailCount; m < tailCount; m++, q++) {
      const j = grid.tailJ0[q];
      fr += tail[0][m] * j;
      mr += tail[2][m] * j;
    }
    const x = kp * r;
    const j0 = r === 0 ? 1 : besselJ0(x);
    const regular = r === 0 ? 0 : -(Math.PI / 2) * besselY0(x) - besselK0(x);
    fr += (residueF / (2 * Math.PI)) * regular;
    mr += (residueM / (2 * Math.PI)) * regular;
    fi -= (residueF / 4) * j0;
    mi -= (residueM / 4) * j0;
    power[0][d] = pf;
    power[1][d] = pm;
    if (d < grid.near.length) {
      table[0][d] = fr;
      table[1][d] = fi;
      table[2][d] = mr;
      table[3][d] = mi;
    } else {
      const c = Math.cos(k1 * r) / (2 * Math.PI * r);
      const s = -Math.sin(k1 * r) / (2 * Math.PI * r);
      rotate(fr + EPS0 * permittivity * c, fi + EPS0 * permittivity * s, k0 * r, r, table, 0, d);
      rotate(mr + c / MU0, mi + s / MU0, k0 * r, r, table, 2, d);
    }
  }

  /** out[0..3]: weighted remainder less pole; out[4..5]: weighted imaginary parts of the whole spectrum below k0. */
  function sample(k: Float64Array, weight: Float64Array): Float64Array[] {
    const columns = [0, 1, 2, 3, 4, 5].map(() => new Float64Array(k.length));
    const value = new Float64Array(4);
    const kp4 = kp ** 4;
    for (let m = 0; m < k.length; m++) {
      spectrum.remainder(k[m], value);
      const pole = (2 * kp * kp) / (k[m] ** 4 - kp4);
      const v = k[m] < k1 ? 1 / Math.sqrt(k1 * k1 - k[m] * k[m]) : 0;
      const w = weight[m];
      columns[0][m] = w * (value[0] - residueF * pole);
      columns[1][m] = w * value[1];
      columns[2][m] = w * (value[2] - residueM * pole);
      columns[3][m] = w * value[3];
      if (k[m] < k0) {
        columns[4][m] = w * (value[1] - EPS0 * permittivity * v);
        columns[5][m] = w * (value[3] - v / MU0);
      }
    }
    return columns;
  }

  const nearTable = table.map((t) => t.slice(0, grid.near.length));
  const farTable = table.map((t) => t.slice(grid.near.length));
  const nearSlopes = nearTable.map((t) => splineSlopes(grid.near, t));
  const farSlopes = farTable.map((t) => splineSlopes(grid.far, t));
  const split = 6 * height < grid.near[grid.near.length - 1] ? Math.max(grid.far[0], 6 * height) : grid.far[0];
  const distances = Float64Array.from([...grid.near, ...grid.far.filter((r) => r > grid.near[grid.near.length - 1])]);
  const kept = distances.map((_, i) => i + (i < grid.near.length ? 0 : count - distances.length));
  const powerF = Float64Array.from(kept, (i) => power[0][i]);
  const powerM = Float64Array.from(kept, (i) => power[1][i]);
  const slopesF = splineSlopes(distances, powerF);
  const slopesM = splineSlopes(distances, powerM);
  const nearStep = grid.near[1];

  function evaluate(r: number, out: Float64Array): void {
    if (r < split) {
      const i = Math.min(grid.near.length - 2, Math.floor(r / nearStep));
      hermite(grid.near, nearTable, nearSlopes, i, r, out);
      const c = Math.cos(k1 * r) / (2 * Math.PI * r);
      const s = -Math.sin(k1 * r) / (2 * Math.PI * r);
      out[0] += EPS0 * permittivity * c;
      out[1] += EPS0 * permittivity * s;
      out[2] += c / MU0;
      out[3] += s / MU0;
      return;
    }
    hermite(grid.far, farTable, farSlopes, interval(grid.far, r), r, out);
    const c = Math.cos(k0 * r) / r;
    const s = -Math.sin(k0 * r) / r;
    for (let q = 0; q < 4; q += 2) {
      const re = out[q];
      const im = out[q + 1];
      out[q] = re * c - im * s;
      out[q + 1] = re * s + im * c;
    }
  }

  function evaluatePower(r: number, out: Float64Array): void {
    const i = interval(distances, r);
    out[0] = cubic(distances, powerF, slopesF, i, r);
    out[1] = cubic(distances, powerM, slopesM, i, r);
    const j0 = besselJ0(kp * r);
    out[2] = -(residueF / 4) * j0;
    out[3] = -(residueM / 4) * j0;
    out[0] += out[2];
    out[1] += out[3];
  }

  return { spectrum, evaluate, evaluatePower };
}

function rotate(re: number, im: number, angle: number, r: number, table: Float64Array[], q: number, d: number): void {
  const c = Math.cos(angle) * r;
  const s = Math.sin(angle) * r;
  table[q][d] = re * c - im * s;
  table[q + 1][d] = re * s + im * c;
}

/** Index of the interval that holds r; the last one beyond the end. */
function interval(x: Float64Array, r: number): number {
  let low = 0;
  let high = x.length - 1;
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if (x[middle] > r) high = middle;
    else low = middle;
  }
  return low;
}

function hermite(
  x: Float64Array,
  y: Float64Array[],
  slopes: Float64Array[],
  i: number,
  r: number,
  out: Float64Array,
): void {
  const h = x[i + 1] - x[i];
  const t = (r - x[i]) / h;
  const u = 1 - t;
  const a = u * u * (1 + 2 * t);
  const b = t * t * (3 - 2 * t);
  const c = t * u * u * h;
  const d = -t * t * u * h;
  for (let q = 0; q < out.length; q++) out[q] = a * y[q][i] + b * y[q][i + 1] + c * slopes[q][i] + d * slopes[q][i + 1];
}

function cubic(x: Float64Array, y: Float64Array, slope: Float64Array, i: number, r: number): number {
  const h = x[i + 1] - x[i];
  const t = (r - x[i]) / h;
  const u = 1 - t;
  return u * u * ((1 + 2 * t) * y[i] + t * h * slope[i]) + t * t * ((3 - 2 * t) * y[i + 1] - u * h * slope[i + 1]);
}
