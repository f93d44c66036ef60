import { describe, expect, it } from 'vitest';
import { carriedTo, carriedValue } from '../../src/study/carried.js';

const known = [76e9, 77e9, 79e9];
const values = [3, 5, -1];
const at = (frequency: number, reach: number) => carriedValue(carriedTo(known, frequency, reach), (i) => values[i]!);

describe('what is known at a few frequencies', () => {
  it.each([0.05e9, 0.5e9, 5e9, Number.POSITIVE_INFINITY])('is exact at them with a reach of %d Hz', (reach) => {
    known.forEach((frequency, i) => {
      expect(at(frequency, reach)).toBeCloseTo(values[i]!, 12);
    });
  });

  it('goes along straight lines with a reach without end, and level beyond the ends', () => {
    expect(at(76.25e9, Number.POSITIVE_INFINITY)).toBeCloseTo(3.5, 12);
    expect(at(78e9, Number.POSITIVE_INFINITY)).toBeCloseTo(2, 12);
    expect(at(70e9, Number.POSITIVE_INFINITY)).toBe(3);
    expect(at(80e9, Number.POSITIVE_INFINITY)).toBe(-1);
  });

  it('is nearly the straight line within a large reach, and nothing beyond a small one', () => {
    expect(at(78e9, 1e12)).toBeCloseTo(2, 4);
    expect(at(78e9, 0.01e9)).toBeCloseTo(0, 12);
    expect(at(79.5e9, 0.01e9)).toBeCloseTo(0, 12);
  });

  it('is the best linear prediction of a process that forgets as e^(−Δf/reach)', () => {
    const reach = 0.7e9;
    const { lowerWeight, upperWeight } = carriedTo(known, 77.6e9, reach);
    const correlation = (a: number, b: number) => Math.exp(-Math.abs(a - b) / reach);
    // Normal equations of the prediction from the two neighbours.
    const between = correlation(77e9, 79e9);
    expect(lowerWeight + between * upperWeight).toBeCloseTo(correlation(77.6e9, 77e9), 12);
    expect(between * lowerWeight + upperWeight).toBeCloseTo(correlation(77.6e9, 79e9), 12);
  });
});
