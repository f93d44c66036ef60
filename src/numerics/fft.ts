/** Tables of a transform of one length; made once, used for many lines. */
export interface FftPlan {
  readonly length: number;
  readonly reversed: Uint32Array;
  readonly cos: Float64Array;
  readonly sin: Float64Array;
}

/** Smallest power of two that is n or more. */
export function powerOfTwoFrom(n: number): number {
  let length = 1;
  while (length < n) length *= 2;
  return length;
}

/** @throws RangeError where the length is no power of two */
export function fftPlan(length: number): FftPlan {
  if (!(Number.isInteger(length) && length >= 1 && powerOfTwoFrom(length) === length))
    throw new RangeError(`fftPlan: a length that is a power of two is needed, got ${length}`);
  const reversed = new Uint32Array(length);
  for (let i = 1; i < length; i++) reversed[i] = (reversed[i >> 1] >> 1) | (i & 1 ? length >> 1 : 0);
  const half = length >> 1;
  const cos = Float64Array.from({ length: half }, (_, i) => Math.cos((2 * Math.PI * i) / length));
  const sin = Float64Array.from({ length: half }, (_, i) => Math.sin((2 * Math.PI * i) / length));
  return { length, reversed, cos, sin };
}

/**
 * Discrete Fourier transform in place, X_k = Σ x_n e^{−j2πkn/N}, not scaled. Radix two (J. W. Cooley and J. W. Tukey, Math.
 * Comput. 19, 1965). The inverse is the same with real and imaginary parts exchanged on the way in and out, over N.
 */
export function fft({ length, reversed, cos, sin }: FftPlan, re: Float64Array, im: Float64Array): void {
  for (let i = 0; i < length; i++) {
    const j = reversed[i];
    if (j <= i) continue;
    const [a, b] = [re[i], im[i]];
    re[i] = re[j];
    im[i] = im[j];
    re[j] = a;
    im[j] = b;
  }
  for (let half = 1; half < length; half *= 2) {
    const stride = length / (2 * half);
    for (let start = 0; start < length; start += 2 * half)
      for (let k = 0, t = 0; k < half; k++, t += stride) {
        const p = start + k;
        const q = p + half;
        const c = cos[t];
        const s = sin[t];
        const x = re[q] * c + im[q] * s;
        const y = im[q] * c - re[q] * s;
        re[q] = re[p] - x;
        im[q] = im[p] - y;
        re[p] += x;
        im[p] += y;
      }
  }
}

/** Two-dimensional transform in place of a row-major field; columns × rows are the lengths of the two plans. */
export function fft2(columns: FftPlan, rows: FftPlan, re: Float64Array, im: Float64Array): void {
  const width = columns.length;
  for (let r = 0; r < rows.length; r++)
    fft(columns, re.subarray(r * width, (r + 1) * width), im.subarray(r * width, (r + 1) * width));
  const a = new Float64Array(rows.length);
  const b = new Float64Array(rows.length);
  for (let c = 0; c < width; c++) {
    for (let r = 0, p = c; r < rows.length; r++, p += width) {
      a[r] = re[p];
      b[r] = im[p];
    }
    fft(rows, a, b);
    for (let r = 0, p = c; r < rows.length; r++, p += width) {
      re[p] = a[r];
      im[p] = b[r];
    }
  }
}
