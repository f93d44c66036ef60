import { describe, expect, it } from 'vitest';
import {
  cutLobes,
  cutShape,
  cutThrough,
  farFieldPower,
  strongestDirection,
} from '../../../src/physics/pattern/index.js';
import { ludwig, pointSources, row } from './point-sources.js';

const DEG = 180 / Math.PI;
const lobesOf = (field: ReturnType<typeof row>, steps?: number) => {
  const cut = cutThrough(field, 0, steps);
  return cutLobes(cut.angle, cut.co);
};
/** Directivity over the half space alone of sources that radiate equally into it. */
const directivity = (field: ReturnType<typeof row>): number =>
  (4 * Math.PI * strongestDirection(field).intensity) / farFieldPower(field);

describe('uniform rows (array factor; Balanis, Antenna Theory, ch. 6; values from memory)', () => {
  it('has the first sidelobe of −12.80 dB with eight and tends to −13.26 dB with many', () => {
    // Eight: |sin 4ψ/(8 sin ψ/2)| at its second maximum, solved apart to 1e-4 dB.
    expect(lobesOf(row(8, 0.5)).firstAbove!.levelDb).toBeCloseTo(-12.797, 1);
    expect(lobesOf(row(100, 0.5), 8001).firstAbove!.levelDb).toBeCloseTo(-13.26, 1);
  });

  it('has a half-power width of 0.886 λ/(Nd) when long', () => {
    const shape = cutShape(row(40, 0.5).cut('elevation'), 3601);
    expect(shape.halfPowerBeamwidth).toBeCloseTo(0.886 / 20, 4);
  });

  it('has nulls at sin θ = n λ/(Nd) and N − 2 sidelobes at half a wavelength', () => {
    const lobes = lobesOf(row(8, 0.5), 3601);
    expect(lobes.mainTo * DEG).toBeCloseTo(Math.asin(1 / 4) * DEG, 1);
    expect(lobes.mainFrom).toBeCloseTo(-lobes.mainTo, 6);
    expect(lobes.sidelobes).toHaveLength(6);
    expect(lobes.firstBelow!.levelDb).toBeCloseTo(lobes.firstAbove!.levelDb, 6);
  });

  it('has directivity N at half a wavelength, doubled because nothing goes down', () => {
    for (const n of [1, 2, 5, 10]) expect(directivity(row(n, 0.5))).toBeCloseTo(2 * n, 3);
  });

  it('has the directivity of sinc sums at any spacing', () => {
    // ∫ over the sphere of a row: Σ sinc(k0 d (m − n)) / N² of 4π.
    const [n, d] = [6, 0.7];
    let sum = 0;
    for (let a = 0; a < n; a++)
      for (let b = 0; b < n; b++) {
        const x = 2 * Math.PI * d * (a - b);
        sum += x === 0 ? 1 : Math.sin(x) / x;
      }
    expect(directivity(row(n, d))).toBeCloseTo((2 * n * n) / sum, 3);
  });

  it('steers to arcsin(lag/k0d) and shows a grating lobe where the spacing lets it in', () => {
    const lag = Math.PI * Math.sin(30 / DEG);
    const peak = strongestDirection(
      row(
        8,
        0.5,
        lag,
        ludwig((c) => c),
      ),
    );
    // The element's own fall draws the beam in by a fifth of a degree at most.
    expect(Math.abs(peak.theta * DEG - 29.5)).toBeLessThan(0.5);
    expect(peak.phi).toBeCloseTo(0, 4);
    expect(
      strongestDirection(
        row(
          8,
          0.5,
          -lag,
          ludwig((c) => c),
        ),
      ).phi,
    ).toBeCloseTo(Math.PI, 4);
    // One wavelength apart and steered: the grating lobe at sin θ = 0.1 − 1 is as strong.
    const lobes = lobesOf(row(8, 1, 2 * Math.PI * 0.1), 3601);
    expect(lobes.highest!.levelDb).toBeCloseTo(0, 2);
    expect(Math.min(lobes.main.angle, lobes.highest!.angle)).toBeCloseTo(Math.asin(-0.9), 3);
  });
});

describe('tapered rows', () => {
  it('Dolph–Chebyshev of ten for 26 dB has all sidelobes there (Dolph 1946)', () => {
    const half = [2.769478, 2.478709, 1.967925, 1.355482, 1];
    const field = pointSources(
      [...half]
        .reverse()
        .concat(half)
        .map((re, i) => ({ x: 0.5 * i, y: 0, re })),
    );
    const lobes = lobesOf(field, 3601);
    expect(lobes.sidelobes).toHaveLength(8);
    for (const lobe of lobes.sidelobes) expect(Math.abs(lobe.levelDb + 26)).toBeLessThan(0.005);
  });

  it('a binomial row has no sidelobe', () => {
    const field = pointSources([1, 4, 6, 4, 1].map((re, i) => ({ x: 0.5 * i, y: 0, re })));
    expect(lobesOf(field, 721).sidelobes).toEqual([]);
    expect(lobesOf(field, 721).highest).toBeUndefined();
  });
});
