/** Curves of the copper chapter: every published model that applies, and the band of what is known. */
import type { Analysis, Board } from '../manifest/model.js';
import { conductivityAt } from '../physics/material/index.js';
import { applicableModels, type RoughnessModel } from '../physics/roughness/index.js';
import { boardLine, effectivePermittivity, feedWidth, lossDbPerM } from './board-line.js';
import { bandCentre, frequencies } from './conditions.js';
import { faceUnder } from './face-view.js';
import { laminateNow } from './laminate.js';
import { nominalValues } from './nominal-values.js';
import type { ModelCurves } from './results.js';
import { surfaces } from './surfaces.js';
import type { FaceTexture } from './values.js';
import type { RoughnessView } from './views.js';

/** Models that both faces to the laminate are known well enough for. */
function modelsOf(board: Board): RoughnessModel[] {
  const { underside, ground } = nominalValues(board);
  const onGround = applicableModels(ground);
  return applicableModels(underside).filter((model) => onGround.includes(model));
}

function curvesOver(
  x: readonly number[],
  models: readonly RoughnessModel[],
  value: (view: RoughnessView, x: number) => number,
): ModelCurves {
  const along = (view: RoughnessView): number[] => x.map((at) => value(view, at));
  return {
    x,
    curves: models.map((model) => ({ model, y: along(model) })),
    band: { low: along('low'), middle: along('middle'), high: along('high') },
  };
}

/** Loss of the feed line, dB/m, over the band and half its width beyond, at nominal temperature. */
export function lineLossCurves(board: Board, analysis: Analysis): ModelCurves {
  const values = nominalValues(board);
  const margin = (board.band.high - board.band.low) / 2;
  const x = [board.band.low - margin, ...frequencies(board, analysis), board.band.high + margin];
  return curvesOver(x, modelsOf(board), (view, frequency) => {
    const state = surfaces(board, values, view, frequency, board.temperature.nominalC);
    return lossDbPerM(boardLine(board, state, values, feedWidth(board), frequency));
  });
}

/** Rq from smooth to 2.5 µm. */
const ROUGHNESSES: readonly number[] = Array.from({ length: 51 }, (_, i) => i * 0.05e-6);

/** The texture at another Rq: lateral measures and nodules stay, a stated Rz keeps its ratio. */
function atRq(texture: FaceTexture, rq: number): FaceTexture {
  const { rz, ...rest } = texture;
  if (rq === 0) return { rq };
  return { ...rest, rq, ...(rz === undefined ? {} : { rz: (rz * rq) / texture.rq }) };
}

/** Loss factor of the underside over Rq at band centre and nominal temperature. */
export function lossFactorCurves(board: Board): ModelCurves {
  const values = nominalValues(board);
  const { foil } = board.stackUp.strip;
  const { nominalC } = board.temperature;
  const frequency = bandCentre(board);
  const conditions = {
    frequency,
    conductivity: conductivityAt(values.stripConductivity, nominalC, foil.temperatureCoefficient),
    permittivity: laminateNow(board, values, frequency, nominalC).permittivity,
  };
  return curvesOver(
    ROUGHNESSES,
    applicableModels(values.underside),
    (view, rq) => faceUnder(view, atRq(values.underside, rq), conditions).lossFactor,
  );
}

/** Effective permittivity of the feed line over the Rq of both faces to the laminate, same conditions. */
export function effectivePermittivityCurves(board: Board): ModelCurves {
  const nominal = nominalValues(board);
  const frequency = bandCentre(board);
  return curvesOver(ROUGHNESSES, modelsOf(board), (view, rq) => {
    const values = { ...nominal, underside: atRq(nominal.underside, rq), ground: atRq(nominal.ground, rq) };
    const state = surfaces(board, values, view, frequency, board.temperature.nominalC);
    return effectivePermittivity(boardLine(board, state, values, feedWidth(board), frequency), frequency);
  });
}
