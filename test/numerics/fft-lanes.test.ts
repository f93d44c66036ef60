import { describe, expect, it } from 'vitest';
import { laneFft, smoothLengthFrom } from '../../src/numerics/fft-lanes.js';

describe('transforms of several sequences side by side', () => {
  it.each([
    [60, 1],
    [30, 3],
    [16, 2],
    [45, 8],
    [1, 2],
  ])('length %i in %i lanes equals the sum that defines it', (n, lanes) => {
    const re = Float64Array.from({ length: n * lanes }, (_, i) => Math.sin(3 * i * i + 1));
    const im = Float64Array.from({ length: n * lanes }, (_, i) => Math.cos(5 * i + 2));
    const [given, givenIm] = [re.slice(), im.slice()];
    laneFft(n, lanes).transform(re, im);
    for (let q = 0; q < lanes; q++)
      for (let k = 0; k < n; k++) {
        let [a, b] = [0, 0];
        for (let m = 0; m < n; m++) {
          const [c, s] = [Math.cos((2 * Math.PI * k * m) / n), -Math.sin((2 * Math.PI * k * m) / n)];
          a += given[m * lanes + q] * c - givenIm[m * lanes + q] * s;
          b += given[m * lanes + q] * s + givenIm[m * lanes + q] * c;
        }
        expect(Math.hypot(re[k * lanes + q] - a, im[k * lanes + q] - b)).toBeLessThan(1e-11);
      }
  });

  it('takes the next length of factors 2, 3 and 5, and refuses others', () => {
    expect([1, 7, 61, 121, 701].map(smoothLengthFrom)).toEqual([1, 8, 64, 125, 720]);
    expect(() => laneFft(14, 1)).toThrow(RangeError);
  });
});
