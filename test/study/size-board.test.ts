import { describe, expect, it } from 'vitest';
import type { Board, SizedFor } from '../../src/manifest/model.js';
import { asksToBeReadied, planBoard, readyBoard, runTask } from '../../src/study/index.js';
import { sizeBoard } from '../../src/study/size-board.js';
import { figure, fixtureBoard } from './fixture-board.js';
import { standIn } from './stand-in-engine.js';

const analysis = { roughnessModel: 'band', frequencyStep: 0.5e9 } as const;
const sizedFor: SizedFor = {
  frequency: 76.5e9,
  patches: 3,
  taper: { kind: 'uniform' },
  leastWidth: 100e-6,
  leastGap: 100e-6,
  grid: 1e-6,
};
const plain = fixtureBoard({ columns: 2, patches: 3 });
const asking: Board = {
  ...plain,
  sizedFor,
  columns: [plain.columns[0]!, { ...plain.columns[1]!, direction: -1, x: 5.673e-3 }],
};

describe('a board that asks for its dimensions', () => {
  const board = readyBoard(asking, analysis);
  const { sized } = board;
  if (sized === undefined || 'reason' in sized) throw new Error(`not sized: ${sized?.reason}`);

  it('gets every column alike, on the grid, the reversed one ending where the other begins', () => {
    const [first, second] = board.columns;
    expect(first!.patches).toHaveLength(3);
    expect(second!.patches).toEqual(first!.patches);
    expect(second!.links).toEqual(first!.links);
    for (const { width, length } of [...first!.patches, ...first!.links]) {
      for (const size of [width, length]) expect(size * 1e6).toBeCloseTo(Math.round(size * 1e6), 6);
      expect(width).toBeGreaterThanOrEqual(sizedFor.leastWidth);
    }
    const total = [...first!.patches, ...first!.links].reduce((sum, { length }) => sum + length, 0);
    expect(second!.x).toBeCloseTo(total, 9);
    expect(first!.x).toBe(0);
  });

  it('is matched with its beam at broadside at the frequency asked for, as the study then finds', () => {
    expect(sized.by).toBe('network');
    expect(sized.networkDb).toBeLessThan(-15);
    const alone = { ...board, columns: board.columns.slice(0, 1), feed: board.feed.slice(0, 1) };
    const [task] = planBoard(alone, analysis);
    const { points } = runTask(alone, analysis, task!).sweep;
    const point = points.find((p) => p.frequency === 76.5e9 && p.temperatureC === 25)!;
    const { re, im } = point.columnReflection[0]!;
    expect(20 * Math.log10(Math.hypot(re, im))).toBeLessThan(-15);
    expect(Math.abs(point.elevation.beamDirection)).toBeLessThan((1 * Math.PI) / 180);
  });

  it('is sized once, and other boards not at all', () => {
    expect(asksToBeReadied(asking)).toBe(true);
    expect(asksToBeReadied(plain)).toBe(false);
    expect(readyBoard(board, analysis)).toBe(board);
    expect(readyBoard(plain, analysis)).toBe(plain);
    const cover = {
      material: 'solder mask',
      permittivity: figure('c.er', 3.5),
      lossTangent: figure('c.tand', 0.02),
      thickness: figure('c.t', 25e-6),
    };
    const covered = { ...asking, stackUp: { ...asking.stackUp, cover } };
    expect(sizeBoard(covered, analysis)).toBe(covered);
  });

  it('is corrected once by the full wave, which then finds it better matched', () => {
    const withFullWave = { ...analysis, fullWave: true };
    const one = { ...asking, columns: asking.columns.slice(0, 1), feed: asking.feed.slice(0, 1) };
    const solved: number[] = [];
    const engine = standIn({ permittivity: 1.01, onSolve: (f) => solved.push(f) });
    const { sized: found, columns } = sizeBoard(one, withFullWave, engine);
    expect(found).toMatchObject({ by: 'full wave' });
    if (found === undefined || 'reason' in found) return;
    expect(solved).toEqual([76.5e9, 76.5e9]);
    expect(found.fullWaveDb!).toBeLessThan(-15);
    // A higher permittivity wants shorter patches, which the network alone finds too short.
    expect(columns[0]!.patches[1]!.length).toBeLessThan(board.columns[0]!.patches[1]!.length);
    expect(found.networkDb).toBeGreaterThan(sized.networkDb);
  });

  it('stays as the network has it where the full wave does not carry it, and says so', () => {
    const failing = () => {
      throw new RangeError('no grid');
    };
    const { sized: found } = sizeBoard(asking, { ...analysis, fullWave: true }, failing);
    expect(found).toMatchObject({ by: 'network', notes: [expect.stringContaining('no grid')] });
  });

  it('says why where it cannot be', () => {
    const narrow = { ...asking, sizedFor: { ...sizedFor, leastWidth: 0.5e-3 } };
    const { sized: none } = readyBoard(narrow, analysis);
    expect(none).toMatchObject({ reason: expect.stringContaining('could not be worked out') });
  });
});
