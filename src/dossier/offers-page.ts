import { type AskedItem, askedItems, askedWords } from '../manifest/index.js';
import type { Board } from '../manifest/model.js';
import type { Procurement, Recipient } from '../manifest/procurement-model.js';
import type { RoughnessSide } from '../study/results.js';
import {
  ALLOWANCE_REACH,
  type AllowanceOutcome,
  type AllowanceResult,
  type BoardVerdict,
  type Offer,
  type ProcurementResults,
  type RequirementVerdict,
} from '../verdict/index.js';
import { caution, cell, chapter, list, number, prose, table } from './blocks.js';
import { cautionsChapter } from './chapter-record.js';
import { type PackInput, page } from './context.js';
import type { Block, Cell, Chapter, DocumentPage, Inline } from './document.js';
import { micrometres } from './figures.js';
import { boardPage, boardTitle, fileLink, link, OFFERS, requirementPage } from './links.js';
import { modelTitle, sideTitle } from './model-words.js';
import { answeredRows, answeredWords } from './offer-rows.js';
import { freeText, inUnit, towardsNominal, unitBehind } from './supplier-limits.js';
import { KIND_WORDS, PARAMETER_WORDS } from './supplier-words.js';
import { count, marginText, statedNumber, valueText } from './values.js';

/** The page of the suppliers: what was asked of whom, how far each item may go, and what came back. Stays inside. */
export function offersPage(input: PackInput): DocumentPage | undefined {
  const { pack, procurement: results } = input;
  const { procurement } = pack;
  if (!procurement || !results) return undefined;
  const answered = procurement.recipients.filter(({ answers }) => answers !== undefined);
  return page(input, {
    id: OFFERS,
    kind: 'offers',
    title: 'Suppliers: asked and offered',
    subtitle: `RFQ ${procurement.rfqNumber}, reply by ${procurement.replyDate}: ${count(procurement.recipients.length, 'sheet')}, ${answered.length} answered`,
    suffix: 'SUPPLIERS',
    chapters: [
      askedChapter(procurement),
      allowanceChapter(input, procurement, results),
      ...answered.map((recipient) =>
        offerChapter(
          input,
          procurement,
          recipient,
          results.offers.find(({ recipientId }) => recipientId === recipient.id),
        ),
      ),
      cautionsChapter(),
    ],
  });
}

function askedChapter({ recipients }: Procurement): Chapter {
  return chapter(
    'asked',
    'What is asked of whom',
    prose(
      'Each sheet is built from the fields allowed for its kind of recipient and names no board, no other supplier and no figure of the antenna. Only the sheets may be sent; this page stays inside.',
    ),
    table(
      'recipients',
      'Recipients and their sheets',
      ['Recipient|1.4', 'Kind', 'Boards|1.2', 'Materials|1.2', 'Sheet|1.4', 'Answer'],
      recipients.map(({ id, name, kind, boards, materials, answers }) => [
        cell(name),
        cell(KIND_WORDS[kind]),
        cell(...boards.flatMap((board, i): Inline[] => [...(i === 0 ? [] : [', ']), link(board, boardPage(board))])),
        cell(materials.length === 0 ? '–' : materials.join(', ')),
        cell(
          fileLink('page', `supplier/${id}.html`),
          ', ',
          fileLink('PDF', `pdf/supplier-${id}.pdf`),
          ', ',
          fileLink('table', `supplier/${id}.csv`),
        ),
        answers === undefined ? cell('none yet') : cell({ code: answers.file }),
      ]),
    ),
  );
}

