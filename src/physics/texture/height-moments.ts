export interface HeightMoments {
  /** Arithmetic mean height Ra or Sa, m. */
  readonly mean: number;
  /** Root-mean-square height Rq or Sq, m. */
  readonly rms: number;
  /** Highest peak above zero and deepest pit below, both counted positive, m. */
  readonly peak: number;
  readonly pit: number;
  /** Skewness and kurtosis; NaN for a flat surface. */
  readonly skewness: number;
  readonly kurtosis: number;
}

/** Figures of heights counted from zero, the reference line or surface; points without a height are left out. */
export function heightMoments(heights: Float64Array): HeightMoments {
  let [n, one, two, three, four, peak, pit] = [0, 0, 0, 0, 0, 0, 0];
  for (const z of heights) {
    if (Number.isNaN(z)) continue;
    const square = z * z;
    n++;
    one += Math.abs(z);
    two += square;
    three += square * z;
    four += square * square;
    if (z > peak) peak = z;
    if (-z > pit) pit = -z;
  }
  const rms = Math.sqrt(two / n);
  return { mean: one / n, rms, peak, pit, skewness: three / n / rms ** 3, kurtosis: four / n / rms ** 4 };
}
