/** The patches that the network is calibrated with: spread evenly over the range, the same every time. */
import type { CalibrationRange, Interval } from '../column/calibration-record.js';
import type { Slab } from '../column/engine.js';
import { SPEED_OF_LIGHT } from '../constants.js';
import { microstripLine, openEndExtension } from '../line/index.js';
import { CALIBRATION_FREQUENCY } from './range.js';

export interface CalibrationCase {
  /** Without loss: the constants are of radiation and reactance. */
  readonly slab: Slab;
  /** m */
  readonly lineWidth: number;
  readonly patchWidth: number;
  readonly patchLength: number;
}

/** Points of the lattice plus one, a prime. */
const MODULUS = 17;
/**
 * Multiplier from one quantity to the next: of those whose points keep furthest apart, one that gives the thinnest laminate
 * a wide line. Hair lines under wide patches ask for meshes that take the full wave a minute each.
 */
const MULTIPLIER = 8;
/** A line wider than this part of its patch makes hardly a step. */
const WIDEST_LINE = 0.6;

/**
 * A good-lattice-point set (N. M. Korobov, Dokl. Akad. Nauk SSSR 124, 1959): each of the four quantities takes 16
 * levels from end to end of its range, each once. Patches resonate near 77 GHz before a line is attached. Where the line
 * would be too wide for the narrowest patch, widths begin where it is not.
 */
export function calibrationCases(range: CalibrationRange): CalibrationCase[] {
  const { electricalHeight, permittivity, lineWidthOverHeight, patchWidth } = range;
  return Array.from({ length: MODULUS - 1 }, (_, i) => {
    const level = (dimension: number): number => ((((i + 1) * MULTIPLIER ** dimension) % MODULUS) - 1) / (MODULUS - 2);
    const height = (at(electricalHeight, level(0)) * SPEED_OF_LIGHT) / (2 * Math.PI * CALIBRATION_FREQUENCY);
    const slab = { permittivity: at(permittivity, level(1)), lossTangent: 0, height };
    const lineWidth = height * at(lineWidthOverHeight, level(2));
    const narrowest = Math.max(patchWidth[0], lineWidth / WIDEST_LINE);
    const width = at([narrowest, patchWidth[1]], level(3));
    return { slab, lineWidth, patchWidth: width, patchLength: halfWave(slab, width) };
  });
}

const at = ([low, high]: Interval, level: number): number => low + (high - low) * level;

/** Length at which a patch is half a wave long with its open ends, m. */
function halfWave({ permittivity, height }: Slab, width: number): number {
  const geometry = { width, height, thickness: 0, permittivity };
  const zero = { re: 0, im: 0 };
  const faces = { underside: zero, top: zero, edges: zero, ground: zero };
  const { effectivePermittivity } = microstripLine({
    geometry,
    frequency: CALIBRATION_FREQUENCY,
    lossTangent: 0,
    faces,
  });
  const wavelength = SPEED_OF_LIGHT / (CALIBRATION_FREQUENCY * Math.sqrt(effectivePermittivity));
  return wavelength / 2 - 2 * openEndExtension(geometry, CALIBRATION_FREQUENCY);
}
