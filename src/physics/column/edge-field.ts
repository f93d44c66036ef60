/**
 * Far field of the excited edges of a board: magnetic currents along y on the ground plane, seen through the slab.
 *
 * By stationary phase (Pozar 1984; textbook): the TM and TE parts of the current's spectrum at k = k0 (u, v) times the
 * voltage transfer of the slab line,
 *   TM 1/(cos k1z h + j (k1z/(εr kz)) sin k1z h),  TE 1/(cos k1z h + j (kz/k1z) sin k1z h).
 * u = sin θ cos φ, v = sin θ sin φ. Elevation cut: φ = 0 (E plane, x–z), θ > 0 towards +x, away from the feed.
 * Azimuth cut: φ = 90° (H plane, y–z), θ > 0 towards +y. Co-polarisation along x (Ludwig 1973, third definition).
 */

import { ETA0, SPEED_OF_LIGHT } from '../constants.js';
import type { ExcitedEdges, FarField, RadiatingEdge } from './engine.js';

/** Strength of an edge's spectrum across, V m per volt: Σ density · width · sinc(k0 v width/2). */
function acrossFactor(edge: RadiatingEdge, k0v: number): number {
  let sum = 0;
  for (const pulse of edge.pulses) {
    const a = (k0v * pulse.width) / 2;
    sum += pulse.density * pulse.width * (a === 0 ? 1 : Math.sin(a) / a);
  }
  return sum;
}

/** TM and TE transfer of the lossless slab at sin² θ: [Re TM, Im TM, Re TE, Im TE]. */
function slabTransfer(excited: ExcitedEdges, sin2: number): readonly [number, number, number, number] {
  const k0 = (2 * Math.PI * excited.frequency) / SPEED_OF_LIGHT;
  const er = excited.slab.permittivity;
  const kz = Math.sqrt(Math.max(0, 1 - sin2));
  const k1z = Math.sqrt(er - sin2);
  const c = Math.cos(k0 * k1z * excited.slab.height);
  const s = Math.sin(k0 * k1z * excited.slab.height);
  const over = (x: number): readonly [number, number] => [c / (c * c + x * x), -x / (c * c + x * x)];
  // Both vanish at grazing for TM (kz → 0) and stay finite for TE, where cos θ takes the field to zero.
  const tm = kz === 0 ? ([0, 0] as const) : over((k1z * s) / (er * kz));
  return [...tm, ...over((kz * s) / k1z)] as const;
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
  const [tmRe, tmIm, teRe, teIm] = slabTransfer(excited, sin2);
  const [tm, te] = [tmRe * tmRe + tmIm * tmIm, teRe * teRe + teIm * teIm];
  const cos2Phi = sin2 === 0 ? 1 : (u * u) / sin2;
  const polar = cos2Phi * tm + (1 - sin2) * (1 - cos2Phi) * te;
  return ((k0 * k0) / (8 * Math.PI * Math.PI * ETA0)) * squared * polar;
}

/**
 * r e^{jk0r} E, V, of magnetic currents along y with the spectrum f on a conducting plane (image included), each part
 * times its transfer of the slab: Eθ = −(jk0/2π) f cos φ TM, Eφ = (jk0/2π) f sin φ cos θ TE (Balanis, Antenna Theory,
 * ch. 12; from memory).
 */
export function edgeField(excited: ExcitedEdges): FarField {
  const k0 = (2 * Math.PI * excited.frequency) / SPEED_OF_LIGHT;
  const spectral = new Float64Array(2);
  const xs = excited.edges.map((e) => e.x);
  const lows = excited.edges.flatMap((e) => e.pulses.map((p) => e.y - p.width / 2));
  const highs = excited.edges.flatMap((e) => e.pulses.map((p) => e.y + p.width / 2));
  return {
    frequency: excited.frequency,
    extent: { x: Math.max(...xs) - Math.min(...xs), y: Math.max(...highs) - Math.min(...lows) },
    at(u, v, out) {
      const sin2 = u * u + v * v;
      out.fill(0);
      if (sin2 >= 1) return;
      spectrum(excited, k0 * u, k0 * v, spectral);
      const [tmRe, tmIm, teRe, teIm] = slabTransfer(excited, sin2);
      const sine = Math.sqrt(sin2);
      const [cosPhi, sinPhi] = sine === 0 ? [1, 0] : [u / sine, v / sine];
      // −j·f = (f.im, −f.re); times k0/2π.
      const k = k0 / (2 * Math.PI);
      const [re, im] = [k * spectral[1], -k * spectral[0]];
      out[0] = cosPhi * (re * tmRe - im * tmIm);
      out[1] = cosPhi * (re * tmIm + im * tmRe);
      const across = -sinPhi * Math.sqrt(1 - sin2);
      out[2] = across * (re * teRe - im * teIm);
      out[3] = across * (re * teIm + im * teRe);
    },
    cut: (plane) => cutIntensity(excited, plane),
  };
}

/** Intensity in a principal cut as a function of the signed angle in rad; edges at one place are gathered first. */
function cutIntensity(excited: ExcitedEdges, plane: 'azimuth' | 'elevation'): (angle: number) => number {
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
