import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { SheetItem } from '../../src/dossier/supplier-allowed-fields.js';
import { limitIn, nominalIn } from '../../src/dossier/supplier-limits.js';

/** A texture of one face with a stated upper limit, µm. */
const item = (nominal: number, limit: number): SheetItem => ({
  id: 'A-treated-face-texture',
  parameter: 'treated-face-texture',
  dimension: 'length',
  unit: 'um',
  nominal: nominal * 1e-6,
  upperOnly: true,
  verification: {},
  limits: {
    lower: { limit: 0, origin: 'stated', allowance: { kind: 'not computed' } },
    upper: { limit: limit * 1e-6, origin: 'stated', allowance: { kind: 'not computed' } },
  },
});

describe('stated limits of a sheet', () => {
  it('are printed as they were written', () => {
    for (const text of ['0.4', '1.25', '0.249', '12.345'])
      expect(limitIn(item(Number(text) / 2, Number(text)), 'upper').replace(/0+$/, '')).toBe(text);
  });

  it('that were worked out from a measured file are rounded to what anybody can measure, never allowing more', () => {
    expect(limitIn(item(0.2007, 0.249089), 'upper')).toBe('0.2490');
    expect(nominalIn(item(0.2007, 0.249089))).toBe('0.2007');
    fc.assert(
      fc.property(
        fc.double({ min: 0.05, max: 3, noNaN: true }),
        fc.double({ min: 1.02, max: 2, noNaN: true }),
        (nominal, factor) => {
          const limit = nominal * factor;
          const printed = limitIn(item(nominal, limit), 'upper');
          expect(Number(printed)).toBeLessThanOrEqual(limit + 1e-9);
          expect(Number(printed)).toBeGreaterThan(limit - 0.02 * (limit - nominal) - 1e-3 * limit);
          expect(printed.replace(/^0\.?0*/, '').replace('.', '').length).toBeLessThanOrEqual(5);
        },
      ),
      { seed: 11, numRuns: 300 },
    );
  });
});
