/**
 * Allowance: the worst value of one item, moved alone, at which every binding requirement still meets.
 *
 * It is searched under every estimate of the roughness band, never under a named model: one with a ceiling finds no limit where
 * copper has one.
 *
 * It asks how far the tolerance of the item may reach. So the moved item takes the place of its own tolerance in the rule
 * of the verdict: its effect and what stays uncertain combine by root sum of squares, against the margin at nominal.
 * Where a board meets, no allowance is therefore tighter than the declared spread; where one item spoils the verdict,
 * its allowance says what it would have to hold.
 *
 * A search asks for a sweep, judges it and chooses the next value from the answer, so it needs both the study below and
 * the reading of requirements here; the study may not import verdicts. The whole search of one item in one direction is
 * therefore one task of this layer, plain data in and out, for the same worker threads that carry out the study.
 */
import type { Analysis, Board, Figure, Requirement, RoughnessModelName } from '../manifest/model.js';
import type { HeldParameter } from '../manifest/procurement-model.js';
import { bracketedRoot } from '../numerics/brent.js';
import { conductivityAt } from '../physics/material/index.js';
import { saturationRq } from '../physics/roughness/index.js';
import {
  type BoardValues,
  type Correction,
  movables,
  ROUGHNESS_SIDES,
  type RoughnessSide,
  runSweep,
} from '../study/index.js';
import { limitOf, marginOf } from './quantities.js';
import { worstValue } from './worst.js';

/** A requirement with what has to stay free of its margin: engine accuracy and the other tolerances, root sum of squares. */
export interface Guarded {
  readonly requirement: Requirement;
  /** In the unit of the quantity, ≥ 0. */
  readonly guard: number;
}

export interface AllowanceTask {
  /** Path of the figure that is moved; it moves everywhere the board uses it. */
  readonly path: string;
  readonly parameter: HeldParameter;
  readonly direction: 'down' | 'up';
  /** Far end of the search. */
  readonly end: number;
  readonly requirements: readonly Guarded[];
}

export type AllowanceOutcome =
  /** `permitted` still meets; `beyond`, within the tolerance of the search, no longer does. */
  | { readonly kind: 'limited'; readonly permitted: number; readonly beyond: number; readonly requirementId: string }
  | { readonly kind: 'not limited'; readonly searchedTo: number }
  | { readonly kind: 'not met at nominal'; readonly requirementIds: readonly string[] };

export interface AllowanceResult {
  readonly path: string;
  readonly parameter: HeldParameter;
  readonly direction: AllowanceTask['direction'];
  readonly nominal: number;
  readonly sides: readonly { readonly side: RoughnessSide; readonly outcome: AllowanceOutcome }[];
  /** The model that the analysis names has reached its ceiling within the search of a texture: no limit can come from it. */
  readonly ceiling?: ModelCeiling;
  /** Sweeps run, for the cost of a build. */
  readonly sweeps: number;
}

export interface ModelCeiling {
  readonly model: RoughnessModelName;
  /** Rq from which it tells no foils apart, m. */
  readonly from: number;
}

/** A root is found to this share of its distance from nominal. */
const RESOLUTION = 0.02;
/** The first step is the declared spread, but not less than this share of the way to the end. */
const SHORTEST_STEP = 1 / 16;
/** Band edges and centre: `frequencies` puts a step of any larger width onto these three. */
const COARSE_STEP = 1e12;

/** Margin of each requirement, in the order of the task; −∞ where there is no value, for then nothing can be said to meet. */
type Margins = readonly number[];
type BySide = Readonly<Record<RoughnessSide, Margins>>;

interface Standing {
  /** Smallest reserve over the requirements, in shares of its guard: 0 or more where all meet. */
  readonly reserve: number;
  readonly failing: readonly string[];
  readonly binding: string;
}

/**
 * Searches one item in one direction under every estimate of the roughness band.
 *
 * Evaluated at both band edges and the centre, at the lowest, nominal and highest temperature. From nominal outward in
 * growing steps until a requirement stops meeting, then between the last two points; a requirement that fails and
 * recovers between two steps is not seen.
 *
 * @param correction of the board by the full wave, where there is one: every sweep is corrected as those of the verdict are
 */
