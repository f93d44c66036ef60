import { type Complex, complex, coth, mul, scale } from '../../numerics/complex.js';
import { MU0 } from '../constants.js';

/** Conductivity of the international annealed copper standard at 20 °C, S/m (IEC 60028:1925, 1/58 Ω mm²/m). */
export const ANNEALED_COPPER_CONDUCTIVITY = 5.8e7;
/** Temperature coefficient of its resistance at constant mass, 20 °C, 1/K (IEC 60028:1925). */
export const COPPER_TEMPERATURE_COEFFICIENT = 0.00393;

function requirePositive(name: string, value: number): void {
  if (!(Number.isFinite(value) && value > 0)) throw new RangeError(`${name} must be positive and finite, got ${value}`);
}

/**
 * Conductivity of a metal at a temperature, by the linear law of resistance about 20 °C, S/m.
 *
 * Source: IEC 60028:1925 for copper. The linear law holds to better than 1 % of resistance from −50 to 150 °C
 * (pure copper bends below −100 °C).
 *
 * @param at20        conductivity at 20 °C, S/m, > 0
 * @param temperature °C
 * @param coefficient 1/K at 20 °C; default that of annealed copper
 * @throws RangeError where the law would give no resistance left
 */
export function conductivityAt(
  at20: number,
  temperature: number,
  coefficient: number = COPPER_TEMPERATURE_COEFFICIENT,
): number {
  requirePositive('conductivity', at20);
  const ratio = 1 + coefficient * (temperature - 20);
  if (!(ratio > 0)) throw new RangeError(`no resistance left at ${temperature} °C with coefficient ${coefficient} 1/K`);
  return at20 / ratio;
}

/**
 * Skin depth δ = sqrt(2/(ωμσ)), m. A good conductor is assumed (ωε ≪ σ) and the normal skin effect: the anomalous
 * one adds 0.3 % to the resistance of copper at 77 GHz.
 *
 * @param frequency            Hz, > 0
 * @param conductivity         S/m, > 0
 * @param relativePermeability 1 unless the metal is magnetic
 */
export function skinDepth(frequency: number, conductivity: number, relativePermeability = 1): number {
  requirePositive('frequency', frequency);
  requirePositive('conductivity', conductivity);
  requirePositive('relative permeability', relativePermeability);
  return 1 / Math.sqrt(Math.PI * frequency * MU0 * relativePermeability * conductivity);
}

/** Surface resistance Rs = 1/(σδ) of a smooth thick conductor, ohm. Arguments as for `skinDepth`. */
export function surfaceResistance(frequency: number, conductivity: number, relativePermeability = 1): number {
  return 1 / (conductivity * skinDepth(frequency, conductivity, relativePermeability));
}

/** Surface impedance (1 + j) Rs of a smooth conductor thicker than four skin depths, ohm. */
export function halfSpaceImpedance(frequency: number, conductivity: number, relativePermeability = 1): Complex {
  const rs = surfaceResistance(frequency, conductivity, relativePermeability);
  return complex(rs, rs);
}

/**
 * Surface impedance of a smooth sheet with field on one side only, ohm: Zc coth((1 + j) t/δ). Exact for any thickness
 * of a plane good conductor.
 *
 * @param thickness m, > 0
 */
export function sheetImpedance(
  frequency: number,
  conductivity: number,
  thickness: number,
  relativePermeability = 1,
): Complex {
  requirePositive('sheet thickness', thickness);
  const delta = skinDepth(frequency, conductivity, relativePermeability);
  const phase = scale(complex(1, 1), thickness / delta);
  return mul(halfSpaceImpedance(frequency, conductivity, relativePermeability), coth(phase));
}
