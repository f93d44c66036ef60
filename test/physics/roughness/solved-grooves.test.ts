import { describe, expect, it } from 'vitest';
import { GROOVE_REFERENCES } from '../../../src/evidence/groove-references.js';
import { areaLimitedPerturbation, smallPerturbation } from '../../../src/physics/roughness/index.js';
import { uniform } from '../texture/noise.js';
import { type Grooves, solvedGrooves } from './solved-grooves.js';

function grooves(
  period: number,
  n: number,
  parts: readonly { k: number; amplitude: number; phase: number }[],
): Grooves {
  const x = Float64Array.from({ length: n }, (_, i) => (i * period) / n);
  return {
    period,
    height: x.map((at) => parts.reduce((s, p) => s + p.amplitude * Math.cos(p.k * at + p.phase), 0)),
    slope: x.map((at) => parts.reduce((s, p) => s - p.k * p.amplitude * Math.sin(p.k * at + p.phase), 0)),
  };
}
const sine = (amplitude: number, period: number, n: number): Grooves =>
  grooves(period, n, [{ k: (2 * Math.PI) / period, amplitude, phase: 0 }]);
const LAYS = ['across', 'along'] as const;

describe('boundary integrals', () => {
  it('a smooth face is one', () => {
    const { across, along } = solvedGrooves(sine(0, 6, 60));
    for (const z of [across, along]) {
      expect(Math.abs(z.re - 1)).toBeLessThan(5e-5);
      expect(Math.abs(z.im - 1)).toBeLessThan(5e-5);
    }
  });

  it.each(LAYS)('gentle sines %s leave second order with the fourth power of height', (lay) => {
    const off = (amplitude: number): number => {
      const k = (2 * Math.PI) / 6;
      const second = smallPerturbation(
        { rq: amplitude / Math.SQRT2, correlationLength: Math.SQRT2 / k, lay, spectrum: 'single' },
        1,
      ).impedance;
      const solved = solvedGrooves(sine(amplitude, 6, 160))[lay];
      return Math.hypot(solved.re - second.re, solved.im - second.im);
    };
    const ratio = off(0.5) / off(0.25);
    expect(ratio).toBeGreaterThan(13);
    expect(ratio).toBeLessThan(19);
  });

  it('has converged with its points', () => {
    const [coarse, fine] = [60, 120].map((n) => solvedGrooves(sine(0.5, 4, n)));
    for (const lay of LAYS) expect(Math.abs(coarse![lay].re - fine![lay].re)).toBeLessThan(2e-4);
  });
});

describe('random grooves of Gaussian spectrum, slope 0.5, Rq 0.6 skin depths', () => {
  // Ten profiles of 14 correlation lengths; second order of each one's own spectrum taken off, that of the endless one added.
  const rq = 0.6;
  const l = 2 * Math.SQRT2 * rq;
  const period = 14 * l;
  const next = uniform(20240607);
  const differences = Array.from({ length: 10 }, () => {
    const weights = Array.from({ length: 14 }, (_, i) => Math.exp(-0.25 * ((2 * Math.PI * (i + 1) * l) / period) ** 2));
    const total = weights.reduce((s, w) => s + w, 0.5);
    const parts = weights.map((w, i) => ({
      k: (2 * Math.PI * (i + 1)) / period,
      amplitude: rq * Math.sqrt((2 * w) / total),
      phase: 2 * Math.PI * next(),
    }));
    const solved = solvedGrooves(grooves(period, 168, parts));
    const second = parts.reduce((s, p) => {
      const one = { rq: p.amplitude / Math.SQRT2, correlationLength: Math.SQRT2 / p.k, lay: 'across' } as const;
      return s + smallPerturbation({ ...one, spectrum: 'single' }, 1).impedance.re - 1;
    }, 1);
    return { across: solved.across.re - second, along: solved.along.re - second };
  });

  it.each(LAYS)('%s: second order is high, and held to the area ratio within what the profiles scatter', (lay) => {
    const mean = differences.reduce((s, d) => s + d[lay], 0) / differences.length;
    const scatter = Math.sqrt(differences.reduce((s, d) => s + (d[lay] - mean) ** 2, 0) / 9 / 10);
    const texture = { rq, correlationLength: l, lay };
    const solved = smallPerturbation(texture, 1).impedance.re + mean;
    expect(mean).toBeLessThan(-2 * scatter);
    expect(Math.abs(areaLimitedPerturbation(texture, 1).impedance.re - solved)).toBeLessThan(0.005 + 2 * scatter);
    const reference = GROOVE_REFERENCES.find(
      (g) => g.lay === lay && g.rqOverDelta === rq && Math.abs(g.slope - 0.5) < 0.01,
    )!;
    expect(Math.abs(solved - reference.lossFactor)).toBeLessThan(3 * Math.hypot(scatter, reference.error));
  });
});
