/**
 * Dimensions of a series-fed column for a taper: by the edge network, corrected once by a better engine where there is one.
 *
 * Closed forms start a short column; its lengths start one twice as long, and so on. Each is a square system: widths set
 * amplitudes and, together, the input resistance; links set the phase from patch to patch, so that the beam stands at
 * broadside; the length of all patches sets the input reactance. Neighbouring columns, covers and grounds that end are not in it.
 */
import { abs, type Complex, complex, div, mul, sub } from '../../numerics/complex.js';
import { leastSquares } from '../../numerics/least-squares.js';
import type { ColumnGeometry } from '../column/index.js';
import { cutShape } from '../pattern/index.js';
import { taperAmplitudes } from '../taper/index.js';
import { excitationError, responseOf, solveColumn } from './column-response.js';
import { type ColumnUnknowns, columnUnknowns, unknownsOf } from './column-unknowns.js';
import { onGrid } from './grid.js';
import { reflectionInFeedLine, withMatching } from './matching-section.js';
import { requireRequest, type SizedColumn, type SizingRequest, withLinks } from './request.js';
import { goalNotes, limitNotes } from './sizing-notes.js';
import { firstGuesses, guessFrom, halved, resistanceRatio } from './starting-layout.js';

/** Largest error of an amplitude over the largest, and of the reflection. */
const TOLERANCE = 5e-3;
/** Most networks solved for it. */
const BUDGET = 200;
/** The same of a column that only starts a longer one. */
const ROUGH = { tolerance: 0.03, budget: 60 };
interface Effort {
  readonly tolerance: number;
  readonly budget: number;
}
/** Steps of the unknowns (1 % of a width, 0.2 % of a length) that one move makes at most. */
const REACH = 20;
/** Columns up to this many patches are found from closed forms. */
const SHORT = 3;
/** Match below which a column at the limits of its widths gets a matching section. */
const POOR_MATCH = 10 ** (-15 / 20);

/** What the network is steered to show; a perfect column where absent. */
interface Aim {
  readonly reflection: Complex;
  /** Of each patch over that asked for; 1 where left out. */
  readonly excitation?: readonly Complex[];
}

/**
 * @returns dimensions on the grid with what the network says of them; `notes` name limits that bind and goals not met
 * @throws RangeError on a request that is not physical, or a slab that guides more than TM0
 */
export function sizeColumn(given: SizingRequest): SizedColumn {
  requireRequest(given);
  const request = withLinks(given);
  const amplitudes = taperAmplitudes(request.taper, request.patches);
  const effort = { tolerance: TOLERANCE, budget: BUDGET };
  const ownLinks = request.linkWidth < request.feedLineWidth;
  const inner = ownLinks ? { ...request, feedLineWidth: request.linkWidth } : request;
  const ratio = resistanceRatio(inner, amplitudes);
  const transformed = ownLinks || ratio < 1;
  let { geometry, solves } = search(inner, amplitudes, effort);
  const reflection = transformed
    ? reflectionInFeedLine(request, ratio)
    : responseOf(solveColumn(inner, geometry)).reflection;
  if (transformed || abs(reflection) > POOR_MATCH) {
    const unknowns = withMatching(request, geometry, reflection);
    const found = steer(request, amplitudes, unknowns, effort);
    const matched = unknowns.geometry(found.x);
    solves += found.calls;
    if (transformed || abs(responseOf(solveColumn(request, matched)).reflection) < abs(reflection)) geometry = matched;
  }
  const sized = figures(request, amplitudes, geometry, solves);
  return { ...sized, notes: [...limitNotes(request, sized.geometry), ...goalNotes(request, sized)] };
}

/** What another engine finds of a sized column at its frequency. */
export interface FoundColumn {
  /** At the port, referred to the feed line. */
  readonly reflection: Complex;
  /** Integral of the longitudinal current over each patch, in any common unit. */
  readonly patchCurrents: readonly Complex[];
}

/**
 * One correction by space mapping: the dimensions are found for which the network shows what the other engine shows of the
 * sized ones, and the sized ones are moved as far to the other side. Unlike a difference of responses this holds where the two
 * engines lie a good part of the column's bandwidth apart.
 *
 * Source: J. W. Bandler et al., "Electromagnetic optimization exploiting aggressive space mapping", IEEE Trans. Microw. Theory
 * Tech. 43(12), 1995 (unit slope).
 *
 * @param sized by `sizeColumn` for the same request
 * @param found of exactly `of`, alone on the board
 * @param of    the sized column, or what an earlier correction made of it: then this is the next one
 * @returns     dimensions with what the *network* says of them, which is now off by the difference of the engines
 * @throws RangeError where `found` has not one current for each patch
 */
