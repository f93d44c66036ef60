/**
 * A board's study as independent tasks: one sweep each for the nominal state, the other roughness models, and both limits
 * of every tolerance under every roughness model (so that no verdict hangs on which model is called nominal). Tasks are plain data and pure, so that they can run on any thread in any order.
 */
import { createHash } from 'node:crypto';
import type { Analysis, Board, QuantityName, RoughnessModelName } from '../manifest/model.js';
import type { ValidityFlag } from '../physics/validity.js';
import { faceStates, lineLossCurves, lossFactorCurves, losslessClosure } from './curves.js';
import { obstacle } from './obstacle.js';
import type { BoardStudy, Sweep } from './results.js';
import type { RunTask, TaskResult } from './task.js';
import { tolerances } from './values.js';

export const ROUGHNESS_MODELS: readonly RoughnessModelName[] = ['hammerstad', 'groiss', 'gradient'];

const COMPUTED: readonly QuantityName[] = [
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
  'line_loss',
];

/** @param board  as it is to be studied: retuned, where its manifest asks for that (`retuneBoard`) */
export function planBoard(board: Board, analysis: Analysis): RunTask[] {
  if (obstacle(board) !== undefined) return [];
  const sweeps: RunTask[] = [
    { id: 'nominal', label: 'nominal', kind: 'model', model: analysis.roughnessModel },
    ...ROUGHNESS_MODELS.filter((model) => model !== analysis.roughnessModel).map(
      (model): RunTask => ({ id: `model-${model}`, label: `roughness by ${model}`, kind: 'model', model }),
    ),
  ];
  for (const { id, label } of tolerances(board))
    for (const model of ROUGHNESS_MODELS)
      for (const limit of ['low', 'high'] as const)
        sweeps.push({
          id: `tolerance-${id}-${limit}-${model}`,
          label: `${label} at its ${limit} limit, roughness by ${model}`,
          kind: 'tolerance',
          tolerance: id,
          limit,
          model,
        });
  return sweeps;
}

/** @param results of `planBoard`'s tasks, in its order */
export function assembleStudy(board: Board, analysis: Analysis, results: readonly TaskResult[]): BoardStudy {
  const reason = obstacle(board);
  const flags = new Map<string, ValidityFlag>();
  // Validity is said of the board as drawn; a tolerance limit just outside a range would only repeat it.
  for (const result of results.filter(({ sweep }) => !sweep.id.startsWith('tolerance-')))
    for (const flag of result.flags) if (!flags.has(flag.code)) flags.set(flag.code, flag);
  const byId = new Map(results.map((result) => [result.sweep.id, result.sweep]));
  const nominal: Sweep = byId.get('nominal') ?? { id: 'nominal', label: 'nominal', points: [] };
  const evaluated = reason === undefined;
  return {
    board,
    hash: createHash('sha256')
      .update(JSON.stringify([board, analysis]))
      .digest('hex'),
    nominal,
    models: evaluated
      ? ROUGHNESS_MODELS.map((model) => ({
          model,
          sweep: model === analysis.roughnessModel ? nominal : need(byId, `model-${model}`),
        }))
      : [],
    tolerances: evaluated
      ? tolerances(board).map(({ id, label, figure, dimension }) => {
          const at = (limit: string, model: string): Sweep => need(byId, `tolerance-${id}-${limit}-${model}`);
          return {
            id,
            label,
            figure,
            dimension,
            low: at('low', analysis.roughnessModel),
            high: at('high', analysis.roughnessModel),
            byModel: ROUGHNESS_MODELS.map((model) => ({ model, low: at('low', model), high: at('high', model) })),
          };
        })
      : [],
    lineLoss: evaluated ? lineLossCurves(board, analysis) : { x: [], curves: [] },
    lossFactor: evaluated ? lossFactorCurves(board) : { x: [], curves: [] },
    faces: evaluated ? faceStates(board) : [],
    flags: [...flags.values()],
    notEvaluated: evaluated ? [] : [{ quantities: COMPUTED, reason }],
    losslessClosure: evaluated ? losslessClosure(board) : Number.NaN,
  };
}

function need(sweeps: ReadonlyMap<string, Sweep>, id: string): Sweep {
  const sweep = sweeps.get(id);
  if (!sweep) throw new Error(`assembleStudy: no result for ${id}`);
  return sweep;
}
