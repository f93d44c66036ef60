/** Change of the reference impedances of an S-matrix. */
import { type Complex, complex } from '../../numerics/complex.js';
import { complexMatrix, factorise, solveInPlace } from '../../numerics/complex-lu.js';
import { requireSquare, type ScatteringMatrix } from './active-reflection.js';

/**
 * The same circuit seen from other real reference impedances.
 *
 * From V = √R (a + b), I = (a − b)/√R: a′ = p a + q b, b′ = q a + p b with p, q = (R ± R′)/(2√(RR′)), so
 * S′ = (q + p S)(p + q S)⁻¹; the usual change of power waves for real impedances (K. Kurokawa, IEEE Trans. Microw.
 * Theory Tech. 13(2), 1965; from memory).
 *
 * @param from real reference impedance of each port now, ohm
 * @param to   and wanted, ohm
 * @throws RangeError when numbers differ or an impedance is not positive
 */
export function renormalise(scattering: ScatteringMatrix, from: readonly number[], to: readonly number[]): Complex[][] {
  requireSquare('renormalise', scattering);
  const n = scattering.length;
  if (from.length !== n || to.length !== n)
    throw new RangeError(`renormalise: ${from.length} and ${to.length} impedances for ${n} ports`);
  for (const r of [...from, ...to])
    if (!(r > 0 && Number.isFinite(r))) throw new RangeError(`renormalise: reference impedance ${r} Ω`);
  const p = from.map((r, i) => (r + to[i]) / (2 * Math.sqrt(r * to[i])));
  const q = from.map((r, i) => (r - to[i]) / (2 * Math.sqrt(r * to[i])));
  // Rows x of S′ from Dᵀ xᵀ = (row of q + pS)ᵀ with D = p + qS.
  const transposed = complexMatrix(n);
  for (let i = 0; i < n; i++)
    for (let j = 0; j < n; j++) {
      transposed.re[j * n + i] = q[i] * scattering[i][j].re + (i === j ? p[i] : 0);
      transposed.im[j * n + i] = q[i] * scattering[i][j].im;
    }
  const lu = factorise(transposed);
  return scattering.map((row, i) => {
    const re = Float64Array.from(row, (s, j) => p[i] * s.re + (i === j ? q[i] : 0));
    const im = Float64Array.from(row, (s) => p[i] * s.im);
    solveInPlace(lu, re, im);
    return row.map((_, j) => complex(re[j], im[j]));
  });
}
