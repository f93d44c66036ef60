import { describe, expect, it } from 'vitest';
import { normalCdf } from '../../../src/numerics/normal.js';
import { gradient, gradientPlaneShift, groiss, hammerstad } from '../../../src/physics/roughness/index.js';

const RATIOS = [0.02, 0.05, 0.1, 0.2, 0.3, 0.5, 0.7, 1, 1.5, 2, 3, 4, 6, 8, 10, 15];
const K = {
  hammerstad: (r: number, delta = 1) => hammerstad(r * delta, delta).factor,
  groiss: (r: number, delta = 1) => groiss(r * delta, delta).factor,
  gradient: (r: number, delta = 1) => gradient(r * delta, delta).re,
};

describe.each(Object.entries(K))('loss factor, %s', (_name, k) => {
  it('is 1 on smooth copper and tends to it', () => {
    expect(k(0)).toBe(1);
    expect(k(0.01) - 1).toBeLessThan(3e-4);
  });

  it('grows with roughness, never below 1', () => {
    const values = [1, ...RATIOS.map((r) => k(r))];
    for (let i = 1; i < values.length; i++) expect(values[i]).toBeGreaterThanOrEqual(values[i - 1]!);
    expect(k(1)).toBeGreaterThan(k(0.1));
  });

  it('depends on Rq over skin depth only', () => {
    expect(k(2, 0.24e-6)).toBeCloseTo(k(2), 12);
  });
});

describe('ceilings', () => {
  it('Hammerstad and Groiss stay below 2 and say when they saturate', () => {
    for (const model of [hammerstad, groiss]) {
      expect(model(100, 1).factor).toBeLessThan(2);
      expect(model(1, 1).saturated).toBe(false);
      expect(model(2.2, 1).saturated).toBe(true);
    }
  });

  it('the gradient model has none', () => {
    expect(gradient(10, 1).re).toBeGreaterThan(10);
  });
});

describe('gradient model', () => {
  // Two separate solutions of the profile made for this project, to 1e-10, printed to 3 decimals or 3 digits.
  it.each([
    [0.1, 1.018, 0.98],
    [0.2, 1.068, 0.92],
    [0.3, 1.14, 0.82],
    [0.5, 1.326, 0.52],
    [0.7, 1.536, 0.11],
    [1, 1.863, -0.66],
    [1.5, 2.402, -2.22],
    [2, 2.925, -4.02],
    [3, 3.928, -8.09],
    [4, 4.89, -12.6],
    [6, 6.734, -22.4],
    [8, 8.504, -33.0],
  ])('at Rq/δ %d: K %d, X %d', (r, k, x) => {
    const z = gradient(r, 1);
    // 2.9245 is printed as 2.925 there: 6e-4 rather than half a digit.
    expect(Math.abs(z.re - k)).toBeLessThan(6e-4);
    expect(Math.abs(z.im - x)).toBeLessThan(Math.abs(x) > 10 ? 0.051 : 0.0051);
  });

  it('agrees with a staircase of thin uniform layers', () => {
    // Independent method: recursion of lossy line sections over 4000 layers, at the mean plane.
    const r = 1.3;
    const n = 4000;
    const top = -8 * r;
    const step = (16 * r) / n;
    let re = 1;
    let im = 1;
    for (let i = n - 1; i >= 0; i--) {
      const t = top + (i + 0.5) * step;
      const sigma = standardNormal(t / r);
      // z ← z + (2j − σ z²) Δt/(1 + σ z Δt): exact to second order for a thin layer.
      const [numRe, numIm] = [-sigma * (re * re - im * im), 2 - sigma * 2 * re * im];
      const [denRe, denIm] = [1 + sigma * re * step, sigma * im * step];
      const d = denRe * denRe + denIm * denIm;
      re += (step * (numRe * denRe + numIm * denIm)) / d;
      im += (step * (numIm * denRe - numRe * denIm)) / d;
    }
    const z = gradient(r, 1);
    expect(Math.abs(z.re - re)).toBeLessThan(2e-4 * z.re);
    expect(Math.abs(z.im - (im + 2 * top))).toBeLessThan(2e-3);
  });

  it.each([0.3, 1.68, 4.2, 10])(
    'is solved to 1e-6 at Rq/δ %d: plain Runge–Kutta steps in another variable agree',
    (r) => {
      // dz/ds = r (2j − Φ(−s) z²) from 8 Rq inside to 8 Rq outside, fourth order, fixed steps; then back to the mean plane.
      const n = 16_000;
      const h = 16 / n;
      const slope = (metal: number, [a, b]: readonly number[]) => [
        -r * metal * (a! * a! - b! * b!),
        r * (2 - metal * 2 * a! * b!),
      ];
      let z = [1, 1];
      const along = (k: number[], f: number) => [z[0]! + f * k[0]!, z[1]! + f * k[1]!];
      for (let i = 0; i < n; i++) {
        const s = -8 + i * h;
        const [at, mid, next] = [normalCdf(-s), normalCdf(-s - h / 2), normalCdf(-s - h)];
        const k1 = slope(at, z);
        const k2 = slope(mid, along(k1, h / 2));
        const k3 = slope(mid, along(k2, h / 2));
        const k4 = slope(next, along(k3, h));
        z = [0, 1].map((c) => z[c]! + (h / 6) * (k1[c]! + 2 * k2[c]! + 2 * k3[c]! + k4[c]!));
      }
      const found = gradient(r, 1);
      expect(Math.abs(found.re / z[0]! - 1)).toBeLessThan(1e-6);
      expect(Math.abs(found.im - (z[1]! - 16 * r))).toBeLessThan(1e-6 * Math.hypot(found.re, found.im));
    },
  );

  it('its electrostatic plane rises as frequency falls, and scales with Rq', () => {
    const es = (rq: number, f: number) => gradientPlaneShift(rq, f, 5.8e7, 3);
    expect(es(1e-6, 24e9)).toBeGreaterThan(es(1e-6, 77e9));
    expect(es(2e-6, 77e9)).toBeCloseTo(2 * es(1e-6, 77e9), 15);
    expect(es(0, 77e9)).toBe(0);
  });
});

/** Φ by direct summation of the density: slow, and not the code under test. */
function standardNormal(x: number): number {
  if (x < -8) return 0;
  const n = 400;
  let sum = 0;
  const d = (x + 8) / n;
  for (let i = 0; i < n; i++) sum += Math.exp(-0.5 * (-8 + (i + 0.5) * d) ** 2) * d;
  return sum / Math.sqrt(2 * Math.PI);
}
