import { describe, expect, it } from 'vitest';
import { accuracyClaims } from '../../src/evidence/accuracy.js';
import { deviationsOf } from '../../src/evidence/accuracy-claim.js';
import { accuracyTable, allChecks } from '../../src/evidence/index.js';
import { gradientByNumerov, perturbationBySum } from '../../src/evidence/second-ways.js';

const table = accuracyTable();

/** Lines that do not meet their target, and what their remark must own up to. */
const MISSED: Readonly<Record<string, RegExp>> = {
  'perturbation-surfaces': /Missed.*0\.014.*0\.026/s,
  'column-coupling': /Missed: 2\.6 dB/,
};

describe('the accuracy table', () => {
  it('has one id per line', () => {
    expect(new Set(table.map((line) => line.id)).size).toBe(table.length);
  });

  it.each(table)('$id says what is compared with what, where, and how closely', (line) => {
    for (const text of [line.figure, line.comparedWith, line.range]) expect(text).toMatch(/\S{3}/);
    expect(line.unit).not.toBe('');
    expect(line.target).toBeGreaterThan(0);
    expect(line.cases).toBeGreaterThan(0);
    expect(Number.isFinite(line.reached)).toBe(true);
    expect(line.met).toBe(line.reached <= line.target);
  });

  it.each(Object.entries(MISSED))('says that %s misses its target, with the reason', (id, reason) => {
    const line = table.find((l) => l.id === id)!;
    expect(line.met).toBe(false);
    expect(line.remark).toMatch(reason);
  });

  it('misses nothing else', () => {
    const missed = table.filter((line) => !line.met).map((line) => line.id);
    expect(missed.sort()).toEqual(Object.keys(MISSED).sort());
  });

  it('the remark on second-order perturbation gives the largest deviation across and along, from the same references', () => {
    const { deviations } = accuracyClaims.find((claim) => claim.id === 'perturbation-surfaces')!;
    const all = deviations();
    // References lie across and along in turn.
    const largest = (of: 0 | 1): number => Math.max(...all.filter((_, i) => i % 2 === of));
    expect(largest(0)).toBeCloseTo(0.014, 3);
    expect(largest(1)).toBeCloseTo(0.026, 3);
  });

  it('is the same twice', () => {
    expect(accuracyTable()).toEqual(table);
  });

  it('takes the largest deviation of either sign, and meets with none that is not a number', () => {
    const claim = { ...accuracyClaims[0]!, target: 2 };
    const of = (...deviations: number[]) => accuracyTable([{ ...claim, deviations: () => deviations }])[0]!;
    expect(of(1, -1.5)).toMatchObject({ reached: 1.5, cases: 2, met: true });
    expect(of(1, -2.5)).toMatchObject({ reached: 2.5, met: false });
    expect(of(1, Number.NaN)).toMatchObject({ reached: Number.NaN, met: false });
  });

  it('refuses a line without a comparison', () => {
    expect(() => deviationsOf(allChecks, /^no such check/, 'unit')).toThrow(/no check matches/);
  });
});

describe('second ways', () => {
  it('the field of the gradient model has converged to fourth order', () => {
    for (const r of [0.3, 3]) {
      const [coarse, middle, fine] = [80, 160, 2000].map((n) => gradientByNumerov(r, n));
      const ratio =
        Math.hypot(coarse!.re - fine!.re, coarse!.im - fine!.im) /
        Math.hypot(middle!.re - fine!.re, middle!.im - fine!.im);
      expect(ratio).toBeGreaterThan(12);
      expect(ratio).toBeLessThan(20);
    }
  });

  it('a smooth conductor is one', () => {
    expect(gradientByNumerov(1e-3).re).toBeCloseTo(1, 4);
    expect(perturbationBySum(0, 1)).toEqual({ re: 1, im: 1 });
  });
});