export function searchAllowance(
  board: Board,
  analysis: Analysis,
  task: AllowanceTask,
  correction?: Correction,
): AllowanceResult {
  const item = movables(board).find(({ figure }) => figure.path === task.path);
  if (!item) throw new RangeError(`board ${board.id} has no figure ${task.path}`);
  const coarse = { ...analysis, frequencyStep: COARSE_STEP };
  const known = new Map<number, BySide>();
  const evaluate = (value: number): BySide => {
    const found = known.get(value) ?? margins(board, coarse, item.move(value), task.requirements, correction);
    known.set(value, found);
    return found;
  };
  const { figure } = item;
  const outcomes = outcomesOf(evaluate, known, figure, task);
  const ceiling = ceilingOf(board, analysis, task);
  return {
    path: task.path,
    parameter: task.parameter,
    direction: task.direction,
    nominal: figure.value,
    sides: ROUGHNESS_SIDES.map((side) => ({ side, outcome: outcomes[side] })),
    ...(ceiling ? { ceiling } : {}),
    sweeps: known.size * ROUGHNESS_SIDES.length,
  };
}

function margins(
  board: Board,
  analysis: Analysis,
  values: BoardValues,
  requirements: readonly Guarded[],
  correction: Correction | undefined,
): BySide {
  const of = (side: RoughnessSide): Margins => {
    const { sweep } = runSweep(board, analysis, 'allowance', 'allowance', values, side, correction);
    return requirements.map(({ requirement }) => {
      const worst = worstValue(sweep, requirement, board);
      return 'notEvaluated' in worst ? -Infinity : marginOf(limitOf(requirement), worst.value);
    });
  };
  return { low: of('low'), middle: of('middle'), high: of('high') };
}

/** How the requirements stand with the item moved, from the margins at nominal and where it is. */
export function standingOf(requirements: readonly Guarded[], nominal: Margins, moved: Margins): Standing {
  const reserves = requirements.map(({ requirement: { id }, guard }, i) => {
    const effect = Math.max(0, nominal[i] - moved[i]);
    return { id, reserve: Math.max(-1e3, (nominal[i] - Math.hypot(guard, effect)) / (guard || 1)) };
  });
  const least = reserves.reduce((a, b) => (b.reserve < a.reserve ? b : a));
  const failing = reserves.filter(({ reserve }) => reserve < 0).map(({ id }) => id);
  return { reserve: least.reserve, binding: least.id, failing };
}

function outcomesOf(
  evaluate: (value: number) => BySide,
  known: ReadonlyMap<number, BySide>,
  { value: nominal, minus, plus }: Figure,
  { direction, end, requirements }: AllowanceTask,
): Record<RoughnessSide, AllowanceOutcome> {
  const start = evaluate(nominal);
  const sign = direction === 'up' ? 1 : -1;
  const reach = Math.abs(end - nominal);
  const first = Math.max(direction === 'up' ? plus : minus, reach * SHORTEST_STEP);

  const of = (side: RoughnessSide): AllowanceOutcome => {
    const standing = (value: number): Standing => standingOf(requirements, start[side], evaluate(value)[side]);
    const at = (value: number): number => standing(value).reserve;
    if (at(nominal) < 0) return { kind: 'not met at nominal', requirementIds: standing(nominal).failing };
    for (let step = first; ; step *= 2) {
      const value = step < reach ? nominal + sign * step : end;
      if (at(value) < 0) break;
      if (value === end) return { kind: 'not limited', searchedTo: end };
    }
    // Points that other estimates asked for bracket the root as well.
    const points = [...known.keys()].sort((a, b) => sign * (a - b));
    const out = points.findIndex((value) => at(value) < 0);
    const [inside, outside] = [points[out - 1], points[out]];
    const tolerance = RESOLUTION * Math.abs(outside - nominal);
    // A reserve of nothing still meets; the root finder wants a sign.
    const signed = (value: number): number => (at(value) >= 0 ? Math.max(at(value), Number.MIN_VALUE) : at(value));
    const root = bracketedRoot(signed, [inside, signed(inside)], [outside, signed(outside)], tolerance);
    return {
      kind: 'limited',
      permitted: root.inside,
      beyond: root.outside,
      requirementId: standing(root.outside).binding,
    };
  };
  // The high estimate first: it limits textures, and its points serve the others.
  const high = of('high');
  return { high, middle: of('middle'), low: of('low') };
}

const TEXTURES: readonly HeldParameter[] = ['treated-face-texture', 'untreated-face-texture', 'outer-face-texture'];

/** Where the named model, if there is one, stops telling roughnesses apart before the search of a texture ends. */
function ceilingOf(
  board: Board,
  { roughnessModel: model }: Analysis,
  { parameter, direction, end }: AllowanceTask,
): ModelCeiling | undefined {
  if (model === 'band' || !TEXTURES.includes(parameter) || direction === 'down') return undefined;
  const { foil } = board.stackUp.strip;
  const conductivity = conductivityAt(foil.conductivity.value, board.temperature.nominalC, foil.temperatureCoefficient);
  const frequency = (board.band.low + board.band.high) / 2;
  const from = saturationRq(model, { frequency, conductivity, permittivity: 1 });
  return from === undefined || from > end ? undefined : { model, from };
}
