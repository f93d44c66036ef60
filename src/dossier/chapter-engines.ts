import type { Board } from '../manifest/model.js';
import { formatNumber } from '../quantity/index.js';
import type { EngineComparison } from '../study/results.js';
import { cell, chapter, DASH, facts, list, number, prose, table } from './blocks.js';
import type { BoardContext } from './context.js';
import type { Block, Cell, Chapter } from './document.js';
import { engineCuts } from './engine-cuts.js';
import { COMPARED_FIGURES, type ComparedFigure, reflectionDifference } from './engine-figures.js';
import { differenceText, trustSentences } from './engine-trust.js';
import { excitationBlocks } from './excitation.js';
import { micrometres } from './figures.js';
import { boardPage, EVIDENCE, link } from './links.js';
import { ENGINE_LIMITS } from './statements.js';
import { GAP, gigahertz, powerAbove, valueText } from './values.js';

const figureValue = (value: number, { unit }: ComparedFigure): string => {
  if (!Number.isFinite(value)) return DASH;
  return unit === '%' ? `${formatNumber(value, 1)}${GAP}%` : valueText(value, unit);
};

/** Figure by figure, and of each its frequencies, so that a trend over the band is seen at once. */
function comparisonTable(board: Board, points: readonly EngineComparison[]): Block {
  const rows = COMPARED_FIGURES.flatMap((figure): (readonly Cell[])[] => {
    const found = points
      .map((point) => ({ point, a: figure.of(point.fullWave, board), b: figure.of(point.network, board) }))
      .filter(({ a, b }) => Number.isFinite(a) || Number.isFinite(b));
    return found.map(({ point, a, b }) => [
      cell(figure.title),
      number(gigahertz(point.frequency)),
      number(figureValue(a, figure)),
      number(figureValue(b, figure)),
      number(Number.isFinite(a - b) ? differenceText(a - b, figure.unit) : DASH),
    ]);
  });
  const complex = points.map((point) => [
    cell('Reflection as complex numbers, rms over the columns'),
    number(gigahertz(point.frequency)),
    cell(DASH),
    cell(DASH),
    number(valueText(reflectionDifference(point), '1')),
  ]);
  return table(
    'engine-comparison',
    'Full wave and network at the compared frequencies: nominal state, nominal temperature, weights of the feed, no feed loss',
    ['Figure|2.4', '#Frequency', '#Full wave', '#Network', '#Full wave less network|1.2'],
    [...complex, ...rows],
  );
}

function runTable(points: readonly EngineComparison[]): Block {
  return table(
    'engine-runs',
    'What each run rests on; power that is missing (+) or too much (−) stands as a share of the accepted power',
    [
      'Frequency',
      '#Power residual, full wave|1.2',
      '#Power residual, network|1.2',
      '#Unknowns',
      '#Iterations',
      '#Residual',
      'Cell (length × width)|1.3',
      'Misfit before trimming|1.3',
    ],
    points.map(({ frequency, fullWave, network, effort }) => [
      cell(gigahertz(frequency)),
      number(residualText(fullWave.powerResidual)),
      number(residualText(network.powerResidual)),
      number(formatNumber(effort.unknowns, 0)),
      number(`${effort.iterations}`),
      number(`below ${powerAbove(effort.residual)}`),
      cell(`${micrometres(effort.cellLength)} × ${micrometres(effort.cellWidth)}`),
      cell(`${micrometres(effort.misfitLength)}, ${micrometres(effort.misfitWidth)}`),
    ]),
  );
}

const residualText = (share: number): string => {
  if (!Number.isFinite(share)) return 'not evaluated';
  return Math.abs(share) < 5e-5
    ? `below ${powerAbove(share)}`
    : `${formatNumber(100 * share, 2, { plus: true })}${GAP}%`;
};

function alignmentText(alignment: { readonly shift: number; readonly remaining: number } | undefined): string {
  if (alignment === undefined) return 'not evaluated';
  const { shift, remaining } = alignment;
  const left = `${valueText(remaining, '1')} of complex reflection remains (root mean square)`;
  if (shift === 0) return `none: no shift takes away much of the difference; ${left}`;
  return `full wave ${shift > 0 ? 'above' : 'below'} the network by ${formatNumber(Math.abs(shift) / 1e9, 3)}${GAP}GHz; then ${left}`;
}

const limits = (): readonly Block[] => [
  prose({ strong: 'Limits of both engines. ' }, 'What no comparison between them can show:'),
  list(ENGINE_LIMITS.map((line) => [line])),
];

/** How far the fast engine, which every sweep, tolerance and allowance rests on, is confirmed on this very board. */
export function enginesChapter(context: BoardContext): Chapter {
  const { board, study } = context;
  const { confirmation } = study;
  if (confirmation.kind === 'network only') {
    const words =
      study.nominal.points.length === 0
        ? 'Neither engine gave figures of the columns of this board.'
        : 'Sweeps, tolerances and allowances rest on the fast engine (network) alone. The uncertainty of every figure of the columns therefore carries what that engine was found to be off on other boards, widened: see its parts under ';
    return chapter(
      'engines',
      'Two engines',
      prose(
        { strong: 'Network only. ' },
        `Reason: ${confirmation.reason}. `,
        words,
        ...(study.nominal.points.length === 0 ? [] : [link('Uncertainty', boardPage(board.id), 'uncertainty'), '.']),
      ),
      ...limits(),
    );
  }
  const { points, flags, alignment, carriedFrom } = confirmation;
  return chapter(
    'engines',
    'Two engines',
    prose(
      'Every board is solved by a full wave at a few frequencies and by a fast network everywhere else. Nominal figures are those of the full wave where it ran; what the engines differ by is carried to all sweeps, and what that leaves open is a part of the uncertainty. How close each engine comes to independent solutions stands under ',
      link('Evidence', EVIDENCE, 'engine-accuracy'),
      '.',
    ),
    ...(carriedFrom === undefined
      ? []
      : [prose(`The full wave did not run on this state of the board: the differences are those of ${carriedFrom}.`)]),
    prose(
      { strong: 'How far the fast engine can be trusted on this board. ' },
      trustSentences(board, points, alignment).join(' '),
    ),
    facts(
      'engine-facts',
      ['Compared at', points.map(({ frequency }) => gigahertz(frequency)).join(', ')],
      ['Shift in frequency that best aligns the reflections', alignmentText(alignment)],
    ),
    comparisonTable(board, points),
    ...engineCuts(board, points),
    ...excitationBlocks(board, points),
    runTable(points),
    ...(flags.length === 0
      ? []
      : [
          table(
            'engine-flags',
            'What the full wave says of its own limits on this board',
            ['Model|1.2', 'What it means|4'],
            flags.map((flag) => [cell(flag.model), cell(flag.text)]),
          ),
        ]),
    ...limits(),
  );
}
