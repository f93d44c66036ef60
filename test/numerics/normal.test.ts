import { describe, expect, it } from 'vitest';
import { normalCdf, normalQuantile } from '../../src/numerics/normal.js';

describe('normal distribution', () => {
  // Abramowitz and Stegun 1964, table 26.1 and 26.2 (values from memory, confirmed by the complementary error function).
  it.each([
    [0, 0.5],
    [1, 0.8413447460685429],
    [-1.96, 0.024997895148220435],
    [-3, 0.0013498980316300946],
    [-5, 2.866515718791939e-7],
    [-10, 7.619853024160527e-24],
  ])('Φ(%d) to 12 digits', (x, expected) => {
    expect(Math.abs(normalCdf(x) / expected - 1)).toBeLessThan(1e-12);
  });

  it('joins series and continued fraction', () => {
    expect(Math.abs(normalCdf(-3 - 1e-9) / normalCdf(-3 + 1e-9) - 1)).toBeLessThan(1e-8);
  });

  it.each([1e-12, 2.2e-7, 0.025, 0.5, 0.9, 1 - 1e-6])('quantile inverts it at %d', (p) => {
    expect(Math.abs(normalCdf(normalQuantile(p)) - p)).toBeLessThan(1e-10 * p + 1e-15);
  });

  it('refuses what is no probability', () => {
    expect(() => normalQuantile(0)).toThrow(RangeError);
    expect(() => normalQuantile(1)).toThrow(RangeError);
  });
});
