import type { Board, Requirement } from '../manifest/model.js';
import type { LinePoint, PointResult, Sweep } from '../study/results.js';
import { limitOf, marginOf, type PointContext, type PointValue, type Quantity, quantityOf } from './quantities.js';
import { celsiusRange, celsiusText, gigahertzRange, gigahertzText } from './wording.js';

export interface Place {
  /** Hz */
  readonly frequency: number;
  readonly temperatureC: number;
}

export interface WorstValue {
  readonly value: number;
  readonly where: Place;
  /** 1 − reflected/incident power of the driven array at that place; 1 for a line by itself. */
  readonly mismatch: number;
}

export type Worst = WorstValue | { readonly notEvaluated: string };

/** Two neighbours on an axis and the weight of the upper one; a place on a sample has equal neighbours. */
interface Between {
  readonly at: number;
  readonly lower: number;
  readonly upper: number;
  readonly weight: number;
}

const SLACK = 1e-9;

const distinct = (values: readonly number[]): readonly number[] => [...new Set(values)].sort((a, b) => a - b);

/** Samples inside [low, high] and both ends; undefined where the range reaches outside the samples. */
function stations(samples: readonly number[], low: number, high: number): readonly Between[] | undefined {
  const first = samples[0];
  const last = samples[samples.length - 1];
  const slack = SLACK * Math.max(Math.abs(first), Math.abs(last), 1);
  if (low < first - slack || high > last + slack || low > high) return undefined;
  const onSample = (value: number) => samples.findIndex((s) => Math.abs(s - value) <= slack);
  const end = (value: number): Between => {
    const exact = onSample(value);
    if (exact >= 0) return { at: samples[exact], lower: exact, upper: exact, weight: 0 };
    const upper = samples.findIndex((s) => s > value);
    const lower = upper - 1;
    return { at: value, lower, upper, weight: (value - samples[lower]) / (samples[upper] - samples[lower]) };
  };
  const inside = samples.flatMap((at, i) =>
    at > low + slack && at < high - slack ? [{ at, lower: i, upper: i, weight: 0 }] : [],
  );
  const ends = high - low <= slack ? [end(low)] : [end(low), end(high)];
  return [...inside, ...ends].sort((a, b) => a.at - b.at);
}

/** The band and temperature range that decide: the requirement's own where given, else the board's. */
export function conditionOf(requirement: Requirement, board: Board) {
  const { band, temperature } = requirement.condition;
  return {
    band: band ?? board.band,
    temperature: temperature ?? { lowC: board.temperature.lowC, highC: board.temperature.highC },
  };
}

/** One point of a sweep as a quantity sees it. */
interface Sample extends Place {
  readonly mismatch: number;
  readonly found: () => PointValue;
}

/** Of the columns, or of the feed line. */
function samplesOf({ points, line }: Sweep, { at, onLine }: Quantity, context: PointContext): readonly Sample[] {
  const place = ({ frequency, temperatureC }: PointResult | LinePoint): Place => ({ frequency, temperatureC });
  if (onLine) return line.map((point) => ({ ...place(point), mismatch: 1, found: () => onLine(point) }));
  return points.map((point) => ({ ...place(point), mismatch: point.mismatch, found: () => at(point, context) }));
}

interface Grid {
  readonly frequencies: readonly number[];
  readonly temperatures: readonly number[];
  readonly point: (temperature: number, frequency: number) => Sample;
}

function gridOf(id: string, samples: readonly Sample[]): Grid {
  const frequencies = distinct(samples.map((p) => p.frequency));
  const temperatures = distinct(samples.map((p) => p.temperatureC));
  const byPlace = new Map(samples.map((p) => [`${p.temperatureC}/${p.frequency}`, p]));
  return {
    frequencies,
    temperatures,
    point: (t, f) => {
      const point = byPlace.get(`${temperatures[t]}/${frequencies[f]}`);
      if (point === undefined) throw new RangeError(`sweep ${id} is not a full grid of band and temperature`);
      return point;
    },
  };
}

function outsideReason(grid: Grid, requirement: Requirement, board: Board): string | undefined {
  const { band, temperature } = conditionOf(requirement, board);
  if (!stations(grid.frequencies, band.low, band.high)) {
    const [first, last] = [grid.frequencies[0], grid.frequencies[grid.frequencies.length - 1]];
    return `the requirement covers ${gigahertzRange(band.low, band.high)}, but this board was evaluated over ${gigahertzRange(first, last)}`;
  }
  if (!stations(grid.temperatures, temperature.lowC, temperature.highC)) {
    const [first, last] = [grid.temperatures[0], grid.temperatures[grid.temperatures.length - 1]];
    return `the requirement covers ${celsiusRange(temperature.lowC, temperature.highC)}, but this board was evaluated over ${celsiusRange(first, last)}`;
  }
  return undefined;
}

/**
 * Worst value of a requirement's quantity over its condition, and where it occurs.
 *
 * Every evaluated point inside the condition counts, and both ends of the condition: an end between two evaluated
 * points is interpolated linearly in the unit of the quantity. A condition that reaches outside what was evaluated, or
 * a single point without a value, makes the requirement not evaluated: nothing is narrowed in silence.
 *
 * @param patternShift moves the pattern of the cut before it is compared with a mask, rad
 * @throws RangeError when the sweep is not a full grid over band and temperature
 */
export function worstValue(sweep: Sweep, requirement: Requirement, board: Board, patternShift = 0): Worst {
  const quantity = quantityOf(requirement.quantity);
  const samples = samplesOf(sweep, quantity, { requirement, board, patternShift });
  if (samples.length === 0) return { notEvaluated: 'nothing was evaluated for this board' };
  const grid = gridOf(sweep.id, samples);
  const outside = outsideReason(grid, requirement, board);
  if (outside !== undefined) return { notEvaluated: outside };
  const { band, temperature } = conditionOf(requirement, board);
  const fs = stations(grid.frequencies, band.low, band.high) ?? [];
  const ts = stations(grid.temperatures, temperature.lowC, temperature.highC) ?? [];
  const limit = limitOf(requirement);
  const memo = new Map<Sample, PointValue>();
  const valueAt = (point: Sample) => {
    const known = memo.get(point) ?? point.found();
    memo.set(point, known);
    return known;
  };
  let worst: WorstValue | undefined;
  for (const t of ts) {
    for (const f of fs) {
      let value = 0;
      let mismatch = 0;
      for (const [ti, tw] of weights(t)) {
        for (const [fi, fw] of weights(f)) {
          const point = grid.point(ti, fi);
          const found = valueAt(point);
          if ('missing' in found) return { notEvaluated: missingReason(found.missing, point) };
          value += tw * fw * found.value;
          mismatch += tw * fw * point.mismatch;
        }
      }
      const here = { value, mismatch, where: { frequency: f.at, temperatureC: t.at } };
      if (worst === undefined || marginOf(limit, value) < marginOf(limit, worst.value)) worst = here;
    }
  }
  return worst ?? { notEvaluated: 'the condition of the requirement is empty' };
}

const weights = (s: Between): readonly (readonly [number, number])[] =>
  s.weight === 0
    ? [[s.lower, 1]]
    : [
        [s.lower, 1 - s.weight],
        [s.upper, s.weight],
      ];

const missingReason = (missing: string, point: Place): string =>
  `${missing} (${gigahertzText(point.frequency)}, ${celsiusText(point.temperatureC)})`;
