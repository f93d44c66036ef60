import { describe, expect, it } from 'vitest';
import { guidedWavePower, type MacroPatch } from '../../../src/physics/column/index.js';
import { patchReach, patchReaction, reactionPlan } from '../../../src/physics/column/patch-currents.js';
import { patchField } from '../../../src/physics/column/patch-field.js';
import { slabIntegrals } from '../../../src/physics/column/slab-integrals.js';
import { slabPotentials } from '../../../src/physics/column/slab-potentials.js';
import { farFieldPower } from '../../../src/physics/pattern/index.js';

const F = 76.991e9;
const slab = { permittivity: 3, lossTangent: 0, height: 127e-6 };
const patch = (x: number, y: number, lines: MacroPatch['lines'] = []): MacroPatch => ({
  column: 0,
  patch: 0,
  x,
  y,
  length: 1.013e-3,
  width: 1.25e-3,
  lines,
});

function reaction(patches: readonly MacroPatch[]) {
  const integrals = slabIntegrals(F, slab.permittivity, slab.height, patchReach(patches));
  return patchReaction(
    reactionPlan(patches, integrals),
    slabPotentials(F, slab.permittivity, slab.height, integrals, 0.1e-3),
  );
}

describe('reaction of macro currents', () => {
  // Independent solution made for this project: two gap-driven patches with smooth copper, each matched; radiation
  // efficiency (guided wave included) 0.939. Centre distance in mm, |S21| in dB.
  const coupling: [string, number, number, number][] = [
    ['E', 1.3915, -16.499, 0.4],
    ['E', 2.3655, -19.601, 0.4],
    ['E', 4.9166, -23.889, 0.4],
    ['E', 8.8127, -27.687, 0.4],
    // Weak where the field along the slab vanishes but for the slab itself; the profile across then has its say.
    ['H', 1.63, -11.362, 0.8],
    ['H', 2.608, -22.86, 0.8],
    ['H', 5.123, -35.614, 0.8],
    ['H', 9.035, -45.503, 0.8],
  ];
  it.each(coupling)(
    'couples two patches in the %s plane, %d mm apart, as full wave does',
    (plane, mm, db, tolerance) => {
      const d = mm * 1e-3;
      const { re, im } = reaction([patch(0, 0), plane === 'E' ? patch(d, 0) : patch(0, d)]);
      // z over the whole resistance, copper and dielectric included; S21 = 2z/(4 − z²) at resonance.
      const [a, b] = [(0.939 * re[1]) / re[0], (0.939 * im[1]) / re[0]];
      const size = (2 * Math.hypot(a, b)) / Math.hypot(4 - (a * a - b * b), -2 * a * b);
      expect(Math.abs(20 * Math.log10(size) - db)).toBeLessThan(tolerance);
    },
  );

  it('takes out of its currents what goes into far field and guided wave', () => {
    const lines = [{ width: 0.15e-3, share: 0.17 }];
    const patches = [patch(0, 0, lines), patch(2.3e-3, 0, [...lines, ...lines]), patch(0.4e-3, 2.1e-3)];
    const { n, re, guided } = reaction(patches);
    const current = { re: Float64Array.of(1, -0.4, 0.7), im: Float64Array.of(0, 0.9, 0.3) };
    const power = (of: Float64Array): number => {
      let sum = 0;
      for (let i = 0; i < n; i++)
        for (let k = 0; k < n; k++)
          sum += (of[i * n + k] * (current.re[i] * current.re[k] + current.im[i] * current.im[k])) / 2;
      return sum;
    };
    const currents = { frequency: F, slab, patches, ...current };
    const empty = new Float64Array(0);
    const wave = guidedWavePower({ frequency: F, slab, currents, edges: [], re: empty, im: empty });
    // Quadrature of the pairs and of the far field, each good to a thousandth.
    expect(wave / power(guided)).toBeCloseTo(1, 2);
    expect(farFieldPower(patchField(currents)) / (power(re) - power(guided))).toBeCloseTo(1, 2);
  });
});
