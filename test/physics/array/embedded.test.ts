import { describe, expect, it } from 'vitest';
import { complex, polar } from '../../../src/numerics/complex.js';
import { activeReflections, arrayFigures, embeddedField, incidentWaves } from '../../../src/physics/array/index.js';
import { edgeNetwork } from '../../../src/physics/column/index.js';
import { farFieldPower, intensity, strongestDirection } from '../../../src/physics/pattern/index.js';

const copper = complex(0.07, 0.07);
const solution = edgeNetwork(
  {
    slab: { permittivity: 3, lossTangent: 0.0015, height: 127e-6 },
    stripThickness: 0,
    referenceImpedance: 'line',
    columns: [0, 1, 2].map((c) => ({
      x: 0,
      y: c * 2.1e-3,
      feedLineWidth: 0.15e-3,
      patches: [1, 2, 3].map(() => ({ width: 0.9e-3, length: 1.06e-3 })),
      links: [1, 2].map(() => ({ width: 0.15e-3, length: 1.25e-3 })),
    })),
  },
  80e9,
).solve({ frequency: 77e9, faces: { underside: copper, top: copper, edges: copper, ground: copper } });

describe('embedded patterns', () => {
  it('add up to the pattern of the driven board', () => {
    const waves = [complex(0.8), polar(1, -0.6), polar(0.5, 2)];
    const driven = solution.excite(waves).field;
    const parts = [0, 1, 2].map((c) => embeddedField(solution, c));
    const [whole, part] = [new Float64Array(4), new Float64Array(4)];
    for (const [u, v] of [
      [0, 0],
      [0.2, -0.5],
      [-0.7, 0.3],
    ] as const) {
      driven.at(u, v, whole);
      const sum = [0, 0, 0, 0];
      parts.forEach((field, c) => {
        field.at(u, v, part);
        const wave = { re: waves[c]!.re / Math.SQRT2, im: waves[c]!.im / Math.SQRT2 };
        for (const i of [0, 2]) {
          sum[i]! += wave.re * part[i]! - wave.im * part[i + 1]!;
          sum[i + 1]! += wave.re * part[i + 1]! + wave.im * part[i]!;
        }
      });
      for (let i = 0; i < 4; i++) expect(sum[i]).toBeCloseTo(whole[i]!, 10);
    }
  });

  it('carry less than the watt that comes in', () => {
    const power = farFieldPower(embeddedField(solution, 1));
    expect(power).toBeGreaterThan(0.01);
    expect(power).toBeLessThan(1);
  });

  it('refuses a column that is not there', () => {
    expect(() => embeddedField(solution, 3)).toThrow(RangeError);
  });
});

describe('far field of the engine', () => {
  it('is one function seen in two cuts, and nothing at the horizon and beyond', () => {
    const { field } = solution.excite([complex(1), polar(0.6, 0.4), complex(0)]);
    const whole = intensity(field);
    const [elevation, azimuth] = [field.cut('elevation'), field.cut('azimuth')];
    for (const angle of [-1.2, -0.4, 0, 0.3, 1.1]) {
      expect(elevation(angle)).toBeCloseTo(whole(Math.sin(angle), 0), 12);
      expect(azimuth(angle)).toBeCloseTo(whole(0, Math.sin(angle)), 12);
    }
    expect(whole(1, 0)).toBe(0);
    expect(whole(0.8, 0.7)).toBe(0);
  });
});

describe('figures of a driven board', () => {
  const waves = incidentWaves([
    { amplitude: 1, phase: 0 },
    { amplitude: 0.6, phase: -0.4 },
    { amplitude: 0.3, phase: -0.8 },
  ]);
  const figures = arrayFigures(solution, waves);

  it('have the active reflection of the S-matrix', () => {
    activeReflections(solution.scattering, waves).forEach((value, n) => {
      expect(value.re).toBeCloseTo(figures.activeReflection[n]!.re, 10);
      expect(value.im).toBeCloseTo(figures.activeReflection[n]!.im, 10);
    });
  });

  it('have the highest intensity of the half space as their peak', () => {
    const peak = strongestDirection(figures.excited.field);
    const directivity = (4 * Math.PI * peak.intensity) / figures.excited.power.radiated;
    expect(Math.abs(10 * Math.log10(directivity / figures.directivity))).toBeLessThan(1e-4);
  });

  it('balance', () => {
    expect(Math.abs(figures.powerResidual)).toBeLessThan(1e-9);
  });
});
