import type { AskedItem } from '../manifest/procurement-model.js';
import type { RoughnessSide } from '../study/results.js';
import type { AllowanceOutcome, AllowanceResult, ModelCeiling } from './allowance.js';

/** Searches of the boards of a pack, by board id. */
export type Allowances = ReadonlyMap<string, readonly AllowanceResult[]>;

/** What the searches say of one side of an item, over all boards that need it. */
export type SideAllowance =
  | {
      readonly kind: 'limited';
      /**
       * Worst value that every board permits under every estimate of the roughness band that sets a limit. A board that does
       * not meet under the high estimate to begin with sets none.
       */
      readonly tightest: number;
      /** Under the estimate that permits most. */
      readonly loosest: number;
      readonly byEstimate: readonly { readonly side: RoughnessSide; readonly permitted: number }[];
      /** On some board or under some estimate a requirement is not met at nominal already: that one sets no limit. */
      readonly partly: boolean;
    }
  | { readonly kind: 'not limited'; readonly searchedTo: number }
  | { readonly kind: 'not met at nominal' }
  /** Not searched: the item is not computed, or no binding requirement is. */
  | { readonly kind: 'not computed' };

export interface HeldSide {
  readonly limit: number;
  /** Where the limit comes from: the manifest's spread, or the tighter calculated allowance. */
  readonly origin: 'stated' | 'calculated';
  readonly allowance: SideAllowance;
  /** The model that the analysis names is saturated within the search: it was not used for this limit. */
  readonly ceiling?: ModelCeiling;
}

export interface HeldLimits {
  readonly lower: HeldSide;
  readonly upper: HeldSide;
}

/** The tighter of the stated spread and the calculated allowance, on each side. */
export function heldLimits(item: AskedItem, allowances: Allowances): HeldLimits {
  const side = (direction: 'down' | 'up', stated: number): HeldSide => {
    const searches = searchesOf(item, direction, allowances);
    const allowance = sideAllowance(searches, direction);
    const ceilings = searches.flatMap(({ ceiling }) => ceiling ?? []);
    const told = ceilings.length === 0 ? {} : { ceiling: ceilings.reduce((a, b) => (b.from < a.from ? b : a)) };
    const tighter =
      allowance.kind === 'limited' && (direction === 'up' ? allowance.tightest < stated : allowance.tightest > stated);
    return tighter
      ? { limit: allowance.tightest, origin: 'calculated', allowance, ...told }
      : { limit: stated, origin: 'stated', allowance, ...told };
  };
  return { lower: side('down', item.lower), upper: side('up', item.upper) };
}

const searchesOf = (item: AskedItem, direction: 'down' | 'up', allowances: Allowances): readonly AllowanceResult[] =>
  item.figures.flatMap(({ board, path }) =>
    (allowances.get(board) ?? []).filter((result) => result.path === path && result.direction === direction),
  );

interface Found {
  readonly side: RoughnessSide;
  readonly outcome: AllowanceOutcome;
}

function sideAllowance(searches: readonly AllowanceResult[], direction: 'down' | 'up'): SideAllowance {
  if (searches.length === 0) return { kind: 'not computed' };
  // Nothing is signed on the word of the lower estimates alone.
  const meeting = searches.filter(({ sides }) =>
    sides.every(({ side, outcome }) => side !== 'high' || outcome.kind !== 'not met at nominal'),
  );
  const found: readonly Found[] = meeting.flatMap(({ sides }) => sides);
  const of = <K extends AllowanceOutcome['kind']>(kind: K) =>
    found.flatMap(({ side, outcome }) =>
      outcome.kind === kind ? [{ side, outcome: outcome as Extract<AllowanceOutcome, { kind: K }> }] : [],
    );
  const partly = meeting.length < searches.length || of('not met at nominal').length > 0;
  const limits = of('limited');
  if (limits.length > 0) {
    const tighter = (a: number, b: number) => (direction === 'up' ? Math.min(a, b) : Math.max(a, b));
    const byEstimate = [...new Set(limits.map(({ side }) => side))].map((side) => ({
      side,
      permitted: limits
        .filter((l) => l.side === side)
        .map((l) => l.outcome.permitted)
        .reduce(tighter),
    }));
    const values = byEstimate.map(({ permitted }) => permitted);
    const [low, high] = [Math.min(...values), Math.max(...values)];
    return {
      kind: 'limited',
      tightest: direction === 'up' ? low : high,
      loosest: direction === 'up' ? high : low,
      byEstimate,
      partly,
    };
  }
  if (partly) return { kind: 'not met at nominal' };
  const ends = of('not limited').map(({ outcome }) => outcome.searchedTo);
  return { kind: 'not limited', searchedTo: direction === 'up' ? Math.min(...ends) : Math.max(...ends) };
}
