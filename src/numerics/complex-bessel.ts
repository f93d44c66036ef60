/**
 * J0 of a complex argument with Re z ≥ 0 and a modest imaginary part: out = [Re, Im].
 *
 * Power series below |z| = 2, downward recurrence normalised by J0 + 2 Σ J2n = 1 (Miller; Abramowitz and Stegun 1964,
 * 9.12 and 9.1.46) below 25, Hankel's expansion (9.2.5) from there. Error below 1e-14 e^{|Im z|} for |Im z| up to 6.
 *
 * @throws RangeError for Re z < 0 or |Im z| > 12, where the recurrence loses digits
 */
export function complexBesselJ0(re: number, im: number, out: Float64Array): void {
  if (!(re >= 0 && Math.abs(im) <= 12)) throw new RangeError(`complexBesselJ0: ${re} + ${im}j is outside the range`);
  const modulus = Math.hypot(re, im);
  if (modulus < 2) powerSeries(re, im, out);
  else if (modulus < 25) downwardRecurrence(re, im, modulus, out);
  else hankelExpansion(re, im, out);
}

/** Σ (−z²/4)^n / n!² */
function powerSeries(re: number, im: number, out: Float64Array): void {
  const [qr, qi] = [-(re * re - im * im) / 4, (-re * im) / 2];
  let [tr, ti] = [1, 0];
  out[0] = 1;
  out[1] = 0;
  for (let n = 1; n < 16; n++) {
    const next = (tr * qr - ti * qi) / (n * n);
    ti = (tr * qi + ti * qr) / (n * n);
    tr = next;
    out[0] += tr;
    out[1] += ti;
  }
}

function downwardRecurrence(re: number, im: number, modulus: number, out: Float64Array): void {
  const size = modulus * modulus;
  const [vr, vi] = [re / size, -im / size];
  let [ar, ai, hr, hi] = [0, 0, 1e-60, 0];
  let [sr, si] = [0, 0];
  for (let order = 36 + 2 * Math.ceil(0.6 * modulus); order > 0; order--) {
    if (order % 2 === 0) {
      sr += 2 * hr;
      si += 2 * hi;
    }
    const factor = 2 * order;
    const nr = factor * (hr * vr - hi * vi) - ar;
    const ni = factor * (hr * vi + hi * vr) - ai;
    [ar, ai, hr, hi] = [hr, hi, nr, ni];
  }
  sr += hr;
  si += hi;
  const q = sr * sr + si * si;
  out[0] = (hr * sr + hi * si) / q;
  out[1] = (hi * sr - hr * si) / q;
}

/** √(2/πz) (P cos(z − π/4) − Q sin(z − π/4)) */
function hankelExpansion(re: number, im: number, out: Float64Array): void {
  const size = re * re + im * im;
  const [vr, vi] = [re / size, -im / size];
  let [pr, pi, qr, qi] = [1, 0, 0, 0];
  let [tr, ti] = [1, 0];
  for (let k = 1; k < 24; k++) {
    // a_k/z^k with a_k = −a_{k−1} (2k − 1)²/(8k)
    const factor = -((2 * k - 1) ** 2) / (8 * k);
    const next = factor * (tr * vr - ti * vi);
    ti = factor * (tr * vi + ti * vr);
    tr = next;
    const sign = k % 4 < 2 ? 1 : -1;
    if (k % 2 === 0) {
      pr += sign * tr;
      pi += sign * ti;
    } else {
      qr += sign * tr;
      qi += sign * ti;
    }
    if (Math.abs(tr) + Math.abs(ti) < 1e-17) break;
  }
  const x = re - Math.PI / 4;
  const [c, s, ch, sh] = [Math.cos(x), Math.sin(x), Math.cosh(im), Math.sinh(im)];
  const [cr, ci, nr, ni] = [c * ch, -s * sh, s * ch, c * sh];
  const sumRe = pr * cr - pi * ci - (qr * nr - qi * ni);
  const sumIm = pr * ci + pi * cr - (qr * ni + qi * nr);
  const modulus = Math.sqrt(2 / (Math.PI * Math.sqrt(size)));
  const angle = -Math.atan2(im, re) / 2;
  const [wr, wi] = [modulus * Math.cos(angle), modulus * Math.sin(angle)];
  out[0] = sumRe * wr - sumIm * wi;
  out[1] = sumRe * wi + sumIm * wr;
}
