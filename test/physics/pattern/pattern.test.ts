import { describe, expect, it } from 'vitest';
import { cutShape } from '../../../src/physics/pattern/index.js';
import { row } from './point-sources.js';

describe('sense of angles', () => {
  it('tilts towards +x when the phase lags along +x', () => {
    // e^{+jωt}: later phase further along +x sends the wave towards +x.
    expect(cutShape(row(4, 0.5, 0.5).cut('elevation')).beamDirection).toBeGreaterThan(0.05);
    expect(cutShape(row(4, 0.5, -0.5).cut('elevation')).beamDirection).toBeLessThan(-0.05);
  });
});

describe('figures of a cut', () => {
  it('reads a Gaussian beam as it is', () => {
    const width = 0.2;
    const shape = cutShape((a) => Math.exp((-4 * Math.LN2 * (a - 0.1) ** 2) / width ** 2));
    expect(shape.beamDirection).toBeCloseTo(0.1, 5);
    expect(shape.halfPowerBeamwidth).toBeCloseTo(width, 6);
    expect(shape.sidelobeDb).toBeNaN();
  });

  it('says so when a half-power point lies outside', () => {
    expect(cutShape((a) => 1 + 0.1 * Math.cos(a)).halfPowerBeamwidth).toBeNaN();
  });

  it('finds a lone sidelobe between samples', () => {
    // A parabola in power through samples 0.5° apart: 0.0006 dB low on a lobe 5° wide.
    const shape = cutShape((a) => Math.exp(-((a / 0.1) ** 2)) + 0.01 * Math.exp(-(((a - 0.6137) / 0.05) ** 2)));
    expect(shape.sidelobeDb).toBeCloseTo(-20, 2);
  });
});
