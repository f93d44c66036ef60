import { gaussLegendre } from '../../numerics/gauss-legendre.js';
import { factoriseReal, solveReal } from '../../numerics/real-lu.js';
import { EPS0 } from '../constants.js';
import { microstripStatic } from './hammerstad-jensen.js';
import { type SpectralBasis, spectralBasis } from './spectral-basis.js';
import { freeWavenumber, noResponse, type SpectralSlab, sheetResponse } from './spectral-slab.js';

export interface SpectralProblem extends SpectralSlab {
  /** Width of the strip, m; it has no thickness. */
  readonly width: number;
}

/** Integrals across the strip and the ground of squares of the sheet currents over the squared strip current, 1/m. */
export interface SheetSquares {
  /** Of the ground's current. */
  readonly ground: number;
  /** Of the strip's current to a distance c short of both edges: `strip` + `edge`·ln(w/c), transverse current included. */
  readonly strip: number;
  readonly edge: number;
  /** Of the underside's current less the square of the top's. */
  readonly underLessTop: number;
  /** Of the difference of the two currents. */
  readonly difference: number;
}

export interface SpectralLine {
  readonly frequency: number;
  readonly effectivePermittivity: number;
  /** Power-current impedance 2P/|I|², ohm. */
  readonly impedance: number;
  /** (ε/e) ∂e/∂ε of slab and coat: dielectric loss is α = ½ β Σ filling·tan δ. */
  readonly filling: { readonly slab: number; readonly cover: number };
  readonly squares: SheetSquares;
}

/**
 * Fundamental mode of a strip without thickness on a grounded slab, with or without a flat coat: Galerkin's method in
 * the spectral domain with edge conditions built in. Far parts of all kernels are integrated in closed form.
 *
 * Source: T. Itoh and R. Mittra, "A technique for computing dispersion characteristics of shielded microstrip lines", IEEE
 * Trans. Microwave Theory Tech. 22(10), 1974, for the open line. Power and the effect of small losses follow from the
 * variation of the Galerkin form, which is stationary (own derivation: P = ¼ |∂(E·J)/∂β|).
 * Lossless; loss enters by the derivatives. Valid while the mode is bound, that is slower than the slab's TM0 wave.
 *
 * @param frequency Hz, > 0
 * @param terms     basis functions along; default by width. The result moves by less than 1e-5 with one more
 * @throws RangeError where no bound mode is found
 */
export function spectralLine(problem: SpectralProblem, frequency: number, terms?: number): SpectralLine {
  const { width, height, coat } = problem;
  if (!(frequency > 0)) throw new RangeError(`frequency must be positive, got ${frequency}`);
  const basis = spectralBasis(
    width,
    height,
    Math.min(height, coat?.thickness ?? height),
    terms ?? 4 + Math.min(8, Math.ceil(width / height / 3)),
  );
  const k0 = freeWavenumber(frequency);
  const found = solveMode(problem, basis, k0);
  const { permittivity: e, current } = found;
  const transforms = transformsOf(basis, current);
  const form = (p: SpectralSlab, at: number): number => galerkinForm(p, basis, k0, at, current, transforms);
  const slope = (f: (x: number) => number, x: number): number => (f(x * 1.0001) - f(x * 0.9999)) / (2e-4 * x);
  const byMode = slope((at) => form(problem, at), e);
  const filling = (byMedium: number, er: number): number => (-byMedium / byMode) * (er / e);
  const bySlab = slope((er) => form({ ...problem, permittivity: er }, e), problem.permittivity);
  const byCoat = coat
    ? slope((er) => form({ ...problem, coat: { ...coat, permittivity: er } }, e), coat.permittivity)
    : 0;
  // The form is q/k0²; de = 2β dβ/k0².
  const omegaEps = 2 * Math.PI * frequency * EPS0;
  return {
    frequency,
    effectivePermittivity: e,
    impedance: (byMode * Math.sqrt(e) * k0) / (omegaEps * Math.PI),
    filling: {
      slab: filling(bySlab, problem.permittivity),
      cover: coat ? filling(byCoat, coat.permittivity) : 0,
    },
    squares: sheetSquares(problem, basis, k0, e, current, transforms),
  };
}

/** Coefficients of the current along, then across (over k0), the first being 1. */
type Current = Float64Array;

