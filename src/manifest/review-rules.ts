import { quoted } from '../quantity/index.js';
import type { ReviewDocument } from './documents/review-document.js';
import type { Path, Problem } from './problem.js';
import { type KnownIds, knownId, RuleReport } from './rules.js';
import type { Node } from './tree.js';

/** What a review may refer to, as far as it is known when the review is read. */
export interface ReviewContext {
  readonly boards: KnownIds;
  readonly requirements: KnownIds;
  /** Of the pack; absent when the pack itself is faulty. */
  readonly revision?: string;
  readonly date?: string;
}

/** The word that stands for "no board is chosen". */
export const NO_BOARD = 'none';

export function reviewRules(root: Node, doc: ReviewDocument, context: ReviewContext): readonly Problem[] {
  const report = new RuleReport(root);
  decisionRules(report, doc, context);
  unique(
    report,
    'open_points',
    'id',
    (doc.open_points ?? []).map((point) => point.id),
  );
  unique(
    report,
    'concessions',
    'number',
    (doc.concessions ?? []).map((concession) => concession.number),
  );
  (doc.concessions ?? []).forEach((concession, i) => {
    const path: Path = ['concessions', i];
    knownId(report, [...path, 'board'], concession.board, 'board', context.boards);
    knownId(report, [...path, 'requirement'], concession.requirement, 'requirement', context.requirements);
    notAfterIssue(report, [...path, 'granted'], concession.granted, context);
    // Dates as YYYY-MM-DD compare as text.
    if (concession.expiry < concession.granted) {
      report.at(
        [...path, 'expiry'],
        quoted(concession.expiry),
        `a day on or after that of granted, ${concession.granted}`,
      );
    }
  });
  revisionRules(report, doc, context);
  return report.problems;
}

function decisionRules(report: RuleReport, { decision }: ReviewDocument, context: ReviewContext): void {
  if (!decision) return;
  if (decision.board !== NO_BOARD) knownId(report, ['decision', 'board'], decision.board, 'board', context.boards);
  else if (context.boards.ids.has(NO_BOARD)) {
    report.at(
      ['decision', 'board'],
      '"none", which is also the id of a board',
      'none says that no board is chosen',
      'Give that board another id.',
    );
  }
  notAfterIssue(report, ['decision', 'date'], decision.date, context);
}

/** A document cannot record what happened after it was issued. */
function notAfterIssue(report: RuleReport, path: Path, day: string, { date }: ReviewContext): void {
  if (date === undefined || day <= date) return;
  report.at(path, quoted(day), `a day on or before the date of the pack, ${date}`);
}

function unique(report: RuleReport, list: string, key: string, values: readonly string[]): void {
  values.forEach((value, i) => {
    if (values.indexOf(value) < i)
      report.at([list, i, key], `${quoted(value)} a second time`, `each ${key} stands once`);
  });
}

/** The table ends with the revision that is being issued, or it would be signed without saying what changed. */
function revisionRules(report: RuleReport, { revisions = [] }: ReviewDocument, context: ReviewContext): void {
  unique(
    report,
    'revisions',
    'revision',
    revisions.map((entry) => entry.revision),
  );
  revisions.forEach((entry, i) => {
    const before = revisions[i - 1];
    if (before && entry.date < before.date) {
      report.at(
        ['revisions', i, 'date'],
        quoted(entry.date),
        `revisions stand oldest first; the one before is of ${before.date}`,
      );
    }
  });
  const last = revisions.at(-1);
  if (last === undefined || context.revision === undefined) return;
  const path: Path = ['revisions', revisions.length - 1];
  if (last.revision !== context.revision) {
    report.at(
      [...path, 'revision'],
      quoted(last.revision),
      `the last entry is the revision of the pack, ${quoted(context.revision)}`,
    );
  } else if (context.date !== undefined && last.date !== context.date) {
    report.at([...path, 'date'], quoted(last.date), `the date of the pack, ${context.date}`);
  }
}
