import { cell, list } from './blocks.js';
import { concessionMarks } from './concessions.js';
import { type BoardContext, type Judged, judgedOn } from './context.js';
import type { Block, Cell, Inline } from './document.js';
import { boardPage, boardTitle, link, requirementPage } from './links.js';
import { count, marginText, valueText } from './values.js';

/** Status with the worst margin, or the declared value; a concession stands beside it and changes nothing. */
export function matrixCell(board: BoardContext, requirementId: string): Cell {
  const { verdict } = judgedOn(board, requirementId);
  const detail =
    verdict.margin !== undefined
      ? marginText(verdict.margin, verdict.unit)
      : typeof verdict.value === 'string'
        ? valueText(verdict.value, verdict.unit)
        : '';
  const marks = concessionMarks(board, requirementId);
  return cell({ status: verdict.status }, ...(detail === '' ? [] : [` ${detail}`]), ...marks);
}

export const notEvaluatedOn = (board: BoardContext): number =>
  board.judged.filter(({ verdict }) => verdict.status === 'not evaluated').length;

/** How many requirements were not evaluated, and where the reasons are. */
export function notEvaluatedText(boards: readonly BoardContext[], reasons: string): string {
  const open = boards.reduce((sum, board) => sum + notEvaluatedOn(board), 0);
  return open === 0 ? 'nothing' : `${count(open, 'requirement')} over all boards; reasons ${reasons}`;
}

/** Boards by their overall status; the pack has no status of its own beyond those of its boards. */
export function boardsByStatus(boards: readonly BoardContext[]): Block {
  const order = ['meets', 'open until measured', 'undecided', 'misses', 'incomplete'] as const;
  const groups = order.flatMap((status) => {
    const found = boards.filter((b) => b.verdict.overall === status);
    return found.length === 0 ? [] : [{ status, found }];
  });
  return list(
    groups.map(({ status, found }) => [
      { status },
      ` ${count(found.length, 'board')}: `,
      ...found.flatMap(({ board }, i): Inline[] => [
        ...(i === 0 ? [] : [', ']),
        link(boardTitle(board), boardPage(board.id)),
      ]),
    ]),
  );
}

/** What was not evaluated on a board, one line per reason; on paper without links to the pages of requirements. */
export function gapsOf({ board, judged }: BoardContext, linked: boolean): readonly (readonly Inline[])[] {
  const reasonOf = ({ verdict }: Judged): string => verdict.reason ?? 'no reason recorded';
  const open = judged.filter(({ verdict }) => (verdict.calculated ?? verdict.status) === 'not evaluated');
  return [...new Set(open.map(reasonOf))].map((reason) => [
    link(boardTitle(board), boardPage(board.id)),
    ': ',
    ...open
      .filter((entry) => reasonOf(entry) === reason)
      .flatMap(({ requirement }, i): Inline[] => [
        ...(i === 0 ? [] : [', ']),
        linked ? link(requirement.id, requirementPage(requirement.id)) : requirement.id,
      ]),
    `. Reason: ${reason}`,
  ]);
}
