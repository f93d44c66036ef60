import { cell, prose, table } from './blocks.js';
import type { BoardContext } from './context.js';
import type { Block, Inline } from './document.js';
import { boardPage, boardTitle, comparePage, link } from './links.js';

/** More pages than this are not read; then every board is compared with the first one only. */
export const MOST_COMPARISONS = 45;

export interface Comparisons {
  readonly pairs: readonly (readonly [BoardContext, BoardContext])[];
  /** False when only pairs with the first board are there. */
  readonly all: boolean;
}

/** Pairs of boards that have a page side by side, in the order of the pack. */
export function comparisonsOf(boards: readonly BoardContext[]): Comparisons {
  const all = (boards.length * (boards.length - 1)) / 2 <= MOST_COMPARISONS;
  const firsts = all ? boards : boards.slice(0, 1);
  return { pairs: firsts.flatMap((a, i) => boards.slice(i + 1).map((b) => [a, b] as const)), all };
}

/** Where each pair is shown, on the overview. */
export function comparisonLinks(boards: readonly BoardContext[]): readonly Block[] {
  const { pairs, all } = comparisonsOf(boards);
  if (pairs.length === 0) return [];
  const rows = [...new Set(pairs.map(([a]) => a))].map((first) => [
    cell(link(boardTitle(first.board), boardPage(first.board.id))),
    cell(
      ...pairs
        .filter(([a]) => a === first)
        .flatMap(([a, b], i): Inline[] => [
          ...(i === 0 ? [] : [', ']),
          link(`${a.board.id} and ${b.board.id}`, comparePage(a.board.id, b.board.id)),
        ]),
    ),
  ]);
  const scope = all
    ? 'Any two boards side by side: fields that differ, verdicts, gain budget'
    : 'Every board beside the first: fields that differ, verdicts, gain budget';
  const left = `All pairs of ${boards.length} boards would be more than ${MOST_COMPARISONS} pages: each is compared with the first board only. Change the order of the boards to compare with another.`;
  return [table('comparisons', scope, ['Board', 'Side by side|2.4'], rows), ...(all ? [] : [prose(left)])];
}
