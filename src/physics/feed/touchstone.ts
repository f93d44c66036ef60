/**
 * Touchstone files, version 1: the open industry format in which scattering parameters are exchanged as text.
 *
 * Source: Touchstone File Format Specification, revision 1.1 (IBIS Open Forum 2002, from memory). Of a two-port a line holds
 * S11 S21 S12 S22; of more ports the matrix follows row by row. Noise data after a two-port's are passed over.
 */
import { type Complex, complex, polar } from '../../numerics/complex.js';

export interface ScatteringTable {
  readonly ports: number;
  /** Ohm, real, of every port. */
  readonly referenceImpedance: number;
  /** Frequency in Hz, ascending; rows leaving, columns driven. */
  readonly points: readonly { readonly frequency: number; readonly s: readonly (readonly Complex[])[] }[];
}

/** What is wrong with a file, and in which line, counted from 1. */
export class TouchstoneError extends Error {
  constructor(
    readonly line: number,
    message: string,
  ) {
    super(message);
    this.name = 'TouchstoneError';
  }
}

const UNITS = new Map([
  ['hz', 1],
  ['khz', 1e3],
  ['mhz', 1e6],
  ['ghz', 1e9],
]);
type PairFormat = 'ri' | 'ma' | 'db';

interface Options {
  readonly unit: number;
  readonly format: PairFormat;
  readonly reference: number;
}

interface Word {
  readonly value: number;
  readonly line: number;
  readonly firstOfLine: boolean;
}

/**
 * @param ports 1 to 4; the suffix of the file's name says it (`.s2p`)
 * @throws TouchstoneError at the first line that cannot be read; RangeError on a number of ports outside 1 to 4
 */
export function parseTouchstone(text: string, ports: number): ScatteringTable {
  if (!(Number.isInteger(ports) && ports >= 1 && ports <= 4))
    throw new RangeError(`a Touchstone file of 1 to 4 ports is read here, got ${ports}`);
  let options: Options | undefined;
  const words: Word[] = [];
  const lines = text.replace(/^\uFEFF/, '').split(/\r\n|\r|\n/);
  lines.forEach((raw, i) => {
    const line = i + 1;
    const content = raw.split('!', 1)[0].trim();
    if (content === '') return;
    if (content.startsWith('['))
      throw new TouchstoneError(
        line,
        `found ${content.split(/\s/)[0]}, a keyword of version 2; version 1 is read here`,
      );
    if (content.startsWith('#')) {
      // The specification: option lines after the first are passed over.
      options ??= optionLine(content.slice(1), line);
      return;
    }
    if (!options) throw new TouchstoneError(line, 'found data before the option line, such as "# GHz S RI R 50"');
    content.split(/\s+/).forEach((word, k) => {
      const value = Number(word);
      if (!Number.isFinite(value)) throw new TouchstoneError(line, `found "${word}" where a number belongs`);
      words.push({ value, line, firstOfLine: k === 0 });
    });
  });
  if (!options) throw new TouchstoneError(lines.length, 'found no option line, such as "# GHz S RI R 50"');
  const points = readPoints(words, ports, options);
  if (points.length === 0) throw new TouchstoneError(lines.length, 'found no data after the option line');
  return { ports, referenceImpedance: options.reference, points };
}

function optionLine(content: string, line: number): Options {
  let [unit, format, reference]: [number, PairFormat, number] = [1e9, 'ma', 50];
  const words = content.toLowerCase().split(/\s+/).filter(Boolean);
  for (let i = 0; i < words.length; i++) {
    const word = words[i];
    if (UNITS.has(word)) unit = UNITS.get(word)!;
    else if (word === 'ri' || word === 'ma' || word === 'db') format = word;
    else if (word === 'r') {
      reference = Number(words[++i]);
      if (!(Number.isFinite(reference) && reference > 0))
        throw new TouchstoneError(line, `found reference "R ${words[i] ?? ''}"; it is a resistance in ohm above 0`);
    } else if (['y', 'z', 'g', 'h'].includes(word))
      throw new TouchstoneError(line, `found parameters ${word.toUpperCase()}; scattering parameters S are read here`);
    else if (word !== 's')
      throw new TouchstoneError(
        line,
        `found option "${word}"; allowed are Hz, kHz, MHz, GHz, S, RI, MA, DB and R with a number`,
      );
  }
  return { unit, format, reference };
}

function readPoints(words: readonly Word[], ports: number, options: Options): ScatteringTable['points'] {
  const length = 1 + 2 * ports * ports;
  const points: { frequency: number; s: Complex[][] }[] = [];
  for (let at = 0; at < words.length; at += length) {
    const { value, line, firstOfLine } = words[at];
    if (!firstOfLine)
      throw new TouchstoneError(line, `found more numbers than the ${length} of one frequency of a ${ports}-port`);
    const frequency = value * options.unit;
    const last = points.at(-1)?.frequency;
    if (last !== undefined && !(frequency > last)) {
      if (ports === 2 && wordsInLine(words, at) === 5) break;
      throw new TouchstoneError(line, `found frequency ${value} after a higher or equal one; they must ascend`);
    }
    if (!(frequency >= 0)) throw new TouchstoneError(line, `found frequency ${value}; it must not be negative`);
    if (at + length > words.length)
      throw new TouchstoneError(
        words[words.length - 1].line,
        `found ${words.length - at} numbers for the last frequency; a ${ports}-port has ${length}`,
      );
    const pairs = Array.from({ length: ports * ports }, (_, k) =>
      pair(words[at + 1 + 2 * k].value, words[at + 2 + 2 * k].value, options.format),
    );
    const place = (row: number, column: number): Complex =>
      pairs[ports === 2 ? column * ports + row : row * ports + column];
    const s = Array.from({ length: ports }, (_, row) => Array.from({ length: ports }, (_, c) => place(row, c)));
    points.push({ frequency, s });
  }
  return points;
}

function wordsInLine(words: readonly Word[], at: number): number {
  let n = 0;
  while (at + n < words.length && words[at + n].line === words[at].line) n++;
  return n;
}

function pair(a: number, b: number, format: PairFormat): Complex {
  if (format === 'ri') return complex(a, b);
  return polar(format === 'db' ? 10 ** (a / 20) : a, (b * Math.PI) / 180);
}
