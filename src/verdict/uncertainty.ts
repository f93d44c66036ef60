import type { Requirement } from '../manifest/model.js';
import type { BoardStudy, FaceState, RoughnessSide, Sweep, ToleranceStudy } from '../study/results.js';
import { carriedOver, directionPart, engineLevel } from './engine-parts.js';
import { limitOf, marginOf } from './quantities.js';
import type { UncertaintyPart } from './uncertainty-part.js';
import { type WorstValue, worstValue } from './worst.js';

/** Worst value under one estimate of the roughness band. */
export interface SideWorst {
  readonly side: RoughnessSide;
  readonly value: number;
  readonly margin: number;
}

export interface Uncertainty {
  readonly parts: readonly UncertaintyPart[];
  readonly sides: readonly SideWorst[];
  /** Smallest margin over the estimates less the root sum of squares of the adverse parts. */
  readonly lower: number;
  /** Largest margin over the estimates plus the root sum of squares of the favourable parts. */
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
 * Engine accuracy and tolerances are independent and combine by root sum of squares. The spread from the low to the high
 * estimate of the roughness band is added linearly, because it is what nobody knows of this copper: it is not a random error.
 * All parts are taken over the estimates, so that the choice of what is nominal moves nothing but the nominal value.
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
  const sides = study.sides.map(({ side, sweep }) => {
    const worst = under(sweep, `under the ${side} estimate of the texture`);
    return { side, sweep, worst, value: worst.value, margin: margin(worst.value) };
  });
  // A study without its band has its nominal state alone.
  const all = sides.length > 0 ? sides : [{ sweep: study.nominal, worst: nominal, margin: nominalMargin }];
  const lowest = all.reduce((a, b) => (b.margin < a.margin ? b : a));
  const highest = all.reduce((a, b) => (b.margin > a.margin ? b : a));
  const engine = [
    engineLevel(study, requirement, lowest.worst, highest.worst),
    ...carriedOver(study, requirement, lowest.worst, highest.worst),
    ...(requirement.quantity === 'pattern_mask'
      ? [
          directionPart(study, requirement, [lowest.worst, highest.worst], (shift) => {
            const moved = (sweep: Sweep) =>
              [-shift, shift].map((by) => margin(under(sweep, 'with the pattern moved', by).value));
            return {
              adverse: lowest.margin - Math.min(...moved(lowest.sweep)),
              favourable: Math.max(...moved(highest.sweep)) - highest.margin,
            };
          }),
        ]
      : []),
  ];
  const tolerances = study.tolerances.map((tolerance) =>
    tolerancePart(tolerance, (sweep, assumption) => under(sweep, assumption).value, margin, nominalMargin, sides),
  );
  // Signed: a named model may put the nominal margin outside the band, and the whole must still be the sum of its parts.
  const roughness: UncertaintyPart = {
    id: 'roughness',
    kind: 'roughness',
    label: 'Roughness, low to high estimate',
    detail: roughnessDetail(study.faces, lowest.margin > nominalMargin || highest.margin < nominalMargin),
    adverse: nominalMargin - lowest.margin,
    favourable: highest.margin - nominalMargin,
  };
  const independent = [...engine, ...tolerances];
  return {
    parts: [...engine, roughness, ...tolerances],
    sides: sides.map(({ side, value, margin: m }) => ({ side, value, margin: m })),
    lower: lowest.margin - rss(independent.map((p) => p.adverse)),
    upper: highest.margin + rss(independent.map((p) => p.favourable)),
  };
}

/** `worst value under …, from what is known of the faces (strip underside: Rq only); added linearly`. */
function roughnessDetail(faces: readonly FaceState[], outside: boolean): string {
  const known = new Map<string, string[]>();
  for (const { face, known: what } of faces) known.set(what, [...(known.get(what) ?? []), face.replace(/ \(.*$/, '')]);
  const words = [...known].map(([what, of]) => `${of.join(', ')}: ${what}`).join('; ');
  return [
    'worst value under the low, middle and high estimate',
    ...(words === '' ? [] : [` for what is known of the copper (${words})`]),
    '; added linearly',
    ...(outside ? ['. The named model puts the nominal value outside the band, which decides'] : []),
  ].join('');
}

function tolerancePart(
  tolerance: ToleranceStudy,
  worstOf: (sweep: Sweep, assumption: string) => number,
  margin: (value: number) => number,
  nominalMargin: number,
  sides: readonly SideWorst[],
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
  const bySide = tolerance.bySide ?? [];
  const effects = bySide.flatMap(({ side, low, high }) => {
    const still = sides.find((s) => s.side === side);
    const at = ends(low, high);
    return still === undefined ? [] : [effect(at.low, at.high, still.margin)];
  });
  if (effects.length === 0) effects.push(effect(atLimits.low, atLimits.high, nominalMargin));
  return {
    id: `tolerance-${tolerance.id}`,
    kind: 'tolerance',
    label: tolerance.label,
    detail:
      effects.length > 1
        ? 'moved alone to both limits under every estimate of the texture; the largest effect counts'
        : 'moved alone to both limits',
    adverse: Math.max(...effects.map((e) => e.adverse)),
    favourable: Math.max(...effects.map((e) => e.favourable)),
    atLimits,
  };
}
