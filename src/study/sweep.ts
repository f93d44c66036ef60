/** One sweep of a board over band and temperature under one set of assumptions. */
import type { Analysis, Board } from '../manifest/model.js';
import { abs2 } from '../numerics/complex.js';
import { arrayFigures, incidentWaves } from '../physics/array/index.js';
import {
  type ColumnEngine,
  type ColumnProblem,
  edgeNetwork,
  guidedWavePower,
  type PowerBudget,
} from '../physics/column/index.js';
import { type CutShape, farFieldPower } from '../physics/pattern/index.js';
import type { ValidityFlag } from '../physics/validity.js';
import { boardLine, columnLineFlags, feedWidth, linePoint, lossDbPerM } from './board-line.js';
import { bandCentre, frequencies, temperatures } from './conditions.js';
import { columnGeometry } from './geometry.js';
import { columnObstacle } from './obstacle.js';
import type { Cut, CutFigures, LinePoint, PointResult, PowerShares, Sweep } from './results.js';
import { type Surfaces, surfaces } from './surfaces.js';
import type { BoardValues } from './values.js';
import type { RoughnessView } from './views.js';

export interface SweepResult {
  readonly sweep: Sweep;
  readonly flags: readonly ValidityFlag[];
}

/** The feed line at every point, and the columns where nothing stands in their way. */
export function runSweep(
  board: Board,
  analysis: Analysis,
  id: string,
  label: string,
  values: BoardValues,
  view: RoughnessView,
): SweepResult {
  const list = frequencies(board, analysis);
  const engine = columnObstacle(board) === undefined ? engineFor(board, values) : undefined;
  const width = feedWidth(board);
  const flags = new Map<string, ValidityFlag>();
  const keep = (found: readonly ValidityFlag[]): void => {
    for (const flag of found) if (!flags.has(flag.code)) flags.set(flag.code, flag);
  };
  const points: PointResult[] = [];
  const line: LinePoint[] = [];
  for (const temperatureC of temperatures(board))
    for (const frequency of list) {
      const state = surfaces(board, values, view, frequency, temperatureC);
      const feed = boardLine(board, state, values, width, frequency);
      line.push(linePoint(feed, frequency, temperatureC));
      keep(state.flags);
      keep(feed.flags);
      if (!engine) continue;
      const centre = id === 'nominal' && temperatureC === board.temperature.nominalC && isCentre(board, frequency);
      if (centre) keep(columnLineFlags(state, width + values.etch, feed, frequency));
      const { point, found } = evaluate(board, values, engine, state, frequency, temperatureC, centre);
      points.push(point);
      keep(found);
    }
  return { sweep: { id, label, points, line }, flags: [...flags.values()] };
}

const isCentre = (board: Board, frequency: number): boolean => Math.abs(frequency - bandCentre(board)) < 1;

/** Preparing a layout costs as much as several frequencies, and most sweeps share one: the last few are kept. */
const engines = new Map<string, ColumnEngine>();
const ENGINES_KEPT = 3;

function engineFor(board: Board, values: BoardValues): ColumnEngine {
  // Loss is a condition of each solve, not of the preparation.
  const problem: ColumnProblem = {
    slab: { permittivity: values.permittivity, lossTangent: 0, height: values.height },
    stripThickness: values.stripThickness,
    columns: columnGeometry(board, values.etch),
    referenceImpedance: board.referenceImpedance,
  };
  const key = JSON.stringify([problem, board.band.high]);
  const engine = engines.get(key) ?? edgeNetwork(problem, board.band.high);
  engines.delete(key);
  engines.set(key, engine);
  for (const old of [...engines.keys()].slice(0, -ENGINES_KEPT)) engines.delete(old);
  return engine;
}

function evaluate(
  board: Board,
  values: BoardValues,
  engine: ColumnEngine,
  state: Surfaces,
  frequency: number,
  temperatureC: number,
  closure: boolean,
): { point: PointResult; found: readonly ValidityFlag[] } {
  const solution = engine.solve({ frequency, ...state });
  const waves = incidentWaves(board.feed);
  const figures = arrayFigures(solution, waves);
  const lossAt = (width: number): number => lossDbPerM(boardLine(board, state, values, width, frequency));

  // Power needed at the feed's input for the waves at the columns, each path with its own loss.
  let [delivered, supplied] = [0, 0];
  board.feed.forEach((path, c) => {
    const { feedLine } = board.columns[c];
    const own = lossAt(feedLine.width) * feedLine.length;
    const given = path.line ? lossAt(path.line.width) * path.line.length : values.feedLossDb[c];
    const power = abs2(waves[c]);
    delivered += power;
    supplied += power * 10 ** ((own + given) / 10);
  });
  const feedTransmission = delivered / supplied;
  const gain = figures.directivity * figures.radiationEfficiency * feedTransmission;
  const { power } = figures.excited;
  const cut = (plane: Cut['plane'], shape: CutShape): Cut => ({
    plane,
    angle: shape.angle,
    gainDbi: shape.intensity.map(
      (u) =>
        10 *
        Math.log10(Math.max(1e-6, (4 * Math.PI * u * figures.radiationEfficiency * feedTransmission) / power.radiated)),
    ),
  });
  const point: PointResult = {
    frequency,
    temperatureC,
    directivity: figures.directivity,
    gain,
    realizedGain: gain * figures.mismatch,
    radiationEfficiency: figures.radiationEfficiency,
    feedTransmission,
    mismatch: figures.mismatch,
    shares: powerShares(power, state),
    columnReflection: figures.passiveReflection,
    activeReflection: figures.activeReflection,
    referenceImpedance: solution.referenceImpedance,
    elevation: cutFigures(figures.elevation),
    azimuth: cutFigures(figures.azimuth),
    powerResidual: figures.powerResidual,
    farFieldClosure:
      closure && figures.excited.edges
        ? (farFieldPower(figures.excited.field) + guidedWavePower(figures.excited.edges)) /
          (power.radiated + power.surfaceWave)
        : Number.NaN,
    cuts: { elevation: cut('elevation', figures.elevation), azimuth: cut('azimuth', figures.azimuth) },
  };
  return { point, found: solution.flags };
}

function cutFigures(shape: CutShape): CutFigures {
  const { beamDirection, halfPowerBeamwidth, sidelobeDb } = shape;
  return { beamDirection, halfPowerBeamwidth, sidelobeDb };
}

/** Fractions of the accepted power; each face's loss split as its resistance is: smooth copper, finish, texture. */
function powerShares(power: PowerBudget, state: Surfaces): PowerShares {
  const of = (face: 'underside' | 'top' | 'edges' | 'ground', part: 'smooth' | 'finish' | 'texture'): number =>
    (power[face] * state.parts[face][part]) / state.faces[face].re / power.accepted;
  const faces = ['underside', 'top', 'edges', 'ground'] as const;
  return {
    radiated: power.radiated / power.accepted,
    surfaceWave: power.surfaceWave / power.accepted,
    stripUnderside: of('underside', 'smooth'),
    stripTop: of('top', 'smooth'),
    stripEdges: of('edges', 'smooth'),
    ground: of('ground', 'smooth'),
    roughness: faces.reduce((sum, face) => sum + of(face, 'texture'), 0),
    finish: faces.reduce((sum, face) => sum + of(face, 'finish'), 0),
    dielectric: power.dielectric / power.accepted,
    load: power.load / power.accepted,
  };
}
