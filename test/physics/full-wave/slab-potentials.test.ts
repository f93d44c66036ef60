import { describe, expect, it } from 'vitest';
import { besselJ0 } from '../../../src/numerics/bessel.js';
import { abs, type Complex, complex, sub } from '../../../src/numerics/complex.js';
import { gaussLegendre } from '../../../src/numerics/gauss-legendre.js';
import { lagrangeWeights } from '../../../src/numerics/lagrange.js';
import { SPEED_OF_LIGHT } from '../../../src/physics/constants.js';
import { hankelTable } from '../../../src/physics/full-wave/hankel-table.js';
import type { SlabMedium } from '../../../src/physics/full-wave/slab-medium.js';
import {
  directPotential,
  type Potentials,
  type PotentialTables,
  potentialTables,
  spectra,
} from '../../../src/physics/full-wave/slab-potentials.js';
import { slabSpectral } from '../../../src/physics/full-wave/slab-spectral.js';
import { fallingPath, windowedPath } from '../../../src/physics/full-wave/sommerfeld-path.js';

const F = 77e9;
const K0 = (2 * Math.PI * F) / SPEED_OF_LIGHT;
const BAND = { low: 76e9, high: 81e9 };
const SLAB: SlabMedium = { permittivity: 3.2, lossTangent: 0.004, height: 110e-6, groundImpedance: complex(0.1, 0.15) };
const COVERED: SlabMedium = { ...SLAB, cover: { permittivity: 3.6, lossTangent: 0.02, thickness: 25e-6 } };

type Part = 'a' | 'q';

function interpolate(re: Float64Array, im: Float64Array, x: number, even: boolean): Complex {
  const weights = new Float64Array(8);
  const first = Math.min(Math.floor(x) - 3, re.length - 8);
  const from = even ? first : Math.max(0, first);
  lagrangeWeights(8, x - from, weights);
  let [sumRe, sumIm] = [0, 0];
  weights.forEach((w, m) => {
    sumRe += w * re[Math.abs(from + m)];
    sumIm += w * im[Math.abs(from + m)];
  });
  return complex(sumRe, sumIm);
}

function nearValue(tables: PotentialTables, p: Potentials, part: Part, rho: number): Complex {
  const x = Math.asinh(rho / tables.nearScale) / tables.nearStep;
  const rest = interpolate(p.near[`${part}Re`], p.near[`${part}Im`], x, true);
  const direct = directPotential(part === 'a' ? p.directA : p.directQ, rho);
  return complex(rest.re + direct.re, rest.im + direct.im);
}

function farValue(tables: PotentialTables, p: Potentials, part: Part, rho: number): Complex {
  const x = Math.log(rho / tables.farStart) / tables.farStep;
  const whole = interpolate(p.far[`${part}Re`], p.far[`${part}Im`], x, false);
  const [c, s] = [Math.cos(tables.farWavenumber * rho) / rho, -Math.sin(tables.farWavenumber * rho) / rho];
  return complex(whole.re * c - whole.im * s, whole.re * s + whole.im * c);
}

