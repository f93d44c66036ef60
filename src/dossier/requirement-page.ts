import type { Requirement } from '../manifest/model.js';
import { formatNumber } from '../quantity/index.js';
import { quantityOf, quantityTitle } from '../verdict/index.js';
import { caution, cell, chapter, facts, number, prose, table } from './blocks.js';
import { cautionsChapter } from './chapter-record.js';
import { marginCell, statusInline, uncertaintyCell, valueCell, whereCell } from './chapter-verdict.js';
import { type BoardContext, type Judged, judgedOn, type PackInput, page } from './context.js';
import type { Block, DocumentPage, Inline } from './document.js';
import { boardPage, boardTitle, DEFINITIONS, link, OVERVIEW, requirementPage } from './links.js';
import { standing } from './standing.js';
import { COMPARED_WITH, NOT_MODELLED } from './statements.js';
import { bandText, limitText, statedNumber, temperatureText } from './values.js';

const DEGREES = 180 / Math.PI;

function maskTable({ mask = [] }: Requirement): readonly Block[] {
  if (mask.length === 0) return [];
  return [
    table(
      'mask',
      'Mask: highest level allowed, relative to the maximum of the cut',
      ['Piece', '#From', '#To', '#Level'],
      mask.map((piece, i) => [
        cell(String(i + 1)),
        number(`${statedNumber(piece.from * DEGREES, 3)}°`),
        number(`${statedNumber(piece.to * DEGREES, 3)}°`),
        number(`${formatNumber(piece.levelDb, 1)} dB`),
      ]),
    ),
  ];
}

function conditionText({ condition }: Requirement): string {
  const band = condition.band === undefined ? 'operating band of each board' : bandText(condition.band);
  const temperature =
    condition.temperature === undefined ? 'temperature range of each board' : temperatureText(condition.temperature);
  return `${band}; ${temperature}`;
}

interface Row {
  readonly context: BoardContext;
  readonly entry: Judged;
}

/** Worst standing first; boards without a value before all. */
function rowsOf(requirement: Requirement, boards: readonly BoardContext[]): readonly Row[] {
  const rows = boards.map((context) => {
    const entry = judgedOn(context, requirement.id);
    return { context, entry, at: standing(entry.verdict) ?? Number.NEGATIVE_INFINITY };
  });
  return rows.sort((a, b) => (a.at === b.at ? 0 : a.at < b.at ? -1 : 1));
}

function verificationText({ verification, testMethod }: Requirement): readonly Inline[] {
  if (verification === 'calculation') return ['by calculation'];
  return [
    `by test${testMethod === undefined ? '' : `: ${testMethod}`}; `,
    { status: 'open until measured' },
    ' whatever the calculation says',
  ];
}

export function requirementPageOf(
  input: PackInput,
  requirement: Requirement,
  boards: readonly BoardContext[],
): DocumentPage {
  const quantity = quantityOf(requirement.quantity);
  const rows = rowsOf(requirement, boards);
  const unit = rows.find(({ entry }) => entry.verdict.unit !== '')?.entry.verdict.unit ?? quantity.unit;
  return page(input, {
    id: requirementPage(requirement.id),
    kind: 'requirement',
    title: `Requirement ${requirement.id}`,
    subtitle: quantityTitle(requirement),
    chapters: [
      chapter(
        'requirement',
        'Requirement',
        prose(requirement.text),
        facts(
          'requirement-facts',
          ['Quantity', quantityTitle(requirement)],
          ['Defined as', quantity.definition, ' ', link('Definitions', DEFINITIONS)],
          ['Limit', limitText(requirement, unit)],
          ['Condition', conditionText(requirement)],
          ['Weight', requirement.weight === 'binding' ? 'binding' : 'target: shown, does not decide'],
          ['Source', requirement.source],
          ['Verification', ...verificationText(requirement)],
        ),
        ...maskTable(requirement),
      ),
      chapter(
        'boards',
        'Boards',
        table(
          'board-results',
          'Worst value of every board over the condition, the smallest margin over uncertainty first',
          ['Board|1.4', '#Worst value|1.2', 'Where|1.2', '#Margin', '#Uncertainty (against / for)|1.3', 'Status|1.3'],
          rows.map(({ context, entry }) => [
            cell(link(boardTitle(context.board), boardPage(context.board.id))),
            valueCell(entry, context.study),
            whereCell(entry),
            marginCell(entry),
            uncertaintyCell(entry),
            cell(...statusInline(entry)),
          ]),
        ),
        prose('Parts of each uncertainty are in the dossiers. ', link('All requirements', OVERVIEW), '.'),
        caution('What is not modelled', ...NOT_MODELLED.map((line) => [line])),
        caution('What the figures are compared with', [COMPARED_WITH]),
      ),
      cautionsChapter(),
    ],
  });
}
