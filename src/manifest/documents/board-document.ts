import { z } from 'zod';
import { declared, exactlyOne, figure, id, numberFigure, quantity, range, statement, text } from './fields.js';
import { textureDocument } from './texture-document.js';

const MOST_COLUMNS = 64;
const MOST_PATCHES = 64;

const copperThickness = () =>
  figure('length', 'Finished thickness of the copper.', range(1e-6, 200e-6, 'the thickness of copper', 'um'), {
    floor: 1e-7,
  });
const dielectricFace = () =>
  z.enum(['treated', 'untreated']).describe('Which face of the foil lies towards the laminate.');

const stackUp = z
  .strictObject({
    cover: z
      .strictObject({
        material: text('What the cover is, for instance solder mask.'),
        permittivity: numberFigure('Relative permittivity of the cover.', 1, 20),
        loss_tangent: numberFigure('Loss tangent of the cover.', 0, 0.2),
        thickness: figure(
          'length',
          'Thickness of the cover above the laminate.',
          range(1e-6, 3e-3, 'the thickness of a cover layer', 'um'),
          { floor: 0 },
        ),
      })
      .describe('Layer over the strips. Figures that depend on it are not evaluated.')
      .optional(),
    strip: z
      .strictObject({
        foil: id('Id of the foil.'),
        thickness: copperThickness(),
        finish: id('Id of the finish on top and edges.'),
        outer_face: statement(
          z
            .strictObject({
              kind: z
                .enum(['foil', 'plated', 'micro_etched'])
                .describe("The foil's own outer face, or one changed by plating or micro-etching."),
              texture: textureDocument().describe('Texture of a plated or micro-etched outer face.').optional(),
            })
            .meta({
              description: 'The face away from the laminate.',
              if: { properties: { kind: { const: 'foil' } } },
              // biome-ignore lint/suspicious/noThenProperty: a JSON Schema keyword
              then: { not: { required: ['texture'] } },
              else: { required: ['texture'] },
            }),
          { what: 'an outer face' },
        ),
        dielectric_face: dielectricFace(),
      })
      .describe('Copper of patches and lines.'),
    laminate: z
      .strictObject({
        material: id('Id of the laminate.'),
        thickness: figure(
          'length',
          'Thickness between the mean planes of the copper faces.',
          range(20e-6, 3e-3, 'the thickness of a laminate', 'mm'),
          { floor: 1e-6 },
        ),
      })
      .describe('Dielectric between strip and ground.'),
    ground: z
      .strictObject({ foil: id('Id of the foil.'), thickness: copperThickness(), dielectric_face: dielectricFace() })
      .describe('Copper of the ground plane.'),
    below: z
      .array(
        z
          .strictObject({
            name: text('What the layer is.'),
            thickness: quantity('length', 'Its thickness.', range(1e-6, 20e-3, 'the thickness of a layer', 'mm')),
          })
          .describe('One layer.'),
      )
      .max(50)
      .describe('Layers below the ground, downward: declared and drawn, not computed.')
      .optional(),
  })
  .describe('Layers from the radiating side downward.');

const width = (of: string) =>
  quantity('length', `Width of ${of}, across the column.`, range(20e-6, 20e-3, `the width of ${of}`, 'mm'));
const length = (of: string) =>
  quantity('length', `Length of ${of}, along the column.`, range(20e-6, 20e-3, `the length of ${of}`, 'mm'));
const lineLength = (of: string) => quantity('length', `Length of ${of}.`, range(0, 0.5, `the length of ${of}`, 'mm'));

