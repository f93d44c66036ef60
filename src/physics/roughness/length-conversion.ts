import { correlationLengthFromSal } from './texture.js';

/** Correlation length (fall to 1/e) over Sal: what is taken, and the least and most that autocorrelations of real surfaces show. */
export interface LengthConversion {
  readonly factor: number;
  readonly low: number;
  readonly high: number;
  /** The autocorrelation assumed and the reason for the spread, in a sentence. */
  readonly assumption: string;
}

const digits = (x: number): string => x.toPrecision(3);

/**
 * From the lag Sal of a fall to `threshold` to that of a fall to 1/e. Taken: Gaussian autocorrelation. Allowed for:
 * exponential, exp(−x/l), where the surface has fine content on long waves, and a single wave, cos kx, on the other side.
 *
 * @param threshold of Sal, 0.2 of ISO 25178-2 unless stated otherwise
 * @throws RangeError outside 0 to 1
 */
export function lengthConversion(threshold = 0.2): LengthConversion {
  const factor = correlationLengthFromSal(1, threshold);
  const exponential = 1 / Math.log(1 / threshold);
  const wave = Math.acos(Math.exp(-1)) / Math.acos(threshold);
  const [low, high] = [Math.min(factor, exponential, wave), Math.max(factor, exponential, wave)];
  return {
    factor,
    low,
    high,
    assumption: `The correlation length is ${digits(factor)} times the stated Sal (fall to ${threshold}): the autocorrelation is assumed to be Gaussian; ${digits(exponential)} (one that falls off exponentially) to ${digits(wave)} (a single wave) is allowed for.`,
  };
}
