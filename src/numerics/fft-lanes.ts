/**
 * Discrete Fourier transforms of several sequences side by side, of any length 2^a 3^b 5^c.
 *
 * Element k of sequence q lies at k·lanes + q: the sequences share every twiddle factor, and the inner loop runs over
 * neighbours in memory.
 */
export interface LaneFft {
  readonly length: number;
  readonly lanes: number;
  /** X_k = Σ x_n e^{−j2πkn/N}, not scaled, in place. With `re` and `im` exchanged: the inverse times N. */
  transform(re: Float64Array, im: Float64Array): void;
}

/** Smallest length 2^a 3^b 5^c that is n or more. */
export function smoothLengthFrom(n: number): number {
  for (let length = Math.max(1, Math.ceil(n)); ; length++) {
    let rest = length;
    for (const p of [2, 3, 5]) while (rest % p === 0) rest /= p;
    if (rest === 1) return length;
  }
}

interface Stage {
  readonly radix: number;
  /** Length of the parts that this stage leaves. */
  readonly parts: number;
  readonly stride: number;
  /** e^{−j2πp/n} and its powers 1 … radix − 1 for each p: radix − 1 pairs. */
  readonly twiddle: Float64Array;
}

/**
 * Self-sorting transform of mixed radix (T. G. Stockham, AFIPS Conf. Proc. 28, 1966; C. Temperton, J. Comput. Phys. 52,
 * 1983). Not re-entrant: it keeps its scratch.
 *
 * @throws RangeError where the length has another prime factor than 2, 3 and 5
 */
export function laneFft(length: number, lanes: number): LaneFft {
  if (!(Number.isInteger(length) && length >= 1 && smoothLengthFrom(length) === length))
    throw new RangeError(`laneFft: a length of factors 2, 3 and 5 is needed, got ${length}`);
  const stages = stagesOf(length, lanes);
  const scratchRe = new Float64Array(length * lanes);
  const scratchIm = new Float64Array(length * lanes);
  return {
    length,
    lanes,
    transform(re, im) {
      let [xr, xi, yr, yi]: Float64Array[] = [re, im, scratchRe, scratchIm];
      for (const stage of stages) {
        run(stage, xr, xi, yr, yi);
        [xr, xi, yr, yi] = [yr, yi, xr, xi];
      }
      if (stages.length % 2 === 1) {
        re.set(scratchRe);
        im.set(scratchIm);
      }
    },
  };
}

function stagesOf(length: number, lanes: number): Stage[] {
  const stages: Stage[] = [];
  for (let n = length, stride = lanes; n > 1; ) {
    const radix = n % 4 === 0 ? 4 : n % 5 === 0 ? 5 : n % 3 === 0 ? 3 : 2;
    const parts = n / radix;
    const twiddle = new Float64Array(2 * parts * (radix - 1));
    for (let p = 0, t = 0; p < parts; p++)
      for (let j = 1; j < radix; j++) {
        twiddle[t++] = Math.cos((2 * Math.PI * p * j) / n);
        twiddle[t++] = -Math.sin((2 * Math.PI * p * j) / n);
      }
    stages.push({ radix, parts, stride, twiddle });
    n = parts;
    stride *= radix;
  }
  return stages;
}

function run(stage: Stage, xr: Float64Array, xi: Float64Array, yr: Float64Array, yi: Float64Array): void {
  if (stage.radix === 4) radix4(stage, xr, xi, yr, yi);
  else if (stage.radix === 5) radix5(stage, xr, xi, yr, yi);
  else if (stage.radix === 3) radix3(stage, xr, xi, yr, yi);
  else radix2(stage, xr, xi, yr, yi);
}

function radix2(
  { parts, stride, twiddle }: Stage,
  xr: Float64Array,
  xi: Float64Array,
  yr: Float64Array,
  yi: Float64Array,
) {
  for (let p = 0; p < parts; p++) {
    const c = twiddle[2 * p];
    const s = twiddle[2 * p + 1];
    const a = p * stride;
    const b = a + parts * stride;
    const y = 2 * p * stride;
    for (let q = 0; q < stride; q++) {
      const ar = xr[a + q];
      const ai = xi[a + q];
      const br = xr[b + q];
      const bi = xi[b + q];
      yr[y + q] = ar + br;
      yi[y + q] = ai + bi;
      const dr = ar - br;
      const di = ai - bi;
      yr[y + stride + q] = dr * c - di * s;
      yi[y + stride + q] = dr * s + di * c;
    }
  }
}

const SIN60 = Math.sqrt(3) / 2;

function radix3(
  { parts, stride, twiddle }: Stage,
  xr: Float64Array,
  xi: Float64Array,
  yr: Float64Array,
  yi: Float64Array,
) {
  const step = parts * stride;
  for (let p = 0, t = 0; p < parts; p++, t += 4) {
    const c1 = twiddle[t];
    const s1 = twiddle[t + 1];
    const c2 = twiddle[t + 2];
    const s2 = twiddle[t + 3];
    const a = p * stride;
    const y = 3 * a;
    for (let q = 0; q < stride; q++) {
      const i = a + q;
      const ar = xr[i];
      const ai = xi[i];
      const br = xr[i + step];
      const bi = xi[i + step];
      const cr = xr[i + 2 * step];
      const ci = xi[i + 2 * step];
      const tr = br + cr;
      const ti = bi + ci;
      const mr = ar - 0.5 * tr;
      const mi = ai - 0.5 * ti;
      const nr = SIN60 * (bi - ci);
      const ni = -SIN60 * (br - cr);
      yr[y + q] = ar + tr;
      yi[y + q] = ai + ti;
      const ur = mr + nr;
      const ui = mi + ni;
      yr[y + stride + q] = ur * c1 - ui * s1;
      yi[y + stride + q] = ur * s1 + ui * c1;
      const vr = mr - nr;
      const vi = mi - ni;
      yr[y + 2 * stride + q] = vr * c2 - vi * s2;
      yi[y + 2 * stride + q] = vr * s2 + vi * c2;
    }
  }
}

