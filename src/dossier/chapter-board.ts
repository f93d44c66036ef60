import type { Board, FeedNetwork } from '../manifest/model.js';
import { abs } from '../numerics/complex.js';
import { formatQuantity } from '../quantity/index.js';
import { chapter, facts, figureBlock, prose } from './blocks.js';
import type { BoardContext } from './context.js';
import type { Chapter } from './document.js';
import { arrayDrawing, stackUpDrawing } from './drawings.js';
import { centreOf } from './engine-cuts.js';
import { micrometres } from './figures.js';
import { layoutTables } from './layout-tables.js';
import { retuningBlocks } from './retuning.js';
import { sizingBlocks } from './sizing.js';
import { bandText, celsius, costText, count, gigahertz, statedNumber, temperatureText } from './values.js';

const millimetres = (metres: number): string => formatQuantity(metres, 'length', { unit: 'mm', decimals: 3 });

export const referenceText = (board: Board): string =>
  board.referenceImpedance === 'line'
    ? 'impedance of the feed line itself'
    : `${statedNumber(board.referenceImpedance)} Ω`;

function networkText({ divider, lineWidth, trunkLength, levelLength, transition }: FeedNetwork): string {
  const dividers = divider === 'tee' ? 'T-junctions' : 'Wilkinson dividers';
  const behind = transition === undefined ? '' : `; transition of ${transition.file} before it`;
  return `${dividers}, lines of ${micrometres(lineWidth)}, ${millimetres(trunkLength)} to the first divider and ${millimetres(levelLength)} from level to level${behind}`;
}

function feedText(board: Board): string {
  const losses = board.feed.map((path) => {
    if (path.lossDb !== undefined) return `${statedNumber(path.lossDb.value)} dB given`;
    if (path.line === undefined) return 'no loss given';
    return `line of ${millimetres(path.line.length)}, ${micrometres(path.line.width)} wide`;
  });
  const distinct = [...new Set(losses)];
  return distinct.length === 1 ? `${distinct[0]}, every path` : losses.map((l, i) => `${i + 1}: ${l}`).join('; ');
}

/** Amplitudes for the drawing, from the better engine at the band centre; none where no engine gave currents. */
function drawnExcitation({ board, study: { confirmation } }: BoardContext) {
  if (confirmation.kind === 'network only') return undefined;
  const { fullWave, frequency } = centreOf(board, confirmation.points);
  return {
    shares: fullWave.excitation.map((patches) => patches.map(abs)),
    note: `Numbers or bars in the patches: amplitude of the current over the largest of the board, full wave at ${gigahertz(frequency)}`,
  };
}

function arrayReading(board: Board, lengthMm: number, smallest: number | undefined): string {
  const patches = [...new Set(board.columns.map((c) => c.patches.length))];
  const ends = new Set(board.columns.map(({ direction = 1, sideFeed }) => (sideFeed ? 'side' : direction)));
  const feed =
    ends.size > 1
      ? 'arrows show where each is fed'
      : ends.has('side')
        ? 'a line from the side feeds each in the middle of a link'
        : `the feed is at the ${ends.has(1) ? 'small' : 'large'}-x end`;
  const dummies = board.columns.filter(({ dummy }) => dummy === true).length;
  return [
    `${count(board.columns.length, 'series-fed column')} of ${patches.join(' or ')} patches at a pitch of ${millimetres(board.pitch)}, ${statedNumber(lengthMm, 2)} mm long with the feed lines`,
    ...(dummies === 0 ? [] : [`${dummies} of them never driven`]),
    `; ${feed}`,
    ...(smallest === undefined
      ? []
      : [`; the smallest amplitude of a driven patch is ${smallest.toFixed(2)} of the largest`]),
  ]
    .join(', ')
    .replaceAll(', ; ', '; ')
    .concat('.');
}

export function boardChapter(context: BoardContext): Chapter {
  const { board } = context;
  const { strip, laminate, cover } = board.stackUp;
  const { material, thickness } = laminate;
  const patches = board.columns.map((c) => c.patches.length);
  const excitation = drawnExcitation(context);
  const drawn = arrayDrawing(board, excitation);
  const driven = excitation?.shares.filter((_, i) => board.columns[i].dummy !== true && board.feed[i]?.amplitude !== 0);
  const smallest = driven === undefined || driven.length === 0 ? undefined : Math.min(...driven.flat());
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
      ...(board.feedNetwork === undefined ? [] : [['Feed network', networkText(board.feedNetwork)] as const]),
      ...(board.groups === undefined
        ? []
        : [
            [
              'Groups',
              board.groups.map(({ id, columns }) => `${id}: ${columns.map((c) => c + 1).join(', ')}`).join('; '),
            ] as const,
          ]),
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
      reading: arrayReading(board, drawn.extent.x[1] - drawn.extent.x[0], smallest),
      alt: 'Top view of the columns of patches and their lines, with the x and y axes, the planes of both cuts, the sign of tilt and the polarisation; where an engine gave currents, the amplitude of every patch as a number or a bar.',
      content: drawn,
    }),
    ...retuningBlocks(board),
    ...sizingBlocks(board),
    ...layoutTables(board),
  );
}
