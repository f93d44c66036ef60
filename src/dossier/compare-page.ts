import { formatNumber } from '../quantity/index.js';
import { quantityOf } from '../verdict/index.js';
import { cell, chapter, DASH, figureBlock, list, number, plainTable, prose, table } from './blocks.js';
import { cautionsChapter } from './chapter-record.js';
import { marginCell, statusInline, valueCell } from './chapter-verdict.js';
import { copperComparison } from './compare-copper.js';
import { type BoardContext, bandPoints, type Judged, judgedOn, type PackInput, page } from './context.js';
import { differencesBetween } from './differences.js';
import type { Block, Cell, Chapter, DocumentPage, Inline } from './document.js';
import { gainBudget } from './gain-budget.js';
import { boardPage, boardTitle, comparePage, link, requirementPage } from './links.js';
import { engineTag } from './network-only.js';
import { celsius, changeText, count, GAP, gigahertz, limitText, rounded, valueText } from './values.js';

type Pair = readonly [BoardContext, BoardContext];
const ids = ([a, b]: Pair): readonly [string, string] => [a.board.id, b.board.id];

function standingOf({ board, verdict }: BoardContext): readonly Inline[] {
  return [link(boardTitle(board), boardPage(board.id)), ' ', { status: verdict.overall }, ` ${verdict.reason}`];
}

function summaryChapter(pair: Pair): Chapter {
  const [a, b] = pair;
  const fields = differencesBetween([a.board, b.board]).length;
  const flipped = a.judged.filter(
    ({ requirement, verdict }) => judgedOn(b, requirement.id).verdict.status !== verdict.status,
  );
  const statuses: readonly Inline[] =
    flipped.length === 0
      ? ['Every requirement has the same status on both.']
      : [
          'Their status differs on ',
          ...flipped.flatMap(({ requirement }, i): Inline[] => [
            ...(i === 0 ? [] : [', ']),
            link(requirement.id, requirementPage(requirement.id)),
          ]),
          '.',
        ];
  return chapter(
    'comparison',
    'Comparison',
    list([standingOf(a), standingOf(b)]),
    prose(
      fields === 0
        ? 'The boards do not differ in any field that changes a result. '
        : `The boards differ in ${count(fields, 'field')}. `,
      ...statuses,
    ),
  );
}

function fieldsChapter(pair: Pair): Chapter {
  const [a, b] = pair;
  const found = differencesBetween([a.board, b.board]);
  const block =
    found.length === 0
      ? prose('None.')
      : plainTable(
          'fields-table',
          'Fields in which the two boards differ',
          [{ title: 'Field', width: 1.3 }, { title: boardTitle(a.board) }, { title: boardTitle(b.board) }],
          found.map(({ label, values }) => [cell(label), ...values.map((value) => cell(value))]),
        );
  return chapter('fields', 'What differs', block);
}

/** Margin of the second board less that of the first; a dash where one has none. */
function marginChange(a: Judged, b: Judged): Cell {
  const [from, to] = [a.verdict.margin, b.verdict.margin];
  return from === undefined || to === undefined ? cell(DASH) : number(changeText(to - from, b.verdict.unit));
}

function verdictsChapter(pair: Pair): Chapter {
  const [a, b] = pair;
  const [first, second] = ids(pair);
  return chapter(
    'verdicts',
    'Verdicts side by side',
    plainTable(
      'verdicts-table',
      'Worst value, margin and status of both boards; a positive change is on the side of the second board',
      [
        { title: 'Requirement' },
        { title: 'Limit', width: 0.9 },
        { title: `${first}: worst value`, numeric: true, width: 1.1 },
        { title: `${second}: worst value`, numeric: true, width: 1.1 },
        { title: `${first}: margin`, numeric: true },
        { title: `${second}: margin`, numeric: true },
        { title: 'Change of margin', numeric: true },
        { title: `${first}: status`, width: 1.2 },
        { title: `${second}: status`, width: 1.2 },
      ],
      a.judged.map((entry) => {
        const { requirement } = entry;
        const other = judgedOn(b, requirement.id);
        return [
          cell(
            link(requirement.id, requirementPage(requirement.id)),
            requirement.weight === 'target' ? ' (target)' : '',
          ),
          cell(limitText(requirement, entry.verdict.unit)),
          valueCell(entry, a.study),
          valueCell(other, b.study),
          marginCell(entry),
          marginCell(other),
          marginChange(entry, other),
          cell(...statusInline(entry)),
          cell(...statusInline(other)),
        ];
      }),
    ),
    prose(
      'Margins carry the uncertainty that the dossiers print in parts. Much of it is common to both boards, so a change of margin is known better than each margin; how much better is not evaluated.',
    ),
  );
}

const level = (value: number): string => `${formatNumber(value, 2)}${GAP}dBi`;
const change = (value: number): string => `${formatNumber(value, 2, { plus: true })}${GAP}dB`;

