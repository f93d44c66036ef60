import type { Board, Figure, RequirementSet } from '../manifest/model.js';
import type { AskedItem, HeldParameter } from '../manifest/procurement-model.js';
import { slabGuidesOneWave } from '../physics/column/index.js';
import { type BoardStudy, movables } from '../study/index.js';
import type { AllowanceTask, Guarded } from './allowance.js';
import type { BoardVerdict, RequirementVerdict } from './judge.js';

/** How far a search goes: beyond it a part would be another part, and no limit is worth printing. */
interface Reach {
  readonly low: (figure: Figure) => number;
  readonly high: (figure: Figure) => number;
  /** For print: `±30 % of nominal`. */
  readonly words: string;
}

const share = (low: number, high: number, words: string): Reach => ({
  low: ({ value }) => low * value,
  high: ({ value }) => high * value,
  words,
});
const TEXTURE: Reach = {
  low: () => 0,
  high: ({ value }) => Math.max(2.5e-6, 2 * value),
  words: '0 to 2.5 µm, or to twice the nominal value where that is more',
};

export const ALLOWANCE_REACH: Readonly<Record<Exclude<HeldParameter, 'edge-slope'>, Reach>> = {
  'laminate-thickness': share(0.7, 1.3, '±30 % of nominal'),
  permittivity: share(0.9, 1.1, '±10 % of nominal'),
  'loss-tangent': share(0, 5, '0 to five times nominal'),
  'treated-face-texture': TEXTURE,
  'untreated-face-texture': TEXTURE,
  'outer-face-texture': TEXTURE,
  'copper-thickness': share(0.3, 2.5, '0.3 to 2.5 times nominal'),
  'finish-thickness': share(0.2, 4, '0.2 to 4 times nominal'),
  'etched-width': {
    low: ({ value }) => value - 40e-6,
    high: ({ value }) => value + 40e-6,
    words: '±40 µm in total',
  },
};

/**
 * Searches for the items of a board, both ways each; none where nothing was evaluated. Only binding, computed
 * requirements limit an item: targets do not decide, and what is declared does not depend on it.
 */
export function planAllowances(
  study: BoardStudy,
  verdict: BoardVerdict,
  set: RequirementSet,
  items: readonly AskedItem[],
): AllowanceTask[] {
  const { board } = study;
  if (study.nominal.line.length === 0) return [];
  const seen = new Set<string>();
  return items.flatMap((item) =>
    item.figures.flatMap(({ board: id, path }) => {
      if (id !== board.id || item.parameter === 'edge-slope' || seen.has(path)) return [];
      const figure = movables(board).find((movable) => movable.figure.path === path)?.figure;
      // The thickness of the ground is declared and does not enter the calculation.
      if (!figure) return [];
      seen.add(path);
      const requirements = guarded(study, verdict, set, path);
      if (requirements.length === 0) return [];
      const reach = ALLOWANCE_REACH[item.parameter];
      const task = (direction: 'down' | 'up', end: number): AllowanceTask[] =>
        end === figure.value ? [] : [{ path, parameter: item.parameter, direction, end, requirements }];
      return [
        ...task('down', reach.low(figure)),
        ...task('up', oneWave(board, item.parameter, figure.value, reach.high(figure))),
      ];
    }),
  );
}

/** The upper end, brought in so far that the laminate still guides a single surface wave, as the column model needs. */
function oneWave(board: Board, parameter: HeldParameter, nominal: number, high: number): number {
  const { material, thickness } = board.stackUp.laminate;
  const guides = (end: number): boolean =>
    slabGuidesOneWave(
      board.band.high * 1.02,
      (parameter === 'permittivity' ? end : material.permittivity.value) * 1.02,
      parameter === 'laminate-thickness' ? end : thickness.value,
    );
  let end = high;
  while (!guides(end) && end > nominal * 1.001) end = nominal + 0.8 * (end - nominal);
  return end;
}

/** Binding computed requirements with the uncertainty that stays when the item itself is moved instead of uncertain. */
function guarded(study: BoardStudy, verdict: BoardVerdict, set: RequirementSet, path: string): readonly Guarded[] {
  const own = study.tolerances.find((tolerance) => tolerance.figure.path === path);
  return set.requirements.flatMap((requirement) => {
    if (requirement.weight !== 'binding' || requirement.quantity === 'declared') return [];
    const found = verdict.requirements.find((v) => v.requirementId === requirement.id);
    if (found === undefined || found.margin === undefined) return [];
    return [{ requirement, guard: guardOf(found, own?.id) }];
  });
}

function guardOf({ parts }: RequirementVerdict, own: string | undefined): number {
  // The spread over the roughness band is not among them: every estimate is searched by itself.
  const others = parts.filter(({ kind, id }) => kind !== 'roughness' && id !== `tolerance-${own}`);
  return Math.hypot(...others.map(({ adverse }) => adverse));
}
