/**
 * Bessel functions of whole order of a real argument, from the cephes library (Moshier 1989; relative error below
 * 1e-15 near their maxima). The library compiles itself once at import.
 */
import cephes from 'cephes';

await cephes.compiled;

export const besselJ0 = (x: number): number => cephes.j0(x);
/** Fills `out` with J0(x), J2(x), J4(x) and so on; x > 0; absolute error below 1e-12 for up to 100 functions. */
export function evenBesselJ(x: number, out: Float64Array): void {
  if (x < 2 * out.length) {
    evenBesselJDownward(x, out);
    return;
  }
  // Upward recurrence is stable while the order stays below the argument, and much faster.
  let [even, odd] = [cephes.j0(x), cephes.j1(x)];
  out[0] = even;
  for (let n = 1; n < out.length; n++) {
    even = ((4 * n - 2) / x) * odd - even;
    odd = ((4 * n) / x) * even - odd;
    out[n] = even;
  }
}

/** Miller's downward recurrence from an order where the function is nothing, normalised by J0 + 2 Σ J2n = 1. */
function evenBesselJDownward(x: number, out: Float64Array): void {
  const LARGE = 1e150;
  let [above, here, sum] = [0, 1, 0];
  for (let order = 40 + 2 * Math.ceil(1.25 * out.length); order >= 0; order--) {
    if (order % 2 === 0) {
      sum += order > 0 ? 2 * here : here;
      if (order / 2 < out.length) out[order / 2] = here;
    }
    [above, here] = [here, ((2 * order) / x) * here - above];
    if (Math.abs(here) > LARGE) {
      above /= LARGE;
      here /= LARGE;
      sum /= LARGE;
      for (let n = Math.ceil(order / 2); n < out.length; n++) out[n] /= LARGE;
    }
  }
  for (let n = 0; n < out.length; n++) out[n] /= sum;
}

/** Second kind; x > 0. */
export const besselY0 = (x: number): number => cephes.y0(x);
/** Modified, second kind; x > 0. */
export const besselK0 = (x: number): number => cephes.k0(x);
