import type { ReviewDocument } from './documents/review-document.js';
import type { Review } from './model.js';
import { NO_BOARD } from './review-rules.js';

const STATUS = { open: 'open', in_work: 'in work', closed: 'closed' } as const;

/** A checked review as the model holds it. */
export function reviewOf(doc: ReviewDocument, file: string): Review {
  const { decision } = doc;
  return {
    file,
    ...(decision === undefined
      ? {}
      : {
          decision: {
            ...(decision.board === NO_BOARD ? {} : { board: decision.board }),
            statement: decision.statement,
            reason: decision.reason,
            date: decision.date,
            by: decision.by,
          },
        }),
    openPoints: (doc.open_points ?? []).map((point) => ({ ...point, status: STATUS[point.status] })),
    concessions: doc.concessions ?? [],
    approvals: (doc.approvals ?? []).map(({ name, date, ...rest }) => ({
      ...rest,
      ...(name === undefined ? {} : { name }),
      ...(date === undefined ? {} : { date }),
    })),
    revisions: doc.revisions ?? [],
  };
}