/** A regular or mirrored row of like pieces. */
function row<X extends z.ZodRawShape>(of: string, extra: X, description: string) {
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
const piece = (of: string) => z.strictObject({ width: width(of), length: length(of) }).describe(`One of ${of}s.`);

const array = z
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
        .describe('Patches of a column from the feed to the open end: a list of each, or a short form.'),
      { what: 'the patches' },
    ),
    links: statement(
      z
        .union([
          z.array(piece('a link')).max(MOST_PATCHES).describe('Every link, from the feed: one fewer than patches.'),
          row('a link', {}, 'Links in short form; there is one fewer than patches.'),
        ])
        .describe('Lines between neighbouring patches. Left out when a column has one patch.'),
      { what: 'the links' },
    ).optional(),
    offset_x: z
      .array(quantity('length', 'Offset of a column.', range(-0.1, 0.1, 'the offset of a column', 'mm')))
      .min(1)
      .max(MOST_COLUMNS)
      .describe('Offset of each column along its own direction, for staggered columns. All 0 when left out.')
      .optional(),
    retune: z
      .enum(['length'])
      .describe(
        'length: patch and link lengths are scaled by one factor, found and printed by the program, so that the match is best at the band centre. For comparing laminates before the layout is redone.',
      )
      .optional(),
  })
  .describe('Series-fed columns of patches; a column runs along +x and is fed at the small-x end.');

const path = z
  .strictObject({
    loss: figure(
      'level',
      'Loss from the gain reference plane to the column.',
      range(0, 30, 'the loss of a feed path', 'dB'),
      { floor: 0 },
    ).optional(),
    line: z
      .strictObject({ width: width('a line'), length: lineLength('a feed path') })
      .describe('Microstrip on this stack-up; its loss is computed.')
      .optional(),
  })
  .meta({
    description: 'Path from the gain reference plane to a column: a loss, or a line.',
    ...exactlyOne('loss', 'line'),
  });

const feed = z
  .strictObject({
    amplitude: z
      .array(z.number().min(0).max(1e6).describe('Amplitude at a column, at least 0.'))
      .min(1)
      .max(MOST_COLUMNS)
      .describe('Relative amplitude of the incident wave at each column; not all 0.'),
    phase: z
      .array(quantity('angle', 'Phase at a column.', range(-100, 100, 'a phase', 'deg')))
      .min(1)
      .max(MOST_COLUMNS)
      .describe('Phase of the incident wave at each column. All 0 when left out.')
      .optional(),
    path: statement(
      z
        .union([path, z.array(path).min(1).max(MOST_COLUMNS).describe('One path per column.')])
        .describe('Path from the gain reference plane to the columns: one for all, or a list.'),
      { what: 'the feed path' },
    ),
  })
  .describe('How the columns are driven.');

const frequency = (what: string) => quantity('frequency', what, range(1e9, 300e9, 'the frequency of a board', 'GHz'));
const temperature = (what: string) =>
  quantity('temperature', what, range(-100, 250, 'the temperature of a board', 'degC'));

/** A board that stands alone. */
export const boardDocument = z
  .strictObject({
    id: id('Name of the board in addresses and file names.'),
    title: text('Title of the board.'),
    based_on: id('Id of another board of the pack whose keys this one inherits.').optional(),
    description: text('What distinguishes the board.').optional(),
    band: z
      .strictObject({ low: frequency('Lower band edge.'), high: frequency('Upper band edge.') })
      .describe('Operating band.'),
    temperature: z
      .strictObject({ low: temperature('Coldest.'), nominal: temperature('Nominal.'), high: temperature('Hottest.') })
      .describe('Operating temperature of the board.'),
    reference_impedance: z
      .union([
        z.literal('line').describe("The feed line's own impedance."),
        quantity('resistance', 'A resistance.', range(1, 1000, 'a reference impedance', 'ohm')),
      ])
      .describe('What reflections refer to: line, or a resistance.'),
    stack_up: stackUp,
    array,
    feed,
    tolerances: z
      .strictObject({
        etch: figure(
          'length',
          'Growth (+) or shrinkage (−) of all copper outlines in width and length, both edges together.',
          range(-0.2e-3, 0.2e-3, 'the etch deviation', 'um'),
        ).optional(),
      })
      .describe('Fabrication tolerances beyond the spreads of the stack-up.')
      .optional(),
    cost: z
      .strictObject({
        amount: z.number().min(0).describe('Cost of one board.'),
        currency: text('Currency, for instance EUR.'),
        basis: text('Quantity, year and what is included.').optional(),
      })
      .describe('Cost of the board.')
      .optional(),
    declared: declared().optional(),
  })
  .describe('A board: stack-up, array, feed and operating conditions.');

export type BoardDocument = z.infer<typeof boardDocument>;
