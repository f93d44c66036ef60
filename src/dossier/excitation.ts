import type { Board } from '../manifest/model.js';
import { abs, arg, type Complex, mul, polar } from '../numerics/complex.js';
import { taperAmplitudes } from '../physics/taper/index.js';
import { formatNumber } from '../quantity/index.js';
import type { EngineComparison } from '../study/results.js';
import { cell, DASH, figureBlock, number, table } from './blocks.js';
import type { Block } from './document.js';
import { centreOf } from './engine-cuts.js';
import { changeText, gigahertz, rounded, valueText } from './values.js';

const DEGREES = 180 / Math.PI;

/** Currents of the patches of one column: amplitude over the largest, phase against their mean in degrees. */
export interface ColumnExcitation {
  readonly amplitude: readonly number[];
  readonly phaseDeg: readonly number[];
}

/** Mean phase is that of the sum: the direction in which the column as a whole radiates broadside. */
export function columnExcitation(currents: readonly Complex[]): ColumnExcitation {
  const largest = Math.max(...currents.map(abs));
  const sum = currents.reduce((a, b) => ({ re: a.re + b.re, im: a.im + b.im }), { re: 0, im: 0 });
  const turn = polar(1, -arg(sum));
  return {
    amplitude: currents.map((current) => (largest > 0 ? abs(current) / largest : 0)),
    phaseDeg: currents.map((current) => arg(mul(current, turn)) * DEGREES),
  };
}

/** Amplitudes asked for along a column of `n` patches; none where the layout is given and not sized. */
export function askedAmplitudes({ sizedFor }: Board, n: number): readonly number[] | undefined {
  return sizedFor === undefined || sizedFor.patches !== n ? undefined : taperAmplitudes(sizedFor.taper, n);
}

interface Departure {
  readonly amplitudeDb: number | undefined;
  readonly phaseDeg: number;
}

/** Largest departure from the taper asked for, and from one phase. */
function departure({ amplitude, phaseDeg }: ColumnExcitation, asked: readonly number[] | undefined): Departure {
  const levels = asked?.map((a, i) => Math.abs(20 * Math.log10(Math.max(amplitude[i], 1e-6) / a)));
  return {
    amplitudeDb: levels === undefined ? undefined : Math.max(...levels),
    phaseDeg: Math.max(...phaseDeg.map(Math.abs)),
  };
}

/** Columns that get no wave of their own carry only what couples into them: they have no taper to keep. */
const driven = ({ columns, feed }: Board): readonly number[] =>
  columns.flatMap(({ dummy }, i) => (dummy === true || feed[i]?.amplitude === 0 ? [] : [i]));

/** Of every driven column how far it is from what was asked: the pictures show one. */
function departureTable(
  columns: readonly { readonly c: number; readonly off: Departure; readonly offNetwork: Departure }[],
  at: string,
): Block {
  const tapered = columns.some(({ off }) => off.amplitudeDb !== undefined);
  const decibels = (db: number | undefined) => number(db === undefined ? DASH : valueText(db, 'dB'));
  return table(
    'excitation-columns',
    `Largest departure along each driven column at ${at}: ${tapered ? 'of amplitude from the taper asked for, ' : ''}of phase from its mean`,
    [
      'Column',
      ...(tapered ? ['#Amplitude, full wave|1.2', '#Amplitude, network|1.2'] : []),
      '#Phase, full wave|1.2',
      '#Phase, network|1.2',
    ],
    columns.map(({ c, off, offNetwork }) => [
      cell(`${c + 1}`),
      ...(tapered ? [decibels(off.amplitudeDb), decibels(offNetwork.amplitudeDb)] : []),
      number(valueText(off.phaseDeg, 'deg')),
      number(valueText(offNetwork.phaseDeg, 'deg')),
    ]),
  );
}

