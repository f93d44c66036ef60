/** One unit of a study's work: plain data in, plain data out, no state. */
import type { Analysis, Board } from '../manifest/model.js';
import type { Correction } from './correction-model.js';
import { nominalValues } from './nominal-values.js';
import { runSweep, type SweepResult } from './sweep.js';
import { tolerances } from './tolerances.js';
import type { RoughnessView } from './views.js';

export type RunTask = { readonly id: string; readonly label: string; readonly view: RoughnessView } & (
  | { readonly kind: 'as drawn' }
  | { readonly kind: 'tolerance'; readonly tolerance: string; readonly limit: 'low' | 'high' }
);

export type TaskResult = SweepResult;

/** @param correction of the board by the full wave (`confirmBoard`), where there is one */
export function runTask(board: Board, analysis: Analysis, task: RunTask, correction?: Correction): TaskResult {
  const { id, label, view } = task;
  if (task.kind === 'as drawn') return runSweep(board, analysis, id, label, nominalValues(board), view, correction);
  const tolerance = tolerances(board).find((t) => t.id === task.tolerance);
  if (!tolerance) throw new Error(`runTask: no tolerance ${task.tolerance} on board ${board.id}`);
  return runSweep(board, analysis, id, label, tolerance[task.limit], view, correction);
}
