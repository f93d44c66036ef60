import { describe, expect, it } from 'vitest';
import { abs, type Complex, complex, div, mul, polar, scale, sub } from '../../../src/numerics/complex.js';
import { ETA0, SPEED_OF_LIGHT } from '../../../src/physics/constants.js';
import { currentTransfer } from '../../../src/physics/full-wave/slab-field.js';
import type { SlabMedium } from '../../../src/physics/full-wave/slab-medium.js';

const F = 77e9;
const K0 = (2 * Math.PI * F) / SPEED_OF_LIGHT;
const SLAB: SlabMedium = { permittivity: 3, lossTangent: 0, height: 127e-6, groundImpedance: complex(0) };
const close = (a: Complex, b: Complex, relative: number): void =>
  expect(abs(sub(a, b))).toBeLessThan(relative * abs(b));

describe('far field of a sheet current', () => {
  it('is that of a dipole and its image where the slab is air', () => {
    // −jk0η0/(4π) times cos θ (TM) or 1 (TE), less the image: 1 − e^{−2jk0h cos θ}.
    for (const sin2 of [0, 0.3, 0.9]) {
      const cosine = Math.sqrt(1 - sin2);
      const image = sub(complex(1), polar(1, -2 * K0 * SLAB.height * cosine));
      const dipole = mul(complex(0, (-K0 * ETA0) / (4 * Math.PI)), image);
      const { tm, te } = currentTransfer({ ...SLAB, permittivity: 1 }, F, sin2);
      close(tm, scale(dipole, cosine), 1e-12);
      close(te, dipole, 1e-12);
    }
  });

  it('vanishes along the board over a dielectric', () => {
    const { tm, te } = currentTransfer(SLAB, F, 1);
    expect(abs(tm)).toBeLessThan(1e-9);
    expect(abs(te)).toBeLessThan(1e-9);
  });

  it('of a buried current follows from one on top by reciprocity', () => {
    // The field that a current on top leaves at height h in a shorted line of length H is sin βh / sin βH of that on top.
    const thickness = 55e-6;
    const whole = { ...SLAB, height: SLAB.height + thickness };
    const buried = { ...SLAB, cover: { permittivity: SLAB.permittivity, lossTangent: 0, thickness } };
    for (const sin2 of [0, 0.4, 0.95]) {
      const beta = K0 * Math.sqrt(SLAB.permittivity - sin2);
      const ratio = Math.sin(beta * SLAB.height) / Math.sin(beta * whole.height);
      const lead = polar(ratio, K0 * thickness * Math.sqrt(1 - sin2));
      const [top, below] = [currentTransfer(whole, F, sin2), currentTransfer(buried, F, sin2)];
      // TM: the voltage of the line is the tangential field, so that the same ratio holds.
      close(below.te, mul(top.te, lead), 1e-12);
      close(below.tm, mul(top.tm, lead), 1e-12);
    }
  });

  it('does not feel a cover of air', () => {
    const cover = { permittivity: 1, lossTangent: 0, thickness: 80e-6 };
    for (const sin2 of [0, 0.5, 0.97]) {
      const [bare, covered] = [currentTransfer(SLAB, F, sin2), currentTransfer({ ...SLAB, cover }, F, sin2)];
      close(covered.tm, bare.tm, 1e-11);
      close(covered.te, bare.te, 1e-11);
    }
  });

  it('falls a little with loss in the cover', () => {
    const cover = { permittivity: 3.5, lossTangent: 0, thickness: 30e-6 };
    const reference = currentTransfer({ ...SLAB, cover }, F, 0.2);
    const lossy = currentTransfer({ ...SLAB, cover: { ...cover, lossTangent: 0.03 } }, F, 0.2);
    expect(abs(div(lossy.te, reference.te))).toBeLessThan(1);
    expect(abs(div(lossy.te, reference.te))).toBeGreaterThan(0.99);
  });

  it('refuses directions below the board', () => {
    expect(() => currentTransfer(SLAB, F, 1.01)).toThrow(RangeError);
    expect(() => currentTransfer(SLAB, F, Number.NaN)).toThrow(RangeError);
  });
});
