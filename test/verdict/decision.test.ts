import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { decide } from '../../src/verdict/decision.js';
import { judgeRequirement } from '../../src/verdict/judge.js';
import { gainRequirement, type TinyCase, tinyStudy } from './tiny-study.js';

const db = fc.double({ min: -5, max: 5, noNaN: true });
const cases: fc.Arbitrary<TinyCase> = fc.record({
  sides: fc.tuple(db, db, db),
  tolerances: fc.array(fc.tuple(db, db), { maxLength: 3 }),
});
const settings = { seed: 20260302, numRuns: 300 };
const judge = (study: Parameters<typeof judgeRequirement>[0], limit: number, direction: 'at_least' | 'at_most') =>
  judgeRequirement(study, gainRequirement(direction, limit));

describe('decision rule', () => {
  it('gives meets at a lower bound of exactly zero and misses only below an upper bound of zero', () => {
    expect(decide({ lower: 0, upper: 1 })).toBe('meets');
    expect(decide({ lower: -1e-12, upper: 1 })).toBe('undecided');
    expect(decide({ lower: -1, upper: 0 })).toBe('undecided');
    expect(decide({ lower: -1, upper: -1e-12 })).toBe('misses');
  });

  it('does not depend on which estimate, or which named model, is nominal', () => {
    fc.assert(
      fc.property(cases, db, fc.constantFrom('at_least' as const, 'at_most' as const), (c, limit, direction) => {
        const statuses = ([0, 1, 2, { dbi: -7 }, { dbi: 7 }] as const).map(
          (nominal) => judge(tinyStudy(c, nominal), limit, direction).status,
        );
        expect(new Set(statuses).size).toBe(1);
      }),
      settings,
    );
  });

  it('never improves when a tolerance is widened: meets and misses only ever become undecided', () => {
    const widening = fc.double({ min: 1, max: 4, noNaN: true });
    const twoSided = fc.tuple(fc.double({ min: -2, max: 0, noNaN: true }), fc.double({ min: 0, max: 2, noNaN: true }));
    fc.assert(
      fc.property(
        fc.tuple(db, db, db),
        fc.array(twoSided, { minLength: 1, maxLength: 3 }),
        widening,
        db,
        (sides, tolerances, k, limit) => {
          const wider = tolerances.map(([low, high]) => [low * k, high * k] as const);
          const before = judge(tinyStudy({ sides, tolerances }), limit, 'at_least');
          const after = judge(tinyStudy({ sides, tolerances: wider }), limit, 'at_least');
          expect([before.status, 'undecided']).toContain(after.status);
          expect(after.adverse).toBeGreaterThanOrEqual((before.adverse ?? 0) - 1e-9);
        },
      ),
      settings,
    );
  });

  it('is symmetric: at least L for g decides as at most −L for −g', () => {
    fc.assert(
      fc.property(cases, db, (c, limit) => {
        const mirrored: TinyCase = {
          sides: [-c.sides[0], -c.sides[1], -c.sides[2]],
          tolerances: c.tolerances.map(([low, high]) => [-low, -high]),
        };
        const up = judge(tinyStudy(c), limit, 'at_least');
        const down = judge(tinyStudy(mirrored), -limit, 'at_most');
        expect(down.margin).toBeCloseTo(up.margin ?? Number.NaN, 9);
        expect(down.adverse).toBeCloseTo(up.adverse ?? Number.NaN, 9);
        expect(down.favourable).toBeCloseTo(up.favourable ?? Number.NaN, 9);
        // A bound that is zero to the last bit may fall on either side of the limit.
        const close = [(up.margin ?? 0) - (up.adverse ?? 0), (up.margin ?? 0) + (up.favourable ?? 0)];
        if (close.every((bound) => Math.abs(bound) > 1e-9)) expect(down.status).toBe(up.status);
      }),
      settings,
    );
  });

  it('is never better than the bound of any single estimate', () => {
    fc.assert(
      fc.property(fc.tuple(db, db, db), db, (sides, limit) => {
        const { status } = judge(tinyStudy({ sides, tolerances: [] }), limit, 'at_least');
        // Gain carries 0.35 dB of engine accuracy; alone, an estimate meets where it clears the limit by that much.
        if (status === 'meets') for (const m of sides) expect(m - limit).toBeGreaterThanOrEqual(0.35 - 1e-9);
        if (status === 'misses') for (const m of sides) expect(m - limit).toBeLessThan(-0.35 + 1e-9);
      }),
      settings,
    );
  });
});
