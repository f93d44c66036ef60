/**
 * Dense real LU factorisation with partial pivoting on a flat row-major typed array. Written for a few hundred
 * unknowns: no allocation in the loops.
 */
export interface RealLu {
  readonly n: number;
  readonly a: Float64Array;
  readonly pivot: Int32Array;
}

/** Factorises in place: the matrix given is overwritten. @throws RangeError when the matrix is singular */
export function factoriseReal(a: Float64Array, n: number): RealLu {
  const pivot = new Int32Array(n);
  for (let k = 0; k < n; k++) {
    let best = k;
    let size = 0;
    for (let i = k; i < n; i++) {
      const m = Math.abs(a[i * n + k]);
      if (m > size) [size, best] = [m, i];
    }
    if (!(size > 0)) throw new RangeError(`factoriseReal: matrix singular at column ${k}`);
    pivot[k] = best;
    if (best !== k)
      for (let j = 0; j < n; j++) {
        const t = a[k * n + j];
        a[k * n + j] = a[best * n + j];
        a[best * n + j] = t;
      }
    const inverse = 1 / a[k * n + k];
    for (let i = k + 1; i < n; i++) {
      const row = i * n;
      const f = a[row + k] * inverse;
      a[row + k] = f;
      if (f === 0) continue;
      for (let j = k + 1, p = k * n + k + 1; j < n; j++, p++) a[row + j] -= f * a[p];
    }
  }
  return { n, a, pivot };
}

/** Solves A x = b in place of b. */
export function solveReal({ n, a, pivot }: RealLu, x: Float64Array): void {
  for (let k = 0; k < n; k++) exchange(x, k, pivot[k]);
  for (let i = 1; i < n; i++) {
    let s = x[i];
    for (let j = 0, p = i * n; j < i; j++, p++) s -= a[p] * x[j];
    x[i] = s;
  }
  for (let i = n - 1; i >= 0; i--) {
    let s = x[i];
    for (let j = i + 1, p = i * n + i + 1; j < n; j++, p++) s -= a[p] * x[j];
    x[i] = s / a[i * n + i];
  }
}

/** Solves Aᵀ x = b in place of b, with the factors of A. */
export function solveRealTransposed({ n, a, pivot }: RealLu, x: Float64Array): void {
  for (let i = 0; i < n; i++) {
    const v = x[i] / a[i * n + i];
    x[i] = v;
    if (v !== 0) for (let j = i + 1, p = i * n + i + 1; j < n; j++, p++) x[j] -= a[p] * v;
  }
  for (let i = n - 1; i > 0; i--) {
    const v = x[i];
    if (v !== 0) for (let j = 0, p = i * n; j < i; j++, p++) x[j] -= a[p] * v;
  }
  for (let k = n - 1; k >= 0; k--) exchange(x, k, pivot[k]);
}

function exchange(x: Float64Array, i: number, j: number): void {
  if (i === j) return;
  const t = x[i];
  x[i] = x[j];
  x[j] = t;
}
