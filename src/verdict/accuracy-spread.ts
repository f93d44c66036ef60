/** How an error of an engine shows in the unit of a quantity. */

/** How far the true value may lie above and below the value found, both ≥ 0. */
export interface Spread {
  readonly up: number;
  readonly down: number;
}

export const both = (amount: number): Spread => ({ up: amount, down: amount });

/** Lower bounds of a reflection go down to a perfect match; −60 dB stands for it, to keep numbers finite. */
const PERFECT_MATCH = 1e-3;

/** A complex error of fixed magnitude turned into dB at the value found: larger downwards than upwards. */
export function reflectionSpread(valueDb: number, error: number): Spread {
  const magnitude = 10 ** (valueDb / 20);
  const lowest = Math.min(magnitude, Math.max(magnitude - error, PERFECT_MATCH));
  return {
    up: 20 * Math.log10((magnitude + error) / magnitude),
    down: 20 * Math.log10(magnitude / lowest),
  };
}

/** `near` down to −20 dB, twice that at −25 dB, linear between and below: about a constant error of the far field. */
export const sidelobeSpread = (valueDb: number, near = 1): Spread => both(near * (1 + Math.max(0, -20 - valueDb) / 5));

/** An error of gain and what an error of the reflection does to the mismatch, root sum of squares. */
export function realizedGainSpread(reflection: number, gainErrorDb: number, reflectionError: number): Spread {
  const mismatchDb = (magnitude: number) => 10 * Math.log10(1 - Math.min(magnitude, 0.99) ** 2);
  const here = mismatchDb(reflection);
  return {
    up: Math.hypot(gainErrorDb, mismatchDb(Math.max(0, reflection - reflectionError)) - here),
    down: Math.hypot(gainErrorDb, here - mismatchDb(reflection + reflectionError)),
  };
}

/** An error in dB of a plain ratio. */
export const ratioSpread = (value: number, errorDb: number): Spread => ({
  up: Math.abs(value) * (10 ** (errorDb / 10) - 1),
  down: Math.abs(value) * (1 - 10 ** (-errorDb / 10)),
});
