import type { Answer, AskedItem, AskedWords } from '../manifest/procurement-model.js';
import { type Allowances, heldLimits } from '../verdict/index.js';
import { cell, number } from './blocks.js';
import type { Cell } from './document.js';
import { inUnit, unitBehind } from './supplier-limits.js';
import { PARAMETER_WORDS } from './supplier-words.js';
import { GAP, statedNumber } from './values.js';

/** Relative: below it two numbers are the same, one of them having been printed. */
const SAME = 2e-3;

/** Rows of what was offered against what is asked now: item, asked, guaranteed, typical, alternative, method, outcome. */
export function answeredRows(
  items: readonly AskedItem[],
  answers: readonly Answer[],
  allowances: Allowances,
): readonly (readonly Cell[])[] {
  return items.map((item) => {
    const answer = answers.find((row) => row.item === item.id);
    const { lower, upper } = heldLimits(item, allowances);
    const say = (value: number) => statedNumber(inUnit(item, value), 6);
    const unit = unitBehind(item);
    const range = (from: number | undefined, to: number) =>
      from === undefined ? `≤${GAP}${say(to)}${unit}` : `${say(from)} to ${say(to)}${unit}`;
    const what = `${PARAMETER_WORDS[item.parameter].what}${item.layer === undefined ? '' : `, ${item.layer}`}`;
    const head = [
      cell({ code: item.id }, ` ${what}`),
      cell(range(item.upperOnly ? undefined : lower.limit, upper.limit)),
    ];
    if (answer === undefined) return [...head, cell('–'), cell('–'), cell('–'), cell('–'), cell('no answer')];
    return [
      ...head,
      cell(answer.guaranteedUpper === undefined ? '–' : range(answer.guaranteedLower, answer.guaranteedUpper)),
      answer.typical === undefined ? cell('–') : number(`${say(answer.typical)}${unit}`),
      cell(answer.alternative ?? '–'),
      cell(answer.method ?? '–'),
      cell(outcome(answer, item, lower.limit, upper.limit)),
    ];
  });
}

function outcome(answer: Answer, item: AskedItem, lower: number, upper: number): string {
  const stale = askedOtherwise(answer, item, lower, upper) ? '; the sheet that was answered asked otherwise' : '';
  if (answer.notOffered) return `not offered${stale}`;
  if (answer.guaranteedUpper === undefined) {
    return `${answer.typical === undefined ? 'no figure' : 'typical only, nothing guaranteed'}${stale}`;
  }
  const slack = SAME * (upper - lower);
  const above = answer.guaranteedUpper > upper + slack;
  const below = !item.upperOnly && answer.guaranteedLower! < lower - slack;
  if (!above && !below) return `as asked or closer${stale}`;
  return `wider than asked (${[...(below ? ['below'] : []), ...(above ? ['above'] : [])].join(' and ')})${stale}`;
}

/** Whether the sheet that came back asked other limits than this build would. */
function askedOtherwise({ asked }: Answer, item: AskedItem, lower: number, upper: number): boolean {
  const slack = 2e-2 * (upper - lower);
  const differs = (was: number | undefined, is: number) => was !== undefined && Math.abs(was - is) > slack;
  return (
    differs(asked.nominal, item.nominal) ||
    differs(asked.upper, upper) ||
    (!item.upperOnly && differs(asked.lower, lower))
  );
}

/** Rows of what was declared in words. */
export function answeredWords(words: readonly AskedWords[], answers: readonly Answer[]): readonly (readonly Cell[])[] {
  return words.map(({ id, what, needed }) => {
    const answer = answers.find((row) => row.item === id);
    const said = answer?.declaration ?? (answer?.notOffered ? 'not offered' : undefined);
    return [
      cell({ code: id }),
      cell(needed === undefined ? what : `${what}; needed: ${needed}`),
      cell(said ?? answer?.alternative ?? 'no answer'),
      cell(answer?.method ?? '–'),
    ];
  });
}
