import { describe, expect, it } from 'vitest';
import { abs, abs2, arg, type Complex, complex, mul, polar, scale, sub } from '../../../src/numerics/complex.js';
import {
  corporateFeed,
  type FeedSpec,
  feedOnBoard,
  LEAST_WIDTH,
  lineOfWidth,
  type TransitionTwoPort,
} from '../../../src/physics/feed/index.js';
import { surfaceResistance } from '../../../src/physics/material/index.js';

const DESIGN = 77e9;

function surroundings(loss: number) {
  const rs = loss * surfaceResistance(DESIGN, 5.8e7);
  const z = complex(rs, rs);
  return {
    slab: { permittivity: 3, lossTangent: 0.0015 * loss, height: 127e-6 },
    stripThickness: 18e-6,
    faces: { underside: z, top: z, edges: z, ground: z },
  };
}

const spec = (divider: 'tee' | 'wilkinson', weights: FeedSpec['weights'], more: Partial<FeedSpec> = {}): FeedSpec => ({
  divider,
  lineWidth: 0.22e-3,
  trunkLength: 3e-3,
  levelLength: 4e-3,
  weights,
  designFrequency: DESIGN,
  ...more,
});
const even = (n: number): FeedSpec['weights'] => Array.from({ length: n }, () => ({ amplitude: 1, phase: 0 }));
const uneven: FeedSpec['weights'] = [
  { amplitude: 0.5, phase: 0 },
  { amplitude: 1, phase: 0.7 },
  { amplitude: 0.9, phase: -1.2 },
  { amplitude: 0.6, phase: 3 },
  { amplitude: 0.45, phase: 0.2 },
];

/** A board that reflects and couples: a passive reciprocal matrix. */
const board = (reference: readonly number[]) => {
  const n = reference.length;
  const scattering = Array.from({ length: n }, (_, i) =>
    Array.from({ length: n }, (_, j) => polar(i === j ? 0.3 + 0.02 * i : 0.05 / (1 + Math.abs(i - j)), 1.1 * (i + j))),
  );
  return { scattering, referenceImpedance: reference };
};

describe('corporate feed', () => {
  it.each(['tee', 'wilkinson'] as const)(
    '%s: gives every column the wave asked for at its design frequency',
    (divider) => {
      const { at } = corporateFeed(spec(divider, uneven), surroundings(0));
      const { scattering } = at({ ...surroundings(0), frequency: DESIGN });
      const total = uneven.reduce((sum, w) => sum + w.amplitude ** 2, 0);
      uneven.forEach(({ amplitude, phase }, i) => {
        expect(abs(scattering[i + 1][0])).toBeCloseTo(amplitude / Math.sqrt(total), 2);
        const lead = arg(mul(scattering[i + 1][0], polar(1, -phase))) - arg(scattering[1][0]);
        expect(Math.abs(Math.sin(lead / 2))).toBeLessThan(2e-3);
      });
      expect(abs(scattering[0][0])).toBeLessThan(0.02);
    },
  );

  it('has equal delays, so that an odd number of columns stays in phase over the band', () => {
    const { at } = corporateFeed(spec('wilkinson', even(3)), surroundings(1));
    for (const frequency of [75e9, 79e9]) {
      const { scattering } = at({ ...surroundings(1), frequency });
      for (const i of [2, 3]) expect(Math.abs(arg(scattering[i][0]) - arg(scattering[1][0]))).toBeLessThan(0.06);
    }
  });

  it.each(['tee', 'wilkinson'] as const)(
    '%s: reciprocal, passive, without loss when its materials have none',
    (divider) => {
      for (const loss of [0, 1]) {
        const { scattering: s } = corporateFeed(spec(divider, uneven), surroundings(loss)).at({
          ...surroundings(loss),
          frequency: 79e9,
          outputReferences: [60, 70, 80, 65, 75],
        });
        s.forEach((row, i) => {
          row.forEach((value, j) => {
            expect(abs(sub(value, s[j][i]))).toBeLessThan(1e-10);
          });
          const out = s.reduce((sum, r) => sum + abs2(r[i]), 0);
          if (loss === 0 && divider === 'tee') expect(out).toBeCloseTo(1, 10);
          else expect(out).toBeLessThan(1 + 1e-10);
        });
      }
    },
  );

  it('loses by length: a longer level costs what its lines lose', () => {
    const transmission = (levelLength: number): number => {
      const { scattering } = corporateFeed(spec('wilkinson', even(4), { levelLength }), surroundings(1)).at({
        ...surroundings(1),
        frequency: DESIGN,
      });
      return 10 * Math.log10([1, 2, 3, 4].reduce((sum, i) => sum + abs2(scattering[i][0]), 0));
    };
    const perLevel = (transmission(4e-3) - transmission(9e-3)) / 2;
    const line = lineOfWidth(surroundings(1), DESIGN, 0.22e-3);
    expect(perLevel / (5e-3 * line.gamma.re * 20 * Math.LOG10E)).toBeCloseTo(1, 1);
  });

  it('says what it is made of', () => {
    const { dimensions, resistors, notes } = corporateFeed(
      spec('wilkinson', uneven, { grid: 1e-6, positions: [-8e-3, -4e-3, 0, 4e-3, 8e-3] }),
      surroundings(1),
    );
    expect(resistors).toHaveLength(4);
    const trunk = dimensions.filter((d) => d.part === 'trunk');
    expect(trunk.map((d) => d.kind)).toEqual(['line', 'quarter-wave step']);
    expect(trunk[0].length + trunk[1].length).toBeCloseTo(3e-3, 9);
    // No step is narrower than what can be etched where nothing is said.
    expect(Math.min(...dimensions.map((d) => d.width))).toBeGreaterThanOrEqual(LEAST_WIDTH);
    expect(dimensions.filter((d) => d.output !== undefined)).toHaveLength(5);
    for (const { width, length } of dimensions)
      for (const value of [width, length]) expect(Math.abs(value * 1e6 - Math.round(value * 1e6))).toBeLessThan(1e-6);
    // The first divider's arms end between columns 0, 1 and 2 (at −3 mm) and between 3 and 4 (at 6 mm).
    expect(notes.join(' ')).toContain('Level 1 is 4.500 mm long, not 4.000 mm');
  });

  it('is one line where there is one column', () => {
    const { dimensions, resistors } = corporateFeed(spec('tee', even(1)), surroundings(1));
    expect(dimensions).toHaveLength(1);
    expect(resistors).toEqual([]);
  });

  it('refuses what is no feed', () => {
    expect(() => corporateFeed(spec('tee', []), surroundings(1))).toThrow('no column is driven');
    expect(() => corporateFeed(spec('tee', even(2), { levelLength: -1 }), surroundings(1))).toThrow('got -1');
    expect(() => corporateFeed(spec('tee', [{ amplitude: 0, phase: 0 }]), surroundings(1))).toThrow('got 0');
    expect(() => corporateFeed(spec('tee', even(2), { positions: [0] }), surroundings(1))).toThrow('1 positions for 2');
  });
});

