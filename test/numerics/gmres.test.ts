import { describe, expect, it } from 'vitest';
import { complexVector, gmres, type LinearMap } from '../../src/numerics/gmres.js';

const n = 24;
/** A full complex matrix, well away from singular. */
const entry = (i: number, j: number): readonly [number, number] => [
  Math.sin(7 * i * j + i) + (i === j ? 8 : 0),
  Math.cos(3 * i + 5 * j) + (i === j ? 3 + 0.3 * i : 0),
];
const apply: LinearMap = (x, y) => {
  for (let i = 0; i < n; i++) {
    y.re[i] = 0;
    y.im[i] = 0;
    for (let j = 0; j < n; j++) {
      const [a, b] = entry(i, j);
      y.re[i] += a * x.re[j] - b * x.im[j];
      y.im[i] += a * x.im[j] + b * x.re[j];
    }
  }
};
const identity: LinearMap = (x, y) => {
  y.re.set(x.re);
  y.im.set(x.im);
};
const jacobi: LinearMap = (x, y) => {
  for (let i = 0; i < n; i++) {
    const [a, b] = entry(i, i);
    const d = a * a + b * b;
    y.re[i] = (x.re[i] * a + x.im[i] * b) / d;
    y.im[i] = (x.im[i] * a - x.re[i] * b) / d;
  }
};

describe('generalised minimal residuals', () => {
  it.each([
    ['without', identity],
    ['with', jacobi],
  ])('finds the solution %s a preconditioner, and states the true residual', (_, precondition) => {
    const wanted = complexVector(n);
    for (let i = 0; i < n; i++) {
      wanted.re[i] = Math.cos(i);
      wanted.im[i] = i / n;
    }
    const b = complexVector(n);
    apply(wanted, b);
    const x = complexVector(n);
    const rough = gmres(apply, precondition, b, complexVector(n), 1e-3, n);
    const found = gmres(apply, precondition, b, x, 1e-12, n + 2);
    expect(rough.iterations).toBeLessThan(found.iterations);
    expect(found.residual).toBeLessThan(1e-12);
    for (let i = 0; i < n; i++) expect(Math.hypot(x.re[i] - wanted.re[i], x.im[i] - wanted.im[i])).toBeLessThan(1e-9);
  });

  it('needs no step from the solution, and gives nothing for nothing', () => {
    const b = complexVector(n);
    b.re[3] = 1;
    const x = complexVector(n);
    gmres(apply, jacobi, b, x, 1e-12, n + 2);
    expect(gmres(apply, jacobi, b, x, 1e-9, n).iterations).toBe(0);
    gmres(apply, jacobi, complexVector(n), x, 1e-9, n);
    expect(Math.max(...x.re.map(Math.abs))).toBe(0);
  });
});
