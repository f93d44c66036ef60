import { UsageError } from './errors.js';

/** The last second of the year 9999; PDF has no form for later dates. */
const latest = 253402300799;

/**
 * Reads SOURCE_DATE_EPOCH, the time that reproducible builds put in the place of "now"
 * (https://reproducible-builds.org/specs/source-date-epoch/): seconds since 1970 as a decimal number.
 */
export function sourceDateEpoch(text: string | undefined): number | undefined {
  if (text === undefined || text === '') return undefined;
  if (!/^\d{1,12}$/.test(text) || Number(text) > latest) {
    throw new UsageError(`SOURCE_DATE_EPOCH is "${text}"; it must be a whole number of seconds since 1970-01-01`);
  }
  return Number(text);
}
