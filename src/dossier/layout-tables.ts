import type { Board, ColumnLayout, Link } from '../manifest/model.js';
import { cell, DASH, number, prose, table } from './blocks.js';
import type { Block, Cell } from './document.js';
import { micrometres } from './figures.js';
import { statedNumber } from './values.js';

const inMillimetres = (metres: number): string => statedNumber(metres * 1e3, 4);

/** What makes two columns alike: all but where they stand, which way they run and whether they are driven. */
const sameLayout = (a: ColumnLayout, b: ColumnLayout): boolean => {
  const form = ({ feedLine, patches, links, matching, inset, termination, sideFeed }: ColumnLayout) =>
    JSON.stringify([feedLine, patches, links, matching, inset, termination, sideFeed]);
  return form(a) === form(b);
};

export const distinctLayouts = (columns: readonly ColumnLayout[]): readonly ColumnLayout[] =>
  columns.filter((column, i) => columns.findIndex((c) => sameLayout(c, column)) === i);

/** What the table of patches cannot say, in words. */
function formWords({ matching = [], inset, termination, sideFeed }: ColumnLayout): readonly string[] {
  return [
    ...(matching.length > 0 ? ['Reflections are taken where the matching sections begin.'] : []),
    ...(inset === undefined
      ? []
      : [
          `The line enters the first patch by ${micrometres(inset.depth)}, between slots of ${micrometres(inset.gap)}.`,
        ]),
    ...(sideFeed === undefined
      ? []
      : [
          `The column is fed in the middle of link ${sideFeed.link + 1} by a line from the ${sideFeed.side === 1 ? '+y' : '−y'} side; reflections are taken at the edge of the link.`,
        ]),
    ...(termination === undefined
      ? ['The last patch is open.']
      : [
          `After the last patch a line of ${micrometres(termination.width)} ends without reflection; what reaches it is lost in the load.`,
        ]),
  ];
}

function rowsOf(column: ColumnLayout): readonly (readonly Cell[])[] {
  const { feedLine, matching = [], patches, links, sideFeed } = column;
  const lineRow = (name: string, line: Link): readonly Cell[] => [
    cell(name),
    number(inMillimetres(line.width)),
    number(inMillimetres(line.length)),
    cell(DASH),
    cell(DASH),
  ];
  const apart = matching.length > 0 || sideFeed !== undefined;
  const before = (i: number): readonly Cell[] => {
    const line = i > 0 ? links[i - 1] : apart ? undefined : feedLine;
    return line === undefined
      ? [cell(DASH), cell(DASH)]
      : [number(inMillimetres(line.width)), number(inMillimetres(line.length))];
  };
  return [
    ...(apart ? [lineRow('Feed line', feedLine)] : []),
    ...matching.map((section, i) => lineRow(`Matching ${i + 1}`, section)),
    ...patches.map((patch, i) => [
      cell(`${i + 1}`),
      ...before(i),
      number(inMillimetres(patch.width)),
      number(inMillimetres(patch.length)),
    ]),
  ];
}

const originOf = ({ retuned, sized }: Board): string => {
  if (sized !== undefined && !('reason' in sized)) return 'sized';
  return retuned === undefined || 'reason' in retuned ? 'drawn' : 'retuned';
};

/** One table per distinct column layout: patches with the line that leads to each. */
export function layoutTables(board: Board): readonly Block[] {
  return distinctLayouts(board.columns).flatMap((column, n) => {
    const same = board.columns.flatMap((c, i) => (sameLayout(c, column) ? [i + 1] : []));
    const reversed = same.filter((number) => board.columns[number - 1].direction === -1);
    const words = [
      ...(reversed.length === 0
        ? []
        : [
            `Fed at the large-x end and running towards −x: column${reversed.length === 1 ? '' : 's'} ${reversed.join(', ')}.`,
          ]),
      ...formWords(column),
    ];
    return [
      table(
        `layout-${n + 1}`,
        `Dimensions in mm as ${originOf(board)}, column${same.length === 1 ? '' : 's'} ${same.join(', ')}; each row is a patch and the line on its feed side`,
        ['Patch', '#Line width', '#Line length', '#Patch width (y)', '#Patch length (x)'],
        rowsOf(column),
      ),
      // An open column that is fed at its small-x end is what the drawing shows without words.
      ...(words.length === 1 && column.termination === undefined ? [] : [prose(words.join(' '))]),
    ];
  });
}
