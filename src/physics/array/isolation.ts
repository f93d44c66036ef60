/** Isolation between groups of columns, such as transmit and receive. */
import { abs } from '../../numerics/complex.js';
import { requireSquare, type ScatteringMatrix } from './active-reflection.js';

export interface Isolation {
  /** −20 log10 |S|, dB; infinite where nothing couples. */
  readonly isolationDb: number;
  /** Driven column of the worst pair, and the one that receives, both from 0. */
  readonly from: number;
  readonly to: number;
}

/**
 * Worst pair between two groups, either one driven, every other port terminated in its reference impedance.
 *
 * @param a columns of one group, from 0
 * @param b columns of the other
 * @throws RangeError on an empty group, a column that does not exist, or one in both groups
 */
export function isolation(scattering: ScatteringMatrix, a: readonly number[], b: readonly number[]): Isolation {
  requireSquare('isolation', scattering);
  if (a.length === 0 || b.length === 0) throw new RangeError('isolation: a group without columns');
  for (const column of [...a, ...b])
    if (!(Number.isInteger(column) && column >= 0 && column < scattering.length))
      throw new RangeError(`isolation: column ${column} of ${scattering.length}`);
  for (const column of a) if (b.includes(column)) throw new RangeError(`isolation: column ${column} is in both groups`);
  let [most, from, to] = [-1, a[0], b[0]];
  const consider = (driven: number, receiving: number): void => {
    const size = abs(scattering[receiving][driven]);
    if (size > most) [most, from, to] = [size, driven, receiving];
  };
  for (const m of a)
    for (const n of b) {
      consider(m, n);
      consider(n, m);
    }
  return { isolationDb: -20 * Math.log10(most), from, to };
}