/** Brute force along the real axis, which loss keeps clear of the pole: the remainder by plain panels, k0 removed by substitution. */
function alongRealAxis(medium: SlabMedium, part: Part, rho: number): Complex {
  const spectral = slabSpectral(medium, F);
  const pair = spectra(spectral);
  const direct = part === 'a' ? spectral.directA : spectral.directQ;
  const out = new Float64Array(4);
  const rule = gaussLegendre(20);
  let [re, im] = [0, 0];
  const panel = (from: number, to: number, k: (x: number) => number, slope: (x: number) => number): void => {
    for (let i = 0; i < 20; i++) {
      const x = from + ((to - from) * (1 + rule.nodes[i])) / 2;
      const w = (((to - from) / 2) * rule.weights[i] * slope(x) * k(x) * besselJ0(k(x) * rho)) / (2 * Math.PI);
      pair(k(x), 0, out);
      const q = part === 'a' ? 0 : 2;
      // C/√(k² − κ²), κ² in the lower half-plane: the root's argument stays within (0, π/2).
      const kk = complex(
        k(x) ** 2 - (direct.wavenumber.re ** 2 - direct.wavenumber.im ** 2),
        -2 * direct.wavenumber.re * direct.wavenumber.im,
      );
      const [modulus, angle] = [1 / Math.sqrt(abs(kk)), -Math.atan2(kk.im, kk.re) / 2];
      const root = complex(modulus * Math.cos(angle), modulus * Math.sin(angle));
      re += w * (out[q] - (direct.amplitude.re * root.re - direct.amplitude.im * root.im));
      im += w * (out[q + 1] - (direct.amplitude.re * root.im + direct.amplitude.im * root.re));
    }
  };
  for (let n = 0; n < 40; n++)
    panel(
      (n * Math.PI) / 80,
      ((n + 1) * Math.PI) / 80,
      (x) => K0 * Math.sin(x),
      (x) => K0 * Math.cos(x),
    );
  // Panels short enough for poles and branch points a hundredth of k0 away.
  const edge = Math.acosh(2.5);
  for (let n = 0; n < 250; n++)
    panel(
      (n * edge) / 250,
      ((n + 1) * edge) / 250,
      (x) => K0 * Math.cosh(x),
      (x) => K0 * Math.sinh(x),
    );
  const last = 11 / (medium.cover?.thickness ?? medium.height);
  const panels = Math.ceil(((last - 2.5 * K0) * Math.max(rho, 0.3e-3)) / 6);
  for (let n = 0; n < panels; n++) {
    const at = (m: number): number => 2.5 * K0 + ((last - 2.5 * K0) * m) / panels;
    panel(
      at(n),
      at(n + 1),
      (x) => x,
      () => 1,
    );
  }
  const whole = directPotential(direct, rho);
  return complex(re + whole.re, im + whole.im);
}

describe('Sommerfeld integrals', () => {
  it('of a decaying exponential are those of the textbook', () => {
    // ∫ e^{−kz} J0(kρ) k dk = z/(ρ² + z²)^{3/2} (Watson 1944, 13.2)
    const z = 0.1e-3;
    const distances = Float64Array.of(0, 0.05e-3, 0.3e-3, 1e-3);
    const out = {
      aRe: new Float64Array(4),
      aIm: new Float64Array(4),
      qRe: new Float64Array(4),
      qIm: new Float64Array(4),
    };
    hankelTable(fallingPath(3 * K0, 1e-3, 25 / z), distances)(
      (kRe, kIm, value) => {
        value[0] = Math.exp(-kRe * z) * Math.cos(kIm * z);
        value[1] = -Math.exp(-kRe * z) * Math.sin(kIm * z);
        value[2] = 2 * value[0];
        value[3] = 2 * value[1];
      },
      out,
      0,
    );
    distances.forEach((rho, i) => {
      const expected = z / (rho * rho + z * z) ** 1.5 / (2 * Math.PI);
      const size = 1 / (z * z);
      expect(Math.abs(out.aRe[i] - expected) / size).toBeLessThan(1e-10);
      expect(Math.abs(out.aIm[i]) / size).toBeLessThan(1e-10);
      expect(out.qRe[i]).toBeCloseTo(2 * out.aRe[i], 6);
    });
  });

  it('of what does not fall off end in a window without a trace', () => {
    // 1/√(k² − κ²) ↔ e^{−jκρ}/(2πρ) (Sommerfeld 1909)
    const kappa = 1.3 * K0;
    for (const nearest of [0.2e-3, 3e-3, 20e-3]) {
      const distances = Float64Array.of(nearest, 1.4 * nearest, 2 * nearest);
      const out = {
        aRe: new Float64Array(3),
        aIm: new Float64Array(3),
        qRe: new Float64Array(3),
        qIm: new Float64Array(3),
      };
      hankelTable(windowedPath(2 * K0, nearest, 2 * nearest), distances)(
        (kRe, kIm, value) => {
          const [re, im] = [kRe * kRe - kIm * kIm - kappa * kappa, 2 * kRe * kIm];
          const [modulus, angle] = [1 / Math.sqrt(Math.hypot(re, im)), -Math.atan2(im, re) / 2];
          value[0] = modulus * Math.cos(angle);
          value[1] = modulus * Math.sin(angle);
          value[2] = 0;
          value[3] = 0;
        },
        out,
        0,
      );
      distances.forEach((rho, i) => {
        const size = 1 / (2 * Math.PI * rho);
        expect(Math.abs(out.aRe[i] / size - Math.cos(kappa * rho))).toBeLessThan(2e-9);
        expect(Math.abs(out.aIm[i] / size + Math.sin(kappa * rho))).toBeLessThan(2e-9);
      });
    }
  });
});

