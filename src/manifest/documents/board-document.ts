import { z } from 'zod';
import { arrayDocument } from './array-document.js';
import { feedDocument } from './feed-document.js';
import { declared, figure, id, numberFigure, quantity, range, statement, text } from './fields.js';
import { textureDocument } from './texture-document.js';

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
    array: arrayDocument,
    feed: feedDocument,
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
