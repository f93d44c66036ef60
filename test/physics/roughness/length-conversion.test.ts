import { describe, expect, it } from 'vitest';
import { lengthConversion } from '../../../src/physics/roughness/index.js';

describe('correlation length from Sal', () => {
  it('is that of a Gaussian autocorrelation, between an exponential one and a single wave', () => {
    const { factor, low, high, assumption } = lengthConversion();
    expect(Math.exp(-((1 / factor) ** 2))).toBeCloseTo(0.2, 12);
    expect(Math.exp(-1 / low)).toBeCloseTo(0.2, 12);
    // cos(k·high) = 1/e where cos(k·1) = 0.2.
    expect(Math.cos(Math.acos(0.2) * high)).toBeCloseTo(Math.exp(-1), 12);
    expect(low).toBeLessThan(factor);
    expect(factor).toBeLessThan(high);
    expect(assumption).toMatch(/0\.788 times.*0\.621 .* to 0\.872/);
  });

  it('is exact where Sal is taken at 1/e, and keeps its order on the other side', () => {
    const { factor, low, high } = lengthConversion(Math.exp(-1));
    for (const x of [factor, low, high]) expect(x).toBeCloseTo(1, 12);
    const early = lengthConversion(0.7);
    expect(early.low).toBeLessThan(early.factor);
    expect(early.factor).toBeLessThan(early.high);
  });

  it.each([0, 1, -0.2, Number.NaN])('refuses a threshold of %s', (threshold) => {
    expect(() => lengthConversion(threshold)).toThrow(RangeError);
  });
});
