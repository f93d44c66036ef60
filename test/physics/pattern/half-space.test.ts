import { describe, expect, it } from 'vitest';
import {
  againstMask,
  beamEfficiency,
  crossPolarDiscrimination,
  cutLobes,
  cutThrough,
  directionGrid,
  farFieldPower,
  halfPowerShare,
  intensity,
  overHalfSpace,
  polarIntensity,
  squint,
  strongestDirection,
} from '../../../src/physics/pattern/index.js';
import { ludwig, pointSources, row, slot } from './point-sources.js';

/** Two patches side by side as their edges. */
const twoByTwo = pointSources(
  [
    { x: 0, y: 0, re: 1 },
    { x: 0.3, y: 0, re: 1 },
    { x: 0, y: 0.9, re: 0.8, im: -0.6 },
    { x: 0.3, y: 0.9, re: 0.8, im: -0.6 },
  ],
  slot,
);

describe('polarisation after Ludwig', () => {
  it('splits the power of the field without loss', () => {
    const field = twoByTwo;
    const [whole, parts, out] = [intensity(field), polarIntensity(field), new Float64Array(2)];
    for (const [u, v] of [
      [0, 0],
      [0.3, 0.4],
      [-0.6, 0.1],
      [0.2, -0.9],
    ] as const) {
      parts(u, v, out);
      expect(out[0] + out[1]).toBeCloseTo(whole(u, v), 14);
    }
  });

  it('finds no cross-polar field in the principal planes of edges, and most of it between them', () => {
    const field = twoByTwo;
    for (const phi of [0, Math.PI / 2]) {
      const { co, cross } = cutThrough(field, phi);
      expect(Math.max(...cross) / Math.max(...co)).toBeLessThan(1e-25);
    }
    expect(Math.max(...cutThrough(field, Math.PI / 4).cross)).toBeGreaterThan(
      1e-3 * Math.max(...cutThrough(field, 0).co),
    );
    const purity = crossPolarDiscrimination(field, strongestDirection(field));
    expect(purity.atPeakDb).toBeGreaterThan(purity.withinBeamDb - 1e-9);
    expect(purity.withinBeamDb).toBeGreaterThanOrEqual(purity.anywhereDb);
    expect(purity.anywhereDb).toBeGreaterThan(5);
    expect(purity.anywhereDb).toBeLessThan(25);
  });

  it('a pure source has no cross-polar field anywhere', () => {
    const field = row(4, 0.5);
    expect(crossPolarDiscrimination(field, strongestDirection(field)).anywhereDb).toBeGreaterThan(250);
  });
});

describe('cuts and grids', () => {
  it('a cut agrees with the principal cuts of the field', () => {
    const field = twoByTwo;
    for (const [phi, plane] of [
      [0, 'elevation'],
      [Math.PI / 2, 'azimuth'],
    ] as const) {
      const { angle, co } = cutThrough(field, phi, 37);
      const principal = field.cut(plane);
      for (let i = 0; i < angle.length; i++) expect(co[i]).toBeCloseTo(principal(angle[i]!), 12);
    }
  });

  it('a grid holds the field inside the unit circle only', () => {
    const field = row(3, 0.6);
    const grid = directionGrid(field, 41);
    const power = intensity(field);
    for (const [i, j] of [
      [20, 20],
      [30, 12],
    ] as const)
      expect(grid.co[j * 41 + i]).toBeCloseTo(power(grid.cosine[i]!, grid.cosine[j]!), 12);
    expect(grid.co[0]).toBeNaN();
    expect(grid.cross[40]).toBeNaN();
  });

  it('finds a beam off both principal planes', () => {
    const k = 2 * Math.PI * 0.5;
    const [u, v] = [0.35, -0.42];
    const sources = Array.from({ length: 64 }, (_, i) => ({ x: 0.5 * (i % 8), y: 0.5 * Math.floor(i / 8) }));
    const field = pointSources(
      sources.map((s) => {
        const phase = -2 * k * (u * s.x + v * s.y);
        return { ...s, re: Math.cos(phase), im: Math.sin(phase) };
      }),
    );
    const peak = strongestDirection(field);
    expect(peak.u).toBeCloseTo(u, 4);
    expect(peak.v).toBeCloseTo(v, 4);
    expect(peak.phi).toBeCloseTo(Math.atan2(v, u), 4);
    expect(peak.intensity).toBeCloseTo(64 ** 2, 1);
  });

  it.each([
    () => cutThrough(row(2, 0.5), Number.NaN),
    () => cutThrough(row(2, 0.5), 0, 1),
    () => directionGrid(row(2, 0.5), 2),
    () => cutLobes([0, 1, 2], [0, 0, 0]),
    () => cutLobes([0, 1, 2], [0, 1]),
    () => againstMask({ angle: [0], intensity: [1] }, [{ from: 1, to: 0, levelDb: 0 }]),
    () => beamEfficiency(row(2, 0.5), { theta: 0, phi: 0 }, 0),
    () => squint([{ frequency: 1, direction: 0 }]),
  ])('refuses nonsense', (call) => {
    expect(call).toThrow(RangeError);
  });
});

