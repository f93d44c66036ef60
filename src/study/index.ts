export { unexplainedShare } from './carried.js';
export {
  carriedConfirmation,
  confirmBoard,
  firstFrequencies,
  fullWaveObstacle,
  MOST_PATCHES,
  type SolverFor,
} from './confirm.js';
export { correctionIn } from './correction.js';
export type { Correction, EngineDifference } from './correction-model.js';
export { nominalValues } from './nominal-values.js';
export { assembleStudy, planBoard } from './plan.js';
export { asksToBeReadied, readyBoard } from './ready-board.js';
export type * from './results.js';
export { RETUNE_LIMITS, retuneBoard } from './retune.js';
export { runSweep } from './sweep.js';
export { type RunTask, runTask, type TaskResult } from './task.js';
export { movables, type Tolerance, tolerances } from './tolerances.js';
export type { BoardValues, FaceTexture } from './values.js';
export { nominalView, ROUGHNESS_SIDES, type RoughnessView, viewText } from './views.js';

import type { Analysis, Board } from '../manifest/model.js';
import { confirmBoard } from './confirm.js';
import { correctionIn } from './correction.js';
import { assembleStudy, planBoard } from './plan.js';
import { readyBoard } from './ready-board.js';
import type { BoardStudy } from './results.js';
import { runTask } from './task.js';

/** A whole study in this thread; a board that asks for it is sized or retuned first. */
export function studyBoard(asWritten: Board, analysis: Analysis): BoardStudy {
  const board = readyBoard(asWritten, analysis);
  const confirmation = confirmBoard(board, analysis);
  const correction = correctionIn(confirmation);
  const results = planBoard(board, analysis).map((task) => runTask(board, analysis, task, correction));
  return assembleStudy(board, analysis, confirmation, results);
}
