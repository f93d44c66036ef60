import { expect, it } from 'vitest';
import { UsageError } from '../../src/cli/errors.js';
import { sourceDateEpoch } from '../../src/cli/source-date.js';

it('reads a whole number of seconds; absent or empty is none', () => {
  expect(sourceDateEpoch('1767225600')).toBe(1767225600);
  expect(sourceDateEpoch('0')).toBe(0);
  expect(sourceDateEpoch(undefined)).toBeUndefined();
  expect(sourceDateEpoch('')).toBeUndefined();
});

it.each(['-1', '1.5', 'today', '1e9', ' 1', '253402300800', '9'.repeat(30)])('refuses "%s"', (text) => {
  expect(() => sourceDateEpoch(text)).toThrow(UsageError);
});
