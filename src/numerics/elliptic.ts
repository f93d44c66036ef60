/** Arithmetic-geometric mean of two positive numbers, to the last digit. */
export function arithmeticGeometricMean(a: number, b: number): number {
  let [x, y] = [a, b];
  // Quadratic convergence: forty steps serve any pair of doubles.
  for (let i = 0; i < 40 && Math.abs(x - y) > 1e-15 * x; i++) [x, y] = [(x + y) / 2, Math.sqrt(x * y)];
  return (x + y) / 2;
}

/**
 * K(k)/K(k′), ratio of the complete elliptic integrals of the first kind of a modulus and its complement: capacitance of two
 * electrodes on the edge of a half plane. By the arithmetic-geometric mean (Abramowitz and Stegun 1964, 17.6).
 *
 * @param k      modulus, in (0, 1)
 * @param kPrime sqrt(1 − k²); given apart where it is known better than the difference would yield
 */
export function ellipticRatio(k: number, kPrime: number = Math.sqrt((1 - k) * (1 + k))): number {
  if (!(k > 0 && k < 1 && kPrime > 0)) throw new RangeError(`a modulus between 0 and 1 is needed, got ${k}`);
  return arithmeticGeometricMean(1, k) / arithmeticGeometricMean(1, kPrime);
}
