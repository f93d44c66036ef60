import type { Board } from '../manifest/model.js';
import { slabGuidesOneWave } from '../physics/column/index.js';

/** Why nothing can be computed for this board, or undefined. */
export function obstacle(board: Board): string | undefined {
  const { cover, laminate } = board.stackUp;
  if (cover)
    return `the board has a cover layer (${cover.material}); the line and column models have none, and 25 µm of solder mask raises effective permittivity by about 8 %`;
  const permittivity = laminate.material.permittivity.value + laminate.material.permittivity.plus;
  const height = laminate.thickness.value + laminate.thickness.plus;
  if (!slabGuidesOneWave(board.band.high * 1.02, permittivity * 1.02, height))
    return 'at the upper band edge the laminate guides a second surface wave, which the column model does not carry';
  if (board.retuned !== undefined && 'reason' in board.retuned) return board.retuned.reason;
  return undefined;
}
