import { describe, expect, it } from 'vitest';
import { abs, abs2, type Complex, complex, div, polar } from '../../../src/numerics/complex.js';
import {
  activeReflections,
  isolation,
  renormalise,
  scanReflection,
  steeringWaves,
} from '../../../src/physics/array/index.js';

const close = (a: Complex, b: Complex, digits = 12): void => {
  expect(a.re).toBeCloseTo(b.re, digits);
  expect(a.im).toBeCloseTo(b.im, digits);
};
const pair = (own: Complex, mutual: Complex): Complex[][] => [
  [own, mutual],
  [mutual, own],
];
const [own, mutual] = [polar(0.4, 1.1), polar(0.1, -0.7)];

describe('active reflection', () => {
  it('is own plus mutual for two driven alike, own less mutual against each other', () => {
    const s = pair(own, mutual);
    close(activeReflections(s, [complex(1), complex(1)])[0]!, complex(own.re + mutual.re, own.im + mutual.im));
    close(activeReflections(s, [complex(2), complex(-2)])[1]!, complex(own.re - mutual.re, own.im - mutual.im));
  });

  it('does not depend on the common level or phase, and is 0 where no wave comes in', () => {
    const s = pair(own, mutual);
    const one = activeReflections(s, [complex(1), polar(0.7, 0.3)]);
    const same = activeReflections(s, [polar(3, 2), polar(2.1, 2.3)]);
    one.forEach((value, n) => {
      close(value, same[n]!);
    });
    const alone = activeReflections(s, [complex(1), complex(0)]);
    close(alone[0]!, own);
    close(alone[1]!, complex(0));
  });

  it.each([
    () => activeReflections(pair(own, mutual), [complex(1)]),
    () => activeReflections([[own, mutual]], [complex(1)]),
    () => scanReflection(pair(own, mutual), [0, 1], 1, [], [1, 1]),
    () => scanReflection(pair(own, mutual), [0, 1], 1, [0], [0, 0]),
    () => scanReflection(pair(own, mutual), [0], 1, [0], [1, 1]),
    () => isolation(pair(own, mutual), [0], []),
    () => isolation(pair(own, mutual), [0], [0]),
    () => isolation(pair(own, mutual), [0], [2]),
    () => renormalise(pair(own, mutual), [50, 50], [50, 0]),
    () => renormalise(pair(own, mutual), [50], [50, 50]),
  ])('refuses nonsense', (call) => {
    expect(call).toThrow(RangeError);
  });
});

describe('scan', () => {
  const k0 = 1613;
  const y = [0, 2e-3];
  it('lags along +y for a beam towards +y', () => {
    const [first, second] = steeringWaves(y, k0, 0.4, [1, 1]);
    close(div(second!, first!), polar(1, -k0 * 2e-3 * Math.sin(0.4)));
  });

  it('gives active reflection of the steered waves and where each column is worst', () => {
    const angles = [-0.6, -0.3, 0, 0.3, 0.6];
    const scan = scanReflection(pair(own, mutual), y, k0, angles, [1, 0.5]);
    const waves = steeringWaves(y, k0, 0.3, [1, 0.5]);
    activeReflections(pair(own, mutual), waves).forEach((value, n) => {
      close(scan.reflection[3]![n]!, value);
    });
    for (const { column, angle, magnitude } of scan.worst) {
      expect(magnitude).toBe(Math.max(...scan.reflection.map((row) => abs(row[column]!))));
      expect(abs(scan.reflection[angles.indexOf(angle)]![column]!)).toBe(magnitude);
    }
  });

  it('leaves out columns that are not driven', () => {
    expect(scanReflection(pair(own, mutual), y, k0, [0], [1, 0]).worst.map((w) => w.column)).toEqual([0]);
  });
});

describe('isolation', () => {
  it('is the worst pair of two groups, whichever way', () => {
    const s = [0, 1, 2, 3].map((i) => [0, 1, 2, 3].map((j) => complex(0.001 * (1 + i + j))));
    s[3]![0] = complex(0, 0.05);
    expect(isolation(s, [0, 1], [2, 3])).toMatchObject({ from: 0, to: 3 });
    expect(isolation(s, [0, 1], [2, 3]).isolationDb).toBeCloseTo(-20 * Math.log10(0.05), 12);
    expect(isolation(s, [2, 3], [0, 1])).toEqual(isolation(s, [0, 1], [2, 3]));
    expect(isolation(s, [1], [2]).isolationDb).toBeCloseTo(-20 * Math.log10(0.004), 12);
  });

  it('is infinite where nothing couples', () => {
    expect(isolation(pair(own, complex(0)), [0], [1]).isolationDb).toBe(Number.POSITIVE_INFINITY);
  });
});

describe('change of reference', () => {
  it('keeps the impedance of a one-port', () => {
    const z = complex(30, 20);
    const gamma = (r: number): Complex => div(complex(z.re - r, z.im), complex(z.re + r, z.im));
    close(renormalise([[gamma(75)]], [75], [50])[0]![0]!, gamma(50));
  });

  it('of a series resistor is what it is in either reference', () => {
    // Series R between references r: S11 = R/(R + 2r), S21 = 2r/(R + 2r).
    const series = (R: number, r: number) => pair(complex(R / (R + 2 * r)), complex((2 * r) / (R + 2 * r)));
    renormalise(series(40, 50), [50, 50], [80, 80]).forEach((row, i) => {
      row.forEach((value, j) => {
        close(value, series(40, 80)[i]![j]!);
      });
    });
  });

  it('goes back where it came from, stays reciprocal and keeps a lossless circuit lossless', () => {
    // A lossless reciprocal two-port: |S11|² + |S21|² = 1, phases 90° apart.
    const s = pair(polar(0.6, 0.2), polar(0.8, 0.2 + Math.PI / 2));
    const there = renormalise(s, [50, 70], [90, 35]);
    close(there[0]![1]!, there[1]![0]!);
    expect(abs2(there[0]![0]!) + abs2(there[1]![0]!)).toBeCloseTo(1, 12);
    renormalise(there, [90, 35], [50, 70]).forEach((row, i) => {
      row.forEach((value, j) => {
        close(value, s[i]![j]!);
      });
    });
  });
});
