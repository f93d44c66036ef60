import { dolphChebyshev } from './dolph-chebyshev.js';
import { taylor } from './taylor.js';

/** Amplitudes asked for along a column or across an array. Sidelobe levels in dB below the main lobe, positive. */
export type Taper =
  | { readonly kind: 'uniform' }
  | { readonly kind: 'dolph-chebyshev'; readonly sidelobeDb: number }
  | { readonly kind: 'taylor'; readonly sidelobeDb: number; readonly nBar: number }
  | { readonly kind: 'given'; readonly amplitudes: readonly number[] };

/**
 * Amplitudes of `n` equally spaced elements in phase, the largest 1.
 *
 * @throws RangeError on fewer than one element, a level that is not positive, or given amplitudes that are not one positive
 *         number for each element
 */
export function taperAmplitudes(taper: Taper, n: number): number[] {
  if (!(Number.isInteger(n) && n >= 1)) throw new RangeError(`taper: number of elements must be 1 or more, got ${n}`);
  switch (taper.kind) {
    case 'uniform':
      return Array<number>(n).fill(1);
    case 'dolph-chebyshev':
      return normalised(dolphChebyshev(n, taper.sidelobeDb));
    case 'taylor':
      return normalised(taylor(n, taper.sidelobeDb, taper.nBar));
    case 'given':
      if (taper.amplitudes.length !== n)
        throw new RangeError(`taper: ${taper.amplitudes.length} amplitudes given for ${n} elements`);
      for (const a of taper.amplitudes)
        if (!(Number.isFinite(a) && a > 0)) throw new RangeError(`taper: amplitudes must be positive, got ${a}`);
      return normalised(taper.amplitudes);
  }
}

const normalised = (amplitudes: readonly number[]): number[] => {
  const largest = Math.max(...amplitudes);
  return amplitudes.map((a) => a / largest);
};

/** Directivity of these amplitudes over that of uniform ones, isotropic elements half a wave apart: (Σa)²/(n Σa²). */
export function taperEfficiency(amplitudes: readonly number[]): number {
  let [sum, squares] = [0, 0];
  for (const a of amplitudes) {
    sum += a;
    squares += a * a;
  }
  return (sum * sum) / (amplitudes.length * squares);
}
