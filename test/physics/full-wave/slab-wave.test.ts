import { describe, expect, it } from 'vitest';
import { complex } from '../../../src/numerics/complex.js';
import { gaussLegendre } from '../../../src/numerics/gauss-legendre.js';
import { tm0Wavenumber } from '../../../src/physics/column/slab-spectrum.js';
import { ETA0, SPEED_OF_LIGHT } from '../../../src/physics/constants.js';
import { currentTransfers } from '../../../src/physics/full-wave/slab-field.js';
import type { SlabMedium } from '../../../src/physics/full-wave/slab-medium.js';
import { guidedPower, guidedWave, guidesTm0Only } from '../../../src/physics/full-wave/slab-wave.js';

const F = 77e9;
const K0 = (2 * Math.PI * F) / SPEED_OF_LIGHT;
const SLAB: SlabMedium = { permittivity: 3, lossTangent: 0, height: 127e-6, groundImpedance: complex(0) };

/** Of a horizontal dipole of 1 A m, W. */
function dipoleRadiation(medium: SlabMedium): number {
  const transfer = currentTransfers(medium, F);
  const { nodes, weights } = gaussLegendre(120);
  let sum = 0;
  nodes.forEach((x, i) => {
    // Dense towards the horizon, where a thin slab lets the field fall late.
    const cosine = ((1 + x) / 2) ** 3;
    const { tm, te } = transfer(1 - cosine * cosine);
    const slope = (3 / 2) * ((1 + x) / 2) ** 2;
    sum += weights[i] * slope * (tm.re ** 2 + tm.im ** 2 + te.re ** 2 + te.im ** 2);
  });
  return (Math.PI * sum) / (2 * ETA0);
}

const dipole = (_kx: number, _ky: number, out: Float64Array): void => {
  out.fill(0);
  out[0] = 1;
};

describe('wave guided by the slab', () => {
  it('has the wavenumber of the TM0 equation', () => {
    for (const [er, h] of [
      [3, 127e-6],
      [3.55, 200e-6],
      [10.2, 254e-6],
      [2.2, 20e-6],
    ]) {
      const { wavenumber } = guidedWave({ ...SLAB, permittivity: er, height: h }, F);
      expect(Math.abs(wavenumber / tm0Wavenumber(K0, er, h) - 1)).toBeLessThan(1e-12);
    }
  });

  it('on a thin slab takes the share of a dipole’s power that leading order says', () => {
    // Psw/Psp → (3π/4) k0h (1 − 1/εr)³/(1 − 1/εr + 0.4/εr²) (Jackson & Alexopoulos 1991, IEEE Trans. AP 39, 407; memory).
    const er = SLAB.permittivity;
    const leading = (((3 * Math.PI) / 4) * (1 - 1 / er) ** 3) / (1 - 1 / er + 0.4 / er ** 2);
    const ratio = (k0h: number): number => {
      const medium = { ...SLAB, height: k0h / K0 };
      return guidedPower(medium, F, dipole, 0) / dipoleRadiation(medium) / (k0h * leading);
    };
    const [coarse, fine] = [ratio(0.004), ratio(0.002)];
    expect(Math.abs(fine - 1)).toBeLessThan(0.01);
    // And the rest is of the next order.
    expect((coarse - 1) / (fine - 1)).toBeGreaterThan(1.6);
    expect((coarse - 1) / (fine - 1)).toBeLessThan(2.4);
  });

  it('is bound more tightly by a cover and by a reactive ground', () => {
    const bare = guidedWave(SLAB, F).wavenumber;
    const cover = { permittivity: 3, lossTangent: 0, thickness: 30e-6 };
    const thicker = guidedWave({ ...SLAB, height: SLAB.height + cover.thickness }, F).wavenumber;
    expect(guidedWave({ ...SLAB, cover }, F).wavenumber / thicker).toBeCloseTo(1, 11);
    expect(guidedWave({ ...SLAB, groundImpedance: complex(0, 0.5) }, F).wavenumber).toBeGreaterThan(bare);
  });

  it('decays by the loss of the medium, in proportion', () => {
    const decay = (tan: number, zg: number): number =>
      -guidedWave({ ...SLAB, lossTangent: tan, groundImpedance: complex(zg) }, F).lossy.im;
    expect(decay(0, 0)).toBeCloseTo(0, 6);
    expect(decay(0.002, 0) / decay(0.001, 0)).toBeCloseTo(2, 3);
    expect(decay(0, 0.2) / decay(0, 0.1)).toBeCloseTo(2, 3);
    expect(decay(0.002, 0.1)).toBeGreaterThan(0);
  });

  it('is absent where nothing binds it', () => {
    const wave = guidedWave({ ...SLAB, permittivity: 1 }, F);
    expect(wave.powerFactor).toBe(0);
    expect(wave.wavenumber).toBeCloseTo(K0, 9);
  });

  it('is alone until TE1 propagates, also under a cover', () => {
    const edge = Math.PI / 2 / (K0 * Math.sqrt(SLAB.permittivity - 1));
    const slab = (height: number): SlabMedium => ({ ...SLAB, height });
    expect(guidesTm0Only(slab(0.999 * edge), F)).toBe(true);
    expect(guidesTm0Only(slab(1.001 * edge), F)).toBe(false);
    expect(() => guidedWave(slab(1.001 * edge), F)).toThrow(RangeError);
    // A cover of the same dielectric is more of the slab.
    const covered = (whole: number): SlabMedium => ({
      ...slab(0.7 * whole),
      cover: { permittivity: SLAB.permittivity, lossTangent: 0, thickness: 0.3 * whole },
    });
    expect(guidesTm0Only(covered(0.999 * edge), F)).toBe(true);
    expect(guidesTm0Only(covered(1.001 * edge), F)).toBe(false);
  });
});
