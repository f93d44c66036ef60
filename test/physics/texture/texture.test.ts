import { describe, expect, it } from 'vitest';
import {
  defaultSettings,
  evaluateMap,
  evaluateProfile,
  GAUSSIAN_ALPHA,
  gaussianMeanLine,
  gaussianMeanSurface,
  gaussianTransmission,
  type HeightMap,
  mapParameters,
  normalRange,
  type Profile,
  profileParameters,
  RQ_CONVERSIONS,
  RQ_OVER_RA,
  withoutMeanLine,
  withoutMeanPlane,
} from '../../../src/physics/texture/index.js';
import { gaussianField, gaussianNoise } from './noise.js';

const UM = 1e-6;
const DX = 0.05 * UM;
const profile = (points: number, f: (x: number) => number): Profile => ({
  spacing: DX,
  heights: Float64Array.from({ length: points }, (_, i) => f(i * DX)),
});
const map = (columns: number, rows: number, spacing: number, f: (x: number, y: number) => number): HeightMap => ({
  columns,
  rows,
  spacingX: spacing,
  spacingY: spacing,
  heights: Float64Array.from({ length: columns * rows }, (_, i) =>
    f((i % columns) * spacing, Math.floor(i / columns) * spacing),
  ),
});
const PERIOD = 10 * UM;
/** Ten periods and the six points that the slope formula leaves out at the ends. */
const WHOLE = 2000 + 6;
const sine = (x: number) => UM * Math.sin((2 * Math.PI * (x + 0.3 * DX)) / PERIOD);
const triangle = (x: number) => UM * (4 * Math.abs((((x + 0.5 * DX) / PERIOD) % 1) - 0.5) - 1);
const codes = (flags: readonly { code: string }[]): string[] => flags.map((f) => f.code);

describe('parameters of profiles with exact answers', () => {
  it('sine: Ra 2A/π, Rq A/√2, Rz 2A, Rku 3/2, Rdq A√2 π/λ, Ral of the cosine', () => {
    const p = profileParameters(profile(WHOLE, sine));
    // Six points beyond ten periods of two hundred: 0.3 %.
    expect(p.ra / UM).toBeCloseTo(2 / Math.PI, 2);
    expect(p.rq / UM).toBeCloseTo(Math.SQRT1_2, 2);
    expect(p.rt / UM).toBeCloseTo(2, 3);
    expect(p.rz).toBe(p.rt);
    expect(p.rku).toBeCloseTo(1.5, 2);
    expect(p.rsk).toBeCloseTo(0, 2);
    expect(p.rdq).toBeCloseTo((Math.SQRT2 * Math.PI * UM) / PERIOD, 6);
    // The estimate over pairs converges as one over the number of periods, here a hundred.
    const long = profileParameters(profile(20000, sine));
    expect(long.ral! / UM).toBeCloseTo((10 * Math.acos(0.2)) / (2 * Math.PI), 2);
  });

  it('whole periods: the textbook digits', () => {
    const p = profileParameters(profile(2000, sine));
    // Heights of whole periods: the sampled sums are exact for Rq and Rku, and to the square of the spacing for Ra.
    expect(p.ra / UM).toBeCloseTo(0.63662, 4);
    expect(p.rq / UM).toBeCloseTo(Math.SQRT1_2, 12);
    expect(p.rku).toBeCloseTo(1.5, 12);
  });

  it('triangle: Ra A/2, Rq A/√3, Rku 9/5', () => {
    const p = profileParameters(profile(2000, triangle));
    expect(p.ra / UM).toBeCloseTo(0.5, 6);
    expect(p.rq / UM).toBeCloseTo(0.57735, 4);
    expect(p.rku).toBeCloseTo(1.8, 3);
    expect(p.rt / UM).toBeCloseTo(2 - 2 * 0.01, 6);
  });

  it('square: Ra, Rq and half of Rz are its amplitude', () => {
    const p = profileParameters(profile(2000, (x) => (Math.floor(x / (5 * UM) + 0.01) % 2 === 0 ? UM : -UM)));
    expect([p.ra, p.rq, p.rz / 2, p.rku].map((v) => Number(v.toPrecision(12)))).toEqual([UM, UM, UM, 1]);
  });

  it('Rz is the mean over sections, Rt the whole', () => {
    const p = profileParameters(
      profile(2000, (x) => (x < 50 * UM ? sine(x) : 2 * sine(x))),
      50 * UM,
    );
    expect(p.sections).toBe(2);
    expect(p.rz / UM).toBeCloseTo(3, 2);
    expect(p.rt / UM).toBeCloseTo(4, 2);
  });
});

