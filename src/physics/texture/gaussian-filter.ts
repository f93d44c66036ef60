import { type FftPlan, fft, fftPlan, powerOfTwoFrom } from '../../numerics/fft.js';
import { type HeightMap, largestHeight, type Profile } from './surface.js';

/** α of the Gaussian filter, sqrt(ln 2/π) = 0.4697: half of a wave of the nesting index passes (ISO 16610-21). */
export const GAUSSIAN_ALPHA = Math.sqrt(Math.LN2 / Math.PI);

/** Share of a wave's amplitude that the filter keeps in the mean line: exp(−π(α·index/λ)²) = 2^−(index/λ)². */
export function gaussianTransmission(wavelength: number, nestingIndex: number): number {
  return 2 ** -((nestingIndex / wavelength) ** 2);
}

/** Nesting index over spacing below which the sampled weighting function departs from its transmission by 0.1 % or more. */
export const COARSEST_SAMPLING = 5;
/** Where exp(−π(x/α)²) falls below the last digit of a double. */
const WEIGHT_ENDS = GAUSSIAN_ALPHA * Math.sqrt(Math.log(1e16) / Math.PI);

/**
 * Mean line of an open profile by the Gaussian filter of ISO 16610-21, weighting function
 * s(x) = exp(−π(x/(α·index))²)/(α·index).
 *
 * End effects: the weighting function is cut where the data end, or have a hole, and scaled to a sum of one. Within half a
 * nesting index of an end the result leans on one side; leave that off (`withoutEnds`). Remove the form first.
 *
 * @param nestingIndex cut-off, m, > 0
 */
export function gaussianMeanLine(profile: Profile, nestingIndex: number): Profile {
  const { spacing, heights } = profile;
  const n = heights.length;
  const { value, weight, unit } = masked(heights);
  const smooth = smoother(n, spacing, nestingIndex);
  smooth(value, weight);
  return { spacing, heights: divided(heights, value, weight, unit) };
}

/**
 * Mean surface of a height map by the areal Gaussian filter of ISO 16610-61: the same weighting function along both axes.
 * Ends and holes as for a profile.
 *
 * @param nestingIndex cut-off, m, > 0
 */
export function gaussianMeanSurface(map: HeightMap, nestingIndex: number): HeightMap {
  const { columns, rows, heights } = map;
  const { value, weight, unit } = masked(heights);
  const alongRows = smoother(columns, map.spacingX, nestingIndex);
  for (let r = 0; r < rows; r++)
    alongRows(value.subarray(r * columns, (r + 1) * columns), weight.subarray(r * columns, (r + 1) * columns));
  const alongColumns = smoother(rows, map.spacingY, nestingIndex);
  const a = new Float64Array(rows);
  const b = new Float64Array(rows);
  for (let c = 0; c < columns; c++) {
    for (let r = 0, p = c; r < rows; r++, p += columns) {
      a[r] = value[p];
      b[r] = weight[p];
    }
    alongColumns(a, b);
    for (let r = 0, p = c; r < rows; r++, p += columns) {
      value[p] = a[r];
      weight[p] = b[r];
    }
  }
  return { ...map, heights: divided(heights, value, weight, unit) };
}

/** Heights in units of the largest, so that they and the ones beside them share a transform without loss of digits. */
function masked(heights: Float64Array): { value: Float64Array; weight: Float64Array; unit: number } {
  const value = new Float64Array(heights.length);
  const weight = new Float64Array(heights.length);
  const unit = largestHeight(heights);
  for (let i = 0; i < heights.length; i++)
    if (!Number.isNaN(heights[i])) {
      value[i] = heights[i] / unit;
      weight[i] = 1;
    }
  return { value, weight, unit };
}

const divided = (heights: Float64Array, value: Float64Array, weight: Float64Array, unit: number): Float64Array =>
  value.map((v, i) => (Number.isNaN(heights[i]) ? Number.NaN : (unit * v) / weight[i]));

/** Convolves two lines of length n at once with the weighting function, in place: one as real, one as imaginary part. */
function smoother(n: number, spacing: number, nestingIndex: number): (a: Float64Array, b: Float64Array) => void {
  if (!(Number.isFinite(nestingIndex) && nestingIndex > 0))
    throw new RangeError(`a nesting index must be a positive length in m, got ${nestingIndex}`);
  const reach = Math.min(n - 1, Math.ceil((WEIGHT_ENDS * nestingIndex) / spacing));
  const plan = fftPlan(powerOfTwoFrom(n + reach));
  const kernel = weightSpectrum(plan, reach, spacing / (GAUSSIAN_ALPHA * nestingIndex));
  const re = new Float64Array(plan.length);
  const im = new Float64Array(plan.length);
  return (a, b) => {
    re.fill(0);
    im.fill(0);
    re.set(a);
    im.set(b);
    fft(plan, re, im);
    // The kernel is even, hence its spectrum real: real and imaginary lines stay apart. Inverse with the parts exchanged.
    for (let k = 0; k < plan.length; k++) {
      re[k] *= kernel[k];
      im[k] *= kernel[k];
    }
    fft(plan, im, re);
    for (let i = 0; i < n; i++) {
      a[i] = re[i] / plan.length;
      b[i] = im[i] / plan.length;
    }
  };
}

/** Spectrum of the sampled weighting function, scaled to a sum of one; `step` is the spacing over α times the index. */
function weightSpectrum(plan: FftPlan, reach: number, step: number): Float64Array {
  const re = new Float64Array(plan.length);
  let sum = 0;
  for (let i = -reach; i <= reach; i++) {
    const weight = Math.exp(-Math.PI * (i * step) ** 2);
    re[(i + plan.length) % plan.length] += weight;
    sum += weight;
  }
  fft(plan, re, new Float64Array(plan.length));
  return re.map((x) => x / sum);
}
