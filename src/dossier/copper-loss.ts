import { formatNumber } from '../quantity/index.js';
import type { LineLossByFace } from '../study/results.js';
import { cell, number, prose, table } from './blocks.js';
import type { Block } from './document.js';
import { sideTitle } from './model-words.js';

const FACES: readonly (readonly [LineLossByFace['faces'][number]['face'], string])[] = [
  ['underside', 'Strip underside'],
  ['ground', 'Ground'],
  ['edges', 'Strip edges'],
  ['top', 'Strip top'],
];
const PARTS = [
  ['smooth', 'smooth copper'],
  ['finish', 'finish'],
  ['texture', 'texture'],
] as const;

/** Thousandths of dB/cm. */
const DECIMALS = 3;

/**
 * Rounds parts so that they add up to the rounded sum: those whose remainders are largest are rounded up.
 * All in units of the last printed digit.
 */
export function roundedParts(parts: readonly number[], total: number): readonly number[] {
  const floors = parts.map(Math.floor);
  const missing = Math.round(total) - floors.reduce((a, b) => a + b, 0);
  const order = parts.map((_, i) => i).sort((a, b) => parts[b] - floors[b] - (parts[a] - floors[a]) || a - b);
  const raised = new Set(order.slice(0, Math.max(0, missing)));
  return floors.map((value, i) => value + (raised.has(i) ? 1 : 0));
}

interface Part {
  readonly label: string;
  /** dB/m, one value an estimate. */
  readonly values: readonly number[];
}

function partsOf(losses: readonly LineLossByFace[]): readonly Part[] {
  const lossOf = (loss: LineLossByFace, face: string, part: 'smooth' | 'finish' | 'texture') =>
    loss.faces.filter((entry) => entry.face === face).reduce((sum, entry) => sum + entry[part], 0);
  return [
    ...FACES.flatMap(([face, name]) =>
      PARTS.map(([part, words]) => ({
        label: `${name}, ${words}`,
        values: losses.map((loss) => lossOf(loss, face, part)),
      })),
    ),
    { label: 'Dielectric', values: losses.map(({ dielectric }) => dielectric) },
  ];
}

/** Loss of the feed line by face, with what finish and texture add to smooth copper; columns are the estimates. */
export function lossByFace(losses: readonly LineLossByFace[]): readonly Block[] {
  if (losses.length === 0) return [];
  const scale = 10 ** DECIMALS / 100;
  const parts = partsOf(losses);
  const columns = losses.map((loss, i) =>
    roundedParts(
      parts.map(({ values }) => values[i] * scale),
      loss.total * scale,
    ),
  );
  const print = (last: number) => number(formatNumber(last / 10 ** DECIMALS, DECIMALS));
  const shown = parts.flatMap(({ label, values }, row) =>
    values.every((value) => value === 0) ? [] : [[cell(label), ...columns.map((column) => print(column[row]))]],
  );
  const line = losses.map(
    ({ side, effectivePermittivity, impedance }) =>
      `${sideTitle(side).toLowerCase()} ${formatNumber(effectivePermittivity, 3)} and ${formatNumber(impedance, 1)}\u00a0Ω`,
  );
  return [
    table(
      'loss-by-face',
      'Loss of the feed line by face in dB/cm at the band centre and nominal temperature, under each estimate of the texture',
      ['Where|2', ...losses.map(({ side }) => `#${sideTitle(side)}`)],
      [
        ...shown,
        [
          cell({ strong: 'Together' }),
          ...columns.map((column) => print(column.reduce((sum, value) => sum + value, 0))),
        ],
      ],
    ),
    prose(
      'Each face counts with its own share of the current. Finish and texture are what they add to smooth copper, or take from it. ',
      `Effective permittivity and impedance of the line: ${line.join('; ')}.`,
    ),
  ];
}
