import { z } from 'zod';
import {
  declared,
  exactlyOne,
  figure,
  id,
  invented,
  numberFigure,
  quantity,
  range,
  statement,
  text,
} from './fields.js';

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
    declared: declared().optional(),
  })
  .describe('One laminate.');

const PARAMETERS = ['Rq', 'Sq', 'Ra', 'Sa', 'Rz', 'Sz'] as const;
const height = (name: string) =>
  figure('length', name, range(0, 50e-6, 'the roughness of a copper face', 'um'), { floor: 0 }).optional();

/** Texture of one copper face: exactly one height parameter. */
export const textureDocument = () =>
  statement(
    z
      .strictObject({
        Rq: height('Root-mean-square height of the profile (ISO 21920).'),
        Sq: height('Root-mean-square height of the surface (ISO 25178), taken as Rq.'),
        Ra: height('Arithmetic mean height of the profile (ISO 21920), converted to Rq.'),
        Sa: height('Arithmetic mean height of the surface (ISO 25178), converted to Rq.'),
        Rz: height('Maximum height of the profile (ISO 21920), converted to Rq.'),
        Sz: height('Maximum height of the surface (ISO 25178), converted to Rq.'),
        instrument: text('Instrument with which the face was measured.').optional(),
        filter: text('Filters (nesting indices) of the evaluation.').optional(),
      })
      .meta({
        description: 'Texture of a copper face: exactly one of Rq, Sq, Ra, Sa, Rz, Sz.',
        ...exactlyOne(...PARAMETERS),
      }),
    { what: 'a texture' },
  );

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
export type TextureDocument = z.infer<ReturnType<typeof textureDocument>>;
export type FoilDocument = z.infer<typeof foil>;
export type FinishDocument = z.infer<typeof finish>;
export const TEXTURE_PARAMETERS = PARAMETERS;
