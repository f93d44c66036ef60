import { RQ_CONVERSIONS } from '../physics/texture/index.js';
import type { BoardDocument } from './documents/board-document.js';
import {
  type FinishDocument,
  type FoilDocument,
  type LaminateDocument,
  TEXTURE_PARAMETERS,
  type TextureDocument,
} from './documents/library-documents.js';
import { figureOf, si } from './figures.js';
import type { DeclaredProperty, Finish, Foil, Laminate, Texture } from './model.js';

type DeclaredDocument = NonNullable<BoardDocument['declared']>;

export const declaredOf = (doc: DeclaredDocument | undefined): readonly DeclaredProperty[] => doc ?? [];

/** Texture with its Rq, converted where another parameter is stated, the doubt of the conversion added; never below 0. */
export function textureOf(doc: TextureDocument, path: string): Texture {
  const parameter = TEXTURE_PARAMETERS.find((p) => doc[p] !== undefined);
  if (parameter === undefined) throw new Error(`unchecked texture ${path} reached the model`);
  const stated = figureOf(doc[parameter]!, 'length', `${path}.${parameter}`);
  const { factor, low, high, assumption } = RQ_CONVERSIONS[parameter];
  const value = stated.value * factor;
  return {
    rq: {
      ...stated,
      value,
      minus: Math.min(value, stated.minus * factor + stated.value * (factor - low)),
      plus: stated.plus * factor + stated.value * (high - factor),
    },
    stated: { parameter, value: stated.value },
    ...(assumption ? { conversion: assumption } : {}),
    ...(doc.instrument === undefined ? {} : { instrument: doc.instrument }),
    ...(doc.filter === undefined ? {} : { filter: doc.filter }),
  };
}

export function laminateOf(doc: LaminateDocument, file: string): Laminate {
  const at = (key: string) => `${file}: ${doc.id}.${key}`;
  const {
    permittivity,
    permittivity_temperature_coefficient: drift,
    loss_tangent_temperature_coefficient: lossDrift,
  } = doc;
  return {
    id: doc.id,
    maker: doc.maker,
    name: doc.name,
    invented: doc.invented,
    permittivityKind: permittivity.kind,
    ...(permittivity.fitted_on
      ? { fittedOn: { foil: permittivity.fitted_on.foil, thickness: si(permittivity.fitted_on.thickness, 'length') } }
      : {}),
    permittivity: figureOf(permittivity, 'number', at('permittivity')),
    lossTangent: figureOf(doc.loss_tangent, 'number', at('loss_tangent')),
    ...(drift
      ? {
          permittivityTemperatureCoefficient: figureOf(
            drift,
            'temperature_coefficient',
            at('permittivity_temperature_coefficient'),
          ),
        }
      : {}),
    ...(lossDrift
      ? {
          lossTangentTemperatureCoefficient: figureOf(
            lossDrift,
            'temperature_coefficient',
            at('loss_tangent_temperature_coefficient'),
          ),
        }
      : {}),
    declared: declaredOf(doc.declared),
  };
}

export function foilOf(doc: FoilDocument, file: string): Foil {
  const at = (key: string) => `${file}: ${doc.id}.${key}`;
  return {
    id: doc.id,
    maker: doc.maker,
    name: doc.name,
    invented: doc.invented,
    conductivity: figureOf(doc.conductivity, 'conductivity', at('conductivity')),
    temperatureCoefficient: si(doc.temperature_coefficient, 'temperature_coefficient'),
    treatedFace: textureOf(doc.treated_face, at('treated_face')),
    untreatedFace: textureOf(doc.untreated_face, at('untreated_face')),
    declared: declaredOf(doc.declared),
  };
}

export function finishOf(doc: FinishDocument, file: string): Finish {
  return {
    id: doc.id,
    name: doc.name,
    invented: doc.invented,
    layers: doc.layers.map((layer, i) => ({
      material: layer.material,
      conductivity: figureOf(layer.conductivity, 'conductivity', `${file}: ${doc.id}.layers[${i}].conductivity`),
      thickness: figureOf(layer.thickness, 'length', `${file}: ${doc.id}.layers[${i}].thickness`),
      relativePermeability: layer.relative_permeability,
    })),
    declared: declaredOf(doc.declared),
  };
}
