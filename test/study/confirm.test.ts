import { describe, expect, it } from 'vitest';
import { carriedConfirmation, confirmBoard, type SolverFor } from '../../src/study/index.js';
import { figure, fixtureBoard } from './fixture-board.js';
import { standIn } from './stand-in-engine.js';

const analysis = { roughnessModel: 'band', frequencyStep: 1e9, fullWave: true } as const;
const board = fixtureBoard({ columns: 1, patches: 2 });
const reasonOf = (confirmation: ReturnType<typeof confirmBoard>): string =>
  confirmation.kind === 'network only' ? confirmation.reason : 'confirmed';
const failing =
  (error: Error): SolverFor =>
  () => {
    throw error;
  };

describe('confirmation of a board', () => {
  it('compares both engines at the band edges and the centre, with what it cost', () => {
    const solved: number[] = [];
    const found = confirmBoard(
      board,
      analysis,
      undefined,
      undefined,
      standIn({ loss: 2, onSolve: (f) => solved.push(f) }),
    );
    expect(solved).toEqual([76e9, 76.5e9, 77e9]);
    if (found.kind !== 'full wave') throw new Error(found.reason);
    expect(found.points.map(({ frequency }) => frequency)).toEqual(solved);
    for (const { fullWave, network, effort } of found.points) {
      expect(effort.unknowns).toBe(100);
      expect(fullWave.power.metal).toBeGreaterThan(1.5 * network.power.metal);
      for (const { power, powerResidual, radiationEfficiency } of [fullWave, network]) {
        const { radiated, surfaceWave, metal, dielectric, load } = power;
        expect(radiated + surfaceWave + metal + dielectric + load + powerResidual).toBeCloseTo(1, 12);
        expect(radiationEfficiency).toBeCloseTo(radiated, 8);
      }
      expect(Math.max(...fullWave.excitation.flat().map(({ re, im }) => Math.hypot(re, im)))).toBeCloseTo(1, 12);
    }
  });

  it('adds frequencies without solving the earlier ones again, in ascending order', () => {
    const first = confirmBoard(board, analysis, undefined, undefined, standIn());
    const solved: number[] = [];
    const found = confirmBoard(board, analysis, [76.5e9, 76.25e9], first, standIn({ onSolve: (f) => solved.push(f) }));
    expect(solved).toEqual([76.25e9]);
    if (found.kind !== 'full wave') throw new Error(found.reason);
    expect(found.points.map(({ frequency }) => frequency)).toEqual([76e9, 76.25e9, 76.5e9, 77e9]);
    expect(found.correction!.differences).toHaveLength(4);
  });

  it('is carried to a board of slightly other materials, which says where it was found', () => {
    const first = confirmBoard(board, analysis, undefined, undefined, standIn());
    const carried = carriedConfirmation(board, analysis, first, 'the board as drawn');
    expect(carried).toEqual({ ...first, carriedFrom: 'the board as drawn' });
    const none = { kind: 'network only', reason: 'the full wave found no solution' } as const;
    expect(carriedConfirmation(board, analysis, none, 'the board as drawn')).toBe(none);
    expect(reasonOf(carriedConfirmation(board, { ...analysis, fullWave: false }, first, ''))).toContain('switched');
  });

  it('says why a board is not confirmed', () => {
    const cover = {
      material: 'solder mask',
      permittivity: figure('c.er', 3.5),
      lossTangent: figure('c.tand', 0.02),
      thickness: figure('c.t', 25e-6),
    };
    const covered = { ...board, stackUp: { ...board.stackUp, cover } };
    expect(reasonOf(confirmBoard(board, { ...analysis, fullWave: false }, undefined, undefined, standIn()))).toBe(
      'the pack switched the full wave off',
    );
    expect(reasonOf(confirmBoard(covered, analysis, undefined, undefined, standIn()))).toContain('cover layer');
    const large = fixtureBoard({ columns: 12, patches: 20 });
    expect(reasonOf(confirmBoard(large, analysis, undefined, undefined, standIn()))).toContain('240 patches');
    expect(
      reasonOf(confirmBoard(board, analysis, undefined, undefined, failing(new RangeError('no grid for this layout')))),
    ).toContain('no grid for this layout');
  });

  it('takes no unfinished solution, and hides no fault', () => {
    const unfinished: SolverFor = (problem, band) => {
      const engine = standIn()(problem, band);
      return {
        name: 'unfinished',
        solve(conditions) {
          const solution = engine.solve(conditions);
          return { ...solution, effort: { ...solution.effort!, residual: 0.1 } };
        },
      };
    };
    expect(reasonOf(confirmBoard(board, analysis, undefined, undefined, unfinished))).toContain('76.00 GHz');
    expect(() => confirmBoard(board, analysis, undefined, undefined, failing(new TypeError('x is undefined')))).toThrow(
      TypeError,
    );
  });
});
