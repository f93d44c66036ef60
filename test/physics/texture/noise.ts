/** A small generator with a seed (G. Marsaglia, xorshift, J. Stat. Softw. 8(14), 2003), for textures that tests can repeat. */
export function uniform(seed: number): () => number {
  let x = seed | 0 || 1;
  return () => {
    x ^= x << 13;
    x ^= x >>> 17;
    x ^= x << 5;
    return ((x >>> 0) + 0.5) / 4294967296;
  };
}

/** Normal deviates, two at a time thrown away by half (Box and Muller 1958). */
export function normal(seed: number): () => number {
  const u = uniform(seed);
  return () => Math.sqrt(-2 * Math.log(u())) * Math.cos(2 * Math.PI * u());
}

/**
 * Normal heights of rms 1 with autocorrelation exp(−x²/l²), l in points: white noise through exp(−2x²/l²), whose sum of
 * squares sets the height.
 */
export function gaussianNoise(points: number, l: number, seed: number): Float64Array {
  const reach = Math.ceil(3 * l);
  const kernel = Array.from({ length: 2 * reach + 1 }, (_, i) => Math.exp((-2 * (i - reach) ** 2) / (l * l)));
  const norm = Math.sqrt(kernel.reduce((s, k) => s + k * k, 0));
  const next = normal(seed);
  const white = Float64Array.from({ length: points + 2 * reach }, next);
  return Float64Array.from({ length: points }, (_, i) => kernel.reduce((s, k, j) => s + k * white[i + j], 0) / norm);
}

/** The same on a grid, autocorrelation exp(−(x² + y²)/l²). */
export function gaussianField(columns: number, rows: number, l: number, seed: number): Float64Array {
  const reach = Math.ceil(3 * l);
  const kernel = Array.from({ length: 2 * reach + 1 }, (_, i) => Math.exp((-2 * (i - reach) ** 2) / (l * l)));
  const norm = kernel.reduce((s, k) => s + k * k, 0);
  const next = normal(seed);
  const tall = rows + 2 * reach;
  const wide = columns + 2 * reach;
  const white = Float64Array.from({ length: wide * tall }, next);
  const half = new Float64Array(columns * tall);
  for (let r = 0; r < tall; r++)
    for (let c = 0; c < columns; c++) {
      let s = 0;
      for (let j = 0; j < kernel.length; j++) s += kernel[j] * white[r * wide + c + j];
      half[r * columns + c] = s;
    }
  const out = new Float64Array(columns * rows);
  for (let r = 0; r < rows; r++)
    for (let c = 0; c < columns; c++) {
      let s = 0;
      for (let j = 0; j < kernel.length; j++) s += kernel[j] * half[(r + j) * columns + c];
      out[r * columns + c] = s / norm;
    }
  return out;
}
