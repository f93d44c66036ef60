/**
 * Lengths of patches and links scaled by one factor to the band centre, so that boards on different laminates can be
 * compared before each has its own layout.
 *
 * What is sought is the least passive reflection of the worst column at the band centre, not the frequency at which an
 * input reactance vanishes: reflection is what the requirement limits, it has a minimum also where the resistance is
 * not the reference impedance, and the input of a long column crosses zero reactance several times. A column of N
 * patches matches at several factors, about 1/2N apart; in all but one of them neighbouring patches are out of phase and
 * the beam stands far off broadside. Only minima with the beam within half its beamwidth of broadside count, and of these the one
 * with the highest realized gain is taken.
 *
 * Conditions are nominal: nominal view of the texture, nominal temperature, nominal figures. Widths, the feed line, offsets
 * and the pitch stay.
 */
import { withPieces } from '../manifest/column-outline.js';
import type { Analysis, Board, ColumnLayout } from '../manifest/model.js';
import { abs2 } from '../numerics/complex.js';
import { minimumBetween } from '../numerics/golden-section.js';
import { arrayFigures, incidentWaves } from '../physics/array/index.js';
import { type ColumnSolution, edgeNetwork } from '../physics/column/index.js';
import { columnGeometry } from './geometry.js';
import { nominalValues } from './nominal-values.js';
import { columnObstacle } from './obstacle.js';
import { surfaces } from './surfaces.js';
import { nominalView } from './views.js';

/** Twice as far as permittivities from 2.9 to 3.6 move a length. */
const LOWEST = 0.85;
const HIGHEST = 1 / LOWEST;
/** Steps of the scan, equal ratios of 0.5 %: a tenth of the distance between two matches of a column of ten patches. */
const STEPS = 65;
/** Four decimals are a tenth of a micrometre on a patch of 1 mm; the printed factor is the one used. */
const DECIMALS = 4;
/** Where less than half the incident power enters, a minimum is a ripple and no match. */
const HIGHEST_REFLECTION_DB = 10 * Math.log10(0.5);

export const RETUNE_LIMITS = { lowest: LOWEST, highest: HIGHEST, highestReflectionDb: HIGHEST_REFLECTION_DB };

/** Lengths of patches and links times a factor, to a tenth of a micrometre: printed lengths are those calculated with. */
export function scaledLengths(columns: readonly ColumnLayout[], factor: number): ColumnLayout[] {
  const scaled = <P extends { readonly width: number; readonly length: number }>({ width, length }: P) => ({
    width,
    length: Math.round(length * factor * 1e7) / 1e7,
  });
  return columns.map((column) =>
    withPieces(column, { patches: column.patches.map(scaled), links: column.links.map(scaled) }),
  );
}

/** A board with `retune` as it is to be studied; any other board, and one that is done, as it is. */
export function retuneBoard(board: Board, analysis: Analysis): Board {
  if (board.retune === undefined || board.retuned !== undefined || columnObstacle(board) !== undefined) return board;
  const solve = solverAtCentre(board, analysis);
  const reflectionDb = (factor: number) => worstReflectionDb(solve(factor));
  const ratio = (HIGHEST / LOWEST) ** (1 / STEPS);
  const scan = Array.from({ length: STEPS + 1 }, (_, i) => {
    const factor = LOWEST * ratio ** i;
    const solution = solve(factor);
    return { factor, db: worstReflectionDb(solution), solution };
  });
  const inner = scan.slice(1, -1).filter(({ db }, i) => db < scan[i]!.db && db <= scan[i + 2]!.db);
  const matches = inner
    .filter(({ db }) => db <= HIGHEST_REFLECTION_DB)
    .map(({ factor, solution }) => ({ factor, ...beamOf(board, solution) }))
    .filter(({ inPhase }) => inPhase);
  if (matches.length === 0) return { ...board, retuned: { reason: reasonFor(inner.length) } };
  const best = matches.reduce((a, b) => (b.realizedGain > a.realizedGain ? b : a));
  const found = minimumBetween(reflectionDb, best.factor / ratio, best.factor * ratio, 0.3 * 10 ** -DECIMALS);
  const factor = Number(found.x.toFixed(DECIMALS));
  return {
    ...board,
    columns: scaledLengths(board.columns, factor),
    retuned: {
      factor,
      drawnDb: hundredths(reflectionDb(1)),
      retunedDb: hundredths(reflectionDb(factor)),
      drawn: board.columns,
    },
  };
}

function reasonFor(minima: number): string {
  const range = `between ${LOWEST} and ${HIGHEST.toFixed(3)} times the drawn lengths`;
  const what = minima === 0 ? 'reflection at the band centre has no minimum' : 'no minimum of reflection is a match';
  return `the layout could not be retuned: ${range}, the range searched, ${what} with the beam within half its beamwidth of broadside and at least half the power accepted`;
}

/** Rounded, because engines of the language differ in the last bit and the results are hashed. */
const hundredths = (db: number): number => Math.round(100 * db) / 100;

function solverAtCentre(board: Board, { roughnessModel }: Analysis): (factor: number) => ColumnSolution {
  const values = nominalValues(board);
  const frequency = (board.band.low + board.band.high) / 2;
  const state = surfaces(board, values, nominalView(roughnessModel), frequency, board.temperature.nominalC);
  return (factor) => {
    // The drawing itself is not rounded; every other layout is what scaling prints.
    const layout = factor === 1 ? board.columns : scaledLengths(board.columns, factor);
    const columns = columnGeometry({ ...board, columns: layout }, values.etch);
    const slab = { permittivity: values.permittivity, lossTangent: 0, height: values.height };
    const { referenceImpedance } = board;
    const problem = { slab, stripThickness: values.stripThickness, columns, referenceImpedance };
    return edgeNetwork(problem, board.band.high).solve({ frequency, ...state });
  };
}

function worstReflectionDb({ scattering }: ColumnSolution): number {
  return 10 * Math.log10(Math.max(1e-12, ...scattering.map((row, c) => abs2(row[c]!))));
}

function beamOf(board: Board, solution: ColumnSolution): { readonly realizedGain: number; readonly inPhase: boolean } {
  const figures = arrayFigures(solution, incidentWaves(board.feed));
  const { beamDirection, halfPowerBeamwidth } = figures.elevation;
  return {
    realizedGain: figures.directivity * figures.radiationEfficiency * figures.mismatch,
    // A beam too wide for half-power points inside the cut has no other match to be told from.
    inPhase: !(Math.abs(beamDirection) > halfPowerBeamwidth / 2),
  };
}
