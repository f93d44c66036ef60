import { describe, expect, it } from 'vitest';
import type { Board } from '../../src/manifest/model.js';
import { RETUNE_LIMITS, retuneBoard, studyBoard } from '../../src/study/index.js';
import { figure, fixtureBoard } from './fixture-board.js';

const analysis = { roughnessModel: 'band', frequencyStep: 250e6 } as const;

/** The fixture on another laminate and with another drawing, asked to be retuned. */
function asked({ permittivity = 3, drawn = 1 }: { permittivity?: number; drawn?: number } = {}): Board {
  const board = fixtureBoard({ columns: 1 });
  const { laminate } = board.stackUp;
  const scale = <P extends { length: number }>(piece: P) => ({ ...piece, length: piece.length * drawn });
  return {
    ...board,
    retune: 'length',
    columns: board.columns.map((c) => ({ ...c, patches: c.patches.map(scale), links: c.links.map(scale) })),
    stackUp: {
      ...board.stackUp,
      laminate: {
        ...laminate,
        material: { ...laminate.material, permittivity: figure('laminate.permittivity', permittivity, 0.04) },
      },
    },
  };
}

function factorOf(board: Board): number {
  const { retuned } = retuneBoard(board, analysis);
  if (retuned === undefined || 'reason' in retuned) throw new Error(`not retuned: ${retuned?.reason}`);
  return retuned.factor;
}

describe('retuning lengths', () => {
  it('puts the best match of the nominal sweep at the band centre', () => {
    const board = { ...asked({ permittivity: 3.3 }), band: { low: 75e9, high: 78e9 } };
    const study = studyBoard(board, analysis);
    const nominal = study.nominal.points.filter((p) => p.temperatureC === board.temperature.nominalC);
    const reflection = nominal.map((p) => Math.hypot(p.columnReflection[0]!.re, p.columnReflection[0]!.im));
    const best = nominal[reflection.indexOf(Math.min(...reflection))]!;
    expect(Math.abs(best.frequency - 76.5e9)).toBeLessThanOrEqual(analysis.frequencyStep);
    const { retuned } = study.board;
    expect(retuned).toMatchObject({ factor: expect.any(Number) });
    if (retuned === undefined || 'reason' in retuned) return;
    const centre = nominal.findIndex((p) => Math.abs(p.frequency - 76.5e9) < 1);
    expect(20 * Math.log10(reflection[centre]!)).toBeCloseTo(retuned.retunedDb, 2);
    expect(retuned.retunedDb).toBeLessThan(retuned.drawnDb);
  });

  it('undoes any scaling of the drawing: the retuned lengths do not depend on it', () => {
    const lengths = (drawn: number) => retuneBoard(asked({ drawn }), analysis).columns[0]!.patches[0]!.length;
    const plain = lengths(1);
    // Two roundings of the factor to four decimals of about 1 mm, and two of lengths to 0.1 µm.
    for (const drawn of [0.95, 1.04]) expect(Math.abs(lengths(drawn) - plain)).toBeLessThan(0.5e-6);
    expect(factorOf(asked({ drawn: 1.04 })) * 1.04).toBeCloseTo(factorOf(asked()), 3);
  });

  it('shortens on a denser laminate, by less than the root of the permittivities says', () => {
    const ratio = factorOf(asked({ permittivity: 3.3 })) / factorOf(asked());
    // Part of the field is in air: the wave slows down by less than in the dielectric alone.
    expect(ratio).toBeGreaterThan(Math.sqrt(3 / 3.3));
    expect(ratio).toBeLessThan(1);
  });

  it('prints the factor that it used: lengths are the drawn ones times it, widths and the rest as drawn', () => {
    const board = asked({ permittivity: 3.2 });
    const done = retuneBoard(board, analysis);
    const factor = factorOf(board);
    expect(factor).toBe(Number(factor.toFixed(4)));
    board.columns.forEach((column, c) => {
      const after = done.columns[c]!;
      expect({ ...after, patches: [], links: [] }).toEqual({ ...column, patches: [], links: [] });
      [...column.patches, ...column.links].forEach((piece, i) => {
        const scaled = [...after.patches, ...after.links][i]!;
        expect(scaled.width).toBe(piece.width);
        expect(Math.abs(scaled.length - piece.length * factor)).toBeLessThanOrEqual(0.5e-7 + 1e-15);
      });
    });
  });

  it('leaves alone what did not ask, what is done, and what cannot be calculated', () => {
    const plain = fixtureBoard({ columns: 1 });
    expect(retuneBoard(plain, analysis)).toBe(plain);
    const done = retuneBoard(asked(), analysis);
    expect(retuneBoard(done, analysis)).toBe(done);
    const cover = {
      material: 'mask',
      permittivity: figure('c.e', 3),
      lossTangent: figure('c.t', 0),
      thickness: figure('c.h', 2e-5),
    };
    const covered = { ...asked(), stackUp: { ...asked().stackUp, cover } };
    expect(retuneBoard(covered, analysis)).toBe(covered);
  });

  it('gives the same board every time', () => {
    expect(JSON.stringify(retuneBoard(asked(), analysis))).toBe(JSON.stringify(retuneBoard(asked(), analysis)));
  });

  it('says so where the match lies outside the range searched, and no column is evaluated then', () => {
    const far = retuneBoard(asked({ drawn: 1.6 }), analysis);
    expect(far.retuned).toMatchObject({ reason: expect.stringContaining(String(RETUNE_LIMITS.lowest)) });
    expect(far.columns).toEqual(asked({ drawn: 1.6 }).columns);
    const study = studyBoard(far, { ...analysis, frequencyStep: 1e9 });
    expect(study.notEvaluated[0]?.reason).toMatch(/could not be retuned/);
    expect(study.nominal.points).toEqual([]);
    expect(study.nominal.line.length).toBeGreaterThan(0);
  });
});
