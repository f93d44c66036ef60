import type { Requirement } from '../../src/manifest/model.js';
import type { BoardStudy, PointResult, RoughnessSide, Sweep } from '../../src/study/results.js';
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
  line: [],
});
const gainSweep = (id: string, dbi: number): Sweep => sweepWith(id, { gain: 10 ** (dbi / 10) });

export interface TinyCase {
  /** dBi under each estimate, in the order of SIDES. */
  readonly sides: readonly [number, number, number];
  /** Change in dB of the gain at the low and high limit of each tolerance under the low estimate; twice and three times that under the others. */
  readonly tolerances: readonly (readonly [number, number])[];
}

export const SIDES: readonly RoughnessSide[] = ['low', 'middle', 'high'];
const NO_CURVES = { x: [], curves: [], band: { low: [], middle: [], high: [] } };

/** @param nominal which of the sides, or a gain of its own as a named model would give */
export function tinyStudy({ sides, tolerances }: TinyCase, nominal: 0 | 1 | 2 | { dbi: number } = 1): BoardStudy {
  const sweeps = sides.map((dbi, i) => ({ side: SIDES[i]!, sweep: gainSweep(SIDES[i]!, dbi) }));
  const named = typeof nominal === 'number' ? undefined : nominal.dbi;
  return {
    board: tinyBoard,
    hash: '0'.repeat(64),
    nominal: named === undefined ? sweeps[nominal as number]!.sweep : gainSweep('nominal', named),
    sides: sweeps,
    tolerances: tolerances.map(([low, high], i) => {
      const bySide = sides.map((dbi, m) => ({
        side: SIDES[m]!,
        low: gainSweep('low', dbi + low * (m + 1)),
        high: gainSweep('high', dbi + high * (m + 1)),
      }));
      const { low: lowSweep, high: highSweep } =
        named === undefined
          ? bySide[nominal as number]!
          : { low: gainSweep('low', named + low), high: gainSweep('high', named + high) };
      return {
        id: `t${i}`,
        label: `Tolerance ${i}`,
        figure: figure(`t${i}`, 0, 1),
        low: lowSweep,
        high: highSweep,
        bySide,
      };
    }),
    lineLoss: NO_CURVES,
    lossFactor: NO_CURVES,
    effectivePermittivity: NO_CURVES,
    lineLossByFace: [],
    slowWave: [],
    faces: [],
    flags: [],
    notEvaluated: [],
    losslessClosure: 1,
    confirmation: { kind: 'network only', reason: 'these studies have no columns' },
  };
}

export const gainRequirement = (
  direction: 'at_least' | 'at_most',
  value: number,
  extra: Partial<Requirement> = {},
): Requirement => requirement('r', { quantity: 'gain', limit: { direction, value }, ...extra });
