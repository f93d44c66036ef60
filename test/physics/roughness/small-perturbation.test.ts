import { describe, expect, it } from 'vitest';
import {
  areaLimitedPerturbation,
  correlationLengthFromAreaRatio,
  gradient,
  isotropicAreaRatio,
  type Lay,
  profileLengthRatio,
  smallPerturbation,
} from '../../../src/physics/roughness/index.js';

const LAYS: Lay[] = ['isotropic', 'across', 'along'];
const RATIOS = [0.05, 0.1, 0.3, 0.6, 1, 2, 4, 8];
const at = (r: number, lengthOverRq: number, lay: Lay) =>
  smallPerturbation({ rq: r, correlationLength: lengthOverRq * r, lay }, 1);

describe.each(LAYS)('second-order perturbation, %s', (lay) => {
  it('is smooth copper without height and tends to it with falling frequency', () => {
    expect(smallPerturbation({ rq: 0, correlationLength: 1, lay }, 1).impedance).toEqual({ re: 1, im: 1 });
    expect(at(0.003, 3, lay).impedance.re - 1).toBeLessThan(2e-5);
    expect(Math.abs(at(0.003, 3, lay).impedance.im - 1)).toBeLessThan(3e-3);
  });

  it('loses more the rougher and the steeper', () => {
    const over = (values: number[]) => values.slice(1).every((v, i) => v > values[i]!);
    expect(over(RATIOS.map((r) => at(r, 4, lay).impedance.re))).toBe(true);
    expect(over([8, 5, 4, 3].map((l) => at(1, l, lay).impedance.re))).toBe(true);
  });

  it('tends to half the mean square gradient at high frequency', () => {
    const p = at(300, 5, lay);
    expect(p.impedance.re - 1).toBeCloseTo(0.5 * p.gradient ** 2, 5);
    // Gaussian autocorrelation: profile slope √2 h/l whatever the lay.
    expect(p.profileSlope).toBeCloseTo(Math.SQRT2 / 5, 12);
  });

  it('depends on heights and lengths over skin depth only', () => {
    const scaled = smallPerturbation({ rq: 0.3e-6, correlationLength: 1e-6, lay }, 0.24e-6);
    const plain = smallPerturbation({ rq: 0.3 / 0.24, correlationLength: 1 / 0.24, lay }, 1);
    expect(scaled.impedance.re).toBeCloseTo(plain.impedance.re, 12);
    expect(scaled.planeShift).toBeCloseTo(plain.planeShift * 0.24e-6, 18);
  });
});

describe('direction of the current', () => {
  it('changes the phase but not the loss of grooves', () => {
    const [across, along] = [at(0.5, 4, 'across'), at(0.5, 4, 'along')];
    expect(across.impedance.re).toBeCloseTo(along.impedance.re, 13);
    expect(across.impedance.im).toBeGreaterThan(along.impedance.im);
  });

  it('along grooves the wave is not slowed: the slow-wave length stays near half a skin depth however rough', () => {
    for (const r of [1, 4, 10]) {
      const p = at(r, 5, 'along');
      expect(Math.abs(0.5 * p.impedance.im + p.planeShift - 0.5)).toBeLessThan(0.03);
    }
  });

  it('across grooves it is slowed by the electrostatic plane and the arc', () => {
    const p = at(10, 5, 'across');
    expect(0.5 * p.impedance.im).toBeCloseTo(0.5 * p.impedance.re, 3);
    expect(p.planeShift).toBeCloseTo((2 / Math.sqrt(Math.PI) / 5) * 10, 6);
  });
});

describe('integrals', () => {
  it('agree with a plain sum over the spectrum to 1e-6', () => {
    // Isotropic Gaussian spectrum: ∫ (l²/2) k exp(−k²l²/4) sqrt(k² + 2j) dk by the midpoint rule.
    for (const [h, l] of [
      [0.3, 0.2],
      [0.3, 1],
      [1, 20],
    ] as const) {
      const n = 400_000;
      const end = 13 / l;
      let re = 0;
      let im = 0;
      let first = 0;
      for (let i = 0; i < n; i++) {
        const k = ((i + 0.5) * end) / n;
        const w = 0.5 * l * l * k * Math.exp(-0.25 * k * k * l * l) * (end / n);
        const m = Math.hypot(k * k, 2);
        re += w * Math.sqrt((m + k * k) / 2);
        im += w * Math.sqrt((m - k * k) / 2);
        first += w * k;
      }
      // (1 + j)[1 − 2jh² + (1 + j)h²(g − k/2)]
      const [a, b] = [1 + h * h * (re - first / 2 - im), h * h * (re - first / 2 + im) - 2 * h * h];
      const z = smallPerturbation({ rq: h, correlationLength: l, lay: 'isotropic' }, 1).impedance;
      expect(Math.abs(z.re - (a - b))).toBeLessThan(1e-6);
      expect(Math.abs(z.im - (a + b))).toBeLessThan(1e-6);
    }
  });
});

