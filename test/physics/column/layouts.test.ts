import { describe, expect, it } from 'vitest';
import { abs, abs2, complex, sub } from '../../../src/numerics/complex.js';
import { type ColumnGeometry, type ColumnProblem, edgeNetwork } from '../../../src/physics/column/index.js';
import { surfaceResistance } from '../../../src/physics/material/index.js';
import { farFieldPower } from '../../../src/physics/pattern/index.js';

const F = 77.5e9;
const LINE = 0.15e-3;
const smooth = (f: number) => {
  const rs = surfaceResistance(f, 5.8e7);
  const z = complex(rs, rs);
  return { underside: z, top: z, edges: z, ground: z };
};
const none = { underside: complex(0), top: complex(0), edges: complex(0), ground: complex(0) };

const plain: ColumnGeometry = {
  x: 0,
  y: 0,
  feedLineWidth: LINE,
  patches: [0.7e-3, 1.0e-3, 1.2e-3, 0.8e-3].map((width) => ({ width, length: 1.06e-3 })),
  links: [1.24e-3, 1.26e-3, 1.23e-3].map((length) => ({ width: LINE, length })),
};
const board = (...columns: ColumnGeometry[]): ColumnProblem => ({
  slab: { permittivity: 3, lossTangent: 0.0015, height: 127e-6 },
  stripThickness: 0,
  referenceImpedance: 'line',
  columns,
});
const solve = (problem: ColumnProblem, frequency = F) =>
  edgeNetwork(problem, 82e9).solve({ frequency, faces: smooth(frequency) });

const matching = [
  { width: 0.25e-3, length: 0.6e-3 },
  { width: 0.12e-3, length: 0.59e-3 },
];
const layouts: [string, ColumnGeometry][] = [
  ['matching sections', { ...plain, matching }],
  ['an inset', { ...plain, inset: { depth: 0.25e-3, gap: 0.1e-3 } }],
  ['both', { ...plain, matching, inset: { depth: 0.2e-3, gap: 0.1e-3 } }],
  ['a termination', { ...plain, termination: { width: LINE } }],
  ['a feed from the side', { ...plain, sideFeed: { link: 1, side: 1 } }],
  ['the other direction', { ...plain, direction: -1 }],
];

