/**
 * Far field of a sheet current in the metal's plane of a slab, by stationary phase (Pozar 1982; Michalski & Mosig 1997).
 *
 * With the spectrum J(kx, ky) = ∬ J e^{+j(kx x + ky y)} at kx = k0 sin θ cos φ, ky = k0 sin θ sin φ:
 *   r e^{jk0r} Eθ = TM (Jx cos φ + Jy sin φ),   r e^{jk0r} Eφ = TE (−Jx sin φ + Jy cos φ),
 *   TM = −(jk0/2π) Ve,   TE = −(jk0/2π) cos θ Vh.
 * r is measured from the origin of x and y in the metal's plane, also under a cover.
 */
import {
  add,
  type Complex,
  complex,
  div,
  exp,
  inverse,
  J,
  mul,
  polar,
  scale,
  sqrt,
  sub,
} from '../../numerics/complex.js';
import { coverPermittivity, type SlabMedium } from './slab-medium.js';
import { slabSpectral } from './slab-spectral.js';

/** V per A m (ohm/m). */
export interface CurrentTransfer {
  readonly tm: Complex;
  readonly te: Complex;
}

/**
 * @param sin2 sin² θ, from 0 (broadside) to 1 (along the board)
 * @throws RangeError outside
 */
export function currentTransfer(medium: SlabMedium, frequency: number, sin2: number): CurrentTransfer {
  return currentTransfers(medium, frequency)(sin2);
}

/** The same for many directions at one frequency: what does not depend on the direction is worked out once. */
export function currentTransfers(medium: SlabMedium, frequency: number): (sin2: number) => CurrentTransfer {
  const spectral = slabSpectral(medium, frequency);
  const { k0 } = spectral;
  const front = complex(0, -k0 / (2 * Math.PI));
  const value = new Float64Array(4);
  return (sin2) => {
    if (!(sin2 >= 0 && sin2 <= 1)) throw new RangeError(`currentTransfer: sin² θ is ${sin2}, from 0 to 1 is needed`);
    const cosine = Math.sqrt(1 - sin2);
    spectral.voltages(k0 * Math.sqrt(sin2), 0, value);
    const tm = mul(front, complex(value[0], value[1]));
    const te = mul(front, complex(cosine * value[2], cosine * value[3]));
    if (!medium.cover) return { tm, te };
    const through = coverTransfer(coverPermittivity(medium), k0 * medium.cover.thickness, cosine);
    return { tm: mul(tm, through.tm), te: mul(te, through.te) };
  };
}

/**
 * Tangential field at the face of the cover over that at the metal, 1/(cos βt + j (Z/Z0) sin βt) of its line, and the
 * phase by which the wave leaves there earlier than from the metal's plane.
 */
function coverTransfer(permittivity: Complex, phaseThickness: number, cosine: number): CurrentTransfer {
  // β/k0 in the cover
  const n = sqrt(sub(permittivity, complex(1 - cosine * cosine)));
  const wave = exp(mul(J, scale(n, phaseThickness)));
  const back = inverse(wave);
  const cos = scale(add(wave, back), 0.5);
  const jSin = scale(sub(wave, back), 0.5);
  const lead = polar(1, phaseThickness * cosine);
  return {
    tm: div(scale(lead, cosine), add(scale(cos, cosine), div(mul(n, jSin), permittivity))),
    te: div(lead, add(cos, div(scale(jSin, cosine), n))),
  };
}
