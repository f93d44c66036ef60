import { describe, expect, it } from 'vitest';
import { lagrangeWeights } from '../../src/numerics/lagrange.js';

describe('Lagrange weights', () => {
  it('are exact for polynomials of one degree less than their number', () => {
    const out = new Float64Array(10);
    for (const x of [-0.4, 0, 2.5, 2.83, 5, 5.7]) {
      lagrangeWeights(6, x, out, 3);
      for (let degree = 0; degree < 6; degree++) {
        let sum = 0;
        for (let m = 0; m < 6; m++) sum += out[3 + m] * m ** degree;
        expect(sum).toBeCloseTo(x ** degree, 8);
      }
    }
  });

  it('write nothing outside their place', () => {
    const out = new Float64Array(10).fill(7);
    lagrangeWeights(4, 1.2, out, 2);
    expect([out[0], out[1], ...out.slice(6)]).toEqual([7, 7, 7, 7, 7, 7]);
  });
});
