import { describe, expect, it } from 'vitest';
import { arrayFactor, peakSidelobeDb, taperAmplitudes, taperEfficiency } from '../../../src/physics/taper/index.js';

describe('Dolph–Chebyshev amplitudes', () => {
  it.each([
    [4, 20],
    [5, 13],
    [8, 25],
    [10, 30],
    [11, 40],
    [24, 26],
  ])('%d elements have every sidelobe at −%d dB', (n, level) => {
    const amplitudes = taperAmplitudes({ kind: 'dolph-chebyshev', sidelobeDb: level }, n);
    expect(Math.abs(peakSidelobeDb(amplitudes) + level)).toBeLessThan(1e-9);
    amplitudes.forEach((a, i) => {
      expect(a).toBe(amplitudes[n - 1 - i]);
    });
    // n − 2 zeros of the polynomial in ψ: between them every lobe is at the level, here seen at the polynomial's extrema.
    const x0 = Math.cosh(Math.acosh(10 ** (level / 20)) / (n - 1));
    for (let k = 1; k <= (n - 1) / 2; k++) {
      const psi = 2 * Math.acos(Math.cos((k * Math.PI) / (n - 1)) / x0);
      const db = 20 * Math.log10(arrayFactor(amplitudes, psi) / arrayFactor(amplitudes, 0));
      expect(Math.abs(db + level)).toBeLessThan(1e-9);
    }
  });

  it.each([
    // Textbook examples after Dolph 1946, from the middle out, values from memory. The second was worked with x0 in four
    // digits, which moves currents by 1 % where its explicit sums cancel.
    [5, 20, [1.94, 1.61, 1], 0.01],
    [10, 20 * Math.log10(20), [2.798, 2.496, 1.974, 1.357, 1], 0.025],
  ])('%d elements agree with published currents', (n, level, published, tolerance) => {
    const amplitudes = taperAmplitudes({ kind: 'dolph-chebyshev', sidelobeDb: level }, n).slice(Math.floor(n / 2));
    published.forEach((value, i) => {
      expect(Math.abs(amplitudes[i] / amplitudes.at(-1)! - value)).toBeLessThan(tolerance);
    });
  });

  it('tends to the binomial amplitudes as the sidelobes vanish', () => {
    const amplitudes = taperAmplitudes({ kind: 'dolph-chebyshev', sidelobeDb: 200 }, 5);
    [1, 4, 6, 4, 1].forEach((b, i) => {
      expect(amplitudes[i]).toBeCloseTo(b / 6, 3);
    });
  });
});

describe('Taylor amplitudes', () => {
  it.each([
    [6, 22, 2],
    [8, 25, 3],
    [10, 25, 4],
    [16, 30, 5],
    [40, 35, 6],
  ])('%d elements hold −%d dB with n̄ = %d', (n, level, nBar) => {
    const amplitudes = taperAmplitudes({ kind: 'taylor', sidelobeDb: level, nBar }, n);
    expect(peakSidelobeDb(amplitudes)).toBeCloseTo(-level, 6);
    for (const a of amplitudes) expect(a).toBeGreaterThan(0);
  });

  it('falls off beyond its near-in lobes and pays for it with a wider main lobe than that of Chebyshev', () => {
    const [taylor, chebyshev] = (
      [
        { kind: 'taylor', sidelobeDb: 30, nBar: 5 },
        { kind: 'dolph-chebyshev', sidelobeDb: 30 },
      ] as const
    ).map((taper) => taperAmplitudes(taper, 40));
    const far = (a: readonly number[]): number => {
      let most = 0;
      for (let psi = 2.5; psi < Math.PI; psi += 0.001) most = Math.max(most, arrayFactor(a, psi));
      return 20 * Math.log10(most / arrayFactor(a, 0));
    };
    expect(far(taylor)).toBeLessThan(-38);
    expect(far(chebyshev)).toBeCloseTo(-30, 1);
    const beside = (a: readonly number[]): number => arrayFactor(a, 0.1) / arrayFactor(a, 0);
    expect(beside(taylor)).toBeGreaterThan(beside(chebyshev));
  });
});

describe('amplitudes of any taper', () => {
  it('gives uniform ones the first sidelobe of the uniform array', () => {
    const uniform = taperAmplitudes({ kind: 'uniform' }, 8);
    expect(taperEfficiency(uniform)).toBe(1);
    // Eight uniform elements: −12.80 dB (any text on arrays; the limit for many is −13.26 dB).
    expect(peakSidelobeDb(uniform)).toBeCloseTo(-12.8, 2);
    expect(peakSidelobeDb(Array<number>(200).fill(1))).toBeCloseTo(-13.26, 2);
  });

  it('passes given ones through, the largest 1', () => {
    expect(taperAmplitudes({ kind: 'given', amplitudes: [1, 4, 2] }, 3)).toEqual([0.25, 1, 0.5]);
    expect(Number.isNaN(peakSidelobeDb(taperAmplitudes({ kind: 'dolph-chebyshev', sidelobeDb: 20 }, 2)))).toBe(true);
  });

  it('refuses nonsense with the value received', () => {
    expect(() => taperAmplitudes({ kind: 'uniform' }, 0)).toThrow('got 0');
    expect(() => taperAmplitudes({ kind: 'dolph-chebyshev', sidelobeDb: -20 }, 8)).toThrow('got -20');
    expect(() => taperAmplitudes({ kind: 'taylor', sidelobeDb: 25, nBar: 9 }, 8)).toThrow('got 9');
    expect(() => taperAmplitudes({ kind: 'given', amplitudes: [1, 0] }, 2)).toThrow('got 0');
    expect(() => taperAmplitudes({ kind: 'given', amplitudes: [1, 1, 1] }, 2)).toThrow('3 amplitudes given for 2');
  });
});
