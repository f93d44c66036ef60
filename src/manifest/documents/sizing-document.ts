import { z } from 'zod';
import { exactlyOne, quantity, range, statement } from './fields.js';
import { MOST_PATCHES } from './layout-fields.js';

const sidelobes = (what: string) => quantity('level', what, range(10, 60, 'a sidelobe level below the beam', 'dB'));

const taper = z.union([
  z.literal('uniform').describe('All patches alike.'),
  z
    .strictObject({
      dolph_chebyshev: sidelobes('All sidelobes at this level below the beam.').optional(),
      taylor: z
        .strictObject({
          sidelobe: sidelobes('Level of the first sidelobes below the beam.'),
          n_bar: z.int().min(2).max(20).describe('Sidelobes held at that level, plus one.'),
        })
        .describe('Taylor distribution: the first sidelobes at one level, the others falling.')
        .optional(),
      given: z
        .array(z.number().gt(0).max(1e6).describe('Relative amplitude of a patch, above 0.'))
        .min(2)
        .max(MOST_PATCHES)
        .describe('Relative amplitude of every patch, from the feed.')
        .optional(),
    })
    .meta({
      description: 'Amplitudes with a name: exactly one of dolph_chebyshev, taylor, given.',
      ...exactlyOne('dolph_chebyshev', 'taylor', 'given'),
    }),
]);

/** A column that is worked out by the program in place of drawn dimensions. */
export const sizedForDocument = statement(
  z
    .strictObject({
      frequency: quantity(
        'frequency',
        'Frequency at which match, beam and sidelobes are sought; it lies in the band.',
        range(1e9, 300e9, 'the frequency of a board', 'GHz'),
      ),
      patches: z.int().min(2).max(MOST_PATCHES).describe('Number of patches in a column.'),
      taper: statement(
        taper.describe('Amplitudes along the column: uniform, or a map of dolph_chebyshev, taylor or given.'),
        { what: 'a taper' },
      ),
      least_width: quantity(
        'length',
        'Narrowest copper that the board maker holds.',
        range(10e-6, 1e-3, 'the narrowest copper', 'um'),
      ),
      least_gap: quantity(
        'length',
        'Narrowest gap that the board maker holds.',
        range(10e-6, 1e-3, 'the narrowest gap', 'um'),
      ),
      grid: quantity('length', 'All dimensions are multiples of this.', range(0.1e-6, 50e-6, 'the grid', 'um')),
    })
    .describe(
      'In place of patches and links: every column is sized by the program for match, a beam at broadside and the sidelobes asked for. Feed line, number and pitch of columns stay as given.',
    ),
  { what: 'what a column is sized for' },
);

export type SizedForDocument = z.infer<typeof sizedForDocument>;