describe('potentials of a slab', () => {
  for (const [name, medium] of [
    ['bare', SLAB],
    ['covered', COVERED],
  ] as const) {
    const tables = potentialTables(BAND, medium, 1.5e-3, 0.2e-3, 30e-3);
    const potentials = tables.at(F, medium);

    it(`agree where near and far tables overlap (${name})`, () => {
      for (const rho of [0.21e-3, 0.4e-3, 0.7e-3, 1e-3, 1.4e-3]) {
        for (const part of ['a', 'q'] as const) {
          const [near, far] = [nearValue(tables, potentials, part, rho), farValue(tables, potentials, part, rho)];
          expect(abs(sub(near, far)) / abs(far)).toBeLessThan(1e-6);
        }
      }
    });

    it(`equal a brute-force integral along the real axis (${name})`, () => {
      // More loss than the band's path needs, so that the axis itself can be used.
      const lossy = { ...medium, lossTangent: 0.03 };
      const values = tables.at(F, lossy);
      for (const rho of [0.03e-3, 0.15e-3, 0.9e-3, 4e-3, 17e-3]) {
        for (const part of ['a', 'q'] as const) {
          const expected = alongRealAxis(lossy, part, rho);
          const value = (rho < 1.4e-3 ? nearValue : farValue)(tables, values, part, rho);
          expect(abs(sub(value, expected)) / abs(expected)).toBeLessThan(1e-6);
        }
      }
    });
  }

  it('are those of a source and its image where the slab is air', () => {
    const air: SlabMedium = { permittivity: 1, lossTangent: 0, height: 0.4e-3, groundImpedance: complex(0) };
    const tables = potentialTables(BAND, air, 1e-3, 0.3e-3, 20e-3);
    const p = tables.at(F, air);
    for (const rho of [0.1e-3, 0.6e-3, 2e-3, 15e-3]) {
      const far = Math.hypot(rho, 2 * air.height);
      const expected = complex(
        Math.cos(K0 * rho) / rho - Math.cos(K0 * far) / far,
        -Math.sin(K0 * rho) / rho + Math.sin(K0 * far) / far,
      );
      for (const [part, amplitude] of [
        ['a', p.directA.amplitude],
        ['q', p.directQ.amplitude],
      ] as const) {
        const value = (rho < 0.9e-3 ? nearValue : farValue)(tables, p, part, rho);
        // Both amplitudes are imaginary: A jωμ0/2, Q 1/(2jωε0), over 2π.
        const size = amplitude.im / (2 * Math.PI);
        expect(abs(sub(value, complex(-size * expected.im, size * expected.re))) / abs(value)).toBeLessThan(2e-7);
      }
    }
  });

  it('do not depend on the tables, also where waves are slow and several are guided', () => {
    const slow: SlabMedium = { ...SLAB, permittivity: 10, height: 254e-6, lossTangent: 0, groundImpedance: complex(0) };
    const radome: SlabMedium = { ...SLAB, cover: { permittivity: 3, lossTangent: 0, thickness: 1e-3 } };
    for (const medium of [slow, radome]) {
      const first = potentialTables(BAND, medium, 1e-3, 0.15e-3, 60e-3);
      const second = potentialTables({ low: 60e9, high: 90e9 }, medium, 1.3e-3, 0.23e-3, 45e-3);
      const [p, q] = [first.at(F, medium), second.at(F, medium)];
      for (const rho of [0.5e-3, 3e-3, 17e-3, 40e-3])
        for (const part of ['a', 'q'] as const) {
          const [a, b] = [farValue(first, p, part, rho), farValue(second, q, part, rho)];
          expect(abs(sub(a, b)) / abs(a)).toBeLessThan(1e-7);
        }
    }
  });

  it('refuse what they are not prepared for', () => {
    const tables = potentialTables(BAND, COVERED, 1e-3, 0.3e-3, 5e-3);
    expect(() => tables.at(110e9, COVERED)).toThrow(RangeError);
    expect(() => tables.at(F, { ...COVERED, permittivity: 6 })).toThrow(RangeError);
    expect(() => tables.at(F, { ...COVERED, height: 10e-6 })).toThrow(RangeError);
    expect(() => potentialTables({ low: 80e9, high: 70e9 }, SLAB, 1e-3, 0.3e-3, 5e-3)).toThrow(RangeError);
  });
});
