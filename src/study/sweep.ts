/** One sweep of a board over band and temperature under one set of assumptions. */
import type { Analysis, Board } from '../manifest/model.js';
import { abs2, type Complex, div, ZERO } from '../numerics/complex.js';
import { type ArrayFigures, arrayFigures, incidentWaves } from '../physics/array/index.js';
import {
  type ColumnEngine,
  type ColumnSolution,
  edgeNetwork,
  guidedWavePower,
  type PowerBudget,
} from '../physics/column/index.js';
import { farFieldPower } from '../physics/pattern/index.js';
import type { ValidityFlag } from '../physics/validity.js';
import { boardLine, columnLineFlags, feedWidth, linePoint, lossDbPerM } from './board-line.js';
import { columnProblem, highestSolved } from './column-problem.js';
import { bandCentre, frequencies, temperatures } from './conditions.js';
import { correctedCut } from './corrected-cut.js';
import { correctedScattering, correctedShares, differenceAt, wavesLeaving } from './correction.js';
import type { Correction, EngineDifference } from './correction-model.js';
import { cutFigures, gainCut } from './engine-figures.js';
import { fedColumns } from './feed-network.js';
import { columnObstacle } from './obstacle.js';
import type { LinePoint, PointResult, PowerShares, Sweep } from './results.js';
import { type Surfaces, surfaces } from './surfaces.js';
import type { BoardValues } from './values.js';
import type { RoughnessView } from './views.js';

export interface SweepResult {
  readonly sweep: Sweep;
  readonly flags: readonly ValidityFlag[];
}

/**
 * The feed line at every point, and the columns where nothing stands in their way.
 *
 * @param correction what the network's figures are brought to those of the full wave by; without it they stay as they are
 */
export function runSweep(
  board: Board,
  analysis: Analysis,
  id: string,
  label: string,
  values: BoardValues,
  view: RoughnessView,
  correction?: Correction,
): SweepResult {
  const list = frequencies(board, analysis);
  const shift = correction?.shift ?? 0;
  const engine = columnObstacle(board) === undefined ? engineFor(board, values) : undefined;
  const differences = correction && list.map((frequency) => differenceAt(correction, frequency));
  const width = feedWidth(board);
  const flags = new Map<string, ValidityFlag>();
  const keep = (found: readonly ValidityFlag[]): void => {
    for (const flag of found) if (!flags.has(flag.code)) flags.set(flag.code, flag);
  };
  const points: PointResult[] = [];
  const line: LinePoint[] = [];
  for (const temperatureC of temperatures(board))
    list.forEach((frequency, f) => {
      const state = surfaces(board, values, view, frequency, temperatureC);
      const feed = boardLine(board, state, values, width, frequency);
      line.push(linePoint(feed, frequency, temperatureC));
      keep(state.flags);
      keep(feed.flags);
      if (!engine) return;
      const nominal = id === 'nominal';
      const centre = nominal && temperatureC === board.temperature.nominalC && isCentre(board, frequency);
      if (centre) keep(columnLineFlags(state, width + values.etch, feed, frequency));
      const solution = engine.solve({ frequency: frequency - shift, ...state });
      keep(solution.flags);
      const place = { board, values, state, frequency, temperatureC };
      const wanted = { closure: centre, coupling: nominal || !!board.groups };
      const { point, found } = evaluate(place, solution, wanted, differences?.[f]);
      points.push(point);
      keep(found);
    });
  return { sweep: { id, label, points, line }, flags: [...flags.values()] };
}

const isCentre = (board: Board, frequency: number): boolean => Math.abs(frequency - bandCentre(board)) < 1;

/** Preparing a layout costs as much as several frequencies, and most sweeps share one: the last few are kept. */
const engines = new Map<string, ColumnEngine>();
const ENGINES_KEPT = 3;

function engineFor(board: Board, values: BoardValues): ColumnEngine {
  const problem = columnProblem(board, values);
  const highest = highestSolved(board);
  const key = JSON.stringify([problem, highest]);
  const engine = engines.get(key) ?? edgeNetwork(problem, highest);
  engines.delete(key);
  engines.set(key, engine);
  for (const old of [...engines.keys()].slice(0, -ENGINES_KEPT)) engines.delete(old);
  return engine;
}

