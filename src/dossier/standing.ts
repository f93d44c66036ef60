import type { Requirement } from '../manifest/model.js';
import type { RequirementVerdict } from '../verdict/index.js';
import { type BoardContext, type Judged, judgedOn } from './context.js';

/**
 * Margin over the uncertainty on its side: 1 or more meets, below −1 misses, between them undecided. It makes margins in
 * dB, degrees and ratios comparable. Declared properties stand at ±Infinity; undefined where nothing was evaluated.
 */
export function standing(verdict: RequirementVerdict): number | undefined {
  const status = verdict.calculated ?? verdict.status;
  if (status === 'not evaluated') return undefined;
  const { margin, adverse = 0, favourable = 0 } = verdict;
  const side = margin === undefined || margin >= 0 ? adverse : favourable;
  if (margin === undefined || side === 0)
    return status === 'meets' ? Number.POSITIVE_INFINITY : Number.NEGATIVE_INFINITY;
  return margin / side;
}

export interface RankedRequirement {
  readonly requirement: Requirement;
  /** Smallest standing over the boards; undefined where no board was evaluated. */
  readonly lowest: number | undefined;
}

/**
 * Requirements in the order in which they matter: first binding ones that some board could not be evaluated against,
 * then by the smallest standing over the boards; ties in the order of the set.
 */
export function rankedRequirements(
  requirements: readonly Requirement[],
  boards: readonly BoardContext[],
): readonly RankedRequirement[] {
  const ranked = requirements.map((requirement) => {
    const standings = boards.map((board) => standing(judgedOn(board, requirement.id).verdict));
    const known = standings.filter((s) => s !== undefined);
    const gap = requirement.weight === 'binding' && known.length < standings.length;
    return { requirement, lowest: known.length === 0 ? undefined : Math.min(...known), gap };
  });
  const key = (r: (typeof ranked)[number]) => r.lowest ?? Number.NEGATIVE_INFINITY;
  const compare = (a: number, b: number) => (a === b ? 0 : a < b ? -1 : 1);
  return ranked
    .sort((a, b) => Number(b.gap) - Number(a.gap) || compare(key(a), key(b)))
    .map(({ requirement, lowest }) => ({ requirement, lowest }));
}

/** The binding requirement with the smallest standing on a board. */
export function tightest(board: BoardContext): Judged | undefined {
  const known = board.judged.flatMap((entry) => {
    const at = standing(entry.verdict);
    return entry.requirement.weight === 'binding' && at !== undefined ? [{ entry, at }] : [];
  });
  if (known.length === 0) return undefined;
  return known.reduce((a, b) => (b.at < a.at ? b : a)).entry;
}
