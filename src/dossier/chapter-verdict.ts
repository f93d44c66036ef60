import type { BoardStudy } from '../study/results.js';
import { quantityOf, quantityTitle } from '../verdict/index.js';
import { caution, cell, chapter, facts, number, prose, table } from './blocks.js';
import { concessionsFor, expiryText, WITHOUT_PURPOSE } from './concessions.js';
import type { BoardContext, Judged } from './context.js';
import type { Block, Cell, Chapter, Inline } from './document.js';
import { concernsOf, figureText } from './figures.js';
import { boardPage, DEFINITIONS, link, requirementPage } from './links.js';
import { judgedTag, networkOnlyCaution } from './network-only.js';
import { retunedNotice } from './retuning.js';
import { sizedNotice } from './sizing.js';
import { COMPARED_WITH, NOT_MODELLED } from './statements.js';
import { gigahertz, limitText, marginText, placeText, uncertaintyText, valueText } from './values.js';

/** Worst value, or why there is none; with what stands behind a value that no full wave confirms. */
export function valueCell({ requirement, verdict }: Judged, study: BoardStudy): Cell {
  if (verdict.value === undefined) return cell(verdict.reason ?? '–');
  const kind = requirement.quantity === 'pattern_mask' ? 'excess ' : '';
  const value = kind + valueText(verdict.value, verdict.unit) + judgedTag(study, requirement);
  const reason = verdict.reason === undefined ? '' : ` (${verdict.reason})`;
  return { content: [value + reason], numeric: typeof verdict.value === 'number' && reason === '' };
}

/** A reason that holds for much of the board stands once, under the table; a row then only points there. */
function resultCell(entry: Judged, study: BoardStudy): Cell {
  const { value, reason } = entry.verdict;
  const shared = study.notEvaluated.some((gap) => gap.reason === reason && gap.quantities.length > 1);
  return value === undefined && shared ? cell('none: reason below') : valueCell(entry, study);
}

export const marginCell = ({ verdict }: Judged): Cell =>
  verdict.margin === undefined ? cell('–') : number(marginText(verdict.margin, verdict.unit));

export const uncertaintyCell = ({ requirement, verdict }: Judged): Cell => {
  if (requirement.quantity === 'declared') return cell('as declared');
  return verdict.adverse === undefined ? cell('–') : number(uncertaintyText(verdict, verdict.unit));
};

export function whereCell({ verdict }: Judged): Cell {
  if (verdict.where !== undefined) return cell(placeText(verdict.where));
  return cell(verdict.part ?? '–');
}

/** Status, and for what only a test decides what the calculation says. */
export function statusInline({ verdict }: Judged): readonly Inline[] {
  if (verdict.calculated === undefined) return [{ status: verdict.status }];
  return [{ status: verdict.status }, ` (calculated: ${verdict.calculated})`];
}

const requirementCell = ({ requirement }: Judged): Cell => {
  const target = requirement.weight === 'target' ? ' (target)' : '';
  return cell(link(requirement.id, requirementPage(requirement.id)), `${target}: ${requirement.text}`);
};

function results({ judged, study }: BoardContext): Block {
  return table(
    'results',
    'Worst value of every requirement over its band and temperature range, against its limit',
    [
      'Requirement|2.4',
      'Limit|0.9',
      '#Worst value|1.1',
      'Where|1.2',
      '#Margin|0.8',
      '#Uncertainty (against / for)|1.2',
      'Status|1.2',
    ],
    judged.map((entry) => {
      const { unit } = entry.verdict;
      return [
        requirementCell(entry),
        cell(limitText(entry.requirement, unit)),
        resultCell(entry, study),
        whereCell(entry),
        marginCell(entry),
        uncertaintyCell(entry),
        cell(...statusInline(entry)),
      ];
    }),
  );
}

function gaps({ study }: BoardContext): readonly Block[] {
  if (study.notEvaluated.length === 0) return [];
  return [
    caution(
      'Not evaluated for this board',
      ...study.notEvaluated.map(({ quantities, reason }) => [
        { strong: `${quantities.map((name) => quantityOf(name).title).join(', ')}: ` },
        reason,
      ]),
    ),
  ];
}