describe('parameters of maps with exact answers', () => {
  it('one-directional sine: Sdr by the complete elliptic integral 9.2384 %, Sdq 0.444288', () => {
    // 1 µm on 10 µm; Sdr = (2/π) √(1+s²) E(s²/(1+s²)) − 1 with s = 2πA/λ, computed separately.
    const spacing = 0.1 * UM;
    const p = mapParameters(map(406, 32, spacing, (x) => UM * Math.sin((2 * Math.PI * x) / PERIOD)));
    expect(p.sdq).toBeCloseTo(0.444288, 6);
    expect(100 * p.sdr).toBeCloseTo(9.2384, 4);
    // Triangles at a hundred points a period lose (kΔ)²/12 of the squared slope, 0.03 %; over whole periods of cells.
    const cells = mapParameters(map(401, 32, spacing, (x) => UM * Math.sin((2 * Math.PI * x) / PERIOD)));
    expect(cells.sdrTriangles / p.sdr).toBeGreaterThan(0.9995);
    expect(cells.sdrTriangles / p.sdr).toBeLessThan(0.9999);
    // Four periods: the estimate over pairs is 3 % high.
    expect(Math.abs((p.sal! / UM / 10) * ((2 * Math.PI) / Math.acos(0.2)) - 1)).toBeLessThan(0.03);
    expect(p.str).toBeUndefined();
  });

  it('egg box: Sq A/2, Sz 2A, Sdq πA√2 · √2/λ', () => {
    const spacing = 0.1 * UM;
    const k = (2 * Math.PI) / PERIOD;
    const p = mapParameters(map(406, 406, spacing, (x, y) => UM * Math.sin(k * x) * Math.cos(k * y)));
    expect(p.sq / UM).toBeCloseTo(0.5, 2);
    expect(p.sz / UM).toBeCloseTo(2, 3);
    expect(p.sdq).toBeCloseTo((k * UM) / Math.SQRT2, 3);
  });

  it('isotropic normal heights: Sdr (√π/2) s e^(1/s²) erfc(1/s), Sal l √ln 5, Str near 1, kurtosis 3', () => {
    const l = 12;
    const h = 0.25 * l;
    const field = gaussianField(700, 600, l, 7);
    const p = mapParameters(map(700, 600, UM, (x, y) => h * UM * field[Math.round(y / UM) * 700 + Math.round(x / UM)]));
    const within = 4 * p.sqStandardError;
    expect(p.sqStandardError).toBeLessThan(0.02);
    expect(Math.abs(p.sq / (h * UM) - 1)).toBeLessThan(within);
    // Sdq = 2 Sq/l = 0.5, for which the published integral gives 11.3169 %.
    expect(p.sdq).toBeGreaterThan(0.5 * (1 - within));
    expect(p.sdq).toBeLessThan(0.5 * (1 + within));
    expect(100 * p.sdr * (0.25 / p.sdq ** 2)).toBeCloseTo(11.3169, 0);
    expect(p.correlationLength! / (l * UM)).toBeCloseTo(1, 1);
    // Sal is the shortest of all directions, hence a little under the mean.
    expect(p.sal! / (l * UM * Math.sqrt(Math.log(5)))).toBeGreaterThan(0.9);
    expect(p.sal! / (l * UM * Math.sqrt(Math.log(5)))).toBeLessThan(1.03);
    expect(p.str!).toBeGreaterThan(0.85);
    expect(p.sku).toBeCloseTo(3, 0);
  });
});

