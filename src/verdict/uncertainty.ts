import type { Requirement, RoughnessModelName } from '../manifest/model.js';
import type { BoardStudy, Sweep, ToleranceStudy } from '../study/results.js';
import { DIRECTION_ERROR, engineAccuracyOf } from './engine-accuracy.js';
import { limitOf, marginOf } from './quantities.js';
import { type WorstValue, worstValue } from './worst.js';

/** One part of the uncertainty of a worst value, in the unit of the quantity. One-sided: for and against the limit. */
export interface UncertaintyPart {
  readonly id: string;
  readonly kind: 'engine' | 'roughness' | 'tolerance';
  readonly label: string;
  /** What was done and where the figure comes from. */
  readonly detail: string;
  /** How far the margin may be smaller than the nominal one, ≥ 0. */
  readonly adverse: number;
  /** How far the margin may be larger than the nominal one, ≥ 0. */
  readonly favourable: number;
  /** Worst values with the tolerance at its lower and upper limit, nominal roughness model. */
  readonly atLimits?: { readonly low: number; readonly high: number };
}

export interface ModelWorst {
  readonly model: RoughnessModelName;
  readonly value: number;
  readonly margin: number;
}

export interface Uncertainty {
  readonly parts: readonly UncertaintyPart[];
  readonly models: readonly ModelWorst[];
  /** Smallest margin over the models less the root sum of squares of the adverse parts. */
  readonly lower: number;
  /** Largest margin over the models plus the root sum of squares of the favourable parts. */
  readonly upper: number;
}

export type UncertaintyResult = Uncertainty | { readonly notEvaluated: string };

/** Stops an evaluation that has no number; caught in `uncertaintyOf` and nowhere else. */
class Missing {
  constructor(readonly reason: string) {}
}

const rss = (values: readonly number[]): number => Math.hypot(...values);

/**
 * Uncertainty of a worst value.
 *
 * Engine accuracy and tolerances are independent and combine by root sum of squares. The spread over the roughness
 * models is added linearly, because nobody knows which model is right for this copper: it is not a random error.
 * All parts are taken over all models, so that the choice of the nominal one moves nothing but the nominal value.
 */
export function uncertaintyOf(study: BoardStudy, requirement: Requirement, nominal: WorstValue): UncertaintyResult {
  try {
    return combine(study, requirement, nominal);
  } catch (cause) {
    if (cause instanceof Missing) return { notEvaluated: cause.reason };
    throw cause;
  }
}

function combine(study: BoardStudy, requirement: Requirement, nominal: WorstValue): Uncertainty {
  const limit = limitOf(requirement);
  const margin = (value: number) => marginOf(limit, value);
  const under = (sweep: Sweep, assumption: string, shift = 0): WorstValue => {
    const worst = worstValue(sweep, requirement, study.board, shift);
    if ('notEvaluated' in worst) throw new Missing(`${assumption}: ${worst.notEvaluated}`);
    return worst;
  };
  const nominalMargin = margin(nominal.value);
  const models = study.models.map(({ model, sweep }) => {
    const worst = under(sweep, `with the ${model} roughness model`);
    return { model, sweep, worst, value: worst.value, margin: margin(worst.value) };
  });
  const all = [{ sweep: study.nominal, worst: nominal, margin: nominalMargin }, ...models];
  const lowest = all.reduce((a, b) => (b.margin < a.margin ? b : a));
  const highest = all.reduce((a, b) => (b.margin > a.margin ? b : a));
  const moved = (sweep: Sweep) =>
    [-DIRECTION_ERROR, DIRECTION_ERROR].map((shift) => margin(under(sweep, 'with the pattern moved', shift).value));
  const engine = [
    engineLevel(requirement, lowest.worst, highest.worst),
    ...(requirement.quantity === 'pattern_mask'
      ? [
          engineDirection(
            lowest.margin - Math.min(...moved(lowest.sweep)),
            Math.max(...moved(highest.sweep)) - highest.margin,
          ),
        ]
      : []),
  ];
  const tolerances = study.tolerances.map((tolerance) =>
    tolerancePart(tolerance, (sweep, assumption) => under(sweep, assumption).value, margin, nominalMargin, models),
  );
  const roughness: UncertaintyPart = {
    id: 'roughness',
    kind: 'roughness',
    label: 'Roughness model',
    detail: `worst value under each of ${models.map((m) => m.model).join(', ')}; added linearly`,
    adverse: nominalMargin - lowest.margin,
    favourable: highest.margin - nominalMargin,
  };
  const independent = [...engine, ...tolerances];
  return {
    parts: [...engine, roughness, ...tolerances],
    models: models.map(({ model, value, margin: m }) => ({ model, value, margin: m })),
    lower: lowest.margin - rss(independent.map((p) => p.adverse)),
    upper: highest.margin + rss(independent.map((p) => p.favourable)),
  };
}

