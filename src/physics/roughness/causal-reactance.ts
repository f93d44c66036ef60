import { add, type Complex, complex, log, mul, scale, sub } from '../../numerics/complex.js';
import { gaussLegendre } from '../../numerics/gauss-legendre.js';
import { groiss } from './groiss.js';
import { roughnessRatio } from './hammerstad.js';

const RULE = gaussLegendre(16);
/** Panels in the logarithm of frequency; beyond the last the integrand is below e⁻³⁰. */
const PANELS = [0, 1, 2.5, 5, 9, 15, 25, 60];

/**
 * Reactance over Rs that a loss factor K(Rq/δ) demands by causality, 1 included (Kramers–Kronig, in the logarithm of
 * frequency): X = 1 + (1/π) ∫ [e^{x/2} κ(r e^{x/2}) − e^{−x/2} κ(r e^{−x/2})]/sinh x dx over x > 0, κ = K − 1.
 *
 * It is the smallest reactance of that loss: any plane shift may be added to it and no loss can tell. So it refers to the
 * plane at which the currents of a very high frequency would flow, which the loss factor does not know; it is taken as the
 * mean plane. Source: H. W. Bode, Network Analysis and Feedback Amplifier Design, 1945, chapter 14. Error below 1e-6 for
 * factors that bend no faster than the published ones.
 *
 * @param excess κ(r), bounded, → 0 as r → 0
 */
export function causalReactance(excess: (r: number) => number, r: number): number {
  let sum = 0;
  for (let p = 1; p < PANELS.length; p++) {
    const half = 0.5 * (PANELS[p] - PANELS[p - 1]);
    for (let i = 0; i < RULE.nodes.length; i++) {
      const x = PANELS[p - 1] + half * (RULE.nodes[i] + 1);
      const e = Math.exp(0.5 * x);
      sum += (half * RULE.weights[i] * (e * excess(r * e) - excess(r / e) / e)) / Math.sinh(x);
    }
  }
  return 1 + sum / Math.PI;
}

/**
 * Hammerstad's loss factor with the reactance that causality demands, K + jX in units of the smooth surface resistance, in
 * closed form (own derivation): (1 + j) {1 + (2/π) [atan U + ln(1 + U) − ½ ln(1 + U²)]} with U = sqrt(1.4 j) Rq/δ. The real
 * part is Hammerstad's factor identically; X exceeds K by up to 0.63 (at Rq/δ of 0.6) and tends to it from above. Plane as for
 * `causalReactance`.
 */
export function hammerstadImpedance(rq: number, delta: number): Complex {
  const r = roughnessRatio(rq, delta);
  const u = scale(complex(Math.SQRT1_2, Math.SQRT1_2), Math.sqrt(1.4) * r);
  const ju = complex(-u.im, u.re);
  const plus = log(add(complex(1), ju));
  const minus = log(sub(complex(1), ju));
  // atan U = (j/2)(ln(1 − jU) − ln(1 + jU)); ln(1 + U²) = ln(1 − jU) + ln(1 + jU).
  const atan = mul(complex(0, 0.5), sub(minus, plus));
  const rest = sub(log(add(complex(1), u)), scale(add(minus, plus), 0.5));
  return mul(complex(1, 1), add(complex(1), scale(add(atan, rest), 2 / Math.PI)));
}

/** Groiss's loss factor with the reactance that causality demands, by quadrature; as `hammerstadImpedance`. */
export function groissImpedance(rq: number, delta: number): Complex {
  const r = roughnessRatio(rq, delta);
  if (r === 0) return complex(1, 1);
  return complex(
    groiss(rq, delta).factor,
    causalReactance((x) => groiss(x, 1).factor - 1, r),
  );
}
