import type { Board } from '../manifest/model.js';
import type { ColumnProblem } from '../physics/column/index.js';
import { columnGeometry } from './geometry.js';
import { FARTHEST_SHIFT } from './shift.js';
import type { BoardValues } from './values.js';

/** A board as the column solvers prepare for it. Loss is a condition of each solve, not of the preparation. */
export const columnProblem = (board: Board, values: BoardValues): ColumnProblem => ({
  slab: { permittivity: values.permittivity, lossTangent: 0, height: values.height },
  stripThickness: values.stripThickness,
  columns: columnGeometry(board, values.etch),
  referenceImpedance: board.referenceImpedance,
});

/** The network is prepared for frequencies that no shift leaves. */
export const highestSolved = (board: Board): number => (1 + FARTHEST_SHIFT) * board.band.high;
