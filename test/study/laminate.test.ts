import { describe, expect, it } from 'vitest';
import type { Board, Laminate } from '../../src/manifest/model.js';
import { debyePermittivity, widebandDebye } from '../../src/physics/material/index.js';
import { equivalentPermittivity } from '../../src/study/in-plane.js';
import { nominalValues, tolerances } from '../../src/study/index.js';
import { laminateAssumptions, laminateNow } from '../../src/study/laminate.js';
import { figure, fixtureBoard } from './fixture-board.js';

function withLaminate(change: Partial<Laminate>): Board {
  const board = fixtureBoard({ columns: 1, patches: 2 });
  const { laminate } = board.stackUp;
  return {
    ...board,
    stackUp: { ...board.stackUp, laminate: { ...laminate, material: { ...laminate.material, ...change } } },
  };
}
const stated = (path: string, value: number, frequency: number) => ({
  ...figure(path, value),
  provenance: { basis: 'typical' as const, frequency },
});
const now = (board: Board, frequency = 77e9, temperatureC = 25) =>
  laminateNow(board, nominalValues(board), frequency, temperatureC);

describe('the laminate in the band', () => {
  it('is used as stated where no frequency is stated, and that is said', () => {
    const board = withLaminate({});
    expect(now(board)).toMatchObject({ permittivity: 3, linePermittivity: 3, lossTangent: 0.0015 });
    expect(laminateAssumptions(board).map(({ code }) => code)).toEqual([
      'laminate.no-frequency',
      'laminate.in-plane-unknown',
    ]);
  });

  it('is carried from the frequency of its statement by causal dispersion', () => {
    const board = withLaminate({
      permittivity: stated('e', 3, 10e9),
      lossTangent: stated('t', 0.003, 10e9),
    });
    const there = debyePermittivity(widebandDebye({ permittivity: 3, lossTangent: 0.003, frequency: 10e9 }), 77e9);
    expect(now(board).permittivity).toBeCloseTo(there.re, 9);
    expect(now(board).lossTangent).toBeCloseTo(-there.im / there.re, 9);
    // Stated in the band it stays, and no frequency is missing.
    const inBand = withLaminate({ permittivity: stated('e', 3, 77e9), lossTangent: stated('t', 0.003, 77e9) });
    expect(now(inBand).permittivity).toBeCloseTo(3, 12);
    expect(laminateAssumptions(inBand).map(({ code }) => code)).toEqual(['laminate.in-plane-unknown']);
  });

  it('takes each figure from its own frequency', () => {
    const mixed = withLaminate({ permittivity: stated('e', 3, 10e9), lossTangent: stated('t', 0.003, 77e9) });
    expect(now(mixed).lossTangent).toBeCloseTo(0.003, 9);
    // −(2/π) tan δ ln(77/10), to first order: −0.39 %.
    expect(now(mixed).permittivity / 3 - 1).toBeCloseTo((-2 / Math.PI) * 0.003 * Math.log(7.7), 4);
  });

  it('follows temperature and water', () => {
    const water = { uptake: figure('w', 4e-4, 1e-4), permittivityPerShare: 15, lossTangentPerShare: 2 };
    const board = withLaminate({ permittivityTemperatureCoefficient: figure('c', -50e-6), water });
    expect(now(board, 77e9, 85).permittivity).toBeCloseTo(3 * (1 - 50e-6 * 60), 12);
    const tolerance = tolerances(board).find(({ id }) => id === 'water-uptake-of-the-laminate')!;
    expect([tolerance.low.waterShare, tolerance.high.waterShare]).toEqual([0, 5e-4]);
    const wet = laminateNow(board, tolerance.high, 77e9, 25);
    expect(wet.permittivity).toBeCloseTo(3 * (1 + 15 * 5e-4), 12);
    expect(wet.lossTangent).toBeCloseTo(0.0015 + 2 * 5e-4, 12);
  });
});

describe('permittivity in the plane of the board', () => {
  it('changes nothing where it is the same', () => {
    expect(equivalentPermittivity(160e-6, 127e-6, 3, 3)).toBeCloseTo(3, 9);
  });

  it('counts for narrow lines and hardly for wide ones', () => {
    const at = (w: number) => equivalentPermittivity(w, 127e-6, 3, 3.3) - 3;
    expect(at(50e-6)).toBeGreaterThan(at(160e-6));
    expect(at(160e-6)).toBeGreaterThan(at(1e-3));
    // All field goes straight through under a strip a hundred heights wide: less than a tenth of a per cent is left.
    expect(at(12.7e-3)).toBeLessThan(0.003);
    expect(at(12.7e-3)).toBeGreaterThan(0);
    // A very narrow strip tends to the mean of both directions, √(3·3.3).
    expect(at(1e-6)).toBeGreaterThan(0.05);
    expect(at(1e-6)).toBeLessThan(Math.sqrt(9.9) - 3);
  });

  it('is an uncertainty from equal in all directions to what the stated value does', () => {
    const board = withLaminate({ inPlanePermittivity: figure('ip', 3.3, 0.1) });
    const { low, high } = tolerances(board).find(({ id }) => id === 'in-plane-permittivity-of-the-laminate')!;
    expect(low).toEqual(nominalValues(board));
    expect(high.inPlanePermittivity).toBeCloseTo(3.4, 12);
    const moved = laminateNow(board, high, 77e9, 25);
    expect(moved.linePermittivity).toBeCloseTo(equivalentPermittivity(0.15e-3, 127e-6, 3, 3.4), 12);
    expect(moved.permittivity).toBeCloseTo(equivalentPermittivity(0.995e-3, 127e-6, 3, 3.4), 12);
    expect(laminateAssumptions(board).map(({ code }) => code)).not.toContain('laminate.in-plane-unknown');
  });
});
