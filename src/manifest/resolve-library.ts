import type { BoardDocument } from './documents/board-document.js';
import type { FinishDocument, FoilDocument, LaminateDocument } from './documents/library-documents.js';
import type { Measurements } from './evaluated-texture.js';
import { figureOf, si } from './figures.js';
import type { DeclaredProperty, Finish, Foil, Laminate } from './model.js';
import { textureOf } from './resolve-texture.js';

type DeclaredDocument = NonNullable<BoardDocument['declared']>;

export const declaredOf = (doc: DeclaredDocument | undefined): readonly DeclaredProperty[] => doc ?? [];

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
    ...(doc.in_plane_permittivity
      ? { inPlanePermittivity: figureOf(doc.in_plane_permittivity, 'number', at('in_plane_permittivity')) }
      : {}),
    ...(doc.water ? { water: waterOf(doc.water, at('water.uptake')) } : {}),
    declared: declaredOf(doc.declared),
  };
}

function waterOf(
  {
    uptake,
    permittivity_per_share: permittivity,
    loss_tangent_per_share: lossTangent,
  }: NonNullable<LaminateDocument['water']>,
  path: string,
): NonNullable<Laminate['water']> {
  return {
    uptake: figureOf(uptake, 'ratio', path),
    ...(permittivity === undefined ? {} : { permittivityPerShare: permittivity }),
    ...(lossTangent === undefined ? {} : { lossTangentPerShare: lossTangent }),
  };
}

export function foilOf(doc: FoilDocument, file: string, measurements: Measurements): Foil {
  const at = (key: string) => `${file}: ${doc.id}.${key}`;
  return {
    id: doc.id,
    maker: doc.maker,
    name: doc.name,
    invented: doc.invented,
    conductivity: figureOf(doc.conductivity, 'conductivity', at('conductivity')),
    temperatureCoefficient: si(doc.temperature_coefficient, 'temperature_coefficient'),
    treatedFace: textureOf(doc.treated_face, at('treated_face'), measurements),
    untreatedFace: textureOf(doc.untreated_face, at('untreated_face'), measurements),
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
