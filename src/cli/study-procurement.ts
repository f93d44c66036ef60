import { askedItems } from '../manifest/index.js';
import type { Board, Pack } from '../manifest/model.js';
import { assembleStudy, type BoardStudy, planBoard, type TaskResult } from '../study/index.js';
import {
  type AllowanceResult,
  type BoardVerdict,
  boardsOnOffer,
  judgeBoard,
  type ProcurementResults,
  planAllowances,
} from '../verdict/index.js';
import type { Progress } from './progress.js';
import type { AllowanceJob, StudyJob } from './study-job.js';
import type { Workers } from './workers.js';

/** What is calculated for suppliers once the boards are judged; undefined where the pack asks nothing of any. */
export async function studyProcurement(
  pack: Pack,
  studies: readonly BoardStudy[],
  verdicts: readonly BoardVerdict[],
  { workers, progress }: { readonly workers: Workers; readonly progress: Progress },
  enter: (stage: string, total?: number) => void,
): Promise<ProcurementResults | undefined> {
  const { procurement, analysis, requirements } = pack;
  if (!procurement) return undefined;
  const items = procurement.recipients.flatMap((recipient) => askedItems(recipient, pack.boards, procurement));
  const searches = studies.flatMap((study, i) =>
    planAllowances(study, verdicts[i], requirements, items).map(
      (allowance): AllowanceJob => ({ board: study.board, analysis, allowance }),
    ),
  );
  enter('searching allowances', searches.length);
  const found = await workers.run<AllowanceResult>(searches, () => progress.step());
  const allowances = new Map<string, AllowanceResult[]>();
  searches.forEach(({ board }, i) => {
    allowances.set(board.id, [...(allowances.get(board.id) ?? []), found[i]]);
  });

  const offers = procurement.recipients.map((recipient) => ({ recipient, boards: boardsOnOffer(pack, recipient) }));
  const plans = offers.flatMap(({ boards }) =>
    boards.map((board) => ({
      board,
      jobs: planBoard(board, analysis).map((task): StudyJob => ({ board, analysis, task })),
    })),
  );
  const jobs = plans.flatMap((plan) => plan.jobs);
  if (jobs.length > 0) enter('judging the boards on what was offered', jobs.length);
  const results = jobs.length === 0 ? [] : await workers.run<TaskResult>(jobs, () => progress.step());
  const resultOf = new Map(jobs.map((job, i) => [job, results[i]]));
  const after = new Map<Board, BoardVerdict>();
  for (const { board, jobs: own } of plans) {
    const study = assembleStudy(
      board,
      analysis,
      own.map((job) => resultOf.get(job)!),
    );
    after.set(board, judgeBoard(study, requirements));
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
