/**
 * Wavenumbers and the guided TM0 wave of a lossless grounded slab, e^{+jωt}: the pole of its spectral potentials
 * (see surface-spectrum.ts) and their residues there.
 */
import { EPS0, SPEED_OF_LIGHT } from '../constants.js';

export interface SlabSpectrum {
  readonly omega: number;
  /** Wavenumbers of air, of the slab's dielectric and of the guided TM0 wave, 1/m. */
  readonly k0: number;
  readonly k1: number;
  readonly kp: number;
  /** lim (k² − kp²) F at the pole; that of M is ω²/kp² times it. */
  readonly residueF: number;
  readonly residueM: number;
  /** The same of G_q, the scalar potential of electric charge on top of the slab. */
  readonly residueQ: number;
}

/**
 * @param frequency    Hz
 * @param permittivity relative, > 1
 * @param height       m
 * @throws RangeError where a second surface wave (TE1) propagates: k0 h √(εr − 1) ≥ π/2
 */
export function slabSpectrum(frequency: number, permittivity: number, height: number): SlabSpectrum {
  const omega = 2 * Math.PI * frequency;
  const k0 = omega / SPEED_OF_LIGHT;
  const k1 = k0 * Math.sqrt(permittivity);
  if (!slabGuidesOneWave(frequency, permittivity, height))
    throw new RangeError(`slabSpectrum: a second surface wave propagates at ${frequency} Hz on ${height} m`);
  const kp = tm0Wavenumber(k0, permittivity, height);
  const { u0, beta } = { u0: Math.sqrt(kp * kp - k0 * k0), beta: Math.sqrt(k1 * k1 - kp * kp) };
  const tan = Math.tan(beta * height);
  const slope = (permittivity * kp) / u0 + (kp / beta) * (tan + beta * height * (1 + tan * tan));
  const residueF = (2 * kp * EPS0 * permittivity * (1 + (permittivity * u0 * tan) / beta)) / slope;
  // G_q = u0 u1 t/(ε0 k² (u1 t + εr u0)) less a TE part without pole; u1 t = −β tan βh = −εr u0 there, and the
  // denominator's slope in k is that of F: d(εr u0 + u1 t)/dk².
  const residueQ = (-2 * u0 * u0 * permittivity) / (EPS0 * kp * slope);
  return { omega, k0, k1, kp, residueF, residueM: (residueF * omega * omega) / (kp * kp), residueQ };
}

/** Whether TM0 alone propagates on the slab: k0 h √(εr − 1) < π/2. */
export function slabGuidesOneWave(frequency: number, permittivity: number, height: number): boolean {
  return ((2 * Math.PI * frequency) / SPEED_OF_LIGHT) * height * Math.sqrt(permittivity - 1) < Math.PI / 2;
}

/** Root of εr u0 = β tan βh between k0 and k1, by bisection on u0 (monotone) to the last bit. TM0 has no cut-off. */
export function tm0Wavenumber(k0: number, permittivity: number, height: number): number {
  let low = 0;
  let high = k0 * Math.sqrt(permittivity - 1);
  for (let i = 0; i < 200 && high - low > 1e-16 * high; i++) {
    const u0 = 0.5 * (low + high);
    const beta = Math.sqrt(Math.max(0, k0 * k0 * (permittivity - 1) - u0 * u0));
    if (permittivity * u0 < beta * Math.tan(beta * height)) low = u0;
    else high = u0;
    if (u0 === low && u0 === high) break;
  }
  const u0 = 0.5 * (low + high);
  return Math.sqrt(k0 * k0 + u0 * u0);
}
