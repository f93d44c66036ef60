import { bracketedRoot } from '../../numerics/brent.js';
import { peakSidelobeDb } from './array-factor.js';

/** How far the level put into the continuous distribution may move, dB, for the array of few elements to reach its own. */
const LEVEL_REACH = 12;

/**
 * Taylor's n̄ distribution sampled at the centres of n elements: n̄ − 1 sidelobes near the level asked for, then falling as 1/u.
 *
 * Source: T. T. Taylor, IRE Trans. Antennas Propag. 3(1), 1955, pp. 16–28. Few samples change the level of the array factor;
 * the level put into the distribution is therefore moved until the array's highest sidelobe is the one asked for. Where no
 * level within 12 dB does that (very few elements), the distribution stays as it is.
 *
 * @param sidelobeDb level below the main lobe, dB, > 0
 * @param nBar       whole number from 2 to n; at least 2A² + 1/2 for a monotone distribution (A = arcosh(ratio)/π)
 * @returns          n amplitudes, symmetric, not normalised
 * @throws RangeError on a level that is not positive or an n̄ outside its range
 */
export function taylor(n: number, sidelobeDb: number, nBar: number): number[] {
  if (!(Number.isFinite(sidelobeDb) && sidelobeDb > 0))
    throw new RangeError(`sidelobe level must be a positive number of dB, got ${sidelobeDb}`);
  if (n < 3) return Array<number>(n).fill(1);
  if (!(Number.isInteger(nBar) && nBar >= 2 && nBar <= n))
    throw new RangeError(`n̄ must be a whole number from 2 to the number of elements ${n}, got ${nBar}`);
  const excess = (level: number): number => {
    const found = peakSidelobeDb(sampled(n, level, nBar));
    return (Number.isNaN(found) ? Number.NEGATIVE_INFINITY : found) + sidelobeDb;
  };
  const [low, high] = [Math.max(1, sidelobeDb - LEVEL_REACH), sidelobeDb + LEVEL_REACH];
  const ends = [excess(low), excess(high)];
  if (!(Number.isFinite(ends[0]) && Number.isFinite(ends[1]) && ends[0] > 0 && ends[1] < 0))
    return sampled(n, sidelobeDb, nBar);
  return sampled(n, bracketedRoot(excess, [high, ends[1]], [low, ends[0]], 1e-9).inside, nBar);
}

function sampled(n: number, levelDb: number, nBar: number): number[] {
  const a = Math.acosh(10 ** (levelDb / 20)) / Math.PI;
  const sigma2 = nBar ** 2 / (a ** 2 + (nBar - 0.5) ** 2);
  const harmonics = Array.from({ length: nBar - 1 }, (_, i) => harmonic(i + 1, a, sigma2, nBar));
  return Array.from({ length: n }, (_, i) => {
    const x = (Math.abs(i - (n - 1) / 2) * 2 * Math.PI) / n;
    return harmonics.reduce((sum, f, m) => sum + 2 * f * Math.cos((m + 1) * x), 1);
  });
}

/** F(m, A, n̄): the pattern at u = m. */
function harmonic(m: number, a: number, sigma2: number, nBar: number): number {
  let f = 1;
  // [(n̄−1)!]² / ((n̄−1+m)! (n̄−1−m)!) as a product without factorials.
  for (let k = 1; k <= m; k++) f *= (nBar - k) / (nBar - 1 + k);
  for (let k = 1; k < nBar; k++) f *= 1 - m ** 2 / (sigma2 * (a ** 2 + (k - 0.5) ** 2));
  return f;
}
