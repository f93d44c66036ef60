import type { QuantityName } from '../manifest/model.js';
import { abs } from '../numerics/complex.js';
import { formatNumber } from '../quantity/index.js';
import type { PointResult } from '../study/results.js';
import { quantityOf } from '../verdict/index.js';
import { cell, chapter, figureBlock, number, prose, table } from './blocks.js';
import { referenceText } from './chapter-board.js';
import { NO_RESULTS } from './chapter-budget.js';
import { type BoardContext, bandPoints } from './context.js';
import type { Block, Cell, Chapter, LinesChart } from './document.js';
import { COMPARED_FIGURES } from './engine-figures.js';
import { engineTag } from './network-only.js';
import { celsius, GAP, gigahertz, limitText, rounded, valueText } from './values.js';

const KINDS = [
  { quantity: 'reflection', id: 'match-passive', engine: 'reflection', name: 'Passive reflection, worst column' },
  {
    quantity: 'active_reflection',
    id: 'match-active',
    engine: 'active-reflection',
    name: 'Active reflection, worst driven column',
  },
] as const;

interface Sample {
  readonly point: PointResult;
  readonly db: number;
}

/** Reflection in dB at every point of the nominal sweep; a point without a value is left out and counted. */
function samples({ board, study }: BoardContext, quantity: QuantityName): readonly Sample[] {
  const { at } = quantityOf(quantity);
  return study.nominal.points.flatMap((point) => {
    const found = at(point, { requirement: {}, board });
    return 'value' in found ? [{ point, db: found.value }] : [];
  });
}

function byTemperature(found: readonly Sample[]): readonly (readonly [number, readonly Sample[]])[] {
  const temperatures = [...new Set(found.map((s) => s.point.temperatureC))];
  return temperatures.map((t) => [t, found.filter((s) => s.point.temperatureC === t)]);
}

const worstOf = (found: readonly Sample[]): Sample => found.reduce((a, b) => (b.db > a.db ? b : a));

interface ComparedLevel {
  readonly frequency: number;
  readonly fullWave: number;
  readonly network: number;
}

/** What both engines say at the compared frequencies, dB; nothing where the network stands alone. */
function comparedLevels(
  { board, study }: BoardContext,
  id: (typeof KINDS)[number]['engine'],
): readonly ComparedLevel[] {
  const figure = COMPARED_FIGURES.find((entry) => entry.id === id);
  if (study.confirmation.kind === 'network only' || figure === undefined) return [];
  return study.confirmation.points
    .map(({ frequency, fullWave, network }) => ({
      frequency,
      fullWave: figure.of(fullWave, board),
      network: figure.of(network, board),
    }))
    .filter(({ fullWave, network }) => Number.isFinite(fullWave) && Number.isFinite(network));
}

function engineSeries(compared: readonly ComparedLevel[]): LinesChart['series'] {
  if (compared.length === 0) return [];
  const points = (of: (level: ComparedLevel) => number) =>
    compared.map((level) => [rounded(level.frequency / 1e9, 4), rounded(of(level), 3)] as const);
  return [
    { label: 'Full wave', symbol: 'disc', points: points(({ fullWave }) => fullWave) },
    { label: 'Network before correction', symbol: 'square', points: points(({ network }) => network) },
  ];
}

function engineReading(compared: readonly ComparedLevel[], unit: string): string {
  if (compared.length === 0) return '';
  const off = ({ fullWave, network }: ComparedLevel) => Math.abs(fullWave - network);
  const most = compared.reduce((a, b) => (off(b) > off(a) ? b : a));
  return `; the engines differ most at ${gigahertz(most.frequency)}: ${valueText(most.fullWave, unit)} by the full wave, ${valueText(most.network, unit)} by the network before correction`;
}

