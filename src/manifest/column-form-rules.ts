import { formatQuantity } from '../quantity/index.js';
import type { ArrayDocument } from './documents/array-document.js';
import type { ColumnLayout } from './model.js';
import type { RuleReport } from './rules.js';

const length = (metres: number): string => formatQuantity(metres, 'length');

/** What inset, side feed, matching sections and termination demand of a column and of each other. */
export function columnFormRules(report: RuleReport, array: ArrayDocument, column: ColumnLayout): void {
  exclusive(report, array);
  insetRules(report, column);
  sideFeedRules(report, array, column);
}

const EXCLUSIVE: readonly (readonly [keyof ArrayDocument, keyof ArrayDocument, why: string])[] = [
  ['inset', 'side_feed', 'a column fed from its side has no line into its first patch'],
  ['matching', 'side_feed', 'matching sections lie before the first patch, and a side feed does not come from there'],
  ['termination', 'inset', 'a travelling-wave column is fed at the edge of its first patch'],
  ['termination', 'side_feed', 'a travelling-wave column is fed at the end away from its termination'],
  ['termination', 'retune', 'retuning seeks the match of a resonant column, and a travelling wave has none'],
];

function exclusive(report: RuleReport, array: ArrayDocument): void {
  for (const [one, other, why] of EXCLUSIVE)
    if (array[one] !== undefined && array[other] !== undefined)
      report.clash(['array'], [one, other], why, 'Remove one, or give an inherited one an empty value.');
}

function insetRules(report: RuleReport, { inset, patches, matching, feedLine }: ColumnLayout): void {
  if (inset === undefined) return;
  const [first] = patches;
  const line = matching?.at(-1) ?? feedLine;
  if (inset.depth >= first!.length / 2) {
    const allowed = `an inset ends before the middle of the first patch, which is ${length(first!.length)} long`;
    report.at(['array', 'inset', 'depth'], report.written(['array', 'inset', 'depth']), allowed);
  }
  if (line.width + 2 * inset.gap >= first!.width) {
    const allowed = `a line ${length(line.width)} wide with a slot at either side leaves something of the first patch, which is ${length(first!.width)} wide`;
    report.at(['array', 'inset', 'gap'], report.written(['array', 'inset', 'gap']), allowed);
  }
}

function sideFeedRules(report: RuleReport, array: ArrayDocument, { sideFeed, links, feedLine }: ColumnLayout): void {
  if (sideFeed === undefined) return;
  const link = links[sideFeed.link];
  if (link === undefined) {
    const allowed = links.length === 0 ? 'a column of one patch has no link' : `the links are 1 to ${links.length}`;
    return void report.at(['array', 'side_feed', 'link'], report.written(['array', 'side_feed', 'link']), allowed);
  }
  if (feedLine.width >= link.length) {
    const allowed = `the feed line meets a link ${length(link.length)} long and is narrower than that`;
    report.at(['array', 'feed_line', 'width'], report.written(['array', 'feed_line', 'width']), allowed);
  }
  if (array.side_feed?.side === 'outward' && array.columns % 2 === 1) {
    const allowed = 'outward has a meaning where no column lies in the middle: an even number of columns';
    report.at(['array', 'side_feed', 'side'], report.written(['array', 'side_feed', 'side']), allowed);
  }
}
