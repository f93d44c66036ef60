import type { Requirement, RoughnessModelName } from '../../src/manifest/model.js';
import type { BoardStudy, PointResult, Sweep } from '../../src/study/results.js';
import { board, figure, requirement } from '../dossier/board-fixture.js';
import { pointOf } from '../dossier/study-fixture.js';

/** Studies of one point whose gain in dBi is given outright: what a verdict does is then plain to see. */
const FREQUENCY = 76.5e9;
export const tinyBoard = board('tiny', {
  band: { low: FREQUENCY, high: FREQUENCY },
  temperature: { lowC: 25, nominalC: 25, highC: 25 },
});
const template = pointOf(tinyBoard, FREQUENCY, 25);

export const sweepWith = (id: string, change: Partial<PointResult>): Sweep => ({
  id,
  label: id,
  points: [{ ...template, ...change }],
});
const gainSweep = (id: string, dbi: number): Sweep => sweepWith(id, { gain: 10 ** (dbi / 10) });

export interface TinyCase {
  /** dBi under each model, in the order of MODELS. */
  readonly models: readonly [number, number, number];
  /** Change in dB of the gain at the low and high limit of each tolerance, per model. */
  readonly tolerances: readonly (readonly [number, number])[];
}

export const MODELS: readonly RoughnessModelName[] = ['hammerstad', 'groiss', 'gradient'];

export function tinyStudy({ models, tolerances }: TinyCase, nominal = 1): BoardStudy {
  const sweeps = models.map((dbi, i) => ({ model: MODELS[i], sweep: gainSweep(MODELS[i], dbi) }));
  return {
    board: tinyBoard,
    hash: '0'.repeat(64),
    nominal: sweeps[nominal].sweep,
    models: sweeps,
    tolerances: tolerances.map(([low, high], i) => {
      const byModel = models.map((dbi, m) => ({
        model: MODELS[m],
        low: gainSweep('low', dbi + low * (m + 1)),
        high: gainSweep('high', dbi + high * (m + 1)),
      }));
      const { low: lowSweep, high: highSweep } = byModel[nominal];
      return {
        id: `t${i}`,
        label: `Tolerance ${i}`,
        figure: figure(`t${i}`, 0, 1),
        low: lowSweep,
        high: highSweep,
        byModel,
      };
    }),
    lineLoss: { x: [], curves: [] },
    lossFactor: { x: [], curves: [] },
    faces: [],
    flags: [],
    notEvaluated: [],
    losslessClosure: 1,
  };
}

export const gainRequirement = (
  direction: 'at_least' | 'at_most',
  value: number,
  extra: Partial<Requirement> = {},
): Requirement => requirement('r', { quantity: 'gain', limit: { direction, value }, ...extra });
