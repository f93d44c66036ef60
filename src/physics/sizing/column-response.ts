/** What the network says of a column: the figures that sizing steers by. */
import { abs2, add, type Complex, complex, div, ONE, scale, ZERO } from '../../numerics/complex.js';
import { type ColumnGeometry, type ColumnSolution, edgeNetwork } from '../column/index.js';
import type { SizingRequest } from './request.js';

export interface ColumnResponse {
  readonly reflection: Complex;
  /** Integral of the longitudinal current over each patch: what every engine tells. */
  readonly patchCurrents: readonly Complex[];
  /** What each patch radiates: less than its current where a line silences much of a narrow edge. */
  readonly moments: readonly Complex[];
}

export function solveColumn(request: SizingRequest, geometry: ColumnGeometry): ColumnSolution {
  const { frequency, slab, stripThickness, faces } = request;
  const engine = edgeNetwork({ slab, stripThickness, columns: [geometry], referenceImpedance: 'line' }, frequency);
  return engine.solve({ frequency, faces });
}

export function responseOf(solution: ColumnSolution): ColumnResponse {
  const { patchCurrents, edges } = solution.excite([ONE]);
  if (!edges) throw new RangeError('sizeColumn: the network does not say what its patches radiate');
  const { patches, re, im } = edges.currents;
  return {
    reflection: solution.scattering[0][0],
    patchCurrents: patchCurrents[0],
    moments: patches.map(({ length }, p) => complex(re[p] * length, im[p] * length)),
  };
}

/**
 * Currents over those asked for, scaled to a mean square of 1 and turned so that their mean is real and positive. Each counts
 * with its power in the means: a weak patch at the end moves the pattern little.
 */
export function excitationError(currents: readonly Complex[], amplitudes: readonly number[]): Complex[] {
  const power = amplitudes.reduce((sum, a) => sum + a * a, 0);
  const mean = currents.reduce((sum, c, i) => add(sum, scale(c, amplitudes[i])), ZERO);
  const size = Math.sqrt(currents.reduce((sum, c) => sum + abs2(c), 0) / power);
  const turn = scale(mean, size / Math.sqrt(abs2(mean)));
  return currents.map((c, i) => div(scale(c, 1 / amplitudes[i]), turn));
}
