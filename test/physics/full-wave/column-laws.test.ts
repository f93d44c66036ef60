import { describe, expect, it } from 'vitest';
import type { ColumnGeometry } from '../../../src/physics/column/index.js';
import { type FullWaveProblem, fullWave } from '../../../src/physics/full-wave/index.js';

const sheet = (re: number, im = re) => ({
  underside: { re, im },
  top: { re, im },
  edges: { re, im },
  ground: { re, im },
});
const slab = { permittivity: 3, lossTangent: 0, height: 0.127e-3 };
const band = { low: 75e9, high: 80e9 };
const frequency = 77e9;
const faces = sheet(0.05);
const coarse = { cellsPerPatch: 13 };
const one: ColumnGeometry = {
  x: 0,
  y: 0,
  feedLineWidth: 0.15e-3,
  patches: [{ width: 1e-3, length: 1.061e-3 }],
  links: [],
};
const problemOf = (columns: readonly ColumnGeometry[], rest: Partial<FullWaveProblem> = {}): FullWaveProblem => ({
  slab,
  stripThickness: 0,
  columns,
  referenceImpedance: 'line',
  ...rest,
});
const solved = (columns: readonly ColumnGeometry[], rest: Partial<FullWaveProblem> = {}) =>
  fullWave(problemOf(columns, rest), band, coarse).solve({ frequency, faces });
const distance = (a: { re: number; im: number }, b: { re: number; im: number }): number =>
  Math.hypot(a.re - b.re, a.im - b.im);
const UNIT = [{ re: 1, im: 0 }];

describe('laws of columns by full wave', () => {
  const alone = solved([one]);

  it.each([24e9, 60e9])('without loss depend on size over wavelength only: %d Hz', (other) => {
    const k = frequency / other;
    const scaled: ColumnGeometry = {
      ...one,
      feedLineWidth: one.feedLineWidth * k,
      patches: one.patches.map((p) => ({ width: p.width * k, length: p.length * k })),
    };
    const [small, large] = [
      { columns: [one], size: 1 },
      { columns: [scaled], size: k },
    ].map(({ columns, size }) =>
      fullWave(
        problemOf(columns, { stripThickness: 18e-6 * size, slab: { ...slab, height: slab.height * size } }),
        { low: band.low / size, high: band.high / size },
        coarse,
      ).solve({ frequency: frequency / size, faces: sheet(0) }),
    );
    expect(distance(small.scattering[0][0], large.scattering[0][0])).toBeLessThan(1e-8);
    const cuts = [small, large].map((s) => s.excite(UNIT).field.cut('elevation'));
    expect(cuts[1](0.3) / cuts[0](0.3)).toBeCloseTo(1, 6);
  });

  it('refer to an impedance in ohm as waves on the line do, renormalised', () => {
    const r = 50;
    // Without loss, so that the line's own impedance is real.
    const [line, ohm] = (['line', r] as const).map((referenceImpedance) =>
      fullWave(problemOf([one], { referenceImpedance }), band, coarse).solve({ frequency, faces: sheet(0) }),
    );
    expect(ohm.referenceImpedance).toEqual([r]);
    // ρ' = (ρ + q)/(1 + qρ), q = (Z − R)/(Z + R)
    const [z] = line.referenceImpedance;
    const q = (z - r) / (z + r);
    const { re, im } = line.scattering[0][0];
    const [nr, dr] = [re + q, 1 + q * re];
    const size = dr * dr + (q * im) ** 2;
    const renormalised = { re: (nr * dr + q * im * im) / size, im: (im * dr - nr * q * im) / size };
    expect(distance(ohm.scattering[0][0], renormalised)).toBeLessThan(1e-9);
    const shares = [ohm, line].map((s) => s.excite(UNIT).power).map((p) => p.radiated / p.accepted);
    expect(shares[0]).toBeCloseTo(shares[1], 9);
  });

  it.each([
    ['equal', 0, { ...one, y: 2.1e-3 }],
    ['unequal', 0, { ...one, y: 2.1e-3, patches: [{ width: 0.8e-3, length: 1.04e-3 }] }],
    ['staggered', 1, { ...one, x: 0.6e-3, y: 2.1e-3 }],
    ['against each other', 0, { ...one, x: 1.061e-3, y: 2.1e-3, direction: -1 as const }],
  ])('couple the same both ways, and say so where feed lines disturb it: %s', (_, told: number, neighbour) => {
    const { scattering, flags } = solved([one, neighbour as ColumnGeometry]);
    expect(distance(scattering[0][1], scattering[1][0])).toBeLessThan(1e-12);
    expect(flags.filter((f) => f.code === 'full-wave.reciprocity')).toHaveLength(told);
    expect(Math.hypot(scattering[1][0].re, scattering[1][0].im)).toBeGreaterThan(0.01);
  });

  it('do not feel a cover of air, and resonate lower under one of dielectric', () => {
    const cover = { permittivity: 1, lossTangent: 0, thickness: 25e-6 };
    expect(distance(solved([one], { cover }).scattering[0][0], alone.scattering[0][0])).toBeLessThan(1e-4);
    const mask = solved([one], { cover: { ...cover, permittivity: 3.5 } });
    // Above resonance by some 2.5 GHz: the reflection has turned on.
    expect(mask.scattering[0][0].im).toBeLessThan(alone.scattering[0][0].im - 0.2);
    expect(mask.flags.some((f) => f.code === 'full-wave.cover')).toBe(true);
  });
});
