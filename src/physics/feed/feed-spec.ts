/** What a corporate feed is asked to be. */
export interface FeedSpec {
  readonly divider: 'tee' | 'wilkinson';
  /** Of every line that is not a quarter-wave step, m. */
  readonly lineWidth: number;
  /** From the input to the first divider, and from one divider to the next or to the column, m; steps are part of them. */
  readonly trunkLength: number;
  readonly levelLength: number;
  /** Of the wave into each driven column, in the order of their position: amplitude > 0, phase in rad. */
  readonly weights: readonly { readonly amplitude: number; readonly phase: number }[];
  /** y of the driven columns, m: a level is then at least as long as its way across. */
  readonly positions?: readonly number[];
  readonly designFrequency: number;
  /** Of every isolation resistor, ohm; the ideal one of each divider where absent. */
  readonly isolationResistance?: number;
  /** Narrowest line, m; default 75 µm. */
  readonly leastWidth?: number;
  /** Dimensions are whole multiples of it, m. */
  readonly grid?: number;
}

/** @throws RangeError naming the quantity and the value received */
export function requireSpec(spec: FeedSpec): void {
  for (const name of ['lineWidth', 'trunkLength', 'levelLength', 'designFrequency'] as const)
    if (!(Number.isFinite(spec[name]) && spec[name] > 0))
      throw new RangeError(`corporateFeed: ${name} must be positive, got ${spec[name]}`);
  if (spec.weights.length === 0) throw new RangeError('corporateFeed: no column is driven');
  for (const { amplitude, phase } of spec.weights)
    if (!(Number.isFinite(amplitude) && amplitude > 0 && Number.isFinite(phase)))
      throw new RangeError(
        `corporateFeed: a driven column needs an amplitude above 0 and a phase, got ${amplitude}, ${phase}`,
      );
  if (spec.positions && spec.positions.length !== spec.weights.length)
    throw new RangeError(`corporateFeed: ${spec.positions.length} positions for ${spec.weights.length} columns`);
}
