import type { Complex } from '../../numerics/complex.js';
import type { ScatteringTable } from './touchstone.js';

/** Pairs that the format allows in a line. */
const PAIRS_IN_LINE = 4;

/**
 * A table of scattering parameters as a Touchstone file, version 1: GHz, real and imaginary parts, nine significant digits.
 *
 * @param comments one line each, printed before the option line
 * @throws RangeError where a matrix is not square of the size of the table
 */
export function formatTouchstone(table: ScatteringTable, comments: readonly string[] = []): string {
  const { ports, referenceImpedance, points } = table;
  const lines = comments.map((text) => `! ${text.replace(/[\r\n]+/g, ' ')}`);
  lines.push(`# GHz S RI R ${Number(referenceImpedance.toPrecision(12))}`);
  for (const { frequency, s } of points) {
    if (s.length !== ports || s.some((row) => row.length !== ports))
      throw new RangeError(`formatTouchstone: a matrix of ${s.length} rows in a table of ${ports} ports`);
    const rows = ports === 2 ? [[s[0][0], s[1][0], s[0][1], s[1][1]]] : s;
    const wrapped = rows.flatMap((row) => chunks(row));
    wrapped.forEach((piece, i) => {
      const start = i === 0 ? String(Number((frequency / 1e9).toPrecision(12))) : '  ';
      lines.push([start, ...piece.flatMap((c) => [number(c.re), number(c.im)])].join(' '));
    });
  }
  return `${lines.join('\n')}\n`;
}

const number = (value: number): string => (value === 0 ? '0' : value.toExponential(8));

function chunks(row: readonly Complex[]): Complex[][] {
  const found: Complex[][] = [];
  for (let i = 0; i < row.length; i += PAIRS_IN_LINE) found.push(row.slice(i, i + PAIRS_IN_LINE));
  return found;
}
