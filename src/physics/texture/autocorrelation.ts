import { fft, fft2, fftPlan, powerOfTwoFrom } from '../../numerics/fft.js';
import { type HeightMap, largestHeight, type Profile } from './surface.js';

/** Autocorrelation over lags, 1 at zero lag; lags up to half the extent, of which enough pairs exist. */
export interface ProfileAutocorrelation {
  /** m */
  readonly spacing: number;
  /** From lag 0 upward. */
  readonly values: Float64Array;
}

/** The same of a map: all lags with |x| ≤ reachX·spacingX and |y| ≤ reachY·spacingY, row after row, zero lag in the middle. */
export interface MapAutocorrelation {
  readonly spacingX: number;
  readonly spacingY: number;
  readonly reachX: number;
  readonly reachY: number;
  readonly values: Float64Array;
}

/**
 * Mean of products of heights at every lag over the mean square (ISO 21920-2, ISO 25178-2), each over the pairs of
 * measured points there are. Heights count from zero: level the data first.
 */
export function profileAutocorrelation({ spacing, heights }: Profile): ProfileAutocorrelation {
  const n = heights.length;
  const reach = Math.floor(n / 2);
  const plan = fftPlan(powerOfTwoFrom(n + reach + 1));
  const { re, im } = packed(plan.length, 1, n, 1, heights);
  fft(plan, re, im);
  powerSpectra(plan.length, 1, re, im);
  fft(plan, im, re);
  const values = new Float64Array(reach + 1);
  for (let lag = 0; lag <= reach; lag++) values[lag] = re[lag] / pairs(im[lag], plan.length);
  return { spacing, values: overFirst(values, values[0]) };
}

export function mapAutocorrelation(map: HeightMap): MapAutocorrelation {
  const { columns, rows, heights } = map;
  const reachX = Math.floor(columns / 2);
  const reachY = Math.floor(rows / 2);
  const across = fftPlan(powerOfTwoFrom(columns + reachX + 1));
  const down = fftPlan(powerOfTwoFrom(rows + reachY + 1));
  const { re, im } = packed(across.length, down.length, columns, rows, heights);
  fft2(across, down, re, im);
  powerSpectra(across.length, down.length, re, im);
  fft2(across, down, im, re);
  const width = 2 * reachX + 1;
  const values = new Float64Array(width * (2 * reachY + 1));
  for (let y = -reachY; y <= reachY; y++)
    for (let x = -reachX; x <= reachX; x++) {
      const p = ((y + down.length) % down.length) * across.length + ((x + across.length) % across.length);
      values[(y + reachY) * width + x + reachX] = re[p] / pairs(im[p], across.length * down.length);
    }
  const middle = values[reachY * width + reachX];
  return { spacingX: map.spacingX, spacingY: map.spacingY, reachX, reachY, values: overFirst(values, middle) };
}

/** Number of pairs from the transform's unscaled figure; a lag without any has no value. */
function pairs(transformed: number, points: number): number {
  const count = Math.round(transformed / points);
  return count > 0 ? count * points : Number.NaN;
}

const overFirst = (values: Float64Array, first: number): Float64Array =>
  first > 0 ? values.map((v) => v / first) : values.map(() => Number.NaN);

/** Heights in units of the largest as real part, ones where measured as imaginary part, zeros around. */
function packed(width: number, height: number, columns: number, rows: number, heights: Float64Array) {
  const re = new Float64Array(width * height);
  const im = new Float64Array(width * height);
  const unit = largestHeight(heights);
  for (let r = 0; r < rows; r++)
    for (let c = 0; c < columns; c++) {
      const z = heights[r * columns + c];
      if (Number.isNaN(z)) continue;
      re[r * width + c] = z / unit;
      im[r * width + c] = 1;
    }
  return { re, im };
}

/** From the transform of a + jb (both real) to |A|² + j|B|², in place, pair of opposite frequencies by pair. */
function powerSpectra(width: number, height: number, re: Float64Array, im: Float64Array): void {
  for (let r = 0; r < height; r++)
    for (let c = 0; c < width; c++) {
      const p = r * width + c;
      const q = ((height - r) % height) * width + ((width - c) % width);
      if (q < p) continue;
      const a = ((re[p] + re[q]) ** 2 + (im[p] - im[q]) ** 2) / 4;
      const b = ((im[p] + im[q]) ** 2 + (re[q] - re[p]) ** 2) / 4;
      re[p] = a;
      im[p] = b;
      re[q] = a;
      im[q] = b;
    }
}
