import { describe, expect, it } from 'vitest';
import { type Complex, complex } from '../../../src/numerics/complex.js';
import { EPS0, MU0, SPEED_OF_LIGHT } from '../../../src/physics/constants.js';
import type { SlabMedium } from '../../../src/physics/full-wave/slab-medium.js';
import { slabSpectral } from '../../../src/physics/full-wave/slab-spectral.js';

const F = 77e9;
const OMEGA = 2 * Math.PI * F;
const K0 = OMEGA / SPEED_OF_LIGHT;
const SLAB: SlabMedium = { permittivity: 3, lossTangent: 0, height: 127e-6, groundImpedance: complex(0) };

function voltages(medium: SlabMedium, kRe: number, kIm = 0): { tm: Complex; te: Complex } {
  const out = new Float64Array(4);
  slabSpectral(medium, F).voltages(kRe, kIm, out);
  return { tm: complex(out[0], out[1]), te: complex(out[2], out[3]) };
}

function expectClose(a: Complex, b: Complex, relative: number): void {
  expect(Math.hypot(a.re - b.re, a.im - b.im)).toBeLessThan(relative * Math.hypot(b.re, b.im));
}

describe('spectral voltages of a slab', () => {
  it('are those of a sheet over a wall where the slab is air', () => {
    // Broadside: η0 in parallel with jη0 tan k0h.
    const eta = MU0 * SPEED_OF_LIGHT;
    const x = Math.tan(K0 * SLAB.height);
    const { tm, te } = voltages({ ...SLAB, permittivity: 1 }, 0);
    const expected = complex((eta * x * x) / (1 + x * x), (eta * x) / (1 + x * x));
    expectClose(tm, expected, 1e-12);
    expectClose(te, expected, 1e-12);
  });

  it('are the textbook reactances of a lossless grounded slab where nothing radiates', () => {
    // Above k1 (Pozar 1982): Ve = −j u0 u1 T/(ωε0 (u1 T + εr u0)), Vh = jωμ0/(u0 + u1/T), T = tanh u1h.
    const er = SLAB.permittivity;
    for (const k of [1.8 * K0, 4 * K0, 40 * K0, 400 * K0]) {
      const u0 = Math.sqrt(k * k - K0 * K0);
      const u1 = Math.sqrt(k * k - er * K0 * K0);
      const t = Math.tanh(u1 * SLAB.height);
      const { tm, te } = voltages(SLAB, k);
      expectClose(tm, complex(0, (-u0 * u1 * t) / (OMEGA * EPS0 * (u1 * t + er * u0))), 1e-12);
      expectClose(te, complex(0, (OMEGA * MU0) / (u0 + u1 / t)), 1e-12);
    }
  });

  it('do not jump where the series of a thin layer takes over', () => {
    // |u1 h|² = 1e-5 on either side of k1; on the scale of ωμ0h.
    const k1 = K0 * Math.sqrt(SLAB.permittivity);
    const scale = OMEGA * MU0 * SLAB.height;
    for (const sign of [-1, 1]) {
      const middle = Math.sqrt(k1 * k1 + (sign * 1e-5) / SLAB.height ** 2);
      const [a, b, c] = [-1e-7, 0, 1e-7].map((step) => voltages(SLAB, middle * (1 + step)));
      for (const part of ['tm', 'te'] as const) {
        expect(Math.abs(a[part].im - 2 * b[part].im + c[part].im) / scale).toBeLessThan(1e-11);
        expect(Math.abs(a[part].im - c[part].im) / scale).toBeGreaterThan(1e-8);
      }
    }
  });

  it('take the surface impedance alone as the slab vanishes', () => {
    const zg = complex(0.15, 0.22);
    const { tm, te } = voltages({ ...SLAB, height: 1e-12, groundImpedance: zg }, 0.5 * K0);
    // In parallel with air, some 400 Ω: 0.07 %.
    expectClose(tm, zg, 1e-3);
    expectClose(te, zg, 1e-3);
  });

  it('do not feel a cover of air', () => {
    const cover = { permittivity: 1, lossTangent: 0, thickness: 40e-6 };
    for (const k of [0, 0.7 * K0, 1.3 * K0, 30 * K0]) {
      const [bare, covered] = [voltages(SLAB, k), voltages({ ...SLAB, cover }, k)];
      expectClose(covered.tm, bare.tm, 1e-11);
      expectClose(covered.te, bare.te, 1e-11);
    }
  });

  it('under a cover of the slab’s own dielectric are those of a buried current', () => {
    // Above k1: slab of the whole thickness, lines written from the buried plane upwards and downwards.
    const thickness = 60e-6;
    const cover = { permittivity: SLAB.permittivity, lossTangent: 0, thickness };
    const k = 5 * K0;
    const u0 = Math.sqrt(k * k - K0 * K0);
    const u1 = Math.sqrt(k * k - SLAB.permittivity * K0 * K0);
    const [down, up] = [Math.tanh(u1 * SLAB.height), Math.tanh(u1 * thickness)];
    const { tm, te } = voltages({ ...SLAB, cover }, k);
    const through = (z1: number, z0: number): number => (z1 * (z0 + z1 * up)) / (z1 + z0 * up);
    const parallel = (a: number, b: number): number => (a * b) / (a + b);
    const [e1, e0] = [-u1 / (OMEGA * EPS0 * SLAB.permittivity), -u0 / (OMEGA * EPS0)];
    expectClose(tm, complex(0, parallel(e1 * down, through(e1, e0))), 1e-12);
    const [h1, h0] = [(OMEGA * MU0) / u1, (OMEGA * MU0) / u0];
    expectClose(te, complex(0, parallel(h1 * down, through(h1, h0))), 1e-12);
  });

  it('tend to their direct terms as 1/k⁵', () => {
    for (const cover of [undefined, { permittivity: 3.6, lossTangent: 0.02, thickness: 25e-6 }]) {
      const spectral = slabSpectral({ ...SLAB, lossTangent: 0.002, ...(cover && { cover }) }, F);
      const error = (k: number, part: 'directA' | 'directQ'): number => {
        const out = new Float64Array(4);
        spectral.voltages(k, 0, out);
        const exact =
          part === 'directA'
            ? complex(out[2], out[3])
            : complex((out[0] - out[2]) / k ** 2, (out[1] - out[3]) / k ** 2);
        const { amplitude, wavenumber } = spectral[part];
        // k ≫ κ, so that the root's series is exact to 1e-10.
        const ratio = {
          re: (wavenumber.re ** 2 - wavenumber.im ** 2) / k ** 2,
          im: (2 * wavenumber.re * wavenumber.im) / k ** 2,
        };
        const factor = {
          re: (1 + ratio.re / 2 + (3 * (ratio.re ** 2 - ratio.im ** 2)) / 8) / k,
          im: (ratio.im / 2 + (3 * ratio.re * ratio.im) / 4) / k,
        };
        const direct = complex(
          amplitude.re * factor.re - amplitude.im * factor.im,
          amplitude.re * factor.im + amplitude.im * factor.re,
        );
        return Math.hypot(exact.re - direct.re, exact.im - direct.im);
      };
      for (const part of ['directA', 'directQ'] as const) {
        const fall = Math.log2(error(500 * K0, part) / error(1000 * K0, part));
        expect(fall).toBeGreaterThan(4.7);
        expect(fall).toBeLessThan(5.3);
      }
    }
  });

  it('refuses what is no passive slab', () => {
    expect(() => slabSpectral({ ...SLAB, permittivity: 0.9 }, F)).toThrow(RangeError);
    expect(() => slabSpectral({ ...SLAB, height: 0 }, F)).toThrow(RangeError);
    expect(() => slabSpectral({ ...SLAB, lossTangent: -1e-3 }, F)).toThrow(RangeError);
    expect(() => slabSpectral({ ...SLAB, groundImpedance: complex(-1, 0) }, F)).toThrow(RangeError);
    expect(() => slabSpectral({ ...SLAB, cover: { permittivity: 3, lossTangent: 0, thickness: 0 } }, F)).toThrow(
      RangeError,
    );
    expect(() => slabSpectral(SLAB, 0)).toThrow(RangeError);
  });
});
