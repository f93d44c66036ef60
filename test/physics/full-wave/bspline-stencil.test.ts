import { describe, expect, it } from 'vitest';
import { gaussLegendre } from '../../../src/numerics/gauss-legendre.js';
import {
  averageAlongX,
  averageAlongY,
  cubicSpline,
  linearSpline,
  STENCIL_REACH,
  splineMoment,
  splineStencil,
} from '../../../src/physics/full-wave/bspline-stencil.js';

function integral(f: (t: number) => number): number {
  const { nodes, weights } = gaussLegendre(20);
  let sum = 0;
  for (let piece = -2; piece < 2; piece++)
    nodes.forEach((x, i) => {
      sum += (weights[i] / 2) * f(piece + (1 + x) / 2);
    });
  return sum;
}

describe('averages over B-splines', () => {
  it('have the moments of the splines', () => {
    for (const p of [0, 2, 4, 8]) {
      expect(splineMoment(1, p)).toBeCloseTo(
        integral((t) => linearSpline(t) * t ** p),
        12,
      );
      expect(splineMoment(3, p)).toBeCloseTo(
        integral((t) => cubicSpline(t) * t ** p),
        12,
      );
    }
  });

  it('take the cubic spline for the correlation of two triangles', () => {
    for (const shift of [0, 0.4, 1, 1.7]) {
      // Pieces between the kinks of both.
      const kinks = [-1, 0, 1, shift - 1, shift, shift + 1].sort((a, b) => a - b);
      const { nodes, weights } = gaussLegendre(4);
      let sum = 0;
      for (let k = 0; k + 1 < kinks.length; k++) {
        const half = (kinks[k + 1] - kinks[k]) / 2;
        nodes.forEach((x, i) => {
          const t = kinks[k] + half * (1 + x);
          sum += half * weights[i] * linearSpline(t) * linearSpline(t - shift);
        });
      }
      expect(sum).toBeCloseTo(cubicSpline(shift), 13);
    }
  });

  it('are exact on a quadrant for even polynomials in both directions', () => {
    const [nx, ny] = [6, 5];
    const [width, height] = [nx + STENCIL_REACH, ny + STENCIL_REACH];
    const f = (x: number, y: number): number => 1 + 0.3 * x ** 2 * y ** 4 - 0.01 * x ** 8 + 0.2 * y ** 2;
    const re = Float64Array.from({ length: width * height }, (_, p) => f(p % width, Math.floor(p / width)));
    const im = re.map((v) => -2 * v);
    const [outRe, outIm] = [new Float64Array(nx * ny), new Float64Array(nx * ny)];
    averageAlongY(averageAlongX({ re, im, width, height }, splineStencil(3)), splineStencil(1), 3, outRe, outIm);
    for (let j = 0; j < ny; j++) {
      for (let i = 0; i < nx; i++) {
        const expected = 3 * integral((s) => cubicSpline(s) * integral((t) => linearSpline(t) * f(i + s, j + t)));
        expect(Math.abs(outRe[j * nx + i] / expected - 1)).toBeLessThan(1e-10);
        expect(Math.abs(outIm[j * nx + i] / expected + 2)).toBeLessThan(2e-10);
      }
    }
  });
});
