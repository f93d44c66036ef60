import { askedItems } from '../manifest/index.js';
import type { Analysis, Board, Pack } from '../manifest/model.js';
import { type BoardStudy, type Confirmation, carriedConfirmation, correctionIn } from '../study/index.js';
import {
  type AllowanceResult,
  type BoardVerdict,
  boardsOnOffer,
  judgeBoard,
  type ProcurementResults,
  planAllowances,
} from '../verdict/index.js';
import type { AllowanceJob } from './study-job.js';
import { type Room, studyBoards } from './study-pack.js';

/** What is calculated for suppliers once the boards are judged; undefined where the pack asks nothing of any. */
export async function studyProcurement(
  pack: Pack,
  studies: readonly BoardStudy[],
  verdicts: readonly BoardVerdict[],
  room: Room,
): Promise<ProcurementResults | undefined> {
  const { procurement, analysis, requirements } = pack;
  const { workers, progress, enter } = room;
  if (!procurement) return undefined;
  const items = procurement.recipients.flatMap((recipient) => askedItems(recipient, pack.boards, procurement));
  const searches = studies.flatMap((study, i) =>
    planAllowances(study, verdicts[i], requirements, items).map(
      (allowance): AllowanceJob => ({
        kind: 'allowance',
        board: study.board,
        analysis,
        allowance,
        correction: correctionIn(study.confirmation),
      }),
    ),
  );
  enter('searching allowances', searches.length);
  const found = await workers.run<AllowanceResult>(searches, () => progress.step());
  const allowances = new Map<string, AllowanceResult[]>();
  searches.forEach(({ board }, i) => {
    allowances.set(board.id, [...(allowances.get(board.id) ?? []), found[i]]);
  });

  const offers = procurement.recipients.map((recipient) => ({ recipient, boards: boardsOnOffer(pack, recipient) }));
  const boards = offers.flatMap((offer) => offer.boards);
  const after = new Map<Board, BoardVerdict>();
  if (boards.length > 0) {
    const confirmations = boards.map((board) => carriedOver(board, analysis, studies));
    const found = await studyBoards(boards, analysis, confirmations, 'judging the boards on what was offered', room);
    for (const study of found) after.set(study.board, judgeBoard(study, requirements));
  }
  return {
    allowances,
    offers: offers.flatMap(({ recipient, boards }) =>
      recipient.answers === undefined
        ? []
        : [
            {
              recipientId: recipient.id,
              boards: boards.map((board) => ({
                before: verdicts.find(({ boardId }) => boardId === board.id)!,
                after: after.get(board)!,
              })),
            },
          ],
    ),
  };
}

/** @throws Error for a board that was not studied before */
function carriedOver(board: Board, analysis: Analysis, studies: readonly BoardStudy[]): Confirmation {
  const drawn = studies.find((study) => study.board.id === board.id);
  if (drawn === undefined) throw new Error(`studyProcurement: no study of board ${board.id}`);
  return carriedConfirmation(board, analysis, drawn.confirmation, 'the board with what was assumed before the offer');
}
