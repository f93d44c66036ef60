import { describe, expect, it } from 'vitest';
import { allChecks, methods, runChecks } from '../../src/evidence/index.js';

describe('checks against values from outside the engine', () => {
  for (const result of runChecks(allChecks)) {
    it(`${result.id}: ${result.quantity}`, () => {
      expect(
        result.ok,
        `${result.value} ${result.unit} against ${result.expected}, tolerance ${result.tolerance} (${result.source})`,
      ).toBe(true);
    });
  }
});

describe('the list of checks', () => {
  it('has one id per check', () => {
    const ids = allChecks.map((check) => check.id);
    expect(new Set(ids).size).toBe(ids.length);
  });

  it.each(allChecks)('$id has a tolerance, its reason and a source', (check) => {
    expect(check.tolerance).toBeGreaterThan(0);
    expect(check.toleranceReason.length).toBeGreaterThan(10);
    expect(check.source.length).toBeGreaterThan(10);
  });
});

describe('runChecks', () => {
  const check = { ...allChecks[0]!, expected: 2, tolerance: 0.1 };
  it.each([
    [2.05, true],
    [2.2, false],
    [Number.NaN, false],
  ])('a value of %d where 2 ± 0.1 is expected: ok %s', (value, ok) => {
    expect(runChecks([{ ...check, compute: () => value }])[0]).toMatchObject({ value, ok });
  });
});

describe('methods', () => {
  it('each has an id of its own, a source and a range', () => {
    expect(new Set(methods.map((m) => m.id)).size).toBe(methods.length);
    for (const m of methods) for (const text of [m.name, m.whatItIs, m.source, m.range]) expect(text).toMatch(/\S{3}/);
  });
});