describe('held to the area ratio', () => {
  it.each(['isotropic', 'across'] as const)('tends to the area ratio at high frequency, %s', (lay) => {
    for (const l of [1, 2, 4]) {
      const p = areaLimitedPerturbation({ rq: 200, correlationLength: l * 200, lay }, 1);
      const area = lay === 'isotropic' ? isotropicAreaRatio(2 / l) : profileLengthRatio(Math.SQRT2 / l);
      expect(p.impedance.re - 1).toBeCloseTo(area, 2);
    }
  });

  it('along grooves stays below the area ratio: current does not reach the bottoms', () => {
    for (const l of [1, 2, 4])
      for (const r of [0.5, 2, 20, 200]) {
        const loss = (lay: Lay) => areaLimitedPerturbation({ rq: r, correlationLength: l * r, lay }, 1).impedance.re;
        expect(loss('along')).toBeLessThan(loss('across'));
        expect(loss('along')).toBeGreaterThan(1);
        // Grooves of unknown direction lie between.
        const unknown = { rq: r, correlationLength: l * r, lay: 'across', fluxWeight: 0.5 } as const;
        expect(areaLimitedPerturbation(unknown, 1).impedance.re).toBeGreaterThan(loss('along'));
        expect(areaLimitedPerturbation(unknown, 1).impedance.re).toBeLessThan(loss('across'));
      }
  });

  // Independently solved random profiles, mean of 4 seeds (scatter about 0.02 at this slope): current along, correlation
  // length 1.41 Rq. They had no part in the constant for grooves along the current.
  it.each([
    [0.5, 1.134],
    [0.7, 1.172],
    [1, 1.207],
    [1.5, 1.231],
    [2, 1.276],
    [3, 1.255],
    [4, 1.274],
    [6, 1.252],
  ])('steep grooves along the current, Rq %d skin depths: K %d', (r, k) => {
    const p = areaLimitedPerturbation({ rq: r, correlationLength: 1.41 * r, lay: 'along' }, 1);
    expect(Math.abs(p.impedance.re - k)).toBeLessThan(0.035);
  });

  it('never exceeds the second order, and joins it on gentle texture', () => {
    for (const l of [0.5, 1, 2, 4, 8, 16]) {
      const limited = areaLimitedPerturbation({ rq: 1, correlationLength: l, lay: 'isotropic' }, 1).impedance.re;
      expect(limited).toBeLessThanOrEqual(at(1, l, 'isotropic').impedance.re);
    }
    expect(areaLimitedPerturbation({ rq: 1, correlationLength: 16, lay: 'isotropic' }, 1).impedance.re).toBeCloseTo(
      at(1, 16, 'isotropic').impedance.re,
      3,
    );
  });

  // Independently solved random profiles: electrostatic plane over Rq against correlation length over Rq.
  it.each([
    [5, 0.21],
    [2.83, 0.37],
    [1.41, 0.62],
    [0.6, 1.2],
    [0.3, 1.7],
  ])('electrostatic plane at correlation length %d Rq: %d Rq', (l, plane) => {
    const p = areaLimitedPerturbation({ rq: 1, correlationLength: l, lay: 'across' }, 1);
    expect(Math.abs(p.planeShift / plane - 1)).toBeLessThan(0.08);
  });

  // Independently solved egg boxes, one wavelength: amplitude and period in skin depths, K, X, plane in Rq. 10 % of the excess
  // loss for moderate slopes; the steep ones are overstated by up to 55 % of it, which the band's spread allows for in part.
  it.each([
    [4, 16, 1.4805, -0.231, 0.861, 0.1],
    [2.02, 7.98, 1.37, 0.65, 0.875, 0.1],
    [3.99, 7.98, 1.9, 0.08, 1.21, 0.3],
  ])('egg box of amplitude %d and period %d skin depths', (amplitude, period, k, x, plane, share) => {
    const rq = amplitude / 2;
    const correlationLength = (2 * period) / (2 * Math.PI * Math.SQRT2);
    const p = areaLimitedPerturbation({ rq, correlationLength, lay: 'isotropic', spectrum: 'single' }, 1);
    expect(Math.abs(p.impedance.re - k)).toBeLessThan(share * (k - 1));
    expect(Math.abs(p.impedance.im - x)).toBeLessThan(0.12);
    expect(Math.abs(p.planeShift / rq / plane - 1)).toBeLessThan(0.08);
  });
});

describe('from the developed area ratio', () => {
  it.each(['gaussian', 'exponential', 'single'] as const)(
    'the spectrum %s has the ratio it was asked for',
    (spectrum) => {
      for (const lay of LAYS) {
        const correlationLength = correlationLengthFromAreaRatio(0.4e-6, 0.2, lay, spectrum);
        const p = smallPerturbation({ rq: 0.4e-6, correlationLength, lay, spectrum }, 0.24e-6);
        const ratio = lay === 'isotropic' ? isotropicAreaRatio(p.gradient) : profileLengthRatio(p.gradient);
        expect(ratio).toBeCloseTo(0.2, 9);
      }
    },
  );
});

it('fine texture along the current tends to the gradient model to second order', () => {
  // Both are 1 + 2r² and no more where the texture is far finer than the skin depth and low beside it.
  const r = 0.03;
  const fine = smallPerturbation({ rq: r, correlationLength: 1e-4, lay: 'along' }, 1).impedance;
  expect(fine.re).toBeCloseTo(gradient(r, 1).re, 3);
});
