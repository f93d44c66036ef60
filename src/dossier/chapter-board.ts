import type { Board, ColumnLayout } from '../manifest/model.js';
import { formatQuantity } from '../quantity/index.js';
import { cell, chapter, facts, figureBlock, number, prose, table } from './blocks.js';
import type { BoardContext } from './context.js';
import type { Block, Chapter } from './document.js';
import { arrayDrawing, stackUpDrawing } from './drawings.js';
import { micrometres } from './figures.js';
import { retuningBlocks } from './retuning.js';
import { bandText, celsius, costText, count, statedNumber, temperatureText } from './values.js';

const millimetres = (metres: number): string => formatQuantity(metres, 'length', { unit: 'mm', decimals: 3 });
const inMillimetres = (metres: number): string => statedNumber(metres * 1e3, 4);

export const referenceText = (board: Board): string =>
  board.referenceImpedance === 'line'
    ? 'impedance of the feed line itself'
    : `${statedNumber(board.referenceImpedance)} Ω`;

function feedText(board: Board): string {
  const losses = board.feed.map((path) => {
    if (path.lossDb !== undefined) return `${statedNumber(path.lossDb.value)} dB given`;
    if (path.line === undefined) return 'no loss given';
    return `line of ${millimetres(path.line.length)}, ${micrometres(path.line.width)} wide`;
  });
  const distinct = [...new Set(losses)];
  return distinct.length === 1 ? `${distinct[0]}, every path` : losses.map((l, i) => `${i + 1}: ${l}`).join('; ');
}

const sameLayout = (a: ColumnLayout, b: ColumnLayout): boolean =>
  JSON.stringify([a.feedLine, a.patches, a.links]) === JSON.stringify([b.feedLine, b.patches, b.links]);

/** One table per distinct column layout: patches with the line that leads to each. */
function layouts(board: Board): readonly Block[] {
  const distinct = board.columns.filter((column, i) => board.columns.findIndex((c) => sameLayout(c, column)) === i);
  return distinct.map((column, n) => {
    const same = board.columns.flatMap((c, i) => (sameLayout(c, column) ? [i + 1] : []));
    return table(
      `layout-${n + 1}`,
      `Dimensions in mm as ${board.retuned === undefined || 'reason' in board.retuned ? 'drawn' : 'retuned'}, column${same.length === 1 ? '' : 's'} ${same.join(', ')}; each row is a patch and the line on its feed side`,
      ['Patch', '#Line width', '#Line length', '#Patch width (y)', '#Patch length (x)'],
      column.patches.map((patch, i) => {
        const line = i === 0 ? column.feedLine : column.links[i - 1];
        return [
          cell(`${i + 1}`),
          number(inMillimetres(line.width)),
          number(inMillimetres(line.length)),
          number(inMillimetres(patch.width)),
          number(inMillimetres(patch.length)),
        ];
      }),
    );
  });
}

export function boardChapter({ board }: BoardContext): Chapter {
  const { strip, laminate, cover } = board.stackUp;
  const { material, thickness } = laminate;
  const patches = board.columns.map((c) => c.patches.length);
  const drawn = arrayDrawing(board);
  const weights = board.feed.map((path) => statedNumber(path.amplitude, 4)).join(', ');
  const phases = board.feed.map((path) => `${statedNumber((path.phase * 180) / Math.PI, 2)}°`).join(', ');
  return chapter(
    'board',
    'Board',
    ...(board.description === undefined ? [] : [prose(board.description)]),
    facts(
      'board-facts',
      ['Laminate', `${material.name}, ${material.maker}${material.invented ? ' (invented)' : ''}`],
      ['Foil', `${strip.foil.name}, ${strip.foil.maker}${strip.foil.invented ? ' (invented)' : ''}`],
      ['Finish', strip.finish.name],
      ['Cover layer', cover === undefined ? 'none' : `${cover.material}, ${micrometres(cover.thickness.value)}`],
      ['Columns', `${count(board.columns.length, 'column')}, pitch ${millimetres(board.pitch)}`],
      ['Patches per column', [...new Set(patches)].join(', ')],
      ['Weights of the feed', `amplitude ${weights}; phase ${phases}`],
      ['Feed loss', feedText(board)],
      ['Reference impedance', referenceText(board)],
      ['Operating band', bandText(board.band)],
      ['Temperature range', `${temperatureText(board.temperature)}, nominal ${celsius(board.temperature.nominalC)}`],
      [
        'Cost',
        board.cost === undefined
          ? 'not given'
          : `${costText(board.cost)}${board.cost.basis === undefined ? '' : `, ${board.cost.basis}`}`,
      ],
    ),
    figureBlock({
      id: 'stack-up',
      title: 'Stack-up, to scale in thickness',
      reading: `The laminate is ${micrometres(thickness.value)} thick between the mean planes of the copper, the strip ${micrometres(strip.thickness.value)}.`,
      alt: 'Cross-section of the stack-up with the name and thickness of every layer, from the outer face down.',
      content: stackUpDrawing(board),
    }),
    figureBlock({
      id: 'array',
      title: 'Array, to scale, seen from the side it radiates to',
      reading: `${count(board.columns.length, 'series-fed column')} of ${[...new Set(patches)].join(' or ')} patches at a pitch of ${millimetres(board.pitch)}, ${statedNumber(drawn.extent.x[1] - drawn.extent.x[0], 2)} mm long with the feed lines; the feed is at the small-x end.`,
      alt: 'Top view of the columns of patches and their lines, with the x and y axes, the planes of both cuts, the sign of tilt and the polarisation.',
      content: drawn,
    }),
    ...retuningBlocks(board),
    ...layouts(board),
  );
}
