/**
 * A profile drawn from stated figures: a sum of cosines whose spectrum has a Gaussian autocorrelation, brought to the stated
 * Rq over what is drawn. The same figures give the same profile.
 */

/** Uniform numbers in [0, 1) from a 32-bit state (mulberry32), so that a sketch is the same in every build. */
function generator(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let t = state;
    t = Math.imul(t ^ (t >>> 15), t | 1);
    t ^= t + Math.imul(t ^ (t >>> 7), t | 61);
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  };
}

export interface SketchInput {
  /** All three in one unit of length, > 0. */
  readonly rq: number;
  /** Distance at which the autocorrelation has fallen to 1/e. */
  readonly correlationLength: number;
  readonly width: number;
  readonly samples: number;
}

/** Heights above their mean, evenly spaced over the width, both ends included; their root mean square is Rq. */
export function sketchProfile({ rq, correlationLength, width, samples }: SketchInput): readonly number[] {
  const next = generator(Math.round(1e4 * rq) * 65537 + Math.round(1e4 * correlationLength));
  const heights = new Float64Array(samples);
  // Autocorrelation exp(−(x/l)²) has the spectrum exp(−(k l/2)²); beyond k l = 6 nothing of it is left to see.
  const last = 6 / correlationLength;
  // Twice the period that the width would need: what is drawn never repeats itself.
  const count = Math.max(16, Math.ceil((last * width) / Math.PI) * 2);
  for (let j = 0; j < count; j++) {
    const wave = ((j + 0.5) * last) / count;
    const amplitude = Math.exp(-((wave * correlationLength) ** 2) / 8);
    const phase = 2 * Math.PI * next();
    for (let i = 0; i < samples; i++) heights[i] += amplitude * Math.cos((wave * width * i) / (samples - 1) + phase);
  }
  const mean = heights.reduce((sum, z) => sum + z, 0) / samples;
  const square = heights.reduce((sum, z) => sum + (z - mean) ** 2, 0) / samples;
  const scale = rq / Math.sqrt(square);
  return Array.from(heights, (z) => (z - mean) * scale);
}
