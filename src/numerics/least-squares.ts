import { factoriseReal, solveReal } from './real-lu.js';

/** Residuals at a point, whose squares are to be least. */
export type Residuals = (x: Float64Array) => Float64Array;

export interface LeastSquaresSettings {
  /** Step of each unknown from which slopes are taken; also what one unknown counts as another's equal. */
  readonly step: Float64Array;
  /** Between which each unknown is kept. */
  readonly low: Float64Array;
  readonly high: Float64Array;
  /** Steps that one move makes at most: slopes say little of what lies further away. */
  readonly reach: number;
  /** Done once the largest residual is below it. */
  readonly tolerance: number;
  /** Calls of the function after which the best point so far is returned. */
  readonly budget: number;
}

export interface LeastSquaresResult {
  readonly x: Float64Array;
  readonly residuals: Float64Array;
  readonly calls: number;
}

/** Ratio of sums of squares above which a step is not worth another set of slopes. */
const ENOUGH = 0.85;
/** The same however short the step was. */
const STALLED = 0.98;

/**
 * Least squares of a function that costs much: damped Gauss–Newton steps (Levenberg 1944, Marquardt 1963), slopes by one-sided
 * differences, kept up to date between by Broyden's rank-one correction (1965) and taken anew where that no longer gains.
 *
 * @throws RangeError where residuals at the start are not finite
 */
export function leastSquares(f: Residuals, start: Float64Array, settings: LeastSquaresSettings): LeastSquaresResult {
  const { step, low, high, reach, tolerance, budget } = settings;
  let calls = 0;
  const call = (x: Float64Array): Float64Array => {
    calls += 1;
    return f(x);
  };
  let x = start.slice();
  let r = call(x);
  let size = squares(r);
  if (!Number.isFinite(size)) throw new RangeError('leastSquares: residuals at the start are not finite');
  let slopes: Float64Array[] = [];
  let fresh = false;
  let damping = 1e-2;
  while (calls < budget && largest(r) > tolerance) {
    if (slopes.length === 0) {
      if (calls + x.length >= budget) break;
      slopes = takeSlopes(call, x, r, step);
      fresh = true;
    }
    const move = dampedStep(slopes, r, damping);
    const shorten = Math.min(1, reach / largest(move));
    for (let i = 0; i < move.length; i++) move[i] *= shorten;
    const next = x.map((value, i) => Math.min(high[i], Math.max(low[i], value + move[i] * step[i])));
    for (let i = 0; i < move.length; i++) move[i] = (next[i] - x[i]) / step[i];
    const there = call(next);
    const sizeThere = squares(there);
    if (sizeThere < size) {
      const gain = sizeThere / size;
      correct(slopes, move, r, there);
      [x, r, size] = [next, there, sizeThere];
      // Where true slopes no longer gain, the residuals that are left cannot be had away.
      if (fresh && shorten === 1 && (gain > STALLED || (gain > ENOUGH && damping < 0.1))) break;
      fresh = false;
      damping = Math.max(1e-8, damping / 5);
      // Slow progress on corrected slopes: true ones are worth their price.
      if (gain > (shorten === 1 ? 0.6 : 0.8)) slopes = [];
    } else if (fresh && damping > 1e4) break;
    else if (fresh) damping *= 6;
    else slopes = [];
  }
  return { x, residuals: r, calls };
}

/** Slopes per unit of step, one column for each unknown. */
function takeSlopes(f: Residuals, x: Float64Array, r: Float64Array, step: Float64Array): Float64Array[] {
  return Array.from(step, (h, i) => {
    const beside = x.slice();
    beside[i] += h;
    const there = f(beside);
    return there.map((value, k) => value - r[k]);
  });
}

/** (JᵀJ + λ diag) δ = −Jᵀr, in units of the steps. */
function dampedStep(slopes: readonly Float64Array[], r: Float64Array, damping: number): Float64Array {
  const n = slopes.length;
  const a = new Float64Array(n * n);
  const b = new Float64Array(n);
  for (let i = 0; i < n; i++) {
    for (let j = 0; j <= i; j++) a[i * n + j] = a[j * n + i] = dot(slopes[i], slopes[j]);
    b[i] = -dot(slopes[i], r);
  }
  let trace = 0;
  for (let i = 0; i < n; i++) trace += a[i * n + i] / n;
  // A floor under the diagonal keeps an unknown without effect (at its limit) from making the matrix singular.
  for (let i = 0; i < n; i++) a[i * n + i] += damping * a[i * n + i] + 1e-9 * trace;
  solveReal(factoriseReal(a, n), b);
  return b;
}

/** Broyden: the slopes that explain the last move, changed as little as possible. */
function correct(slopes: readonly Float64Array[], move: Float64Array, r: Float64Array, there: Float64Array): void {
  const length2 = dot(move, move);
  if (length2 === 0) return;
  const surprise = there.map((value, k) => {
    let expected = r[k];
    for (let i = 0; i < slopes.length; i++) expected += slopes[i][k] * move[i];
    return (value - expected) / length2;
  });
  for (let i = 0; i < slopes.length; i++) for (let k = 0; k < r.length; k++) slopes[i][k] += surprise[k] * move[i];
}

const dot = (a: Float64Array, b: Float64Array): number => {
  let sum = 0;
  for (let k = 0; k < a.length; k++) sum += a[k] * b[k];
  return sum;
};
const squares = (r: Float64Array): number => dot(r, r);
const largest = (r: Float64Array): number => r.reduce((most, value) => Math.max(most, Math.abs(value)), 0);
