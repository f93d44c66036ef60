import { describe, expect, it } from 'vitest';
import { overallOf } from '../../src/verdict/board-status.js';
import type { RequirementStatus } from '../../src/verdict/decision.js';
import { judgeDeclared } from '../../src/verdict/declared.js';
import { judgeBoard, judgePack } from '../../src/verdict/index.js';
import { board, laminate, requirement, requirements } from '../dossier/board-fixture.js';
import { studyOf } from '../dossier/study-fixture.js';

const weighed = (...statuses: readonly RequirementStatus[]) =>
  statuses.map((status, i) => ({ requirementId: `r${i}`, weight: 'binding' as const, status }));

describe('board status', () => {
  it.each([
    [['meets', 'meets'], 'meets'],
    [['meets', 'open until measured'], 'open until measured'],
    [['open until measured', 'undecided'], 'undecided'],
    [['undecided', 'misses'], 'misses'],
    [['misses', 'not evaluated'], 'incomplete'],
  ] as const)('of %j is %s', (statuses, overall) => {
    expect(overallOf(weighed(...statuses)).overall).toBe(overall);
  });

  it('is not decided by targets', () => {
    const target = { requirementId: 't', weight: 'target' as const, status: 'misses' as const };
    expect(overallOf([...weighed('meets'), target]).overall).toBe('meets');
    expect(overallOf([target]).overall).toBe('incomplete');
  });

  it('names what stands in the way, missed requirements of an incomplete board too', () => {
    const { reason } = overallOf(weighed('misses', 'not evaluated', 'meets'));
    expect(reason).toBe('Of 3 binding requirements: 1 not evaluated (r1); 1 missed (r0).');
  });
});

describe('declared properties', () => {
  const flame = requirement('f', { quantity: 'declared', property: 'flammability', allowed: ['V-0', '5VA'] });

  it('meet where the declared text is allowed, and miss otherwise', () => {
    const withRating = (value: string) => {
      const material = laminate('nf-30', 3, {
        declared: [{ id: 'flammability', value, document: 'D', revision: '1' }],
      });
      const base = board('b');
      return { ...base, stackUp: { ...base.stackUp, laminate: { ...base.stackUp.laminate, material } } };
    };
    expect(judgeDeclared(flame, withRating('V-0')).status).toBe('meets');
    expect(judgeDeclared(flame, withRating('HB')).status).toBe('misses');
  });

  it('are not evaluated when nothing declares them, or no document is named', () => {
    const moisture = requirement('m', { quantity: 'declared', property: 'moisture', allowed: ['low'] });
    expect(judgeDeclared(moisture, board('b')).status).toBe('not evaluated');
    const spoken = board('b', { declared: [{ id: 'moisture', value: 'low' }] });
    expect(judgeDeclared(moisture, spoken)).toMatchObject({ status: 'not evaluated' });
  });

  it('compare numbers with a limit, the least favourable declaration deciding', () => {
    const lead = requirement('l', {
      quantity: 'declared',
      property: 'peel_strength',
      limit: { direction: 'at_least', value: 0.7 },
    });
    const weak = board('b', {
      declared: [{ id: 'peel_strength', value: 0.6, unit: 'N/mm', document: 'D' }],
    });
    expect(judgeDeclared(lead, board('b'))).toMatchObject({ status: 'meets', value: 0.8, part: 'foil smooth' });
    expect(judgeDeclared(lead, weak)).toMatchObject({ status: 'misses', value: 0.6, part: 'board' });
  });
});

describe('judging a pack', () => {
  const set = { id: 's', title: 'S', file: 's.yaml', invented: true, requirements };
  const studies = [studyOf(board('qb-1')), studyOf(board('qb-2', { rq: 1.6e-6 }))];
  const [smooth, rough] = judgePack(studies, set);

  it('keeps the order of boards and requirements', () => {
    expect([smooth.boardId, rough.boardId]).toEqual(['qb-1', 'qb-2']);
    expect(smooth.requirements.map((r) => r.requirementId)).toEqual(requirements.map((r) => r.id));
  });

  it('leaves a rougher board more doubtful in gain than a smooth one, and never surer', () => {
    const gain = (v: typeof smooth) => v.requirements.find((r) => r.requirementId === 'r-gain');
    expect(gain(rough)?.adverse).toBeGreaterThan(gain(smooth)?.adverse ?? Number.NaN);
    expect(gain(smooth)?.status).toBe('meets');
    expect(gain(rough)?.status).toBe('undecided');
  });

  it('is the same whichever estimate is nominal', () => {
    const status = (nominal: 'low' | 'middle' | 'high') =>
      judgeBoard(studyOf(board('qb-2', { rq: 1.6e-6 }), nominal), set).requirements.map((r) => r.status);
    expect(status('low')).toEqual(status('middle'));
    expect(status('high')).toEqual(status('middle'));
  });

  it('is incomplete when a binding quantity cannot be evaluated', () => {
    const covered = {
      ...studies[0],
      notEvaluated: [{ quantities: ['reflection' as const], reason: 'a cover layer is not in the models' }],
    };
    const verdict = judgeBoard(covered, set);
    expect(verdict.overall).toBe('incomplete');
    expect(verdict.requirements.find((r) => r.requirementId === 'r-match')).toMatchObject({
      status: 'not evaluated',
      reason: 'a cover layer is not in the models',
    });
  });
});