describe('feed on a board', () => {
  const transition: TransitionTwoPort = {
    referenceImpedance: 50,
    points: [76e9, 77e9, 78e9].map((frequency, i) => ({
      frequency,
      s: [
        [0.1, 0.05 * i],
        [0, -0.9],
        [0, -0.9],
        [0.15, -0.1],
      ] as const,
    })),
  };

  it.each([
    ['tee', undefined],
    ['wilkinson', undefined],
    ['wilkinson', transition],
  ] as const)('%s: accounts for every watt', (divider, before) => {
    const feed = corporateFeed(spec(divider, uneven), surroundings(1)).at({
      ...surroundings(1),
      frequency: 77.4e9,
      inputReference: 50,
      outputReferences: [60, 70, 80, 65, 75],
    });
    const b = board([60, 70, 80, 65, 75]);
    const fed = feedOnBoard(feed, b, [0, 1, 2, 3, 4], before);
    const { delivered, reflected, burnt, lineLoss, transitionLoss } = fed;
    expect(delivered + reflected + burnt + lineLoss + transitionLoss).toBeCloseTo(1, 10);
    if (divider === 'tee') expect(burnt).toBe(0);
    else expect(burnt).toBeGreaterThan(0);
    if (before) expect(transitionLoss).toBeGreaterThan(0.1);
    else expect(transitionLoss).toBeCloseTo(0, 12);
    expect(reflected).toBeCloseTo(abs2(fed.inputReflection), 12);
    expect(fed.transmission).toBeCloseTo(delivered / (1 - reflected), 12);
    expect(fed.flags.map((f) => f.code)).not.toContain('feed.transition-range');
  });

  it('is the bare network on a board that does not reflect', () => {
    const feed = corporateFeed(spec('wilkinson', even(2)), surroundings(1)).at({ ...surroundings(1), frequency: 78e9 });
    const [, ...reference] = feed.referenceImpedance;
    const zero = [0, 1].map(() => [complex(0), complex(0)]);
    const fed = feedOnBoard(feed, { scattering: zero, referenceImpedance: reference }, [0, 1]);
    expect(abs(sub(fed.inputReflection, feed.scattering[0][0]))).toBeLessThan(1e-15);
    fed.incident.forEach((wave: Complex, i: number) => {
      expect(abs(sub(wave, scale(feed.scattering[i + 1][0], Math.SQRT2)))).toBeLessThan(1e-14);
    });
  });

  it('leaves columns alone that are not driven', () => {
    const feed = corporateFeed(spec('tee', even(2)), surroundings(1)).at({ ...surroundings(1), frequency: DESIGN });
    const z = feed.referenceImpedance[1];
    const fed = feedOnBoard(feed, board([40, z, z, 90]), [1, 2]);
    expect(fed.incident[0]).toEqual(complex(0));
    expect(fed.incident[3]).toEqual(complex(0));
    expect(abs(fed.incident[1])).toBeGreaterThan(0.5);
  });

  it('flags a transition outside its data, and one that gives more than it gets', () => {
    const feed = (frequency: number) =>
      corporateFeed(spec('tee', even(2)), surroundings(1)).at({ ...surroundings(1), frequency, inputReference: 50 });
    const at = (frequency: number, two: TransitionTwoPort) => {
      const state = feed(frequency);
      const [, ...reference] = state.referenceImpedance;
      return feedOnBoard(state, board(reference), [0, 1], two).flags.map((f) => f.code);
    };
    expect(at(79e9, transition)).toContain('feed.transition-range');
    const loud = {
      ...transition,
      points: transition.points.map((p) => ({ ...p, s: [...p.s.slice(0, 3), [0.9, 0]] as const })),
    };
    expect(at(77e9, loud as TransitionTwoPort)).toContain('feed.transition-active');
  });

  it('refuses ports that do not belong together', () => {
    const feed = corporateFeed(spec('tee', even(2)), surroundings(1)).at({ ...surroundings(1), frequency: DESIGN });
    expect(() => feedOnBoard(feed, board([50, 50]), [0, 1])).toThrow('referred to');
    expect(() => feedOnBoard(feed, board([50, 50]), [0])).toThrow('1 driven columns on 2 outputs');
    const [, ...reference] = feed.referenceImpedance;
    expect(() => feedOnBoard(feed, board(reference), [0, 1], transition)).toThrow('the transition is referred to 50');
  });
});
