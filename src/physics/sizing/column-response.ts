/** What the network says of a column: the figures that sizing steers by. */
import { abs2, add, type Complex, complex, div, scale, ZERO } from '../../numerics/complex.js';
import { type ColumnGeometry, type ColumnSolution, edgeNetwork } from '../column/index.js';
import type { SizingRequest } from './request.js';

export interface ColumnResponse {
  readonly reflection: Complex;
  /** Of each patch, in any common unit. */
  readonly patchCurrents: readonly Complex[];
}

export function solveColumn(request: SizingRequest, geometry: ColumnGeometry): ColumnSolution {
  const { frequency, slab, stripThickness, faces } = request;
  const engine = edgeNetwork({ slab, stripThickness, columns: [geometry], referenceImpedance: 'line' }, frequency);
  return engine.solve({ frequency, faces });
}

export function responseOf(solution: ColumnSolution): ColumnResponse {
  const { patchCurrents } = solution.excite([complex(1)]);
  return { reflection: solution.scattering[0][0], patchCurrents: patchCurrents[0] };
}

/** Currents over those asked for, scaled to a mean square of 1 and turned so that their mean is real and positive. */
export function excitationError(currents: readonly Complex[], amplitudes: readonly number[]): Complex[] {
  const ratios = currents.map((c, i) => scale(c, 1 / amplitudes[i]));
  const mean = ratios.reduce((sum, c) => add(sum, c), ZERO);
  const size = Math.sqrt(ratios.reduce((sum, c) => sum + abs2(c), 0) / ratios.length);
  const turn = scale(mean, size / Math.sqrt(abs2(mean)));
  return ratios.map((c) => div(c, turn));
}