describe('power by integration', () => {
  it('is 2π for a lone source, 4π/3 for cos², at any extent of the sampling', () => {
    expect(farFieldPower(row(1, 0.5))).toBeCloseTo(2 * Math.PI, 8);
    expect(farFieldPower(pointSources([{ x: 0, y: 0, re: 1 }], ludwig(Math.sqrt)))).toBeCloseTo(Math.PI, 3);
    expect(
      farFieldPower(
        pointSources(
          [{ x: 0, y: 0, re: 1 }],
          ludwig((c) => c),
        ),
      ),
    ).toBeCloseTo((2 * Math.PI) / 3, 8);
    expect(overHalfSpace(row(30, 0.6), () => 1)).toBeCloseTo(2 * Math.PI, 8);
  });

  it('does not depend on how the board is turned', () => {
    const along = Array.from({ length: 9 }, (_, i) => ({ x: 0.6 * i, y: 0.2 * (i % 2), re: 1, im: 0.1 * i }));
    const turned = along.map((s) => ({ ...s, x: s.y, y: s.x }));
    expect(farFieldPower(pointSources(turned))).toBeCloseTo(farFieldPower(pointSources(along)), 6);
  });

  it('all lies within the half space as a cone, and half of cos² within 45° … by its integral', () => {
    const field = pointSources(
      [{ x: 0, y: 0, re: 1 }],
      ludwig((c) => c),
    );
    const axis = { theta: 0, phi: 0 };
    expect(beamEfficiency(field, axis, Math.PI / 2)).toBeCloseTo(1, 4);
    // 1 − cos³(a)
    for (const a of [0.3, 0.8]) expect(beamEfficiency(field, axis, a)).toBeCloseTo(1 - Math.cos(a) ** 3, 6);
    // Half power at cos θ = 1/√2.
    expect(halfPowerShare(field, strongestDirection(field))).toBeCloseTo(1 - 0.5 ** 1.5, 3);
  });

  it('follows the axis of a cone', () => {
    const lag = Math.PI * Math.sin(0.4);
    const steered = row(12, 0.5, lag);
    const on = beamEfficiency(steered, { theta: 0.4, phi: 0 }, 0.15);
    expect(on).toBeGreaterThan(2 * beamEfficiency(steered, { theta: 0.4, phi: Math.PI }, 0.15));
    expect(on).toBeGreaterThan(beamEfficiency(steered, { theta: 0.3, phi: 0 }, 0.15));
  });
});

describe('masks and squint', () => {
  const cut = cutThrough(row(8, 0.5), 0, 1801);
  const shape = { angle: cut.angle, intensity: cut.co };
  it('names each place where a cut stands above a mask, worst of it', () => {
    const breaches = againstMask(shape, [
      { from: -1.5, to: -0.26, levelDb: -14 },
      { from: 0.26, to: 1.5, levelDb: -14 },
      { from: 0.26, to: 1.5, levelDb: -10 },
    ]);
    expect(breaches).toHaveLength(2);
    for (const breach of breaches) {
      expect(breach.levelDb).toBeCloseTo(-12.8, 2);
      expect(breach.excessDb).toBeCloseTo(1.2, 2);
    }
    expect(breaches[0]!.angle).toBeCloseTo(-breaches[1]!.angle, 6);
  });

  it('leaves alone what no segment names', () => {
    expect(againstMask(shape, [])).toEqual([]);
    expect(againstMask(shape, [{ from: 0.3, to: 1.5, levelDb: -12.7 }])).toEqual([]);
  });

  it('reads a straight squint and a jump apart', () => {
    const at = (direction: (f: number) => number) =>
      [76, 77, 78, 79].map((f) => ({ frequency: f * 1e9, direction: direction(f) }));
    const straight = squint(at((f) => 0.02 * (f - 77)));
    expect(straight.perHertz).toBeCloseTo(0.02e-9, 16);
    expect(straight.span).toBeCloseTo(0.06, 12);
    expect(straight.residual).toBeLessThan(1e-9);
    expect(squint(at((f) => (f > 78 ? 0.1 : 0))).residual).toBeGreaterThan(0.02);
  });
});
