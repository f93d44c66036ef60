import { describe, expect, it } from 'vitest';
import {
  conductivityAt,
  halfSpaceImpedance,
  platedImpedance,
  sheetImpedance,
  skinDepth,
  surfaceResistance,
} from '../../../src/physics/material/index.js';

const F = 77e9;
const SIGMA = 5.8e7;

describe('copper', () => {
  it('scales as the square root of frequency', () => {
    expect(surfaceResistance(4 * F, SIGMA) / surfaceResistance(F, SIGMA)).toBeCloseTo(2, 12);
    expect(skinDepth(F, SIGMA) / skinDepth(4 * F, SIGMA)).toBeCloseTo(2, 12);
  });

  it('keeps its conductivity at 20 °C, and loses it when hot', () => {
    expect(conductivityAt(SIGMA, 20)).toBe(SIGMA);
    expect(conductivityAt(SIGMA, 125)).toBeLessThan(conductivityAt(SIGMA, 85));
  });

  it('a thick sheet is a half space, a thin one its direct-current resistance', () => {
    const half = halfSpaceImpedance(F, SIGMA);
    const thick = sheetImpedance(F, SIGMA, 18e-6);
    expect(thick.re / half.re).toBeCloseTo(1, 12);
    const thin = sheetImpedance(F, SIGMA, 5e-9);
    expect(thin.re * SIGMA * 5e-9).toBeCloseTo(1, 6);
  });

  it('refuses what is not physical, quoting it', () => {
    expect(() => skinDepth(0, SIGMA)).toThrow(/got 0/);
    expect(() => surfaceResistance(F, -1)).toThrow(/got -1/);
    expect(() => conductivityAt(SIGMA, -300)).toThrow(RangeError);
    expect(() => sheetImpedance(F, SIGMA, 0)).toThrow(RangeError);
  });
});

describe('finish layers', () => {
  const layer = (conductivity: number, thickness: number) => ({ conductivity, thickness, relativePermeability: 1 });

  it('no layer, and a layer of the same metal, change nothing', () => {
    const bare = halfSpaceImpedance(F, SIGMA);
    expect(platedImpedance(F, SIGMA, [])).toEqual(bare);
    const same = platedImpedance(F, SIGMA, [layer(SIGMA, 0.3e-6)]);
    expect(same.re).toBeCloseTo(bare.re, 12);
    expect(same.im).toBeCloseTo(bare.im, 12);
  });

  it('a layer thicker than its skin hides what is below', () => {
    const z = platedImpedance(F, SIGMA, [layer(1.7e6, 50e-6)]);
    expect(z.re / surfaceResistance(F, 1.7e6)).toBeCloseTo(1, 10);
  });

  it('two halves of a layer are the layer', () => {
    const whole = platedImpedance(F, SIGMA, [layer(1.7e6, 2e-6)]);
    const halves = platedImpedance(F, SIGMA, [layer(1.7e6, 1e-6), layer(1.7e6, 1e-6)]);
    expect(halves.re).toBeCloseTo(whole.re, 12);
    expect(halves.im).toBeCloseTo(whole.im, 12);
  });

  it('order matters: gold over nickel is not nickel over gold', () => {
    const gold = layer(4.1e7, 0.2e-6);
    const nickel = layer(1.7e6, 4e-6);
    expect(platedImpedance(F, SIGMA, [nickel, gold]).re).toBeLessThan(platedImpedance(F, SIGMA, [gold, nickel]).re);
  });

  it('is passive for any layers', () => {
    for (const t of [1e-9, 1e-8, 1e-7, 1e-6, 1e-5])
      for (const mu of [1, 5]) {
        const z = platedImpedance(F, SIGMA, [{ conductivity: 1.7e6, thickness: t, relativePermeability: mu }]);
        expect(z.re).toBeGreaterThan(0);
        expect(z.im).toBeGreaterThan(0);
      }
  });
});
