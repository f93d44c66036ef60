/**
 * Surface impedance of each copper face of a board at a frequency and temperature, under one view of its texture.
 */
import type { Board } from '../manifest/model.js';
import { complex } from '../numerics/complex.js';
import type { Slab } from '../physics/column/index.js';
import { MU0 } from '../physics/constants.js';
import type { FaceImpedances } from '../physics/line/index.js';
import { conductivityAt, platedImpedance, surfaceResistance } from '../physics/material/index.js';
import { overFlatImpedance, type RoughFace, referToElectrostaticPlane } from '../physics/roughness/index.js';
import type { ValidityFlag } from '../physics/validity.js';
import { faceUnder } from './face-view.js';
import { laminateNow } from './laminate.js';
import type { BoardValues, FaceTexture } from './values.js';
import type { RoughnessView } from './views.js';

export interface Surfaces {
  readonly slab: Slab;
  /** Of the slab for the feed line: another than the columns' only where the laminate differs in its plane. */
  readonly linePermittivity: number;
  /** Between the electrostatic plane of the underside and the top, m. */
  readonly stripThickness: number;
  readonly faces: FaceImpedances;
  /** Parts of each face's resistance, ohm: bare smooth copper, what the finish adds, what the texture adds. */
  readonly parts: Readonly<Record<keyof FaceImpedances, { smooth: number; finish: number; texture: number }>>;
  readonly flags: readonly ValidityFlag[];
}

/** Words for the faces that flags concern. */
export const FACE_WORDS = {
  underside: 'strip underside',
  ground: 'ground',
  outer: 'strip top and edges',
} as const;
export type FacePlace = keyof typeof FACE_WORDS;

/**
 * Faces to the laminate are referred to their electrostatic planes and the slab made thinner by as much, so that one
 * height serves capacitance and inductance. Where the permittivity is a design value, fitted on lines with foil on, the
 * slowing of the wave by texture is in it already: then only the loss of the texture is taken.
 *
 * @param slowing overrides that, to see what texture does to the wave by itself
 */
export function surfaces(
  board: Board,
  values: BoardValues,
  view: RoughnessView,
  frequency: number,
  temperatureC: number,
  slowing = board.stackUp.laminate.material.permittivityKind === 'bulk',
): Surfaces {
  const { strip, ground } = board.stackUp;
  const laminate = laminateNow(board, values, frequency, temperatureC);
  const { permittivity, lossTangent } = laminate;
  const stripSigma = conductivityAt(values.stripConductivity, temperatureC, strip.foil.temperatureCoefficient);
  const groundSigma = conductivityAt(values.groundConductivity, temperatureC, ground.foil.temperatureCoefficient);

  const towardsLaminate = (texture: FaceTexture, conductivity: number) => {
    const face = faceUnder(view, texture, { frequency, conductivity, permittivity });
    const smooth = surfaceResistance(frequency, conductivity);
    const referred = slowing
      ? referToElectrostaticPlane(face)
      : { impedance: complex(face.impedance.re, smooth), heightReduction: 0 };
    return { face, ...referred, parts: { smooth, finish: 0, texture: face.impedance.re - smooth } };
  };
  const underside = towardsLaminate(values.underside, stripSigma);
  const groundFace = towardsLaminate(values.ground, groundSigma);

  const smooth = surfaceResistance(frequency, stripSigma);
  const layers = strip.finish.layers.map((layer, i) => ({
    conductivity: values.finishConductivity[i],
    thickness: values.finishThickness[i],
    relativePermeability: layer.relativePermeability,
  }));
  const flat = platedImpedance(frequency, stripSigma, layers);
  // The half space with the flat layers' resistance feels the texture as they do.
  const equal = (Math.PI * frequency * MU0) / (flat.re * flat.re);
  const outer: RoughFace = overFlatImpedance(
    faceUnder(view, values.outer, { frequency, conductivity: equal, permittivity: 1 }),
    flat,
  );
  const outerParts = { smooth, finish: flat.re - smooth, texture: outer.impedance.re - flat.re };
  return {
    slab: {
      permittivity,
      lossTangent,
      height: values.height - underside.heightReduction - groundFace.heightReduction,
    },
    linePermittivity: laminate.linePermittivity,
    stripThickness: values.stripThickness + underside.heightReduction,
    faces: {
      underside: underside.impedance,
      top: outer.impedance,
      edges: outer.impedance,
      ground: groundFace.impedance,
    },
    parts: { underside: underside.parts, top: outerParts, edges: outerParts, ground: groundFace.parts },
    flags: [
      ...laminate.flags,
      ...ofFace(underside.face, 'underside'),
      ...ofFace(groundFace.face, 'ground'),
      ...ofFace(outer, 'outer'),
    ],
  };
}

/** Flags with the face they concern, so that one face's cannot hide another's. */
const ofFace = ({ flags }: RoughFace, place: FacePlace): ValidityFlag[] =>
  flags.map((flag) => ({ ...flag, code: `${flag.code}@${place}` }));
