export { nominalValues } from './nominal-values.js';
export { assembleStudy, planBoard } from './plan.js';
export type * from './results.js';
export { RETUNE_LIMITS, retuneBoard } from './retune.js';
export { runSweep } from './sweep.js';
export { type RunTask, runTask, type TaskResult } from './task.js';
export { movables, type Tolerance, tolerances } from './tolerances.js';
export type { BoardValues, FaceTexture } from './values.js';
export { nominalView, ROUGHNESS_SIDES, type RoughnessView, viewText } from './views.js';

import type { Analysis, Board } from '../manifest/model.js';
import { assembleStudy, planBoard } from './plan.js';
import type { BoardStudy } from './results.js';
import { retuneBoard } from './retune.js';
import { runTask } from './task.js';

/** A whole study in this thread; a board that asks for it is retuned first. */
export function studyBoard(asWritten: Board, analysis: Analysis): BoardStudy {
  const board = retuneBoard(asWritten, analysis);
  return assembleStudy(
    board,
    analysis,
    planBoard(board, analysis).map((task) => runTask(board, analysis, task)),
  );
}