function allowanceChapter({ pack }: PackInput, procurement: Procurement, { allowances }: ProcurementResults): Chapter {
  const items = procurement.recipients.flatMap((recipient) => askedItems(recipient, pack.boards, procurement));
  const searched = pack.boards.filter((board) => allowances.has(board.id));
  return chapter(
    'allowances',
    'How far each item may go',
    prose(
      'The worst value of an item, moved alone, at which the first binding requirement stops meeting. The moved item takes the place of its own tolerance: its effect and what else is uncertain (engine accuracy, the other tolerances) combine by root sum of squares against the margin at nominal, as in the verdict. ',
      'Evaluated at both band edges and the centre, at the lowest, nominal and highest temperature; found to two percent of the distance from nominal and given on the side that still meets. A requirement that fails and recovers between two steps of the search is not seen.',
    ),
    ...(searched.length === 0
      ? [prose('No board that something is asked for has a binding, computed requirement.')]
      : searched.map((board) => allowanceTable(board, allowances.get(board.id) ?? [], items))),
    ...ceilingCaution(searched.flatMap((board) => allowances.get(board.id) ?? [])),
    caution('How far the search goes', [
      Object.entries(ALLOWANCE_REACH)
        .map(([parameter, { words }]) => `${PARAMETER_WORDS[parameter as keyof typeof ALLOWANCE_REACH].what}: ${words}`)
        .join('; '),
      '.',
    ]),
  );
}

/** The model behind the nominal figures may tell no foils apart; then no limit on a texture is its word. */
function ceilingCaution(results: readonly AllowanceResult[]): readonly Block[] {
  const ceilings = results.flatMap(({ ceiling }) => ceiling ?? []);
  if (ceilings.length === 0) return [];
  const { model, from } = ceilings.reduce((a, b) => (b.from < a.from ? b : a));
  return [
    caution('No limit from a saturated model', [
      `The analysis names ${modelTitle(model)}, which tells no foils apart from an Rq of ${micrometres(from)}. It was not used for any limit here: limits on textures come from the low, middle and high estimate.`,
    ]),
  ];
}

const SIDES: readonly RoughnessSide[] = ['low', 'middle', 'high'];

function allowanceTable(board: Board, results: readonly AllowanceResult[], items: readonly AskedItem[]): Block {
  const failing = results.flatMap(({ sides }) =>
    sides.map(({ outcome }) => (outcome.kind === 'not met at nominal' ? outcome.requirementIds : undefined)),
  );
  if (failing.every((ids) => ids !== undefined)) {
    return prose(
      link(boardTitle(board), boardPage(board.id)),
      ': already not met at nominal (',
      ...requirementLinks([...new Set(failing.flat())]),
      '), under every estimate of the copper’s texture, so that no item has an allowance.',
    );
  }
  return table(
    `allowances-${board.id}`,
    `Calculated allowances of ${boardTitle(board)}, under each estimate of the copper’s texture, with the requirement that stops meeting first`,
    ['Item|1.8', 'Direction|0.8', '#Nominal', ...SIDES.map((side) => `${sideTitle(side)}|1.3`)],
    results.map(({ path, parameter, direction, nominal, sides }) => {
      const item = items.find(({ figures }) => figures.some((f) => f.board === board.id && f.path === path))!;
      const measured = { ...item, nominal };
      const under = (side: RoughnessSide) => outcomeCell(sides.find((s) => s.side === side)!.outcome, measured);
      return [
        cell(PARAMETER_WORDS[parameter].what, ...(item.layer === undefined ? [] : [`, ${item.layer}`])),
        cell(direction),
        number(withUnit(statedNumber(inUnit(measured, nominal)), measured)),
        ...SIDES.map(under),
      ];
    }),
  );
}

const withUnit = (text: string, item: AskedItem): string => text + unitBehind(item);

function outcomeCell(outcome: AllowanceOutcome, item: AskedItem): Cell {
  switch (outcome.kind) {
    case 'limited':
      return cell(
        withUnit(towardsNominal(item, outcome.permitted), item),
        ' (',
        link(outcome.requirementId, requirementPage(outcome.requirementId)),
        ')',
      );
    case 'not limited':
      return cell(freeText(item, outcome.searchedTo));
    case 'not met at nominal':
      return cell('already not met at nominal (', ...requirementLinks(outcome.requirementIds), ')');
  }
}

const requirementLinks = (ids: readonly string[]): readonly Inline[] =>
  ids.flatMap((id, i): Inline[] => [...(i === 0 ? [] : [', ']), link(id, requirementPage(id))]);

