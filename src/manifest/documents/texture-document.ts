import { z } from 'zod';
import {
  date,
  exactlyOne,
  figure,
  quantity,
  range,
  ratioFigure,
  reference,
  spread,
  statement,
  text,
} from './fields.js';

/** Heights that Rq is taken or converted from; of these one. */
export const MEAN_HEIGHTS = ['Rq', 'Sq', 'Ra', 'Sa'] as const;
/** Maximum heights: stated beside one of the others, or alone and then converted. */
export const MAXIMUM_HEIGHTS = ['Rz', 'Sz'] as const;
export const TEXTURE_PARAMETERS = [...MEAN_HEIGHTS, ...MAXIMUM_HEIGHTS] as const;
/** What a measured file gives, and what it takes the place of. */
export const MEASURED_INSTEAD = [
  ...TEXTURE_PARAMETERS,
  'Sal',
  'Sal_threshold',
  'correlation_length',
  'Sdr',
  'filter',
] as const;

/** Highest Rq of a copper face, m. */
export const HIGHEST_ROUGHNESS = 50e-6;

const height = (name: string) =>
  figure('length', name, range(0, HIGHEST_ROUGHNESS, 'the roughness of a copper face', 'um'), { floor: 0 }).optional();

const length = (description: string, subject: string) =>
  figure('length', description, range(1e-8, 100e-6, subject, 'um'), { floor: 1e-9 });

const nestingIndex = (description: string) =>
  quantity('length', description, range(1e-8, 1e-2, 'a nesting index', 'um')).optional();

const nodules = statement(
  z
    .strictObject({
      radius: figure('length', 'Radius of a nodule.', range(5e-9, 10e-6, 'the radius of a nodule', 'um'), {
        floor: 1e-9,
      }),
      pitch: figure(
        'length',
        'Distance of neighbouring nodules, centre to centre, at least two radii.',
        range(1e-8, 50e-6, 'the pitch of nodules', 'um'),
        { floor: 1e-9 },
      ).optional(),
      per_area: figure(
        'per_area',
        'Instead of the pitch: nodules, or stacks of them, per area; the pitch is that of a square lattice.',
        range(1e8, 1e16, 'the number of nodules per area', '1/um2'),
        { floor: 1 },
      ).optional(),
      layers: z.int().min(1).max(10).describe('Nodules one above another. 1 when left out.').optional(),
    })
    .meta({
      description:
        'Nodules of the treatment, taken as equal balls on a flat base; from micrographs of face and section.',
      ...exactlyOne('pitch', 'per_area'),
    }),
  { what: 'nodules' },
);

const measured = statement(
  z
    .strictObject({
      file: reference('Measured heights: a profile or a height map as CSV, or an X3P file (ISO 25178-72).'),
      short_nesting_index: nestingIndex(
        'Nesting index of the Gaussian filter that takes out what is finer (profile filter of ISO 21920-3, S-filter of ISO 25178-3). Left out: none.',
      ),
      long_nesting_index: nestingIndex(
        'Nesting index of the Gaussian filter that takes out what is longer (cut-off of a profile, L-filter of a map). Left out: only a tilt is removed.',
      ),
      spread: spread(
        'number',
        'How far other places and lots may lie from this one, as a share of every figure evaluated, such as 15 %. What the finite length leaves open is added.',
      ),
      document: text('Number of the document that the measurement belongs to.').optional(),
      revision: text('Revision of that document, in quotes when it is a number.').optional(),
      date: date('Date of the measurement or its document.').optional(),
    })
    .describe(
      'Instead of stated heights, lengths and area: a measured file, evaluated by the program (ISO 21920-2, ISO 25178-2).',
    ),
  { what: 'a measured texture' },
);

const present = (key: string) => ({ required: [key] });

/** Texture of one copper face: one height or a measured file, and what else is known. */
export const textureDocument = () =>
  statement(
    z
      .strictObject({
        Rq: height('Root-mean-square height of the profile (ISO 21920).'),
        Sq: height('Root-mean-square height of the surface (ISO 25178), taken as Rq.'),
        Ra: height('Arithmetic mean height of the profile (ISO 21920), converted to Rq.'),
        Sa: height('Arithmetic mean height of the surface (ISO 25178), converted to Rq.'),
        Rz: height('Maximum height of the profile (ISO 21920): beside one of the above, or alone and converted to Rq.'),
        Sz: height('Maximum height of the surface (ISO 25178): beside one of the above, or alone and converted to Rq.'),
        Sal: length(
          'Autocorrelation length (ISO 25178), converted to the correlation length. Narrows the band of estimates.',
          'the autocorrelation length of a copper face',
        ).optional(),
        Sal_threshold: z
          .number()
          .min(0.05)
          .max(0.9)
          .describe('Value of the autocorrelation that Sal is taken at. 0.2 when left out.')
          .optional(),
        correlation_length: length(
          'Instead of Sal: distance at which the autocorrelation has fallen to 1/e.',
          'the correlation length of a copper face',
        ).optional(),
        Sdr: ratioFigure(
          'Developed interfacial area ratio (ISO 25178), as a ratio or in %. Narrows the band of estimates.',
          range(1e-6, 20, 'the developed area ratio of a copper face', '%'),
          { floor: 1e-9 },
        ).optional(),
        lay: z
          .enum(['isotropic', 'across', 'along'])
          .describe(
            'How the texture lies to the current along a column: the same in all directions, or grooves across or along it. Left out: not known.',
          )
          .optional(),
        nodules: nodules.optional(),
        measured: measured.optional(),
        instrument: text('Instrument with which the face was measured.').optional(),
        filter: text('Filters (nesting indices) of the evaluation.').optional(),
      })
      .meta({
        description:
          'Texture of a copper face. A height is needed: one of Rq, Sq, Ra, Sa, with Rz or Sz beside it where known; Rz or Sz alone; or a measured file.',
        allOf: [
          { anyOf: [...TEXTURE_PARAMETERS, 'measured'].map(present) },
          ...pairs(MEAN_HEIGHTS).map((keys) => ({ not: { required: keys } })),
          { not: { required: [...MAXIMUM_HEIGHTS] } },
          { not: { required: ['Sal', 'correlation_length'] } },
        ],
        dependentRequired: { Sal_threshold: ['Sal'] },
        dependentSchemas: { measured: { not: { anyOf: MEASURED_INSTEAD.map(present) } } },
      }),
    { what: 'a texture' },
  );

function pairs(keys: readonly string[]): string[][] {
  return keys.flatMap((a, i) => keys.slice(i + 1).map((b) => [a, b]));
}

export type TextureDocument = z.infer<ReturnType<typeof textureDocument>>;
export type MeasuredDocument = NonNullable<TextureDocument['measured']>;
export type NodulesDocument = NonNullable<TextureDocument['nodules']>;
