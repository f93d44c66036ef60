import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { clipLine } from '../../src/chart/clip.js';
import {
  angleStep,
  decimalsOf,
  fitDomain,
  linearTicks,
  logTicks,
  makeScale,
  niceStep,
  printNumber,
} from '../../src/chart/scale.js';

const seed = 20261116;

describe('scales', () => {
  it('lead to pixels and back', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.05, max: 50, noNaN: true }), (value) => {
        for (const type of ['linear', 'log'] as const) {
          const scale = makeScale(type, [0.05, 50], [0, 400]);
          expect(scale.toValue(scale.toPixel(value))).toBeCloseTo(value, 9);
        }
      }),
      { seed },
    );
  });

  it('refuse an empty domain and a logarithm of nothing', () => {
    expect(() => makeScale('linear', [1, 1], [0, 1])).toThrow(RangeError);
    expect(() => makeScale('log', [0, 1], [0, 1])).toThrow(RangeError);
  });

  it('choose readable ticks', () => {
    expect(linearTicks([-90, 90], angleStep(180, 8))).toEqual([-90, -60, -30, 0, 30, 60, 90]);
    expect(linearTicks([-40, 5], niceStep(45, 8))).toEqual([-40, -30, -20, -10, 0]);
    expect(linearTicks([75.5, 77.9], niceStep(2.4, 8))).toEqual([75.5, 76, 76.5, 77, 77.5]);
    expect(logTicks([0.05, 2])).toEqual([0.05, 0.1, 0.2, 0.5, 1, 2]);
    expect(logTicks([1e-3, 1e5])).toEqual([1e-3, 1e-2, 0.1, 1, 10, 100, 1e3, 1e4, 1e5]);
  });

  it('never crowd an axis beyond the count asked for', () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-6, max: 1e6, noNaN: true }), fc.integer({ min: 2, max: 12 }), (span, count) => {
        expect(span / niceStep(span, count)).toBeLessThanOrEqual(count * (1 + 1e-9));
        expect(span / niceStep(span, count)).toBeGreaterThan(count / 2.6);
      }),
      { seed },
    );
  });

  it('widen a domain to whole steps around all values', () => {
    expect(fitDomain([0.23, 1.31], 'linear')).toEqual([0.2, 1.4]);
    expect(fitDomain([4], 'linear')).toEqual([3.4, 4.6].map((v) => expect.closeTo(v, 0)));
    expect(fitDomain([Number.NaN], 'linear')).toEqual([0, 1]);
    expect(fitDomain([0.05, 2, -1], 'log')).toEqual([0.05, 2]);
  });

  it('print numbers with a true minus sign and no negative zero', () => {
    expect(printNumber(-0.314, 2)).toBe('\u22120.31');
    expect(printNumber(0.314, 2, true)).toBe('+0.31');
    expect(printNumber(-0.001, 2, true)).toBe('0.00');
    expect(decimalsOf(0.25)).toBe(2);
    expect(decimalsOf(20)).toBe(0);
  });
});

describe('cutting a line at the edges of the plot', () => {
  const line = [
    [-1, -1],
    [1, 1],
    [3, -1],
  ] as const;

  it('ends it on the edge', () => {
    expect(clipLine(line, [0, 2], [0.5, 2])).toEqual([
      [
        [0.5, 0.5],
        [1, 1],
        [1.5, 0.5],
      ],
    ]);
  });

  it('breaks it where it leaves and where a value is missing', () => {
    expect(clipLine(line, [-1, 3], [-1, 0.5])).toHaveLength(2);
    expect(
      clipLine(
        [
          [0, 0],
          [1, Number.NaN],
          [2, 0],
          [3, 0],
        ],
        [0, 3],
        [-1, 1],
      ),
    ).toEqual([
      [
        [2, 0],
        [3, 0],
      ],
    ]);
    expect(clipLine(line, [5, 6], [5, 6])).toEqual([]);
  });

  it('keeps every point inside', () => {
    const point = fc.tuple(fc.double({ min: -9, max: 9, noNaN: true }), fc.double({ min: -9, max: 9, noNaN: true }));
    fc.assert(
      fc.property(fc.array(point, { minLength: 2, maxLength: 9 }), (points) => {
        for (const [x, y] of clipLine(points, [-3, 3], [-2, 2]).flat()) {
          expect(Math.abs(x)).toBeLessThanOrEqual(3 + 1e-9);
          expect(Math.abs(y)).toBeLessThanOrEqual(2 + 1e-9);
        }
      }),
      { seed },
    );
  });
});
