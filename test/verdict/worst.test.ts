import { describe, expect, it } from 'vitest';
import type { PointResult, Sweep } from '../../src/study/results.js';
import { worstValue } from '../../src/verdict/worst.js';
import { board, requirement } from '../dossier/board-fixture.js';
import { pointOf } from '../dossier/study-fixture.js';

const subject = board('qb-1', { band: { low: 76e9, high: 78e9 }, temperature: { lowC: 0, nominalC: 25, highC: 50 } });
const template = pointOf(subject, 77e9, 25);

/** Efficiency given as a function of place: no conversion between it and the value judged. */
function sweep(efficiency: (ghz: number, celsius: number) => number): Sweep {
  const points = [0, 50].flatMap((temperatureC) =>
    [76, 77, 78].map(
      (ghz): PointResult => ({
        ...template,
        frequency: ghz * 1e9,
        temperatureC,
        radiationEfficiency: efficiency(ghz, temperatureC),
        mismatch: 0.9,
      }),
    ),
  );
  return { id: 's', label: 's', points, line: [] };
}
const atLeast = (condition: Parameters<typeof requirement>[1]['condition']) =>
  requirement('r', { quantity: 'radiation_efficiency', limit: { direction: 'at_least', value: 0.5 }, condition });
const falling = sweep((ghz, celsius) => 0.9 - 0.1 * (ghz - 76) - 0.002 * celsius);

describe('worst value', () => {
  it('is taken over band and temperature, and says where', () => {
    const found = worstValue(falling, atLeast({}), subject);
    expect(found).toMatchObject({ where: { frequency: 78e9, temperatureC: 50 } });
    expect('value' in found && found.value).toBeCloseTo(0.6, 12);
  });

  it('is the largest value for an upper limit', () => {
    const atMost = requirement('r', {
      quantity: 'radiation_efficiency',
      limit: { direction: 'at_most', value: 0.5 },
    });
    expect(worstValue(falling, atMost, subject)).toMatchObject({ where: { frequency: 76e9, temperatureC: 0 } });
  });

  it('interpolates the ends of a condition that lie between evaluated points', () => {
    const found = worstValue(
      falling,
      atLeast({ band: { low: 76.2e9, high: 77.5e9 }, temperature: { lowC: 10, highC: 20 } }),
      subject,
    );
    expect(found).toMatchObject({ where: { frequency: 77.5e9, temperatureC: 20 } });
    expect('value' in found && found.value).toBeCloseTo(0.9 - 0.15 - 0.04, 12);
  });

  it('takes a single frequency and temperature', () => {
    const found = worstValue(
      falling,
      atLeast({ band: { low: 77e9, high: 77e9 }, temperature: { lowC: 0, highC: 0 } }),
      subject,
    );
    expect('value' in found && found.value).toBeCloseTo(0.8, 12);
  });

  it('does not narrow a band that reaches outside what was evaluated', () => {
    const found = worstValue(falling, atLeast({ band: { low: 75e9, high: 77e9 } }), subject);
    expect(found).toEqual({
      notEvaluated: 'the requirement covers 75 to 77 GHz, but this board was evaluated over 76 to 78 GHz',
    });
  });

  it('does not narrow a temperature range that reaches outside what was evaluated', () => {
    const found = worstValue(falling, atLeast({ temperature: { lowC: -40, highC: 25 } }), subject);
    expect(found).toEqual({
      notEvaluated: 'the requirement covers −40 to 25 °C, but this board was evaluated over 0 to 50 °C',
    });
  });

  it('is not evaluated as soon as one point in the condition has no value', () => {
    const holed = sweep((ghz, celsius) => (ghz === 77 && celsius === 50 ? Number.NaN : 0.9));
    const found = worstValue(holed, atLeast({}), subject);
    expect('notEvaluated' in found && found.notEvaluated).toContain('(77 GHz, 50 °C)');
    expect(worstValue(holed, atLeast({ band: { low: 77.9e9, high: 78e9 } }), subject)).toHaveProperty('notEvaluated');
    expect(worstValue(holed, atLeast({ band: { low: 76e9, high: 76e9 } }), subject)).toHaveProperty('value', 0.9);
  });

  it('is taken from the line where the columns were not evaluated', () => {
    const line = [0, 50].flatMap((temperatureC) =>
      [76, 77, 78].map((ghz) => ({
        frequency: ghz * 1e9,
        temperatureC,
        lossDbPerM: ghz + temperatureC / 10,
        effectivePermittivity: 2.4,
        impedance: 50,
      })),
    );
    const loss = requirement('r', { quantity: 'line_loss', limit: { direction: 'at_most', value: 1 } });
    const found = worstValue({ id: 's', label: 's', points: [], line }, loss, subject);
    expect(found).toMatchObject({ where: { frequency: 78e9, temperatureC: 50 } });
    expect('value' in found && found.value).toBeCloseTo(0.83, 12);
    expect(worstValue({ id: 's', label: 's', points: [], line }, atLeast({}), subject)).toHaveProperty('notEvaluated');
    expect(worstValue({ ...falling, line: [] }, loss, subject)).toHaveProperty('notEvaluated');
  });

  it('refuses a sweep with a hole in its grid', () => {
    const points = falling.points.slice(1);
    expect(() => worstValue({ ...falling, points }, atLeast({}), subject)).toThrow(RangeError);
  });
});
