import { z } from 'zod';
import { exactlyOne, quantity, range } from './fields.js';

/** Fields of columns that several parts of a board document share. */
export const MOST_COLUMNS = 64;
export const MOST_PATCHES = 64;

export const width = (of: string) =>
  quantity('length', `Width of ${of}, across the column.`, range(20e-6, 20e-3, `the width of ${of}`, 'mm'));
export const length = (of: string) =>
  quantity('length', `Length of ${of}, along the column.`, range(20e-6, 20e-3, `the length of ${of}`, 'mm'));
export const lineLength = (of: string) =>
  quantity('length', `Length of ${of}.`, range(0, 0.5, `the length of ${of}`, 'mm'));

/** A regular or mirrored row of like pieces. */
export function row<X extends z.ZodRawShape>(of: string, extra: X, description: string) {
  const list = (item: z.ZodString, what: string) =>
    z
      .array(item)
      .min(1)
      .max(MOST_PATCHES)
      .describe(`${what} in order from the feed; the first half and the middle when mirrored.`)
      .optional();
  return z
    .strictObject({
      ...extra,
      width: width(of).optional(),
      widths: list(width(of), 'Widths'),
      length: length(of).optional(),
      lengths: list(length(of), 'Lengths'),
      mirrored: z
        .boolean()
        .describe('true: the lists give the half next to the feed (with the middle), the rest mirrors it.')
        .optional(),
    })
    .meta({ description, allOf: [exactlyOne('width', 'widths'), exactlyOne('length', 'lengths')] });
}
export const piece = (of: string) =>
  z.strictObject({ width: width(of), length: length(of) }).describe(`One of ${of}s.`);

/** Columns by their numbers, as people count them. */
export const columnNumbers = (description: string) =>
  z
    .array(z.int().min(1).max(MOST_COLUMNS).describe('Number of a column, from 1.'))
    .min(1)
    .max(MOST_COLUMNS)
    .describe(description);
