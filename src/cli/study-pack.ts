/** The studies of boards, spread over the workers. */
import type { Analysis, Board } from '../manifest/model.js';
import {
  assembleStudy,
  type BoardStudy,
  type Confirmation,
  correctionIn,
  firstFrequencies,
  fullWaveObstacle,
  planBoard,
  type TaskResult,
} from '../study/index.js';
import type { Progress } from './progress.js';
import type { ConfirmJob, StudyJob } from './study-job.js';
import type { Workers } from './workers.js';

export interface Room {
  readonly workers: Workers;
  readonly progress: Progress;
  /** A stage of the build begins. */
  readonly enter: (stage: string, total?: number) => void;
}

/** Further full-wave frequencies of a board, with what is known of others. */
export interface Further {
  readonly frequencies: readonly number[];
  readonly earlier: Confirmation;
}

/**
 * Whether and how far the full wave confirms each board.
 *
 * @param further  by board; without it, the first frequencies
 */
export async function confirmBoards(
  boards: readonly Board[],
  analysis: Analysis,
  { workers, progress, enter }: Room,
  further?: readonly Further[],
): Promise<Confirmation[]> {
  const obstacles = boards.map((board) => fullWaveObstacle(board, analysis));
  const able = boards.map((_, i) => i).filter((i) => obstacles[i] === undefined);
  // The largest first, so that none is left alone at the end.
  const order = [...able].sort((a, b) => patches(boards[b]) - patches(boards[a]) || a - b);
  const jobs = order.map((i): ConfirmJob => {
    const { frequencies, earlier } = further?.[i] ?? { frequencies: firstFrequencies(boards[i]) };
    return { kind: 'confirm', board: boards[i], analysis, frequencies, earlier };
  });
  if (jobs.length > 0) enter('solving the full wave', jobs.length);
  const found = jobs.length === 0 ? [] : await workers.run<Confirmation>(jobs, () => progress.step());
  return obstacles.map((reason, i) =>
    reason === undefined ? found[order.indexOf(i)] : { kind: 'network only', reason },
  );
}

const patches = ({ columns }: Board): number => columns.reduce((sum, column) => sum + column.patches.length, 0);

/**
 * @param confirmations of the boards, in their order
 * @param stage         what to call the work
 */
export async function studyBoards(
  boards: readonly Board[],
  analysis: Analysis,
  confirmations: readonly Confirmation[],
  stage: string,
  { workers, progress, enter }: Room,
): Promise<BoardStudy[]> {
  const plans = boards.map((board, i) =>
    planBoard(board, analysis).map(
      (task): StudyJob => ({ kind: 'study', board, analysis, task, correction: correctionIn(confirmations[i]) }),
    ),
  );
  const jobs = plans.flat();
  enter(stage, jobs.length);
  const results = await workers.run<TaskResult>(jobs, () => progress.step());
  const resultOf = new Map(jobs.map((job, i) => [job, results[i]]));
  return plans.map((plan, i) =>
    assembleStudy(
      boards[i],
      analysis,
      confirmations[i],
      plan.map((job) => resultOf.get(job)!),
    ),
  );
}
