import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { abs2, type Complex, polar, sub } from '../../src/numerics/complex.js';
import { correctedCut } from '../../src/study/corrected-cut.js';
import { correctedScattering, correctedShares, wavesLeaving } from '../../src/study/correction.js';
import { type Confirmation, confirmBoard, correctionIn, nominalValues, runSweep } from '../../src/study/index.js';
import type { PointResult } from '../../src/study/results.js';
import { fixtureBoard } from './fixture-board.js';
import { type StandIn, standIn } from './stand-in-engine.js';

const analysis = { roughnessModel: 'band', frequencyStep: 0.25e9, fullWave: true } as const;
const board = fixtureBoard({ band: { low: 76e9, high: 78e9 } });
const confirmed = (engine: StandIn): Extract<Confirmation, { kind: 'full wave' }> => {
  const found = confirmBoard(board, analysis, undefined, undefined, standIn(engine));
  if (found.kind !== 'full wave') throw new Error(found.reason);
  return found;
};
const sweepOf = (confirmation?: Confirmation) =>
  runSweep(
    board,
    analysis,
    'nominal',
    'nominal',
    nominalValues(board),
    'middle',
    confirmation && correctionIn(confirmation),
  ).sweep.points;
const plain = sweepOf();

/** Largest difference of the figures of two points, each in a unit in which 1 is a lot. */
function apart(a: PointResult, b: PointResult): number {
  const numbers = (p: PointResult): number[] => [
    ...[p.directivity, p.gain, p.realizedGain, p.radiationEfficiency].map((x) => 10 * Math.log10(x)),
    p.mismatch,
    ...p.columnReflection.flatMap(({ re, im }) => [re, im]),
    ...p.activeReflection.flatMap(({ re, im }) => [re, im]),
    ...[p.elevation, p.azimuth].flatMap((c) => [10 * c.beamDirection, 10 * c.halfPowerBeamwidth, c.sidelobeDb]),
    ...Object.values(p.shares),
  ];
  const others = numbers(b);
  return Math.max(
    ...numbers(a).map((x, i) => (Number.isNaN(x) && Number.isNaN(others[i]) ? 0 : Math.abs(x - others[i]!))),
  );
}

function expectClosed(point: PointResult): void {
  expect(Object.values(point.shares).reduce((a, b) => a + b, 0)).toBeCloseTo(1, 13);
  expect(Math.min(...Object.values(point.shares))).toBeGreaterThanOrEqual(0);
  expect(point.shares.radiated).toBe(point.radiationEfficiency);
  expect(point.gain).toBe(point.directivity * point.radiationEfficiency * point.feedTransmission);
  expect(point.realizedGain).toBe(point.gain * point.mismatch);
  expect(point.mismatch).toBeGreaterThan(0);
  expect(point.mismatch).toBeLessThanOrEqual(1);
}

describe('the network corrected by the full wave', () => {
  it('stays as it is where the engines agree', () => {
    const same = confirmed({});
    expect(same.alignment).toEqual({ shift: 0, remaining: expect.closeTo(0, 9) });
    sweepOf(same).forEach((point, i) => {
      expect(apart(point, plain[i]!)).toBeLessThan(1e-6);
      const cut = plain[i]!.cuts.elevation.gainDbi;
      point.cuts.elevation.gainDbi.forEach((level, k) => {
        expect(Math.abs(level - cut[k]!)).toBeLessThan(1e-5);
      });
    });
  });

  it('finds a shift in frequency and is then right at frequencies and in states that were not compared', () => {
    const shift = 0.12e9;
    const found = confirmed({ shift });
    expect(found.alignment!.shift).toBeCloseTo(shift, -7);
    // Two steps of the sweep are one full-wave frequency and the middle between two.
    const truth = runSweep(
      { ...board, band: { low: 76e9 - shift, high: 78e9 - shift } },
      analysis,
      'nominal',
      '',
      nominalValues(board),
      'middle',
    ).sweep.points;
    sweepOf(found).forEach((point, i) => {
      // Surfaces, 0.16 % of frequency apart, are those of the sweep here and those of the shifted band there.
      expect(apart(point, truth[i]!)).toBeLessThan(0.01);
      expect(apart(plain[i]!, truth[i]!)).toBeGreaterThan(0.02);
    });
  });

  it('gives the figures of the full wave itself where it ran, and closes its budgets everywhere', () => {
    const found = confirmed({ permittivity: 1.006, loss: 1.3 });
    const points = sweepOf(found);
    for (const point of points) expectClosed(point);
    const nominal = points.filter((p) => p.temperatureC === board.temperature.nominalC);
    for (const { frequency, fullWave } of found.points) {
      const point = nominal.find((p) => p.frequency === frequency)!;
      expect(point.directivity).toBeCloseTo(fullWave.directivity, 6);
      expect(point.radiationEfficiency).toBeCloseTo(fullWave.radiationEfficiency, 8);
      expect(point.mismatch).toBeCloseTo(fullWave.mismatch, 8);
      fullWave.activeReflection.forEach((s, c) => {
        expect(abs2(sub(point.activeReflection[c]!, s))).toBeLessThan(1e-12);
      });
      fullWave.scattering.forEach((row, i) => {
        row.forEach((s, j) => {
          expect(abs2(sub(point.scattering![i]![j]!, s))).toBeLessThan(1e-12);
        });
      });
      for (const plane of ['elevation', 'azimuth'] as const) {
        expect(point[plane].beamDirection).toBeCloseTo(fullWave[plane].beamDirection, 8);
        expect(point[plane].sidelobeDb).toBeCloseTo(fullWave[plane].sidelobeDb, 8);
        const most = Math.max(...point.cuts[plane].gainDbi);
        expect(most).toBeCloseTo(
          Math.max(...fullWave.cuts[plane].gainDbi) + 10 * Math.log10(point.feedTransmission),
          1,
        );
      }
    }
  });

  it('moves by no more between compared frequencies than the engines differ there', () => {
    const found = confirmed({ permittivity: 1.003, loss: 1.3 });
    const truth = (frequencies: number[]) =>
      (
        confirmBoard(
          board,
          analysis,
          frequencies,
          undefined,
          standIn({ permittivity: 1.003, loss: 1.3 }),
        ) as typeof found
      ).points;
    const between = plain.filter((p) => p.temperatureC === 25).map((p) => p.frequency);
    const points = sweepOf(found).filter((p) => p.temperatureC === 25);
    truth(between).forEach(({ fullWave }, i) => {
      const off = Math.sqrt(abs2(sub(points[i]!.columnReflection[0]!, fullWave.scattering[0]![0]!)));
      expect(off).toBeLessThan(0.02);
      const gain =
        10 *
        Math.log10(
          (points[i]!.directivity * points[i]!.radiationEfficiency) /
            fullWave.directivity /
            fullWave.radiationEfficiency,
        );
      expect(Math.abs(gain)).toBeLessThan(0.05);
    });
  });
});

