/**
 * Spectral admittances of a grounded slab seen by a magnetic current on its ground plane, lossless slab, e^{+jωt}.
 *
 * With Ye and Yh the admittances of the TM and TE slab lines looking up from the ground (Pozar 1982; Michalski &
 * Mosig 1997, the dual case), the vector- and scalar-potential kernels are
 *   F = Ye/(jω),   M = jω (Yh − Ye)/k²,
 * from which the terms of an infinite slab, ε1/u1 and 1/(μ0 u1), are taken off: what remains falls as e^{−2kh}.
 * u0² = k² − k0², u1² = k² − εr k0², t = tanh(u1 h).
 */
import { EPS0, MU0, SPEED_OF_LIGHT } from '../constants.js';

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
  /** F and M less their infinite-slab terms at real k: out = [Re F, Im F, Re M, Im M]. */
  remainder(k: number, out: Float64Array): void;
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
  const er = permittivity;
  const e1 = EPS0 * er;

  function remainder(k: number, out: Float64Array): void {
    const k2 = k * k;
    const propagating = k < k0;
    // u0 is real above k0 and j·w below it; u1 appears only as u1² , u1 t and t/u1, which are real either way.
    const w = Math.sqrt(Math.abs(k2 - k0 * k0));
    const s = k2 - k1 * k1;
    const v = Math.sqrt(Math.abs(s));
    const evanescent = s > 0;
    const t = evanescent ? Math.tanh(v * height) : Math.tan(v * height);
    const u1t = evanescent ? v * t : -v * t;
    const tOverU1 = v === 0 ? height : t / v;
    // F = e1 (1 + er u0 t/u1) / (er u0 + u1 t);  jω Yh = (1/μ0) (u0 + u1 t) / (1 + u0 t/u1)
    let fr: number;
    let fi: number;
    let yr: number;
    let yi: number;
    if (propagating) {
      [fr, fi] = quotient(1, er * w * tOverU1, u1t, er * w);
      [yr, yi] = quotient(u1t, w, 1, w * tOverU1);
    } else {
      fr = (1 + er * w * tOverU1) / (er * w + u1t);
      fi = 0;
      yr = (w + u1t) / (1 + w * tOverU1);
      yi = 0;
    }
    fr *= e1;
    fi *= e1;
    const mr = (yr / MU0 + omega * omega * fr) / k2;
    const mi = (yi / MU0 + omega * omega * fi) / k2;
    // Infinite-slab terms: 1/u1 is −j/v below k1 (u1 = +jv).
    out[0] = evanescent ? fr - e1 / v : fr;
    out[1] = evanescent ? fi : fi + e1 / v;
    out[2] = evanescent ? mr - 1 / (MU0 * v) : mr;
    out[3] = evanescent ? mi : mi + 1 / (MU0 * v);
  }

  return { omega, k0, k1, kp, residueF, residueM: (residueF * omega * omega) / (kp * kp), residueQ, remainder };
}

/** Whether TM0 alone propagates on the slab: k0 h √(εr − 1) < π/2. */
export function slabGuidesOneWave(frequency: number, permittivity: number, height: number): boolean {
  return ((2 * Math.PI * frequency) / SPEED_OF_LIGHT) * height * Math.sqrt(permittivity - 1) < Math.PI / 2;
}

/** (a + jb)/(c + jd) */
function quotient(a: number, b: number, c: number, d: number): [number, number] {
  const q = c * c + d * d;
  return [(a * c + b * d) / q, (b * c - a * d) / q];
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
