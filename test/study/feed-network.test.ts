import { describe, expect, it } from 'vitest';
import { abs, abs2, arg, div } from '../../src/numerics/complex.js';
import { boardFeed, fedColumns } from '../../src/study/feed-network.js';
import { nominalValues, runSweep } from '../../src/study/index.js';
import { surfaces } from '../../src/study/surfaces.js';
import { fixtureBoard } from './fixture-board.js';

const analysis = { roughnessModel: 'band', frequencyStep: 1e9 } as const;
const plain = fixtureBoard();
const feedNetwork = { divider: 'wilkinson', lineWidth: 0.15e-3, trunkLength: 2e-3, levelLength: 3e-3 } as const;
const board = {
  ...plain,
  feed: [
    { amplitude: 1, phase: 0 },
    { amplitude: 0.8, phase: 0.3 },
  ],
  feedNetwork,
};
const values = nominalValues(board);
const frequency = 76.5e9;
const state = surfaces(board, values, 'middle', frequency, 25);
const still = { re: 0, im: 0 };
const fedBy = (reflection: number, coupling = 0) =>
  fedColumns(board, values, state, frequency, {
    scattering: [
      [
        { re: reflection, im: 0 },
        { re: coupling, im: 0 },
      ],
      [
        { re: coupling, im: 0 },
        { re: reflection, im: 0 },
      ],
    ],
    referenceImpedance: [80, 80],
  });

describe('a feed network on its board', () => {
  it('gives matched columns the weights of the feed at the band centre', () => {
    const [first, second] = fedBy(0).waves;
    const ratio = div(second!, first!);
    expect(abs(ratio)).toBeCloseTo(0.8, 1);
    expect(arg(ratio)).toBeCloseTo(0.3, 1);
    expect(boardFeed(board).dimensions.length).toBeGreaterThan(0);
  });

  it('loses in its lines, and sends back what the columns reflect', () => {
    const matched = fedBy(0);
    expect(matched.figures.transmission).toBeGreaterThan(0.5);
    expect(matched.figures.transmission).toBeLessThan(0.99);
    // For 1 W at the input, what is accepted is what arrives at matched columns and what is lost.
    const arriving = (abs2(matched.waves[0]!) + abs2(matched.waves[1]!)) / 2;
    expect(arriving).toBeCloseTo(matched.figures.transmission * matched.mismatch, 9);
    const poor = fedBy(0.5);
    expect(abs(poor.figures.inputReflection)).toBeGreaterThan(abs(matched.figures.inputReflection));
    expect(poor.mismatch).toBeCloseTo(1 - abs2(poor.figures.inputReflection), 12);
  });

  it('burns in its resistors what unequal columns send back', () => {
    const unequal = fedColumns(board, values, state, frequency, {
      scattering: [
        [{ re: 0.6, im: 0 }, still],
        [still, { re: -0.6, im: 0 }],
      ],
      referenceImpedance: [80, 80],
    });
    expect(unequal.figures.burnt).toBeGreaterThan(fedBy(0).figures.burnt + 0.05);
  });

  it('stands in every point of a sweep, whose gain still closes', () => {
    const { points } = runSweep(board, analysis, 'nominal', 'nominal', values, 'middle').sweep;
    expect(points).toHaveLength(9);
    for (const point of points) {
      expect(point.feed!.transmission).toBe(point.feedTransmission);
      expect(point.gain).toBe(point.directivity * point.radiationEfficiency * point.feedTransmission);
      expect(point.mismatch).toBeCloseTo(1 - abs2(point.feed!.inputReflection), 12);
      expect(point.scattering).toHaveLength(2);
    }
  });
});
