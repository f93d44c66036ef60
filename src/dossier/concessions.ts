import type { Concession } from '../manifest/model.js';
import { type BoardContext, judgedOn } from './context.js';
import type { Inline } from './document.js';

/** A concession beside what was found; the verdict stays as it is. */
export interface Standing {
  readonly concession: Concession;
  /** By the date of the pack. */
  readonly expired: boolean;
  /** The board misses the requirement, by calculation where a test is still due. */
  readonly missed: boolean;
}

/** Concessions for a board, in the order of the review. */
export function concessionsFor(context: BoardContext): readonly Standing[] {
  const { pack } = context.input;
  const own = pack.review?.concessions.filter(({ board }) => board === context.board.id) ?? [];
  return own.map((concession) => {
    const { verdict } = judgedOn(context, concession.requirement);
    return {
      concession,
      // ISO dates compare as text; the last day still counts.
      expired: concession.expiry < pack.date,
      missed: (verdict.calculated ?? verdict.status) === 'misses',
    };
  });
}

/** Said behind the status in a table of verdicts; nothing where the requirement is not missed. */
export function concessionMarks(context: BoardContext, requirementId: string): readonly Inline[] {
  return concessionsFor(context)
    .filter(({ concession, missed }) => missed && concession.requirement === requirementId)
    .map(({ concession, expired }) => `, concession ${concession.number}${expired ? ' (expired)' : ''}`);
}

export const expiryText = ({ concession, expired }: Standing): string =>
  expired ? `${concession.expiry}: expired` : concession.expiry;

export const WITHOUT_PURPOSE = 'without purpose: the requirement is not missed';
