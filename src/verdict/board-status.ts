import type { RequirementStatus } from './decision.js';

export type BoardStatus = 'meets' | 'undecided' | 'misses' | 'open until measured' | 'incomplete';

interface Weighed {
  readonly requirementId: string;
  readonly weight: 'binding' | 'target';
  readonly status: RequirementStatus;
}

/** Why the order is as it is; printed with the definitions. */
export const BOARD_STATUS_RULE =
  'The binding requirements decide, in this order: a board with one not evaluated is incomplete, because a gap must not ' +
  'hide behind any verdict; else with one missed it misses, because no measurement or better model is expected to ' +
  'change that; else with one undecided it is undecided; else with one verified by test it is open until measured; ' +
  'else it meets. Targets are shown and do not decide.';

const ORDER: readonly { readonly status: RequirementStatus; readonly overall: BoardStatus; readonly words: string }[] =
  [
    { status: 'not evaluated', overall: 'incomplete', words: 'not evaluated' },
    { status: 'misses', overall: 'misses', words: 'missed' },
    { status: 'undecided', overall: 'undecided', words: 'undecided' },
    { status: 'open until measured', overall: 'open until measured', words: 'open until measured' },
  ];

/** Overall status of a board and the sentence that gives its ground. See `BOARD_STATUS_RULE`. */
export function overallOf(requirements: readonly Weighed[]): {
  readonly overall: BoardStatus;
  readonly reason: string;
} {
  const binding = requirements.filter((r) => r.weight === 'binding');
  if (binding.length === 0) {
    return { overall: 'incomplete', reason: 'No requirement is binding, so there is nothing to decide.' };
  }
  const found = ORDER.flatMap((step) => {
    const ids = binding.filter((r) => r.status === step.status).map((r) => r.requirementId);
    return ids.length === 0 ? [] : [{ ...step, ids }];
  });
  if (found.length === 0) {
    return {
      overall: 'meets',
      reason: `All ${binding.length} binding requirements are met with the whole uncertainty.`,
    };
  }
  const counts = found.map(({ words, ids }) => `${ids.length} ${words} (${ids.join(', ')})`);
  return { overall: found[0].overall, reason: `Of ${binding.length} binding requirements: ${counts.join('; ')}.` };
}
