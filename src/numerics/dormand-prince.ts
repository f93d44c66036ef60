/** dy/dt written into `out`; `y` and `out` have the length of the start vector. */
export type Derivative = (t: number, y: Float64Array, out: Float64Array) => void;

export interface OdeTolerance {
  /** Error per step relative to the largest component of y. */
  readonly relative: number;
  readonly absolute: number;
}

const C = [0, 1 / 5, 3 / 10, 4 / 5, 8 / 9, 1, 1];
const A = [
  [],
  [1 / 5],
  [3 / 40, 9 / 40],
  [44 / 45, -56 / 15, 32 / 9],
  [19372 / 6561, -25360 / 2187, 64448 / 6561, -212 / 729],
  [9017 / 3168, -355 / 33, 46732 / 5247, 49 / 176, -5103 / 18656],
  [35 / 384, 0, 500 / 1113, 125 / 192, -2187 / 6784, 11 / 84],
];
/** Fifth order less embedded fourth order. */
const E = [71 / 57600, 0, -71 / 16695, 71 / 1920, -17253 / 339200, 22 / 525, -1 / 40];

const STEP_LIMIT = 100_000;

/**
 * Initial-value problem y' = f(t, y) from t0 to t1 (either direction) by the adaptive fifth-order method of
 * J. R. Dormand and P. J. Prince, J. Comp. Appl. Math. 6(1), 1980, table 2, with local extrapolation.
 *
 * @returns y(t1)
 * @throws Error where 100 000 steps do not suffice
 */
export function integrateOde(
  f: Derivative,
  t0: number,
  t1: number,
  start: readonly number[],
  tolerance: OdeTolerance,
): Float64Array {
  const n = start.length;
  const y = Float64Array.from(start);
  const trial = new Float64Array(n);
  const k = A.map(() => new Float64Array(n));
  const stage = (i: number): Float64Array => k[i] as Float64Array;
  let t = t0;
  let h = (t1 - t0) / 100;
  f(t, y, stage(0));
  for (let step = 0; step < STEP_LIMIT; step++) {
    const last = (t1 - t - h) * Math.sign(t1 - t0) <= 0;
    if (last) h = t1 - t;
    for (let i = 1; i < 7; i++) {
      const row = A[i] as number[];
      for (let m = 0; m < n; m++) {
        let sum = 0;
        for (let j = 0; j < i; j++) sum += (row[j] as number) * (stage(j)[m] as number);
        trial[m] = (y[m] as number) + h * sum;
      }
      f(t + (C[i] as number) * h, trial, stage(i));
    }
    let error = 0;
    let size = 0;
    for (let m = 0; m < n; m++) {
      let e = 0;
      for (let i = 0; i < 7; i++) e += (E[i] as number) * (stage(i)[m] as number);
      error = Math.max(error, Math.abs(h * e));
      size = Math.max(size, Math.abs(trial[m] as number));
    }
    const ratio = error / (tolerance.absolute + tolerance.relative * size);
    if (ratio <= 1) {
      // The seventh stage is the first of the next step.
      y.set(trial);
      stage(0).set(stage(6));
      if (last) return y;
      t += h;
    }
    h *= Math.min(5, Math.max(0.2, 0.9 * (ratio + 1e-12) ** -0.2));
  }
  throw new Error(`no end after ${STEP_LIMIT} steps from ${t0} to ${t1}`);
}
