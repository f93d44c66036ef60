import { z } from 'zod';
import { declared, figure, id, invented, numberFigure, quantity, range, ratioFigure, text } from './fields.js';
import { textureDocument } from './texture-document.js';

const identity = (what: string) => ({
  id: id(`Name by which boards refer to the ${what}.`),
  maker: text('Who makes it.'),
  name: text('Trade name.'),
  invented: invented(),
});

const laminate = z
  .strictObject({
    ...identity('laminate'),
    permittivity: numberFigure('Relative permittivity of the laminate.', 1, 20, {
      extra: {
        kind: z
          .enum(['bulk', 'design'])
          .describe(
            'bulk: process value of the dielectric alone. design: fitted on lines with a named foil, so part of the roughness effect is already in it.',
          ),
        fitted_on: z
          .strictObject({
            foil: id('Foil of the lines on which a design value was fitted.'),
            thickness: quantity(
              'length',
              'Laminate thickness of those lines.',
              range(20e-6, 3e-3, 'the thickness of a laminate', 'mm'),
            ),
          })
          .describe('For a design value: the foil and thickness on which it was fitted.')
          .optional(),
      },
    }),
    loss_tangent: numberFigure('Loss tangent of the laminate.', 0, 0.1),
    permittivity_temperature_coefficient: figure(
      'temperature_coefficient',
      'Relative change of the permittivity per kelvin.',
      range(-2e-3, 2e-3, 'the temperature coefficient of a permittivity', 'ppm/K'),
    ).optional(),
    loss_tangent_temperature_coefficient: figure(
      'temperature_coefficient',
      'Relative change of the loss tangent per kelvin.',
      range(-0.05, 0.05, 'the temperature coefficient of a loss tangent', '%/K'),
    ).optional(),
    in_plane_permittivity: numberFigure(
      'Relative permittivity in the plane of the board, where it differs. Left out: taken as equal, and said so.',
      1,
      20,
    ).optional(),
    water: z
      .strictObject({
        uptake: ratioFigure(
          'Share of mass that the laminate takes up as water in service, as a ratio or in %.',
          range(0, 0.05, 'the water uptake of a laminate', '%'),
          { floor: 0 },
        ),
        permittivity_per_share: z
          .number()
          .min(0)
          .max(200)
          .describe('Relative rise of the permittivity per unit of that share: 10 makes 0.04 % of water 0.4 %.')
          .optional(),
        loss_tangent_per_share: z
          .number()
          .min(0)
          .max(50)
          .describe('Rise of the loss tangent itself per unit of that share: 1 makes 0.04 % of water 0.0004.')
          .optional(),
      })
      .meta({
        description: 'Water in service, between none and the uptake stated. One of the two effects is needed.',
        anyOf: [{ required: ['permittivity_per_share'] }, { required: ['loss_tangent_per_share'] }],
      })
      .optional(),
    declared: declared().optional(),
  })
  .describe('One laminate.');

const conductivity = (what: string) =>
  figure(
    'conductivity',
    `Conductivity of the ${what} at 20 degC.`,
    range(1e5, 7e7, `the conductivity of a ${what}`, 'MS/m'),
    {
      floor: 1,
    },
  );

const foil = z
  .strictObject({
    ...identity('foil'),
    conductivity: conductivity('metal'),
    temperature_coefficient: quantity(
      'temperature_coefficient',
      'Temperature coefficient of resistivity at 20 degC.',
      range(0, 0.01, 'the temperature coefficient of copper', '%/K'),
    ),
    treated_face: textureDocument().describe('Texture of the treated face.'),
    untreated_face: textureDocument().describe('Texture of the untreated face.'),
    declared: declared().optional(),
  })
  .describe('One copper foil.');

const finish = z
  .strictObject({
    id: id('Name by which boards refer to the finish.'),
    name: text('Name of the finish.'),
    invented: invented(),
    layers: z
      .array(
        z
          .strictObject({
            material: text('Material of the layer.'),
            conductivity: conductivity('metal'),
            thickness: figure(
              'length',
              'Thickness of the layer.',
              range(5e-9, 50e-6, 'the thickness of a finish layer', 'um'),
              { floor: 0 },
            ),
            relative_permeability: z
              .number()
              .min(0.5)
              .max(1000)
              .describe('Relative permeability at the band; 1 when not magnetic.'),
          })
          .describe('One plated layer.'),
      )
      .max(6)
      .describe('Layers from the copper outward; an empty list for bare copper.'),
    declared: declared().optional(),
  })
  .describe('One finish of the copper.');

const list = <S extends z.ZodType>(item: S, what: string) =>
  z.array(item).min(1).max(200).describe(`The ${what} of this library.`);

export const laminatesDocument = z
  .strictObject({ laminates: list(laminate, 'laminates') })
  .describe('A library of laminates.');
export const foilsDocument = z.strictObject({ foils: list(foil, 'foils') }).describe('A library of copper foils.');
export const finishesDocument = z
  .strictObject({ finishes: list(finish, 'finishes') })
  .describe('A library of finishes.');

export type LaminateDocument = z.infer<typeof laminate>;
export type FoilDocument = z.infer<typeof foil>;
export type FinishDocument = z.infer<typeof finish>;
