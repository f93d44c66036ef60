import { type Complex, complex, div, log } from '../../numerics/complex.js';
import type { ValidityFlag } from '../validity.js';

/** Permittivity and loss tangent of a dielectric as stated at one frequency. */
export interface StatedDielectric {
  /** Relative permittivity, ≥ 1. */
  readonly permittivity: number;
  /** ≥ 0 */
  readonly lossTangent: number;
  /** Frequency of the statement, Hz, > 0. */
  readonly frequency: number;
}

/** Angular frequencies between which the relaxations are spread evenly in the logarithm, rad/s. */
export interface DebyeCorners {
  readonly lower: number;
  readonly upper: number;
}

/** 1e14 rad/s keeps the upper corner out of the band: 1e12 cuts the loss tangent by 26 % between 10 and 77 GHz. */
export const WIDEBAND_CORNERS: DebyeCorners = { lower: 1e4, upper: 1e14 };

export interface WidebandDebye {
  /** Permittivity far above the upper corner. */
  readonly high: number;
  /** Fall of the permittivity from far below the lower corner to far above the upper one. */
  readonly step: number;
  readonly corners: DebyeCorners;
}

const TITLE = 'laminate, wideband Debye';
/** Fall of the loss tangent towards a corner that is flagged. */
const CORNER_FALL = 0.05;

function spread(frequency: number, { lower, upper }: DebyeCorners): Complex {
  const omega = 2 * Math.PI * frequency;
  return log(div(complex(upper, omega), complex(lower, omega)));
}

/**
 * Causal dispersion of a low-loss laminate, from one statement: ε(ω) = ε∞ + Δε ln[(ω2 + jω)/(ω1 + jω)]/ln(ω2/ω1).
 *
 * Source: A. R. Djordjević, R. M. Biljić, V. D. Likar-Smiljanić and T. K. Sarkar, IEEE Trans. Electromagn. Compat. 43(4),
 * 2001, eq. (5) (from memory). It satisfies Kramers–Kronig for any corners; the loss tangent is nearly constant between
 * them. Range: laminates whose loss tangent is nearly constant over the decade or two that are crossed; above, relaxations
 * of the resin raise it, so a value stated in the band is always the better one.
 *
 * @throws RangeError on a statement that is not physical, or outside the corners
 */
export function widebandDebye(stated: StatedDielectric, corners: DebyeCorners = WIDEBAND_CORNERS): WidebandDebye {
  const { permittivity, lossTangent, frequency } = stated;
  if (!(Number.isFinite(permittivity) && permittivity >= 1))
    throw new RangeError(`relative permittivity must be 1 or more, got ${permittivity}`);
  if (!(Number.isFinite(lossTangent) && lossTangent >= 0))
    throw new RangeError(`loss tangent must be 0 or more, got ${lossTangent}`);
  const omega = 2 * Math.PI * frequency;
  if (!(corners.lower > 0 && omega > corners.lower && corners.upper > omega))
    throw new RangeError(
      `frequency ${frequency} Hz must lie between the corners ${corners.lower} and ${corners.upper} rad/s`,
    );
  const l = spread(frequency, corners);
  const decades = Math.log(corners.upper / corners.lower);
  const step = (-permittivity * lossTangent * decades) / l.im;
  return { high: permittivity - (step * l.re) / decades, step, corners };
}

/** Complex relative permittivity ε′ − jε″ of a wideband Debye dielectric at a frequency (e^{+jωt}). */
export function debyePermittivity(dielectric: WidebandDebye, frequency: number): Complex {
  const { high, step, corners } = dielectric;
  const l = spread(frequency, corners);
  const scale = step / Math.log(corners.upper / corners.lower);
  return complex(high + scale * l.re, scale * l.im);
}

/** Linear coefficients of a laminate; those left out count as zero. */
export interface LaminateCoefficients {
  /** Relative change of the permittivity per kelvin. */
  readonly permittivityPerKelvin?: number;
  /** Relative change of the loss tangent per kelvin. */
  readonly lossTangentPerKelvin?: number;
  /** Relative change of the permittivity per mass share of water taken up (1 = all water). */
  readonly permittivityPerWaterShare?: number;
  /** Change of the loss tangent itself per mass share of water taken up. */
  readonly lossTangentPerWaterShare?: number;
}

export interface LaminateConditions {
  /** Hz, > 0 */
  readonly frequency: number;
  /** Departure from the temperature of the statement, K. */
  readonly temperatureRise?: number;
  /** Water taken up since the statement, as a share of mass: 0.0004 for 0.04 %. */
  readonly waterShare?: number;
}

export interface LaminateState {
  readonly permittivity: number;
  readonly lossTangent: number;
  readonly flags: readonly ValidityFlag[];
}

/**
 * Permittivity and loss tangent of a laminate at another frequency, temperature and moisture than those of its statement.
 * The linear coefficients are applied to the statement, then the causal dispersion carries it to the frequency.
 *
 * @example
 * laminateAt({ permittivity: 3, lossTangent: 0.0013, frequency: 10e9 }, { frequency: 77e9, temperatureRise: 60 },
 *   { permittivityPerKelvin: -25e-6 });
 */
export function laminateAt(
  stated: StatedDielectric,
  conditions: LaminateConditions,
  coefficients: LaminateCoefficients = {},
  corners: DebyeCorners = WIDEBAND_CORNERS,
): LaminateState {
  const { temperatureRise = 0, waterShare = 0, frequency } = conditions;
  const c = coefficients;
  const permittivity =
    stated.permittivity *
    (1 + (c.permittivityPerKelvin ?? 0) * temperatureRise + (c.permittivityPerWaterShare ?? 0) * waterShare);
  const lossTangent =
    stated.lossTangent * (1 + (c.lossTangentPerKelvin ?? 0) * temperatureRise) +
    (c.lossTangentPerWaterShare ?? 0) * waterShare;
  const dielectric = widebandDebye({ permittivity, lossTangent, frequency: stated.frequency }, corners);
  const there = debyePermittivity(dielectric, frequency);
  return {
    permittivity: there.re,
    lossTangent: -there.im / there.re,
    flags: cornerFlags(stated.frequency, frequency, corners),
  };
}

function cornerFlags(from: number, to: number, corners: DebyeCorners): ValidityFlag[] {
  const fall = 1 - spread(to, corners).im / spread(from, corners).im;
  if (Math.abs(fall) <= CORNER_FALL) return [];
  return [
    {
      code: 'laminate.debye-corner',
      severity: 'outside',
      model: TITLE,
      text: `Between ${(from / 1e9).toPrecision(3)} and ${(to / 1e9).toPrecision(3)} GHz the loss tangent changes by ${(-100 * fall).toFixed(0)} % only because a corner of the dispersion model lies near (${corners.lower.toExponential(0)} to ${corners.upper.toExponential(0)} rad/s), not because the laminate does.`,
    },
  ];
}
