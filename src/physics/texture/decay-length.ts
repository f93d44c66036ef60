import type { MapAutocorrelation, ProfileAutocorrelation } from './autocorrelation.js';

/** Fall of the autocorrelation that Ral and Sal are taken at unless stated otherwise (ISO 21920-2, ISO 25178-2). */
export const STANDARD_FALL = 0.2;

/** Lag at which the autocorrelation first falls to a level, m; undefined where it does not within half the length. */
export function profileDecayLength(a: ProfileAutocorrelation, level: number): number | undefined {
  return firstFall((lag) => a.values[lag], a.values.length - 1, level, a.spacing);
}

/** Shortest and longest lag, over all directions, at which it first falls to a level, m; `longest` undefined where some direction does not. */
export interface MapDecay {
  readonly shortest: number | undefined;
  readonly longest: number | undefined;
  /** Mean over the directions that fall. */
  readonly mean: number | undefined;
}

const DIRECTIONS = 180;

export function mapDecayLengths(a: MapAutocorrelation, level: number): MapDecay {
  const step = Math.min(a.spacingX, a.spacingY);
  const falls: number[] = [];
  let all = true;
  for (let i = 0; i < DIRECTIONS; i++) {
    const angle = (Math.PI * i) / DIRECTIONS;
    const [dx, dy] = [(Math.cos(angle) * step) / a.spacingX, (Math.sin(angle) * step) / a.spacingY];
    // The interpolation needs two points around.
    const reachX = (a.reachX - 2) / Math.abs(dx);
    const reachY = (a.reachY - 2) / Math.abs(dy);
    const fall = firstFall((k) => interpolated(a, k * dx, k * dy), Math.floor(Math.min(reachX, reachY)), level, step);
    if (fall === undefined) all = false;
    else falls.push(fall);
  }
  if (falls.length === 0) return { shortest: undefined, longest: undefined, mean: undefined };
  return {
    shortest: Math.min(...falls),
    longest: all ? Math.max(...falls) : undefined,
    mean: falls.reduce((x, y) => x + y, 0) / falls.length,
  };
}

/** The cubic through four neighbours, solved for the level by bisection. */
function firstFall(at: (lag: number) => number, reach: number, level: number, step: number): number | undefined {
  for (let k = 1; k <= reach; k++) {
    if (!(at(k) <= level)) continue;
    const [p0, p1, p2, p3] = [at(Math.abs(k - 2)), at(k - 1), at(k), at(Math.min(k + 1, reach))];
    let [low, high] = [0, 1];
    for (let i = 0; i < 50; i++) {
      const middle = (low + high) / 2;
      if (cubic(p0, p1, p2, p3, middle) > level) low = middle;
      else high = middle;
    }
    return (k - 1 + low) * step;
  }
  return undefined;
}

/** Four-point Lagrange interpolation between the inner two, t from 0 to 1. */
function cubic(p0: number, p1: number, p2: number, p3: number, t: number): number {
  return (
    (-t * (t - 1) * (t - 2) * p0) / 6 +
    ((t + 1) * (t - 1) * (t - 2) * p1) / 2 -
    ((t + 1) * t * (t - 2) * p2) / 2 +
    ((t + 1) * t * (t - 1) * p3) / 6
  );
}

function interpolated(a: MapAutocorrelation, x: number, y: number): number {
  const width = 2 * a.reachX + 1;
  const [ix, iy] = [Math.floor(x), Math.floor(y)];
  const line = (row: number): number => {
    const p = (row + a.reachY) * width + ix + a.reachX;
    return cubic(a.values[p - 1], a.values[p], a.values[p + 1], a.values[p + 2], x - ix);
  };
  return cubic(line(iy - 1), line(iy), line(iy + 1), line(iy + 2), y - iy);
}
