import { describe, expect, it } from 'vitest';
import {
  ballPile,
  cannonball,
  exactSphereTerm,
  groiss,
  hallHemispheres,
  hammerstad,
  hurayImpedance,
  hurayLossFactor,
  noduleStacks,
  publishedSphereTerm,
  sphereOverstatement,
} from '../../../src/physics/roughness/index.js';

describe('one ball', () => {
  it('the causal term has the published loss identically', () => {
    for (const x of [0.05, 0.3, 1, 3, 20])
      expect(publishedSphereTerm(x, 1).re).toBeCloseTo(1 / (1 + 1 / x + 1 / (2 * x * x)), 14);
  });

  it('the exact term loses with the third power when small, and as a plane when large', () => {
    // Landau and Lifshitz: absorption of a small ball, (4/45)(a/δ)³ in these units.
    expect(exactSphereTerm(0.01, 1).re).toBeCloseTo((4 / 45) * 1e-6, 12);
    expect(exactSphereTerm(400, 1).re).toBeCloseTo(1, 2);
  });

  it('has no step between series and closed form', () => {
    const [below, above] = [exactSphereTerm(0.3 - 1e-9, 1), exactSphereTerm(0.3, 1)];
    expect(Math.abs(above.re / below.re - 1)).toBeLessThan(1e-6);
    expect(Math.abs(above.im / below.im - 1)).toBeLessThan(1e-6);
  });

  // Ratio of published to exact loss; 18, 4.7 and 1.4 times by an independent evaluation.
  it.each([
    [0.5, 18],
    [1, 4.7],
    [2, 1.4],
  ])('of %d skin depths is overstated %d times', (x, times) => {
    expect(Math.abs(sphereOverstatement(x, 1) / times - 1)).toBeLessThan(0.03);
  });

  it('pushes flux out', () => {
    for (const x of [0.1, 0.5, 2, 8]) expect(exactSphereTerm(x, 1).im).toBeLessThan(0);
  });

  it('refuses a radius of nothing', () => {
    expect(() => exactSphereTerm(0, 1)).toThrow(/got 0/);
  });
});

describe('balls on a face', () => {
  const balls = [
    { radius: 0.5, perArea: 0.1 },
    { radius: 2, perArea: 0.02 },
  ];

  it('real and causal form of Huray agree in loss', () => {
    for (const delta of [0.2, 1, 5])
      expect(hurayImpedance(balls, delta, 0.9).re).toBeCloseTo(hurayLossFactor(balls, delta, 0.9), 13);
  });

  it('none leave the base alone', () => {
    expect(hurayImpedance([], 1)).toEqual({ re: 1, im: 1 });
  });

  it('cannonball stacking rises from 1 to its ceiling of 8.33', () => {
    const k = [1e-3, 0.1, 1, 10, 1e5].map((rz) => cannonball(rz, 1).re);
    expect(k[0]! - 1).toBeLessThan(1e-5);
    expect(k[4]).toBeCloseTo(1 + (1.5 * 4 * Math.PI * 14) / 36, 2);
    for (let i = 1; i < k.length; i++) expect(k[i]).toBeGreaterThan(k[i - 1]!);
  });

  it('Hall’s factor is never below 1, and says when it was held there', () => {
    expect(hallHemispheres(0.5, 1.5, 1)).toMatchObject({ factor: 1, clipped: true });
    // Printed in the comparison of independently solved hemispheres as the formula's own values.
    expect(hallHemispheres(1, 3, 1).factor).toBeCloseTo(1.07, 3);
    expect(hallHemispheres(4, 12, 1).factor).toBeCloseTo(1.468, 3);
    expect(() => hallHemispheres(1, 1.5, 1)).toThrow(/two radii/);
  });
});

describe('solved pile of balls', () => {
  it('passes through the solved piles and grows without waves', () => {
    expect(ballPile(0.295, 1).impedance).toEqual({ re: 1.153, im: 1.203 });
    expect(ballPile(2.389, 1).impedance.re).toBeCloseTo(2.009, 12);
    const k = Array.from({ length: 200 }, (_, i) => ballPile(0.02 * i, 1).impedance.re);
    for (let i = 1; i < k.length; i++) expect(k[i]).toBeGreaterThanOrEqual(k[i - 1]!);
  });

  it('has Groiss within 9 % and Hammerstad 0 to 13 % below from 0.6 skin depths on', () => {
    for (const r of [0.6, 0.9, 1.2, 2, 3, 3.5]) {
      const k = ballPile(r, 1).impedance.re;
      expect(Math.abs(groiss(r, 1).factor / k - 1)).toBeLessThan(0.09);
      expect(hammerstad(r, 1).factor).toBeLessThan(k);
      expect(hammerstad(r, 1).factor).toBeGreaterThan(0.87 * k);
    }
  });

  it('goes on beyond the last pile as a fixed depth', () => {
    const s = (r: number) => ballPile(r, 1).impedance;
    expect(s(8).re).toBe(2.14);
    expect(s(8).im - s(6).im).toBeCloseTo(s(6).im - s(4).im, 10);
  });
});

describe('stacks of nodules', () => {
  // Solved stacks of four balls at three radii: radius in skin depths, slow-wave length in radii of X and plane as solved.
  it.each([
    [0.25, 1.89, 1.176],
    [0.5, 2.77, 2.35],
    [1, 4.31, 4.7],
    [2, 4.11, 9.41],
  ])('of radius %d skin depths: slow-wave length within 10 %', (a, x, plane) => {
    const face = noduleStacks({ radius: a, pitch: 3 * a, layers: 4 }, 1);
    const [s, solved] = [0.5 * face.impedance.im + face.planeShift, 0.5 * x + plane];
    expect(Math.abs(s / solved - 1)).toBeLessThan(0.1);
  });

  it('lie between free balls and the published formula, within a few per cent', () => {
    for (const a of [0.3, 0.7, 1, 1.5, 2, 4])
      for (const p of [2.2, 3, 5, 8]) {
        const face = noduleStacks({ radius: a, pitch: p * a }, 1);
        expect(face.impedance.re).toBeLessThanOrEqual(face.published + 1e-12);
        expect(face.impedance.re).toBeGreaterThan(1 + 0.97 * (face.free - 1));
      }
  });
});