interface At {
  readonly board: Board;
  readonly values: BoardValues;
  readonly state: Surfaces;
  readonly frequency: number;
  readonly temperatureC: number;
}

function evaluate(
  at: At,
  solution: ColumnSolution,
  wanted: { readonly closure: boolean; readonly coupling: boolean },
  difference: EngineDifference | undefined,
): { readonly point: PointResult; readonly found: readonly ValidityFlag[] } {
  const { board, values, state, frequency, temperatureC } = at;
  const { referenceImpedance } = solution;
  const scattering = difference ? correctedScattering(solution.scattering, difference) : solution.scattering;
  const fed = board.feedNetwork
    ? fedColumns(board, values, state, frequency, { scattering, referenceImpedance })
    : undefined;
  const waves = fed?.waves ?? incidentWaves(board.feed);
  const figures = arrayFigures(solution, waves);
  const { power } = figures.excited;
  const feedTransmission = fed?.figures.transmission ?? feedPaths(at, waves);
  const reflected = wavesLeaving(scattering, waves);
  const mismatch = fed?.mismatch ?? 1 - sum(reflected.map(abs2)) / sum(waves.map(abs2));
  const drawn = powerShares(power, state);
  const shares = difference ? correctedShares(drawn, difference.shares) : drawn;
  const directivity = figures.directivity * 10 ** ((difference?.directivityDb ?? 0) / 10);
  const radiationEfficiency = shares.radiated;
  const gain = directivity * radiationEfficiency * feedTransmission;
  const cuts = cutsOf(figures, feedTransmission, difference, gain);
  const point: PointResult = {
    frequency,
    temperatureC,
    directivity,
    gain,
    realizedGain: gain * mismatch,
    radiationEfficiency,
    feedTransmission,
    mismatch,
    shares,
    columnReflection: scattering.map((row, c) => row[c]),
    activeReflection: waves.map((wave, c) => (abs2(wave) > 0 ? div(reflected[c], wave) : ZERO)),
    referenceImpedance,
    elevation: cuts.elevation.figures,
    azimuth: cuts.azimuth.figures,
    powerResidual: figures.powerResidual,
    farFieldClosure:
      wanted.closure && figures.excited.edges
        ? (farFieldPower(figures.excited.field) + guidedWavePower(figures.excited.edges)) /
          (power.radiated + power.surfaceWave)
        : Number.NaN,
    cuts: { elevation: cuts.elevation.cut, azimuth: cuts.azimuth.cut },
    ...(wanted.coupling ? { scattering } : {}),
    ...(fed ? { feed: fed.figures } : {}),
  };
  return { point, found: fed?.flags ?? [] };
}

const sum = (parts: readonly number[]): number => parts.reduce((a, b) => a + b, 0);

/** Power into the columns over power needed at the feed's input, each path with its own loss. */
function feedPaths({ board, values, state, frequency }: At, waves: readonly Complex[]): number {
  const lossAt = (width: number): number => lossDbPerM(boardLine(board, state, values, width, frequency));
  let [delivered, supplied] = [0, 0];
  board.feed.forEach((path, c) => {
    const { feedLine } = board.columns[c];
    const own = lossAt(feedLine.width) * feedLine.length;
    const given = path.line ? lossAt(path.line.width) * path.line.length : values.feedLossDb[c];
    const power = abs2(waves[c]);
    delivered += power;
    supplied += power * 10 ** ((own + given) / 10);
  });
  return delivered / supplied;
}

/** Cuts of gain at the feed's input, whose maximum moves as `gain` does. */
function cutsOf(figures: ArrayFigures, feedTransmission: number, by: EngineDifference | undefined, gain: number) {
  const drawn = figures.radiationEfficiency * feedTransmission;
  const rise = 10 * Math.log10(gain / (figures.directivity * drawn));
  const of = (plane: 'elevation' | 'azimuth') => {
    const shape = figures[plane];
    const cut = gainCut(plane, shape, drawn / figures.excited.power.radiated);
    return by ? correctedCut(cut, cutFigures(shape), by[plane], rise) : { cut, figures: cutFigures(shape) };
  };
  return { elevation: of('elevation'), azimuth: of('azimuth') };
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