describe('bounds of a corrected point', () => {
  const wave = fc
    .tuple(fc.double({ min: 0, max: 1, noNaN: true }), fc.double({ min: -3, max: 3, noNaN: true }))
    .map(([r, a]) => polar(r, a));
  const matrix = (n: number) =>
    fc.array(fc.array(wave, { minLength: n, maxLength: n }), { minLength: n, maxLength: n });

  it('returns no more power than it is given, whatever the difference', () => {
    fc.assert(
      fc.property(matrix(3), matrix(3), fc.array(wave, { minLength: 3, maxLength: 3 }), (s, by, a) => {
        const difference = { reflection: by.map((row, i) => row[i]!), coupling: by };
        const moved = correctedScattering(s, difference as unknown as Parameters<typeof correctedScattering>[1]);
        const power = (waves: readonly Complex[]) => waves.reduce((sum, w) => sum + abs2(w), 0);
        return power(wavesLeaving(moved, a)) <= 1.01 * power(a) + 1e-12;
      }),
    );
  });

  it('keeps shares between 0 and 1 with their sum', () => {
    const ratio = fc.double({ min: -3, max: 3, noNaN: true });
    fc.assert(
      fc.property(fc.tuple(ratio, ratio, ratio, ratio, ratio), ([radiated, surfaceWave, metal, dielectric, load]) => {
        const shares = correctedShares(plain[0]!.shares, { radiated, surfaceWave, metal, dielectric, load });
        expect(Object.values(shares).reduce((a, b) => a + b, 0)).toBeCloseTo(1, 12);
        expect(Math.min(...Object.values(shares))).toBeGreaterThanOrEqual(0);
        // Loss in the metal keeps its split.
        expect(shares.ground * plain[0]!.shares.roughness).toBeCloseTo(shares.roughness * plain[0]!.shares.ground, 12);
      }),
    );
  });
});

describe('a moved cut', () => {
  const { elevation } = plain[0]!.cuts;
  const figures = plain[0]!.elevation;
  const by = { direction: 0.03, width: 0.05, sidelobeDb: 1.2 };
  const moved = correctedCut(elevation, figures, by, -0.3);

  it('shows the direction, width, sidelobe and maximum that it is said to have', () => {
    const { angle, gainDbi } = moved.cut;
    const top = gainDbi.indexOf(Math.max(...gainDbi));
    expect(angle[top]).toBeCloseTo(moved.figures.beamDirection, 1);
    expect(gainDbi[top]).toBeCloseTo(Math.max(...elevation.gainDbi) - 0.3, 1);
    const above = [...angle].filter((_, i) => gainDbi[i]! >= gainDbi[top]! - 3.01);
    expect(Math.abs(above.at(-1)! - above[0]! - moved.figures.halfPowerBeamwidth)).toBeLessThan(0.02);
    const lobes = [...gainDbi].filter(
      (level, i) => level > gainDbi[i - 1]! && level > gainDbi[i + 1]! && level < gainDbi[top]! - 1,
    );
    expect(Math.max(...lobes) - gainDbi[top]!).toBeCloseTo(moved.figures.sidelobeDb, 1);
    expect(moved.figures.sidelobeDb).toBeCloseTo(figures.sidelobeDb + 1.2, 9);
  });

  it('has no sidelobe above its maximum and no direction behind the board', () => {
    const far = correctedCut(elevation, figures, { direction: 3, width: 0, sidelobeDb: 60 }, 0);
    expect(far.figures.sidelobeDb).toBeLessThan(0);
    expect(far.figures.beamDirection).toBeCloseTo(Math.PI / 2, 9);
    expect(Math.max(...far.cut.gainDbi)).toBeLessThanOrEqual(Math.max(...elevation.gainDbi));
  });
});