/** Amplitude and phase of every patch against what was asked, by both engines, at the band centre. */
export function excitationBlocks(board: Board, points: readonly EngineComparison[]): readonly Block[] {
  const { fullWave, network, frequency } = centreOf(board, points);
  const columns = driven(board).map((c) => {
    const byFullWave = columnExcitation(fullWave.excitation[c]);
    const byNetwork = columnExcitation(network.excitation[c]);
    const asked = askedAmplitudes(board, byFullWave.amplitude.length);
    return {
      c,
      byFullWave,
      byNetwork,
      asked,
      off: departure(byFullWave, asked),
      offNetwork: departure(byNetwork, asked),
    };
  });
  if (columns.length === 0) return [];
  const worst = columns.reduce((a, b) => (b.off.phaseDeg > a.off.phaseDeg ? b : a));
  const at = gigahertz(frequency);
  const name = `column ${worst.c + 1}`;
  const patch = (values: readonly number[], decimals: number) =>
    values.map((value, i) => [i + 1, rounded(value, decimals)] as const);
  const askedText =
    worst.off.amplitudeDb === undefined
      ? 'no taper was asked for'
      : `the largest departure from the taper asked for is ${formatNumber(worst.off.amplitudeDb, 2)} dB`;
  return [
    figureBlock({
      id: 'excitation-amplitude',
      title: `Amplitude along ${name}, the one farthest from one phase, at ${at}`,
      reading: `By the full wave the smallest amplitude is ${formatNumber(Math.min(...worst.byFullWave.amplitude), 2)} of the largest; ${askedText}.`,
      alt: `Amplitude of the current of each patch over the largest of the column, by the full wave and by the network${worst.asked === undefined ? '' : ', with the taper asked for'}.`,
      content: {
        chart: 'lines',
        xTitle: 'Patch, counted from the feed (1)',
        xWhole: true,
        yTitle: 'Amplitude over the largest (1)',
        yDomain: [0, 1.05],
        series: [
          ...(worst.asked === undefined ? [] : [{ label: 'Asked for', emphasis: true, points: patch(worst.asked, 3) }]),
          { label: 'Network', points: patch(worst.byNetwork.amplitude, 3) },
          { label: 'Full wave', symbol: 'disc', points: patch(worst.byFullWave.amplitude, 3) },
        ],
      },
    }),
    figureBlock({
      id: 'excitation-phase',
      title: `Phase along ${name} against its mean, at ${at}`,
      reading: `By the full wave the patches depart from one phase by up to ${formatNumber(worst.off.phaseDeg, 1)}°, by the network by up to ${formatNumber(worst.offNetwork.phaseDeg, 1)}°.`,
      alt: 'Phase of the current of each patch against the mean of the column in degrees, by the full wave and by the network; one phase along the column is zero.',
      content: {
        chart: 'lines',
        xTitle: 'Patch, counted from the feed (1)',
        xWhole: true,
        yTitle: 'Phase against the mean (°)',
        series: [
          {
            label: 'One phase',
            emphasis: true,
            points: patch(
              worst.byNetwork.phaseDeg.map(() => 0),
              0,
            ),
          },
          { label: 'Network', points: patch(worst.byNetwork.phaseDeg, 1) },
          { label: 'Full wave', symbol: 'disc', points: patch(worst.byFullWave.phaseDeg, 1) },
        ],
      },
    }),
    table(
      'excitation-patches',
      `Excitation of ${name} at ${at}, patch by patch; amplitude over the largest, phase against the mean`,
      [
        'Patch',
        ...(worst.asked === undefined ? [] : ['#Amplitude asked for|1.2']),
        '#Amplitude, full wave|1.2',
        '#Amplitude, network|1.2',
        '#Phase, full wave|1.2',
        '#Phase, network|1.2',
      ],
      worst.byFullWave.amplitude.map((amplitude, i) => [
        cell(`${i + 1}`),
        ...(worst.asked === undefined ? [] : [number(formatNumber(worst.asked[i], 3))]),
        number(formatNumber(amplitude, 3)),
        number(formatNumber(worst.byNetwork.amplitude[i], 3)),
        number(changeText(worst.byFullWave.phaseDeg[i], 'deg')),
        number(changeText(worst.byNetwork.phaseDeg[i], 'deg')),
      ]),
    ),
    departureTable(columns, at),
  ];
}
