import { describe, expect, it } from 'vitest';
import { successRunSize } from '../../src/numerics/success-run.js';

describe('sample size without failures', () => {
  // Tables of the success-run formula (reliability handbooks, from memory).
  it.each([
    [0.9, 0.9, 22],
    [0.95, 0.9, 29],
    [0.95, 0.95, 59],
    [0.95, 0.99, 299],
  ])('confidence %s, reliability %s: %s pieces', (confidence, reliability, n) => {
    expect(successRunSize(confidence, reliability)).toBe(n);
  });

  it('is the smallest sample that gives the confidence', () => {
    for (const confidence of [0.5, 0.75, 0.8, 0.9, 0.95, 0.99]) {
      for (const reliability of [0.5, 0.8, 0.9, 0.95, 0.99]) {
        const n = successRunSize(confidence, reliability);
        expect(reliability ** n).toBeLessThanOrEqual(1 - confidence + 1e-12);
        expect(n === 1 || reliability ** (n - 1) > 1 - confidence + 1e-12).toBe(true);
      }
    }
  });

  it('refuses certainty', () => {
    expect(() => successRunSize(1, 0.9)).toThrow('confidence');
    expect(() => successRunSize(0.9, 1)).toThrow('reliability');
    expect(() => successRunSize(0.9, Number.NaN)).toThrow('reliability');
  });
});
