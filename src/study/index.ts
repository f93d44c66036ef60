export { assembleStudy, planBoard, ROUGHNESS_MODELS } from './plan.js';
export type * from './results.js';
export { type RunTask, runTask, type TaskResult } from './task.js';
export { nominalValues, type Tolerance, tolerances } from './values.js';

import type { Analysis, Board } from '../manifest/model.js';
import { assembleStudy, planBoard } from './plan.js';
import type { BoardStudy } from './results.js';
import { runTask } from './task.js';

/** A whole study in this thread. */
export function studyBoard(board: Board, analysis: Analysis): BoardStudy {
  return assembleStudy(
    board,
    analysis,
    planBoard(board, analysis).map((task) => runTask(board, analysis, task)),
  );
}
