import { describe, expect, it } from 'vitest';
import { besselJ0 } from '../../src/numerics/bessel.js';
import { complexBesselJ0 } from '../../src/numerics/complex-bessel.js';

/** (1/2π) ∮ e^{jz sin φ} dφ by the trapezoidal rule, which converges faster than any power. */
function integral(re: number, im: number): [number, number] {
  const steps = 700;
  let [sumRe, sumIm] = [0, 0];
  for (let n = 0; n < steps; n++) {
    const s = Math.sin((2 * Math.PI * (n + 0.5)) / steps);
    sumRe += (Math.cos(re * s) * Math.cosh(im * s)) / steps;
    sumIm -= (Math.sin(re * s) * Math.sinh(im * s)) / steps;
  }
  return [sumRe, sumIm];
}

describe('J0 of a complex argument', () => {
  const out = new Float64Array(2);

  it('equals its integral in every region and where regions meet', () => {
    for (const modulus of [0, 0.3, 1.99, 2.01, 7, 24.9, 25.1, 60, 250]) {
      for (const y of [0, 0.5, 2, 4, 6, -3]) {
        complexBesselJ0(modulus, y, out);
        const [re, im] = integral(modulus, y);
        expect(Math.hypot(out[0] - re, out[1] - im)).toBeLessThan(3e-14 * Math.exp(Math.abs(y)));
      }
    }
  });

  it('is the real function on the real axis', () => {
    for (const x of [0.1, 3, 11, 24, 26, 300]) {
      complexBesselJ0(x, 0, out);
      expect(Math.abs(out[0] - besselJ0(x))).toBeLessThan(1e-14);
      expect(out[1]).toBeCloseTo(0, 15);
    }
  });

  it('refuses what it cannot work out', () => {
    expect(() => complexBesselJ0(-1, 0, out)).toThrow(RangeError);
    expect(() => complexBesselJ0(3, 13, out)).toThrow(RangeError);
    expect(() => complexBesselJ0(Number.NaN, 0, out)).toThrow(RangeError);
  });
});
