import { describe, expect, it } from 'vitest';
import { slabIntegrals } from '../../../src/physics/column/slab-integrals.js';
import { addWeights, type SlabPotentials, slabPotentials } from '../../../src/physics/column/slab-potentials.js';
import { slabSpectrum } from '../../../src/physics/column/slab-spectrum.js';
import { EPS0, MU0 } from '../../../src/physics/constants.js';

const F = 77e9;
const K0 = (2 * Math.PI * F) / 299792458;

/** Potential p at distance r: [re, im, guided part of im]. */
function at(integrals: ReturnType<typeof slabIntegrals>, slab: SlabPotentials, p: number, r: number): number[] {
  const weights = new Float64Array(integrals.distance.length);
  addWeights(integrals.distance, r, 1, weights, 0, weights);
  return [slab.re[p], slab.im[p], slab.guided[p]].map((table) => weights.reduce((sum, w, i) => sum + w * table[i], 0));
}

const difference = (a: number[], b: number[]): number => Math.hypot(a[0] - b[0], a[1] - b[1]) / Math.hypot(a[0], a[1]);

// The table's interpolation is good to 5e-5 of the potential: 0.001 dB in any figure, far below the engine's own accuracy.
describe('slab potentials', () => {
  const integrals = slabIntegrals(F, 3, 127e-6, 25e-3);
  const slab = slabPotentials(F, 3, 127e-6, integrals);

  it('tends to free space over a ground plane as the slab vanishes', () => {
    // Permittivity 1.02 and 1 µm: F = ε0 e^{−jk0r}/(2πr), M = e^{−jk0r}/(2πμ0r) to the slab's own few tenths of a per cent.
    const grid = slabIntegrals(F, 1.02, 1e-6, 10e-3);
    const thin = slabPotentials(F, 1.02, 1e-6, grid);
    for (const r of [0.3e-3, 1e-3, 4e-3, 9e-3]) {
      const free = [Math.cos(K0 * r) / (2 * Math.PI * r), -Math.sin(K0 * r) / (2 * Math.PI * r)];
      const [f, m] = [at(grid, thin, 2, r), at(grid, thin, 3, r)];
      expect(difference(free, [f[0] / EPS0, f[1] / EPS0])).toBeLessThan(5e-3);
      expect(difference(free, [m[0] * MU0, m[1] * MU0])).toBeLessThan(5e-3);
    }
  });

  it('is a charge and its image close by, in the mean of the two media', () => {
    const r = 40e-6;
    const [scalar] = at(integrals, slab, 1, r);
    // Static image series of a charge on a grounded slab of permittivity 3, the n-th pair of images 2n h below.
    const image = (n: number): number => 1 / Math.hypot(r, 2 * n * 127e-6);
    let sum = image(0);
    for (let n = 1; n < 60; n++) sum += (-1) ** n * ((3 - 1) / (3 + 1)) ** (n - 1) * (1 + (3 - 1) / (3 + 1)) * image(n);
    // Retardation over 40 µm at 77 GHz is (k r)²/2, a few parts in a thousand.
    expect((scalar * 2 * Math.PI * EPS0 * (1 + 3)) / sum).toBeCloseTo(1, 1);
  });

  it('does not depend on the paths that it is integrated along', () => {
    const grid = slabIntegrals(90e9, 3.3, 100e-6, 40e-3);
    const other = slabPotentials(F, 3, 127e-6, grid);
    for (const r of [0.03e-3, 0.2e-3, 1.1e-3, 2.4e-3, 10e-3, 24e-3])
      for (const p of [1, 2, 3])
        expect(difference(at(integrals, slab, p, r), at(grid, other, p, r))).toBeLessThan(1e-4);
    // G_A falls as 1/r² and so drowns in the interpolation of what cancels; it is judged by its size nearby.
    for (const r of [0.03e-3, 0.2e-3, 1.1e-3, 2.4e-3])
      expect(difference(at(integrals, slab, 0, r), at(grid, other, 0, r))).toBeLessThan(1e-4);
  });

  it('is all guided wave far along the slab, but for the lateral wave', () => {
    // e^{−jkr}/√r against 1/r²: at 24 mm (six wavelengths) the rest is a few per cent of M.
    for (const p of [1, 2, 3]) {
      const [near, far] = [at(integrals, slab, p, 12e-3), at(integrals, slab, p, 24e-3)];
      const rest = (v: number[]): number => Math.abs(v[1] - v[2]) / Math.hypot(v[0], v[1]);
      expect(rest(far)).toBeLessThan(0.6);
      expect(rest(near)).toBeLessThan(1.2);
    }
  });

  it('finds the pole where the spectrum is singular', () => {
    const { kp, k0, k1, residueF, residueQ } = slabSpectrum(F, 3, 127e-6);
    expect(kp).toBeGreaterThan(k0);
    expect(kp).toBeLessThan(k1);
    const [er, h] = [3, 127e-6];
    // The lossless TM line at real k: F = ε1 (u1 + εr u0 t)/(u1 (εr u0 + u1 t)), TM part of G_q = u0 u1 t/(ε0 k² (…)).
    for (const side of [1 - 1e-6, 1 + 1e-6]) {
      const k = kp * side;
      const u0 = Math.sqrt(k * k - k0 * k0);
      const b = Math.sqrt(k1 * k1 - k * k);
      const [u1t, tOverU1] = [-b * Math.tan(b * h), Math.tan(b * h) / b];
      const d = er * u0 + u1t;
      const gap = k * k - kp * kp;
      expect(((EPS0 * er * (1 + er * u0 * tOverU1)) / d) * (gap / residueF)).toBeCloseTo(1, 2);
      expect(((u0 * u1t) / (EPS0 * k * k * d)) * (gap / residueQ)).toBeCloseTo(1, 2);
    }
  });
});
