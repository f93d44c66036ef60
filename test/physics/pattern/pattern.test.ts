import { describe, expect, it } from 'vitest';
import { edgeField } from '../../../src/physics/column/edge-field.js';
import type { ExcitedEdges } from '../../../src/physics/column/index.js';
import { cutShape, intensity } from '../../../src/physics/pattern/index.js';

const edges: ExcitedEdges = {
  frequency: 77e9,
  slab: { permittivity: 3, lossTangent: 0, height: 127e-6 },
  edges: [
    {
      column: 0,
      patch: 0,
      x: -0.5e-3,
      y: 0,
      sign: -1,
      pulses: [
        { width: 1e-3, density: 1 },
        { width: 0.2e-3, density: -0.7 },
      ],
    },
    { column: 0, patch: 0, x: 0.5e-3, y: 0, sign: 1, pulses: [{ width: 1e-3, density: 1 }] },
    { column: 1, patch: 0, x: 0.5e-3, y: 2e-3, sign: 1, pulses: [{ width: 1.1e-3, density: 0.9 }] },
  ],
  re: Float64Array.of(-1, 0.9, 0.4),
  im: Float64Array.of(0.1, 0.05, -0.3),
};

describe('pattern of edges', () => {
  it('is one function seen in two cuts', () => {
    const whole = intensity(edgeField(edges));
    const [el, az] = [edgeField(edges).cut('elevation'), edgeField(edges).cut('azimuth')];
    for (const angle of [-1.2, -0.4, 0, 0.3, 1.1]) {
      expect(el(angle)).toBeCloseTo(whole(Math.sin(angle), 0), 12);
      expect(az(angle)).toBeCloseTo(whole(0, Math.sin(angle)), 12);
    }
  });

  it('vanishes at the horizon and beyond', () => {
    const whole = intensity(edgeField(edges));
    expect(whole(1, 0)).toBe(0);
    expect(whole(0.8, 0.7)).toBe(0);
  });

  it('tilts towards +x when the phase lags along +x', () => {
    // e^{+jωt}: later phase further along +x sends the wave towards +x.
    const lag = (phase: number): ExcitedEdges => ({
      ...edges,
      edges: [0, 1, 2, 3].map((i) => ({ ...edges.edges[1], x: i * 2e-3, sign: 1 as const })),
      re: Float64Array.from([0, 1, 2, 3], (i) => Math.cos(-i * phase)),
      im: Float64Array.from([0, 1, 2, 3], (i) => Math.sin(-i * phase)),
    });
    expect(cutShape(edgeField(lag(0.5)).cut('elevation')).beamDirection).toBeGreaterThan(0.05);
    expect(cutShape(edgeField(lag(-0.5)).cut('elevation')).beamDirection).toBeLessThan(-0.05);
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
