/** One unit of a study's work: plain data in, plain data out, no state. */
import type { Analysis, Board } from '../manifest/model.js';
import type { RoughnessModel } from '../physics/roughness/index.js';
import { runSweep, type SweepResult } from './sweep.js';
import { nominalValues, tolerances } from './values.js';

export type RunTask = { readonly id: string; readonly label: string } & (
  | { readonly kind: 'model'; readonly model: RoughnessModel }
  | {
      readonly kind: 'tolerance';
      readonly tolerance: string;
      readonly limit: 'low' | 'high';
      readonly model: RoughnessModel;
    }
);

export type TaskResult = SweepResult;

export function runTask(board: Board, analysis: Analysis, task: RunTask): TaskResult {
  if (task.kind === 'model') return runSweep(board, analysis, task.id, task.label, nominalValues(board), task.model);
  const tolerance = tolerances(board).find((t) => t.id === task.tolerance);
  if (!tolerance) throw new Error(`runTask: no tolerance ${task.tolerance} on board ${board.id}`);
  return runSweep(board, analysis, task.id, task.label, tolerance[task.limit], task.model);
}