function radix4(
  { parts, stride, twiddle }: Stage,
  xr: Float64Array,
  xi: Float64Array,
  yr: Float64Array,
  yi: Float64Array,
) {
  const step = parts * stride;
  for (let p = 0, t = 0; p < parts; p++, t += 6) {
    const c1 = twiddle[t];
    const s1 = twiddle[t + 1];
    const c2 = twiddle[t + 2];
    const s2 = twiddle[t + 3];
    const c3 = twiddle[t + 4];
    const s3 = twiddle[t + 5];
    const a = p * stride;
    const y = 4 * a;
    for (let q = 0; q < stride; q++) {
      const i = a + q;
      const ar = xr[i];
      const ai = xi[i];
      const br = xr[i + step];
      const bi = xi[i + step];
      const cr = xr[i + 2 * step];
      const ci = xi[i + 2 * step];
      const dr = xr[i + 3 * step];
      const di = xi[i + 3 * step];
      const er = ar + cr;
      const ei = ai + ci;
      const fr = ar - cr;
      const fi = ai - ci;
      const gr = br + dr;
      const gi = bi + di;
      // −j(b − d)
      const hr = bi - di;
      const hi = dr - br;
      const o = y + q;
      yr[o] = er + gr;
      yi[o] = ei + gi;
      let ur = fr + hr;
      let ui = fi + hi;
      yr[o + stride] = ur * c1 - ui * s1;
      yi[o + stride] = ur * s1 + ui * c1;
      ur = er - gr;
      ui = ei - gi;
      yr[o + 2 * stride] = ur * c2 - ui * s2;
      yi[o + 2 * stride] = ur * s2 + ui * c2;
      ur = fr - hr;
      ui = fi - hi;
      yr[o + 3 * stride] = ur * c3 - ui * s3;
      yi[o + 3 * stride] = ur * s3 + ui * c3;
    }
  }
}

const COS72 = Math.cos((2 * Math.PI) / 5);
const COS144 = Math.cos((4 * Math.PI) / 5);
const SIN72 = Math.sin((2 * Math.PI) / 5);
const SIN144 = Math.sin((4 * Math.PI) / 5);

function radix5(
  { parts, stride, twiddle }: Stage,
  xr: Float64Array,
  xi: Float64Array,
  yr: Float64Array,
  yi: Float64Array,
) {
  const step = parts * stride;
  for (let p = 0, t = 0; p < parts; p++, t += 8) {
    const a = p * stride;
    const y = 5 * a;
    for (let q = 0; q < stride; q++) {
      const i = a + q;
      const ar = xr[i];
      const ai = xi[i];
      // Sums and differences of the pairs (1, 4) and (2, 3).
      const pr = xr[i + step] + xr[i + 4 * step];
      const pi = xi[i + step] + xi[i + 4 * step];
      const mr = xr[i + step] - xr[i + 4 * step];
      const mi = xi[i + step] - xi[i + 4 * step];
      const sr = xr[i + 2 * step] + xr[i + 3 * step];
      const si = xi[i + 2 * step] + xi[i + 3 * step];
      const dr = xr[i + 2 * step] - xr[i + 3 * step];
      const di = xi[i + 2 * step] - xi[i + 3 * step];
      const er = ar + COS72 * pr + COS144 * sr;
      const ei = ai + COS72 * pi + COS144 * si;
      const fr = ar + COS144 * pr + COS72 * sr;
      const fi = ai + COS144 * pi + COS72 * si;
      // −j times the odd parts
      const gr = SIN72 * mi + SIN144 * di;
      const gi = -(SIN72 * mr + SIN144 * dr);
      const hr = SIN144 * mi - SIN72 * di;
      const hi = -(SIN144 * mr - SIN72 * dr);
      const o = y + q;
      yr[o] = ar + pr + sr;
      yi[o] = ai + pi + si;
      let ur = er + gr;
      let ui = ei + gi;
      yr[o + stride] = ur * twiddle[t] - ui * twiddle[t + 1];
      yi[o + stride] = ur * twiddle[t + 1] + ui * twiddle[t];
      ur = fr + hr;
      ui = fi + hi;
      yr[o + 2 * stride] = ur * twiddle[t + 2] - ui * twiddle[t + 3];
      yi[o + 2 * stride] = ur * twiddle[t + 3] + ui * twiddle[t + 2];
      ur = fr - hr;
      ui = fi - hi;
      yr[o + 3 * stride] = ur * twiddle[t + 4] - ui * twiddle[t + 5];
      yi[o + 3 * stride] = ur * twiddle[t + 5] + ui * twiddle[t + 4];
      ur = er - gr;
      ui = ei - gi;
      yr[o + 4 * stride] = ur * twiddle[t + 6] - ui * twiddle[t + 7];
      yi[o + 4 * stride] = ur * twiddle[t + 7] + ui * twiddle[t + 6];
    }
  }
}
