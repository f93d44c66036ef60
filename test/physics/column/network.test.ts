import { describe, expect, it } from 'vitest';
import { abs, abs2, complex, sub } from '../../../src/numerics/complex.js';
import { type ColumnProblem, edgeNetwork, guidedWavePower } from '../../../src/physics/column/index.js';
import { surfaceResistance } from '../../../src/physics/material/index.js';
import { farFieldPower } from '../../../src/physics/pattern/index.js';

const FREQUENCY = 77.5e9;
const rs = surfaceResistance(FREQUENCY, 5.8e7);
const faces = (re: number, im: number) => {
  const z = complex(re * rs, im * rs);
  return { underside: z, top: z, edges: z, ground: z };
};

function problem(
  columns: number,
  options: { lossTangent?: number; thickness?: number; pitch?: number } = {},
): ColumnProblem {
  const { lossTangent = 0.0015, thickness = 18e-6, pitch = 2.0e-3 } = options;
  return {
    slab: { permittivity: 3, lossTangent, height: 127e-6 },
    stripThickness: thickness,
    referenceImpedance: 'line',
    columns: Array.from({ length: columns }, (_, c) => ({
      // Staggered and tapered, so that no symmetry hides a mistake.
      x: c * 0.2e-3,
      y: c * pitch,
      feedLineWidth: 0.15e-3,
      patches: [0.7e-3, 1.0e-3, 1.2e-3, 0.8e-3].map((width) => ({ width, length: 1.06e-3 })),
      links: [1.24e-3, 1.26e-3, 1.23e-3].map((length) => ({ width: 0.15e-3, length })),
    })),
  };
}

const sinks = (p: ReturnType<ReturnType<ReturnType<typeof edgeNetwork>['solve']>['excite']>['power']): number =>
  p.radiated + p.surfaceWave + p.underside + p.top + p.edges + p.ground + p.dielectric;

