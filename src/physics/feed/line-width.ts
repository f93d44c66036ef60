import { bracketedRoot } from '../../numerics/brent.js';
import type { Slab } from '../column/index.js';
import { type FaceImpedances, type MicrostripLine, microstripLine } from '../line/index.js';

/** What a microstrip lies on and is made of, at one frequency and temperature. */
export interface LineSurroundings {
  readonly slab: Slab;
  readonly stripThickness: number;
  readonly faces: FaceImpedances;
}

/** Microstrip of a width (m) at a frequency by the closed forms. @throws RangeError as `microstripLine` */
export function lineOfWidth(at: LineSurroundings, frequency: number, width: number): MicrostripLine {
  return microstripLine({
    geometry: {
      width,
      height: at.slab.height,
      thickness: at.stripThickness,
      permittivity: at.slab.permittivity,
    },
    frequency,
    lossTangent: at.slab.lossTangent,
    faces: at.faces,
  });
}

/** Widths in heights of the slab between which one is looked for: what the closed forms are stated for. */
const NARROWEST = 0.05;
const WIDEST = 20;

/**
 * Width of the line of an impedance (ohm), m, between `leastWidth` and 20 heights of the slab; the nearest end where the
 * impedance lies beyond it.
 */
export function widthOfImpedance(at: LineSurroundings, frequency: number, impedance: number, leastWidth = 0): number {
  const low = Math.max(leastWidth, NARROWEST * at.slab.height);
  const high = WIDEST * at.slab.height;
  const excess = (w: number): number => lineOfWidth(at, frequency, w).impedance - impedance;
  const [first, last] = [excess(low), excess(high)];
  if (first <= 0) return low;
  if (last >= 0) return high;
  return bracketedRoot(excess, [low, first], [high, last], 1e-10).inside;
}
