import type { Board } from '../manifest/model.js';
import { places } from './places.js';
import { type BoardValues, faceTexture } from './values.js';

/** A board's values with every figure at its nominal. */
export function nominalValues(board: Board): BoardValues {
  const { strip, ground, cover } = board.stackUp;
  const empty: BoardValues = {
    permittivity: Number.NaN,
    lossTangent: Number.NaN,
    permittivityTemperatureCoefficient: 0,
    lossTangentTemperatureCoefficient: 0,
    waterShare: 0,
    height: Number.NaN,
    stripThickness: Number.NaN,
    etch: 0,
    stripConductivity: Number.NaN,
    groundConductivity: Number.NaN,
    underside: faceTexture(strip.dielectricFace.texture),
    outer: faceTexture(strip.outerFace.texture),
    ground: faceTexture(ground.dielectricFace.texture),
    finishConductivity: strip.finish.layers.map(() => Number.NaN),
    finishThickness: strip.finish.layers.map(() => Number.NaN),
    ...(cover ? { cover: { permittivity: Number.NaN, lossTangent: Number.NaN, thickness: Number.NaN } } : {}),
    feedLossDb: board.feed.map(() => 0),
  };
  return places(board).reduce((values, place) => place.set(values, place.figure.value), empty);
}
