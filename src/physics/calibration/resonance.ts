/** Resonance, resistance and Q from impedances at a few frequencies, by the same rule for network and full wave. */
import type { Complex } from '../../numerics/complex.js';

export interface Resonance {
  /** Hz */
  readonly frequency: number;
  /** ohm */
  readonly resistance: number;
  readonly quality: number;
}

/**
 * Series resonance at a gap: X(f) and R(f) as parabolas, f0 where X vanishes, Q = f0 X'/(2R).
 *
 * @throws RangeError where the reactance does not rise through zero near the samples
 */
export function seriesResonance(frequencies: readonly number[], impedance: readonly Complex[]): Resonance {
  const { centre, spread, x } = normal(frequencies);
  const reactance = parabola(
    x,
    impedance.map((z) => z.im),
  );
  const resistance = parabola(
    x,
    impedance.map((z) => z.re),
  );
  const root = Math.sqrt(reactance.b * reactance.b - 4 * reactance.a * reactance.c);
  // Of the two zeros that where X rises, in the form that keeps its digits as the parabola straightens.
  const zero = (-2 * reactance.c) / (reactance.b + root);
  if (!(reactance.b > 0) || !Number.isFinite(zero) || Math.abs(zero) > 4)
    throw new RangeError('seriesResonance: no resonance near the frequencies given');
  const frequency = centre + spread * zero;
  const r = value(resistance, zero);
  return { frequency, resistance: r, quality: (frequency * root) / (spread * 2 * r) };
}

/**
 * Parallel resonance at an edge: Z = R/(1 + jQδ) + jX, δ = f/f0 − f0/f, has 1/Re Z = (1 + Q²δ²)/R whatever X. A parabola
 * through 1/Re Z gives f0 at its lowest point, R there, and Q from its curvature (δ = 2Δf/f0 near resonance).
 *
 * @throws RangeError where 1/Re Z has no lowest point near the samples
 */
export function parallelResonance(frequencies: readonly number[], impedance: readonly Complex[]): Resonance {
  const { centre, spread, x } = normal(frequencies);
  const fit = parabola(
    x,
    impedance.map((z) => 1 / z.re),
  );
  const lowest = -fit.b / (2 * fit.a);
  const least = value(fit, lowest);
  if (!(fit.a > 0 && least > 0) || Math.abs(lowest) > 4)
    throw new RangeError('parallelResonance: no resonance near the frequencies given');
  const frequency = centre + spread * lowest;
  return { frequency, resistance: 1 / least, quality: (frequency / (2 * spread)) * Math.sqrt(fit.a / least) };
}

function normal(frequencies: readonly number[]): { centre: number; spread: number; x: number[] } {
  const low = Math.min(...frequencies);
  const high = Math.max(...frequencies);
  const [centre, spread] = [(low + high) / 2, (high - low) / 2];
  return { centre, spread, x: frequencies.map((f) => (f - centre) / spread) };
}

interface Parabola {
  readonly a: number;
  readonly b: number;
  readonly c: number;
}

const value = ({ a, b, c }: Parabola, x: number): number => (a * x + b) * x + c;

/** Least squares a x² + b x + c over points that lie even about 0. */
function parabola(x: readonly number[], y: readonly number[]): Parabola {
  const sum = (term: (x: number, y: number) => number): number => x.reduce((s, xi, i) => s + term(xi, y[i]), 0);
  const n = x.length;
  const [s2, s4] = [sum((u) => u * u), sum((u) => u ** 4)];
  const [y0, y1, y2] = [sum((_, v) => v), sum((u, v) => u * v), sum((u, v) => u * u * v)];
  const a = (n * y2 - s2 * y0) / (n * s4 - s2 * s2);
  return { a, b: y1 / s2, c: (y0 - a * s2) / n };
}
