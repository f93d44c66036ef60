import type { Board } from '../manifest/model.js';
import { slabGuidesOneWave } from '../physics/column/index.js';
import { boardLine, feedWidth } from './board-line.js';
import { nominalValues } from './nominal-values.js';
import { surfaces } from './surfaces.js';

/** Why the columns of this board cannot be computed, or undefined. Its lines are computed all the same. */
export function columnObstacle(board: Board): string | undefined {
  const { cover, laminate } = board.stackUp;
  if (cover)
    return `the board has a cover layer (${cover.material}); the column model has none, and 25 µm of solder mask raises effective permittivity by about 8 %. The line figures include it`;
  const permittivity = laminate.material.permittivity.value + laminate.material.permittivity.plus;
  const height = laminate.thickness.value + laminate.thickness.plus;
  if (!slabGuidesOneWave(board.band.high * 1.02, permittivity * 1.02, height))
    return 'at the upper band edge the laminate guides a second surface wave, which the column model does not carry';
  if (board.retuned !== undefined && 'reason' in board.retuned) return board.retuned.reason;
  if (board.sized !== undefined && 'reason' in board.sized) return board.sized.reason;
  return undefined;
}

/** Why not even the feed line can be computed, or undefined. */
export function lineObstacle(board: Board): string | undefined {
  const values = nominalValues(board);
  const frequency = board.band.high;
  const state = surfaces(board, values, 'smooth', frequency, board.temperature.nominalC);
  try {
    boardLine(board, state, values, feedWidth(board), frequency);
    return undefined;
  } catch (cause) {
    if (!(cause instanceof RangeError)) throw cause;
    return `the feed line cannot be solved: ${cause.message}`;
  }
}
