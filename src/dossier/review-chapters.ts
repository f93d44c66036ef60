import type { Review } from '../manifest/model.js';
import { cell, chapter, DASH, facts, prose, table } from './blocks.js';
import { concessionsFor, expiryText, WITHOUT_PURPOSE } from './concessions.js';
import { type BoardContext, judgedOn, type PackInput } from './context.js';
import type { Block, Cell, Chapter, Inline } from './document.js';
import { boardPage, boardTitle, link } from './links.js';

/** What people decided, as the overview and the document of the pack show it. */
export const decisionChapter = (input: PackInput, boards: readonly BoardContext[]): Chapter =>
  chapter('decision', 'Decision', decision(input, boards));

function decision({ pack }: PackInput, boards: readonly BoardContext[]): Block {
  const made = pack.review?.decision;
  if (made === undefined) return prose('No decision is recorded yet.');
  const chosen = boards.find(({ board }) => board.id === made.board);
  const board: readonly Inline[] =
    chosen === undefined
      ? ['none']
      : [link(boardTitle(chosen.board), boardPage(chosen.board.id)), ', ', { status: chosen.verdict.overall }];
  return facts(
    'decision-facts',
    ['Decision', made.statement],
    ['Board', ...board],
    ['Reason', made.reason],
    ['Decided by', `${made.by}, ${made.date}`],
  );
}

export const openPointsChapter = (input: PackInput): Chapter =>
  chapter('open-points', 'Open points', openPoints(input));

function openPoints({ pack }: PackInput): Block {
  const points = pack.review?.openPoints ?? [];
  if (points.length === 0) return prose('No open point is recorded.');
  const due = (point: Review['openPoints'][number]): string =>
    point.status !== 'closed' && point.due < pack.date ? `${point.due}: overdue` : point.due;
  return table(
    'open-point-table',
    `Open points as of ${pack.date}`,
    ['Point', 'What is open|3', 'Owner|1.2', 'Due', 'Status'],
    points.map((point) => [cell(point.id), cell(point.text), cell(point.owner), cell(due(point)), cell(point.status)]),
  );
}

export const concessionsChapter = (boards: readonly BoardContext[], input: PackInput): Chapter =>
  chapter('concessions', 'Concessions', ...concessions(boards, input));

function concessions(boards: readonly BoardContext[], { pack }: PackInput): readonly Block[] {
  const rows = boards.flatMap((context) => concessionsFor(context).map((standing) => ({ context, standing })));
  if (rows.length === 0) return [prose('No concession is recorded.')];
  const status = ({ context, standing }: (typeof rows)[number]): Cell => {
    const { verdict } = judgedOn(context, standing.concession.requirement);
    const calculated = verdict.calculated === undefined ? '' : ` (calculated: ${verdict.calculated})`;
    return cell({ status: verdict.status }, calculated + (standing.missed ? '' : `; ${WITHOUT_PURPOSE}`));
  };
  return [
    table(
      'concession-table',
      'Concessions beside the verdicts',
      ['Concession', 'Board', 'Requirement', 'Status|1.2', 'What is conceded|2.6', 'Granted|1.4', 'Holds until'],
      rows.map((row) => {
        const { concession } = row.standing;
        return [
          cell(concession.number),
          cell(link(concession.board, boardPage(concession.board))),
          cell(concession.requirement),
          status(row),
          cell(concession.text),
          cell(`${concession.granted}, ${concession.approver}`),
          cell(expiryText(row.standing)),
        ];
      }),
    ),
    prose(`A concession changes no verdict. Expiry is judged at the date of this document, ${pack.date}.`),
  ];
}

/** Who approves the pack, without the lines to sign on. */
export const approvalsChapter = ({ pack }: PackInput): Chapter => {
  const approvals = pack.review?.approvals ?? [];
  if (approvals.length === 0) return chapter('approvals', 'Approvals', prose('No signatory is named.'));
  return chapter(
    'approvals',
    'Approvals',
    table(
      'approval-table',
      'Who signs, and what the signature attests',
      ['Role|1.2', 'Name', 'Organisation|1.2', 'Signed', 'What the signature attests|2.4'],
      approvals.map(({ role, name, organisation, date, attests }) => [
        cell(role),
        cell(name ?? DASH),
        cell(organisation),
        cell(date ?? 'not yet'),
        cell(attests),
      ]),
    ),
  );
};

/** The same with room for name, date and signature, for paper. */
export const signingChapter = ({ pack }: PackInput): Chapter => {
  const approvals = pack.review?.approvals ?? [];
  if (approvals.length === 0) return chapter('signing', 'Signatures', prose('The pack names no signatory.'));
  const written = (text: string | undefined): Cell =>
    text === undefined ? { content: [], signature: true } : cell(text);
  return chapter(
    'signing',
    'Signatures',
    table(
      'signing-table',
      `Signatures under ${pack.documentNumber}, revision ${pack.revision}`,
      ['Role', 'Name|1.2', 'Organisation', 'Date|0.9', 'Signature|1.7', 'What the signature attests|2'],
      approvals.map(({ role, name, organisation, date, attests }) => [
        cell(role),
        written(name),
        cell(organisation),
        written(date),
        { content: [], signature: true },
        cell(attests),
      ]),
    ),
  );
};

export const revisionsChapter = ({ pack }: PackInput): Chapter => {
  const revisions = pack.review?.revisions ?? [];
  return chapter(
    'revisions',
    'Revisions',
    revisions.length === 0
      ? prose('No table of revisions is recorded.')
      : table(
          'revision-table',
          'Revisions of this document, oldest first',
          ['Revision', 'Date', 'Author|1.2', 'What changed|4'],
          revisions.map(({ revision, date, author, change }) => [
            cell(revision),
            cell(date),
            cell(author),
            cell(change),
          ]),
        ),
  );
};
