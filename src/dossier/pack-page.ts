import { quantityOf } from '../verdict/index.js';
import { caution, cell, chapter, facts, list, plainTable, prose, table } from './blocks.js';
import { changesChapter } from './changes-chapter.js';
import { cautionsChapter } from './chapter-record.js';
import { type BoardContext, boardContexts, documentNumber, type PackInput, page } from './context.js';
import { differencesBetween } from './differences.js';
import type { Block, Cell, Chapter, DocumentPage } from './document.js';
import { boardData, boardPdf, boardSuffix, boardTitle, PACK, PACK_DATA } from './links.js';
import { boardsByStatus, gapsOf, matrixCell, notEvaluatedOn, notEvaluatedText } from './matrix.js';
import {
  concessionsChapter,
  decisionChapter,
  openPointsChapter,
  revisionsChapter,
  signingChapter,
} from './review-chapters.js';
import { type RankedRequirement, rankedRequirements } from './standing.js';
import { count, limitText } from './values.js';

/** SHA-256 of the data files of a revision, by their path below its folder. */
export type DataHashes = ReadonlyMap<string, string>;

/** More columns than these are not read on upright A4. */
const MOST_STATUSES = 6;
const MOST_VALUES = 4;

/**
 * The document of the whole pack, to be signed: what changed, the verdicts, what was decided about them, and which
 * dossiers belong to it by the hash of their results. On paper only; its pages on screen are the overview and dossiers.
 */
export function packPage(input: PackInput, hashes: DataHashes): DocumentPage {
  const { pack } = input;
  const boards = boardContexts(input);
  return page(input, {
    id: PACK,
    kind: 'pack',
    title: pack.title,
    subtitle: `Revision ${pack.revision}, ${pack.status}: ${count(boards.length, 'board')} against ${count(pack.requirements.requirements.length, 'requirement')}`,
    chapters: [
      changesChapter(input, boards),
      verdictsChapter(input, boards),
      differencesChapter(boards),
      decisionChapter(input, boards),
      openPointsChapter(input),
      concessionsChapter(boards, input),
      dossiersChapter(input, boards, hashes),
      revisionsChapter(input),
      signingChapter(input),
      cautionsChapter(),
      statusesChapter(),
    ],
  });
}

function verdictsChapter({ pack }: PackInput, boards: readonly BoardContext[]): Chapter {
  const ranked = rankedRequirements(pack.requirements.requirements, boards);
  const groups = inGroups(boards, MOST_STATUSES);
  const gaps = boards.flatMap((board) => gapsOf(board, false));
  return chapter(
    'verdicts',
    'Verdicts',
    boardsByStatus(boards),
    facts('counts', ['Not evaluated', notEvaluatedText(boards, 'below the table')]),
    ...groups.map((group, i) => matrix(group, ranked, numbered('matrix', i), partOf(i, groups.length))),
    ...(gaps.length === 0 ? [] : [caution('Not evaluated', ...gaps)]),
  );
}

/** Requirements down, boards across: status and worst margin. */
function matrix(
  boards: readonly BoardContext[],
  ranked: readonly RankedRequirement[],
  id: string,
  part: string,
): Block {
  const line = (name: string, of: (board: BoardContext) => Cell): readonly Cell[] => [
    cell({ strong: name }),
    ...boards.map(of),
  ];
  return plainTable(
    id,
    `Status and worst margin of every requirement, worst first${part}`,
    [{ title: 'Requirement', width: 1.6 }, ...boards.map(({ board }) => ({ title: board.id }))],
    [
      line('Overall', (board) => cell({ status: board.verdict.overall })),
      ...ranked.map(({ requirement }) => {
        const unit = requirement.unit ?? quantityOf(requirement.quantity).unit;
        const target = requirement.weight === 'target' ? ' (target)' : '';
        return [
          cell({ strong: requirement.id }, ` ${limitText(requirement, unit)}${target}`),
          ...boards.map((board) => matrixCell(board, requirement.id)),
        ];
      }),
      line('Not evaluated', (board) => cell(String(notEvaluatedOn(board)))),
    ],
  );
}

function differencesChapter(boards: readonly BoardContext[]): Chapter {
  const found = differencesBetween(boards.map(({ board }) => board));
  const columns = inGroups(
    boards.map((_, i) => i),
    MOST_VALUES,
  );
  const blocks =
    found.length === 0
      ? [
          prose(
            boards.length < 2
              ? 'The pack holds a single board.'
              : 'The boards do not differ in any field that changes a result.',
          ),
        ]
      : columns.map((group, n) =>
          plainTable(
            numbered('difference-table', n),
            `Fields in which the boards differ${partOf(n, columns.length)}`,
            [{ title: 'Field', width: 1.3 }, ...group.map((i) => ({ title: boards[i].board.id }))],
            found.map(({ label, values }) => [cell(label), ...group.map((i) => cell(values[i]))]),
          ),
        );
  return chapter('differences', 'What differs between the boards', ...blocks);
}

function dossiersChapter(
  { pack, programVersion }: PackInput,
  boards: readonly BoardContext[],
  hashes: DataHashes,
): Chapter {
  const hashOf = (file: string): string => {
    const hash = hashes.get(file);
    if (hash === undefined) throw new RangeError(`no hash of ${file}`);
    return hash;
  };
  return chapter(
    'dossiers',
    'Contents of the pack',
    table(
      'dossier-table',
      'Dossiers that belong to this pack, with the SHA-256 of their results',
      ['Dossier|1.6', 'Document number, file', 'Results, SHA-256|2'],
      boards.map(({ board }) => [
        cell(boardTitle(board)),
        cell(documentNumber(pack, boardSuffix(board.id)), ', ', { code: boardPdf(board.id).replace(/^pdf\//, '') }),
        cell({ code: boardData(board.id) }, ' ', { code: hashOf(boardData(board.id)) }),
      ]),
    ),
    facts(
      'record',
      ['Requirement set', `${pack.requirements.title}, `, { code: pack.requirements.file }],
      ['Program', `boardcase ${programVersion}`],
      ['Verdicts of all boards', { code: PACK_DATA }, ', SHA-256 ', { code: hashOf(PACK_DATA) }],
    ),
  );
}

const statusesChapter = (): Chapter =>
  chapter(
    'statuses',
    'Statuses in short',
    list([
      [
        { status: 'meets' },
        ': inside the limit under every estimate of the copper’s texture and with the whole adverse uncertainty.',
      ],
      [{ status: 'undecided' }, ': the margin is below the uncertainty.'],
      [
        { status: 'misses' },
        ': outside the limit under every estimate of the copper’s texture and with the whole favourable uncertainty.',
      ],
      [{ status: 'not evaluated' }, ': no value, with the reason; never read as meets.'],
      [{ status: 'open until measured' }, ': a test decides; the calculation stands beside it.'],
      [{ status: 'incomplete' }, ': of a board, a binding requirement is not evaluated.'],
    ]),
    prose(
      'A concession stands beside a missed requirement and changes no status. Full definitions are on the page Definitions.',
    ),
  );

/** As few groups as fit, of as equal sizes as can be. */
export function inGroups<T>(items: readonly T[], most: number): readonly (readonly T[])[] {
  const groups = Math.ceil(items.length / most);
  return Array.from({ length: groups }, (_, i) =>
    items.slice(Math.round((i * items.length) / groups), Math.round(((i + 1) * items.length) / groups)),
  );
}

const numbered = (id: string, index: number): string => (index === 0 ? id : `${id}-${index + 1}`);
const partOf = (index: number, parts: number): string => (parts === 1 ? '' : `, part ${index + 1} of ${parts}`);
