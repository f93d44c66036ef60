/**
 * A board's study as independent tasks: one sweep each for the estimates of the roughness band and for the nominal state,
 * and both limits of every tolerance under each of these (so that no verdict hangs on which is called nominal). Tasks are
 * plain data and pure, so that they can run on any thread in any order.
 */
import { createHash } from 'node:crypto';
import type { Analysis, Board, QuantityName } from '../manifest/model.js';
import { boardFlags } from './board-flags.js';
import { faceStates } from './face-states.js';
import { lineLossByFace } from './line-loss-by-face.js';
import { losslessClosure } from './lossless-closure.js';
import { effectivePermittivityCurves, lineLossCurves, lossFactorCurves } from './model-curves.js';
import { columnObstacle, lineObstacle } from './obstacle.js';
import type { BoardStudy, Confirmation, ModelCurves, Sweep, ToleranceStudy } from './results.js';
import { slowWave } from './slow-wave.js';
import type { RunTask, TaskResult } from './task.js';
import { tolerances } from './tolerances.js';
import { nominalView, ROUGHNESS_SIDES, type RoughnessView, viewText } from './views.js';

const ON_COLUMNS: readonly QuantityName[] = [
  'gain',
  'realized_gain',
  'directivity',
  'radiation_efficiency',
  'reflection',
  'active_reflection',
  'half_power_beamwidth',
  'sidelobe_level',
  'beam_direction',
  'pattern_mask',
  'isolation',
];
const ON_LINES: readonly QuantityName[] = ['line_loss'];

/** The nominal view, and the estimates that it is not. */
function viewsOf({ roughnessModel }: Analysis): readonly RoughnessView[] {
  const nominal = nominalView(roughnessModel);
  return [nominal, ...ROUGHNESS_SIDES.filter((side) => side !== nominal)];
}

const drawnId = (view: RoughnessView, nominal: RoughnessView): string =>
  view === nominal ? 'nominal' : `side-${view}`;
const limitId = (tolerance: string, limit: string, view: RoughnessView): string =>
  `tolerance-${tolerance}-${limit}-${view}`;

/** @param board  as it is to be studied: retuned, where its manifest asks for that (`retuneBoard`) */
export function planBoard(board: Board, analysis: Analysis): RunTask[] {
  if (lineObstacle(board) !== undefined) return [];
  const views = viewsOf(analysis);
  const [nominal] = views;
  const tasks: RunTask[] = views.map((view) => ({
    id: drawnId(view, nominal),
    label: view === nominal ? 'nominal' : viewText(view),
    kind: 'as drawn',
    view,
  }));
  for (const { id, label } of tolerances(board))
    for (const view of views)
      for (const limit of ['low', 'high'] as const)
        tasks.push({
          id: limitId(id, limit, view),
          label: `${label} at its ${limit} limit, ${viewText(view)}`,
          kind: 'tolerance',
          tolerance: id,
          limit,
          view,
        });
  return tasks;
}

/**
 * @param confirmation of the board (`confirmBoard`), whose correction the tasks were run with
 * @param results      of `planBoard`'s tasks, in its order
 */
export function assembleStudy(
  board: Board,
  analysis: Analysis,
  confirmation: Confirmation,
  results: readonly TaskResult[],
): BoardStudy {
  const ofColumns = columnObstacle(board);
  const ofLines = lineObstacle(board);
  const head = {
    board,
    hash: createHash('sha256')
      .update(JSON.stringify([board, analysis]))
      .digest('hex'),
    flags: boardFlags(board, results, confirmation),
    notEvaluated: [
      ...(ofLines === undefined ? [] : [{ quantities: [...ON_COLUMNS, ...ON_LINES], reason: ofLines }]),
      ...(ofLines !== undefined || ofColumns === undefined ? [] : [{ quantities: ON_COLUMNS, reason: ofColumns }]),
    ],
  };
  if (ofLines !== undefined) return { ...head, ...NOTHING, confirmation };
  const byId = new Map(results.map((result) => [result.sweep.id, result.sweep]));
  const nominal = nominalView(analysis.roughnessModel);
  return {
    ...head,
    nominal: need(byId, 'nominal'),
    sides: ROUGHNESS_SIDES.map((side) => ({ side, sweep: need(byId, drawnId(side, nominal)) })),
    tolerances: tolerances(board).map(({ id, label, figure, dimension }): ToleranceStudy => {
      const at = (limit: string, view: RoughnessView): Sweep => need(byId, limitId(id, limit, view));
      return {
        id,
        label,
        figure,
        dimension,
        low: at('low', nominal),
        high: at('high', nominal),
        bySide: ROUGHNESS_SIDES.map((side) => ({ side, low: at('low', side), high: at('high', side) })),
      };
    }),
    lineLoss: lineLossCurves(board, analysis),
    lossFactor: lossFactorCurves(board),
    effectivePermittivity: effectivePermittivityCurves(board),
    lineLossByFace: lineLossByFace(board),
    slowWave: slowWave(board),
    faces: faceStates(board),
    losslessClosure: ofColumns === undefined ? losslessClosure(board) : Number.NaN,
    confirmation,
  };
}

const NO_CURVES: ModelCurves = { x: [], curves: [], band: { low: [], middle: [], high: [] } };
const NOTHING = {
  nominal: { id: 'nominal', label: 'nominal', points: [], line: [] },
  sides: [],
  tolerances: [],
  lineLoss: NO_CURVES,
  lossFactor: NO_CURVES,
  effectivePermittivity: NO_CURVES,
  lineLossByFace: [],
  slowWave: [],
  faces: [],
  losslessClosure: Number.NaN,
} as const;

function need(sweeps: ReadonlyMap<string, Sweep>, id: string): Sweep {
  const sweep = sweeps.get(id);
  if (!sweep) throw new Error(`assembleStudy: no result for ${id}`);
  return sweep;
}
