import { MU0 } from '../constants.js';
import type { RoughFace } from './rough-face.js';

type Face = Pick<RoughFace, 'impedance' | 'planeShift' | 'frequency' | 'lossFactor'>;

const perLength = (reactance: number, frequency: number): number => reactance / (2 * Math.PI * frequency * MU0);

/**
 * Slow-wave length of a face, m: s = X δ/2 + es, the depth at which the magnetic field ends below the plane at which the
 * electric field ends. Both are counted from the mean plane, so that s itself depends on no plane. δ/2 when smooth.
 * Own derivation; inductance per length grows by µ0 and capacitance per length shrinks by the same depths.
 */
export const slowWaveLength = (face: Face): number => perLength(face.impedance.im, face.frequency) + face.planeShift;

/** Slow-wave length beyond that of a smooth face of the same metal, m. */
export const slowWaveExcess = (face: Face): number =>
  slowWaveLength(face) - perLength(face.impedance.re / face.lossFactor, face.frequency);

/** Share of the wide line's rise that a line feels: 1 for w ≫ h, 0.75 at 50 ohm on permittivity 3 (within 3 %). */
export const SLOW_WAVE_SHARE = { wide: 1, fiftyOhm: 0.75 } as const;

/**
 * Relative rise of the effective permittivity of a microstrip over one with smooth faces:
 * share · (s_strip + s_ground − δ)/h. First order in s/h; within 3 % of independent sections with rough faces.
 *
 * Do not add it where the laminate's permittivity is a design value fitted on lines with the same foil and thickness: the
 * rise is in it already.
 *
 * @param height between mean planes, m, > 0
 * @param share  one of `SLOW_WAVE_SHARE`, or a line's own
 * @example
 * permittivityRise({ strip: face, ground: face, height: 127e-6, share: SLOW_WAVE_SHARE.fiftyOhm }); // 0.0064
 */
export function permittivityRise(line: {
  readonly strip: Face;
  readonly ground: Face;
  readonly height: number;
  readonly share: number;
}): number {
  if (!(line.height > 0)) throw new RangeError(`dielectric height must be positive, got ${line.height}`);
  return (line.share * (slowWaveExcess(line.strip) + slowWaveExcess(line.ground))) / line.height;
}

/** Shift of a resonance by a small relative rise of the permittivity, Hz: −f/2 times the rise. */
export const resonanceShift = (rise: number, frequency: number): number => -0.5 * frequency * rise;

/** Change of sin θ of a series-fed column's beam by a small relative rise: sqrt(εeff)/2 times the rise. */
export const tiltShift = (rise: number, effectivePermittivity: number): number =>
  0.5 * Math.sqrt(effectivePermittivity) * rise;
