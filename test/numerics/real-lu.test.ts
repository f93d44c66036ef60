import { describe, expect, it } from 'vitest';
import { evenBesselJ } from '../../src/numerics/bessel.js';
import { factoriseReal, solveReal, solveRealTransposed } from '../../src/numerics/real-lu.js';

/** Entries without structure, so that rows are exchanged; the same every time. */
function matrix(n: number): Float64Array {
  return Float64Array.from({ length: n * n }, (_, i) => Math.sin(1 + 7.3 * i * i));
}

describe('real LU', () => {
  const n = 40;
  const x = Float64Array.from({ length: n }, (_, i) => Math.cos(i));

  it('solves a system and the transposed system with the same factors', () => {
    const a = matrix(n);
    const right = new Float64Array(n);
    const rightTransposed = new Float64Array(n);
    for (let i = 0; i < n; i++)
      for (let j = 0; j < n; j++) {
        right[i] += a[i * n + j] * x[j];
        rightTransposed[j] += a[i * n + j] * x[i];
      }
    const lu = factoriseReal(a, n);
    solveReal(lu, right);
    solveRealTransposed(lu, rightTransposed);
    for (let i = 0; i < n; i++) {
      expect(right[i]).toBeCloseTo(x[i], 9);
      expect(rightTransposed[i]).toBeCloseTo(x[i], 9);
    }
  });

  it('exchanges rows where a pivot is zero, and refuses a singular matrix', () => {
    const right = Float64Array.of(2, 3);
    solveReal(factoriseReal(Float64Array.of(0, 1, 1, 0), 2), right);
    expect([...right]).toEqual([3, 2]);
    expect(() => factoriseReal(Float64Array.of(1, 2, 2, 4), 2)).toThrow(/singular at column 1/);
  });
});

describe('Bessel functions of even order', () => {
  // J0 + 2 Σ J(2n) = 1: Abramowitz and Stegun 9.1.46.
  it.each([0.01, 1, 7.9, 24, 31.9, 32, 200])('sum to one at %d', (x) => {
    const j = new Float64Array(Math.ceil(x / 2) + 40);
    evenBesselJ(x, j);
    expect(j.reduce((sum, v, n) => sum + (n ? 2 : 1) * v, 0)).toBeCloseTo(1, 11);
  });

  it('the quick way for large arguments continues the other', () => {
    const few = new Float64Array(6);
    const many = new Float64Array(40);
    for (const x of [12, 20, 60]) {
      evenBesselJ(x, few);
      evenBesselJ(x, many);
      for (let n = 0; n < 6; n++) expect(few[n]).toBeCloseTo(many[n], 12);
    }
  });
});
