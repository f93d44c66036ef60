/** What acts within a cell only: the metal's sheet impedance, and the trims of edges off the grid lines. */
import type { Complex } from '../../numerics/complex.js';
import type { ComplexVector } from '../../numerics/gmres.js';
import { EPS0, MU0 } from '../constants.js';
import type { Mesh } from './mesh.js';

/** Per metal cell of the mesh, ohm: between currents along x, along y, and on the current that flows into the cell. */
export interface LocalTerms {
  readonly x: ComplexVector;
  readonly y: ComplexVector;
  /** Imaginary: a capacitance in series; loss of the dielectric is in the real part. */
  readonly charge: ComplexVector;
}

/**
 * @param sheet    sheet impedance of each rectangle of the mesh, ohm
 * @param ambient  mean of the relative permittivities under and over the metal, which charges near an edge see
 */
export function localTerms(mesh: Mesh, frequency: number, sheet: readonly Complex[], ambient: Complex): LocalTerms {
  const { cells, grid } = mesh;
  const n = cells.place.length;
  const vector = (): ComplexVector => ({ re: new Float64Array(n), im: new Float64Array(n) });
  const terms = { x: vector(), y: vector(), charge: vector() };
  const omega = 2 * Math.PI * frequency;
  const inductive = (omega * MU0) / (2 * Math.PI);
  // 1/(jω 2π ε0 ε) = −j ε*/(|ε|² ω 2π ε0)
  const over = 1 / (omega * 2 * Math.PI * EPS0 * (ambient.re * ambient.re + ambient.im * ambient.im));
  const potential = { re: -ambient.im * over, im: -ambient.re * over };
  for (let c = 0; c < n; c++) {
    const z = sheet[cells.rectangle[c]];
    terms.x.re[c] = (z.re * grid.dx) / grid.dy;
    terms.x.im[c] = (z.im * grid.dx) / grid.dy + inductive * cells.currentX[c] * grid.dx;
    terms.y.re[c] = (z.re * grid.dy) / grid.dx;
    terms.y.im[c] = (z.im * grid.dy) / grid.dx + inductive * cells.currentY[c] * grid.dy;
    const kappa = cells.chargeX[c] / grid.dx + cells.chargeY[c] / grid.dy;
    terms.charge.re[c] = potential.re * kappa;
    terms.charge.im[c] = potential.im * kappa;
  }
  return terms;
}

/** The same as a sparse matrix over the unknowns: row u holds entries start[u] to start[u + 1]. Places may repeat: they add. */
export interface LocalMatrix {
  readonly start: Int32Array;
  readonly column: Int32Array;
  readonly re: Float64Array;
  readonly im: Float64Array;
}

export function localMatrix(mesh: Mesh, terms: LocalTerms): LocalMatrix {
  const start = new Int32Array(mesh.unknowns + 1);
  eachLocal(mesh, terms, (row) => start[row + 1]++);
  for (let u = 0; u < mesh.unknowns; u++) start[u + 1] += start[u];
  const next = start.slice();
  const count = start[mesh.unknowns];
  const matrix = {
    start,
    column: new Int32Array(count),
    re: new Float64Array(count),
    im: new Float64Array(count),
  };
  eachLocal(mesh, terms, (row, column, re, im) => {
    const e = next[row]++;
    matrix.column[e] = column;
    matrix.re[e] = re;
    matrix.im[e] = im;
  });
  return matrix;
}

/** y += L x */
export function addLocal({ start, column, re, im }: LocalMatrix, x: ComplexVector, y: ComplexVector): void {
  for (let u = 0; u + 1 < start.length; u++) {
    let sumRe = 0;
    let sumIm = 0;
    for (let e = start[u]; e < start[u + 1]; e++) {
      const xr = x.re[column[e]];
      const xi = x.im[column[e]];
      sumRe += re[e] * xr - im[e] * xi;
      sumIm += re[e] * xi + im[e] * xr;
    }
    y.re[u] += sumRe;
    y.im[u] += sumIm;
  }
}

/** Visits every entry of the local matrix: row, column, value. Entries of one place come more than once and add up. */
function eachLocal(
  mesh: Mesh,
  terms: LocalTerms,
  visit: (row: number, column: number, re: number, im: number) => void,
): void {
  const { edges, place } = mesh.cells;
  for (let c = 0; c < place.length; c++) {
    const e = 4 * c;
    // Triangles that overlap in a cell: a third of the cell with themselves, a sixth with each other.
    for (const axis of [0, 2]) {
      const t = axis === 0 ? terms.x : terms.y;
      const low = edges[e + axis];
      const high = edges[e + axis + 1];
      if (low >= 0) visit(low, low, t.re[c] / 3, t.im[c] / 3);
      if (high >= 0) visit(high, high, t.re[c] / 3, t.im[c] / 3);
      if (low >= 0 && high >= 0) {
        visit(low, high, t.re[c] / 6, t.im[c] / 6);
        visit(high, low, t.re[c] / 6, t.im[c] / 6);
      }
    }
    const re = terms.charge.re[c];
    const im = terms.charge.im[c];
    if (re === 0 && im === 0) continue;
    for (let a = 0; a < 4; a++) {
      if (edges[e + a] < 0) continue;
      for (let b = 0; b < 4; b++) {
        if (edges[e + b] < 0) continue;
        const sign = (a + b) % 2 === 0 ? 1 : -1;
        visit(edges[e + a], edges[e + b], sign * re, sign * im);
      }
    }
  }
}
