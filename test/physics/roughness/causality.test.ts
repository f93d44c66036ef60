import { describe, expect, it } from 'vitest';
import type { Complex } from '../../../src/numerics/complex.js';
import {
  cannonball,
  causalReactance,
  exactSphereTerm,
  gradient,
  groissImpedance,
  hallHemispheres,
  hammerstad,
  hammerstadImpedance,
  hurayImpedance,
  smallPerturbation,
} from '../../../src/physics/roughness/index.js';
import { causalityDefect } from './kramers-kronig.js';

const perturbed =
  (lay: 'isotropic' | 'across' | 'along', spectrum: 'gaussian' | 'exponential' | 'single') => (r: number) =>
    smallPerturbation({ rq: r, correlationLength: 3 * r, lay, spectrum }, 1).impedance;

/** K + jX over Rq/δ, and the accuracy relative to |Z| that is asked of each. */
const MODELS: [string, (r: number) => Complex, number][] = [
  ['smooth', () => ({ re: 1, im: 1 }), 2e-4],
  ['Hammerstad', (r) => hammerstadImpedance(r, 1), 2e-4],
  ['Groiss', (r) => groissImpedance(r, 1), 2e-4],
  ['Hall', (r) => hallHemispheres(2 * r, 6 * r, 1).impedance, 2e-4],
  ['Huray', (r) => hurayImpedance([{ radius: r, perArea: 0.1 / r ** 2 }], 1), 2e-4],
  ['Huray, exact balls', (r) => hurayImpedance([{ radius: r, perArea: 0.1 / r ** 2 }], 1, 1, 'exact'), 2e-4],
  ['cannonball', (r) => cannonball(5.5 * r, 1), 2e-4],
  ['perturbation, isotropic', perturbed('isotropic', 'gaussian'), 2e-4],
  ['perturbation, across', perturbed('across', 'gaussian'), 2e-4],
  ['perturbation, along', perturbed('along', 'exponential'), 2e-4],
  ['perturbation, one wavelength', perturbed('isotropic', 'single'), 2e-4],
  // Its loss keeps growing nearly with the frequency, so the cut at Rq/δ = 60 shows.
  ['gradient', (r) => gradient(r, 1), 1e-3],
];

describe.each(MODELS)('causality, %s', (_name, z, accuracy) => {
  it.each([0.1, 0.4, 1, 2.5])('X at Rq/δ %d is what K demands, but for the choice of plane', (r) => {
    const { re, im } = z(r);
    expect(Math.abs(causalityDefect(z, r, 0.7))).toBeLessThan(accuracy * Math.hypot(re, im));
  });
});

describe('the test of causality', () => {
  it('finds X = K, the completion by a poorer conductor, wrong', () => {
    const equal = (r: number): Complex => ({ re: hammerstad(r, 1).factor, im: hammerstad(r, 1).factor });
    expect(Math.abs(causalityDefect(equal, 2.5, 0.7))).toBeGreaterThan(0.3);
  });

  it('finds a reactance of the wrong sign wrong', () => {
    const wrong = (r: number): Complex => {
      const { re, im } = exactSphereTerm(r, 1);
      return { re: 1 + re, im: 1 - im };
    };
    expect(Math.abs(causalityDefect(wrong, 2.5, 0.7))).toBeGreaterThan(0.1);
  });

  it('leaves the plane free: a constant inductance changes nothing', () => {
    const shifted = (r: number): Complex => {
      const { re, im } = hammerstadImpedance(r, 1);
      return { re, im: im + 2 * r };
    };
    expect(causalityDefect(shifted, 1, 0.7)).toBeCloseTo(
      causalityDefect((r) => hammerstadImpedance(r, 1), 1, 0.7),
      10,
    );
  });
});

describe('completed reactance of loss-only models', () => {
  it.each([0.01, 0.1, 0.5, 1, 3, 10])('closed form and quadrature agree for Hammerstad at Rq/δ %d', (r) => {
    const z = hammerstadImpedance(r, 1);
    expect(z.re).toBeCloseTo(hammerstad(r, 1).factor, 13);
    expect(causalReactance((x) => hammerstad(x, 1).factor - 1, r)).toBeCloseTo(z.im, 9);
  });

  it('is 1 on smooth copper and tends to K on coarse copper', () => {
    for (const z of [hammerstadImpedance, groissImpedance]) {
      expect(z(0, 1).im).toBe(1);
      expect(z(1e-4, 1).im).toBeCloseTo(1, 3);
      expect(z(50, 1).im / z(50, 1).re).toBeCloseTo(1, 2);
    }
  });
});
