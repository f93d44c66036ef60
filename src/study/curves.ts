/** Curves and face figures of the copper chapter, and the lossless check of the power balance. */
import type { Analysis, Board } from '../manifest/model.js';
import { ZERO } from '../numerics/complex.js';
import { arrayFigures, incidentWaves } from '../physics/array/index.js';
import { edgeNetwork } from '../physics/column/index.js';
import { conductivityAt, skinDepth } from '../physics/material/index.js';
import { farFieldPower, guidedWavePower } from '../physics/pattern/index.js';
import { type RoughnessModel, roughFace } from '../physics/roughness/index.js';
import { frequencies } from './conditions.js';
import { columnGeometry } from './geometry.js';
import type { FaceState, ModelCurves } from './results.js';
import { surfaces } from './surfaces.js';
import { boardLine } from './sweep.js';
import { nominalValues } from './values.js';

const MODELS = ['hammerstad', 'groiss', 'gradient'] as const;
const DB_PER_NEPER = 20 / Math.LN10;

const centre = (board: Board): number => (board.band.low + board.band.high) / 2;

/** Loss of the feed line, dB/m, over the band and a tenth beyond it, at nominal temperature. */
export function lineLossCurves(board: Board, analysis: Analysis): ModelCurves {
  const values = nominalValues(board);
  const inside = frequencies(board, analysis);
  const margin = (board.band.high - board.band.low) / 2;
  const x = [board.band.low - margin, ...inside, board.band.high + margin];
  const loss = (model: RoughnessModel, frequency: number): number => {
    const state = surfaces(board, values, model, frequency, board.temperature.nominalC);
    return DB_PER_NEPER * boardLine(state, board.columns[0].feedLine.width, frequency).gamma.re;
  };
  return {
    x,
    curves: (['smooth', ...MODELS] as const).map((model) => ({ model, y: x.map((f) => loss(model, f)) })),
  };
}

/** Loss factor over Rq from smooth to 2.5 µm at band centre and nominal temperature. */
export function lossFactorCurves(board: Board): ModelCurves {
  const conductivity = stripConductivity(board);
  const x = Array.from({ length: 51 }, (_, i) => i * 0.05e-6);
  const factor = (model: RoughnessModel, rq: number): number =>
    roughFace(model, { rq, frequency: centre(board), conductivity, permittivity: nominalValues(board).permittivity })
      .lossFactor;
  return { x, curves: MODELS.map((model) => ({ model, y: x.map((rq) => factor(model, rq)) })) };
}

function stripConductivity(board: Board): number {
  const { foil } = board.stackUp.strip;
  return conductivityAt(foil.conductivity.value, board.temperature.nominalC, foil.temperatureCoefficient);
}

export function faceStates(board: Board): FaceState[] {
  const values = nominalValues(board);
  const { strip, ground } = board.stackUp;
  const frequency = centre(board);
  const groundSigma = conductivityAt(
    ground.foil.conductivity.value,
    board.temperature.nominalC,
    ground.foil.temperatureCoefficient,
  );
  const list = [
    {
      face: `strip underside (${strip.dielectricFace.kind})`,
      rq: values.undersideRq,
      sigma: stripConductivity(board),
      permittivity: values.permittivity,
    },
    {
      face: `ground (${ground.dielectricFace.kind})`,
      rq: values.groundRq,
      sigma: groundSigma,
      permittivity: values.permittivity,
    },
    {
      face: `strip top and edges (${strip.outerFace.kind}), bare copper`,
      rq: values.outerRq,
      sigma: stripConductivity(board),
      permittivity: 1,
    },
  ];
  return list.map(({ face, rq, sigma, permittivity }) => ({
    face,
    rq,
    skinDepth: skinDepth(frequency, sigma),
    models: MODELS.map((model) => {
      const rough = roughFace(model, { rq, frequency, conductivity: sigma, permittivity });
      return { model, lossFactor: rough.lossFactor, reactance: rough.reactance, planeShift: rough.planeShift };
    }),
  }));
}

/** (far field + guided wave)/(power into the edges) of the board without any loss, at band centre. */
export function losslessClosure(board: Board): number {
  const values = nominalValues(board);
  const engine = edgeNetwork(
    {
      slab: { permittivity: values.permittivity, lossTangent: 0, height: values.height },
      stripThickness: values.stripThickness,
      columns: columnGeometry(board, 0),
      referenceImpedance: board.referenceImpedance,
    },
    centre(board),
  );
  const solution = engine.solve({
    frequency: centre(board),
    faces: { underside: ZERO, top: ZERO, edges: ZERO, ground: ZERO },
  });
  const { excited } = arrayFigures(solution, incidentWaves(board.feed));
  return (farFieldPower(excited.edges) + guidedWavePower(excited.edges)) / excited.power.accepted;
}
