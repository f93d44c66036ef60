/**
 * Lagrange weights on `count` evenly spaced nodes 0, 1, …, count − 1 for the point x: Σ w_m f(m) is exact for polynomials
 * of degree count − 1 (Abramowitz and Stegun 1964, 25.2.1).
 *
 * @param out weights are written from `first` on
 */
export function lagrangeWeights(count: number, x: number, out: Float64Array, first = 0): void {
  for (let m = 0; m < count; m++) {
    let weight = 1;
    for (let n = 0; n < count; n++) if (n !== m) weight *= (x - n) / (m - n);
    out[first + m] = weight;
  }
}
