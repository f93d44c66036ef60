import { describe, expect, it } from 'vitest';
import { judgeRequirement } from '../../src/verdict/judge.js';
import { requirement } from '../dossier/board-fixture.js';
import { gainRequirement, sweepWith, tinyStudy } from './tiny-study.js';

describe('uncertainty', () => {
  // 14.0, 13.6 (nominal) and 12.9 dBi; one tolerance ∓0.1 dB times 1, 2, 3 by estimate; network only, 1.5 × 0.35 dB.
  const study = tinyStudy({ sides: [14, 13.6, 12.9], tolerances: [[-0.1, 0.05]] });
  const verdict = judgeRequirement(study, gainRequirement('at_least', 12));

  it('adds the spread over the estimates linearly to the root sum of squares of the rest', () => {
    expect(verdict.margin).toBeCloseTo(1.6, 9);
    expect(verdict.adverse).toBeCloseTo(0.7 + Math.hypot(0.525, 0.3), 9);
    expect(verdict.favourable).toBeCloseTo(0.4 + Math.hypot(0.525, 0.15), 9);
  });

  it('spans the estimates alone: a named model outside them moves the nominal value and no bound', () => {
    const limit = gainRequirement('at_least', 12);
    const bounds = (v: typeof verdict) => [v.margin! - v.adverse!, v.margin! + v.favourable!];
    for (const dbi of [11, 12.9, 13.6, 15]) {
      const named = judgeRequirement(
        tinyStudy({ sides: [14, 13.6, 12.9], tolerances: [[-0.1, 0.05]] }, { dbi }),
        limit,
      );
      expect(named.value).toBeCloseTo(dbi, 9);
      expect(named.status).toBe(verdict.status);
      bounds(named).forEach((bound, i) => {
        expect(bound).toBeCloseTo(bounds(verdict)[i]!, 9);
      });
      const roughness = named.parts.find((p) => p.kind === 'roughness')!;
      const rest = named.parts.filter((p) => p.kind !== 'roughness').map((p) => p.adverse);
      expect(roughness.adverse + Math.hypot(...rest)).toBeCloseTo(named.adverse!, 9);
      expect(roughness.detail.includes('outside the band')).toBe(dbi < 12.9 || dbi > 14);
    }
  });

  it('says what is known of the faces behind the band', () => {
    const face = { face: 'ground (treated)', known: 'Rq and correlation length' } as (typeof study.faces)[number];
    const told = judgeRequirement({ ...study, faces: [face] }, gainRequirement('at_least', 12));
    expect(told.parts.find((p) => p.kind === 'roughness')?.detail).toContain('ground: Rq and correlation length');
  });

  it('prints every part, and the parts add up to the whole', () => {
    expect(verdict.parts.map((p) => p.kind)).toEqual(['engine', 'roughness', 'tolerance']);
    const linear = verdict.parts.filter((p) => p.kind === 'roughness').reduce((sum, p) => sum + p.adverse, 0);
    const squares = verdict.parts.filter((p) => p.kind !== 'roughness').map((p) => p.adverse);
    expect(linear + Math.hypot(...squares)).toBeCloseTo(verdict.adverse ?? Number.NaN, 9);
  });

  it('takes the largest effect of a tolerance over the estimates and shows the nominal limits', () => {
    const part = verdict.parts.find((p) => p.kind === 'tolerance');
    expect(part?.adverse).toBeCloseTo(0.3, 9);
    expect(part?.atLimits?.low).toBeCloseTo(13.4, 9);
    expect(part?.atLimits?.high).toBeCloseTo(13.7, 9);
  });

  it('does not count a tolerance that helps at both limits against the board', () => {
    const helped = judgeRequirement(
      tinyStudy({ sides: [13, 13, 13], tolerances: [[0.2, 0.4]] }),
      gainRequirement('at_least', 12),
    );
    const part = helped.parts.find((p) => p.kind === 'tolerance');
    expect(part?.adverse).toBe(0);
    expect(part?.favourable).toBeCloseTo(1.2, 9);
  });

  it('is not evaluated when an estimate yields no number, and says under which', () => {
    const broken = {
      ...study,
      sides: study.sides.map((s) => (s.side === 'high' ? { ...s, sweep: sweepWith('x', { gain: Number.NaN }) } : s)),
    };
    const found = judgeRequirement(broken, gainRequirement('at_least', 12));
    expect(found.status).toBe('not evaluated');
    expect(found.reason).toContain('high estimate');
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
