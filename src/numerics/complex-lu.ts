/**
 * Dense complex LU factorisation with partial pivoting on flat row-major typed arrays, real and imaginary parts apart.
 * Written for a few hundred unknowns: no allocation in the loops.
 */
export interface ComplexMatrix {
  readonly n: number;
  readonly re: Float64Array;
  readonly im: Float64Array;
}

export function complexMatrix(n: number): ComplexMatrix {
  return { n, re: new Float64Array(n * n), im: new Float64Array(n * n) };
}

export interface ComplexLu {
  readonly n: number;
  readonly re: Float64Array;
  readonly im: Float64Array;
  readonly pivot: Int32Array;
}

/** Factorises in place: the matrix given is overwritten. @throws RangeError when the matrix is singular */
export function factorise(matrix: ComplexMatrix): ComplexLu {
  const { n, re, im } = matrix;
  const pivot = new Int32Array(n);
  for (let k = 0; k < n; k++) {
    let best = k;
    let size = 0;
    for (let i = k; i < n; i++) {
      const m = Math.abs(re[i * n + k]) + Math.abs(im[i * n + k]);
      if (m > size) [size, best] = [m, i];
    }
    if (!(size > 0)) throw new RangeError(`factorise: matrix singular at column ${k}`);
    pivot[k] = best;
    if (best !== k) swapRows(re, im, n, k, best);
    const kk = k * n + k;
    const d = re[kk] * re[kk] + im[kk] * im[kk];
    const ir = re[kk] / d;
    const ii = -im[kk] / d;
    for (let i = k + 1; i < n; i++) {
      const row = i * n;
      const ar = re[row + k];
      const ai = im[row + k];
      if (ar === 0 && ai === 0) continue;
      const fr = ar * ir - ai * ii;
      const fi = ar * ii + ai * ir;
      re[row + k] = fr;
      im[row + k] = fi;
      for (let j = k + 1, p = k * n + k + 1; j < n; j++, p++) {
        re[row + j] -= fr * re[p] - fi * im[p];
        im[row + j] -= fr * im[p] + fi * re[p];
      }
    }
  }
  return { n, re, im, pivot };
}

function swapRows(re: Float64Array, im: Float64Array, n: number, a: number, b: number): void {
  for (let j = 0; j < n; j++) {
    const r = re[a * n + j];
    re[a * n + j] = re[b * n + j];
    re[b * n + j] = r;
    const i = im[a * n + j];
    im[a * n + j] = im[b * n + j];
    im[b * n + j] = i;
  }
}

/** Solves A x = b in place of b. */
export function solveInPlace(lu: ComplexLu, xr: Float64Array, xi: Float64Array): void {
  const { n, re, im, pivot } = lu;
  for (let k = 0; k < n; k++) {
    const p = pivot[k];
    if (p === k) continue;
    const r = xr[k];
    xr[k] = xr[p];
    xr[p] = r;
    const i = xi[k];
    xi[k] = xi[p];
    xi[p] = i;
  }
  for (let i = 1; i < n; i++) {
    let sr = xr[i];
    let si = xi[i];
    for (let j = 0, p = i * n; j < i; j++, p++) {
      sr -= re[p] * xr[j] - im[p] * xi[j];
      si -= re[p] * xi[j] + im[p] * xr[j];
    }
    xr[i] = sr;
    xi[i] = si;
  }
  for (let i = n - 1; i >= 0; i--) {
    let sr = xr[i];
    let si = xi[i];
    for (let j = i + 1, p = i * n + i + 1; j < n; j++, p++) {
      sr -= re[p] * xr[j] - im[p] * xi[j];
      si -= re[p] * xi[j] + im[p] * xr[j];
    }
    const q = i * n + i;
    const d = re[q] * re[q] + im[q] * im[q];
    xr[i] = (sr * re[q] + si * im[q]) / d;
    xi[i] = (si * re[q] - sr * im[q]) / d;
  }
}
