/**
 * Edges of metal that do not lie where the grid draws them.
 *
 * Piecewise constant charges (and currents across the edge's direction) make metal act as if it ended a little inside the
 * drawn edge. A further term on the diagonal of the outermost row of cells, κ/(2πε) for the charge and µκ/(2π) for the
 * current along the edge, moves the acting edge inwards for κ > 0 and outwards for κ < 0. Near an edge only the static part
 * of the field counts, so that one function serves all edges: the distance from the drawn edge inwards to the acting edge
 * in cells, as a function of κ. Own derivation; the function is solved here for a strip in free space, whose true width
 * is known from its logarithmic capacity W/4.
 */
import { bracketedRoot } from '../../numerics/brent.js';
import { factoriseReal, solveReal } from '../../numerics/real-lu.js';

/** Cells across the strip that stands for any edge: with 40 the distance is within 0.001 cell of its limit. */
const CELLS = 40;

/** Mean of −ln|y − y′| over two unit cells k apart. */
function meanLogarithm(k: number): number {
  const twice = (x: number): number => (x === 0 ? 0 : (x * x * Math.log(Math.abs(x))) / 2 - (3 * x * x) / 4);
  return 2 * twice(k) - twice(k + 1) - twice(k - 1);
}

/** Distance from the drawn edge inwards to the acting one, in cells. */
export function actingEdge(kappa: number): number {
  const a = new Float64Array(CELLS * CELLS);
  for (let i = 0; i < CELLS; i++) {
    for (let j = 0; j < CELLS; j++) a[i * CELLS + j] = meanLogarithm(i - j);
    if (i === 0 || i === CELLS - 1) a[i * CELLS + i] += kappa;
  }
  const charge = new Float64Array(CELLS).fill(1);
  solveReal(factoriseReal(a, CELLS), charge);
  const width = 4 * Math.exp(-1 / charge.reduce((sum, q) => sum + q, 0));
  return (CELLS - width) / 2;
}

/** Distance inwards of the acting edge, in cells, without a further term. */
export const NATURAL_EDGE = actingEdge(0);

const LEAST = -0.9;
const MOST = 2;

/**
 * κ that puts the acting edge `inwards` cells inside the drawn one.
 *
 * @param inwards −0.45 to 0.55; what lies further out is brought to the nearer end
 */
export function edgeTrim(inwards: number): number {
  if (inwards === NATURAL_EDGE) return 0;
  const excess = (kappa: number): number => actingEdge(kappa) - inwards;
  const low = excess(LEAST);
  const high = excess(MOST);
  if (low >= 0) return LEAST;
  if (high <= 0) return MOST;
  return bracketedRoot(excess, [LEAST, low], [MOST, high], 1e-6).inside;
}
