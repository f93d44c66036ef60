import type { Board, QuantityName } from '../manifest/model.js';
import { formatNumber } from '../quantity/index.js';
import type { EngineComparison } from '../study/results.js';
import { ENGINE_ACCURACY } from '../verdict/index.js';
import { type ComparedFigure, differencesOf, reflectionDifference } from './engine-figures.js';
import { changeText, GAP, valueText } from './values.js';

/** The quantity whose stated accuracy a compared figure is held against, and what its value there is divided by. */
const HELD: Readonly<Record<string, { readonly quantity: QuantityName; readonly scale?: number }>> = {
  reflection: { quantity: 'reflection' },
  'active-reflection': { quantity: 'active_reflection' },
  directivity: { quantity: 'directivity' },
  gain: { quantity: 'gain' },
  efficiency: { quantity: 'radiation_efficiency', scale: 100 },
  'elevation-direction': { quantity: 'beam_direction' },
  'elevation-beamwidth': { quantity: 'half_power_beamwidth' },
  'elevation-sidelobe': { quantity: 'sidelobe_level' },
  'azimuth-direction': { quantity: 'beam_direction' },
  'azimuth-beamwidth': { quantity: 'half_power_beamwidth' },
  'azimuth-sidelobe': { quantity: 'sidelobe_level' },
};

/** How the largest difference of a figure compares with what the network is trusted to. */
export interface Trust {
  readonly figure: ComparedFigure;
  readonly frequency: number;
  /** Full wave less network, the largest in magnitude. */
  readonly difference: number;
  /** What is granted in that direction there; undefined where nothing is stated. */
  readonly granted?: number;
  readonly inside: boolean;
}

export function trustOf(board: Board, points: readonly EngineComparison[]): readonly Trust[] {
  return differencesOf(board, points).flatMap(({ figure, points: found }): Trust[] => {
    if (found.length === 0) return [];
    const judged = found.map(({ frequency, difference }) => {
      const held = HELD[figure.id];
      const accuracy = ENGINE_ACCURACY.find(({ quantity }) => quantity === held?.quantity);
      const point = points.find((p) => p.frequency === frequency);
      if (accuracy === undefined || point === undefined) return { frequency, difference, inside: true };
      const scale = held.scale ?? 1;
      const { up, down } = accuracy.spread(figure.of(point.network, board) / scale, {
        reflection: Math.sqrt(Math.max(0, 1 - point.network.mismatch)),
      });
      const granted = (difference > 0 ? up : down) * scale;
      return { frequency, difference, granted, inside: Math.abs(difference) <= granted };
    });
    const outside = judged.filter(({ inside }) => !inside);
    const among = outside.length > 0 ? outside : judged;
    const largest = among.reduce((a, b) => (Math.abs(b.difference) > Math.abs(a.difference) ? b : a));
    return [{ figure, ...largest }];
  });
}

export const differenceText = (difference: number, unit: ComparedFigure['unit']): string =>
  unit === '%' ? `${formatNumber(difference, 1, { plus: true })}${GAP}%` : changeText(difference, unit);

const lower = (title: string): string => title.replace(/^[A-Z]/, (letter) => letter.toLowerCase());

const shiftClause = (alignment: { readonly shift: number; readonly remaining: number } | undefined): string =>
  alignment === undefined || alignment.shift === 0
    ? ''
    : `; with the network moved by ${formatNumber(alignment.shift / 1e9, 3, { plus: true })}${GAP}GHz ${valueText(alignment.remaining, '1')} of it remains`;

/** What a reader may conclude from the comparison about the engine behind the sweeps, tolerances and allowances. */
export function trustSentences(
  board: Board,
  points: readonly EngineComparison[],
  alignment?: { readonly shift: number; readonly remaining: number },
): readonly string[] {
  const trust = trustOf(board, points);
  const outside = trust.filter(({ inside }) => !inside);
  const inside = trust.filter((entry) => entry.inside && entry.granted !== undefined);
  const complex = Math.max(...points.map(reflectionDifference));
  const list = (entries: readonly Trust[]): string => entries.map(({ figure }) => lower(figure.title)).join('; ');
  return [
    `Complex reflection differs by up to ${valueText(complex, '1')}, root mean square over the columns${shiftClause(alignment)}.`,
    ...(inside.length === 0
      ? []
      : [`Within the accuracy that the uncertainty grants the network before any correction: ${list(inside)}.`]),
    outside.length === 0
      ? 'Nothing lies outside it: the network can be trusted on this board for comparisons, tolerances and allowances.'
      : `Outside it: ${outside
          .map(
            ({ figure, difference, granted = 0 }) =>
              `${lower(figure.title)} (${differenceText(difference, figure.unit)}, granted ${differenceText(Math.sign(difference) * granted, figure.unit)})`,
          )
          .join('; ')}. For these the network alone must not be relied on for this board.`,
  ];
}
