/**
 * Spectral potentials of electric currents on top of a grounded slab and of magnetic currents on its ground plane,
 * lossless slab, e^{+jωt}, for complex k.
 *
 * Electric (mixed potentials, Michalski & Mosig 1997), V = 1/(Yup + Ydown) of the TE (h) and TM (e) slab lines:
 *   G_A = V_h/(jω) = μ0/(u0 + u1/t),   G_q = jω (V_e − V_h)/k².
 * Magnetic (dual; Y looking up from the ground):
 *   F = Y_e/(jω) = ε1 (u1 + εr u0 t)/(u1 (εr u0 + u1 t)),   M = jω (Y_h − Y_e)/k².
 * u0² = k² − k0², u1² = k² − εr k0², t = tanh(u1 h). Taken off in closed form, so that what is left falls fast:
 *   μ0/(2u_a), k_a² = (k0² + k1²)/2;  1/(ε0(1 + εr)u_b), k_b² = 2εr k0²/(1 + εr);  ε1/u1;  1/(μ0 u1).
 */
import { EPS0, MU0 } from '../constants.js';
import type { SlabSpectrum } from './slab-spectrum.js';

/** Number of potentials and their order: G_A, G_q, F, M. */
export const POTENTIALS = 4;

export interface SurfaceSpectrum {
  /** Wavenumber of each closed term, and its factor: factor · e^{−jkr}/(4πr)·2. */
  readonly closedK: Float64Array;
  readonly closedFactor: Float64Array;
  /** out = re, im of the remainders at complex k: the first two potentials, or all four. */
  remainder(kRe: number, kIm: number, potentials: 2 | 4, out: Float64Array): void;
}

export function surfaceSpectrum(slab: SlabSpectrum, permittivity: number, height: number): SurfaceSpectrum {
  const { k0, k1, omega } = slab;
  const er = permittivity;
  const ka2 = (k0 * k0 + k1 * k1) / 2;
  const kb2 = (2 * er * k0 * k0) / (1 + er);
  const [fa, fb, fe, fm] = [MU0 / 2, 1 / (EPS0 * (1 + er)), EPS0 * er, 1 / MU0];
  const root = new Float64Array(2);

  function remainder(kRe: number, kIm: number, potentials: 2 | 4, out: Float64Array): void {
    const k2r = kRe * kRe - kIm * kIm;
    const k2i = 2 * kRe * kIm;
    principalRoot(k2r - k0 * k0, k2i, root);
    const [u0r, u0i] = [root[0], root[1]];
    principalRoot(k2r - k1 * k1, k2i, root);
    const [u1r, u1i] = [root[0], root[1]];
    // tanh(u1 h); beyond 18 it is 1 to the last bit.
    let [tr, ti] = [1, 0];
    if (u1r * height < 18) {
      const d = Math.cosh(2 * u1r * height) + Math.cos(2 * u1i * height);
      tr = Math.sinh(2 * u1r * height) / d;
      ti = Math.sin(2 * u1i * height) / d;
    }
    const [ar, ai] = [u1r * tr - u1i * ti, u1r * ti + u1i * tr]; // u1 t
    const [br, bi] = [u0r * tr - u0i * ti, u0r * ti + u0i * tr]; // u0 t
    // TE: u0 + u1/t = (u0 t + u1)/t
    const [er1, ei1] = [br + u1r, bi + u1i];
    const de = er1 * er1 + ei1 * ei1;
    const [gr, gi] = [(tr * er1 + ti * ei1) / de, (ti * er1 - tr * ei1) / de];
    // TM: u0 u1 t/(u1 t + er u0)
    const [mr, mi] = [ar + er * u0r, ai + er * u0i];
    const dm = mr * mr + mi * mi;
    const [nr, ni] = [u0r * ar - u0i * ai, u0r * ai + u0i * ar];
    const [vr, vi] = [(nr * mr + ni * mi) / dm, (ni * mr - nr * mi) / dm];
    const k4 = k2r * k2r + k2i * k2i;
    const over = (re: number, im: number, q: number): void => {
      out[q] = (re * k2r + im * k2i) / k4;
      out[q + 1] = (im * k2r - re * k2i) / k4;
    };
    out[0] = MU0 * gr;
    out[1] = MU0 * gi;
    over(vr / EPS0 + omega * omega * MU0 * gr, vi / EPS0 + omega * omega * MU0 * gi, 2);
    const close = (k2: number, factor: number, q: number): void => {
      principalRoot(k2r - k2, k2i, root);
      const d = root[0] * root[0] + root[1] * root[1];
      out[q] -= (factor * root[0]) / d;
      out[q + 1] += (factor * root[1]) / d;
    };
    close(ka2, fa, 0);
    close(kb2, fb, 2);
    if (potentials === 2) return;
    // F = ε1 (u1 + er u0 t)/(u1 (er u0 + u1 t));  jω Yh = (1/μ0) u1 (u0 + u1 t)/(u1 + u0 t)
    const [pr, pi] = [u1r + er * br, u1i + er * bi];
    const [qr, qi] = [u1r * mr - u1i * mi, u1r * mi + u1i * mr];
    const dq = qr * qr + qi * qi;
    out[4] = (EPS0 * er * (pr * qr + pi * qi)) / dq;
    out[5] = (EPS0 * er * (pi * qr - pr * qi)) / dq;
    const [sr, si] = [u0r + ar, u0i + ai];
    const [wr, wi] = [u1r * sr - u1i * si, u1r * si + u1i * sr];
    const [yr, yi] = [(wr * er1 + wi * ei1) / de / MU0, (wi * er1 - wr * ei1) / de / MU0];
    over(yr + omega * omega * out[4], yi + omega * omega * out[5], 6);
    close(k1 * k1, fe, 4);
    close(k1 * k1, fm, 6);
  }

  return {
    closedK: Float64Array.of(Math.sqrt(ka2), Math.sqrt(kb2), k1, k1),
    closedFactor: Float64Array.of(fa, fb, fe, fm),
    remainder,
  };
}

/** Root with non-negative real part, and above the cut: what decays away from the board. */
function principalRoot(re: number, im: number, out: Float64Array): void {
  const m = Math.hypot(re, im);
  if (m === 0) {
    out[0] = 0;
    out[1] = 0;
    return;
  }
  // The larger part first, the other from the product: no digits lost.
  if (re >= 0) {
    out[0] = Math.sqrt((m + re) / 2);
    out[1] = im / (2 * out[0]);
  } else {
    out[1] = Math.sqrt((m - re) / 2);
    out[0] = im / (2 * out[1]);
  }
}
