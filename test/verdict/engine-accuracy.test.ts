import { describe, expect, it } from 'vitest';
import { reflectionSpread, sidelobeSpread } from '../../src/verdict/accuracy-spread.js';
import { ENGINE_ACCURACY, engineAccuracyOf } from '../../src/verdict/engine-accuracy.js';
import { fullWaveAccuracyOf } from '../../src/verdict/full-wave-accuracy.js';
import { lineOutside } from '../../src/verdict/line-range.js';
import { figure, fixtureBoard } from '../study/fixture-board.js';

describe('engine accuracy', () => {
  it('turns a complex reflection error into an asymmetric one in dB', () => {
    // |S11| 0.2 ± 0.1: 0.3 is 3.52 dB above, 0.1 is 6.02 dB below.
    const spread = reflectionSpread(20 * Math.log10(0.2), 0.1);
    expect(spread.up).toBeCloseTo(3.522, 3);
    expect(spread.down).toBeCloseTo(6.021, 3);
  });

  it('lets a reflection smaller than the error go down to a perfect match, with a finite number', () => {
    const spread = reflectionSpread(-30, 0.1);
    expect(spread.down).toBeCloseTo(30, 9);
    expect(reflectionSpread(-120, 0.1).down).toBe(0);
  });

  it('grows for lower sidelobes', () => {
    expect(sidelobeSpread(-13).up).toBe(1);
    expect(sidelobeSpread(-20).up).toBe(1);
    expect(sidelobeSpread(-25).up).toBeCloseTo(2, 12);
    expect(sidelobeSpread(-30).up).toBeGreaterThan(2);
  });

  it('lets a poor match widen the realized gain, and not the gain', () => {
    const realized = engineAccuracyOf('realized_gain');
    const good = realized.spread(12, { reflection: 0.05 }).down;
    const poor = realized.spread(12, { reflection: 0.5 }).down;
    expect(good).toBeGreaterThanOrEqual(0.35);
    expect(poor).toBeGreaterThan(good);
    expect(engineAccuracyOf('gain').spread(12, { reflection: 0.5 })).toEqual({ up: 0.35, down: 0.35 });
  });

  it('is better by the full wave than by the network, for every quantity of the columns', () => {
    const values = { sidelobe_level: -23, pattern_mask: -23, reflection: -15, active_reflection: -15, isolation: 30 };
    for (const { quantity, spread } of ENGINE_ACCURACY) {
      if (quantity === 'line_loss') expect(fullWaveAccuracyOf(quantity)).toBeUndefined();
      else {
        const value = values[quantity as keyof typeof values] ?? 10;
        const [network, better] = [spread, fullWaveAccuracyOf(quantity)!.spread].map((of) =>
          of(value, { reflection: 0.2 }),
        );
        // The direction is known to 0.5 deg by both.
        if (quantity === 'beam_direction') expect(better).toEqual(network);
        else {
          expect(better!.up).toBeLessThan(network!.up);
          expect(better!.down).toBeLessThan(network!.down);
        }
      }
    }
  });

  it('doubles that of a line outside what it was compared on, and names the respect', () => {
    const { spread } = engineAccuracyOf('line_loss');
    expect(spread(0.5, { reflection: 0 })).toEqual({ up: 0.015, down: 0.015 });
    expect(spread(0.5, { reflection: 0, outside: true })).toEqual({ up: 0.03, down: 0.03 });
    const board = fixtureBoard();
    expect(lineOutside(board)).toEqual([]);
    const { laminate } = board.stackUp;
    const high = { ...laminate, thickness: figure('t', 0.4e-3) };
    expect(lineOutside({ ...board, stackUp: { ...board.stackUp, laminate: high } }).join()).toMatch(
      /0\.400 mm.*times as wide/,
    );
    const cover = {
      material: 'mask',
      permittivity: figure('a', 3),
      lossTangent: figure('b', 0),
      thickness: figure('c', 2e-5),
    };
    expect(lineOutside({ ...board, stackUp: { ...board.stackUp, cover } }).join()).toContain('cover');
    expect(lineOutside({ ...board, band: { low: 130e9, high: 140e9 } }).join()).toContain('100 GHz');
  });
});