describe('layouts of the edge network', () => {
  it.each(layouts)('keeps every watt, with reciprocity and passivity: %s', (_, column) => {
    const solution = solve(board(column, { ...plain, x: 0.3e-3, y: 2.1e-3 }));
    const { scattering: s } = solution;
    expect(abs(sub(s[1][0], s[0][1]))).toBeLessThan(1e-12);
    for (const c of [0, 1]) expect(abs2(s[0][c]) + abs2(s[1][c])).toBeLessThan(1);
    const { power } = solution.excite([complex(1), complex(0.4, -0.7)]);
    const sinks =
      power.radiated +
      power.surfaceWave +
      power.underside +
      power.top +
      power.edges +
      power.ground +
      power.dielectric +
      power.load;
    expect(Math.abs(power.accepted - sinks) / power.incident).toBeLessThan(1e-12);
    const flagged = solution.flags.some((f) => f.code === 'column.layout');
    expect(flagged).toBe(column.termination === undefined);
  });

  it('mirrors a column that runs the other way', () => {
    const forward = solve(board(plain)).excite([complex(1)]);
    const backward = solve(board({ ...plain, direction: -1 })).excite([complex(1)]);
    expect(abs(sub(forward.reflected[0], backward.reflected[0]))).toBeLessThan(1e-12);
    const [a, b] = [forward, backward].map((e) => e.field.cut('elevation'));
    for (const angle of [-0.9, -0.2, 0.1, 0.6]) expect(b(-angle) / a(angle)).toBeCloseTo(1, 9);
    forward.patchCurrents[0].forEach((current, p) => {
      expect(abs(sub(complex(-current.re, -current.im), backward.patchCurrents[0][p]))).toBeLessThan(
        1e-12 + 1e-9 * abs(current),
      );
    });
  });

  it('sees a lossless quarter wave through as the classic transformer', () => {
    const lossless = { permittivity: 3, lossTangent: 0, height: 127e-6 };
    const impedance = (column: ColumnGeometry) => {
      const { scattering, referenceImpedance } = edgeNetwork({ ...board(column), slab: lossless }, 82e9).solve({
        frequency: F,
        faces: none,
      });
      const [s, z] = [scattering[0][0], referenceImpedance[0]];
      const d = (1 - s.re) ** 2 + s.im ** 2;
      return { re: (z * (1 - abs2(s))) / d, im: (z * 2 * s.im) / d, z };
    };
    // A section of the feed line's own width is more of the feed line: |Γ| stays, its phase turns back by 2βl.
    const near = impedance(plain);
    const far = impedance({ ...plain, matching: [{ width: LINE, length: 0.4e-3 }] });
    const gamma = (w: typeof near) => {
      const n = complex(w.re - w.z, w.im);
      const d = complex(w.re + w.z, w.im);
      return { size: abs(n) / abs(d), angle: Math.atan2(n.im, n.re) - Math.atan2(d.im, d.re) };
    };
    expect(gamma(far).size).toBeCloseTo(gamma(near).size, 9);
    const turn = (gamma(near).angle - gamma(far).angle + 4 * Math.PI) % (2 * Math.PI);
    // β of a 0.15 mm line on 127 µm, permittivity 3, at 77.5 GHz: 2450 to 2500 rad/m.
    expect(turn / 2 / 0.4e-3).toBeGreaterThan(2400);
    expect(turn / 2 / 0.4e-3).toBeLessThan(2550);
  });

  it('lowers the resistance of an inset patch as cos² of the depth', () => {
    const length = 1.02e-3;
    // Resistance at resonance from the smallest |Γ|, which no length of line changes; all of these are above the line's.
    const resistance = (depth: number): number => {
      const patches = [{ width: 1.0e-3, length }];
      const engine = edgeNetwork(
        board({ ...plain, patches, links: [], ...(depth > 0 ? { inset: { depth, gap: 0.06e-3 } } : {}) }),
        86e9,
      );
      let least = 1;
      for (let f = 74e9; f <= 84e9; f += 50e6)
        least = Math.min(least, abs(engine.solve({ frequency: f, faces: smooth(f) }).scattering[0][0]));
      return (1 + least) / (1 - least);
    };
    const edge = resistance(0);
    for (const depth of [0.1e-3, 0.2e-3, 0.28e-3]) {
      const expected = Math.cos((Math.PI * depth) / length) ** 2;
      // Published practice (Balanis, Antenna Theory, 14.2.1; from memory), itself good to 10 or 20 per cent.
      expect(resistance(depth) / edge / expected).toBeGreaterThan(0.8);
      expect(resistance(depth) / edge / expected).toBeLessThan(1.2);
    }
  });

  it('gives a matched load what passes the column, and less of it the more patches there are', () => {
    const passing = [1, 2, 4].map((n) => {
      const column = {
        ...plain,
        patches: plain.patches.slice(0, n),
        links: plain.links.slice(0, n - 1),
        termination: { width: LINE },
      };
      const { power } = solve(board(column)).excite([complex(1)]);
      return power.load / power.accepted;
    });
    for (const share of passing) expect(share).toBeGreaterThan(0.05);
    expect(passing[0]).toBeLessThan(0.95);
    expect(passing[1]).toBeLessThan(passing[0]);
    expect(passing[2]).toBeLessThan(passing[1]);
    const open = solve(board(plain)).excite([complex(1)]);
    expect(open.power.load).toBe(0);
  });

  it('radiates broadside from two patches fed at the middle of their link only if their currents are in phase', () => {
    const patch = { width: 1e-3, length: 1.05e-3 };
    const column: ColumnGeometry = {
      ...plain,
      patches: [patch, patch],
      links: [{ width: LINE, length: 1.25e-3 }],
      sideFeed: { link: 0, side: 1 },
    };
    const excited = solve(board(column)).excite([complex(1)]);
    // Mirror symmetry: currents of the two patches are opposite along x, and the field vanishes broadside.
    const [a, b] = excited.patchCurrents[0];
    expect(abs(complex(a.re + b.re, a.im + b.im))).toBeLessThan(1e-9 * abs(a) + 1e-15);
    const cut = excited.field.cut('elevation');
    expect(cut(0)).toBeLessThan(1e-12 * cut(0.5));
    expect(cut(0.5) / cut(-0.5)).toBeCloseTo(1, 9);
    expect(farFieldPower(excited.field)).toBeGreaterThan(0);
  });

  it('refuses what cannot be drawn', () => {
    const bad: ColumnGeometry[] = [
      { ...plain, inset: { depth: 1.1e-3, gap: 0.1e-3 } },
      { ...plain, inset: { depth: 0.2e-3, gap: 0.4e-3 } },
      { ...plain, sideFeed: { link: 3, side: 1 } },
      { ...plain, sideFeed: { link: 1, side: 1 }, matching },
    ];
    for (const column of bad) expect(() => edgeNetwork(board(column), 80e9)).toThrow(RangeError);
  });
});
