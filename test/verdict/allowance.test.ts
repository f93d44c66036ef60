import { describe, expect, it } from 'vitest';
import type { Analysis, Requirement } from '../../src/manifest/model.js';
import { movables, type RoughnessView, runSweep, studyBoard } from '../../src/study/index.js';
import { type AllowanceTask, searchAllowance, standingOf } from '../../src/verdict/allowance.js';
import { judgeBoard, marginOf, planAllowances, worstValue } from '../../src/verdict/index.js';
import { requirement } from '../dossier/board-fixture.js';
import { fixtureBoard } from '../study/fixture-board.js';

const board = fixtureBoard({ columns: 1, patches: 2, rq: 0.4e-6 });
const analysis: Analysis = { roughnessModel: 'band', frequencyStep: 1e12 };
const SIDES = ['low', 'middle', 'high'] as const;
const item = (path: string) => movables(board).find(({ figure }) => figure.path === path)!;

/** Worst gain of the board with an item moved, under a view of its texture, by a sweep of its own. */
function worstGain(path: string, value: number, view: RoughnessView): number {
  const { sweep } = runSweep(board, analysis, 'check', 'check', item(path).move(value), view);
  const worst = worstValue(sweep, gainAtLeast(-100), board);
  if ('notEvaluated' in worst) throw new Error(worst.notEvaluated);
  return worst.value;
}
const gainAtLeast = (value: number): Requirement =>
  requirement('r-gain', { quantity: 'gain', limit: { direction: 'at_least', value }, weight: 'binding' });

const LOSS = 'laminate.loss_tangent';
const TEXTURE = 'foil.treated';
const task = (change: Partial<AllowanceTask> & Pick<AllowanceTask, 'requirements'>): AllowanceTask => ({
  path: LOSS,
  parameter: 'loss-tangent',
  direction: 'up',
  end: 0.0075,
  ...change,
});
const outcomesOf = (t: AllowanceTask) =>
  Object.fromEntries(searchAllowance(board, analysis, t).sides.map(({ side, outcome }) => [side, outcome]));

describe('allowance of one item', () => {
  it('ends where the requirement stops meeting, under each estimate by itself', () => {
    const limit = Math.min(...SIDES.map((side) => worstGain(LOSS, 0.0015, side))) - 0.3;
    const guard = 0.1;
    const outcomes = outcomesOf(task({ requirements: [{ requirement: gainAtLeast(limit), guard }] }));
    for (const model of SIDES) {
      const outcome = outcomes[model];
      if (outcome.kind !== 'limited') throw new Error(outcome.kind);
      const nominal = worstGain(LOSS, 0.0015, model) - limit;
      // The rule of the verdict: margin at nominal against the moved item and what is uncertain besides.
      const reserve = (value: number) =>
        nominal - Math.hypot(guard, worstGain(LOSS, 0.0015, model) - worstGain(LOSS, value, model));
      expect(reserve(outcome.permitted)).toBeGreaterThanOrEqual(0);
      expect(reserve(outcome.beyond)).toBeLessThan(0);
      expect(outcome.beyond - outcome.permitted).toBeLessThanOrEqual(0.021 * (outcome.beyond - 0.0015));
      expect(outcome.requirementId).toBe('r-gain');
    }
  });

  it('names the first of several requirements to fail, and does without a guard', () => {
    const now = worstGain(LOSS, 0.0015, 'middle');
    const tight = { ...gainAtLeast(now - 0.1), id: 'r-tight' };
    const outcome = outcomesOf(
      task({ requirements: [gainAtLeast(now - 0.5), tight].map((r) => ({ requirement: r, guard: 0 })) }),
    ).middle;
    expect(outcome).toMatchObject({ kind: 'limited', requirementId: 'r-tight' });
  });

  it('is none where the requirement is not met to begin with', () => {
    const outcome = outcomesOf(task({ requirements: [{ requirement: gainAtLeast(60), guard: 0.1 }] })).high;
    expect(outcome).toEqual({ kind: 'not met at nominal', requirementIds: ['r-gain'] });
    const now = worstGain(LOSS, 0.0015, 'high');
    // Met by the figure alone, but not with what is uncertain.
    expect(outcomesOf(task({ requirements: [{ requirement: gainAtLeast(now - 0.1), guard: 5 }] })).high.kind).toBe(
      'not met at nominal',
    );
  });

  it('is not limited where nothing binds up to the end', () => {
    const easy = [{ requirement: gainAtLeast(-60), guard: 0.1 }];
    expect(outcomesOf(task({ requirements: easy })).middle).toEqual({ kind: 'not limited', searchedTo: 0.0075 });
    expect(outcomesOf(task({ requirements: easy, direction: 'down', end: 0 })).middle).toEqual({
      kind: 'not limited',
      searchedTo: 0,
    });
  });

  it('limits a texture by its high estimate first, and never by a named model with a ceiling', () => {
    const texture = { path: TEXTURE, parameter: 'treated-face-texture', end: 2.5e-6 } as const;
    const at = (rq: number, view: RoughnessView) => worstGain(TEXTURE, rq, view);
    // Half way between what Groiss can lose at most and what the high estimate loses there.
    const limit = (at(2.5e-6, 'groiss') + at(2.5e-6, 'high')) / 2;
    expect(at(2.5e-6, 'high')).toBeLessThan(at(2.5e-6, 'groiss') - 0.2);
    const t = task({ ...texture, requirements: [{ requirement: gainAtLeast(limit), guard: 0 }] });
    const outcomes = outcomesOf(t);
    expect(outcomes.high!.kind).toBe('limited');
    expect(outcomes.low!.kind).toBe('not limited');
    const named = searchAllowance(board, { ...analysis, roughnessModel: 'groiss' }, t);
    expect(Object.fromEntries(named.sides.map(({ side, outcome }) => [side, outcome]))).toEqual(outcomes);
    // Groiss is within 5 % of its ceiling of 2 from exp(−(δ/2Rq)^1.6) = 0.9 on: Rq of 2.04 skin depths, 0.241 µm here.
    expect(named.ceiling).toMatchObject({ model: 'groiss' });
    expect(named.ceiling!.from / 0.2413e-6).toBeCloseTo(2.04, 2);
    expect(searchAllowance(board, analysis, t).ceiling).toBeUndefined();
  });

  it('refuses a figure that the board does not have', () => {
    expect(() => searchAllowance(board, analysis, task({ path: 'nothing', requirements: [] }))).toThrow(
      'no figure nothing',
    );
  });
});

