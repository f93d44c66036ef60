import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { askedAmplitudes, columnExcitation, excitationBlocks } from '../../src/dossier/excitation.js';
import { abs, type Complex, mul, polar } from '../../src/numerics/complex.js';
import { board } from './board-fixture.js';
import { confirmedOf } from './engine-fixture.js';
import { plain } from './pack-fixture.js';
import { pointOf } from './study-fixture.js';

const currents: fc.Arbitrary<Complex[]> = fc.array(
  fc
    .record({
      size: fc.double({ min: 0.2, max: 1, noNaN: true }),
      angle: fc.double({ min: -0.6, max: 0.6, noNaN: true }),
    })
    .map(({ size, angle }) => polar(size, angle)),
  { minLength: 2, maxLength: 12 },
);

describe('excitation of a column', () => {
  it('does not change with level and phase of the whole column', () => {
    fc.assert(
      fc.property(currents, fc.double({ min: -3, max: 3, noNaN: true }), (column, turn) => {
        const [one, other] = [columnExcitation(column), columnExcitation(column.map((c) => mul(c, polar(0.3, turn))))];
        one.amplitude.forEach((a, i) => {
          expect(other.amplitude[i]).toBeCloseTo(a, 9);
          expect(other.phaseDeg[i]).toBeCloseTo(one.phaseDeg[i], 6);
        });
        expect(Math.max(...one.amplitude)).toBeCloseTo(1, 12);
      }),
      { seed: 3, numRuns: 100 },
    );
  });

  it('has its mean phase at zero: the sum of the turned currents is real', () => {
    fc.assert(
      fc.property(currents, (column) => {
        const { amplitude, phaseDeg } = columnExcitation(column);
        const sum = amplitude.reduce((total, a, i) => total + a * Math.sin((phaseDeg[i] * Math.PI) / 180), 0);
        expect(Math.abs(sum)).toBeLessThan(1e-9 * column.reduce((total, c) => total + abs(c), 0) + 1e-9);
      }),
      { seed: 4, numRuns: 100 },
    );
  });

  it('is set against the taper asked for, and against none where the layout was drawn', () => {
    expect(askedAmplitudes(board('qb-1'), 6)).toBeUndefined();
    const sizedFor = {
      frequency: 76.5e9,
      patches: 6,
      taper: { kind: 'given', amplitudes: [1, 2, 4, 4, 2, 1] },
      leastWidth: 1e-4,
      leastGap: 1e-4,
      grid: 1e-6,
    } as const;
    const sized = board('qb-1', { sizedFor });
    expect(askedAmplitudes(sized, 6)).toEqual([0.25, 0.5, 1, 1, 0.5, 0.25]);
    const confirmation = confirmedOf(sized, pointOf);
    if (confirmation.kind === 'network only') throw new Error('the fixture is confirmed');
    const blocks = excitationBlocks(sized, confirmation.points);
    const departures = blocks.find((b) => b.kind === 'table' && b.id === 'excitation-columns');
    if (departures?.kind !== 'table') throw new Error('no table');
    // Amplitudes of the fixture are widths over 1.1 mm: 0.7/1.1 against 0.25 is farthest off.
    expect(plain(departures.rows[0][1].content[0])).toBe(`${(20 * Math.log10(0.7 / 1.1 / 0.25)).toFixed(2)} dB`);
    const figure = blocks.find((b) => b.kind === 'figure' && b.id === 'excitation-amplitude');
    expect(figure).toMatchObject({
      content: { series: [{ label: 'Asked for' }, { label: 'Network' }, { label: 'Full wave' }] },
    });
  });
});
