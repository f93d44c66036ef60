/**
 * Averages of the potentials over the B-splines of cells close to the source, where the potentials are singular or steep.
 *
 * The four-fold integral of two rooftops is a two-fold one of the potential against their correlation, a product of
 * B-splines. It is linear in the potential: the direct term C e^{−jκρ}/(2πρ) enters by moments of ρ^{n−1}, n = 0, 1, …,
 * the rest by weights on its table. Both are geometry. Pieces of a spline that touch the source are split into two
 * triangles (Duffy 1982, SIAM J. Numer. Anal. 19, 1260), others take Gauss points by their distance.
 */
import { abs, add, complex, mul, sqrt, sub } from '../../numerics/complex.js';
import { gaussLegendre } from '../../numerics/gauss-legendre.js';
import { lagrangeWeights } from '../../numerics/lagrange.js';
import { cubicSpline, linearSpline } from './bspline-stencil.js';
import type { PotentialTables } from './slab-potentials.js';

/** Which B-spline stands along x and along y. */
export type CellKind = 'ax' | 'ay' | 'q';

const DEGREES: Record<CellKind, readonly [1 | 3, 1 | 3]> = { ax: [3, 1], ay: [1, 3], q: [1, 1] };
const TABLE_POINTS = 8;

/** Functionals of the near cells: one row a cell. */
export interface NearCells {
  /** Cells (i, j), i and j from 0. */
  readonly cells: readonly (readonly [number, number])[];
  /** Averages of (ρ/unit)^{n−1}, n from 0 to `orders` − 1, row by row. */
  readonly moments: Record<CellKind, Float64Array>;
  readonly orders: number;
  /** m */
  readonly unit: number;
  /** Weights on the near table, row by row. */
  readonly table: Record<CellKind, Float64Array>;
  readonly tableCount: number;
}

/** A point of a piece in the first quadrant, in steps of the grid, and what the functionals read there. */
interface PiecePoint {
  readonly tx: number;
  readonly ty: number;
  readonly weight: number;
  readonly powers: Float64Array;
  readonly first: number;
  readonly lagrange: Float64Array;
}

/**
 * @param radius cells whose middles lie nearer than this are near, m
 * @param orders moments of the direct term
 */
export function nearCells(
  grid: { readonly dx: number; readonly dy: number; readonly nx: number; readonly ny: number },
  radius: number,
  orders: number,
  tables: PotentialTables,
): NearCells {
  const { dx, dy, nx, ny } = grid;
  const unit = radius;
  const cells: [number, number][] = [];
  for (let j = 0; j < ny && j * dy < radius; j++)
    for (let i = 0; i < nx && Math.hypot(i * dx, j * dy) < radius; i++) cells.push([i, j]);
  const rows = (length: number): Record<CellKind, Float64Array> => ({
    ax: new Float64Array(cells.length * length),
    ay: new Float64Array(cells.length * length),
    q: new Float64Array(cells.length * length),
  });
  const moments = rows(orders);
  const table = rows(tables.nearCount);
  const pieces = new Map<string, PiecePoint[]>();
  const piece = (i: number, j: number): PiecePoint[] => {
    const key = `${i} ${j}`;
    let points = pieces.get(key);
    if (!points) {
      points = piecePoints(i, j, dx, dy, unit, orders, tables);
      pieces.set(key, points);
    }
    return points;
  };

  for (const kind of ['ax', 'ay', 'q'] as const) {
    const [degreeX, degreeY] = DEGREES[kind];
    const [splineX, splineY] = [degreeX === 3 ? cubicSpline : linearSpline, degreeY === 3 ? cubicSpline : linearSpline];
    const [halfX, halfY] = [(degreeX + 1) / 2, (degreeY + 1) / 2];
    cells.forEach(([ci, cj], row) => {
      for (let j = cj - halfY; j < cj + halfY; j++) {
        for (let i = ci - halfX; i < ci + halfX; i++) {
          const [signX, signY] = [i < 0 ? -1 : 1, j < 0 ? -1 : 1];
          for (const p of piece(i < 0 ? -i - 1 : i, j < 0 ? -j - 1 : j)) {
            const w = p.weight * splineX(signX * p.tx - ci) * splineY(signY * p.ty - cj);
            for (let n = 0; n < orders; n++) moments[kind][row * orders + n] += w * p.powers[n];
            for (let m = 0; m < TABLE_POINTS; m++)
              table[kind][row * tables.nearCount + Math.abs(p.first + m)] += w * p.lagrange[m];
          }
        }
      }
    });
  }
  return { cells, moments, orders, unit, table, tableCount: tables.nearCount };
}

function piecePoints(
  i: number,
  j: number,
  dx: number,
  dy: number,
  unit: number,
  orders: number,
  tables: PotentialTables,
): PiecePoint[] {
  const points: PiecePoint[] = [];
  const place = (tx: number, ty: number, weight: number): void => {
    const rho = Math.hypot(tx * dx, ty * dy);
    const powers = new Float64Array(orders);
    powers[0] = unit / rho;
    for (let n = 1; n < orders; n++) powers[n] = (powers[n - 1] * rho) / unit;
    const x = Math.asinh(rho / tables.nearScale) / tables.nearStep;
    const first = Math.floor(x) - TABLE_POINTS / 2 + 1;
    const lagrange = new Float64Array(TABLE_POINTS);
    lagrangeWeights(TABLE_POINTS, x - first, lagrange);
    points.push({ tx, ty, weight, powers, first, lagrange });
  };
  if (i === 0 && j === 0) {
    // In either triangle (u, uv) the Jacobian u takes away the 1/ρ.
    const [along, across] = [unitRule(14), unitRule(24)];
    for (const u of along)
      for (const v of across) {
        place(u.at, u.at * v.at, u.weight * v.weight * u.at);
        place(u.at * v.at, u.at, u.weight * v.weight * u.at);
      }
    return points;
  }
  const rule = unitRule(pointsAt(Math.hypot(i * dx, j * dy) / Math.max(dx, dy)));
  for (const u of rule) for (const v of rule) place(i + u.at, j + v.at, u.weight * v.weight);
  return points;
}

/**
 * Gauss points for 1e-9 on a piece whose distance from the singularity is `ratio` of its longer side: n points err as
 * R^{−2n}, R of Bernstein's ellipse through −1 + 2j·ratio (Trefethen 2013, theorem 19.3); one more for the spline.
 */
function pointsAt(ratio: number): number {
  const z = complex(-1, 2 * ratio);
  const root = sqrt(sub(mul(z, z), complex(1)));
  const ellipse = Math.max(abs(add(z, root)), abs(sub(z, root)));
  return 1 + Math.ceil(4.5 / Math.log10(ellipse));
}

/** Gauss points on (0, 1). */
function unitRule(n: number): { at: number; weight: number }[] {
  const { nodes, weights } = gaussLegendre(n);
  return Array.from(nodes, (x, i) => ({ at: (1 + x) / 2, weight: weights[i] / 2 }));
}
