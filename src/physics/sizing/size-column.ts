import { type Complex, sub } from '../../numerics/complex.js';
import type { ColumnGeometry } from '../column/index.js';
import { cutShape } from '../pattern/index.js';
import { taperAmplitudes } from '../taper/index.js';
import { excitationError, responseOf, solveColumn } from './column-response.js';
import { type ColumnUnknowns, columnUnknowns } from './column-unknowns.js';
import { type LeastSquaresResult, leastSquares } from './least-squares.js';
import { type SizedColumn, type SizingRequest, requireRequest } from './request.js';
import { firstGuesses, guessFrom, halved } from './starting-layout.js';

const BUDGET = 220;
const TOLERANCE = 5e-3;

/** Where the network is to be steered to instead of a perfect column: what another engine found beside it. */
interface Aim {
  readonly reflection: Complex;
  readonly excitation: readonly Complex[];
}

/** Columns up to this many patches are found from closed forms; longer ones by way of shorter ones. */
const SHORT = 3;
const WORD = 0.03;

export function sizeColumn(request: SizingRequest): SizedColumn {
  requireRequest(request);
  const amplitudes = taperAmplitudes(request.taper, request.patches);
  const { geometry, solves } = search(request, amplitudes, TOLERANCE);
  return figures(request, amplitudes, geometry, solves);
}

function search(
  request: SizingRequest,
  amplitudes: readonly number[],
  tolerance: number,
): { geometry: ColumnGeometry; solves: number } {
  let before = 0;
  let unknowns: ColumnUnknowns;
  if (amplitudes.length > SHORT) {
    const fewer = halved(amplitudes);
    const shorter = search(request, fewer, WORD);
    unknowns = columnUnknowns(request, amplitudes, guessFrom(request, amplitudes, shorter.geometry, fewer));
    before = shorter.solves;
  } else {
    const tried = firstGuesses(request, amplitudes).map((guess) => columnUnknowns(request, amplitudes, guess));
    const sizes = tried.map((u) => squares(residuals(request, amplitudes, u.geometry(u.start))));
    unknowns = tried[sizes.indexOf(Math.min(...sizes))];
    before = tried.length;
  }
  const found = steer(request, amplitudes, unknowns, unknowns.start, tolerance);
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
    r[2 * i] = e.re - (aim?.excitation[i].re ?? 1);
    r[2 * i + 1] = e.im - (aim?.excitation[i].im ?? 0);
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
  start: Float64Array,
  tolerance: number,
  aim?: Aim,
): LeastSquaresResult {
  const f = (x: Float64Array): Float64Array => residuals(request, amplitudes, unknowns.geometry(x), aim);
  return leastSquares(f, start, { ...unknowns, reach: 20, tolerance, budget: BUDGET });
}

function figures(
  request: SizingRequest,
  amplitudes: readonly number[],
  geometry: ColumnGeometry,
  solves: number,
): SizedColumn {
  const solution = solveColumn(request, geometry);
  const response = responseOf(solution);
  const shape = cutShape(solution.excite([{ re: 1, im: 0 }]).field.cut('elevation'));
  return {
    geometry,
    reflection: response.reflection,
    beamDirection: shape.beamDirection,
    sidelobeDb: shape.sidelobeDb,
    excitationError: excitationError(response.moments, amplitudes),
    notes: [],
    solves,
  };
}
