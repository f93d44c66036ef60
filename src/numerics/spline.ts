/**
 * Cubic spline through samples on an ascending grid, not-a-knot at both ends (de Boor 1978), as slopes at the knots,
 * so that several functions on one grid share one search for the interval.
 *
 * @param x at least four ascending knots
 * @returns slope of the spline at each knot
 */
export function splineSlopes(x: Float64Array, y: Float64Array): Float64Array {
  const n = x.length;
  if (n < 4 || y.length !== n) throw new RangeError(`splineSlopes: ${n} knots and ${y.length} values, 4 or more alike`);
  const lower = new Float64Array(n);
  const diagonal = new Float64Array(n);
  const upper = new Float64Array(n);
  const slope = new Float64Array(n);
  const h = (i: number): number => x[i + 1] - x[i];
  const d = (i: number): number => (y[i + 1] - y[i]) / h(i);
  diagonal[0] = h(1);
  upper[0] = h(0) + h(1);
  slope[0] = ((h(0) + 2 * (h(0) + h(1))) * h(1) * d(0) + h(0) * h(0) * d(1)) / (h(0) + h(1));
  for (let i = 1; i < n - 1; i++) {
    lower[i] = h(i);
    diagonal[i] = 2 * (h(i - 1) + h(i));
    upper[i] = h(i - 1);
    slope[i] = 3 * (h(i) * d(i - 1) + h(i - 1) * d(i));
  }
  const a = h(n - 2);
  const b = h(n - 3);
  lower[n - 1] = a + b;
  diagonal[n - 1] = b;
  slope[n - 1] = (a * a * d(n - 3) + (2 * (a + b) + a) * b * d(n - 2)) / (a + b);
  for (let i = 1; i < n; i++) {
    const factor = lower[i] / diagonal[i - 1];
    diagonal[i] -= factor * upper[i - 1];
    slope[i] -= factor * slope[i - 1];
  }
  slope[n - 1] /= diagonal[n - 1];
  for (let i = n - 2; i >= 0; i--) slope[i] = (slope[i] - upper[i] * slope[i + 1]) / diagonal[i];
  return slope;
}
