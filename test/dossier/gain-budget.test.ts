import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { gainBudget } from '../../src/dossier/gain-budget.js';
import type { PointResult } from '../../src/study/results.js';
import { board } from './board-fixture.js';
import { pointOf } from './study-fixture.js';

const template = pointOf(board('qb-1'), 76.5e9, 25);

/** A point with any split of the accepted power, feed loss and mismatch; closed by construction. */
const points: fc.Arbitrary<PointResult> = fc
  .record({
    weights: fc.array(fc.double({ min: 0, max: 1, noNaN: true }), { minLength: 9, maxLength: 9 }),
    lost: fc.double({ min: 0, max: 0.9, noNaN: true }),
    directivity: fc.double({ min: 5, max: 500, noNaN: true }),
    feed: fc.double({ min: 0.3, max: 1, noNaN: true }),
    mismatch: fc.double({ min: 0.3, max: 1, noNaN: true }),
  })
  .map(({ weights, lost, directivity, feed, mismatch }) => {
    const total = weights.reduce((a, b) => a + b, 0) || 1;
    const [surfaceWave, stripUnderside, stripTop, stripEdges, ground, roughness, finish, dielectric, load] =
      weights.map((w) => (w / total) * lost);
    const parts = { surfaceWave, stripUnderside, stripTop, stripEdges, ground, roughness, finish, dielectric, load };
    const radiated = 1 - Object.values(parts).reduce((a, b) => a + b, 0);
    const gain = directivity * radiated * feed;
    return {
      ...template,
      directivity,
      shares: { radiated, ...parts },
      feedTransmission: feed,
      mismatch,
      gain,
      realizedGain: gain * mismatch,
    };
  });

const hundredths = (x: number) => Math.round(100 * x);

describe('gain budget', () => {
  it('closes to the last printed digit, whatever the shares', () => {
    fc.assert(
      fc.property(points, (point) => {
        const budget = gainBudget(point);
        let level = hundredths(budget.directivity);
        for (const step of budget.steps) {
          level += hundredths(step.change);
          expect(level).toBe(hundredths(step.level));
          expect(Math.abs(step.change * 100 - hundredths(step.change))).toBeLessThan(1e-9);
        }
        expect(level).toBe(hundredths(budget.realizedGain));
      }),
      { seed: 7, numRuns: 300 },
    );
  });

  it('starts at the directivity and ends at the realized gain, each rounded by itself', () => {
    fc.assert(
      fc.property(points, (point) => {
        const budget = gainBudget(point);
        expect(Math.abs(budget.directivity - 10 * Math.log10(point.directivity))).toBeLessThanOrEqual(0.005 + 1e-9);
        expect(Math.abs(budget.realizedGain - 10 * Math.log10(point.realizedGain))).toBeLessThanOrEqual(0.005 + 1e-9);
      }),
      { seed: 8, numRuns: 300 },
    );
  });

  it('names every share of the study, that of loads only where columns are terminated', () => {
    const names = Object.keys(template.shares).filter((name) => name !== 'radiated');
    const named = (point: PointResult) => gainBudget(point).steps.filter((s) => s.share !== undefined);
    expect(named(template)).toHaveLength(names.length - 1);
    const { shares } = template;
    const loaded = named({ ...template, shares: { ...shares, load: 0.01, dielectric: shares.dielectric - 0.01 } });
    expect(loaded).toHaveLength(names.length);
    expect(loaded.at(-1)).toMatchObject({ label: 'Termination loads', share: 0.01 });
  });

  it('takes a finish that conducts better than copper as a gain', () => {
    const { shares } = template;
    const moved = { ...shares, finish: -0.002, dielectric: shares.dielectric + shares.finish + 0.002 };
    const step = gainBudget({ ...template, shares: moved }).steps.find((s) => s.label === 'Plated finish');
    expect(step?.change).toBeGreaterThan(0);
  });

  it('refuses a point whose parts do not make its realized gain', () => {
    expect(() => gainBudget({ ...template, realizedGain: template.realizedGain * 0.99 })).toThrow('does not close');
  });
});
