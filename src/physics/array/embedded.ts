/** Embedded element patterns. */
import { type Complex, complex, ZERO } from '../../numerics/complex.js';
import type { ColumnSolution, FarField } from '../column/index.js';

/**
 * Far field of one column driven by a wave of one watt, all others terminated in their reference impedance (embedded
 * element pattern, IEEE Std 145-2013): 4π times its power per solid angle is the embedded realized gain.
 *
 * Patterns of driven boards are sums of these, since the board is linear.
 *
 * @throws RangeError on a column that the board does not have
 */
export function embeddedField(solution: ColumnSolution, column: number): FarField {
  const ports = solution.scattering.length;
  if (!(Number.isInteger(column) && column >= 0 && column < ports))
    throw new RangeError(`embeddedField: column ${column} of ${ports}`);
  const waves: Complex[] = solution.scattering.map((_, c) => (c === column ? complex(Math.SQRT2) : ZERO));
  return solution.excite(waves).field;
}
