import type { Board } from '../manifest/model.js';
import { abs } from '../numerics/complex.js';
import { isolation, type ScatteringMatrix, scanReflection } from '../physics/array/index.js';
import { SPEED_OF_LIGHT } from '../physics/constants.js';
import { formatNumber } from '../quantity/index.js';
import { quantityOf } from '../verdict/index.js';
import { cell, chapter, DASH, figureBlock, number, prose, table } from './blocks.js';
import { type BoardContext, bandPoints } from './context.js';
import type { Block, Chapter, LinesChart } from './document.js';
import { engineTag } from './network-only.js';
import { GAP, gigahertz, limitText, rounded, valueText } from './values.js';

const DEGREES = 180 / Math.PI;
/** Below this a coupling is as good as none, and a level stays a number. */
const SMALLEST = 1e-6;
const level = (magnitude: number): number => 20 * Math.log10(Math.max(magnitude, SMALLEST));
/** As many columns as a table of their matrix may have before it no longer fits a sheet. */
const MOST_IN_TABLE = 12;
const SCAN_STEPS = 60;

interface Coupled {
  readonly context: BoardContext;
  readonly scattering: ScatteringMatrix;
  readonly frequency: number;
  /** For titles: where, and whether the network stands alone. */
  readonly at: string;
}

function coupledOf(context: BoardContext): Coupled | undefined {
  const centre = bandPoints(context)?.centre;
  if (centre?.scattering === undefined || centre.scattering.length < 2) return undefined;
  const at = `${gigahertz(centre.frequency)}${engineTag(context.study)}`;
  return { context, scattering: centre.scattering, frequency: centre.frequency, at };
}

/** Ordered pairs of columns that stand in different groups. */
function betweenGroups({ groups = [] }: Board): readonly (readonly [number, number])[] {
  return groups.flatMap((a) =>
    groups.flatMap((b) => (a === b ? [] : a.columns.flatMap((i) => b.columns.map((j) => [i, j] as const)))),
  );
}

function matrixFigure({ context: { board }, scattering, at }: Coupled): Block {
  const found = scattering.flatMap((cells, row) =>
    cells.flatMap((s, column) => (row === column ? [] : [{ row, column, value: rounded(level(abs(s)), 1) }])),
  );
  const strongest = found.reduce((a, b) => (b.value > a.value ? b : a));
  const outlined = betweenGroups(board);
  const floor = Math.min(...found.map(({ value }) => value));
  return figureBlock({
    id: 'coupling-matrix',
    title: `Coupling between columns at ${at}`,
    reading: `The strongest coupling is ${formatNumber(strongest.value, 1)}${GAP}dB from column ${strongest.column + 1} into column ${strongest.row + 1}.`,
    alt: `Square of cells, one per pair of columns, each with the level of the wave that leaves one column while another is driven${outlined.length === 0 ? '' : '; pairs of different groups are outlined with a dashed line'}.`,
    content: {
      drawing: 'matrix',
      rowTitle: 'Leaving column',
      columnTitle: 'Driven column',
      unit: 'dB',
      labels: scattering.map((_, i) => `${i + 1}`),
      cells: found,
      range: [Math.min(floor, strongest.value - 1), strongest.value],
      ...(outlined.length === 0 ? {} : { outlined }),
    },
  });
}

function matrixTable({ scattering, at }: Coupled): readonly Block[] {
  if (scattering.length > MOST_IN_TABLE) return [];
  return [
    table(
      'coupling-table',
      `Magnitude of the S-matrix of the columns in dB at ${at}: rows leave, columns are driven; the diagonal is passive reflection`,
      ['Leaving', ...scattering.map((_, j) => `#${j + 1}`)],
      scattering.map((row, i) => [cell(`${i + 1}`), ...row.map((s) => number(formatNumber(level(abs(s)), 1)))]),
    ),
  ];
}

function isolationTable({ context: { board }, scattering, at }: Coupled): readonly Block[] {
  const { groups = [] } = board;
  const pairs = groups.flatMap((a, i) => groups.slice(i + 1).map((b) => ({ a, b })));
  if (pairs.length === 0) return [];
  return [
    table(
      'isolation-table',
      `Least isolation between groups of columns at ${at}`,
      ['Groups|2', '#Isolation', 'Pair|2'],
      pairs.map(({ a, b }) => {
        const { isolationDb, from, to } = isolation(scattering, a.columns, b.columns);
        return [
          cell(`${a.id} and ${b.id}`),
          Number.isFinite(isolationDb) ? number(valueText(isolationDb, 'dB')) : cell(DASH),
          cell(`column ${from + 1} driven, column ${to + 1} receives`),
        ];
      }),
    ),
  ];
}

