/** The full wave beside the network: the nominal state of a board at a few frequencies, solved by both. */
import type { Analysis, Board } from '../manifest/model.js';
import { abs2 } from '../numerics/complex.js';
import type { ColumnEngine } from '../physics/column/index.js';
import { edgeNetwork } from '../physics/column/index.js';
import { type FullWaveProblem, fullWave } from '../physics/full-wave/index.js';
import type { ValidityFlag } from '../physics/validity.js';
import { columnProblem, highestSolved } from './column-problem.js';
import { bandCentre } from './conditions.js';
import { correctionOf, reflectionReach } from './correction.js';
import type { Correction } from './correction-model.js';
import { engineFigures } from './engine-figures.js';
import { nominalValues } from './nominal-values.js';
import { columnObstacle } from './obstacle.js';
import type { Confirmation, EngineComparison } from './results.js';
import { aligningShift } from './shift.js';
import { surfaces } from './surfaces.js';
import { nominalView } from './views.js';

/** A column solver ready for a board over a band. */
export type SolverFor = (
  problem: FullWaveProblem,
  band: { readonly low: number; readonly high: number },
) => ColumnEngine;

/** Patches beyond which a board is not given to the full wave: time and memory grow with them. */
export const MOST_PATCHES = 160;
/** A solution that stopped short of this relative residual is none. */
const LARGEST_RESIDUAL = 1e-2;

/** Band edges and centre. */
export const firstFrequencies = (board: Board): number[] => [board.band.low, bandCentre(board), board.band.high];

/** Why the full wave is not run on this board, or undefined. */
export function fullWaveObstacle(board: Board, analysis: Analysis): string | undefined {
  if (!analysis.fullWave) return 'the pack switched the full wave off';
  const obstacle = columnObstacle(board);
  if (obstacle !== undefined) return obstacle;
  const patches = board.columns.reduce((sum, column) => sum + column.patches.length, 0);
  if (patches > MOST_PATCHES)
    return `the board has ${patches} patches; the full wave is run on boards of up to ${MOST_PATCHES}`;
  return undefined;
}

/**
 * Of a board whose materials differ a little from one that was confirmed: the full wave is not run again, and what it found there
 * is carried over.
 *
 * @param from  the state it was found in, in words
 */
export function carriedConfirmation(
  board: Board,
  analysis: Analysis,
  confirmed: Confirmation,
  from: string,
): Confirmation {
  const reason = fullWaveObstacle(board, analysis);
  if (reason !== undefined) return { kind: 'network only', reason };
  return confirmed.kind === 'full wave' ? { ...confirmed, carriedFrom: from } : confirmed;
}

/**
 * Solves the board by both engines, and works out what the network is to be corrected by.
 *
 * @param frequencies  inside the band; those of `earlier` are not solved again
 * @param earlier      what was found before
 * @returns            `network only` with its reason where the full wave does not carry such a board or finds no solution
 */
export function confirmBoard(
  board: Board,
  analysis: Analysis,
  frequencies: readonly number[] = firstFrequencies(board),
  earlier?: Confirmation,
  solver: SolverFor = fullWave,
): Confirmation {
  const obstacle = fullWaveObstacle(board, analysis);
  if (obstacle !== undefined) return { kind: 'network only', reason: obstacle };
  const known = earlier?.kind === 'full wave' ? earlier.points : [];
  const wanted = frequencies.filter((f) => !known.some((point) => point.frequency === f)).sort((a, b) => a - b);
  const state = stateOf(board, analysis);
  const network = edgeNetwork(state.problem, highestSolved(board));
  const flags = new Map<string, ValidityFlag>(
    (earlier?.kind === 'full wave' ? earlier.flags : []).map((flag) => [flag.code, flag]),
  );
  let points: EngineComparison[];
  try {
    const engine = solver(state.problem, board.band);
    points = wanted.map((frequency) => {
      const conditions = state.at(frequency);
      const solution = engine.solve({ frequency, ...conditions });
      const { effort } = solution;
      if (effort === undefined) throw new Error('confirmBoard: the solver does not say what its solution cost');
      if (!(effort.residual <= LARGEST_RESIDUAL))
        throw new RangeError(`no solution was reached at ${(frequency / 1e9).toFixed(2)} GHz`);
      for (const flag of solution.flags) if (!flags.has(flag.code)) flags.set(flag.code, flag);
      return {
        frequency,
        fullWave: engineFigures(board, solution),
        network: engineFigures(board, network.solve({ frequency, ...conditions })),
        effort,
      };
    });
  } catch (cause) {
    if (!(cause instanceof RangeError)) throw cause;
    return { kind: 'network only', reason: `the full wave does not carry this board: ${cause.message}` };
  }
  const all = [...known, ...points].sort((a, b) => a.frequency - b.frequency);
  const correction = correctionFor(all);
  return {
    kind: 'full wave',
    points: all,
    flags: [...flags.values()],
    alignment: { shift: correction.shift, remaining: remainingOf(correction) },
    correction,
  };

  function correctionFor(compared: readonly EngineComparison[]) {
    const shift = aligningShift(
      compared.map(({ frequency, fullWave: { scattering } }) => ({ frequency, reflection: diagonal(scattering) })),
      (frequency, conditionsFor) => diagonal(network.solve({ frequency, ...state.at(conditionsFor) }).scattering),
    );
    const longest = Math.max(...board.columns.map(({ patches }) => patches.length));
    const shifted = compared.map(({ frequency, fullWave: figures, network: unshifted }) => ({
      frequency,
      fullWave: figures,
      network:
        shift === 0
          ? unshifted
          : engineFigures(board, network.solve({ frequency: frequency - shift, ...state.at(frequency) })),
    }));
    return correctionOf(shifted, shift, reflectionReach(bandCentre(board), longest));
  }
}

/** Root mean square of what is left of the reflections. */
function remainingOf({ differences }: Correction): number {
  const squares = differences.flatMap(({ reflection }) => reflection.map(abs2));
  return Math.sqrt(squares.reduce((a, b) => a + b, 0) / squares.length);
}

const diagonal = <T>(matrix: readonly (readonly T[])[]): T[] => matrix.map((row, i) => row[i]);

/** Nominal figures, view and temperature. */
function stateOf(board: Board, { roughnessModel }: Analysis) {
  const values = nominalValues(board);
  const problem = columnProblem(board, values);
  const known = new Map<number, ReturnType<typeof surfaces>>();
  const at = (frequency: number) => {
    const found =
      known.get(frequency) ??
      surfaces(board, values, nominalView(roughnessModel), frequency, board.temperature.nominalC);
    known.set(frequency, found);
    return found;
  };
  return { problem, at };
}
