import type { Board, ColumnLayout, Link, SizedFor, Taper } from '../manifest/model.js';
import { cell, facts, list, prose, table } from './blocks.js';
import type { Block } from './document.js';
import { micrometres } from './figures.js';
import { distinctLayouts } from './layout-tables.js';
import { boardPage, link } from './links.js';
import { count, gigahertz, statedNumber, valueText } from './values.js';

export function taperText(taper: Taper): string {
  switch (taper.kind) {
    case 'uniform':
      return 'uniform';
    case 'dolph-chebyshev':
      return `Dolph–Chebyshev, sidelobes at −${statedNumber(taper.sidelobeDb)} dB`;
    case 'taylor':
      return `Taylor, first sidelobes at −${statedNumber(taper.sidelobeDb)} dB, n̄ = ${taper.nBar}`;
    case 'given':
      return `given: ${taper.amplitudes.map((a) => statedNumber(a, 4)).join(', ')}`;
  }
}

const askedFor = (sizedFor: SizedFor): readonly (readonly [string, string])[] => [
  ['Sized for', `${gigahertz(sizedFor.frequency)}, ${count(sizedFor.patches, 'patch', 'patches')}`],
  ['Taper asked for', taperText(sizedFor.taper)],
  [
    'What the board maker holds',
    `copper from ${micrometres(sizedFor.leastWidth)}, gaps from ${micrometres(sizedFor.leastGap)}, grid ${micrometres(sizedFor.grid)}`,
  ],
];

/** For page one: the layout under verdict was worked out and not drawn by anyone. */
export function sizedNotice({ id, sizedFor, sized }: Board): readonly Block[] {
  if (sizedFor === undefined || sized === undefined || 'reason' in sized) return [];
  return [
    prose(
      { strong: 'Sized layout. ' },
      `The dimensions of the columns were worked out by the program for ${gigahertz(sizedFor.frequency)}: see `,
      link('Board', boardPage(id), 'sizing'),
      '.',
    ),
  ];
}

const length = (metres: number): string => `${statedNumber(metres * 1e3, 4)} mm`;
const pieceText = ({ width, length: along }: Link): string => `{ width: ${length(width)}, length: ${length(along)} }`;
const pieceList = (pieces: readonly Link[]): string => `[${pieces.map(pieceText).join(', ')}]`;

/** Fields of `array` in a manifest that draw this column, as they are written there. */
export function manifestFields({ feedLine, patches, links, matching, inset }: ColumnLayout): readonly {
  readonly field: string;
  readonly text: string;
}[] {
  return [
    { field: 'feed_line', text: pieceText(feedLine) },
    ...(matching === undefined ? [] : [{ field: 'matching', text: pieceList(matching) }]),
    ...(inset === undefined
      ? []
      : [{ field: 'inset', text: `{ depth: ${length(inset.depth)}, gap: ${length(inset.gap)} }` }]),
    { field: 'patches', text: pieceList(patches) },
    ...(links.length === 0 ? [] : [{ field: 'links', text: pieceList(links) }]),
  ];
}

/** What became of a column that was asked for in place of dimensions. */
export function sizingBlocks(board: Board): readonly Block[] {
  const { sizedFor, sized, columns } = board;
  if (sizedFor === undefined || sized === undefined) return [];
  if ('reason' in sized) {
    return [prose({ strong: 'Not sized. ' }, `${sized.reason}.`), facts('sizing', ...askedFor(sizedFor))];
  }
  const { by, networkDb, fullWaveDb, notes } = sized;
  const [column] = distinctLayouts(columns);
  return [
    prose(
      { strong: 'Sized before the study. ' },
      `The columns were asked for, not drawn. Their dimensions were worked out ${by === 'network' ? 'by the network alone' : 'by the network and corrected by the full wave'}, with nominal copper and at nominal temperature; every figure and verdict here is of the layout below.`,
    ),
    facts(
      'sizing',
      ...askedFor(sizedFor),
      ['Reflection at that frequency, by the network', valueText(networkDb, 'dB')],
      ...(fullWaveDb === undefined ? [] : [['The same, by the full wave', valueText(fullWaveDb, 'dB')] as const]),
    ),
    ...(notes.length === 0 ? [] : [list(notes.map((note) => [note]))]),
    table(
      'sized-fields',
      'The sized column as explicit dimensions: to freeze the layout, write these fields under array in place of sized_for',
      ['Field', 'To be written|5'],
      manifestFields(column).map(({ field, text }) => [cell({ code: field }), cell({ code: text })]),
    ),
  ];
}
