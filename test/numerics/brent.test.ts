import { describe, expect, it } from 'vitest';
import { bracketedRoot } from '../../src/numerics/brent.js';

const root = (f: (x: number) => number, from: number, to: number, tolerance = 1e-9) =>
  bracketedRoot(f, [from, f(from)], [to, f(to)], tolerance);

describe('bracketed root', () => {
  const cases: readonly (readonly [string, (x: number) => number, number, number, number])[] = [
    // Roots known without this program: Dottie number, plastic number (both 15 digits, OEIS A003957, A060006, from memory).
    ['cos x = x', (x) => Math.cos(x) - x, 0, 1, 0.739085133215161],
    ['x³ = x + 1', (x) => x ** 3 - x - 1, 1, 2, 1.324717957244746],
    ['a straight line', (x) => 3 - 2 * x, 0, 10, 1.5],
    ['a kink at the root', (x) => Math.min(0.25 - x, 4 * (0.25 - x)), 0, 1, 0.25],
    ['a step', (x) => (x < Math.SQRT2 ? 1 : -1), 0, 3, Math.SQRT2],
    ['downwards', (x) => x + 0.3, 5, -5, -0.3],
    ['very flat at the root', (x) => (1 - x) ** 3, 0, 3, 1],
  ];
  for (const [name, f, from, to, expected] of cases) {
    it(`encloses the root: ${name}`, () => {
      const { inside, outside } = root(f, from, to);
      expect(Math.abs(inside - outside)).toBeLessThanOrEqual(1e-9);
      expect((inside - expected) * (outside - expected)).toBeLessThanOrEqual(1e-18);
      expect(Math.sign(f(inside))).toBe(Math.sign(f(from)));
      expect(Math.sign(f(outside))).not.toBe(Math.sign(f(from)));
    });
  }

  it('takes few calls on smooth functions: bisection would need thirty', () => {
    expect(root((x) => Math.exp(x) - 5, 0, 4).calls).toBeLessThan(14);
  });

  it('never takes many more than bisection', () => {
    // Brent 1973, section 4.3: about the square of the number of bisections at worst; in practice below three times it.
    expect(root((x) => (x === 0 ? 0 : x * Math.exp(-1 / (x * x))) - 1e-12, 3, -1).calls).toBeLessThan(100);
  });

  it('counts a zero at the far end as outside', () => {
    const { inside, outside } = root((x) => 1 - x, 0, 1);
    expect(inside).toBeLessThan(1);
    expect(outside).toBe(1);
  });

  it('refuses ends of one sign, a tolerance of nothing and values that are no number', () => {
    expect(() => root((x) => x * x + 1, 0, 1)).toThrow('no sign change');
    expect(() => root((x) => x - 0.5, 0, 1, 0)).toThrow('tolerance');
    expect(() => bracketedRoot(() => Number.NaN, [0, 1], [1, -1], 0.1)).toThrow('not finite');
  });
});