function budgetChapter(pair: Pair): Chapter {
  const [a, b] = pair;
  const [first, second] = ids(pair);
  const [one, two] = [bandPoints(a)?.centre, bandPoints(b)?.centre];
  if (one === undefined || two === undefined) {
    const without = [a, b].filter((context) => bandPoints(context) === undefined).map(({ board }) => board.id);
    return chapter('budget', 'Gain budget side by side', prose(`Nothing was computed for ${without.join(' and ')}.`));
  }
  const [from, to] = [gainBudget(one), gainBudget(two)];
  // Only columns with terminations have a step of their loads: the other board loses nothing there.
  const changeOf = (budget: typeof from, label: string): number =>
    budget.steps.find((step) => step.label === label)?.change ?? 0;
  const longest = from.steps.length < to.steps.length ? to : from;
  const steps = longest.steps.map(({ label }) => ({ label, from: changeOf(from, label), to: changeOf(to, label) }));
  const largest = steps.reduce((x, y) => (Math.abs(y.to - y.from) > Math.abs(x.to - x.from) ? y : x));
  const gained = to.realizedGain - from.realizedGain;
  const row = (label: string, print: (value: number) => string, x: number, y: number): readonly Cell[] => [
    cell(label),
    number(print(x)),
    number(print(y)),
    number(change(y - x)),
  ];
  return chapter(
    'budget',
    'Gain budget side by side',
    prose(
      `At the band centre ${second} has ${formatNumber(Math.abs(gained), 2)}${GAP}dB ${gained < 0 ? 'less' : 'more'} realized gain than ${first}; `,
      `${formatNumber(Math.abs(to.directivity - from.directivity), 2)}${GAP}dB ${to.directivity < from.directivity ? 'less' : 'more'} directivity. `,
      `The largest difference between the losses is ${largest.label.toLowerCase()} with ${change(largest.to - largest.from)}.`,
    ),
    table(
      'budget-table',
      `From directivity to realized gain: ${first} at ${gigahertz(one.frequency)}, ${celsius(one.temperatureC)}; ${second} at ${gigahertz(two.frequency)}, ${celsius(two.temperatureC)}`,
      ['Step|2', `#${first}`, `#${second}`, '#Difference'],
      [
        row('Directivity', level, from.directivity, to.directivity),
        ...steps.map((step) => row(step.label, change, step.from, step.to)),
        row('Realized gain', level, from.realizedGain, to.realizedGain),
      ],
    ),
  );
}

const CURVES = [
  { quantity: 'realized_gain', id: 'gain-curves', name: 'Realized gain', axis: 'Realized gain (dBi)', worst: 'lowest' },
  {
    quantity: 'reflection',
    id: 'match-curves',
    name: 'Passive reflection of the worst column',
    axis: 'Reflection (dB)',
    worst: 'largest',
  },
] as const;

/** Both boards over frequency at their nominal temperature. */
function curvesFigure(pair: Pair, kind: (typeof CURVES)[number]): readonly Block[] {
  const { unit, at } = quantityOf(kind.quantity);
  const found = pair.map((context) => {
    const points = (bandPoints(context)?.nominal ?? []).flatMap((point) => {
      const value = at(point, { requirement: {}, board: context.board });
      return 'value' in value ? [{ frequency: point.frequency, value: value.value }] : [];
    });
    return { context, points };
  });
  if (found.some(({ points }) => points.length === 0)) return [];
  const worst = found.map(({ context, points }) => {
    const point = points.reduce((x, y) => ((kind.worst === 'lowest') === y.value < x.value ? y : x));
    return `${valueText(point.value, unit)} at ${gigahertz(point.frequency)} for ${context.board.id}${engineTag(context.study)}`;
  });
  const [{ judged, board }] = pair;
  const limits = judged
    .map(({ requirement }) => requirement)
    .filter((r) => r.quantity === kind.quantity && r.limit !== undefined)
    .map((r) => ({
      label: `${r.id}: ${limitText(r, unit)}`,
      level: r.limit?.value ?? Number.NaN,
      from: rounded((r.condition.band ?? board.band).low / 1e9, 4),
      to: rounded((r.condition.band ?? board.band).high / 1e9, 4),
      forbidden: r.limit?.direction === 'at_least' ? ('below' as const) : ('above' as const),
    }));
  return [
    figureBlock({
      id: kind.id,
      title: `${kind.name} over frequency at nominal temperature, both boards`,
      reading: `The ${kind.worst} value is ${worst.join(' and ')}.`,
      alt: `${kind.axis} over frequency, one line per board${limits.length === 0 ? '' : `; limit lines ${limits.map((l) => l.label).join(', ')}`}.`,
      content: {
        chart: 'lines',
        xTitle: 'Frequency (GHz)',
        yTitle: kind.axis,
        series: found.map(({ context, points }, i) => ({
          label: `${context.board.id}${engineTag(context.study)}`,
          ...(i === 0 ? { emphasis: true } : {}),
          points: points.map((p) => [rounded(p.frequency / 1e9, 4), rounded(p.value, 3)] as const),
        })),
        limits,
      },
    }),
  ];
}

/** Two boards side by side: what differs, and what follows from it. */
export function comparisonPage(input: PackInput, pair: Pair): DocumentPage {
  const [first, second] = ids(pair);
  const curves = CURVES.flatMap((kind) => curvesFigure(pair, kind));
  return page(input, {
    id: comparePage(first, second),
    kind: 'compare',
    title: `${first} and ${second} compared`,
    subtitle: `Verdicts: ${first} ${pair[0].verdict.overall}, ${second} ${pair[1].verdict.overall}`,
    chapters: [
      summaryChapter(pair),
      fieldsChapter(pair),
      verdictsChapter(pair),
      budgetChapter(pair),
      ...copperComparison(pair),
      ...(curves.length === 0 ? [] : [chapter('curves', 'Over frequency', ...curves)]),
      cautionsChapter(),
    ],
  });
}
