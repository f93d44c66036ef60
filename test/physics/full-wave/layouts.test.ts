import { describe, expect, it } from 'vitest';
import { type ColumnGeometry, edgeNetwork } from '../../../src/physics/column/index.js';
import { type FullWaveProblem, type FullWaveSettings, fullWave } from '../../../src/physics/full-wave/index.js';

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
const exact = { ...coarse, tolerance: 1e-11 };
const one: ColumnGeometry = {
  x: 0,
  y: 0,
  feedLineWidth: 0.15e-3,
  patches: [{ width: 1e-3, length: 1.061e-3 }],
  links: [],
};
const two: ColumnGeometry = {
  ...one,
  patches: [
    { width: 0.7e-3, length: 1.061e-3 },
    { width: 0.995e-3, length: 1.061e-3 },
  ],
  links: [{ width: 0.15e-3, length: 1.238e-3 }],
};
const problemOf = (columns: readonly ColumnGeometry[], rest: Partial<FullWaveProblem> = {}): FullWaveProblem => ({
  slab,
  stripThickness: 0,
  columns,
  referenceImpedance: 'line',
  ...rest,
});
const solved = (
  columns: readonly ColumnGeometry[],
  rest: Partial<FullWaveProblem> = {},
  settings: FullWaveSettings = coarse,
) => fullWave(problemOf(columns, rest), band, settings).solve({ frequency, faces });
const distance = (a: { re: number; im: number }, b: { re: number; im: number }): number =>
  Math.hypot(a.re - b.re, a.im - b.im);
const UNIT = [{ re: 1, im: 0 }];

describe('layouts of columns by full wave', () => {
  it.each([
    ['plain', two],
    [
      'with matching, inset and termination',
      {
        ...two,
        matching: [{ width: 0.2e-3, length: 0.5e-3 }],
        inset: { depth: 0.25e-3, gap: 0.1e-3 },
        termination: { width: 0.15e-3 },
      },
    ],
  ])('run to −x as the mirror image of +x: %s', (_, column: ColumnGeometry) => {
    const [forth, back] = ([1, -1] as const).map((direction) => {
      const solution = solved([{ ...column, direction }], {}, exact);
      return { s: solution.scattering[0][0], direction, excited: solution.excite(UNIT) };
    });
    expect(distance(forth.s, back.s)).toBeLessThan(1e-9);
    for (const angle of [-0.4, 0.1, 0.7])
      expect(back.excited.field.cut('elevation')(-angle) / forth.excited.field.cut('elevation')(angle)).toBeCloseTo(
        1,
        7,
      );
    for (const part of ['radiated', 'surfaceWave', 'underside', 'ground', 'load'] as const)
      expect(Math.abs(back.excited.power[part] - forth.excited.power[part])).toBeLessThan(1e-9);
    expect(distance(back.excited.patchCurrents[0][0], forth.excited.patchCurrents[0][0])).toBeCloseTo(
      2 * Math.hypot(forth.excited.patchCurrents[0][0].re, forth.excited.patchCurrents[0][0].im),
      9,
    );
  });

  it('are fed alike from either side', () => {
    const [left, right] = ([1, -1] as const).map((side) =>
      solved([{ ...two, sideFeed: { link: 0, side } }], {}, exact),
    );
    expect(distance(left.scattering[0][0], right.scattering[0][0])).toBeLessThan(1e-8);
    const angles = [left, right].map((s) => s.excite(UNIT).field.cut('azimuth'));
    expect(angles[1](-0.5) / angles[0](0.5)).toBeCloseTo(1, 6);
  });

  it('with slots beside the line look the same on grids that draw the slots differently', () => {
    const column = { ...one, inset: { depth: 0.3e-3, gap: 0.1e-3 } };
    const reflections = [2, 3, 4].map(
      (cellsPerLine) => solved([column], {}, { ...coarse, cellsPerLine }).scattering[0][0],
    );
    for (const r of reflections.slice(1)) expect(distance(r, reflections[0])).toBeLessThan(0.03);
    // Deeper into the patch its resistance is lower, as cos².
    const edge = solved([one]).scattering[0][0];
    expect(Math.hypot(reflections[2].re, reflections[2].im)).toBeLessThan(Math.hypot(edge.re, edge.im));
  });

  it('give a termination what the edge network gives it', () => {
    const column = { ...two, termination: { width: 0.15e-3 } };
    const wave = solved([column]);
    const network = edgeNetwork(problemOf([column]), band.high).solve({ frequency, faces });
    expect(distance(wave.scattering[0][0], network.scattering[0][0])).toBeLessThan(0.06);
    const loads = [wave, network].map((s) => s.excite(UNIT).power.load);
    expect(loads[0]).toBeGreaterThan(0.1);
    expect(Math.abs(loads[0] / loads[1] - 1)).toBeLessThan(0.12);
  });

  it('transform by a matching section as the edge network does', () => {
    const column = { ...one, feedLineWidth: 0.2e-3, matching: [{ width: 0.4e-3, length: 0.55e-3 }] };
    const network = edgeNetwork(problemOf([column]), band.high).solve({ frequency, faces }).scattering[0][0];
    const plain = edgeNetwork(problemOf([{ ...column, matching: [] }]), band.high).solve({ frequency, faces });
    const wave = solved([column]).scattering[0][0];
    expect(distance(wave, network)).toBeLessThan(0.1);
    expect(distance(wave, plain.scattering[0][0])).toBeGreaterThan(0.4);
  });

  it('refuse a feed that has no place', () => {
    expect(() => solved([{ ...two, sideFeed: { link: 1, side: 1 } }])).toThrow(RangeError);
    expect(() => solved([{ ...two, sideFeed: { link: 0, side: 1 }, inset: { depth: 1e-4, gap: 1e-4 } }])).toThrow(
      RangeError,
    );
    expect(() => solved([{ ...one, inset: { depth: 0.3e-3, gap: 0.5e-3 } }])).toThrow(RangeError);
  });
});
