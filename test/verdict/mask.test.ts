import { describe, expect, it } from 'vitest';
import type { Cut } from '../../src/study/results.js';
import { highestExcess, levelAt } from '../../src/verdict/mask.js';

const DEG = Math.PI / 180;
const triangle = (peakAt = 0): Cut => {
  const angle = Float64Array.from({ length: 37 }, (_, i) => (i * 5 - 90) * DEG);
  return { plane: 'elevation', angle, gainDbi: angle.map((a) => 12 - Math.abs(a / DEG - peakAt)) };
};

describe('mask', () => {
  it('gives the largest excess over all pieces, relative to the maximum', () => {
    const mask = [
      { from: 20 * DEG, to: 40 * DEG, levelDb: -25 },
      { from: -40 * DEG, to: -30 * DEG, levelDb: -20 },
    ];
    expect(highestExcess(triangle(), mask)).toBeCloseTo(5, 9);
  });

  it('counts the ends of a piece between samples in full', () => {
    expect(highestExcess(triangle(), [{ from: 22.5 * DEG, to: 24 * DEG, levelDb: -20 }])).toBeCloseTo(-2.5, 9);
  });

  it('moves the pattern towards a piece with a positive shift', () => {
    const mask = [{ from: 22.5 * DEG, to: 40 * DEG, levelDb: -20 }];
    expect(highestExcess(triangle(), mask, 2 * DEG)).toBeCloseTo(-0.5, 9);
    expect(highestExcess(triangle(), mask, -2 * DEG)).toBeCloseTo(-4.5, 9);
  });

  it('covers the whole hemisphere and survives a null in the pattern', () => {
    const cut = triangle();
    cut.gainDbi[0] = Number.NEGATIVE_INFINITY;
    const mask = [{ from: -90 * DEG, to: -80 * DEG, levelDb: -60 }];
    expect(highestExcess(cut, mask)).toBeCloseTo(-20, 9);
    expect(highestExcess(cut, mask, -0.5 * DEG)).toBeCloseTo(-19.5, 9);
  });

  it('gives no number where a piece leaves the sampled angles or the pattern has no maximum', () => {
    const half: Cut = { plane: 'azimuth', angle: Float64Array.of(0, 1), gainDbi: Float64Array.of(3, 1) };
    expect(highestExcess(half, [{ from: -0.5, to: 0.5, levelDb: -10 }])).toBeNaN();
    const holed: Cut = { ...half, gainDbi: Float64Array.of(3, Number.NaN) };
    expect(highestExcess(holed, [{ from: 0, to: 0.5, levelDb: -10 }])).toBeNaN();
    expect(levelAt(half, 1.5)).toBeNaN();
  });
});