describe('the rule of an allowance', () => {
  const guarded = (guard: number) => [{ requirement: gainAtLeast(0), guard }];

  it('is that of the verdict: root sum of squares of the move and the rest', () => {
    // 3, 4, 5: a move of 4 beside a guard of 3 uses up a margin of 5.
    expect(standingOf(guarded(3), [5], [1]).reserve).toBeCloseTo(0, 12);
    expect(standingOf(guarded(3), [5], [0.9]).failing).toEqual(['r-gain']);
    expect(standingOf(guarded(3), [5], [1.1]).failing).toEqual([]);
  });

  it('takes a favourable move for none', () => {
    expect(standingOf(guarded(3), [5], [9])).toEqual(standingOf(guarded(3), [5], [5]));
  });

  it('lets nothing meet that has no value', () => {
    expect(standingOf(guarded(3), [5], [-Infinity]).failing).toEqual(['r-gain']);
  });
});

describe('the searches of a board', () => {
  const study = studyBoard(board, analysis);
  const now = worstGain(LOSS, 0.0015, 'middle');
  const set = (limit: number) => ({
    id: 's',
    title: 's',
    file: 's.yaml',
    invented: true,
    requirements: [
      gainAtLeast(limit),
      requirement('r-target', { quantity: 'gain', limit: { direction: 'at_least', value: 99 }, weight: 'target' }),
    ],
  });
  const asked = (parameter: 'loss-tangent' | 'etched-width' | 'copper-thickness', path: string) => ({
    id: `A-${parameter}`,
    group: 'A',
    parameter,
    dimension: 'number' as const,
    upperOnly: false,
    nominal: 0,
    lower: 0,
    upper: 0,
    figures: [
      { board: board.id, path },
      { board: 'another', path },
    ],
  });

  it('go both ways for each item asked, against the binding computed requirements', () => {
    const requirements = set(now - 3);
    const tasks = planAllowances(study, judgeBoard(study, requirements), requirements, [
      asked('loss-tangent', LOSS),
      asked('etched-width', 'board.etch'),
      asked('copper-thickness', 'board.ground'),
    ]);
    expect(tasks.map(({ path, direction, end }) => [path, direction, Number(end.toPrecision(9))])).toEqual([
      [LOSS, 'down', 0],
      [LOSS, 'up', 0.0075],
      ['board.etch', 'down', -40e-6],
      ['board.etch', 'up', 40e-6],
    ]);
    for (const { requirements: guarded } of tasks) expect(guarded.map((g) => g.requirement.id)).toEqual(['r-gain']);
  });

  it('guard with all parts of the uncertainty but the item itself and the band', () => {
    const requirements = set(now - 3);
    const verdict = judgeBoard(study, requirements);
    const [{ requirements: guarded }] = planAllowances(study, verdict, requirements, [asked('loss-tangent', LOSS)]);
    const own = study.tolerances.find(({ figure }) => figure.path === LOSS)!;
    const { parts } = verdict.requirements[0];
    const rest = parts.filter(({ kind, id }) => kind !== 'roughness' && id !== `tolerance-${own.id}`);
    expect(parts.length - rest.length).toBe(2);
    expect(guarded[0].guard).toBeCloseTo(Math.hypot(...rest.map(({ adverse }) => adverse)), 12);
  });

  it('reach at least to the declared spread where the board meets: the allowance never contradicts the verdict', () => {
    const verdictAt = (limit: number) => judgeBoard(study, set(limit));
    // Just met: the tightest case there is.
    const { margin = 0, adverse = 0 } = verdictAt(now - 3).requirements[0];
    const limit = now - 3 + (margin - adverse) - 0.01;
    const verdict = verdictAt(limit);
    expect(verdict.requirements[0].status).toBe('meets');
    for (const t of planAllowances(study, verdict, set(limit), [
      asked('loss-tangent', LOSS),
      asked('etched-width', 'board.etch'),
    ])) {
      const { figure } = item(t.path);
      const stated = t.direction === 'up' ? figure.value + figure.plus : figure.value - figure.minus;
      const sign = t.direction === 'up' ? 1 : -1;
      for (const { side, outcome } of searchAllowance(board, analysis, t).sides) {
        if (outcome.kind === 'limited')
          expect(sign * (outcome.permitted - stated), `${t.path} ${side}`).toBeGreaterThan(-1e-3 * Math.abs(stated));
        else expect(outcome.kind).toBe('not limited');
      }
    }
    expect(marginOf({ direction: 'at_least', value: limit }, now)).toBeGreaterThan(0);
  });

  it('are none for a board that was not evaluated', () => {
    const empty = { ...study, nominal: { ...study.nominal, points: [], line: [] } };
    expect(planAllowances(empty, judgeBoard(study, set(now)), set(now), [asked('loss-tangent', LOSS)])).toEqual([]);
  });
});
