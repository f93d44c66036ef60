/** The functions of √(k² − εr k0²) that a layer's line needs, in real arithmetic: they are called at every node. */

/** Principal square root: out = [Re ≥ 0, Im]. */
export function squareRoot(re: number, im: number, out: Float64Array): void {
  const modulus = Math.sqrt(re * re + im * im);
  const large = Math.sqrt((modulus + Math.abs(re)) / 2);
  const small = large === 0 ? 0 : Math.abs(im) / (2 * large);
  const sign = im < 0 ? -1 : 1;
  out[0] = re >= 0 ? large : small;
  out[1] = sign * (re >= 0 ? small : large);
}

/** tanh(u h)/u from u²: out = [Re, Im]. */
export function tanhOver(uuRe: number, uuIm: number, h: number, out: Float64Array): void {
  const hh = h * h;
  if ((uuRe * uuRe + uuIm * uuIm) * hh * hh < 1e-10) {
    // h (1 − q/3 + 2q²/15), q = u²h²: the next term is below 1e-16.
    const [qr, qi] = [uuRe * hh, uuIm * hh];
    out[0] = h * (1 - qr / 3 + (2 * (qr * qr - qi * qi)) / 15);
    out[1] = h * (-qi / 3 + (4 * qr * qi) / 15);
    return;
  }
  squareRoot(uuRe, uuIm, out);
  const [ur, ui] = [out[0], out[1]];
  let [tr, ti] = [1, 0];
  // From there tanh is 1 to the last bit.
  if (ur * h < 20) {
    const e = Math.exp(2 * ur * h);
    const over = 2 / (e + 1 / e + 2 * Math.cos(2 * ui * h));
    tr = ((e - 1 / e) / 2) * over;
    ti = Math.sin(2 * ui * h) * over;
  }
  const size = ur * ur + ui * ui;
  out[0] = (tr * ur + ti * ui) / size;
  out[1] = (ti * ur - tr * ui) / size;
}
