/**
 * Dimensions of a board that asks for a layout instead of drawing one: every column alike, worked out on the network, then
 * corrected by what the full wave finds of that very column where it misses a goal.
 *
 * Conditions are nominal: nominal view of the texture, nominal temperature, nominal figures.
 */
import { withPieces } from '../manifest/column-outline.js';
import type { Analysis, Board, ColumnLayout, Link, Sized, SizedFor } from '../manifest/model.js';
import { abs, ONE } from '../numerics/complex.js';
import type { ColumnGeometry } from '../physics/column/index.js';
import { fullWave } from '../physics/full-wave/index.js';
import { cutShape } from '../physics/pattern/index.js';
import {
  correctSizing,
  type FoundColumn,
  goalNotes,
  limitNotes,
  type SizedColumn,
  type SizedFigures,
  type SizingRequest,
  shortfall,
  sizeColumn,
} from '../physics/sizing/index.js';
import type { SolverFor } from './confirm.js';
import { nominalValues } from './nominal-values.js';
import { columnObstacle } from './obstacle.js';
import { surfaces } from './surfaces.js';
import { nominalView } from './views.js';

/**
 * A board with `sizedFor` as it is to be studied; any other board, and one that is done, as it is.
 *
 * @param solver  that corrects, where the analysis has it; the full wave where left out
 */
export function sizeBoard(board: Board, analysis: Analysis, solver: SolverFor = fullWave): Board {
  const { sizedFor } = board;
  if (sizedFor === undefined || board.sized !== undefined || columnObstacle(board) !== undefined) return board;
  const request = requestFor(board, sizedFor, analysis);
  try {
    const sized = sizeColumn(request);
    return analysis.fullWave ? corrected(board, request, sized, solver) : withLayout(board, sized, byNetwork(sized));
  } catch (cause) {
    if (!(cause instanceof RangeError)) throw cause;
    return { ...board, sized: { reason: `the layout could not be worked out: ${cause.message}` } };
  }
}

const byNetwork = ({ reflection, notes }: SizedColumn) =>
  ({ by: 'network', networkDb: hundredths(reflection), notes }) as const;

type FoundByFullWave = FoundColumn & SizedFigures;

/** Part of every goal within which a column is left as it is. */
const AMPLE = 0.6;
/** Corrections made at most; the second only where the first leaves a goal missed. */
const CORRECTIONS = 2;

/** Corrected where the full wave sees a goal missed or nearly so; of what it has seen the best stands. */
function corrected(board: Board, request: SizingRequest, sized: SizedColumn, solver: SolverFor): Board {
  let found: FoundByFullWave;
  try {
    found = solvedAlone(request, sized.geometry, solver);
  } catch (cause) {
    if (!(cause instanceof RangeError)) throw cause;
    const { notes, ...rest } = byNetwork(sized);
    const note = `the full wave does not carry this column, which stays as the network has it: ${cause.message}`;
    return withLayout(board, sized, { ...rest, notes: [...notes, note] });
  }
  let now = { column: sized, found };
  let best = { ...now, round: 0 };
  for (let round = 0; round < CORRECTIONS; round++) {
    if (shortfall(request, best.found) <= (round === 0 ? AMPLE : 1)) break;
    const column = correctSizing(request, sized, now.found, now.column.geometry);
    try {
      now = { column, found: solvedAlone(request, column.geometry, solver) };
    } catch (cause) {
      if (!(cause instanceof RangeError)) throw cause;
      break;
    }
    if (shortfall(request, now.found) < shortfall(request, best.found)) best = { ...now, round };
  }
  const { column } = best;
  return withLayout(board, column, {
    by: column === sized ? 'network' : 'full wave',
    networkDb: hundredths(column.reflection),
    fullWaveDb: hundredths(best.found.reflection),
    notes: [
      ...(best.round > 0 ? ['A second correction by the full wave was needed.'] : []),
      ...limitNotes(request, column.geometry),
      ...goalNotes(request, best.found, 'full wave'),
    ],
  });
}

/** The full wave needs some width of band to prepare for. */
const AROUND = 0.01;

function solvedAlone(request: SizingRequest, geometry: ColumnGeometry, solver: SolverFor): FoundByFullWave {
  const { frequency, slab, stripThickness, faces } = request;
  const problem = { slab, stripThickness, columns: [geometry], referenceImpedance: 'line' } as const;
  const engine = solver(problem, { low: frequency * (1 - AROUND), high: frequency * (1 + AROUND) });
  const solution = engine.solve({ frequency, faces, slab, stripThickness });
  const { patchCurrents, field } = solution.excite([ONE]);
  const { beamDirection, sidelobeDb } = cutShape(field.cut('elevation'));
  return { reflection: solution.scattering[0][0], patchCurrents: patchCurrents[0], beamDirection, sidelobeDb };
}

function requestFor(board: Board, sizedFor: SizedFor, { roughnessModel }: Analysis): SizingRequest {
  const { frequency, patches, taper, leastWidth, leastGap, grid } = sizedFor;
  const values = nominalValues(board);
  const { nominalC } = board.temperature;
  const { slab, stripThickness, faces } = surfaces(board, values, nominalView(roughnessModel), frequency, nominalC);
  const alone = board.columns.length === 1;
  return {
    frequency,
    patches,
    taper,
    slab,
    stripThickness,
    faces,
    feedLineWidth: board.columns[0].feedLine.width,
    leastWidth,
    leastGap,
    grid,
    ...(alone ? {} : { greatestWidth: board.pitch - leastGap }),
  };
}

/** Rounded, because engines of the language differ in the last bit and the results are hashed. */
const hundredths = (reflection: { readonly re: number; readonly im: number }): number =>
  Math.round(2000 * Math.log10(Math.max(1e-6, abs(reflection)))) / 100;

function withLayout(board: Board, { geometry }: SizedColumn, sized: Sized): Board {
  return { ...board, columns: board.columns.map((column) => laidOut(column, geometry)), sized };
}

/** The dimensions of a column in the place of what was guessed. */
function laidOut(column: ColumnLayout, { patches, links, matching, inset }: ColumnGeometry): ColumnLayout {
  return {
    ...withPieces(column, { patches: patches.map(tidy), links: links.map(tidy) }),
    ...(matching === undefined ? {} : { matching: matching.map(tidy) }),
    ...(inset === undefined ? {} : { inset: { depth: nanometres(inset.depth), gap: nanometres(inset.gap) } }),
  };
}

/** Without the tails that multiples of a grid have in binary: what is printed is what is calculated with. */
const nanometres = (length: number): number => Math.round(length * 1e9) / 1e9;
const tidy = ({ width, length }: Link): Link => ({ width: nanometres(width), length: nanometres(length) });
