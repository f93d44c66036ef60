import { type Complex, sub } from '../../numerics/complex.js';
import type { ColumnGeometry } from '../column/index.js';
import { cutShape } from '../pattern/index.js';
import { taperAmplitudes } from '../taper/index.js';
import { excitationError, responseOf, solveColumn } from './column-response.js';
import { type ColumnUnknowns, columnUnknowns } from './column-unknowns.js';
import { type LeastSquaresResult, leastSquares } from './least-squares.js';
import { type SizedColumn, type SizingRequest, requireRequest } from './request.js';
import { firstGuess, guessFrom, halved } from './starting-layout.js';

const BUDGET = 220;
const TOLERANCE = 2e-3;

/** Where the network is to be steered to instead of a perfect column: what another engine found beside it. */
interface Aim {
  readonly reflection: Complex;
  readonly excitation: readonly Complex[];
}

/** Columns up to this many patches are found from closed forms; longer ones by way of shorter ones. */
const SHORT = 5;

export function sizeColumn(request: SizingRequest): SizedColumn {
  requireRequest(request);
  const amplitudes = taperAmplitudes(request.taper, request.patches);
  const { geometry, solves } = search(request, amplitudes);
  return figures(request, amplitudes, geometry, solves);
}

function search(request: SizingRequest, amplitudes: readonly number[]): { geometry: ColumnGeometry; solves: number } {
  let before = 0;
  let guess = firstGuess(request, amplitudes);
  if (amplitudes.length > SHORT) {
    const fewer = halved(amplitudes);
    const shorter = search(request, fewer);
    guess = guessFrom(request, amplitudes, shorter.geometry, fewer);
    before = shorter.solves;
  }
  const unknowns = columnUnknowns(request, amplitudes, guess);
  const found = steer(request, amplitudes, unknowns, unknowns.start);
  return { geometry: unknowns.geometry(found.x), solves: before + found.calls };
}

function steer(
  request: SizingRequest,
  amplitudes: readonly number[],
  unknowns: ColumnUnknowns,
  start: Float64Array,
  aim?: Aim,
): LeastSquaresResult {
  const residuals = (x: Float64Array): Float64Array => {
    const { reflection, moments } = responseOf(solveColumn(request, unknowns.geometry(x)));
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
  };
  return leastSquares(residuals, start, { ...unknowns, tolerance: TOLERANCE, budget: BUDGET });
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
