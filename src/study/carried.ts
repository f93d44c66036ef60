/**
 * How what is known at a few frequencies is carried to those between: by linear prediction of a quantity whose values are
 * correlated as e^{−|Δf|/reach} (first-order Markov process; N. Wiener, Extrapolation, Interpolation and Smoothing of
 * Stationary Time Series, 1949, from memory). The two neighbours alone count; within a large reach it is the straight line between
 * them, beyond a small one nothing is carried. Exact at the known frequencies.
 */
export interface Carried {
  /** Of the known frequencies. */
  readonly lower: number;
  readonly upper: number;
  readonly lowerWeight: number;
  readonly upperWeight: number;
}

/**
 * @param known  ascending, at least one, Hz
 * @param reach  Hz, > 0; Infinity for straight lines, which go on level beyond the ends
 */
export function carriedTo(known: readonly number[], frequency: number, reach: number): Carried {
  const last = known.length - 1;
  const alone = (index: number): Carried => ({
    lower: index,
    upper: index,
    lowerWeight: Math.exp(-Math.abs(frequency - known[index]) / reach),
    upperWeight: 0,
  });
  if (frequency <= known[0]) return alone(0);
  if (frequency >= known[last]) return alone(last);
  const upper = known.findIndex((f) => f >= frequency);
  if (known[upper] === frequency) return alone(upper);
  const lower = upper - 1;
  const step = known[upper] - known[lower];
  const below = (frequency - known[lower]) / step;
  const span = step / reach;
  // From 30 reaches on both sines overflow together and nothing is carried but next to a known frequency.
  const weight = (part: number): number =>
    span === 0 ? part : span > 30 ? Math.exp((part - 1) * span) : Math.sinh(part * span) / Math.sinh(span);
  return { lower, upper, lowerWeight: weight(1 - below), upperWeight: weight(below) };
}

export const carriedValue = (
  { lower, upper, lowerWeight, upperWeight }: Carried,
  value: (index: number) => number,
): number => lowerWeight * value(lower) + (upperWeight === 0 ? 0 : upperWeight * value(upper));

/** Variance that the prediction leaves, as a share of that of the quantity: 0 at a known frequency, 1 far from all. */
export function unexplainedShare(known: readonly number[], frequency: number, reach: number): number {
  const by = carriedTo(known, frequency, reach);
  const likeness = (index: number): number => Math.exp(-Math.abs(frequency - known[index]) / reach);
  return Math.max(0, 1 - carriedValue(by, likeness));
}
