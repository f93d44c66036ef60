import { expect, it } from 'vitest';
import { noProgress } from '../../src/cli/progress.js';
import { studyFurther } from '../../src/cli/study-further.js';
import { carryOut } from '../../src/cli/study-job.js';
import { confirmBoards, type Room, studyBoards } from '../../src/cli/study-pack.js';
import { inThisThread } from '../../src/cli/workers.js';
import type { BoardStudy } from '../../src/study/index.js';
import { judgeRequirement, worstValue } from '../../src/verdict/index.js';
import { requirement } from '../dossier/board-fixture.js';
import { fixtureBoard } from '../study/fixture-board.js';
import { standIn } from '../study/stand-in-engine.js';

const analysis = { roughnessModel: 'band', frequencyStep: 0.5e9, fullWave: true } as const;
const board = fixtureBoard({ columns: 1, patches: 2, band: { low: 75e9, high: 79e9 } });

/** A room whose full wave is a stand-in that notes where it is asked. */
function roomNoting(stages: string[], solved: number[]): Room {
  const solver = standIn({ permittivity: 1.01, loss: 1.3, onSolve: (f) => solved.push(f) });
  return {
    workers: inThisThread((job) => carryOut(job, solver)),
    progress: noProgress,
    enter: (stage) => void stages.push(stage),
  };
}

it('asks the full wave where a margin is smaller than its uncertainty, and judges what it then says', async () => {
  const [stages, solved]: [string[], number[]] = [[], []];
  const room = roomNoting(stages, solved);
  const confirmations = await confirmBoards([board], analysis, room);
  const first = await studyBoards([board], analysis, confirmations, 'calculating', room);
  expect(solved).toEqual([75e9, 77e9, 79e9]);

  const condition = { band: { low: 75.5e9, high: 76e9 } };
  const asked = (value: number) =>
    requirement('r', { quantity: 'gain', limit: { direction: 'at_least', value }, condition });
  const worst = worstValue(first[0]!.nominal, asked(0), board);
  if ('notEvaluated' in worst) throw new Error(worst.notEvaluated);
  const set = (value: number) => ({ id: 's', title: 's', file: 's', invented: true, requirements: [asked(value)] });

  // Far from its limit nothing more is run.
  expect(await studyFurther(first, set(worst.value - 6), analysis, room)).toBe(first);
  expect(solved).toHaveLength(3);

  const near = set(worst.value - 0.05);
  const second = await studyFurther(first, near, analysis, room);
  expect(solved.slice(3)).toEqual([worst.where.frequency]);
  expect(stages).toEqual([
    'solving the full wave',
    'calculating',
    'solving the full wave',
    'calculating boards near a limit',
  ]);
  const engines = (study: BoardStudy) =>
    judgeRequirement(study, near.requirements[0]!).parts.find(({ id }) => id === 'engines')!.adverse;
  expect(engines(second[0]!)).toBeLessThan(engines(first[0]!));
});
