import { describe, expect, it } from 'vitest';
import { complex, exp, log } from '../../src/numerics/complex.js';
import { monotoneCubic } from '../../src/numerics/monotone-cubic.js';

describe('monotone cubic', () => {
  const x = [0, 1, 2, 4, 5];
  const y = [0, 0.1, 3, 3.1, 3.1];

  it('passes through its samples and keeps to them outside', () => {
    for (const [i, at] of x.entries()) expect(monotoneCubic(x, y, at)).toBeCloseTo(y[i]!, 14);
    expect(monotoneCubic(x, y, -3)).toBe(0);
    expect(monotoneCubic(x, y, 9)).toBe(3.1);
  });

  it('rises where they rise', () => {
    let last = 0;
    for (let at = 0; at <= 5; at += 0.01) {
      const value = monotoneCubic(x, y, at);
      expect(value).toBeGreaterThanOrEqual(last - 1e-14);
      last = value;
    }
  });

  it('is exact on a straight line', () => {
    expect(monotoneCubic([0, 1, 3], [1, 3, 7], 2.2)).toBeCloseTo(5.4, 14);
  });
});

it('the logarithm undoes the exponential', () => {
  for (const z of [complex(0.3, 2), complex(-1, -3), complex(2, 0)]) {
    const back = log(exp(z));
    expect(back.re).toBeCloseTo(z.re, 14);
    expect(back.im).toBeCloseTo(z.im, 14);
  }
});
