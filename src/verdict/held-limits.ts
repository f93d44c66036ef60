import type { RoughnessModelName } from '../manifest/model.js';
import type { AskedItem } from '../manifest/procurement-model.js';
import type { AllowanceOutcome, AllowanceResult } from './allowance.js';

/** Searches of the boards of a pack, by board id. */
export type Allowances = ReadonlyMap<string, readonly AllowanceResult[]>;

/** What the searches say of one side of an item, over all boards that need it. */
export type SideAllowance =
  | {
      readonly kind: 'limited';
      /** Worst value that every board and every model that sets a limit permits. */
      readonly tightest: number;
      /** Under the model that permits most. */
      readonly loosest: number;
      readonly byModel: readonly { readonly model: RoughnessModelName; readonly permitted: number }[];
      readonly saturated: readonly RoughnessModelName[];
      /** On some board or under some model a requirement is not met at nominal already: that one sets no limit. */
      readonly partly: boolean;
    }
  | { readonly kind: 'saturated'; readonly saturated: readonly RoughnessModelName[] }
  | { readonly kind: 'not limited'; readonly searchedTo: number }
  | { readonly kind: 'not met at nominal' }
  /** Not searched: the item is not computed, or no binding requirement is. */
  | { readonly kind: 'not computed' };

export interface HeldSide {
  readonly limit: number;
  /** Where the limit comes from: the manifest's spread, or the tighter calculated allowance. */
  readonly origin: 'stated' | 'calculated';
  readonly allowance: SideAllowance;
}

export interface HeldLimits {
  readonly lower: HeldSide;
  readonly upper: HeldSide;
}

/** The tighter of the stated spread and the calculated allowance, on each side. */
export function heldLimits(item: AskedItem, allowances: Allowances): HeldLimits {
  const side = (direction: 'down' | 'up', stated: number): HeldSide => {
    const allowance = sideAllowance(item, direction, allowances);
    const tighter =
      allowance.kind === 'limited' && (direction === 'up' ? allowance.tightest < stated : allowance.tightest > stated);
    return tighter
      ? { limit: allowance.tightest, origin: 'calculated', allowance }
      : { limit: stated, origin: 'stated', allowance };
  };
  return { lower: side('down', item.lower), upper: side('up', item.upper) };
}

interface Found {
  readonly model: RoughnessModelName;
  readonly outcome: AllowanceOutcome;
}

function sideAllowance(item: AskedItem, direction: 'down' | 'up', allowances: Allowances): SideAllowance {
  const searches = item.figures.flatMap(({ board, path }) =>
    (allowances.get(board) ?? []).filter((result) => result.path === path && result.direction === direction),
  );
  const found: readonly Found[] = searches.flatMap(({ models }) => models);
  if (found.length === 0) return { kind: 'not computed' };
  const of = <K extends AllowanceOutcome['kind']>(kind: K) =>
    found.flatMap(({ model, outcome }) =>
      outcome.kind === kind ? [{ model, outcome: outcome as Extract<AllowanceOutcome, { kind: K }> }] : [],
    );
  const saturated = [...new Set(of('saturated').map(({ model }) => model))];
  const limits = of('limited');
  if (limits.length > 0) {
    const tighter = (a: number, b: number) => (direction === 'up' ? Math.min(a, b) : Math.max(a, b));
    const byModel = [...new Set(limits.map(({ model }) => model))].map((model) => ({
      model,
      permitted: limits
        .filter((l) => l.model === model)
        .map((l) => l.outcome.permitted)
        .reduce(tighter),
    }));
    const values = byModel.map(({ permitted }) => permitted);
    const [low, high] = [Math.min(...values), Math.max(...values)];
    return {
      kind: 'limited',
      tightest: direction === 'up' ? low : high,
      loosest: direction === 'up' ? high : low,
      byModel,
      saturated,
      partly: of('not met at nominal').length > 0,
    };
  }
  if (saturated.length > 0) return { kind: 'saturated', saturated };
  const free = of('not limited');
  if (free.length < found.length) return { kind: 'not met at nominal' };
  const ends = free.map(({ outcome }) => outcome.searchedTo);
  return { kind: 'not limited', searchedTo: direction === 'up' ? Math.min(...ends) : Math.max(...ends) };
}