describe('edge network', () => {
  it.each([0, 18e-6])('accounts for every watt, strip thickness %d m', (thickness) => {
    const solution = edgeNetwork(problem(3, { thickness }), 80e9).solve({ frequency: FREQUENCY, faces: faces(2, 3) });
    const { power } = solution.excite([complex(1), complex(0.3, -0.8), complex(-0.5, 0.2)]);
    // Circuit identities, so rounding is the only error: 1e-9 is the bound the dossier prints.
    expect(Math.abs(power.accepted - sinks(power)) / power.incident).toBeLessThan(1e-12);
    for (const part of [power.radiated, power.surfaceWave, power.underside, power.ground, power.dielectric])
      expect(part).toBeGreaterThan(0);
  });

  it('is reciprocal and passive', () => {
    const { scattering } = edgeNetwork(problem(3), 80e9).solve({ frequency: FREQUENCY, faces: faces(1, 1) });
    for (let i = 0; i < 3; i++) {
      for (let j = 0; j < i; j++) {
        expect(abs(scattering[i][j])).toBeGreaterThan(1e-4);
        expect(abs(sub(scattering[i][j], scattering[j][i]))).toBeLessThan(1e-12);
      }
      expect(scattering.reduce((sum, row) => sum + abs2(row[i]), 0)).toBeLessThan(1);
    }
  });

  it('radiates in the far field and the surface wave what the circuit puts into its edges (lossless)', () => {
    const solution = edgeNetwork(problem(2, { lossTangent: 0 }), 80e9).solve({
      frequency: FREQUENCY,
      faces: faces(0, 0),
    });
    const { power, edges, field } = solution.excite([complex(1), complex(0, 1)]);
    expect(Math.abs(power.accepted - power.radiated - power.surfaceWave) / power.incident).toBeLessThan(1e-12);
    // Spectrum of the currents against their reaction in space. What edges send out beside the cavity mode is in the
    // circuit but in no macro current: a thousandth or two of the power.
    expect(Math.abs(farFieldPower(field) - power.radiated) / power.accepted).toBeLessThan(2e-3);
    expect(Math.abs(guidedWavePower(edges!) - power.surfaceWave) / power.accepted).toBeLessThan(1e-3);
  });

  it('loses less with smoother copper and nothing without', () => {
    const engine = edgeNetwork(problem(1, { lossTangent: 0 }), 80e9);
    const loss = [0, 1, 2].map((k) => {
      const { power } = engine.solve({ frequency: FREQUENCY, faces: faces(k, k) }).excite([complex(1)]);
      return (power.accepted - power.radiated - power.surfaceWave) / power.accepted;
    });
    expect(loss[0]).toBeLessThan(1e-12);
    expect(loss[1]).toBeGreaterThan(0.02);
    expect(loss[2]).toBeGreaterThan(loss[1]);
  });

  it('lowers resonance when copper adds reactance', () => {
    const engine = edgeNetwork(problem(1), 82e9);
    const dip = (x: number): number => {
      let [best, at] = [1, 0];
      for (let f = 74e9; f <= 82e9; f += 50e6) {
        const s = abs(engine.solve({ frequency: f, faces: faces(1, x) }).scattering[0][0]);
        if (s < best) [best, at] = [s, f];
      }
      return at;
    };
    // Rough copper of 2Rs + 3jRs lowers resonance by 0.12 to 0.27 % in independent full-wave solutions: 50 to 400 MHz here.
    const shift = dip(1) - dip(4);
    expect(shift).toBeGreaterThan(50e6);
    expect(shift).toBeLessThan(500e6);
  });

  it('lowers the resonance of a patch as its metal thickens', () => {
    const resonance = (thickness: number): number => {
      const single = problem(1, { thickness, lossTangent: 0 });
      const engine = edgeNetwork(
        { ...single, columns: [{ ...single.columns[0], patches: [{ width: 1.25e-3, length: 1.013e-3 }], links: [] }] },
        82e9,
      );
      let [best, at] = [0, 0];
      for (let f = 76e9; f <= 81e9; f += 20e6) {
        const s = engine.solve({ frequency: f, faces: faces(0, 0) }).scattering[0][0];
        const resistance = (1 - s.re * s.re - s.im * s.im) / ((1 - s.re) ** 2 + s.im * s.im);
        if (resistance > best) [best, at] = [resistance, f];
      }
      return at;
    };
    const thin = resonance(0);
    const drop = [18e-6, 35e-6].map((t) => 1 - resonance(t) / thin);
    // Common experience on 0.1 to 0.13 mm: a few tenths of a per cent.
    expect(drop[0]).toBeGreaterThan(0.002);
    expect(drop[1]).toBeGreaterThan(drop[0]);
    expect(drop[1]).toBeLessThan(0.01);
  });

  it('sees a column far from others as a single one', () => {
    const single = edgeNetwork(problem(1), 80e9).solve({ frequency: FREQUENCY, faces: faces(1, 1) }).scattering[0][0];
    const far = edgeNetwork(problem(2, { pitch: 60e-3 }), 80e9).solve({ frequency: FREQUENCY, faces: faces(1, 1) });
    expect(abs(sub(far.scattering[0][0], single))).toBeLessThan(2e-4);
    expect(abs(far.scattering[1][0])).toBeLessThan(0.02);
  });

  it('does not care how the board lies: mirrored across and shifted', () => {
    const base = problem(3);
    const mirrored = { ...base, columns: base.columns.map((c) => ({ ...c, x: c.x + 1e-3, y: 5e-3 - c.y })) };
    const [a, b] = [base, mirrored].map((p) =>
      edgeNetwork(p, 80e9).solve({ frequency: FREQUENCY, faces: faces(1, 1) }),
    );
    expect(abs(sub(a.scattering[2][0], b.scattering[2][0]))).toBeLessThan(1e-9);
    expect(abs(sub(a.scattering[1][1], b.scattering[1][1]))).toBeLessThan(1e-9);
  });

  it('solves at another reference impedance as the same network seen differently', () => {
    const line = edgeNetwork(problem(1), 80e9).solve({ frequency: FREQUENCY, faces: faces(1, 1) });
    const fifty = edgeNetwork({ ...problem(1), referenceImpedance: 50 }, 80e9).solve({
      frequency: FREQUENCY,
      faces: faces(1, 1),
    });
    const impedance = (s: { re: number; im: number }, z: number): number =>
      (z * (1 - s.re * s.re - s.im * s.im)) / ((1 - s.re) ** 2 + s.im * s.im);
    const [a, b] = [line, fifty].map((s) => impedance(s.scattering[0][0], s.referenceImpedance[0]));
    expect(fifty.referenceImpedance[0]).toBe(50);
    expect(a).toBeCloseTo(b, 8);
  });

  it('flags what lies outside the range of its constants, and only that', () => {
    const codes = (p: ColumnProblem, f: number): string[] =>
      edgeNetwork(p, f)
        .solve({ frequency: f, faces: faces(1, 1) })
        .flags.map((x) => x.code);
    expect(codes(problem(1), FREQUENCY)).toEqual([]);
    expect(codes(problem(1), 15e9)).toContain('column.k0h');
    const light = { ...problem(1), slab: { permittivity: 2, lossTangent: 0, height: 127e-6 } };
    expect(codes(light, FREQUENCY)).toEqual(['column.permittivity']);
  });

  it('refuses layouts and frequencies that it cannot solve', () => {
    const p = problem(1);
    expect(() => edgeNetwork({ ...p, columns: [{ ...p.columns[0], links: [] }] }, 80e9)).toThrow(RangeError);
    expect(() => edgeNetwork(p, 77e9).solve({ frequency: 80e9, faces: faces(1, 1) })).toThrow(RangeError);
    const thick = { ...p, slab: { permittivity: 10, lossTangent: 0, height: 1e-3 } };
    expect(() => edgeNetwork(thick, 80e9).solve({ frequency: 80e9, faces: faces(1, 1) })).toThrow(
      /second surface wave/,
    );
  });
});
