/**
 * J0 of a complex argument near the positive real axis, for integration paths that leave it.
 *
 * Power series to |z| = 11, Hankel's expansion beyond (Abramowitz & Stegun 1964, 9.1.10 and 9.2.5 to 9.2.10; from memory).
 * Absolute error below 1e-9 of e^{|Im z|}.
 */

const SERIES_END = 11;
const HANKEL_TERMS = 10;

/** @param out [Re J0, Im J0]; Re z ≥ 0 */
export function besselJ0Complex(re: number, im: number, out: Float64Array): void {
  if (re * re + im * im < SERIES_END * SERIES_END) series(re, im, out);
  else hankel(re, im, out);
}

function series(re: number, im: number, out: Float64Array): void {
  // Terms of −z²/4.
  const qr = -(re * re - im * im) / 4;
  const qi = -(re * im) / 2;
  let [tr, ti, sr, si] = [1, 0, 1, 0];
  for (let n = 1; n < 60; n++) {
    const k = 1 / (n * n);
    const r = (tr * qr - ti * qi) * k;
    ti = (tr * qi + ti * qr) * k;
    tr = r;
    sr += tr;
    si += ti;
    if (Math.abs(tr) + Math.abs(ti) < 1e-17) break;
  }
  out[0] = sr;
  out[1] = si;
}

function hankel(re: number, im: number, out: Float64Array): void {
  const size = re * re + im * im;
  const [wr, wi] = [re / size, -im / size];
  // P and Q: Σ of a_k z^−k with a_k = a_(k−1) (−(2k − 1)²)/(8k), signs + − − + of the asymptotic series.
  let [pr, pi, qr, qi] = [1, 0, 0, 0];
  let [tr, ti] = [1, 0];
  for (let k = 1; k <= HANKEL_TERMS; k++) {
    const a = -((2 * k - 1) ** 2) / (8 * k);
    const r = (tr * wr - ti * wi) * a;
    ti = (tr * wi + ti * wr) * a;
    tr = r;
    const sign = k % 4 === 0 || k % 4 === 1 ? 1 : -1;
    if (k % 2 === 0) {
      pr += sign * tr;
      pi += sign * ti;
    } else {
      qr += sign * tr;
      qi += sign * ti;
    }
  }
  // √(2/πz) (P cos χ − Q sin χ), χ = z − π/4
  const chi = re - Math.PI / 4;
  const [c, s] = [Math.cos(chi), Math.sin(chi)];
  const [ch, sh] = [Math.cosh(im), Math.sinh(im)];
  const [cr, ci] = [c * ch, -s * sh];
  const [sr, si] = [s * ch, c * sh];
  const ar = pr * cr - pi * ci - (qr * sr - qi * si);
  const ai = pr * ci + pi * cr - (qr * si + qi * sr);
  // Principal root of 2/(πz).
  const modulus = Math.sqrt(2 / (Math.PI * Math.sqrt(size)));
  const angle = -Math.atan2(im, re) / 2;
  const [rr, ri] = [modulus * Math.cos(angle), modulus * Math.sin(angle)];
  out[0] = rr * ar - ri * ai;
  out[1] = rr * ai + ri * ar;
}