function offerChapter(
  { pack, procurement: results }: PackInput,
  procurement: Procurement,
  recipient: Recipient,
  offer: Offer | undefined,
): Chapter {
  const items = askedItems(recipient, pack.boards, procurement);
  const words = askedWords(recipient, pack.boards, pack.requirements.requirements, procurement);
  const { name, answers } = recipient;
  const rows = answeredRows(items, answers!.rows, results!.allowances);
  const moved = (offer?.boards ?? []).flatMap(changes);
  return chapter(
    `offer-${recipient.id}`,
    `Offer of ${name}`,
    prose('Read from ', { code: answers!.file }, '. Ranges are compared with the limits that this build asks.'),
    table(
      `offered-${recipient.id}`,
      `Offered against asked, ${name}`,
      ['Item|1.5', 'Asked|1.4', 'Guaranteed|1.2', '#Typical', 'Alternative|1.2', 'Method|1.4', 'Outcome|1.5'],
      rows,
    ),
    ...(words.length === 0
      ? []
      : [
          table(
            `declared-${recipient.id}`,
            `Declared by ${name}`,
            ['Item', 'Asked|2.4', 'Declared|2', 'Method or document|1.4'],
            answeredWords(words, answers!.rows),
          ),
        ]),
    ...(offer === undefined || offer.boards.length === 0
      ? [prose('Nothing offered changes a figure, so the verdicts stand as they are.')]
      : [
          prose(
            'The boards below were studied and judged again with the offered figures in place of those assumed: a guaranteed range replaces the spread, and its typical value, where given, the nominal one. Everything else stays. ',
            moved.length === 0 ? 'No status changes.' : '',
          ),
          ...(moved.length === 0 ? [] : [list(moved)]),
          ...offer.boards.map((pair) => beforeAfter(recipient, pair)),
        ]),
  );
}

type Pair = { readonly before: BoardVerdict; readonly after: BoardVerdict };

const after = ({ after: verdict }: Pair, id: string): RequirementVerdict =>
  verdict.requirements.find(({ requirementId }) => requirementId === id)!;

/** What flips, one line each. */
function changes(pair: Pair): readonly (readonly Inline[])[] {
  const { before } = pair;
  const line = (what: readonly Inline[], from: Inline, to: Inline): readonly Inline[] => [
    link(before.boardId, boardPage(before.boardId)),
    ', ',
    ...what,
    ': ',
    from,
    ' becomes ',
    to,
  ];
  const overall =
    before.overall === pair.after.overall
      ? []
      : [line(['overall'], { status: before.overall }, { status: pair.after.overall })];
  const each = before.requirements.flatMap((verdict) => {
    const now = after(pair, verdict.requirementId);
    const shown = ({ calculated, status }: RequirementVerdict) => calculated ?? status;
    if (shown(now) === shown(verdict)) return [];
    return [
      line(
        [link(verdict.requirementId, requirementPage(verdict.requirementId))],
        { status: shown(verdict) },
        { status: shown(now) },
      ),
    ];
  });
  return [...overall, ...each];
}

function beforeAfter({ id, name }: Recipient, pair: Pair): Block {
  const { before } = pair;
  const figures = (verdict: RequirementVerdict): readonly Cell[] => [
    cell({ status: verdict.status }),
    verdict.value === undefined ? cell('–') : number(valueText(verdict.value, verdict.unit)),
    verdict.margin === undefined ? cell('–') : number(marginText(verdict.margin, verdict.unit)),
  ];
  return table(
    `judged-${id}-${before.boardId}`,
    `${before.boardId}, status before and with the offer of ${name}`,
    ['Requirement|1.2', 'Before|1.1', '#Worst value', '#Margin', 'With the offer|1.1', '#Worst value', '#Margin'],
    before.requirements.map((verdict) => [
      cell(link(verdict.requirementId, requirementPage(verdict.requirementId))),
      ...figures(verdict),
      ...figures(after(pair, verdict.requirementId)),
    ]),
  );
}
