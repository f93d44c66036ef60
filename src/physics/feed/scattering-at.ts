import { add, type Complex, complex, scale, ZERO } from '../../numerics/complex.js';
import type { ValidityFlag } from '../validity.js';
import type { ScatteringTable } from './touchstone.js';

/** Two-port between feed network and radar as a pack holds it: S11, S21, S12, S22, each re, im; port 2 faces the antenna. */
export interface TransitionTwoPort {
  readonly referenceImpedance: number;
  readonly points: readonly { readonly frequency: number; readonly s: readonly (readonly [number, number])[] }[];
}

/** A two-port table in the order in which a pack holds a transition. @throws RangeError unless it has two ports */
export function transitionOf(table: ScatteringTable): TransitionTwoPort {
  if (table.ports !== 2) throw new RangeError(`a transition has two ports, got ${table.ports}`);
  const { referenceImpedance, points } = table;
  return {
    referenceImpedance,
    points: points.map(({ frequency, s }) => ({
      frequency,
      s: [s[0][0], s[1][0], s[0][1], s[1][1]].map((c) => [c.re, c.im] as const),
    })),
  };
}

/** The other way round. @throws RangeError on a point without four values */
export function tableOf(transition: TransitionTwoPort): ScatteringTable {
  const points = transition.points.map(({ frequency, s }) => {
    if (s.length !== 4) throw new RangeError(`a transition has four S-parameters, got ${s.length}`);
    const [s11, s21, s12, s22] = s.map(([re, im]) => complex(re, im));
    return {
      frequency,
      s: [
        [s11, s12],
        [s21, s22],
      ],
    };
  });
  return { ports: 2, referenceImpedance: transition.referenceImpedance, points };
}

/** Points that one interpolation goes through. */
const STENCIL = 4;

/**
 * S-matrix at a frequency: real and imaginary parts by the cubic through the four nearest points (fewer where the table is
 * shorter). A phase of 30° from point to point leaves an error of 0.002. Outside the table the nearest end holds, flagged.
 *
 * @throws RangeError on an empty table
 */
export function scatteringAt(
  table: ScatteringTable,
  frequency: number,
): { readonly s: readonly (readonly Complex[])[]; readonly flags: readonly ValidityFlag[] } {
  const { points, ports } = table;
  if (points.length === 0) throw new RangeError('scatteringAt: the table is empty');
  const [low, high] = [points[0].frequency, points[points.length - 1].frequency];
  const f = Math.min(high, Math.max(low, frequency));
  const after = Math.max(
    1,
    points.findIndex((p) => p.frequency >= f),
  );
  const start = Math.max(0, Math.min(points.length - STENCIL, after - STENCIL / 2));
  const used = points.slice(start, start + STENCIL);
  const weights = used.map((p, i) =>
    used.reduce((w, q, k) => (k === i ? w : (w * (f - q.frequency)) / (p.frequency - q.frequency)), 1),
  );
  const s = Array.from({ length: ports }, (_, row) =>
    Array.from({ length: ports }, (_, column) =>
      used.reduce((sum, p, i) => add(sum, scale(p.s[row][column], weights[i])), ZERO),
    ),
  );
  return { s, flags: f === frequency ? [] : [outside(frequency, low, high)] };
}

const outside = (frequency: number, low: number, high: number): ValidityFlag => ({
  code: 'feed.transition-range',
  severity: 'outside',
  model: 'measured or simulated transition',
  text: `The transition's data reach from ${(low / 1e9).toPrecision(4)} to ${(high / 1e9).toPrecision(4)} GHz; at ${(frequency / 1e9).toPrecision(4)} GHz the value at their end is used.`,
});
