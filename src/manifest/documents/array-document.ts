import { z } from 'zod';
import { exactlyOne, id, quantity, range, replacing, statement } from './fields.js';
import { columnNumbers, lineLength, MOST_COLUMNS, MOST_PATCHES, piece, row, width } from './layout-fields.js';
import { sizedForDocument } from './sizing-document.js';

const MOST_STEPS = 8;

const offset = (what: string) => quantity('length', what, range(-0.1, 0.1, 'the offset of a column', 'mm'));

/** How every column differs from one that is fed at its near end and open at the other. */
const form = {
  direction: z
    .enum(['forward', 'reversed', 'alternate'])
    .describe(
      'reversed: every column is fed at the large-x end and runs towards the small. alternate: every second one. forward when left out.',
    )
    .optional(),
  offset_x: z
    .array(offset('Offset of a column.'))
    .min(1)
    .max(MOST_COLUMNS)
    .describe('Offset of each column along +x, for staggered columns. All 0 when left out.')
    .optional(),
  stagger: offset('Offset of every second column along +x, in place of offset_x.').optional(),
  dummy_columns: z
    .union([
      z.int().min(1).max(MOST_COLUMNS).describe('How many at each side.'),
      columnNumbers('Which columns, by number from 1.'),
    ])
    .describe(
      'Columns that are never driven: so many at each side, or a list of numbers from 1. They count among columns, and their amplitude in the feed is 0; their feed lines end in the reference impedance.',
    )
    .optional(),
  matching: z
    .array(piece('a matching section'))
    .min(1)
    .max(MOST_STEPS)
    .describe('Sections between feed line and first patch, from the feed line on, such as quarter-wave steps.')
    .optional(),
  inset: statement(
    z
      .strictObject({
        depth: quantity(
          'length',
          'How far the line enters the patch.',
          range(10e-6, 10e-3, 'the depth of an inset', 'mm'),
        ),
        gap: quantity(
          'length',
          'Width of the slot at either side of the line.',
          range(10e-6, 5e-3, 'the gap of an inset', 'mm'),
        ),
      })
      .describe('The line enters the first patch between two slots.'),
    { what: 'an inset' },
  ).optional(),
  side_feed: statement(
    z
      .strictObject({
        link: z.int().min(1).max(MOST_PATCHES).describe('Number of the link, from 1 at the first patch.'),
        side: z
          .enum(['+y', '-y', 'outward'])
          .describe('Side from which the line comes; outward: +y in the upper half of the array, -y in the lower.'),
      })
      .describe('The column is fed in the middle of a link, by a feed line along y.'),
    { what: 'a side feed' },
  ).optional(),
  termination: z
    .strictObject({ width: width('a terminated line') })
    .describe(
      'Travelling wave: a line after the last patch that ends without reflection. The end is open when left out.',
    )
    .optional(),
};

export const arrayDocument = replacing(
  z
    .strictObject({
      columns: z.int().min(1).max(MOST_COLUMNS).describe('Number of columns.'),
      pitch: quantity(
        'length',
        'Distance between the centre lines of neighbouring columns.',
        range(0.1e-3, 0.2, 'the pitch of columns', 'mm'),
      ),
      feed_line: z
        .strictObject({ width: width('a line'), length: lineLength('the feed line') })
        .describe('Line that feeds the first patch of each column.'),
      patches: statement(
        z
          .union([
            z.array(piece('a patch')).min(1).max(MOST_PATCHES).describe('Every patch, from the feed.'),
            row(
              'a patch',
              { count: z.int().min(1).max(MOST_PATCHES).describe('Number of patches in a column.') },
              'Patches in short form.',
            ),
          ])
          .describe(
            'Patches of a column from the feed to the open end: a list of each, or a short form. Either patches or sized_for; in a variant one takes the place of the other.',
          ),
        { what: 'the patches' },
      ).optional(),
      links: statement(
        z
          .union([
            z.array(piece('a link')).max(MOST_PATCHES).describe('Every link, from the feed: one fewer than patches.'),
            row('a link', {}, 'Links in short form; there is one fewer than patches.'),
          ])
          .describe('Lines between neighbouring patches. Left out when a column has one patch.'),
        { what: 'the links' },
      ).optional(),
      sized_for: sizedForDocument.optional(),
      ...form,
      groups: z
        .array(
          z
            .strictObject({
              id: id('Name of the group, for instance tx.'),
              columns: columnNumbers('Its columns, by number from 1.'),
            })
            .describe('One group.'),
        )
        .min(1)
        .max(MOST_COLUMNS)
        .describe('Columns that belong together, such as transmit and receive; isolation is asked for between groups.')
        .optional(),
      scan: z
        .strictObject({
          low: scanAngle('Lowest beam direction.'),
          high: scanAngle('Highest beam direction.'),
        })
        .describe('Beam directions in azimuth over which the active reflection is shown.')
        .optional(),
      retune: z
        .enum(['length'])
        .describe(
          'length: patch and link lengths are scaled by one factor, found and printed by the program, so that the match is best at the band centre. For comparing laminates before the layout is redone.',
        )
        .optional(),
    })
    .meta({
      description:
        'Series-fed columns of patches; a column runs along +x and is fed at the small-x end unless it says otherwise.',
      ...exactlyOne('patches', 'sized_for'),
    }),
  { sized_for: ['patches', 'links'], patches: ['sized_for'], offset_x: ['stagger'], stagger: ['offset_x'] },
);

function scanAngle(what: string) {
  return quantity('angle', what, range(-Math.PI / 2, Math.PI / 2, 'a beam direction', 'deg'));
}

export type ArrayDocument = z.infer<typeof arrayDocument>;