function matchFigure(context: BoardContext, kind: (typeof KINDS)[number]): Block {
  const found = samples(context, kind.quantity);
  const unit = quantityOf(kind.quantity).unit;
  const limits = context.judged
    .map(({ requirement }) => requirement)
    .filter((r) => r.quantity === kind.quantity && r.limit !== undefined)
    .map((r) => ({
      label: `${r.id}: ${limitText(r, unit)}`,
      level: r.limit?.value ?? Number.NaN,
      from: rounded((r.condition.band ?? context.board.band).low / 1e9, 4),
      to: rounded((r.condition.band ?? context.board.band).high / 1e9, 4),
      forbidden: r.limit?.direction === 'at_least' ? ('below' as const) : ('above' as const),
    }));
  if (found.length === 0) return prose(`${kind.name}: no value at any point.`);
  const worst = worstOf(found);
  const compared = comparedLevels(context, kind.engine);
  return figureBlock({
    id: kind.id,
    title: `${kind.name}, over frequency at each temperature${engineTag(context.study)}`,
    reading: `The largest value is ${valueText(worst.db, unit)} at ${gigahertz(worst.point.frequency)} and ${celsius(worst.point.temperatureC)}${engineReading(compared, unit)}.`,
    alt: `Reflection in dB over frequency, one line per temperature${compared.length === 0 ? '' : '; single values of the full wave and of the network before correction as symbols'}${limits.length === 0 ? '; no requirement limits it' : `; limit lines ${limits.map((l) => l.label).join(', ')}`}.`,
    content: {
      chart: 'lines',
      xTitle: 'Frequency (GHz)',
      yTitle: 'Reflection (dB)',
      series: [
        ...byTemperature(found).map(([temperature, group]) => ({
          label: celsius(temperature),
          ...(temperature === context.board.temperature.nominalC ? { emphasis: true } : {}),
          points: group.map((s) => [rounded(s.point.frequency / 1e9, 4), rounded(s.db, 3)] as const),
        })),
        ...engineSeries(compared),
      ],
      limits,
    },
  });
}

function matchRows(context: BoardContext): readonly (readonly Cell[])[] {
  return KINDS.flatMap((kind) => {
    const unit = quantityOf(kind.quantity).unit;
    return byTemperature(samples(context, kind.quantity)).map(([temperature, group]) => {
      const worst = worstOf(group);
      const middle = group[Math.floor((group.length - 1) / 2)];
      return [
        cell(kind.name),
        number(celsius(temperature)),
        number(valueText(group[0].db, unit)),
        number(valueText(middle.db, unit)),
        number(valueText(group[group.length - 1].db, unit)),
        number(valueText(worst.db, unit)),
        number(gigahertz(worst.point.frequency)),
      ];
    });
  });
}

/** What the feed network does at its input, nominal temperature; nothing for boards without one. */
function feedTable(context: BoardContext): readonly Block[] {
  const points = (bandPoints(context)?.nominal ?? []).flatMap(({ frequency, feed }) =>
    feed === undefined ? [] : [{ frequency, feed }],
  );
  if (points.length === 0) return [];
  return [
    table(
      'feed-table',
      `Feed network at its input, with the columns behind it, nominal temperature${engineTag(context.study)}`,
      ['Frequency', '#Reflection at the input|1.2', '#Power into the columns|1.2', '#Power burnt in resistors|1.2'],
      points.map(({ frequency, feed }) => [
        cell(gigahertz(frequency)),
        number(valueText(20 * Math.log10(Math.max(abs(feed.inputReflection), 1e-6)), 'dB')),
        number(valueText(10 * Math.log10(feed.transmission), 'dB')),
        number(`${formatNumber(100 * feed.burnt, 2)}${GAP}%`),
      ]),
    ),
  ];
}

export function matchChapter(context: BoardContext): Chapter {
  if (context.study.nominal.points.length === 0) return chapter('match', 'Match', prose(NO_RESULTS));
  return chapter(
    'match',
    'Match',
    ...KINDS.map((kind) => matchFigure(context, kind)),
    table(
      'match-table',
      `Reflection at the band edges, the band centre and where it is largest${engineTag(context.study)}`,
      ['Reflection|2', '#Temperature', '#Lower edge', '#Centre', '#Upper edge', '#Largest', '#At'],
      matchRows(context),
    ),
    ...feedTable(context),
    prose(
      `Referred to the ${referenceText(context.board)}, at the true edge of the first patch. Passive: each column driven alone, the others terminated in the reference impedance. Active: all columns driven with the weights of the feed.`,
    ),
  );
}
