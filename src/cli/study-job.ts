import type { Analysis, Board, Pack } from '../manifest/model.js';
import {
  asksToBeReadied,
  type Confirmation,
  type Correction,
  confirmBoard,
  type RunTask,
  readyBoard,
  runTask,
  type SolverFor,
  type TaskResult,
} from '../study/index.js';
import { type AllowanceResult, type AllowanceTask, searchAllowance } from '../verdict/index.js';
import { inThisThread, threadPool, type Workers } from './workers.js';

/** Every job holds all it needs, so that any thread can carry it out. */
interface OnBoard {
  readonly board: Board;
  readonly analysis: Analysis;
}

/** A layout that is worked out before the board's study. */
export interface ReadyJob extends OnBoard {
  readonly kind: 'ready';
}

/** The full wave at some frequencies, beside what is known of others. */
export interface ConfirmJob extends OnBoard {
  readonly kind: 'confirm';
  readonly frequencies: readonly number[];
  readonly earlier?: Confirmation;
}

/** A task of a board's study. */
export interface StudyJob extends OnBoard {
  readonly kind: 'study';
  readonly task: RunTask;
  readonly correction?: Correction;
}

/** One item of a board, moved until a requirement stops meeting. */
export interface AllowanceJob extends OnBoard {
  readonly kind: 'allowance';
  readonly allowance: AllowanceTask;
  readonly correction?: Correction;
}

export type Job = ReadyJob | ConfirmJob | StudyJob | AllowanceJob;

/**
 * @param unknownJob a `Job`, as it comes from another thread
 * @param solver     that confirms; the full wave where left out
 */
export function carryOut(unknownJob: unknown, solver?: SolverFor): TaskResult | AllowanceResult | Confirmation | Board {
  const job = unknownJob as Job;
  const { board, analysis } = job;
  switch (job.kind) {
    case 'ready':
      return readyBoard(board, analysis);
    case 'confirm':
      return confirmBoard(board, analysis, job.frequencies, job.earlier, solver);
    case 'study':
      return runTask(board, analysis, job.task, job.correction);
    case 'allowance':
      return searchAllowance(board, analysis, job.allowance, job.correction);
  }
}

/** The pack with every board as it is to be studied. */
export async function readyPack(pack: Pack, workers: Workers, onDone: () => void): Promise<Pack> {
  const { boards, analysis } = pack;
  const asked = boardsToReady(pack);
  const jobs = asked.map((board): ReadyJob => ({ kind: 'ready', board, analysis }));
  const readied = jobs.length === 0 ? [] : await workers.run<Board>(jobs, onDone);
  return { ...pack, boards: boards.map((board) => readied[asked.indexOf(board)] ?? board) };
}

export const boardsToReady = ({ boards }: Pack): Board[] => boards.filter(asksToBeReadied);

/** All cores when running compiled. From TypeScript source (tests, development) Node cannot start a thread by itself. */
export function studyWorkers(): Workers {
  return import.meta.url.endsWith('.js')
    ? threadPool(new URL('./task-worker.js', import.meta.url))
    : inThisThread((job) => carryOut(job));
}
