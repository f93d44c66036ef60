import { describe, expect, it } from 'vitest';
import { sketchProfile } from '../../src/dossier/tooth-profile.js';

const input = { rq: 0.4, correlationLength: 1.13, width: 12, samples: 400 };
const rms = (z: readonly number[]) => Math.sqrt(z.reduce((sum, h) => sum + h * h, 0) / z.length);

describe('a sketched profile', () => {
  it('has the stated Rq about its mean', () => {
    for (const [rq, correlationLength] of [
      [0.4, 1.13],
      [2.4, 6.8],
      [0.3, 0.2],
    ]) {
      const heights = sketchProfile({ ...input, rq, correlationLength, width: 40 });
      expect(rms(heights)).toBeCloseTo(rq, 12);
      expect(heights.reduce((a, b) => a + b, 0) / heights.length).toBeCloseTo(0, 12);
    }
  });

  it('is the same every time, another one for other figures', () => {
    expect(sketchProfile(input)).toEqual(sketchProfile(input));
    expect(sketchProfile({ ...input, correlationLength: 1.14 })).not.toEqual(sketchProfile(input));
  });

  it('loses correlation over the stated length: 1/e of a Gaussian autocorrelation', () => {
    // 400 correlation lengths: the estimate scatters by about 1/sqrt(400/2.5) of the variance.
    const wide = { rq: 1, correlationLength: 1, width: 400, samples: 8001 };
    const z = sketchProfile(wide);
    const lagged = (lag: number) => {
      const n = Math.round(lag * 20);
      return z.slice(n).reduce((sum, h, i) => sum + h * z[i], 0) / (z.length - n);
    };
    expect(lagged(0.5)).toBeGreaterThan(Math.exp(-0.25) - 0.1);
    expect(Math.abs(lagged(1) - Math.exp(-1))).toBeLessThan(0.1);
    expect(Math.abs(lagged(2))).toBeLessThan(0.1);
  });
});