describe('Gaussian filter', () => {
  it('α, the weight at the middle, and the transmission of ISO 16610-21', () => {
    expect(GAUSSIAN_ALPHA).toBeCloseTo(0.4697186, 7);
    expect(1 / GAUSSIAN_ALPHA).toBeCloseTo(2.128934, 6);
    for (const [ratio, kept] of [
      [1 / 3, 0.001953125],
      [0.5, 0.0625],
      [1, 0.5],
      [2, 0.8408964],
      [10, 0.9930925],
    ])
      expect(gaussianTransmission(ratio, 1)).toBeCloseTo(kept, 7);
  });

  it.each([
    [5, 0.0625],
    [10, 0.5],
    [20, 0.8408964],
  ])('a sine of %d µm under an index of 10 µm keeps %d in the mean line', (period, kept) => {
    const measured = profile(4001, (x) => UM * Math.cos((2 * Math.PI * (x - 2000 * DX)) / (period * UM)));
    const { heights } = gaussianMeanLine(measured, 10 * UM);
    expect(heights[2000] / UM).toBeCloseTo(kept, 6);
  });

  it('areal: the product of both directions', () => {
    const spacing = 0.25 * UM;
    const n = 241;
    const mid = (n - 1) / 2;
    const k = (2 * Math.PI) / PERIOD;
    const measured = map(
      n,
      n,
      spacing,
      (x, y) => Math.cos(k * (x - mid * spacing)) * Math.cos(k * (y - mid * spacing)),
    );
    expect(gaussianMeanSurface(measured, PERIOD).heights[mid * n + mid]).toBeCloseTo(0.25, 6);
  });

  it('keeps a constant at the ends and across holes, and leaves holes unmeasured', () => {
    const holed = profile(400, () => 3 * UM);
    for (const i of [100, 101, 250]) holed.heights[i] = Number.NaN;
    const { heights } = gaussianMeanLine(holed, 4 * UM);
    expect(heights[100]).toBeNaN();
    for (const i of [0, 99, 102, 399]) expect(heights[i] / UM).toBeCloseTo(3, 12);
  });

  it('normal heights of a known spectrum lose what the transfer function says', () => {
    const l = 20;
    const heights = gaussianNoise(120000, l, 11);
    const index = 3 * l * DX;
    const { parameters, flags } = evaluateProfile(
      { spacing: DX, heights: heights.map((z) => z * UM) },
      { longFilter: index },
    );
    // Density of exp(−x²/l²) over wavenumber: (l/√π) exp(−k²l²/4) for k > 0.
    let left = 0;
    const step = 0.002 / l;
    for (let k = step / 2; k < 12 / l; k += step)
      left +=
        (l / Math.sqrt(Math.PI)) *
        Math.exp((-k * k * l * l) / 4) *
        (1 - gaussianTransmission((2 * Math.PI) / k, 3 * l)) ** 2 *
        step;
    expect(left).toBeLessThan(0.9);
    expect(parameters.rqStandardError).toBeLessThan(0.012);
    expect(Math.abs(parameters.rq / (UM * Math.sqrt(left)) - 1)).toBeLessThan(3 * parameters.rqStandardError);
    expect(parameters.rq / parameters.ra).toBeCloseTo(1.2533, 1);
    expect(codes(flags)).toEqual(['texture.bandwidth']);
  });

  it('unfiltered: Rq and correlation length of what was made', () => {
    const l = 20;
    const heights = gaussianNoise(120000, l, 3);
    const p = profileParameters({ spacing: DX, heights });
    expect(Math.abs(p.rq - 1)).toBeLessThan(3 * p.rqStandardError);
    expect(p.rqStandardError).toBeCloseTo(0.5 * Math.sqrt((2 * l * Math.sqrt(Math.PI / 2)) / 120000), 3);
    expect(p.ral! / (l * DX * Math.sqrt(Math.log(5)))).toBeCloseTo(1, 1);
    expect(p.correlationLength! / (l * DX)).toBeCloseTo(1, 1);
    expect((p.rdq * l * DX) / (Math.SQRT2 * p.rq)).toBeCloseTo(1, 1);
  });
});

