/** Scattering between the ports of a board from the waves read on its feed lines. */
import { abs2, add, type Complex, complex, mul, scale, sub } from '../../numerics/complex.js';
import { complexMatrix, factorise, solveInPlace } from '../../numerics/complex-lu.js';

/**
 * Coupling is the same both ways. What a gap radiates into its neighbour's feed line besides is not, where one begins
 * further along than the other: the mean of both ways is free of what changes sign with that.
 */
export function reciprocal(read: readonly (readonly Complex[])[]): { mean: Complex[][]; disagreement: number } {
  let disagreement = 0;
  const mean = read.map((column, k) =>
    column.map((s, p) => {
      disagreement = Math.max(disagreement, Math.sqrt(abs2(sub(s, read[p][k]))));
      return scale(add(s, read[p][k]), 0.5);
    }),
  );
  return { mean, disagreement };
}

/**
 * From waves on the lines (column k of `onLines`: leaving waves for a unit wave at k) to waves at real references.
 */
export function renormalisation(
  onLines: readonly (readonly Complex[])[],
  from: readonly number[],
  to: readonly number[],
) {
  const n = from.length;
  // Waves a', b' at a reference r against a, b at z: a' = ((r + z) a + (z − r)·(…)): V = √z (a + b), I = (a − b)/√z.
  const p = from.map((z, i) => (z + to[i]) / (2 * Math.sqrt(z * to[i])));
  const q = from.map((z, i) => (z - to[i]) / (2 * Math.sqrt(z * to[i])));
  const inside = complexMatrix(n);
  for (let k = 0; k < n; k++)
    for (let i = 0; i < n; i++) {
      inside.re[i * n + k] = (i === k ? p[i] : 0) + q[i] * onLines[k][i].re;
      inside.im[i * n + k] = q[i] * onLines[k][i].im;
    }
  const lu = factorise(inside);
  const lineWaves = (incident: readonly Complex[]): Complex[] => {
    const re = Float64Array.from(incident, (a) => a.re);
    const im = Float64Array.from(incident, (a) => a.im);
    solveInPlace(lu, re, im);
    return incident.map((_, i) => complex(re[i], im[i]));
  };
  const leaving = (incident: readonly Complex[]): Complex[] => {
    const a = lineWaves(incident);
    return a.map((wave, i) => {
      let b = complex(0);
      for (let k = 0; k < n; k++) b = add(b, mul(onLines[k][i], a[k]));
      return add(scale(wave, q[i]), scale(b, p[i]));
    });
  };
  const columns = from.map((_, k) => leaving(from.map((__, i) => complex(i === k ? 1 : 0))));
  const scattering = from.map((_, i) => columns.map((column) => column[i]));
  return { lineWaves, leaving, scattering };
}
