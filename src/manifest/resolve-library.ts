import type { BoardDocument } from './documents/board-document.js';
import {
  type FinishDocument,
  type FoilDocument,
  type LaminateDocument,
  TEXTURE_PARAMETERS,
  type TextureDocument,
} from './documents/library-documents.js';
import { figureOf, si } from './figures.js';
import type { DeclaredProperty, Finish, Foil, Laminate, Texture, TextureParameter } from './model.js';

type DeclaredDocument = NonNullable<BoardDocument['declared']>;

export const declaredOf = (doc: DeclaredDocument | undefined): readonly DeclaredProperty[] => doc ?? [];

/** sqrt(π/2): Rq over Ra of heights with a normal distribution. */
const RQ_PER_RA = Math.sqrt(Math.PI / 2);
/** Rz over Rq taken for treated copper foil; foils differ, hence the widened spread. */
const RZ_PER_RQ = 5.5;
/** Added to both distances as a share of Rq when it comes from Rz. */
const RZ_WIDENING = 0.25;

interface Conversion {
  readonly factor: number;
  /** Share of the converted value added to its spread. */
  readonly widening: number;
  readonly sentence?: string;
}

const CONVERSIONS: Readonly<Record<TextureParameter, Conversion>> = {
  Rq: { factor: 1, widening: 0 },
  Sq: {
    factor: 1,
    widening: 0,
    sentence:
      'Rq is taken equal to the stated Sq: the root-mean-square height of the surface stands for that of a profile.',
  },
  Ra: {
    factor: RQ_PER_RA,
    widening: 0,
    sentence: 'Rq is 1.2533 times the stated Ra: heights are assumed to have a normal distribution.',
  },
  Sa: {
    factor: RQ_PER_RA,
    widening: 0,
    sentence:
      'Rq is 1.2533 times the stated Sa: heights are assumed to have a normal distribution, and Sq to equal Rq.',
  },
  Rz: {
    factor: 1 / RZ_PER_RQ,
    widening: RZ_WIDENING,
    sentence: 'Rq is the stated Rz divided by 5.5, an assumption; 25 % of Rq is added to its spread on both sides.',
  },
  Sz: {
    factor: 1 / RZ_PER_RQ,
    widening: RZ_WIDENING,
    sentence: 'Rq is the stated Sz divided by 5.5, an assumption; 25 % of Rq is added to its spread on both sides.',
  },
};

/** Texture with its Rq, converted where another parameter is stated; the lower limit never falls below 0. */
export function textureOf(doc: TextureDocument, path: string): Texture {
  const parameter = TEXTURE_PARAMETERS.find((p) => doc[p] !== undefined);
  if (parameter === undefined) throw new Error(`unchecked texture ${path} reached the model`);
  const stated = figureOf(doc[parameter]!, 'length', `${path}.${parameter}`);
  const { factor, widening, sentence } = CONVERSIONS[parameter];
  const value = stated.value * factor;
  const extra = value * widening;
  return {
    rq: {
      ...stated,
      value,
      minus: Math.min(value, stated.minus * factor + extra),
      plus: stated.plus * factor + extra,
    },
    stated: { parameter, value: stated.value },
    ...(sentence ? { conversion: sentence } : {}),
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