/** Newton's method on the Galerkin form as a function of the effective permittivity, the rest of the current eliminated. */
function solveMode(
  problem: SpectralProblem,
  basis: SpectralBasis,
  k0: number,
): { permittivity: number; current: Current } {
  const highest = Math.max(problem.permittivity, problem.coat?.permittivity ?? 1);
  const still = microstripStatic({ ...problem, thickness: 0 }).effectivePermittivity;
  let e = Math.min(still * 1.03, 0.5 * (still + highest));
  for (let i = 0; i < 60; i++) {
    const current = strongestCurrent(galerkinMatrix(problem, basis, k0, e), basis.along + basis.across);
    const transforms = transformsOf(basis, current);
    const form = (at: number): number => galerkinForm(problem, basis, k0, at, current, transforms);
    // With the current held, the form's slope is that of the eliminated equation too: it is stationary.
    const step = 1e-4 * e;
    const slope = (form(e + step) - form(e - step)) / (2 * step);
    const next = Math.min(Math.max(e - form(e) / slope, 1 + 0.3 * (e - 1)), highest);
    if (!Number.isFinite(next)) break;
    if (Math.abs(next - e) < 1e-11 * e) return { permittivity: next, current };
    e = next;
  }
  throw new RangeError(
    `no bound mode found on a strip ${problem.width} m wide on ${problem.height} m of permittivity ${problem.permittivity}`,
  );
}

/** The current with first coefficient 1 for which all other rows of the matrix vanish. */
function strongestCurrent(matrix: Float64Array, n: number): Current {
  const m = n - 1;
  const rest = new Float64Array(m * m);
  const right = new Float64Array(m);
  for (let i = 0; i < m; i++) {
    right[i] = -matrix[(i + 1) * n];
    for (let j = 0; j < m; j++) rest[i * m + j] = matrix[(i + 1) * n + j + 1];
  }
  solveReal(factoriseReal(rest, m), right);
  return Float64Array.of(1, ...right);
}

const scratch = noResponse();

/** Kernels along–along, along–across, across–across at one wavenumber, over J(2n)J(2m), and their far forms c/ky. */
function kernels(slab: SpectralSlab, k0: number, e: number, ky: number, a: number, out: Float64Array): void {
  const beta2 = e * k0 * k0;
  const k2 = ky * ky + beta2;
  sheetResponse(slab, k0, k2, scratch);
  const { tm, te } = scratch;
  const x = ky * a;
  out[0] = (e * tm - ky * ky * te) / k2;
  out[1] = (Math.sqrt(e) * ky * (tm + k0 * k0 * te)) / (k2 * x);
  out[2] = (ky * ky * tm - beta2 * k0 * k0 * te) / (k2 * x * x);
}

function farKernels(slab: SpectralSlab, e: number, a: number): readonly [number, number, number] {
  const sum = slab.permittivity + (slab.coat?.permittivity ?? 1);
  return [e / sum - 0.5, Math.sqrt(e) / (sum * a), 1 / (sum * a * a)];
}

function galerkinMatrix(slab: SpectralSlab, basis: SpectralBasis, k0: number, e: number): Float64Array {
  const { halfWidth: a, along, across, nodes, weights, bessel, far, reach } = basis;
  const n = along + across;
  const matrix = new Float64Array(n * n);
  const c = farKernels(slab, e, a);
  const k = new Float64Array(3);
  // Row i: order of the Bessel function and whether it is a current across.
  const order = (i: number): number => (i < along ? i : i - along + 1);
  for (let i = 0; i < nodes.length; i++) {
    const ky = nodes[i];
    kernels(slab, k0, e, ky, a, k);
    const near = -Math.expm1(-ky * reach) / ky;
    for (let t = 0; t < 3; t++) k[t] = weights[i] * (k[t] - c[t] * near);
    for (let p = 0; p < n; p++)
      for (let q = p; q < n; q++)
        matrix[p * n + q] += k[+(p >= along) + +(q >= along)] * bessel[order(p)][i] * bessel[order(q)][i];
  }
  for (let p = 0; p < n; p++)
    for (let q = p; q < n; q++) {
      matrix[p * n + q] += c[+(p >= along) + +(q >= along)] * far[order(p)][order(q)];
      matrix[q * n + p] = matrix[p * n + q];
    }
  return matrix;
}

/** Transforms of the current along and across at every node. */
interface Transforms {
  readonly x: Float64Array;
  readonly y: Float64Array;
}

function transformsOf({ halfWidth: a, along, nodes, bessel }: SpectralBasis, current: Current): Transforms {
  const x = new Float64Array(nodes.length);
  const y = new Float64Array(nodes.length);
  for (let n = 0; n < current.length; n++) {
    const row = bessel[n < along ? n : n - along + 1];
    const into = n < along ? x : y;
    for (let i = 0; i < nodes.length; i++) into[i] += current[n] * row[i];
  }
  // The kernels hold the division by ky w/2; currents want it back.
  for (let i = 0; i < nodes.length; i++) y[i] /= nodes[i] * a;
  return { x, y };
}

