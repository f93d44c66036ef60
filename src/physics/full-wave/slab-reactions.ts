/**
 * Reactions of rooftop currents on a uniform grid in the metal's plane of a slab, as functions of their offset.
 *
 * Mixed-potential form (Mosig & Gardiol 1982, 1985; Michalski & Mosig 1997, from memory): the part of the currents and
 * the part of the charges apart, so that any two rooftops' reaction is a sum of a few entries. With J_x = (I/dy)
 * tri(x/dx) rect(y/dy), I = 1 A, the reaction of two at an offset is dx² times the average of jω G_A over a cubic B-spline
 * along x and a linear one along y; that of two cells' charges is the average of G_q/(jω) over linear ones.
 *
 * Cells nearer than eight steps are integrated (`bspline-cells.ts`), others averaged by stencils from samples on the grid
 * (`bspline-stencil.ts`): relative error about 1e-6, up to 6e-6 beside the source where the steps exceed the slab's height.
 */
import { type Complex, complex, mul, scale } from '../../numerics/complex.js';
import { lagrangeWeights } from '../../numerics/lagrange.js';
import { type CellKind, type NearCells, nearCells } from './bspline-cells.js';
import { averageAlongX, averageAlongY, type QuadrantSamples, STENCIL_REACH, splineStencil } from './bspline-stencil.js';
import type { TransformPair } from './hankel-table.js';
import type { SlabMedium } from './slab-medium.js';
import { type Band, type PotentialTables, potentialTables } from './slab-potentials.js';
import type { DirectTerm } from './slab-spectral.js';

export interface ReactionGrid {
  /** Steps, m. */
  readonly dx: number;
  readonly dy: number;
  /** Offsets 0 to nx − 1 and 0 to ny − 1 steps. */
  readonly nx: number;
  readonly ny: number;
}

/** Each nx·ny, index j·nx + i for the offset (i dx, j dy), even in both; ohm. */
export interface SlabReactions {
  /** Two x-directed rooftops, part of the vector potential, jω included. */
  readonly axRe: Float64Array;
  readonly axIm: Float64Array;
  /** Two y-directed ones. */
  readonly ayRe: Float64Array;
  readonly ayIm: Float64Array;
  /** Two cells that 1 A flows into: 1/(jω) times the average of G_q. Z_xx(i, j) = ax + 2 q(i, j) − q(i + 1, j) − q(i − 1, j). */
  readonly qRe: Float64Array;
  readonly qIm: Float64Array;
}

export interface PreparedReactions {
  /**
   * @param medium another than the one prepared for: within some per cent in permittivity, height and cover; any ground
   * @throws RangeError where its wavenumbers leave the range prepared for
   */
  at(frequency: number, medium?: SlabMedium): SlabReactions;
}

/** Cells integrated rather than sampled, in the larger of the steps. */
const NEAR_STEPS = 8;
/** Samples that the stencils of all other cells take lie beyond this: 8 − 4√2, with something to spare. */
const SAMPLED_FROM = 2.2;
const FAR_POINTS = 6;

/**
 * All that geometry and band decide; each frequency then costs milliseconds.
 *
 * @param band lowest and highest frequency, Hz
 * @throws RangeError on a grid without cells, a band or a medium that is none
 */
export function prepareReactions(grid: ReactionGrid, band: Band, medium: SlabMedium): PreparedReactions {
  const { dx, dy, nx, ny } = grid;
  if (!(dx > 0 && dy > 0 && nx >= 1 && ny >= 1 && Number.isInteger(nx) && Number.isInteger(ny)))
    throw new RangeError(`prepareReactions: ${nx} × ${ny} offsets of ${dx} × ${dy} m`);
  const step = Math.max(dx, dy);
  const radius = NEAR_STEPS * step;
  const nearReach = radius + 2 * Math.hypot(dx, dy);
  const farReach = Math.hypot((nx - 1 + STENCIL_REACH) * dx, (ny - 1 + STENCIL_REACH) * dy);
  const tables = potentialTables(band, medium, nearReach, SAMPLED_FROM * step, Math.max(farReach, 2 * radius));
  // Of a power series of e^{−jx}, until its terms fall below 1e-12.
  const orders = Math.ceil(16 + 2.8 * tables.largestWavenumber * nearReach);
  const near = nearCells(grid, radius, orders, tables);
  const samples = samplePlan(grid, tables);
  const [linear, cubic] = [splineStencil(1), splineStencil(3)];

  function at(frequency: number, actual: SlabMedium = medium): SlabReactions {
    const potentials = tables.at(frequency, actual);
    const column = (): Float64Array => new Float64Array(nx * ny);
    const out = { axRe: column(), axIm: column(), ayRe: column(), ayIm: column(), qRe: column(), qIm: column() };
    const { a, q } = samples(potentials.far);
    averageAlongY(averageAlongX(a, cubic), linear, dx * dx, out.axRe, out.axIm);
    averageAlongY(averageAlongX(a, linear), cubic, dy * dy, out.ayRe, out.ayIm);
    averageAlongY(averageAlongX(q, linear), linear, 1, out.qRe, out.qIm);
    const { directA, directQ, near: table } = potentials;
    fillNear(near, nx, 'ax', dx * dx, directA, table.aRe, table.aIm, out.axRe, out.axIm);
    fillNear(near, nx, 'ay', dy * dy, directA, table.aRe, table.aIm, out.ayRe, out.ayIm);
    fillNear(near, nx, 'q', 1, directQ, table.qRe, table.qIm, out.qRe, out.qIm);
    return out;
  }
  return { at };
}

