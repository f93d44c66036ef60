/** A complex vector, real and imaginary parts apart. */
export interface ComplexVector {
  readonly re: Float64Array;
  readonly im: Float64Array;
}

export const complexVector = (n: number): ComplexVector => ({ re: new Float64Array(n), im: new Float64Array(n) });

/** y = A x; must not keep x. */
export type LinearMap = (x: ComplexVector, y: ComplexVector) => void;

export interface GmresResult {
  readonly iterations: number;
  /** |b − A x| / |b| as the recurrence has it. */
  readonly residual: number;
}

/**
 * Solves A x = b by generalised minimal residuals, preconditioned from the right, so that the residual is the true one.
 * Source: Y. Saad and M. H. Schultz, SIAM J. Sci. Stat. Comput. 7(3), 1986; modified Gram–Schmidt, Givens rotations.
 *
 * @param x  the start on entry, the solution on return
 * @param tolerance relative residual at which to stop
 * @param most iterations before it gives up; no restart, so that many vectors are kept
 */
export function gmres(
  apply: LinearMap,
  precondition: LinearMap,
  b: ComplexVector,
  x: ComplexVector,
  tolerance: number,
  most: number,
): GmresResult {
  const n = b.re.length;
  const norm = norm2(b);
  if (norm === 0) {
    x.re.fill(0);
    x.im.fill(0);
    return { iterations: 0, residual: 0 };
  }
  const basis: ComplexVector[] = [];
  const w = complexVector(n);
  apply(x, w);
  const first = complexVector(n);
  for (let i = 0; i < n; i++) {
    first.re[i] = b.re[i] - w.re[i];
    first.im[i] = b.im[i] - w.im[i];
  }
  let residual = norm2(first);
  if (residual <= tolerance * norm) return { iterations: 0, residual: residual / norm };
  scaleBy(first, 1 / residual);
  basis.push(first);
  // Upper triangle column by column, rotations, and the rotated right-hand side.
  const h: ComplexVector[] = [];
  const cosine = new Float64Array(most);
  const sine = complexVector(most);
  const g = complexVector(most + 1);
  g.re[0] = residual;
  const z = complexVector(n);
  let k = 0;
  while (k < most && residual > tolerance * norm) {
    precondition(basis[k], z);
    const next = complexVector(n);
    apply(z, next);
    const column = complexVector(k + 2);
    for (let i = 0; i <= k; i++) {
      const [re, im] = dot(basis[i], next);
      column.re[i] = re;
      column.im[i] = im;
      subtract(next, basis[i], re, im);
    }
    const below = norm2(next);
    for (let i = 0; i < k; i++) rotate(column, i, cosine[i], sine.re[i], sine.im[i]);
    // Rotation that takes `below` out: [c, s; −s*, c] with real c.
    const ar = column.re[k];
    const ai = column.im[k];
    const size = Math.hypot(ar, ai);
    const whole = Math.hypot(size, below);
    const c = size / whole;
    const sr = size > 0 ? (ar * below) / (size * whole) : 1;
    const si = size > 0 ? (ai * below) / (size * whole) : 0;
    cosine[k] = c;
    sine.re[k] = sr;
    sine.im[k] = si;
    column.re[k + 1] = below;
    rotate(column, k, c, sr, si);
    rotate(g, k, c, sr, si);
    h.push(column);
    residual = Math.hypot(g.re[k + 1], g.im[k + 1]);
    k++;
    if (!(below > 1e-300)) break;
    scaleBy(next, 1 / below);
    basis.push(next);
  }
  const y = backSubstitute(h, g, k);
  w.re.fill(0);
  w.im.fill(0);
  for (let i = 0; i < k; i++) subtract(w, basis[i], -y.re[i], -y.im[i]);
  precondition(w, z);
  for (let i = 0; i < n; i++) {
    x.re[i] += z.re[i];
    x.im[i] += z.im[i];
  }
  return { iterations: k, residual: residual / norm };
}

/** Rows i and i + 1 of a column: [c, s; −s*, c]. */
function rotate(v: ComplexVector, i: number, c: number, sr: number, si: number): void {
  const ar = v.re[i];
  const ai = v.im[i];
  const br = v.re[i + 1];
  const bi = v.im[i + 1];
  v.re[i] = c * ar + sr * br - si * bi;
  v.im[i] = c * ai + sr * bi + si * br;
  v.re[i + 1] = c * br - sr * ar - si * ai;
  v.im[i + 1] = c * bi - sr * ai + si * ar;
}

function backSubstitute(h: readonly ComplexVector[], g: ComplexVector, k: number): ComplexVector {
  const y = complexVector(k);
  for (let i = k - 1; i >= 0; i--) {
    let re = g.re[i];
    let im = g.im[i];
    for (let j = i + 1; j < k; j++) {
      re -= h[j].re[i] * y.re[j] - h[j].im[i] * y.im[j];
      im -= h[j].re[i] * y.im[j] + h[j].im[i] * y.re[j];
    }
    const dr = h[i].re[i];
    const di = h[i].im[i];
    const d = dr * dr + di * di;
    y.re[i] = (re * dr + im * di) / d;
    y.im[i] = (im * dr - re * di) / d;
  }
  return y;
}

function norm2({ re, im }: ComplexVector): number {
  let sum = 0;
  for (let i = 0; i < re.length; i++) sum += re[i] * re[i] + im[i] * im[i];
  return Math.sqrt(sum);
}

function scaleBy({ re, im }: ComplexVector, k: number): void {
  for (let i = 0; i < re.length; i++) {
    re[i] *= k;
    im[i] *= k;
  }
}

/** ⟨a, b⟩ = Σ a* b. */
function dot(a: ComplexVector, b: ComplexVector): readonly [number, number] {
  const ar = a.re;
  const ai = a.im;
  const br = b.re;
  const bi = b.im;
  let re = 0;
  let im = 0;
  for (let i = 0; i < ar.length; i++) {
    re += ar[i] * br[i] + ai[i] * bi[i];
    im += ar[i] * bi[i] - ai[i] * br[i];
  }
  return [re, im];
}

/** v −= (kr + j ki) a. */
function subtract(v: ComplexVector, a: ComplexVector, kr: number, ki: number): void {
  const vr = v.re;
  const vi = v.im;
  const ar = a.re;
  const ai = a.im;
  for (let i = 0; i < vr.length; i++) {
    vr[i] -= kr * ar[i] - ki * ai[i];
    vi[i] -= kr * ai[i] + ki * ar[i];
  }
}
