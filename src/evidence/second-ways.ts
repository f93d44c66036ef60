import { type Complex, complex, div, exp, mul, scale, sub } from '../numerics/complex.js';
import { normalCdf } from '../numerics/normal.js';

/**
 * The gradient model's impedance by another way: the field itself instead of its impedance. E″ = 2j r² Φ(−s) E over the
 * height s in Rq, from a decaying wave deep in the metal to the straight line in the air, by Numerov's method with even steps.
 * Global error of fourth order.
 */
export function gradientByNumerov(r: number, steps = 2000): Complex {
  const h = 16 / steps;
  const twelfth = (i: number): Complex => complex(0, (h * h * 2 * r * r * normalCdf(8 - i * h)) / 12);
  let before = complex(1);
  let now = exp(complex(r * h, r * h));
  for (let i = 1; i < steps; i++) {
    const [fBefore, fNow, fNext] = [twelfth(i - 1), twelfth(i), twelfth(i + 1)];
    const right = sub(
      mul(complex(2 + 10 * fNow.re, 10 * fNow.im), now),
      mul(complex(1 - fBefore.re, -fBefore.im), before),
    );
    before = now;
    now = div(right, complex(1 - fNext.re, -fNext.im));
  }
  const slope = scale(sub(now, before), 1 / h);
  // Straight up there: E = a + b s; Z over Z0 is γ0 r a/b, γ0² = 2j.
  return scale(mul(complex(0, 2), div(sub(now, scale(slope, 8)), slope)), r);
}

/** Second-order perturbation of an isotropic Gaussian spectrum by a plain sum over its wavenumbers, skin depth 1. */
export function perturbationBySum(rq: number, length: number, terms = 40_000): Complex {
  const step = 13 / length / terms;
  const [h2, l2] = [rq * rq, length * length];
  let re = 0;
  let im = 0;
  for (let i = 0; i < terms; i++) {
    const k = (i + 0.5) * step;
    const weight = 0.5 * l2 * k * Math.exp(-0.25 * k * k * l2) * step;
    const modulus = Math.hypot(k * k, 2);
    re += weight * (Math.sqrt((modulus + k * k) / 2) - k / 2);
    im += weight * Math.sqrt((modulus - k * k) / 2);
  }
  // (1 + j)[1 − 2jh² + (1 + j)h²(re + j im)]
  const [a, b] = [1 + h2 * (re - im), h2 * (re + im) - 2 * h2];
  return complex(a - b, a + b);
}