/** The quadratic form of a current in the Galerkin matrix, without the matrix. */
function galerkinForm(
  slab: SpectralSlab,
  basis: SpectralBasis,
  k0: number,
  e: number,
  current: Current,
  { x, y }: Transforms,
): number {
  const { halfWidth: a, along, nodes, weights, far, reach } = basis;
  const c = farKernels(slab, e, a);
  const k = new Float64Array(3);
  let sum = 0;
  for (let i = 0; i < nodes.length; i++) {
    const ky = nodes[i];
    kernels(slab, k0, e, ky, a, k);
    const near = -Math.expm1(-ky * reach) / ky;
    const across = y[i] * ky * a;
    sum +=
      weights[i] *
      ((k[0] - c[0] * near) * x[i] * x[i] +
        2 * (k[1] - c[1] * near) * x[i] * across +
        (k[2] - c[2] * near) * across * across);
  }
  const order = (i: number): number => (i < along ? i : i - along + 1);
  for (let p = 0; p < current.length; p++)
    for (let q = 0; q < current.length; q++)
      sum += current[p] * current[q] * c[+(p >= along) + +(q >= along)] * far[order(p)][order(q)];
  return sum;
}

const POINTS_ACROSS = 12;

function sheetSquares(
  slab: SpectralSlab,
  basis: SpectralBasis,
  k0: number,
  e: number,
  current: Current,
  transforms: Transforms,
): SheetSquares {
  const { halfWidth: a, along, nodes, weights } = basis;
  const beta = Math.sqrt(e) * k0;
  const rule = gaussLegendre(POINTS_ACROSS);
  const position = rule.nodes.map((x) => (a * (x + 1)) / 2);
  const differenceAlong = new Float64Array(POINTS_ACROSS);
  const differenceAcross = new Float64Array(POINTS_ACROSS);
  let [ground, underLessTop, transverse] = [0, 0, 0];
  for (let i = 0; i < nodes.length; i++) {
    const ky = nodes[i];
    const x = transforms.x[i];
    const y = k0 * transforms.y[i];
    const k = Math.sqrt(ky * ky + beta * beta);
    // Both components share one phase after the quarter period between them is taken out: see the form above.
    const tm = (beta * x + ky * y) / k;
    const te = (ky * x - beta * y) / k;
    sheetResponse(slab, k0, k * k, scratch);
    const w = weights[i] / Math.PI;
    ground += w * ((tm * scratch.groundTm) ** 2 + (te * scratch.groundTe) ** 2);
    underLessTop += w * (tm * tm * scratch.underLessTopTm + te * te * scratch.underLessTopTe);
    transverse += w * y * y;
    const [dTm, dTe] = [(w * tm * scratch.underLessTopTm) / k, (w * te * scratch.underLessTopTe) / k];
    for (let p = 0; p < POINTS_ACROSS; p++) {
      differenceAlong[p] += (beta * dTm + ky * dTe) * Math.cos(ky * position[p]);
      differenceAcross[p] += (ky * dTm - beta * dTe) * Math.sin(ky * position[p]);
    }
  }
  // The difference lives on in the field beyond the edges: only the strip itself counts.
  let difference = 0;
  for (let p = 0; p < POINTS_ACROSS; p++)
    difference += a * rule.weights[p] * (differenceAlong[p] ** 2 + differenceAcross[p] ** 2);
  return { ground, underLessTop, difference, ...edgeSquares(current.subarray(0, along), a, transverse) };
}

/** ∫J² of the current along between y = ±(w/2 − c), c short: its logarithm apart. */
function edgeSquares(current: Current, a: number, transverse: number): { strip: number; edge: number } {
  const rule = gaussLegendre(2 * current.length);
  const atEdge = current.reduce((sum, c, n) => sum + (n % 2 ? -c : c), 0);
  let sum = 0;
  for (let i = 0; i < rule.nodes.length; i++) {
    const x = rule.nodes[i];
    let value = 0;
    for (let n = 0; n < current.length; n++) value += (n % 2 ? -1 : 1) * current[n] * Math.cos(2 * n * Math.acos(x));
    sum += (rule.weights[i] * (value * value - atEdge * atEdge)) / (1 - x * x);
  }
  const per = 1 / (Math.PI * Math.PI * a);
  return { strip: per * sum + transverse, edge: per * atEdge * atEdge };
}
