import { describe, expect, it } from 'vitest';
import { fft, fft2, fftPlan, powerOfTwoFrom } from '../../src/numerics/fft.js';

const wave = (n: number, k: number) => Float64Array.from({ length: n }, (_, i) => Math.cos((2 * Math.PI * k * i) / n));

describe('fft', () => {
  it('the definition, for every frequency', () => {
    const n = 16;
    const x = Float64Array.from({ length: n }, (_, i) => Math.sin(3 * i) + i / 7);
    const y = Float64Array.from({ length: n }, (_, i) => Math.cos(i * i));
    const re = x.slice();
    const im = y.slice();
    fft(fftPlan(n), re, im);
    for (let k = 0; k < n; k++) {
      let [a, b] = [0, 0];
      for (let i = 0; i < n; i++) {
        const angle = (-2 * Math.PI * k * i) / n;
        a += x[i] * Math.cos(angle) - y[i] * Math.sin(angle);
        b += x[i] * Math.sin(angle) + y[i] * Math.cos(angle);
      }
      expect(re[k]).toBeCloseTo(a, 11);
      expect(im[k]).toBeCloseTo(b, 11);
    }
  });

  it('back by exchanging the parts', () => {
    const re = wave(64, 5);
    const im = new Float64Array(64);
    const plan = fftPlan(64);
    fft(plan, re, im);
    fft(plan, im, re);
    const original = wave(64, 5);
    for (let i = 0; i < 64; i++) expect(re[i] / 64).toBeCloseTo(original[i], 13);
  });

  it('a plane wave is one point of the two-dimensional transform', () => {
    const [columns, rows] = [16, 8];
    const re = new Float64Array(columns * rows);
    const im = new Float64Array(columns * rows);
    for (let r = 0; r < rows; r++)
      for (let c = 0; c < columns; c++) {
        const angle = 2 * Math.PI * ((3 * c) / columns + (2 * r) / rows);
        re[r * columns + c] = Math.cos(angle);
        im[r * columns + c] = Math.sin(angle);
      }
    fft2(fftPlan(columns), fftPlan(rows), re, im);
    for (let i = 0; i < re.length; i++) expect(re[i]).toBeCloseTo(i === 2 * columns + 3 ? columns * rows : 0, 10);
  });

  it('powers of two only', () => {
    expect([1, 2, 3, 1000].map(powerOfTwoFrom)).toEqual([1, 2, 4, 1024]);
    expect(() => fftPlan(12)).toThrow(/power of two/);
  });
});
