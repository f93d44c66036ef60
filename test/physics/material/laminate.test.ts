import { describe, expect, it } from 'vitest';
import { debyePermittivity, laminateAt, WIDEBAND_CORNERS, widebandDebye } from '../../../src/physics/material/index.js';

const stated = { permittivity: 3, lossTangent: 0.0013, frequency: 10e9 };

describe('wideband Debye', () => {
  it('returns its statement at its frequency', () => {
    const e = debyePermittivity(widebandDebye(stated), 10e9);
    expect(e.re).toBeCloseTo(3, 13);
    expect(-e.im / e.re).toBeCloseTo(0.0013, 14);
  });

  it('keeps the loss tangent within 1 % from 10 to 77 GHz, its upper corner far above', () => {
    const there = laminateAt(stated, { frequency: 77e9 });
    expect(Math.abs(there.lossTangent / 0.0013 - 1)).toBeLessThan(0.01);
    expect(there.permittivity).toBeLessThan(3);
    expect(there.flags).toEqual([]);
  });

  it('flags a corner that touches the span', () => {
    const there = laminateAt(stated, { frequency: 77e9 }, {}, { lower: 1e4, upper: 1e12 });
    expect(there.flags.map((f) => f.code)).toEqual(['laminate.debye-corner']);
    expect(there.flags[0]!.text).toContain('changes by -26 %');
  });

  it('falls with frequency and never gains', () => {
    const model = widebandDebye(stated);
    let last = Number.POSITIVE_INFINITY;
    for (let f = 1e6; f < 2e13; f *= 1.7) {
      const e = debyePermittivity(model, f);
      expect(e.re).toBeLessThan(last);
      expect(e.im).toBeLessThan(0);
      last = e.re;
    }
  });

  it.each([1e9, 10e9, 77e9, 300e9])('is causal at %d Hz: Kramers–Kronig gives its permittivity from its loss', (f) => {
    // ε′(ω) − ε∞ = (1/π) ∫ [eˣ ε″(ωeˣ) − e⁻ˣ ε″(ωe⁻ˣ)]/sinh x dx over x > 0, midpoint rule.
    const model = widebandDebye(stated);
    const loss = (x: number): number => -debyePermittivity(model, f * Math.exp(x)).im;
    const n = 40_000;
    const end = 40;
    let sum = 0;
    for (let i = 0; i < n; i++) {
      const x = ((i + 0.5) * end) / n;
      sum += ((Math.exp(x) * loss(x) - Math.exp(-x) * loss(-x)) / Math.sinh(x)) * (end / n);
    }
    const step = debyePermittivity(model, f).re - model.high;
    expect(Math.abs(sum / Math.PI - step)).toBeLessThan(1e-5 * step);
  });

  it('refuses statements that are not physical', () => {
    expect(() => widebandDebye({ ...stated, permittivity: 0.9 })).toThrow(/got 0.9/);
    expect(() => widebandDebye({ ...stated, lossTangent: -1e-4 })).toThrow(/got -0.0001/);
    expect(() => widebandDebye({ ...stated, frequency: 1e14 }, WIDEBAND_CORNERS)).toThrow(/between the corners/);
  });

  it('without loss has no dispersion', () => {
    expect(laminateAt({ ...stated, lossTangent: 0 }, { frequency: 77e9 })).toMatchObject({
      permittivity: 3,
      lossTangent: 0,
    });
  });
});

describe('temperature and moisture', () => {
  const coefficients = {
    permittivityPerKelvin: -25e-6,
    lossTangentPerKelvin: 1e-3,
    permittivityPerWaterShare: 10,
    lossTangentPerWaterShare: 0.5,
  };

  it('are linear in the statement', () => {
    const hot = laminateAt(stated, { frequency: 10e9, temperatureRise: 60 }, coefficients);
    expect(hot.permittivity).toBeCloseTo(3 * (1 - 1.5e-3), 12);
    expect(hot.lossTangent).toBeCloseTo(0.0013 * 1.06, 13);
    const moist = laminateAt(stated, { frequency: 10e9, waterShare: 4e-4 }, coefficients);
    expect(moist.permittivity).toBeCloseTo(3 * 1.004, 12);
    expect(moist.lossTangent).toBeCloseTo(0.0013 + 2e-4, 13);
  });

  it('count for nothing where no coefficient is known', () => {
    const there = laminateAt(stated, { frequency: 10e9, temperatureRise: 60, waterShare: 1e-3 });
    expect(there.permittivity).toBeCloseTo(3, 12);
  });
});
