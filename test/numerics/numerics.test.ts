import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { besselJ0, besselK0, besselY0 } from '../../src/numerics/bessel.js';
import { abs, complex, div, exp, mul, sqrt, sub, tanh } from '../../src/numerics/complex.js';
import { complexMatrix, factorise, solveInPlace } from '../../src/numerics/complex-lu.js';
import { gaussLegendre } from '../../src/numerics/gauss-legendre.js';
import { splineSlopes } from '../../src/numerics/spline.js';

const value = fc.record({
  re: fc.double({ min: -50, max: 50, noNaN: true }),
  im: fc.double({ min: -50, max: 50, noNaN: true }),
});
const SEED = { seed: 77, numRuns: 200 };

describe('complex numbers', () => {
  it('square a root back to itself, on the right half plane', () => {
    fc.assert(
      fc.property(value, (a) => {
        const r = sqrt(a);
        return r.re >= 0 && abs(sub(mul(r, r), a)) <= 1e-12 * (1 + abs(a));
      }),
      SEED,
    );
  });
  it('divide what they multiply', () => {
    fc.assert(
      fc.property(value, value, (a, b) => abs(b) < 1e-3 || abs(sub(div(mul(a, b), b), a)) <= 1e-10 * (1 + abs(a))),
      SEED,
    );
  });
  it('have tanh from exponentials', () => {
    const z = complex(0.7, -1.9);
    const [p, m] = [exp(z), exp(complex(-z.re, -z.im))];
    const expected = div(sub(p, m), complex(p.re + m.re, p.im + m.im));
    expect(abs(sub(tanh(z), expected))).toBeLessThan(1e-14);
    expect(tanh(complex(400, 3))).toEqual(complex(1, 0));
  });
});

describe('complex LU', () => {
  it('solves what it factorised', () => {
    const n = 17;
    const m = complexMatrix(n);
    let seed = 1;
    const random = (): number => {
      seed = (seed * 16807) % 2147483647;
      return seed / 2147483647 - 0.5;
    };
    for (let i = 0; i < n * n; i++) [m.re[i], m.im[i]] = [random(), random()];
    const [re, im] = [m.re.slice(), m.im.slice()];
    const [xr, xi] = [Float64Array.from({ length: n }, random), Float64Array.from({ length: n }, random)];
    const [br, bi] = [new Float64Array(n), new Float64Array(n)];
    for (let i = 0; i < n; i++)
      for (let j = 0; j < n; j++) {
        br[i] += re[i * n + j] * xr[j] - im[i * n + j] * xi[j];
        bi[i] += re[i * n + j] * xi[j] + im[i * n + j] * xr[j];
      }
    solveInPlace(factorise(m), br, bi);
    for (let i = 0; i < n; i++) expect(Math.hypot(br[i] - xr[i], bi[i] - xi[i])).toBeLessThan(1e-12);
  });
  it('refuses a singular matrix', () => {
    expect(() => factorise(complexMatrix(2))).toThrow(RangeError);
  });
});

describe('quadrature, spline, Bessel functions', () => {
  it('integrates polynomials up to degree 2n − 1 exactly', () => {
    for (const n of [1, 2, 5, 12, 40]) {
      const { nodes, weights } = gaussLegendre(n);
      for (const degree of [0, 2 * n - 2, 2 * n - 1]) {
        const sum = nodes.reduce((s, x, i) => s + weights[i] * x ** degree, 0);
        expect(sum).toBeCloseTo(degree % 2 ? 0 : 2 / (degree + 1), 13);
      }
    }
  });
  it('reproduces a cubic', () => {
    const x = Float64Array.of(0, 0.3, 1, 1.2, 2.5);
    const slopes = splineSlopes(
      x,
      x.map((t) => t ** 3 - 2 * t * t + 1),
    );
    x.forEach((t, i) => {
      expect(slopes[i]).toBeCloseTo(3 * t * t - 4 * t, 10);
    });
  });
  it('has the tabulated values of Bessel functions', () => {
    // Abramowitz & Stegun 1964, tables 9.1 and 9.8 (from memory): J0(1), Y0(1), K0(1), first zero of J0.
    expect(besselJ0(1)).toBeCloseTo(0.7651976866, 10);
    expect(besselY0(1)).toBeCloseTo(0.088256964, 9);
    expect(besselK0(1)).toBeCloseTo(0.4210244382, 10);
    expect(besselJ0(2.404825557695773)).toBeCloseTo(0, 14);
  });
});
