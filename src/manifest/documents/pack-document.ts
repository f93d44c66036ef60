import { z } from 'zod';
import { date, id, quantity, range, reference, revision, text } from './fields.js';

const library = (what: string) =>
  z
    .array(reference(`A file of ${what}.`))
    .min(1)
    .max(50)
    .describe(`Files of ${what}.`);

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
    boards: z.array(reference('A board file.')).min(1).max(40).describe('Board files, in the order of the comparison.'),
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
          .enum(['hammerstad', 'groiss', 'gradient'])
          .describe('Roughness model behind the nominal figures. The spread over all models is always evaluated.'),
        frequency_step: quantity(
          'frequency',
          'Largest frequency step over the band.',
          range(1e6, 5e9, 'the frequency step', 'MHz'),
        ),
      })
      .describe('How the boards are analysed.'),
  })
  .describe('A pack: boards judged together against one requirement set.');

export type PackDocument = z.infer<typeof packDocument>;
