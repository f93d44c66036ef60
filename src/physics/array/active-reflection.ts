/**
 * Active reflection: what a column sends back when all columns are driven together, for any weights and over scan.
 *
 * Γn = Σ S_nm a_m / a_n (D. M. Pozar, IEEE Trans. Antennas Propag. 42(8), 1994; from memory).
 */
import { abs, abs2, add, type Complex, div, mul, polar, ZERO } from '../../numerics/complex.js';

/** Row = leaving, column = driven. */
export type ScatteringMatrix = readonly (readonly Complex[])[];

/**
 * @param scattering square, of the board's ports
 * @param incident   wave into each port, √W peak, at the same reference planes; 0 where a port is only terminated
 * @returns          one per port; 0 at a port that gets no wave
 * @throws RangeError when the numbers of ports differ
 */
export function activeReflections(scattering: ScatteringMatrix, incident: readonly Complex[]): Complex[] {
  requireSquare('activeReflections', scattering);
  if (incident.length !== scattering.length)
    throw new RangeError(`activeReflections: ${incident.length} waves for ${scattering.length} ports`);
  return scattering.map((row, n) => {
    if (!(abs2(incident[n]) > 0)) return ZERO;
    return div(
      row.reduce((sum, s, m) => add(sum, mul(s, incident[m])), ZERO),
      incident[n],
    );
  });
}

/**
 * Waves that send the beam of columns side by side to an azimuth: the phase lags along y by k0 sin(angle).
 *
 * @param y          centre line of each column, m
 * @param k0         wavenumber in free space, rad/m
 * @param angle      from the zenith towards +y in the H plane, rad
 * @param amplitudes of the waves, √W peak; 0 for a column that is not driven
 */
export function steeringWaves(
  y: readonly number[],
  k0: number,
  angle: number,
  amplitudes: readonly number[],
): Complex[] {
  if (y.length !== amplitudes.length)
    throw new RangeError(`steeringWaves: ${y.length} places, ${amplitudes.length} amplitudes`);
  return y.map((place, n) => polar(amplitudes[n], -k0 * place * Math.sin(angle)));
}

export interface ScanReflection {
  /** Azimuths of the beam, rad, as asked. */
  readonly angles: readonly number[];
  /** Active reflection of every column at every angle: [angle][column]. */
  readonly reflection: readonly (readonly Complex[])[];
  /** Per driven column, where it reflects most. */
  readonly worst: readonly { readonly column: number; readonly angle: number; readonly magnitude: number }[];
}

/**
 * Active reflection of every column while the beam is steered over `angles` by phases alone.
 *
 * @throws RangeError when numbers of columns differ, no angle is asked for, or no column is driven
 */
export function scanReflection(
  scattering: ScatteringMatrix,
  y: readonly number[],
  k0: number,
  angles: readonly number[],
  amplitudes: readonly number[],
): ScanReflection {
  if (angles.length === 0) throw new RangeError('scanReflection: no angle');
  if (!amplitudes.some((a) => a !== 0)) throw new RangeError('scanReflection: no column is driven');
  const reflection = angles.map((angle) => activeReflections(scattering, steeringWaves(y, k0, angle, amplitudes)));
  const worst = amplitudes.flatMap((amplitude, column) => {
    if (amplitude === 0) return [];
    let [magnitude, angle] = [-1, Number.NaN];
    reflection.forEach((row, i) => {
      const size = abs(row[column]);
      if (size > magnitude) [magnitude, angle] = [size, angles[i]];
    });
    return [{ column, angle, magnitude }];
  });
  return { angles, reflection, worst };
}

/** @throws RangeError unless there are as many columns as rows */
export function requireSquare(who: string, matrix: ScatteringMatrix): void {
  for (const row of matrix)
    if (row.length !== matrix.length)
      throw new RangeError(`${who}: a matrix of ${matrix.length} rows with a row of ${row.length}`);
}
