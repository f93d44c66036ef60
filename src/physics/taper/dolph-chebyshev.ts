/**
 * Amplitudes whose array factor is the Chebyshev polynomial T_{n−1}(x0 cos(ψ/2)): the narrowest main lobe for its sidelobes,
 * which are all alike.
 *
 * Source: C. L. Dolph, Proc. IRE 34(6), 1946, pp. 335–348. Amplitudes as the finite Fourier sum over n samples of the
 * polynomial: R. J. Stegen, Proc. IRE 41(11), 1953, pp. 1671–1674; no digits cancel, unlike in the explicit sums.
 * Below about half a wave of spacing, or in a scanned array, only part of the lobes is visible.
 *
 * @param sidelobeDb level of every sidelobe below the main lobe, dB, > 0
 * @returns          n amplitudes, symmetric, not normalised
 * @throws RangeError on a level that is not positive
 */
export function dolphChebyshev(n: number, sidelobeDb: number): number[] {
  if (!(Number.isFinite(sidelobeDb) && sidelobeDb > 0))
    throw new RangeError(`sidelobe level must be a positive number of dB, got ${sidelobeDb}`);
  if (n < 3) return Array<number>(n).fill(1);
  const order = n - 1;
  const x0 = Math.cosh(Math.acosh(10 ** (sidelobeDb / 20)) / order);
  const half = order / 2;
  return Array.from({ length: n }, (_, i) => {
    // Mirror elements share one sum, so that the amplitudes are symmetric to the last bit.
    const x = half - Math.min(i, order - i);
    let sum = 0;
    for (let s = 0; s < n; s++) {
      const psi = (2 * Math.PI * s) / n;
      sum += chebyshev(order, x0 * Math.cos(psi / 2)) * Math.cos(psi * x);
    }
    return sum / n;
  });
}

function chebyshev(order: number, x: number): number {
  if (Math.abs(x) <= 1) return Math.cos(order * Math.acos(x));
  return (x < 0 && order % 2 === 1 ? -1 : 1) * Math.cosh(order * Math.acosh(Math.abs(x)));
}
