import { cell, chapter, DASH, facts, number, prose, table } from './blocks.js';
import { type Changes, changesBetween, type Flip, type ListChange, type Move, type Stand } from './changes.js';
import type { BoardContext, PackInput } from './context.js';
import { packFile } from './data.js';
import type { Block, Cell, Chapter, Inline, Status } from './document.js';
import { boardPage, link, requirementPage } from './links.js';
import type { RevisionData } from './previous.js';
import { changePair, count, marginText, valueText } from './values.js';

/** What changed since the revision before: the first thing that the overview and the document of the pack say. */
export function changesChapter(input: PackInput, boards: readonly BoardContext[]): Chapter {
  const { previous } = input;
  if (previous === undefined) {
    return chapter('changes', 'What changed', prose('No previous revision.'));
  }
  const { revision, date, status } = previous.data.pack;
  const changes = changesBetween(previous.data, packFile(input, boards));
  return chapter(
    'changes',
    `What changed since revision ${revision}`,
    prose(`Compared with revision ${revision} of ${date} (${status}).`),
    summary(changes),
    ...flipTable(changes.flips, boards),
    ...moveTable(changes.moved),
  );
}

function summary(changes: Changes): Block {
  const { flips, moved, within, unchanged, notComparable, programVersion } = changes;
  const figures = [
    `${moved.length === 0 ? 'none' : moved.length} moved beyond the uncertainty`,
    `${within} within it`,
    `${unchanged} unchanged`,
    ...(notComparable === 0 ? [] : [`${notComparable} that cannot be compared`]),
  ];
  return facts(
    'change-facts',
    ['Verdicts', flips.length === 0 ? 'none flipped' : `${count(flips.length, 'verdict')} flipped`],
    ['Figures', figures.join(', ')],
    ['Boards', ...listText(changes.boards)],
    ['Requirements', ...listText(changes.requirements)],
    ['Input files', ...listText(changes.inputs, (code) => ({ code }))],
    [
      'Program',
      programVersion.from === programVersion.to
        ? `boardcase ${programVersion.to}, the same`
        : `boardcase ${programVersion.from} before, ${programVersion.to} now`,
    ],
  );
}

function listText(change: ListChange, word: (name: string) => Inline = (name) => name): readonly Inline[] {
  const parts = (['added', 'removed', 'changed'] as const).filter((kind) => change[kind].length > 0);
  if (parts.length === 0) return ['the same'];
  return parts.flatMap((kind, n): readonly Inline[] => [
    `${n === 0 ? '' : '; '}${kind}: `,
    ...change[kind].flatMap((name, i) => (i === 0 ? [word(name)] : [', ', word(name)])),
  ]);
}

const STATUSES: ReadonlySet<string> = new Set<Status>([
  'meets',
  'undecided',
  'misses',
  'not evaluated',
  'open until measured',
  'incomplete',
]);

/** Data of an older program may know a status that this one does not. */
const isStatus = (text: string): text is Status => STATUSES.has(text);

const standCell = ({ status, calculated }: Stand): Cell =>
  cell(isStatus(status) ? { status } : status, ...(calculated === undefined ? [] : [` (calculated: ${calculated})`]));

function flipTable(flips: readonly Flip[], boards: readonly BoardContext[]): readonly Block[] {
  if (flips.length === 0) return [];
  const order = new Map(boards.map(({ board }, i) => [board.id, i]));
  const sorted = [...flips].sort((a, b) => (order.get(a.boardId) ?? 0) - (order.get(b.boardId) ?? 0));
  return [
    table(
      'flips',
      'Verdicts that flipped',
      ['Board', 'Requirement|1.4', 'Before', 'Now'],
      sorted.map(({ boardId, requirementId, from, to }) => [
        cell(link(boardId, boardPage(boardId))),
        requirementId === undefined ? cell('overall') : cell(link(requirementId, requirementPage(requirementId))),
        standCell(from),
        standCell(to),
      ]),
    ),
  ];
}

type Verdict = RevisionData['verdicts'][number];
const worst = ({ value, unit }: Verdict): Cell =>
  value === null ? cell(DASH) : { content: [valueText(value, unit)], numeric: typeof value === 'number' };
const uncertainty = ({ adverse, favourable, unit }: Verdict): Cell => {
  if (adverse === null || favourable === null) return cell(DASH);
  // Only what a document declares has none.
  return adverse === 0 && favourable === 0 ? number('as declared') : number(changePair(-adverse, favourable, unit));
};

function moveTable(moved: readonly Move[]): readonly Block[] {
  if (moved.length === 0) return [];
  return [
    table(
      'moves',
      'Worst values that moved beyond their uncertainty',
      [
        'Board',
        'Requirement|1.2',
        '#Before',
        '#Now',
        '#Margin changed by',
        '#Uncertainty before (against / for)',
        '#Uncertainty now (against / for)',
      ],
      moved.map(({ before, now, change }) => [
        cell(link(now.boardId, boardPage(now.boardId))),
        cell(link(now.requirementId, requirementPage(now.requirementId))),
        worst(before),
        worst(now),
        change === undefined ? cell(DASH) : number(marginText(change, now.unit)),
        uncertainty(before),
        uncertainty(now),
      ]),
    ),
    prose(
      'A figure is listed when the worst value of one revision lies outside the interval that the other states around its own.',
    ),
  ];
}