/** Requirements on active reflection, as far as their band holds the frequency that is drawn. */
function limitsAt({ context: { judged, board }, frequency }: Coupled): NonNullable<LinesChart['limits']> {
  const { unit } = quantityOf('active_reflection');
  return judged.flatMap(({ requirement }) => {
    const { low, high } = requirement.condition.band ?? board.band;
    if (requirement.quantity !== 'active_reflection' || requirement.limit === undefined) return [];
    if (frequency < low || frequency > high) return [];
    const { direction, value } = requirement.limit;
    const forbidden = direction === 'at_least' ? ('below' as const) : ('above' as const);
    return [{ label: `${requirement.id}: ${limitText(requirement, unit)}`, level: value, forbidden }];
  });
}

function scanFigure(coupled: Coupled): readonly Block[] {
  const { context, scattering, frequency, at } = coupled;
  const { board } = context;
  const { scan } = board;
  const amplitudes = board.columns.map(({ dummy }, i) => (dummy === true ? 0 : (board.feed[i]?.amplitude ?? 0)));
  if (scan === undefined || !amplitudes.some((a) => a > 0)) return [];
  const step = (scan.high - scan.low) / SCAN_STEPS;
  const angles = Array.from({ length: SCAN_STEPS + 1 }, (_, i) => scan.low + i * step);
  const found = scanReflection(
    scattering,
    board.columns.map(({ y }) => y),
    (2 * Math.PI * frequency) / SPEED_OF_LIGHT,
    angles,
    amplitudes,
  );
  const degrees = (angle: number) => rounded(angle * DEGREES, 2);
  const worst = found.worst.reduce((a, b) => (b.magnitude > a.magnitude ? b : a));
  const limits = limitsAt(coupled);
  const of = (column: number) =>
    angles.map((angle, i) => [degrees(angle), rounded(level(abs(found.reflection[i][column])), 2)] as const);
  const envelope = angles.map(
    (angle, i) =>
      [
        degrees(angle),
        rounded(level(Math.max(...found.worst.map(({ column }) => abs(found.reflection[i][column])))), 2),
      ] as const,
  );
  const several = found.worst.length > 1;
  return [
    figureBlock({
      id: 'scan-reflection',
      title: `Active reflection over the direction of the beam in azimuth at ${at}`,
      reading: `The largest value is ${valueText(level(worst.magnitude), 'dB')}, of column ${worst.column + 1} with the beam at ${formatNumber(worst.angle * DEGREES, 1)}°.`,
      alt: `Active reflection in dB over the direction of the beam, of the column that reflects most anywhere and of the worst column at each direction${limits.length === 0 ? '' : `; limit lines ${limits.map((l) => l.label).join(', ')}`}.`,
      content: {
        chart: 'lines',
        xTitle: 'Direction of the beam in azimuth (°)',
        yTitle: 'Active reflection (dB)',
        series: [
          ...(several ? [{ label: 'Worst column at each', emphasis: true, points: envelope }] : []),
          { label: `Column ${worst.column + 1}`, points: of(worst.column) },
        ],
        limits,
      },
    }),
    table(
      'scan-table',
      `Where each driven column reflects most while the beam is steered from ${formatNumber(scan.low * DEGREES, 0)}° to ${formatNumber(scan.high * DEGREES, 0)}° by phases alone, amplitudes of the feed`,
      ['Column', '#Active reflection', '#Beam at'],
      found.worst.map(({ column, magnitude, angle }) => [
        cell(`${column + 1}`),
        number(valueText(level(magnitude), 'dB')),
        number(`${formatNumber(angle * DEGREES, 1)}°`),
      ]),
    ),
  ];
}

/** What columns do to each other; nothing for a board of one column or without figures of columns. */
export function couplingChapter(context: BoardContext): readonly Chapter[] {
  const coupled = coupledOf(context);
  if (coupled === undefined) return [];
  return [
    chapter(
      'coupling',
      'Coupling',
      matrixFigure(coupled),
      ...matrixTable(coupled),
      ...isolationTable(coupled),
      ...scanFigure(coupled),
      prose(
        'One column driven, all others terminated in the reference impedance, waves taken at the true edge of the first patch. Housing, radome and the edges of the board couple too and are not computed.',
      ),
    ),
  ];
}