function concessions(context: BoardContext): readonly Block[] {
  const standings = concessionsFor(context);
  if (standings.length === 0) return [];
  return [
    caution(
      'Concessions: they change no status',
      ...standings.map((standing) => [
        { strong: `${standing.concession.number} for ${standing.concession.requirement}: ` },
        `${standing.concession.text} Granted ${standing.concession.granted} by ${standing.concession.approver}, holds until ${expiryText(standing)}.`,
        ...(standing.missed ? [] : [` ${sentence(WITHOUT_PURPOSE)}`]),
      ]),
    ),
  ];
}

const sentence = (words: string): string => `${words[0].toUpperCase()}${words.slice(1)}.`;

function outsideRange({ board, study }: BoardContext): readonly Block[] {
  const outside = study.flags.filter((flag) => flag.severity === 'outside');
  if (outside.length === 0) return [];
  return [
    caution(
      'Models used outside their stated range',
      ...outside.map((flag) => [{ strong: `${flag.model}: ` }, flag.text]),
      [
        'The engine accuracy in the uncertainty holds inside the range only. See ',
        link('Validity', boardPage(board.id), 'validity'),
        '.',
      ],
    ),
  ];
}

function assumptions({ board }: BoardContext): readonly Block[] {
  const concerns = concernsOf(board);
  if (concerns.length === 0) {
    return [prose('Every material and fabrication figure is guaranteed or measured and is used at its own frequency.')];
  }
  return [
    prose(
      { strong: 'Strongest assumptions. ' },
      'Figures that are typical, estimated or used outside their frequency, the strongest assumption first. A verdict is no better than these.',
    ),
    table(
      'assumptions',
      'Figures that are typical, estimated or used outside their frequency',
      ['Figure|1.4', '#Value|1.1', 'Why it is an assumption|2.4', 'Written in|1.8'],
      concerns.map(({ use, clauses }) => [
        cell(use.label),
        number(figureText(use)),
        cell(clauses.join('; ')),
        cell({ code: use.figure.path }),
      ]),
    ),
  ];
}

/** Which engine the figures of the columns come from; where there are none, or the network alone, a caution says so. */
function solvedBy({ board, study: { confirmation } }: BoardContext): readonly (readonly [string, ...Inline[]])[] {
  if (confirmation.kind === 'network only') return [];
  const at = confirmation.points.map(({ frequency }) => gigahertz(frequency)).join(', ');
  return [
    [
      'Columns solved by',
      `the full wave at ${at}, and by the network corrected to it everywhere else: `,
      link('Two engines', boardPage(board.id), 'engines'),
    ],
  ];
}

/** Page one of a dossier: what was found, against what, and what it rests on. */
export function verdictChapter(context: BoardContext): Chapter {
  const { board, verdict, judged } = context;
  const undecided = judged.filter(({ verdict: v }) => (v.calculated ?? v.status) === 'undecided');
  return chapter(
    'verdict',
    'Verdict',
    { kind: 'verdict', status: verdict.overall, content: [verdict.reason] },
    ...retunedNotice(board),
    ...sizedNotice(board),
    ...networkOnlyCaution(context),
    results(context),
    facts(
      'reading',
      ['Margin', 'distance of the worst value to its limit, positive inside'],
      [
        'Uncertainty',
        'how much smaller and how much larger the margin may be: engine accuracy, every declared tolerance and the band of the copper’s texture; parts in ',
        link('Uncertainty', boardPage(board.id), 'uncertainty'),
      ],
      [
        'Margin below uncertainty',
        undecided.length === 0
          ? 'none'
          : undecided.map(({ requirement }) => `${requirement.id} (${quantityTitle(requirement)})`).join('; '),
      ],
      ...solvedBy(context),
      ['Rule', 'how statuses follow from these: ', link('Definitions', DEFINITIONS, 'statuses')],
    ),
    ...concessions(context),
    ...gaps(context),
    ...outsideRange(context),
    caution('What is not modelled', ...NOT_MODELLED.map((line) => [line])),
    caution('What the figures are compared with', [COMPARED_WITH]),
    ...assumptions(context),
  );
}