function fillNear(
  { cells, moments, orders, unit, table, tableCount }: NearCells,
  nx: number,
  kind: CellKind,
  factor: number,
  direct: DirectTerm,
  tableRe: Float64Array,
  tableIm: Float64Array,
  outRe: Float64Array,
  outIm: Float64Array,
): void {
  // C e^{−jκρ}/(2πρ) = C/(2π unit) Σ (−jκ unit)^n/n! (ρ/unit)^{n−1}
  const step = mul(complex(0, -unit), direct.wavenumber);
  let term: Complex = scale(direct.amplitude, 1 / (2 * Math.PI * unit));
  const [termRe, termIm] = [new Float64Array(orders), new Float64Array(orders)];
  for (let n = 0; n < orders; n++) {
    termRe[n] = term.re;
    termIm[n] = term.im;
    term = scale(mul(term, step), 1 / (n + 1));
  }
  const [rowMoments, rowTable] = [moments[kind], table[kind]];
  for (let row = 0; row < cells.length; row++) {
    let [re, im] = [0, 0];
    for (let n = 0, p = row * orders; n < orders; n++, p++) {
      re += rowMoments[p] * termRe[n];
      im += rowMoments[p] * termIm[n];
    }
    for (let m = 0, p = row * tableCount; m < tableCount; m++, p++) {
      re += rowTable[p] * tableRe[m];
      im += rowTable[p] * tableIm[m];
    }
    const index = cells[row][1] * nx + cells[row][0];
    outRe[index] = factor * re;
    outIm[index] = factor * im;
  }
}

/** Samples of both potentials at the offsets and a margin, 0 where they are not asked for; written over by the next call. */
function samplePlan(
  { dx, dy, nx, ny }: ReactionGrid,
  tables: PotentialTables,
): (far: TransformPair) => { a: QuadrantSamples; q: QuadrantSamples } {
  const [width, height] = [nx + STENCIL_REACH, ny + STENCIL_REACH];
  const count = width * height;
  const first = new Int32Array(count);
  const weights = new Float64Array(count * FAR_POINTS);
  // e^{−jκρ}/ρ
  const [waveRe, waveIm] = [new Float64Array(count), new Float64Array(count)];
  for (let j = 0, p = 0; j < height; j++) {
    for (let i = 0; i < width; i++, p++) {
      const rho = Math.hypot(i * dx, j * dy);
      if (rho < tables.farStart) continue;
      waveRe[p] = Math.cos(tables.farWavenumber * rho) / rho;
      waveIm[p] = -Math.sin(tables.farWavenumber * rho) / rho;
      const x = Math.log(rho / tables.farStart) / tables.farStep;
      first[p] = Math.min(Math.max(0, Math.floor(x) - FAR_POINTS / 2 + 1), tables.farCount - FAR_POINTS);
      lagrangeWeights(FAR_POINTS, x - first[p], weights, p * FAR_POINTS);
    }
  }
  const samples = (): QuadrantSamples => ({ re: new Float64Array(count), im: new Float64Array(count), width, height });
  const [a, q] = [samples(), samples()];

  return ({ aRe, aIm, qRe, qIm }) => {
    for (let p = 0, w = 0; p < count; p++) {
      let [sumA, sumAj, sumQ, sumQj] = [0, 0, 0, 0];
      for (let t = first[p], end = t + FAR_POINTS; t < end; t++, w++) {
        const weight = weights[w];
        sumA += weight * aRe[t];
        sumAj += weight * aIm[t];
        sumQ += weight * qRe[t];
        sumQj += weight * qIm[t];
      }
      const [c, s] = [waveRe[p], waveIm[p]];
      a.re[p] = sumA * c - sumAj * s;
      a.im[p] = sumA * s + sumAj * c;
      q.re[p] = sumQ * c - sumQj * s;
      q.im[p] = sumQ * s + sumQj * c;
    }
    return { a, q };
  };
}
