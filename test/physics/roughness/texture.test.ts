import { describe, expect, it } from 'vitest';
import {
  areaRatio,
  correlationLengthFromSal,
  gradientFromAreaRatio,
  isotropicAreaRatio,
  profileLengthRatio,
} from '../../../src/physics/roughness/index.js';
import { noduleLattice } from '../../../src/physics/roughness/texture.js';

describe('developed area ratio', () => {
  it('is half the mean square gradient on gentle texture, less on steep', () => {
    expect(isotropicAreaRatio(1e-3)).toBeCloseTo(0.5e-6, 11);
    expect(profileLengthRatio(1e-3)).toBeCloseTo(0.5e-6, 11);
    expect(isotropicAreaRatio(1)).toBeLessThan(0.5);
  });

  it('has no step between series and closed form', () => {
    const [below, above] = [isotropicAreaRatio(0.15 - 1e-9), isotropicAreaRatio(0.15)];
    expect(Math.abs(above - below)).toBeLessThan(1e-8);
  });

  it.each([0.3, 1, 3])('of grooves of slope %d is the mean of sqrt(1 + g²)', (slope) => {
    const n = 20_000;
    let sum = 0;
    for (let i = 0; i < n; i++) {
      const t = -9 + (18 * (i + 0.5)) / n;
      sum += (Math.exp(-0.5 * t * t) * Math.hypot(1, slope * t) * 18) / n;
    }
    expect(profileLengthRatio(slope)).toBeCloseTo(sum / Math.sqrt(2 * Math.PI) - 1, 8);
  });

  it.each(['isotropic', 'across'] as const)('is undone by the gradient found from it, %s', (lay) => {
    for (const g of [0.05, 0.5, 1.5, 4]) expect(gradientFromAreaRatio(areaRatio(g, lay), lay)).toBeCloseTo(g, 9);
  });

  it('refuses what no foil has', () => {
    expect(() => gradientFromAreaRatio(-0.1, 'isotropic')).toThrow(/got -0.1/);
    expect(() => gradientFromAreaRatio(50, 'isotropic')).toThrow(/got 50/);
  });
});

it('Sal to correlation length: a Gaussian autocorrelation falls to 0.2 at sqrt(ln 5) lengths', () => {
  expect(correlationLengthFromSal(1.2686)).toBeCloseTo(1, 4);
  expect(Math.exp(-((1.5 / correlationLengthFromSal(1.5)) ** 2))).toBeCloseTo(0.2, 12);
});

describe('nodules', () => {
  it('by pitch or by number per area are the same', () => {
    expect(noduleLattice({ radius: 0.2, perArea: 1 }).pitch).toBe(1);
    expect(noduleLattice({ radius: 0.2, pitch: 1 })).toEqual({ radius: 0.2, pitch: 1, layers: 1 });
  });

  it('must fit beside one another, and be stated once', () => {
    expect(() => noduleLattice({ radius: 0.6, pitch: 1 })).toThrow(/two radii/);
    expect(() => noduleLattice({ radius: 0.2, pitch: 1, perArea: 1 })).toThrow(/exactly one/);
    expect(() => noduleLattice({ radius: 0.2 })).toThrow(/exactly one/);
  });
});
