/**
 * Surface impedance of each copper face of a board at a frequency and temperature, under one roughness model.
 */
import type { Board } from '../manifest/model.js';
import { complex } from '../numerics/complex.js';
import type { Slab } from '../physics/column/index.js';
import type { FaceImpedances } from '../physics/line/index.js';
import { conductivityAt, platedImpedance, surfaceResistance } from '../physics/material/index.js';
import {
  type RoughFace,
  type RoughnessModel,
  referToElectrostaticPlane,
  roughFace,
  roughPlatedFace,
} from '../physics/roughness/index.js';
import type { ValidityFlag } from '../physics/validity.js';
import type { BoardValues } from './values.js';

export interface Surfaces {
  readonly slab: Slab;
  /** Between the electrostatic plane of the underside and the top, m. */
  readonly stripThickness: number;
  readonly faces: FaceImpedances;
  /** Parts of each face's resistance, ohm: bare smooth copper, what the finish adds, what the texture adds. */
  readonly parts: Readonly<Record<keyof FaceImpedances, { smooth: number; finish: number; texture: number }>>;
  readonly flags: readonly ValidityFlag[];
}

/**
 * Faces to the laminate are referred to their electrostatic planes and the slab made thinner by as much, so that one
 * height serves capacitance and inductance. Where the permittivity is a design value, fitted on lines with foil on, the
 * slowing of the wave by texture is in it already: then only the loss of the texture is taken.
 */
export function surfaces(
  board: Board,
  values: BoardValues,
  model: RoughnessModel,
  frequency: number,
  temperatureC: number,
): Surfaces {
  const { strip, ground, laminate } = board.stackUp;
  const rise = temperatureC - board.temperature.nominalC;
  const permittivity = values.permittivity * (1 + values.permittivityTemperatureCoefficient * rise);
  const lossTangent = values.lossTangent * (1 + values.lossTangentTemperatureCoefficient * rise);
  const stripSigma = conductivityAt(values.stripConductivity, temperatureC, strip.foil.temperatureCoefficient);
  const groundSigma = conductivityAt(values.groundConductivity, temperatureC, ground.foil.temperatureCoefficient);
  const slowing = laminate.material.permittivityKind === 'bulk';

  const towardsLaminate = (rq: number, conductivity: number) => {
    const face = roughFace(model, { rq, frequency, conductivity, permittivity });
    const smooth = surfaceResistance(frequency, conductivity);
    const referred = slowing
      ? referToElectrostaticPlane(face)
      : { impedance: complex(face.impedance.re, smooth), heightReduction: 0 };
    return { face, ...referred, parts: { smooth, finish: 0, texture: face.impedance.re - smooth } };
  };
  const underside = towardsLaminate(values.undersideRq, stripSigma);
  const groundFace = towardsLaminate(values.groundRq, groundSigma);

  const smooth = surfaceResistance(frequency, stripSigma);
  const layers = strip.finish.layers.map((layer, i) => ({
    conductivity: values.finishConductivity[i],
    thickness: values.finishThickness[i],
    relativePermeability: layer.relativePermeability,
  }));
  const flat = platedImpedance(frequency, stripSigma, layers);
  const outer: RoughFace = roughPlatedFace(model, flat, { rq: values.outerRq, frequency, permittivity: 1 });
  const outerParts = { smooth, finish: flat.re - smooth, texture: outer.impedance.re - flat.re };
  return {
    slab: {
      permittivity,
      lossTangent,
      height: values.height - underside.heightReduction - groundFace.heightReduction,
    },
    stripThickness: values.stripThickness + underside.heightReduction,
    faces: {
      underside: underside.impedance,
      top: outer.impedance,
      edges: outer.impedance,
      ground: groundFace.impedance,
    },
    parts: { underside: underside.parts, top: outerParts, edges: outerParts, ground: groundFace.parts },
    flags: [...underside.face.flags, ...groundFace.face.flags, ...outer.flags],
  };
}
