import { describe, expect, it } from 'vitest';
import { judgeRequirement } from '../../src/verdict/judge.js';
import { requirement } from '../dossier/board-fixture.js';
import { gainRequirement, sweepWith, tinyStudy } from './tiny-study.js';

describe('uncertainty', () => {
  // 14.0, 13.6 (nominal) and 12.9 dBi; one tolerance ∓0.3 dB times 1, 2, 3 by model; 0.35 dB engine.
  const study = tinyStudy({ models: [14, 13.6, 12.9], tolerances: [[-0.1, 0.05]] });
  const verdict = judgeRequirement(study, gainRequirement('at_least', 12));

  it('adds the spread over the models linearly to the root sum of squares of the rest', () => {
    expect(verdict.margin).toBeCloseTo(1.6, 9);
    expect(verdict.adverse).toBeCloseTo(0.7 + Math.hypot(0.35, 0.3), 9);
    expect(verdict.favourable).toBeCloseTo(0.4 + Math.hypot(0.35, 0.15), 9);
  });

  it('prints every part, and the parts add up to the whole', () => {
    expect(verdict.parts.map((p) => p.kind)).toEqual(['engine', 'roughness', 'tolerance']);
    const linear = verdict.parts.filter((p) => p.kind === 'roughness').reduce((sum, p) => sum + p.adverse, 0);
    const squares = verdict.parts.filter((p) => p.kind !== 'roughness').map((p) => p.adverse);
    expect(linear + Math.hypot(...squares)).toBeCloseTo(verdict.adverse ?? Number.NaN, 9);
  });

  it('takes the largest effect of a tolerance over the models and shows the nominal limits', () => {
    const part = verdict.parts.find((p) => p.kind === 'tolerance');
    expect(part?.adverse).toBeCloseTo(0.3, 9);
    expect(part?.atLimits?.low).toBeCloseTo(13.4, 9);
    expect(part?.atLimits?.high).toBeCloseTo(13.7, 9);
  });

  it('does not count a tolerance that helps at both limits against the board', () => {
    const helped = judgeRequirement(
      tinyStudy({ models: [13, 13, 13], tolerances: [[0.2, 0.4]] }),
      gainRequirement('at_least', 12),
    );
    const part = helped.parts.find((p) => p.kind === 'tolerance');
    expect(part?.adverse).toBe(0);
    expect(part?.favourable).toBeCloseTo(1.2, 9);
  });

  it('is not evaluated when a roughness model yields no number, and says under which', () => {
    const broken = {
      ...study,
      models: study.models.map((m) =>
        m.model === 'gradient' ? { ...m, sweep: sweepWith('x', { gain: Number.NaN }) } : m,
      ),
    };
    const found = judgeRequirement(broken, gainRequirement('at_least', 12));
    expect(found.status).toBe('not evaluated');
    expect(found.reason).toContain('gradient');
    expect(found.value).toBeCloseTo(13.6, 9);
  });

  it('keeps what a test decides open, with the calculation beside it', () => {
    const open = judgeRequirement(study, gainRequirement('at_least', 12, { verification: 'test' }));
    expect(open).toMatchObject({ status: 'open until measured', calculated: 'meets' });
    expect(open.margin).toBeCloseTo(1.6, 9);
    const missed = judgeRequirement(study, gainRequirement('at_least', 20, { verification: 'test' }));
    expect(missed).toMatchObject({ status: 'open until measured', calculated: 'misses' });
  });

  it('reports what the program cannot evaluate with the reason of the study', () => {
    const covered = { ...study, notEvaluated: [{ quantities: ['gain' as const], reason: 'a cover layer is present' }] };
    expect(judgeRequirement(covered, gainRequirement('at_least', 12))).toMatchObject({
      status: 'not evaluated',
      reason: 'a cover layer is present',
    });
  });

  it('moves the pattern against a mask by the accuracy of the direction', () => {
    const mask = requirement('m', {
      quantity: 'pattern_mask',
      cut: 'elevation',
      mask: [{ from: (10 * Math.PI) / 180, to: (14 * Math.PI) / 180, levelDb: -6 }],
    });
    const parts = judgeRequirement(study, mask).parts;
    // On the flank of the main lobe half a degree is worth several tenths of a dB.
    expect(parts.find((p) => p.id === 'engine-direction')?.adverse).toBeGreaterThan(0.1);
  });
});
