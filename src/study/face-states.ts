/** What is known of each copper face of a board and what follows from it, at band centre and nominal temperature. */
import type { Board } from '../manifest/model.js';
import { conductivityAt, skinDepth } from '../physics/material/index.js';
import {
  applicableModels,
  type FaceConditions,
  type RoughFace,
  roughFace,
  roughnessBand,
  saturationStatement,
  slowWaveLength,
} from '../physics/roughness/index.js';
import { bandCentre } from './conditions.js';
import { heldTexture } from './face-view.js';
import { laminateNow } from './laminate.js';
import { nominalValues } from './nominal-values.js';
import type { FaceFigures, FaceState } from './results.js';
import type { FaceTexture } from './values.js';
import { ROUGHNESS_SIDES } from './views.js';

export function faceStates(board: Board): FaceState[] {
  const values = nominalValues(board);
  const { strip, ground } = board.stackUp;
  const { nominalC } = board.temperature;
  const frequency = bandCentre(board);
  const { permittivity } = laminateNow(board, values, frequency, nominalC);
  const stripSigma = conductivityAt(values.stripConductivity, nominalC, strip.foil.temperatureCoefficient);
  const groundSigma = conductivityAt(values.groundConductivity, nominalC, ground.foil.temperatureCoefficient);
  const state = (
    place: FaceState['place'],
    face: string,
    texture: FaceTexture,
    conductivity: number,
    onFace: number,
  ): FaceState => ({ face, place, ...stateOf(texture, { frequency, conductivity, permittivity: onFace }) });
  return [
    state('underside', `strip underside (${strip.dielectricFace.kind})`, values.underside, stripSigma, permittivity),
    state('ground', `ground (${ground.dielectricFace.kind})`, values.ground, groundSigma, permittivity),
    state('outer', `strip top and edges (${strip.outerFace.kind}), bare copper`, values.outer, stripSigma, 1),
  ];
}

const figuresOf = (face: RoughFace): FaceFigures => ({
  lossFactor: face.lossFactor,
  reactance: face.reactance,
  planeShift: face.planeShift,
  slowWaveLength: slowWaveLength(face),
});

function stateOf(stated: FaceTexture, conditions: FaceConditions): Omit<FaceState, 'face' | 'place'> {
  const { texture } = heldTexture(stated);
  const band = roughnessBand(texture, conditions);
  const models = applicableModels(texture);
  return {
    rq: texture.rq,
    skinDepth: skinDepth(conditions.frequency, conditions.conductivity),
    known: knownText(texture),
    band: ROUGHNESS_SIDES.map((side) => ({ side, reason: band[side].reason, ...figuresOf(band[side]) })),
    models: models.map((model) => {
      const face = roughFace(model, { ...texture, ...conditions });
      return { model, flags: face.flags, ...figuresOf(face) };
    }),
    narrowing: band.narrowing,
    saturation: models.flatMap((model) => {
      const text = saturationStatement(model, texture, conditions);
      return text === undefined ? [] : [{ model, text }];
    }),
  };
}

/** `Rq, correlation length and lay`. */
function knownText({ rz, correlationLength, developedAreaRatio, nodule, lay }: FaceTexture): string {
  const list = [
    'Rq',
    ...(rz === undefined ? [] : ['Rz']),
    ...(correlationLength === undefined ? [] : ['correlation length']),
    ...(developedAreaRatio === undefined ? [] : ['developed area ratio']),
    ...(nodule === undefined ? [] : ['nodules']),
    ...(lay === undefined ? [] : ['lay']),
  ];
  if (list.length === 1) return 'Rq only';
  return `${list.slice(0, -1).join(', ')} and ${list[list.length - 1]}`;
}
