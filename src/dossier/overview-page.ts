import { formatNumber } from '../quantity/index.js';
import { quantityOf, quantityTitle } from '../verdict/index.js';
import { caution, cell, chapter, facts, list, number, plainTable, prose, table } from './blocks.js';
import { changesChapter } from './changes-chapter.js';
import { cautionsChapter, inputTable } from './chapter-record.js';
import { comparisonLinks } from './comparisons.js';
import { type BoardContext, judgedOn, type PackInput, page } from './context.js';
import { differencesBetween } from './differences.js';
import type { Block, Chapter, DocumentPage, Inline } from './document.js';
import { concernsOf } from './figures.js';
import {
  boardPage,
  boardPdf,
  boardTitle,
  DEFINITIONS,
  EVIDENCE,
  fileLink,
  link,
  OFFERS,
  OVERVIEW,
  PACK_PDF,
  requirementPage,
} from './links.js';
import { boardsByStatus, gapsOf, matrixCell, notEvaluatedText } from './matrix.js';
import {
  approvalsChapter,
  concessionsChapter,
  decisionChapter,
  openPointsChapter,
  revisionsChapter,
} from './review-chapters.js';
import { rankedRequirements, standing, tightest } from './standing.js';
import { COMPARED_WITH, NOT_MODELLED } from './statements.js';
import { costText, count, limitText, marginText } from './values.js';

function matrix(boards: readonly BoardContext[], ranked: ReturnType<typeof rankedRequirements>): Block {
  return plainTable(
    'matrix',
    'Status and worst margin of every board against every requirement, worst first',
    [
      { title: 'Board', width: 1.4 },
      { title: 'Overall', width: 1.2 },
      ...ranked.map(({ requirement }) => ({
        title: `${requirement.id}${requirement.weight === 'target' ? ' (target)' : ''}`,
      })),
    ],
    boards.map((board) => [
      cell(link(board.board.id, boardPage(board.board.id))),
      cell({ status: board.verdict.overall }),
      ...ranked.map(({ requirement }) => matrixCell(board, requirement.id)),
    ]),
  );
}

function requirementList(boards: readonly BoardContext[], ranked: ReturnType<typeof rankedRequirements>): Block {
  return table(
    'requirements',
    'The requirements in the same order',
    ['Requirement', 'Text|2.4', 'Quantity|1.4', 'Limit|0.9', 'Weight|0.7', 'Worst on|1.2'],
    ranked.map(({ requirement, lowest }) => {
      const worst = boards.find(
        (b) => standing(judgedOn(b, requirement.id).verdict) === lowest && lowest !== undefined,
      );
      const unit =
        worst === undefined ? quantityOf(requirement.quantity).unit : judgedOn(worst, requirement.id).verdict.unit;
      return [
        cell(link(requirement.id, requirementPage(requirement.id))),
        cell(requirement.text),
        cell(quantityTitle(requirement)),
        cell(limitText(requirement, unit)),
        cell(requirement.weight),
        worst === undefined ? cell('–') : cell(link(boardTitle(worst.board), boardPage(worst.board.id))),
      ];
    }),
  );
}

const boardCost = ({ board }: BoardContext): string => (board.cost === undefined ? 'not given' : costText(board.cost));

/** Each board in one line: why it stands so, its tightest binding requirement, its cost. */
function standings(boards: readonly BoardContext[]): Block {
  return table(
    'standings',
    'Tightest binding requirement of every board, and its cost',
    ['Board|1.2', 'Overall', 'Why|2.6', 'Tightest requirement|1.2', '#Margin', '#Margin / uncertainty', '#Cost'],
    boards.map((context) => {
      const tight = tightest(context);
      const ratio = tight === undefined ? undefined : standing(tight.verdict);
      return [
        cell(link(boardTitle(context.board), boardPage(context.board.id))),
        cell({ status: context.verdict.overall }),
        cell(context.verdict.reason),
        tight === undefined ? cell('–') : cell(link(tight.requirement.id, requirementPage(tight.requirement.id))),
        tight?.verdict.margin === undefined ? cell('–') : number(marginText(tight.verdict.margin, tight.verdict.unit)),
        ratio === undefined || !Number.isFinite(ratio) ? cell('–') : number(formatNumber(ratio, 2)),
        number(boardCost(context)),
      ];
    }),
  );
}

