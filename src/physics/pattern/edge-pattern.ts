/**
 * Far field of the excited edges of a board: magnetic currents along y on the ground plane, seen through the slab.
 *
 * By stationary phase (Pozar 1984; textbook): the TM and TE parts of the current's spectrum at k = k0 (u, v) times the
 * voltage transfer of the slab line,
 *   TM 1/(cos k1z h + j (k1z/(εr kz)) sin k1z h),  TE 1/(cos k1z h + j (kz/k1z) sin k1z h).
 * u = sin θ cos φ, v = sin θ sin φ. Elevation cut: φ = 0 (E plane, x–z), θ > 0 towards +x, away from the feed.
 * Azimuth cut: φ = 90° (H plane, y–z), θ > 0 towards +y. Co-polarisation along x (Ludwig 1973, third definition).
 */

import type { ExcitedEdges, RadiatingEdge } from '../column/engine.js';
import { ETA0, SPEED_OF_LIGHT } from '../constants.js';

/** Power per solid angle, W/sr, in direction cosines. */
export type Intensity = (u: number, v: number) => number;

/** Strength of an edge's spectrum across, V m per volt: Σ density · width · sinc(k0 v width/2). */
function acrossFactor(edge: RadiatingEdge, k0v: number): number {
  let sum = 0;
  for (const pulse of edge.pulses) {
    const a = (k0v * pulse.width) / 2;
    sum += pulse.density * pulse.width * (a === 0 ? 1 : Math.sin(a) / a);
  }
  return sum;
}

/** |TM transfer|² and |TE transfer|² of the lossless slab at sin² θ. */
function slabTransfer(excited: ExcitedEdges, sin2: number): { tm: number; te: number } {
  const k0 = (2 * Math.PI * excited.frequency) / SPEED_OF_LIGHT;
  const er = excited.slab.permittivity;
  const kz = Math.sqrt(Math.max(0, 1 - sin2));
  const k1z = Math.sqrt(er - sin2);
  const c = Math.cos(k0 * k1z * excited.slab.height);
  const s = Math.sin(k0 * k1z * excited.slab.height);
  // Both vanish at grazing for TM (kz → 0) and stay finite for TE, where cos² θ takes the field to zero.
  const tm = kz === 0 ? 0 : 1 / (c * c + ((k1z * s) / (er * kz)) ** 2);
  return { tm, te: 1 / (c * c + ((kz * s) / k1z) ** 2) };
}

/** Spectrum of the magnetic current, V m: out = [re, im] at wavenumbers (kx, ky). */
function spectrum(excited: ExcitedEdges, kx: number, ky: number, out: Float64Array): void {
  let [re, im] = [0, 0];
  excited.edges.forEach((edge, m) => {
    const a = edge.sign * acrossFactor(edge, ky);
    const phase = kx * edge.x + ky * edge.y;
    const c = a * Math.cos(phase);
    const s = a * Math.sin(phase);
    re += excited.re[m] * c - excited.im[m] * s;
    im += excited.re[m] * s + excited.im[m] * c;
  });
  out[0] = re;
  out[1] = im;
}

/** Power per solid angle, W/sr, from the squared spectrum: k0²/(8π²η) (|M_φ|² TM + cos²θ |M_ρ|² TE). */
function intensityOf(excited: ExcitedEdges, squared: number, u: number, v: number): number {
  const sin2 = u * u + v * v;
  if (sin2 >= 1) return 0;
  const k0 = (2 * Math.PI * excited.frequency) / SPEED_OF_LIGHT;
  const { tm, te } = slabTransfer(excited, sin2);
  const cos2Phi = sin2 === 0 ? 1 : (u * u) / sin2;
  const polar = cos2Phi * tm + (1 - sin2) * (1 - cos2Phi) * te;
  return ((k0 * k0) / (8 * Math.PI * Math.PI * ETA0)) * squared * polar;
}

export function radiationIntensity(excited: ExcitedEdges): Intensity {
  const k0 = (2 * Math.PI * excited.frequency) / SPEED_OF_LIGHT;
  const out = new Float64Array(2);
  return (u, v) => {
    if (u * u + v * v >= 1) return 0;
    spectrum(excited, k0 * u, k0 * v, out);
    return intensityOf(excited, out[0] * out[0] + out[1] * out[1], u, v);
  };
}

/** Intensity in a principal cut as a function of the signed angle in rad; edges at one place are gathered first. */
export function cutIntensity(excited: ExcitedEdges, plane: 'azimuth' | 'elevation'): (angle: number) => number {
  const k0 = (2 * Math.PI * excited.frequency) / SPEED_OF_LIGHT;
  const along = plane === 'elevation';
  // In elevation every pulse counts with its whole width; in azimuth pulses of one column and width share a factor.
  const groups = new Map<string, { at: number; width: number; re: number; im: number }>();
  excited.edges.forEach((edge, m) => {
    for (const pulse of edge.pulses) {
      const at = along ? edge.x : edge.y;
      const width = along ? 0 : pulse.width;
      const key = `${at} ${width}`;
      const group = groups.get(key) ?? { at, width, re: 0, im: 0 };
      const a = edge.sign * pulse.density * pulse.width;
      group.re += a * excited.re[m];
      group.im += a * excited.im[m];
      groups.set(key, group);
    }
  });
  const list = [...groups.values()];
  return (angle) => {
    const sine = Math.sin(angle);
    let [re, im] = [0, 0];
    for (const g of list) {
      const a = (k0 * sine * g.width) / 2;
      const factor = a === 0 ? 1 : Math.sin(a) / a;
      const c = factor * Math.cos(k0 * sine * g.at);
      const s = factor * Math.sin(k0 * sine * g.at);
      re += g.re * c - g.im * s;
      im += g.re * s + g.im * c;
    }
    return intensityOf(excited, re * re + im * im, along ? sine : 0, along ? 0 : sine);
  };
}
