const SQRT_2PI = Math.sqrt(2 * Math.PI);

/**
 * Standard normal distribution function Φ(x), relative error below 1e-13 in both tails.
 *
 * Within |x| < 3 by the series Φ = ½ + φ(x) (x + x³/3 + x⁵/(3·5) + …) (Abramowitz and Stegun 1964, 26.2.11), beyond by
 * Laplace's continued fraction for the tail (26.2.14).
 */
export function normalCdf(x: number): number {
  if (Number.isNaN(x)) return Number.NaN;
  const ax = Math.abs(x);
  const density = Math.exp(-0.5 * x * x) / SQRT_2PI;
  if (ax < 3) {
    let term = x;
    let sum = x;
    for (let n = 3; Math.abs(term) > 1e-17 * Math.abs(sum); n += 2) {
      term *= (x * x) / n;
      sum += term;
    }
    return 0.5 + density * sum;
  }
  if (ax > 38) return x > 0 ? 1 : 0;
  let fraction = ax;
  for (let n = 80; n >= 1; n--) fraction = ax + n / fraction;
  const tail = density / fraction;
  return x > 0 ? 1 - tail : tail;
}

/**
 * The x with Φ(x) = p, by bisection to the last digit that matters here (|dx| < 1e-12).
 *
 * @param p in (0, 1)
 * @throws RangeError outside it
 */
export function normalQuantile(p: number): number {
  if (!(p > 0 && p < 1)) throw new RangeError(`a probability between 0 and 1 is needed, got ${p}`);
  // Φ is exact in its lower tail only, so the upper half goes by symmetry.
  if (p > 0.5) return -normalQuantile(1 - p);
  let low = -38;
  let high = 0.5;
  while (high - low > 1e-12) {
    const middle = 0.5 * (low + high);
    if (normalCdf(middle) < p) low = middle;
    else high = middle;
  }
  return 0.5 * (low + high);
}
