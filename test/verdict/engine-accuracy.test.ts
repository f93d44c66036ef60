import { describe, expect, it } from 'vitest';
import { engineAccuracyOf, reflectionSpread, sidelobeSpread } from '../../src/verdict/engine-accuracy.js';

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
});
