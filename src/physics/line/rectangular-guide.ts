import { ETA0, SPEED_OF_LIGHT } from '../constants.js';

export interface RectangularGuideInput {
  /** Broad inner width a, m. */
  readonly width: number;
  /** Inner height b, m. */
  readonly height: number;
  /** Relative permittivity of the filling. */
  readonly permittivity: number;
  readonly lossTangent: number;
  /** Hz, above cut-off. */
  readonly frequency: number;
  /** Surface resistance of the broad and of the side walls, ohm. */
  readonly surfaceResistance: { readonly broad: number; readonly side: number };
}

export interface RectangularGuide {
  /** Hz */
  readonly cutoff: number;
  /** rad/m */
  readonly beta: number;
  /** Np/m */
  readonly dielectricLoss: number;
  /** Np/m, by wall pair. */
  readonly conductorLoss: { readonly broad: number; readonly side: number };
}

/**
 * TE10 mode of a filled rectangular waveguide with small losses.
 *
 * αd = k² tan δ/(2β); αc = [Rs(broad) a³k² + Rs(side) 2bπ²]/(a³ b β k η).
 * Source: D. M. Pozar, "Microwave Engineering", 4th ed., 2012, section 3.3, eq. (3.29) and (3.96) (from memory).
 * First order in the loss; not at cut-off.
 *
 * @throws RangeError at or below cut-off
 */
export function rectangularGuide(input: RectangularGuideInput): RectangularGuide {
  const { width: a, height: b, permittivity, lossTangent, frequency, surfaceResistance } = input;
  const index = Math.sqrt(permittivity);
  const cutoff = SPEED_OF_LIGHT / (2 * a * index);
  if (!(frequency > cutoff)) throw new RangeError(`TE10 needs more than its cut-off of ${cutoff} Hz, got ${frequency}`);
  const k = (2 * Math.PI * frequency * index) / SPEED_OF_LIGHT;
  const beta = Math.sqrt(k * k - (Math.PI / a) ** 2);
  const common = a ** 3 * b * beta * k * (ETA0 / index);
  return {
    cutoff,
    beta,
    dielectricLoss: (k * k * lossTangent) / (2 * beta),
    conductorLoss: {
      broad: (surfaceResistance.broad * a ** 3 * k * k) / common,
      side: (surfaceResistance.side * 2 * b * Math.PI ** 2) / common,
    },
  };
}
