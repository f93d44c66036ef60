import { describe, expect, it } from 'vitest';
import { bestShift } from '../../src/evidence/column-comparison.js';
import { COLUMN_REFERENCES } from '../../src/evidence/column-references.js';
import { isotropicRow } from '../../src/evidence/isotropic-row.js';
import { fitResonance } from '../../src/evidence/patch-comparison.js';
import { PATCH_REFERENCES, TWO_COLUMNS, UNIT_REFERENCES } from '../../src/evidence/patch-references.js';
import { add, type Complex, complex, div } from '../../src/numerics/complex.js';
import { intensity } from '../../src/physics/pattern/index.js';

describe('fit of a resonance', () => {
  const z = (f: number): Complex => add(div(complex(300), complex(1, 25 * (f / 78.5 - 78.5 / f))), complex(0, 17));
  const points = [76.5, 77.5, 78.5, 79.5, 80.5].map((fGHz) => ({ fGHz, z: z(fGHz) }));

  it('finds what made the points from a guess some way off', () => {
    const found = fitResonance(points, { f0GHz: 79.3, ohm: 250, q: 22, seriesOhm: 0 });
    expect(found.f0GHz).toBeCloseTo(78.5, 8);
    expect(found.ohm).toBeCloseTo(300, 5);
    expect(found.q).toBeCloseTo(25, 6);
    expect(found.seriesOhm).toBeCloseTo(17, 5);
  });
});

describe('shift of reflections', () => {
  it.each(COLUMN_REFERENCES)('$name: is what a curve was moved by, with its sign', (reference) => {
    // Samples half a gigahertz apart, taken for those of 0.5 GHz higher.
    const row = (fGHz: number) => {
      const i = 2 * Math.round((fGHz - 0.5 - 74) * 2);
      const s11 = [reference.smoothReflection[i]!, reference.smoothReflection[i + 1]!] as const;
      return { fGHz, s11, reflection: 0, reflectionDb: 0, directivityDb: 0, gainDb: 0, tiltDeg: 0, sidelobeDb: 0 };
    };
    const rows = [76, 77, 78, 79, 80].map((f) => ({ ...row(f), engineGainDbi: 0, referenceGainDbi: 0 }));
    expect(bestShift({ reference, copper: 'smooth', rows })).toBeCloseTo(0.5, 2);
  });
});

describe('references', () => {
  it('agree between the rows and the finer curve of the same solution', () => {
    for (const reference of COLUMN_REFERENCES)
      for (const row of reference.rows.filter((r) => r.copper === 'smooth')) {
        const i = 4 * (row.fGHz - 74);
        expect(reference.smoothReflection.slice(i, i + 2)).toEqual([...row.s11]);
      }
  });

  it('are passive', () => {
    for (const reference of COLUMN_REFERENCES)
      for (let i = 0; i < reference.smoothReflection.length; i += 2)
        expect(Math.hypot(reference.smoothReflection[i]!, reference.smoothReflection[i + 1]!)).toBeLessThan(1);
    for (const unit of UNIT_REFERENCES)
      for (const [, re, im, through] of unit.rows) expect(re * re + im * im + through * through).toBeLessThan(1);
    for (const [, a, b, c, d] of TWO_COLUMNS.rows) expect(a * a + b * b + c * c + d * d).toBeLessThan(1);
    for (const patch of PATCH_REFERENCES) {
      const [none, smooth] = [patch.fits[0]!, patch.fits[1]!];
      expect(smooth.q).toBeLessThan(none.q);
      expect(smooth.f0GHz).toBeLessThan(none.f0GHz);
    }
  });
});

describe('isotropic row', () => {
  it('is one function as field and as cut', () => {
    const field = isotropicRow([1, 2, 3, 2], 0.6);
    const [power, cut] = [intensity(field), field.cut('elevation')];
    for (const angle of [-1.3, -0.2, 0, 0.7]) expect(cut(angle)).toBeCloseTo(power(Math.sin(angle), 0), 10);
    expect(field.cut('azimuth')(0.5)).toBeCloseTo(64, 10);
  });
});
