/**
 * Voltages of the TM (e) and TE (h) lines of a grounded slab where a sheet current of 1 A/m flows in the metal's plane.
 *
 * V = 1/(Yup + Ydown): E_ρ = −Ve J_ρ and E_φ = −Vh J_φ in the spectral domain (Michalski & Mosig 1997, IEEE Trans. AP 45,
 * 508). The slab line ends in the ground's surface impedance, the line upwards in air, behind the cover if there is one.
 * e^{+jωt}; u = √(k² − εr k0²) with Re u ≥ 0. Layers enter by u² and tanh(uh)/u alone, which are even in u: the only
 * branch point is that of air.
 */
import { add, type Complex, complex, div, mul, scale, sqrt } from '../../numerics/complex.js';
import { EPS0, MU0, SPEED_OF_LIGHT } from '../constants.js';
import { squareRoot, tanhOver } from './layer-line.js';
import { checkMedium, coverPermittivity, type SlabMedium, slabPermittivity } from './slab-medium.js';

/** A term C/√(k² − κ²) of the spectrum, the transform of C e^{−jκρ}/(2πρ). */
export interface DirectTerm {
  readonly amplitude: Complex;
  /** κ, 1/m. */
  readonly wavenumber: Complex;
}

export interface SlabSpectral {
  readonly k0: number;
  /**
   * At a radial wavenumber in the upper half-plane or on the real axis.
   * @param out [Re Ve, Im Ve, Re Vh, Im Vh], ohm; then [Re, Im] of Zup + Zdown of the TM line times what is finite and not
   *            zero above k0: zero where a TM wave is guided
   */
  voltages(kRe: number, kIm: number, out: Float64Array): void;
  /** What Vh and (Ve − Vh)/k² tend to at large k: the half-spaces that meet at the metal, κ right to the order 1/k³. */
  readonly directA: DirectTerm;
  readonly directQ: DirectTerm;
}

/**
 * @param frequency Hz
 * @throws RangeError on a frequency that is not positive or a medium that is not passive
 */
export function slabSpectral(medium: SlabMedium, frequency: number): SlabSpectral {
  checkMedium(medium);
  if (!(frequency > 0 && Number.isFinite(frequency))) throw new RangeError(`slabSpectral: frequency ${frequency} Hz`);
  const omega = 2 * Math.PI * frequency;
  const k0 = omega / SPEED_OF_LIGHT;
  const k0Squared = k0 * k0;
  const er = slabPermittivity(medium);
  const ec = coverPermittivity(medium);
  // A line's impedance is u·p on TM, p = 1/(jωε), and jωμ0/u on TE.
  const wm = omega * MU0;
  const p0 = -1 / (omega * EPS0);
  const [p1, pc] = [div(complex(0, p0), er), div(complex(0, p0), ec)];
  const { height } = medium;
  const [gRe, gIm] = [medium.groundImpedance.re, medium.groundImpedance.im];
  const thickness = medium.cover?.thickness ?? 0;
  const [t, u0] = [new Float64Array(2), new Float64Array(2)];
  // Zdown and Zup as fractions, since those of air are 0 and infinite at grazing: [numerator, denominator] of TM, of TE.
  const down = new Float64Array(8);
  const up = new Float64Array(8);

  function below(kkRe: number, kkIm: number): void {
    const [uuRe, uuIm] = [kkRe - er.re * k0Squared, kkIm - er.im * k0Squared];
    tanhOver(uuRe, uuIm, height, t);
    const [tr, ti] = [t[0], t[1]];
    // u tanh(uh)
    const [sr, si] = [uuRe * tr - uuIm * ti, uuRe * ti + uuIm * tr];
    down[0] = gRe + p1.re * sr - p1.im * si;
    down[1] = gIm + p1.re * si + p1.im * sr;
    // 1 + Zg t/p1, with 1/p1 = jωε1 = er/(j p0)
    const [yr, yi] = [er.im / p0, -er.re / p0];
    const [zr, zi] = [gRe * tr - gIm * ti, gRe * ti + gIm * tr];
    down[2] = 1 + zr * yr - zi * yi;
    down[3] = zr * yi + zi * yr;
    down[4] = gRe - wm * ti;
    down[5] = gIm + wm * tr;
    // 1 + Zg u tanh(uh)/(jωμ0)
    down[6] = 1 + (gRe * si + gIm * sr) / wm;
    down[7] = -(gRe * sr - gIm * si) / wm;
  }

  function above(kkRe: number, kkIm: number): void {
    squareRoot(kkRe - k0Squared, kkIm, u0);
    const [ur, ui] = [u0[0], u0[1]];
    const [zr, zi] = [-p0 * ui, p0 * ur];
    if (thickness === 0) {
      up[0] = zr;
      up[1] = zi;
      up[2] = 1;
      up[3] = 0;
      up[4] = 0;
      up[5] = wm;
      up[6] = ur;
      up[7] = ui;
      return;
    }
    const [uuRe, uuIm] = [kkRe - ec.re * k0Squared, kkIm - ec.im * k0Squared];
    tanhOver(uuRe, uuIm, thickness, t);
    const [tr, ti] = [t[0], t[1]];
    const [sr, si] = [uuRe * tr - uuIm * ti, uuRe * ti + uuIm * tr];
    up[0] = zr + pc.re * sr - pc.im * si;
    up[1] = zi + pc.re * si + pc.im * sr;
    // 1 + Z0 t/pc = 1 + εc u0 t
    const [vr, vi] = [ur * tr - ui * ti, ur * ti + ui * tr];
    up[2] = 1 + ec.re * vr - ec.im * vi;
    up[3] = ec.re * vi + ec.im * vr;
    up[4] = -wm * vi;
    up[5] = wm * (1 + vr);
    up[6] = ur + sr;
    up[7] = ui + si;
  }

  function voltages(kRe: number, kIm: number, out: Float64Array): void {
    const [kkRe, kkIm] = [kRe * kRe - kIm * kIm, 2 * kRe * kIm];
    below(kkRe, kkIm);
    above(kkRe, kkIm);
    for (let q = 0; q < 8; q += 4) {
      const [ar, ai, br, bi] = [up[q], up[q + 1], up[q + 2], up[q + 3]];
      const [cr, ci, dr, di] = [down[q], down[q + 1], down[q + 2], down[q + 3]];
      // Zup = a/b, Zdown = c/d: V = ac/(ad + bc)
      const [nr, ni] = [ar * cr - ai * ci, ar * ci + ai * cr];
      const sr = ar * dr - ai * di + br * cr - bi * ci;
      const si = ar * di + ai * dr + br * ci + bi * cr;
      const size = sr * sr + si * si;
      out[q / 2] = (nr * sr + ni * si) / size;
      out[q / 2 + 1] = (ni * sr - nr * si) / size;
      if (q === 0 && out.length > 4) {
        out[4] = sr;
        out[5] = si;
      }
    }
  }

  const sum = add(er, ec);
  return {
    k0,
    voltages,
    directA: { amplitude: complex(0, wm / 2), wavenumber: sqrt(scale(sum, k0Squared / 2)) },
    directQ: {
      amplitude: div(complex(0, p0), sum),
      wavenumber: sqrt(scale(div(mul(er, ec), sum), 2 * k0Squared)),
    },
  };
}
