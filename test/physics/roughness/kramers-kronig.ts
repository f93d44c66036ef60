import type { Complex } from '../../../src/numerics/complex.js';
import { gaussLegendre } from '../../../src/numerics/gauss-legendre.js';

/** Rq/δ of the highest frequency in the integrals; what lies above cancels in the difference of two frequencies. */
const HIGHEST = 60;

/**
 * Hilbert transform of the resistance, in units in which δ = 1/r and ω = r²: X/ω up to a constant inductance,
 * (1/π) ∫ [R(ωeˣ) − R(ωe⁻ˣ)]/(ω sinh x) dx (Bode 1945, chapter 14).
 */
function inductance(z: (r: number) => Complex, r: number): number {
  const end = 2 * Math.log(HIGHEST / r);
  const { nodes, weights } = gaussLegendre(12);
  let sum = 0;
  let from = 0;
  for (const to of [0.5, 1, 2, 3, 4.5, 6, 8, end].filter((x) => x <= end)) {
    const half = 0.5 * (to - from);
    for (let i = 0; i < nodes.length; i++) {
      const x = from + half * (nodes[i]! + 1);
      const e = Math.exp(0.5 * x);
      sum += (half * weights[i]! * (e * z(r * e).re - z(r / e).re / e)) / Math.sinh(x);
    }
    from = to;
  }
  return sum / (Math.PI * r);
}

/**
 * How far X at `r` is from what causality demands of K, given X at `reference`: the once-subtracted Kramers–Kronig relation,
 * which leaves a model free to choose its plane. In units of the smooth surface resistance.
 *
 * @param z K + jX over Rq/δ
 */
export function causalityDefect(z: (r: number) => Complex, r: number, reference: number): number {
  const demanded = inductance(z, r) - inductance(z, reference);
  const found = z(r).im / r - z(reference).im / reference;
  return (found - demanded) * r;
}
