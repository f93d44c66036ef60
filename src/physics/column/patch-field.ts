/**
 * Far field of the macro currents of a board's patches: electric currents along x on top of the slab.
 *
 * By stationary phase (Pozar 1984; textbook) from the spectrum of the current at k = k0 (u, v) and the voltages of the
 * slab lines: r e^{jk0r} Eθ = −(jk0/2π) V_e J̃x cos φ, Eφ = (jk0/2π) cos θ V_h J̃x sin φ.
 * u = sin θ cos φ, v = sin θ sin φ. Elevation cut: φ = 0 (E plane, x–z), θ > 0 towards +x, away from the feed.
 * Azimuth cut: φ = 90° (H plane, y–z), θ > 0 towards +y. Co-polarisation along x (Ludwig 1973, third definition).
 */
import { ETA0, SPEED_OF_LIGHT } from '../constants.js';
import type { ExcitedPatches, FarField, MacroPatch } from './engine.js';
import { currentSpectrum, sameShape } from './macro-current.js';

/** V_e and V_h of the lossless slab at sin² θ: [Re, Im, Re, Im], ohm. */
function slabVoltages(excited: ExcitedPatches, sin2: number): readonly [number, number, number, number] {
  const k0 = (2 * Math.PI * excited.frequency) / SPEED_OF_LIGHT;
  const er = excited.slab.permittivity;
  const w = Math.sqrt(Math.max(0, 1 - sin2));
  const q = Math.sqrt(er - sin2);
  const tan = Math.tan(k0 * q * excited.slab.height);
  const over = (a: number, re: number, im: number): readonly [number, number] => {
    const d = re * re + im * im;
    return [(a * im) / d, (a * re) / d];
  };
  // V_e = jη w q t/(εr w + j q t), V_h = jη t/(q + j w t), t = tan k1z h: j a/(re + j im) = (a im + j a re)/|.|².
  const [er1, ei1] = over(ETA0 * w * q * tan, er * w, q * tan);
  const [hr, hi] = over(ETA0 * tan, q, w * tan);
  return [er1, ei1, hr, hi] as const;
}

/** Spectrum of the current, A m, at wavenumbers (kx, ky): out = [re, im]. */
export function boardSpectrum(excited: ExcitedPatches, kx: number, ky: number, out: Float64Array): void {
  const { patches } = excited;
  let [re, im, shape] = [0, 0, 0];
  for (let p = 0; p < patches.length; p++) {
    const patch = patches[p];
    // Patches of one shape tend to follow each other.
    if (p === 0 || !sameShape(patch, patches[p - 1])) shape = currentSpectrum(patch, kx, ky);
    const phase = kx * patch.x + ky * patch.y;
    const [c, s] = [shape * Math.cos(phase), shape * Math.sin(phase)];
    re += excited.re[p] * c - excited.im[p] * s;
    im += excited.re[p] * s + excited.im[p] * c;
  }
  out[0] = re;
  out[1] = im;
}

export function patchField(excited: ExcitedPatches): FarField {
  const k0 = (2 * Math.PI * excited.frequency) / SPEED_OF_LIGHT;
  const current = new Float64Array(2);
  return {
    frequency: excited.frequency,
    extent: extent(excited.patches),
    at(u, v, out) {
      const sin2 = u * u + v * v;
      out.fill(0);
      if (sin2 >= 1) return;
      boardSpectrum(excited, k0 * u, k0 * v, current);
      const [er, ei, hr, hi] = slabVoltages(excited, sin2);
      const sine = Math.sqrt(sin2);
      const [cosPhi, sinPhi] = sine === 0 ? [1, 0] : [u / sine, v / sine];
      // −j J̃ k0/2π.
      const k = k0 / (2 * Math.PI);
      const [re, im] = [k * current[1], -k * current[0]];
      out[0] = cosPhi * (re * er - im * ei);
      out[1] = cosPhi * (re * ei + im * er);
      const across = -sinPhi * Math.sqrt(1 - sin2);
      out[2] = across * (re * hr - im * hi);
      out[3] = across * (re * hi + im * hr);
    },
    cut: (plane) => cutIntensity(excited, plane),
  };
}

function extent(patches: readonly MacroPatch[]): { x: number; y: number } {
  const span = (axis: 'x' | 'y', size: 'length' | 'width'): number =>
    Math.max(...patches.map((p) => p[axis] + p[size] / 2)) - Math.min(...patches.map((p) => p[axis] - p[size] / 2));
  return { x: span('x', 'length'), y: span('y', 'width') };
}

/** Intensity in a principal cut as a function of the signed angle in rad; patches at one place are gathered first. */
function cutIntensity(excited: ExcitedPatches, plane: 'azimuth' | 'elevation'): (angle: number) => number {
  const k0 = (2 * Math.PI * excited.frequency) / SPEED_OF_LIGHT;
  const along = plane === 'elevation';
  const gathered: { patch: MacroPatch; at: number; re: number; im: number }[] = [];
  excited.patches.forEach((patch, p) => {
    const at = along ? patch.x : patch.y;
    let found = gathered.find((g) => g.at === at && sameShape(g.patch, patch));
    if (!found) {
      found = { patch, at, re: 0, im: 0 };
      gathered.push(found);
    }
    found.re += excited.re[p];
    found.im += excited.im[p];
  });
  const list = {
    ...excited,
    patches: gathered.map(({ patch, at }) => ({ ...patch, x: along ? at : 0, y: along ? 0 : at })),
    re: Float64Array.from(gathered, (g) => g.re),
    im: Float64Array.from(gathered, (g) => g.im),
  };
  const current = new Float64Array(2);
  return (angle) => {
    const sine = Math.sin(angle);
    boardSpectrum(list, along ? k0 * sine : 0, along ? 0 : k0 * sine, current);
    const sin2 = Math.min(1, sine * sine);
    const [er, ei, hr, hi] = slabVoltages(excited, sin2);
    const voltage2 = along ? er * er + ei * ei : (1 - sin2) * (hr * hr + hi * hi);
    return ((k0 * k0) / (8 * Math.PI * Math.PI * ETA0)) * (current[0] ** 2 + current[1] ** 2) * voltage2;
  };
}