function assumptionTable(boards: readonly BoardContext[]): Block {
  return table(
    'assumption-counts',
    'Figures that a verdict rests on without a guarantee, per board',
    ['Board|1.2', '#Outside their frequency', '#Estimated', '#Typical', 'Strongest first|2.6', 'All'],
    boards.map(({ board }) => {
      const concerns = concernsOf(board);
      const basis = (name: string) => concerns.filter((c) => c.use.figure.provenance.basis === name).length;
      const strongest = concerns.slice(0, 3).map((c) => c.use.label);
      const more = concerns.length - strongest.length;
      return [
        cell(link(boardTitle(board), boardPage(board.id))),
        number(String(concerns.filter((c) => c.outsideFrequency).length)),
        number(String(basis('estimated'))),
        number(String(basis('typical'))),
        cell(concerns.length === 0 ? 'none' : strongest.join('; ') + (more > 0 ? `; ${more} more` : '')),
        cell(link('list with reasons', boardPage(board.id), concerns.length === 0 ? 'verdict' : 'assumptions')),
      ];
    }),
  );
}

function differences(boards: readonly BoardContext[]): Block {
  const found = differencesBetween(boards.map((b) => b.board));
  if (boards.length < 2) return prose('The pack holds a single board.');
  if (found.length === 0) return prose('The boards do not differ in any field that changes a result.');
  return plainTable(
    'difference-table',
    'Fields in which the boards differ',
    [{ title: 'Field', width: 1.3 }, ...boards.map(({ board }) => ({ title: boardTitle(board) }))],
    found.map(({ label, values }) => [cell(label), ...values.map((value) => cell(value))]),
  );
}

function pagesChapter({ pack, procurement }: PackInput, boards: readonly BoardContext[]): Chapter {
  const dossier = ({ board, verdict }: BoardContext): readonly Inline[] => [
    link(`Dossier of ${boardTitle(board)}`, boardPage(board.id)),
    ' ',
    { status: verdict.overall },
    ', ',
    fileLink('PDF', boardPdf(board.id)),
  ];
  return chapter(
    'pages',
    'Pages of this pack',
    list([
      [fileLink('The pack as one PDF', PACK_PDF), ': verdicts, decision, concessions and signatures'],
      ...boards.map(dossier),
      ...pack.requirements.requirements.map((r): readonly Inline[] => [
        link(`Requirement ${r.id}`, requirementPage(r.id)),
        `: ${r.text}`,
      ]),
      ...(procurement === undefined
        ? []
        : [[link('Suppliers', OFFERS), ': what is asked of whom, how far each item may go, and what came back']]),
      [link('Evidence', EVIDENCE), ': methods, their sources and ranges, and the checks run for this build'],
      [link('Definitions', DEFINITIONS), ': what every figure and status means'],
    ]),
  );
}

export function overviewPage(input: PackInput, boards: readonly BoardContext[]): DocumentPage {
  const { pack } = input;
  const ranked = rankedRequirements(pack.requirements.requirements, boards);
  const gaps = boards.flatMap((board) => gapsOf(board, true));
  return page(input, {
    id: OVERVIEW,
    kind: 'overview',
    title: pack.title,
    subtitle: `${pack.documentNumber}, revision ${pack.revision}, ${pack.date}: ${count(boards.length, 'board')} against ${count(pack.requirements.requirements.length, 'requirement')}`,
    chapters: [
      changesChapter(input, boards),
      chapter(
        'overview',
        'Overview',
        prose(
          `Candidate antenna boards compared against one requirement set, ${pack.requirements.title}, by calculation. `,
          'Each cell of the table gives a status and the worst margin over the band and temperature range of the requirement; the dossiers behind it give the figures, their uncertainty and what they rest on.',
        ),
        boardsByStatus(boards),
        facts(
          'counts',
          ['Not evaluated', notEvaluatedText(boards, 'on the requirement pages')],
          ['To sign', fileLink('the pack as one PDF', PACK_PDF)],
        ),
        matrix(boards, ranked),
        ...(gaps.length === 0 ? [] : [caution('Not evaluated', ...gaps)]),
        caution('What is not modelled', ...NOT_MODELLED.map((line) => [line])),
        caution('What the figures are compared with', [COMPARED_WITH]),
      ),
      decisionChapter(input, boards),
      openPointsChapter(input),
      concessionsChapter(boards, input),
      chapter(
        'standing',
        'How the boards stand',
        standings(boards),
        prose(
          'Margins in dB, degrees and ratios are compared by their uncertainty: a margin over uncertainty of 1 or more meets, below −1 misses, between them it is undecided. It also orders the columns of the table above.',
        ),
        requirementList(boards, ranked),
      ),
      chapter('differences', 'What differs between the boards', differences(boards), ...comparisonLinks(boards)),
      chapter('assumptions', 'What the verdicts rest on', assumptionTable(boards)),
      revisionsChapter(input),
      approvalsChapter(input),
      pagesChapter(input, boards),
      chapter(
        'inputs',
        'Inputs',
        facts('program', ['Program', `boardcase ${input.programVersion}`]),
        inputTable(pack.inputs),
      ),
      cautionsChapter(),
    ],
  });
}
