import { describe, expect, it } from 'vitest';
import { kernelGrid, slabKernel } from '../../../src/physics/column/slab-kernel.js';
import { slabSpectrum } from '../../../src/physics/column/slab-spectrum.js';
import { EPS0, MU0 } from '../../../src/physics/constants.js';

const F = 77e9;

// Splines of the kernel are good to 1e-4 of its size: 0.001 dB in any figure, far below the engine's own accuracy.
describe('slab kernel', () => {
  const grid = kernelGrid(F, 3, 127e-6, 25e-3);
  const kernel = slabKernel(F, 3, 127e-6, grid);
  const [value, power] = [new Float64Array(4), new Float64Array(4)];

  it('tends to free space over a ground plane as the slab vanishes', () => {
    // Permittivity 1.02 and 1 µm: F = ε0 e^{−jk0r}/(2πr), M = e^{−jk0r}/(2πμ0r) to the slab's own few tenths of a per cent.
    const thin = slabKernel(F, 1.02, 1e-6, kernelGrid(F, 1.02, 1e-6, 10e-3));
    const k0 = (2 * Math.PI * F) / 299792458;
    for (const r of [0.3e-3, 1e-3, 4e-3, 9e-3]) {
      thin.evaluate(r, value);
      const c = Math.cos(k0 * r) / (2 * Math.PI * r);
      const s = -Math.sin(k0 * r) / (2 * Math.PI * r);
      const size = 1 / (2 * Math.PI * r);
      expect(Math.hypot(value[0] / EPS0 - c, value[1] / EPS0 - s) / size).toBeLessThan(5e-3);
      expect(Math.hypot(value[2] * MU0 - c, value[3] * MU0 - s) / size).toBeLessThan(5e-3);
    }
  });

  it('carries in its imaginary part the power that is split into space and guided wave', () => {
    for (const r of [0.05e-3, 0.4e-3, 0.75e-3, 0.8e-3, 3e-3, 12e-3]) {
      kernel.evaluate(r, value);
      kernel.evaluatePower(r, power);
      const scale = Math.hypot(value[0], value[1]);
      expect(Math.abs(value[1] - power[0]) / scale).toBeLessThan(1e-4);
      expect(Math.abs(value[3] - power[1]) / Math.hypot(value[2], value[3])).toBeLessThan(1e-4);
    }
  });

  it('is continuous where near and far tables meet', () => {
    const at = (r: number): number[] => {
      kernel.evaluate(r, value);
      return [...value];
    };
    const split = 6 * 127e-6;
    const [a, b] = [at(split * (1 - 1e-9)), at(split * (1 + 1e-9))];
    for (let i = 0; i < 4; i += 2) {
      const size = Math.hypot(a[i], a[i + 1]);
      expect(Math.hypot(a[i] - b[i], a[i + 1] - b[i + 1]) / size).toBeLessThan(1e-4);
    }
  });

  it('does not depend on the grid it is tabulated on', () => {
    const other = slabKernel(F, 3, 127e-6, kernelGrid(81e9, 3.2, 110e-6, 40e-3));
    for (const r of [0.2e-3, 1.1e-3, 2.4e-3, 10e-3, 24e-3]) {
      kernel.evaluate(r, value);
      const first = [...value];
      other.evaluate(r, value);
      for (let i = 0; i < 4; i += 2)
        expect(
          Math.hypot(first[i] - value[i], first[i + 1] - value[i + 1]) / Math.hypot(first[i], first[i + 1]),
        ).toBeLessThan(1e-4);
    }
  });

  it('finds the pole where the spectrum is singular', () => {
    const { kp, k0, k1, remainder, residueF } = slabSpectrum(F, 3, 127e-6);
    expect(kp).toBeGreaterThan(k0);
    expect(kp).toBeLessThan(k1);
    // (k² − kp²)·F tends to the residue from either side; at 1e-6 off, second-order terms are below 1e-3.
    for (const side of [1 - 1e-6, 1 + 1e-6]) {
      remainder(kp * side, value);
      expect((value[0] * ((kp * side) ** 2 - kp * kp)) / residueF).toBeCloseTo(1, 2);
    }
  });
});
