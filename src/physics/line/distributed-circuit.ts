import { add, type Complex, complex, div, mul, scale, sqrt, ZERO } from '../../numerics/complex.js';
import { SPEED_OF_LIGHT } from '../constants.js';

export interface DistributedCircuitInput<Face extends string> {
  /** Characteristic impedance without loss, ohm, > 0. */
  readonly impedance: number;
  /** Effective relative permittivity without loss, ≥ 1. */
  readonly effectivePermittivity: number;
  /** Hz, > 0 */
  readonly frequency: number;
  /** Loss tangent of the line as a whole: that of the dielectric times its share of the capacitance. */
  readonly lossTangent: number;
  /** Series resistance per length of a face over its surface resistance, 1/m. */
  readonly weights: Readonly<Record<Face, number>>;
  /** Surface impedance of each face, ohm. */
  readonly faces: Readonly<Record<Face, Complex>>;
}

/** A lossy line of which each face's part is known. */
export interface DistributedCircuit<Face extends string> {
  /** Propagation constant α + jβ, 1/m. */
  readonly gamma: Complex;
  /** Characteristic impedance with loss, ohm. */
  readonly characteristic: Complex;
  /** Np/m of each face, R/(2 Z0). To first order their sum and `dielectricLoss` are Re γ. */
  readonly conductorLoss: Readonly<Record<Face, number>>;
  /** Np/m */
  readonly dielectricLoss: number;
}

/**
 * A line that carries a quasi-TEM wave as a distributed circuit: Z′ = jωL + Σ Z(face)·weight, Y′ = jωC (1 − j tan δ).
 * The metal's inner reactance slows the wave. Any text on transmission lines.
 *
 * @throws RangeError on arguments that are not physical
 */
export function distributedCircuit<Face extends string>(
  input: DistributedCircuitInput<Face>,
): DistributedCircuit<Face> {
  const { impedance, effectivePermittivity, frequency, lossTangent, weights, faces } = input;
  if (!(frequency > 0)) throw new RangeError(`frequency must be positive, got ${frequency}`);
  if (!(lossTangent >= 0)) throw new RangeError(`loss tangent must be 0 or more, got ${lossTangent}`);
  const names = Object.keys(weights) as Face[];
  const omega = 2 * Math.PI * frequency;
  const slowness = Math.sqrt(effectivePermittivity) / SPEED_OF_LIGHT;
  const surface = names.reduce((sum, name) => add(sum, scale(faces[name], weights[name])), ZERO);
  const series = add(complex(0, omega * impedance * slowness), surface);
  const susceptance = (omega * slowness) / impedance;
  const shunt = complex(susceptance * lossTangent, susceptance);
  const loss = names.map((name) => [name, (faces[name].re * weights[name]) / (2 * impedance)] as const);
  return {
    gamma: sqrt(mul(series, shunt)),
    characteristic: sqrt(div(series, shunt)),
    conductorLoss: Object.fromEntries(loss) as Record<Face, number>,
    dielectricLoss: 0.5 * omega * slowness * lossTangent,
  };
}
