import type { Analysis, Board, Pack } from '../manifest/model.js';
import { type RunTask, retuneBoard, runTask, type TaskResult } from '../study/index.js';
import { type AllowanceResult, type AllowanceTask, searchAllowance } from '../verdict/index.js';
import { inThisThread, threadPool, type Workers } from './workers.js';

/** A task of a board's study with all it needs, so that any thread can carry it out. */
export interface StudyJob {
  readonly board: Board;
  readonly analysis: Analysis;
  readonly task: RunTask;
}

/** A board whose layout is retuned before its study. */
export interface RetuneJob {
  readonly board: Board;
  readonly analysis: Analysis;
}

/** One item of a board, moved until a requirement stops meeting. */
export interface AllowanceJob {
  readonly board: Board;
  readonly analysis: Analysis;
  readonly allowance: AllowanceTask;
}

export function carryOut(job: unknown): TaskResult | AllowanceResult | Board {
  const { board, analysis, task, allowance } = job as RetuneJob & Partial<StudyJob> & Partial<AllowanceJob>;
  if (allowance !== undefined) return searchAllowance(board, analysis, allowance);
  return task === undefined ? retuneBoard(board, analysis) : runTask(board, analysis, task);
}

/** The pack with every board as it is to be studied. */
export async function retunePack(pack: Pack, workers: Workers, onDone: () => void): Promise<Pack> {
  const { boards, analysis } = pack;
  const asked = boardsToRetune(pack);
  const jobs = asked.map((board): RetuneJob => ({ board, analysis }));
  const retuned = jobs.length === 0 ? [] : await workers.run<Board>(jobs, onDone);
  return { ...pack, boards: boards.map((board) => retuned[asked.indexOf(board)] ?? board) };
}

export const boardsToRetune = ({ boards }: Pack): Board[] => boards.filter((board) => board.retune !== undefined);

/** All cores when running compiled. From TypeScript source (tests, development) Node cannot start a thread by itself. */
export function studyWorkers(): Workers {
  return import.meta.url.endsWith('.js')
    ? threadPool(new URL('./task-worker.js', import.meta.url))
    : inThisThread(carryOut);
}