export function correctSizing(
  given: SizingRequest,
  sized: SizedColumn,
  found: FoundColumn,
  of: ColumnGeometry = sized.geometry,
): SizedColumn {
  requireRequest(given);
  const request = withLinks(given);
  const amplitudes = taperAmplitudes(request.taper, request.patches);
  if (found.patchCurrents.length !== amplitudes.length)
    throw new RangeError(`correctSizing: ${found.patchCurrents.length} currents for ${amplitudes.length} patches`);
  const network = responseOf(solveColumn(request, of));
  const moments = network.moments.map((m, i) => mul(m, div(found.patchCurrents[i], network.patchCurrents[i])));
  const aim: Aim = { reflection: found.reflection, excitation: excitationError(moments, amplitudes) };
  const unknownsFrom = (geometry: ColumnGeometry): ColumnUnknowns =>
    geometry.matching
      ? withMatching(request, geometry, network.reflection)
      : { ...columnUnknowns(request, amplitudes), start: unknownsOf(request, geometry) };
  const unknowns = unknownsFrom(sized.geometry);
  const { start, low, high } = unknowns;
  const { x, calls } = steer(request, amplitudes, unknowns, { tolerance: TOLERANCE, budget: BUDGET }, aim);
  const moved = unknownsFrom(of).start.map((value, i) => Math.min(high[i], Math.max(low[i], value + start[i] - x[i])));
  const corrected = figures(request, amplitudes, unknowns.geometry(moved), calls);
  return { ...corrected, notes: limitNotes(request, corrected.geometry) };
}

function search(
  request: SizingRequest,
  amplitudes: readonly number[],
  effort: Effort,
): { geometry: ColumnGeometry; solves: number } {
  const ratio = resistanceRatio(request, amplitudes);
  const aim: Aim = { reflection: complex((ratio - 1) / (ratio + 1), 0) };
  let before = 0;
  let unknowns: ColumnUnknowns;
  if (amplitudes.length > SHORT) {
    const fewer = halved(amplitudes);
    const shorter = search(request, fewer, ROUGH);
    unknowns = columnUnknowns(request, amplitudes, guessFrom(request, amplitudes, shorter.geometry, fewer));
    before = shorter.solves;
  } else {
    const tried = firstGuesses(request, amplitudes).map((guess) => columnUnknowns(request, amplitudes, guess));
    const sizes = tried.map((u) => squares(residuals(request, amplitudes, u.geometry(u.start), aim)));
    unknowns = tried[sizes.indexOf(Math.min(...sizes))];
    before = tried.length;
  }
  const found = steer(request, amplitudes, unknowns, effort, aim);
  return { geometry: unknowns.geometry(found.x), solves: before + found.calls };
}

const squares = (r: Float64Array): number => r.reduce((sum, value) => sum + value * value, 0);

function residuals(
  request: SizingRequest,
  amplitudes: readonly number[],
  geometry: ColumnGeometry,
  aim?: Aim,
): Float64Array {
  const { reflection, moments } = responseOf(solveColumn(request, geometry));
  const error = excitationError(moments, amplitudes);
  const r = new Float64Array(2 * error.length + 2);
  error.forEach((e, i) => {
    r[2 * i] = amplitudes[i] * (e.re - (aim?.excitation?.[i].re ?? 1));
    r[2 * i + 1] = amplitudes[i] * (e.im - (aim?.excitation?.[i].im ?? 0));
  });
  const s = aim ? sub(reflection, aim.reflection) : reflection;
  r[2 * error.length] = s.re;
  r[2 * error.length + 1] = s.im;
  return r;
}

function steer(
  request: SizingRequest,
  amplitudes: readonly number[],
  unknowns: ColumnUnknowns,
  effort: Effort,
  aim?: Aim,
): { x: Float64Array; calls: number } {
  const f = (x: Float64Array): Float64Array => residuals(request, amplitudes, unknowns.geometry(x), aim);
  return leastSquares(f, unknowns.start, { ...unknowns, reach: REACH, ...effort });
}

function figures(
  request: SizingRequest,
  amplitudes: readonly number[],
  exact: ColumnGeometry,
  solves: number,
): Omit<SizedColumn, 'notes'> {
  const geometry = onGrid(exact, request.grid);
  const solution = solveColumn(request, geometry);
  const response = responseOf(solution);
  const { beamDirection, sidelobeDb } = cutShape(solution.excite([{ re: 1, im: 0 }]).field.cut('elevation'));
  return {
    geometry,
    reflection: response.reflection,
    beamDirection,
    sidelobeDb,
    excitationError: excitationError(response.moments, amplitudes),
    solves,
  };
}
