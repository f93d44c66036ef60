import type { Analysis, Board } from '../manifest/model.js';
import { type RunTask, runTask, type TaskResult } from '../study/index.js';
import { inThisThread, threadPool, type Workers } from './workers.js';

/** A task of a board's study with all it needs, so that any thread can carry it out. */
export interface StudyJob {
  readonly board: Board;
  readonly analysis: Analysis;
  readonly task: RunTask;
}

export function carryOut(job: unknown): TaskResult {
  const { board, analysis, task } = job as StudyJob;
  return runTask(board, analysis, task);
}

/** All cores when running compiled. From TypeScript source (tests, development) Node cannot start a thread by itself. */
export function studyWorkers(): Workers {
  return import.meta.url.endsWith('.js')
    ? threadPool(new URL('./task-worker.js', import.meta.url))
    : inThisThread(carryOut);
}
