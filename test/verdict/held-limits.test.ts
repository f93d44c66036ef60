import { describe, expect, it } from 'vitest';
import type { AskedItem } from '../../src/manifest/procurement-model.js';
import { type AllowanceOutcome, type AllowanceResult, heldLimits } from '../../src/verdict/index.js';

const item: AskedItem = {
  id: 'A-permittivity',
  group: 'A',
  parameter: 'permittivity',
  dimension: 'number',
  upperOnly: false,
  nominal: 3,
  lower: 2.9,
  upper: 3.1,
  figures: [
    { board: 'a', path: 'p' },
    { board: 'b', path: 'p' },
  ],
};
const limited = (permitted: number): AllowanceOutcome => ({
  kind: 'limited',
  permitted,
  beyond: permitted,
  requirementId: 'r',
});
const free: AllowanceOutcome = { kind: 'not limited', searchedTo: 3.3 };
const failed: AllowanceOutcome = { kind: 'not met at nominal', requirementIds: ['r'] };

/** Outcomes under the low, middle and high estimate. */
const search = (direction: 'down' | 'up', ...outcomes: readonly AllowanceOutcome[]): AllowanceResult => ({
  path: 'p',
  parameter: 'permittivity',
  direction,
  nominal: 3,
  sides: outcomes.map((outcome, i) => ({ side: (['low', 'middle', 'high'] as const)[i]!, outcome })),
  sweeps: 1,
});
const upper = (a: AllowanceResult, ...b: readonly AllowanceResult[]) =>
  heldLimits(
    item,
    new Map([
      ['a', [a]],
      ['b', b],
    ]),
  ).upper;

describe('limit of an item', () => {
  it('is the stated one where the allowance reaches further', () => {
    expect(upper(search('up', limited(3.12), limited(3.2), limited(3.15)))).toEqual({
      limit: 3.1,
      origin: 'stated',
      allowance: {
        kind: 'limited',
        tightest: 3.12,
        loosest: 3.2,
        byEstimate: [
          { side: 'low', permitted: 3.12 },
          { side: 'middle', permitted: 3.2 },
          { side: 'high', permitted: 3.15 },
        ],
        partly: false,
      },
    });
  });

  it('is the calculated one where that is tighter, on either side', () => {
    const both = [search('down', limited(2.95), limited(2.92), free), search('up', free, free, limited(3.02))];
    const { lower, upper: high } = heldLimits(item, new Map([['a', both]]));
    expect([lower.limit, lower.origin, high.limit, high.origin]).toEqual([2.95, 'calculated', 3.02, 'calculated']);
    expect(lower.allowance).toMatchObject({ tightest: 2.95, loosest: 2.92 });
  });

  it('is the tightest over the boards', () => {
    const found = upper(search('up', free, free, limited(3.05)), search('up', free, limited(3.08), limited(3.03)));
    expect(found).toMatchObject({ limit: 3.03, origin: 'calculated', allowance: { tightest: 3.03, loosest: 3.08 } });
  });

  it('names the model that the analysis asks for where it has a ceiling, and takes no limit from it', () => {
    const ceiling = { model: 'groiss', from: 0.4e-6 } as const;
    const side = upper({ ...search('up', free, free, limited(3.05)), ceiling });
    expect(side).toMatchObject({ limit: 3.05, origin: 'calculated', ceiling });
    expect(upper(search('up', free, free, limited(3.05)))).not.toHaveProperty('ceiling');
  });

  it('is not signed on the lower estimates alone', () => {
    expect(upper(search('up', limited(3.02), limited(3.01), failed))).toMatchObject({
      limit: 3.1,
      origin: 'stated',
      allowance: { kind: 'not met at nominal' },
    });
    // Another board still limits; the one that does not meet sets nothing.
    expect(upper(search('up', limited(3.01), free, failed), search('up', free, free, limited(3.05)))).toMatchObject({
      limit: 3.05,
      origin: 'calculated',
      allowance: { partly: true },
    });
  });

  it('says when a board does not meet at nominal, in whole or in part', () => {
    expect(upper(search('up', failed, failed, failed)).allowance).toEqual({ kind: 'not met at nominal' });
    expect(upper(search('up', free, free, free), search('up', failed, failed, failed)).allowance).toEqual({
      kind: 'not met at nominal',
    });
    expect(upper(search('up', failed, limited(3.2), limited(3.2))).allowance).toMatchObject({
      kind: 'limited',
      partly: true,
    });
  });

  it('is stated alone where nothing was searched or nothing limits', () => {
    expect(heldLimits(item, new Map()).lower).toEqual({
      limit: 2.9,
      origin: 'stated',
      allowance: { kind: 'not computed' },
    });
    expect(upper(search('up', free, free, free)).allowance).toEqual({ kind: 'not limited', searchedTo: 3.3 });
  });
});
