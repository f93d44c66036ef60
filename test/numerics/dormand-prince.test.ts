import { describe, expect, it } from 'vitest';
import { integrateOde } from '../../src/numerics/dormand-prince.js';

const tight = { relative: 1e-10, absolute: 1e-12 };

describe('Dormand–Prince', () => {
  it('follows a harmonic oscillator over three periods', () => {
    const end = integrateOde(
      (_t, y, out) => {
        out[0] = y[1]!;
        out[1] = -y[0]!;
      },
      0,
      6 * Math.PI,
      [1, 0],
      tight,
    );
    expect(Math.hypot(end[0]! - 1, end[1]!)).toBeLessThan(1e-7);
  });

  it('runs backwards in time', () => {
    const end = integrateOde((t, _y, out) => out.fill(3 * t * t), 2, 0, [8], tight);
    expect(Math.abs(end[0]!)).toBeLessThan(1e-9);
  });

  it('ends at the asked error', () => {
    const exact = Math.exp(5);
    const error = (relative: number) =>
      Math.abs(integrateOde((_t, y, out) => out.set(y), 0, 5, [1], { relative, absolute: 0 })[0]! / exact - 1);
    expect(error(1e-5)).toBeLessThan(1e-3);
    expect(error(1e-9)).toBeLessThan(1e-7);
    expect(error(1e-9)).toBeLessThan(error(1e-5));
  });

  it('gives up on a solution that ends before the interval does', () => {
    expect(() => integrateOde((_t, y, out) => out.fill(y[0]! * y[0]!), 0, 2, [1], tight)).toThrow(/100000 steps/);
  });
});
