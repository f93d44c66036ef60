import { describe, expect, it } from 'vitest';
import { type Complex, complex, div } from '../../../src/numerics/complex.js';
import { parallelResonance, seriesResonance } from '../../../src/physics/calibration/resonance.js';

const detuning = (f: number, f0: number): number => f / f0 - f0 / f;

describe('resonance', () => {
  it('reads a series circuit', () => {
    const frequencies = [75e9, 77e9, 79e9];
    const z = frequencies.map((f): Complex => complex(1.6, 1.6 * 18 * detuning(f, 77.4e9)));
    const { frequency, resistance, quality } = seriesResonance(frequencies, z);
    expect(frequency / 77.4e9).toBeCloseTo(1, 5);
    expect(resistance).toBeCloseTo(1.6, 9);
    expect(quality / 18).toBeCloseTo(1, 2);
  });

  it('reads a parallel circuit whatever reactance stands in series', () => {
    const frequencies = [77.5e9, 78e9, 78.5e9, 79e9, 79.5e9];
    for (const series of [0, 17, -40]) {
      const z = frequencies.map((f): Complex => {
        const { re, im } = div(complex(290), complex(1, 25 * detuning(f, 78.6e9)));
        return complex(re, im + series);
      });
      const { frequency, resistance, quality } = parallelResonance(frequencies, z);
      // The parabola takes δ for 2Δf/f0: a few parts in 10⁵ of frequency.
      expect(Math.abs(frequency / 78.6e9 - 1)).toBeLessThan(2e-4);
      expect(resistance / 290).toBeCloseTo(1, 3);
      expect(quality / 25).toBeCloseTo(1, 2);
    }
  });

  it('refuses samples that hold no resonance', () => {
    const falling = [complex(1, 3), complex(1, 1), complex(1, -1)];
    expect(() => seriesResonance([75e9, 77e9, 79e9], falling)).toThrow(RangeError);
    const flat = [1, 2, 1].map((re) => complex(1 / re));
    expect(() => parallelResonance([75e9, 77e9, 79e9], flat)).toThrow(RangeError);
  });
});
