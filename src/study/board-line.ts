/** Microstrips on a board's stack-up, solved: their loss, permittivity and impedance. */
import type { Board } from '../manifest/model.js';
import { SPEED_OF_LIGHT } from '../physics/constants.js';
import { type MicrostripLine, microstripLine, type StripSection, solvedMicrostrip } from '../physics/line/index.js';
import type { ValidityFlag } from '../physics/validity.js';
import { bandCentre } from './conditions.js';
import { nominalValues } from './nominal-values.js';
import type { LinePoint } from './results.js';
import { tabledStrip } from './strip-table.js';
import type { Surfaces } from './surfaces.js';
import type { BoardValues } from './values.js';

/** dB per neper. */
export const DB_PER_NEPER = 20 / Math.LN10;

function sectionOf(
  { permittivity, height, stripThickness }: Pick<BoardValues, 'permittivity' | 'height' | 'stripThickness'>,
  { cover }: BoardValues,
  width: number,
): StripSection {
  return {
    width,
    height,
    thickness: stripThickness,
    permittivity,
    ...(cover ? { cover: { permittivity: cover.permittivity, thickness: cover.thickness, shape: 'planar' } } : {}),
  };
}

/**
 * A microstrip on a board under the conditions of `state`. A cover layer is taken as flat, with its whole thickness above the
 * laminate.
 *
 * @param drawn width as drawn, m; etching is in `values`
 * @throws RangeError where no bound wave is found
 */
export function boardLine(
  board: Board,
  state: Surfaces,
  values: BoardValues,
  drawn: number,
  frequency: number,
): MicrostripLine {
  const { slab, stripThickness, faces, linePermittivity } = state;
  const at = { permittivity: linePermittivity, height: slab.height, stripThickness };
  const geometry = sectionOf(at, values, drawn + values.etch);
  const nominal = nominalValues(board);
  const anchor = { section: sectionOf(nominal, nominal, drawn), frequency: bandCentre(board) };
  return solvedMicrostrip({
    geometry,
    frequency,
    lossTangent: slab.lossTangent,
    coverLossTangent: values.cover?.lossTangent ?? 0,
    faces,
    solution: tabledStrip(geometry, frequency, anchor),
  });
}

export const lossDbPerM = (line: MicrostripLine): number => DB_PER_NEPER * line.gamma.re;

/** From the phase, the metal's inner reactance included. */
export const effectivePermittivity = (line: MicrostripLine, frequency: number): number =>
  ((line.gamma.im * SPEED_OF_LIGHT) / (2 * Math.PI * frequency)) ** 2;

/** The line that the line figures are of: the first column's, as drawn. */
export const feedWidth = (board: Board): number => board.columns[0].feedLine.width;

export const linePoint = (line: MicrostripLine, frequency: number, temperatureC: number): LinePoint => ({
  frequency,
  temperatureC,
  lossDbPerM: lossDbPerM(line),
  effectivePermittivity: effectivePermittivity(line, frequency),
  impedance: line.impedance,
});

/** Difference in effective permittivity from which the columns' own lines are said to differ. */
const WORTH_SAYING = 0.006;

/** Whether the column network, which has lines of its own in closed form, sees another wave than the solved line. */
export function columnLineFlags(
  state: Surfaces,
  width: number,
  line: MicrostripLine,
  frequency: number,
): ValidityFlag[] {
  const { slab, stripThickness, faces } = state;
  const closed = microstripLine({
    geometry: { width, height: slab.height, thickness: stripThickness, permittivity: slab.permittivity },
    frequency,
    lossTangent: slab.lossTangent,
    faces,
  });
  const off = closed.effectivePermittivity / line.effectivePermittivity - 1;
  if (Math.abs(off) <= WORTH_SAYING) return [];
  return [
    {
      code: 'line.columns-differ',
      severity: 'note',
      model: 'lines of the column network',
      text: `The column network has lines of its own in closed form; their effective permittivity at the feed line's width is ${(100 * Math.abs(off)).toFixed(1)} % ${off < 0 ? 'below' : 'above'} the solved one, which moves a resonance by ${((Math.abs(off) * frequency) / 2e6).toFixed(0)} MHz. Closed forms are good to 0.6 %. Line figures are the solved ones.`,
    },
  ];
}