/** Engine accuracy at the least favourable value over the models (adverse) and at the most favourable (favourable). */
function engineLevel(requirement: Requirement, lowest: WorstValue, highest: WorstValue): UncertaintyPart {
  const accuracy = engineAccuracyOf(requirement.quantity);
  const lowestPiece = Math.min(...(requirement.mask ?? []).map((piece) => piece.levelDb));
  const spread = (worst: WorstValue) =>
    accuracy.spread(requirement.quantity === 'pattern_mask' ? lowestPiece : worst.value, {
      reflection: Math.sqrt(Math.max(0, 1 - worst.mismatch)),
    });
  const [against, forIt] = [spread(lowest), spread(highest)];
  const rising = limitOf(requirement).direction === 'at_most';
  return {
    id: 'engine',
    kind: 'engine',
    label: 'Engine accuracy',
    detail: `${accuracy.statement} (${accuracy.source})`,
    adverse: rising ? against.up : against.down,
    favourable: rising ? forIt.down : forIt.up,
  };
}

const engineDirection = (adverse: number, favourable: number): UncertaintyPart => ({
  id: 'engine-direction',
  kind: 'engine',
  label: 'Engine accuracy, direction',
  detail: 'pattern moved by ±0.5 deg against the mask (engine accuracy of the beam direction)',
  adverse: Math.max(0, adverse),
  favourable: Math.max(0, favourable),
});

function tolerancePart(
  tolerance: ToleranceStudy,
  worstOf: (sweep: Sweep, assumption: string) => number,
  margin: (value: number) => number,
  nominalMargin: number,
  models: readonly ModelWorst[],
): UncertaintyPart {
  const effect = (low: number, high: number, still: number) => ({
    adverse: Math.max(0, still - Math.min(margin(low), margin(high))),
    favourable: Math.max(0, Math.max(margin(low), margin(high)) - still),
  });
  const ends = (low: Sweep, high: Sweep) => ({
    low: worstOf(low, `${tolerance.label} at its lower limit`),
    high: worstOf(high, `${tolerance.label} at its upper limit`),
  });
  const atLimits = ends(tolerance.low, tolerance.high);
  const effects = [effect(atLimits.low, atLimits.high, nominalMargin)];
  for (const { model, low, high } of tolerance.byModel ?? []) {
    const still = models.find((m) => m.model === model);
    const at = ends(low, high);
    if (still !== undefined) effects.push(effect(at.low, at.high, still.margin));
  }
  return {
    id: `tolerance-${tolerance.id}`,
    kind: 'tolerance',
    label: tolerance.label,
    detail:
      effects.length > 1
        ? 'moved alone to both limits under every roughness model; the largest effect counts'
        : 'moved alone to both limits',
    adverse: Math.max(...effects.map((e) => e.adverse)),
    favourable: Math.max(...effects.map((e) => e.favourable)),
    atLimits,
  };
}
