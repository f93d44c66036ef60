import { describe, expect, it } from 'vitest';
import { leastSquares } from '../../src/numerics/least-squares.js';

const settings = (n: number, more: object = {}) => ({
  step: new Float64Array(n).fill(1e-3),
  low: new Float64Array(n).fill(-10),
  high: new Float64Array(n).fill(10),
  reach: 5000,
  tolerance: 1e-9,
  budget: 400,
  ...more,
});

describe('least squares', () => {
  it('finds where as many figures as unknowns vanish', () => {
    // Circle and hyperbola: x² + y² = 4, xy = 1 meet at √(2 ± √3).
    const f = (x: Float64Array) => Float64Array.of(x[0] * x[0] + x[1] * x[1] - 4, x[0] * x[1] - 1);
    const { x, calls } = leastSquares(f, Float64Array.of(3, 0.1), settings(2));
    expect(x[0]).toBeCloseTo(Math.sqrt(2 + Math.sqrt(3)), 8);
    expect(x[1]).toBeCloseTo(Math.sqrt(2 - Math.sqrt(3)), 8);
    expect(calls).toBeLessThan(40);
  });

  it('fits more figures than it has unknowns as well as they can be', () => {
    const t = [0, 1, 2, 3, 4];
    const y = [1, 0.61, 0.36, 0.23, 0.13];
    const f = (x: Float64Array) => Float64Array.from(t, (ti, i) => x[0] * Math.exp(-x[1] * ti) - y[i]);
    const { x, residuals } = leastSquares(f, Float64Array.of(0.5, 0.1), settings(2));
    const sum = residuals.reduce((s, r) => s + r * r, 0);
    // No neighbour is better.
    for (const [i, h] of [
      [0, 3e-3],
      [0, -3e-3],
      [1, 3e-3],
      [1, -3e-3],
    ]) {
      const beside = x.slice();
      beside[i] += h;
      expect(f(beside).reduce((s, r) => s + r * r, 0)).toBeGreaterThan(sum);
    }
  });

  it('stays between its limits and within its budget', () => {
    const f = (x: Float64Array) => Float64Array.of(x[0] - 5, x[1] + 1);
    const { x } = leastSquares(f, Float64Array.of(0, 0), settings(2, { high: Float64Array.of(2, 10) }));
    expect(x[0]).toBe(2);
    expect(x[1]).toBeCloseTo(-1, 6);
    let calls = 0;
    const costly = (x: Float64Array) => {
      calls += 1;
      return Float64Array.of(Math.sin(7 * x[0]) + 1.5, Math.cos(5 * x[1]) + 1.5);
    };
    leastSquares(costly, Float64Array.of(1, 1), settings(2, { budget: 12 }));
    expect(calls).toBeLessThanOrEqual(12);
  });

  it('refuses a start without finite residuals', () => {
    expect(() => leastSquares(() => Float64Array.of(Number.NaN), Float64Array.of(1), settings(1))).toThrow(
      'not finite',
    );
  });
});
