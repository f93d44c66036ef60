/**
 * The wave that a slab guides, TM0, and the power a sheet current gives to it.
 *
 * Power of a sheet current, ½ (1/4π²) ∬ Re(Ve |Jρ|² + Vh |Jφ|²) dkx dky: on a lossless slab that is real below k0 alone
 * (radiation), and at the pole kp of Ve, where the path passes above and half the residue counts:
 *   P = kp Im(R)/(8π) ∮ |Jρ(kp, φ)|² dφ,   R = lim (k − kp) Ve   (Pozar 1982; sign and factor from the balance above).
 */
import { bracketedRoot } from '../../numerics/brent.js';
import { add, type Complex, complex, div, mul, polar, scale, sub } from '../../numerics/complex.js';
import { ETA0, SPEED_OF_LIGHT } from '../constants.js';
import { losslessMedium, type SlabMedium } from './slab-medium.js';
import { type SlabSpectral, slabSpectral } from './slab-spectral.js';

export interface GuidedWave {
  /** kp without loss, 1/m; k0 where the medium guides no wave. */
  readonly wavenumber: number;
  /** With the medium's loss, β − jα. */
  readonly lossy: Complex;
  /** P = powerFactor · ∮ |Jρ(kp, φ)|² dφ without loss, ohm/m²; 0 where the medium guides no wave. */
  readonly powerFactor: number;
}

/** Writes [Re Jx, Im Jx, Re Jy, Im Jy] = ∬ J e^{+j(kx x + ky y)} at (kx, ky), A m. */
export type CurrentSpectrum = (kx: number, ky: number, out: Float64Array) => void;

/** Whether no wave but TM0 is guided. The next is TE1: a quarter of a wave across slab and cover. */
export function guidesTm0Only(medium: SlabMedium, frequency: number): boolean {
  const k0 = (2 * Math.PI * frequency) / SPEED_OF_LIGHT;
  const across = (er: number, thickness: number): number => k0 * Math.sqrt(er - 1) * thickness;
  const slab = across(medium.permittivity, medium.height);
  const { cover } = medium;
  const over = cover ? across(cover.permittivity, cover.thickness) : 0;
  if (slab >= Math.PI / 2 || over >= Math.PI / 2) return false;
  if (over === 0) return true;
  // At k0: impedance of the slab, jωμ0 tan(β1 h)/β1, against that of the cover open above, −jωμ0 cot(βc t)/βc.
  const [b1, bc] = [slab / medium.height, over / (cover?.thickness ?? 1)];
  return (b1 === 0 ? medium.height : Math.tan(slab) / b1) * bc * Math.tan(over) < 1;
}

/**
 * @param frequency Hz
 * @throws RangeError where more than TM0 is guided
 */
export function guidedWave(medium: SlabMedium, frequency: number): GuidedWave {
  if (!guidesTm0Only(medium, frequency))
    throw new RangeError(`guidedWave: more than one wave is guided at ${frequency} Hz on ${medium.height} m`);
  const lossless = losslessMedium(medium);
  const spectral = slabSpectral(lossless, frequency);
  const { k0 } = spectral;
  const reactance = Math.max(0, medium.groundImpedance.im);
  const densest = Math.max(medium.permittivity, medium.cover?.permittivity ?? 1);
  // Decay above the board: no more than in the densest layer, and what the ground's reactance holds.
  const top = k0 * (1.05 * Math.sqrt(densest - 1) + (2 * reactance) / ETA0);
  const loop = (u0: number): number => tmLoop(spectral, complex(Math.hypot(k0, u0))).im;
  const bottom = 1e-7 * top;
  if (!(top > 0 && loop(bottom) > 0)) return { wavenumber: k0, lossy: complex(k0), powerFactor: 0 };
  const { inside, outside } = bracketedRoot(loop, [bottom, loop(bottom)], [top, loop(top)], 1e-14 * top);
  const wavenumber = Math.hypot(k0, (inside + outside) / 2);
  return {
    wavenumber,
    lossy: newton(slabSpectral(medium, frequency), complex(wavenumber)),
    powerFactor: (wavenumber * residue(spectral, wavenumber).im) / (8 * Math.PI),
  };
}

function tmLoop(spectral: SlabSpectral, k: Complex): Complex {
  const value = new Float64Array(6);
  spectral.voltages(k.re, k.im, value);
  return complex(value[4], value[5]);
}

/** Cauchy's integral over a circle halfway to the branch point, by the trapezoidal rule: error 2^−56. */
function residue(spectral: SlabSpectral, kp: number): Complex {
  const POINTS = 56;
  const radius = (kp - spectral.k0) / 2;
  const value = new Float64Array(4);
  let sum = complex(0);
  for (let i = 0; i < POINTS; i++) {
    const offset = polar(radius, (2 * Math.PI * (i + 0.5)) / POINTS);
    spectral.voltages(kp + offset.re, offset.im, value);
    sum = add(sum, mul(offset, complex(value[0], value[1])));
  }
  return scale(sum, 1 / POINTS);
}

/** Newton's method on the loop's impedance, its slope by a central difference. */
function newton(spectral: SlabSpectral, start: Complex): Complex {
  let k = start;
  const step = complex(1e-3 * (start.re - spectral.k0));
  for (let i = 0; i < 20; i++) {
    const rise = sub(tmLoop(spectral, add(k, step)), tmLoop(spectral, sub(k, step)));
    const change = div(mul(tmLoop(spectral, k), scale(step, 2)), rise);
    k = sub(k, change);
    if (Math.hypot(change.re, change.im) < 1e-12 * k.re) break;
  }
  return k;
}

/**
 * Power in the guided wave of the lossless medium, W.
 *
 * @param extent largest distance between two points of the current, m: sets the steps in φ
 * @throws RangeError where more than TM0 is guided
 */
export function guidedPower(medium: SlabMedium, frequency: number, spectrum: CurrentSpectrum, extent: number): number {
  const { wavenumber, powerFactor } = guidedWave(medium, frequency);
  const steps = 4 * Math.ceil((24 + 2 * wavenumber * extent) / 4);
  const current = new Float64Array(4);
  let sum = 0;
  for (let i = 0; i < steps; i++) {
    const angle = (2 * Math.PI * (i + 0.5)) / steps;
    const [c, s] = [Math.cos(angle), Math.sin(angle)];
    spectrum(wavenumber * c, wavenumber * s, current);
    sum += (current[0] * c + current[2] * s) ** 2 + (current[1] * c + current[3] * s) ** 2;
  }
  return (powerFactor * sum * 2 * Math.PI) / steps;
}
