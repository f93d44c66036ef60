/** Which face of the feed line loses how much, and why, under each estimate of the texture. */
import type { Board } from '../manifest/model.js';
import { abs2 } from '../numerics/complex.js';
import { boardLine, DB_PER_NEPER, effectivePermittivity, feedWidth, lossDbPerM } from './board-line.js';
import { bandCentre } from './conditions.js';
import { nominalValues } from './nominal-values.js';
import type { LineLossByFace } from './results.js';
import { surfaces } from './surfaces.js';
import { ROUGHNESS_SIDES } from './views.js';

const FACES = ['underside', 'top', 'edges', 'ground'] as const;

/**
 * 2α P is the power lost in all faces and in the dielectric, P that carried: each one's part of α is its resistance over
 * twice the real characteristic impedance, which sums to α exactly.
 */
export function lineLossByFace(board: Board): LineLossByFace[] {
  const values = nominalValues(board);
  const frequency = bandCentre(board);
  return ROUGHNESS_SIDES.map((side) => {
    const state = surfaces(board, values, side, frequency, board.temperature.nominalC);
    const line = boardLine(board, state, values, feedWidth(board), frequency);
    const perOhm = DB_PER_NEPER / (2 * line.characteristic.re);
    return {
      side,
      faces: FACES.map((face) => {
        const { smooth, finish, texture } = state.parts[face];
        const per = (perOhm * line.seriesResistanceByFace[face]) / state.faces[face].re;
        return { face, smooth: per * smooth, finish: per * finish, texture: per * texture };
      }),
      dielectric: perOhm * line.shuntConductance * abs2(line.characteristic),
      total: lossDbPerM(line),
      effectivePermittivity: effectivePermittivity(line, frequency),
      impedance: line.impedance,
    };
  });
}