describe('form and flags', () => {
  it('takes a tilt off exactly, holes or not', () => {
    const line = profile(300, (x) => 3 * UM + 0.2 * x);
    line.heights[17] = Number.NaN;
    for (const z of withoutMeanLine(line).heights) if (!Number.isNaN(z)) expect(Math.abs(z)).toBeLessThan(1e-18);
    const plane = map(40, 30, UM, (x, y) => 2 * UM + 0.1 * x - 0.3 * y);
    plane.heights[500] = Number.NaN;
    for (const z of withoutMeanPlane(plane).heights) if (!Number.isNaN(z)) expect(Math.abs(z)).toBeLessThan(1e-18);
  });

  it('a tilted sine gives the figures of the level one', () => {
    const tilted = profile(8000, (x) => sine(x) + 0.05 * x);
    const { parameters } = evaluateProfile(tilted, { longFilter: 80 * UM });
    // The sine at an eighth of the index keeps 2^−64 in the mean line; what is left is the remnant of the tilt at the ends.
    expect(parameters.rq / UM).toBeCloseTo(Math.SQRT1_2, 2);
    expect(parameters.sections).toBe(4);
  });

  it('says what the data cannot carry', () => {
    const heights = gaussianField(64, 64, 0.8, 5).map((z) => z * UM);
    const coarse: HeightMap = { columns: 64, rows: 64, spacingX: UM, spacingY: UM, heights };
    expect(codes(evaluateMap(coarse, { shortFilter: 3 * UM, longFilter: 30 * UM }).flags)).toContain(
      'texture.filter-sampling',
    );
    expect(codes(evaluateMap(coarse, {}).flags)).toEqual(['texture.bandwidth', 'texture.resolution']);
    const holed = heights.map((z, i) => (i % 10 === 0 ? Number.NaN : z));
    expect(codes(evaluateMap({ ...coarse, heights: holed }, {}).flags)).toContain('texture.unmeasured');
    const slow = gaussianField(64, 64, 20, 5);
    expect(codes(evaluateMap({ ...coarse, heights: slow }, {}).flags)).toContain('texture.extent');
    expect(codes(evaluateProfile(profile(4000, sine), { longFilter: 80 * UM }).flags)).toContain('texture.sections');
  });

  it.each([
    [() => evaluateProfile(profile(10, sine), {}), /16 points/],
    [
      () =>
        evaluateProfile(
          profile(400, () => Number.NaN),
          {},
        ),
      /measured/,
    ],
    [() => evaluateProfile(profile(400, sine), { longFilter: 19.5 * UM }), /16 points/],
    [() => evaluateProfile(profile(400, sine), { shortFilter: 2 * UM, longFilter: UM }), /below the long/],
    [() => evaluateMap({ ...map(20, 20, UM, () => 0), columns: 21 }, {}), /420 heights/],
  ])('refuses %#', (attempt, message) => {
    expect(attempt).toThrow(message);
  });
});

describe('conversions', () => {
  it('mean range of normal heights against the table of control charts (d2; Tippett 1925, ISO 7870-2)', () => {
    for (const [n, d2] of [
      [2, 1.128],
      [5, 2.326],
      [10, 3.078],
      [25, 3.931],
    ])
      expect(normalRange(n)).toBeCloseTo(d2, 3);
    // Rz over Rq of 5.5 is the range of some 200 independent heights.
    expect(normalRange(200)).toBeCloseTo(5.49, 2);
  });

  it('Rq over Ra of sine and normal heights', () => {
    expect(RQ_OVER_RA.normal).toBeCloseTo(1.25331, 5);
    expect(RQ_OVER_RA.sine).toBeCloseTo(Math.SQRT1_2 / (2 / Math.PI), 12);
  });

  it.each(Object.entries(RQ_CONVERSIONS))('%s: the factor lies in its spread, and says why', (name, c) => {
    expect(c.low).toBeLessThanOrEqual(c.factor);
    expect(c.high).toBeGreaterThanOrEqual(c.factor);
    if (name === 'Rq') expect(c.assumption).toBeUndefined();
    else expect(c.assumption).toContain(name);
  });
});

describe('default settings', () => {
  // ISO 21920-3:2021, as read in a technical summary of its table: intervals are above the previous up to and with this limit.
  it.each([
    ['Ra', 0.02, 0.08, 0.4],
    ['Ra', 0.021, 0.25, 1.25],
    ['Ra', 0.1, 0.25, 1.25],
    ['Ra', 2, 0.8, 4],
    ['Ra', 10, 2.5, 12.5],
    ['Ra', 50, 8, 40],
    ['Rz', 0.16, 0.08, 0.4],
    ['Rz', 0.8, 0.25, 1.25],
    ['Rz', 5.5, 0.8, 4],
    ['Rz', 80, 2.5, 12.5],
  ] as const)('%s to %d µm: index %d mm, evaluation length %d mm', (parameter, limit, index, length) => {
    const settings = defaultSettings(parameter, limit * UM);
    expect(settings.longFilter * 1e3).toBeCloseTo(index, 12);
    expect(settings.evaluationLength * 1e3).toBeCloseTo(length, 12);
  });
});
