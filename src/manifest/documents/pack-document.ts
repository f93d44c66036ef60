import { z } from 'zod';
import { date, exactlyOne, id, quantity, range, reference, revision, text, words } from './fields.js';

const library = (what: string) =>
  z
    .array(reference(`A file of ${what}.`))
    .min(1)
    .max(50)
    .describe(`Files of ${what}.`);

const hideable = () =>
  words(
    z
      .string()
      .regex(
        /^(?:cost|authors|descriptions|sources|review|declared|(?:boards|requirements|declared)\/[a-z0-9]+(?:-[a-z0-9]+)*)$/u,
      )
      .describe(
        'cost, authors, descriptions (of boards), sources (of requirements), review, declared (properties and the requirements on them), declared/<id>, boards/<id> or requirements/<id>.',
      ),
    'one of cost, authors, descriptions, sources, review, declared, declared/<id>, boards/<id>, requirements/<id>',
  );

/** Boards judged together against one requirement set. */
export const packDocument = z
  .strictObject({
    id: id('Name of the pack in addresses and file names.'),
    title: text('Title of the pack.'),
    document_number: text('Document number in the title block (ISO 7200 identification number).'),
    revision: revision('Revision of the pack, in quotes when it is a number.'),
    date: date('Date of issue.'),
    status: z.enum(['draft', 'for_review', 'released']).describe('Status of the document.'),
    authors: z.array(text('A name.')).min(1).max(20).describe('Who wrote it.'),
    owner: text('Legal owner of the document.'),
    notice: text('Printed on every page, for instance that the data are invented.').optional(),
    marking: text('Who may see it, printed on every page. Left out: "internal: not for suppliers".').optional(),
    review: reference('The review of the pack: decision, open points, concessions, approvals.').optional(),
    procurement: reference('What is asked of suppliers: one sheet a recipient.').optional(),
    previous: z
      .strictObject({
        revision: revision('Previous revision, found in the output folder of this pack.').optional(),
        data: reference('Data of the previous revision: its data/pack.json, kept under the root.').optional(),
      })
      .meta({
        description:
          'The revision that this one follows; the pages begin with what changed since. Exactly one of revision and data.',
        ...exactlyOne('revision', 'data'),
      })
      .optional(),
    boards: z.array(reference('A board file.')).min(1).max(40).describe('Board files, in the order of the comparison.'),
    variants: z
      .array(reference('A table of variants.'))
      .min(1)
      .max(10)
      .describe(
        'CSV tables of candidates, one row a board: columns id, title, based_on, then paths of plain values in a board file; an empty cell inherits, ~ drops the inherited key, a list is parted by semicolons.',
      )
      .optional(),
    audiences: z
      .array(
        z
          .strictObject({
            id: id('Name of the audience, as given to --audience.'),
            marking: text(
              'Who may see the copy, printed on every page of it; that of the pack when left out.',
            ).optional(),
            hide: z.array(hideable()).min(1).max(200).describe('What its copy leaves out.'),
          })
          .describe('One audience.'),
      )
      .min(1)
      .max(20)
      .describe('Readers who get a copy of the pack with entries left out, built with --audience.')
      .optional(),
    requirements: reference('The requirement set that all boards are judged against.'),
    libraries: z
      .strictObject({
        laminates: library('laminates'),
        foils: library('foils'),
        finishes: library('finishes'),
      })
      .describe('Libraries of materials that boards refer to by id; several packs may share them.'),
    analysis: z
      .strictObject({
        roughness_model: z
          .enum(['band', 'hammerstad', 'groiss', 'gradient'])
          .describe(
            'What stands behind the nominal figures: band (when left out), the middle estimate for what is known of each face, or a published model. The spread from low to high estimate is always evaluated.',
          )
          .optional(),
        frequency_step: quantity(
          'frequency',
          'Largest frequency step over the band.',
          range(1e6, 5e9, 'the frequency step', 'MHz'),
        ),
        full_wave: z
          .enum(['on', 'off'])
          .describe(
            'on (when left out): the full-wave engine solves every board at some frequencies of its band, and the figures of the network are corrected by it. off: the network alone, and wider uncertainty.',
          )
          .optional(),
      })
      .describe('How the boards are analysed.'),
  })
  .describe('A pack: boards judged together against one requirement set.');

export type PackDocument = z.infer<typeof packDocument>;
