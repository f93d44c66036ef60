import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { minimumBetween } from '../../src/numerics/golden-section.js';

describe('golden-section search', () => {
  it('finds the foot of a parabola and of a cusp wherever it lies, within its tolerance', () => {
    fc.assert(
      fc.property(fc.double({ min: -0.9, max: 0.9, noNaN: true }), fc.boolean(), (foot, cusp) => {
        const f = (x: number) => (cusp ? Math.abs(x - foot) : (x - foot) ** 2);
        const found = minimumBetween(f, -1, 1, 1e-6);
        expect(Math.abs(found.x - foot)).toBeLessThan(2e-6);
        expect(found.value).toBe(f(found.x));
      }),
    );
  });

  it('takes as many values as the golden ratio says', () => {
    let calls = 0;
    minimumBetween(
      (x) => {
        calls += 1;
        return (x - 0.3) ** 2;
      },
      0,
      1,
      5e-4,
    );
    // The bracket of 1 shrinks by 0.618 a step to 0.001, after two values to begin with.
    expect(calls).toBe(2 + Math.ceil(Math.log(1e-3) / Math.log((Math.sqrt(5) - 1) / 2)));
  });

  it('ends at a bound where the function falls towards it', () => {
    expect(minimumBetween((x) => -x, 0, 1, 1e-6).x).toBeGreaterThan(1 - 2e-6);
  });

  it.each([
    [1, 1, 1e-3],
    [2, 1, 1e-3],
    [0, 1, 0],
    [Number.NaN, 1, 1e-3],
  ])('refuses what is no bracket: %d to %d within %d', (low, high, tolerance) => {
    expect(() => minimumBetween((x) => x, low, high, tolerance)).toThrow(RangeError);
  });
});
