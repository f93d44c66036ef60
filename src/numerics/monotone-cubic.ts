/**
 * Value at x of the monotone piecewise cubic through samples on an ascending grid (F. N. Fritsch and R. E. Carlson,
 * SIAM J. Numer. Anal. 17(2), 1980; slopes by their harmonic mean), held constant outside the grid. It neither overshoots nor
 * waves between samples, so that few solved points can stand for a curve.
 *
 * @param x at least two ascending knots
 */
export function monotoneCubic(x: readonly number[], y: readonly number[], at: number): number {
  const n = x.length;
  if (n < 2 || y.length !== n) throw new RangeError(`monotoneCubic: ${n} knots and ${y.length} values`);
  if (at <= x[0]) return y[0];
  if (at >= x[n - 1]) return y[n - 1];
  let i = 0;
  while (at > x[i + 1]) i++;
  const secant = (k: number): number => (y[k + 1] - y[k]) / (x[k + 1] - x[k]);
  const slope = (k: number): number => {
    if (k === 0) return secant(0);
    if (k === n - 1) return secant(n - 2);
    const [a, b] = [secant(k - 1), secant(k)];
    return a * b > 0 ? (2 * a * b) / (a + b) : 0;
  };
  const h = x[i + 1] - x[i];
  const t = (at - x[i]) / h;
  const u = 1 - t;
  return u * u * ((1 + 2 * t) * y[i] + t * h * slope(i)) + t * t * ((1 + 2 * u) * y[i + 1] - u * h * slope(i + 1));
}
