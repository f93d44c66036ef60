/**
 * Product of all reactions on the metal with a current, by transforms on the whole grid: convolution of currents along x
 * and y with the reactions of their vector potential, and of the charge that they leave with that of the scalar potential.
 *
 * Four transforms a product: charge and its gradient are factors 1 − e^{−jk} of the spectra.
 */
import { laneFft } from '../../numerics/fft-lanes.js';
import type { ComplexVector, LinearMap } from '../../numerics/gmres.js';
import type { Mesh } from './mesh.js';
import { circulantSize, LANES, type ReactionSpectrum } from './reaction-spectrum.js';

/** Rows of the grid with currents along one axis, each with the run of unknowns that lies in it. */
interface Rows {
  readonly row: number;
  readonly unknown: Int32Array;
  readonly column: Int32Array;
}

/** Scratch and plans for one mesh, to be used with any spectrum of its size. Not re-entrant. */
export function reactionProduct(mesh: Mesh): (spectrum: ReactionSpectrum) => LinearMap {
  const { nx, ny } = mesh;
  const { columns, rows } = circulantSize(nx, ny);
  const along = laneFft(columns, LANES);
  const across = laneFft(rows, LANES);
  const currents = [gatherRows(mesh, 0), gatherRows(mesh, 1)] as const;
  const pad = Math.ceil(columns / LANES) * LANES;
  const middle = [0, 1].map(() => ({ re: new Float64Array(ny * pad), im: new Float64Array(ny * pad) }));
  const line = { re: new Float64Array(columns * LANES), im: new Float64Array(columns * LANES) };
  const posts = [0, 1].map(() => ({ re: new Float64Array(rows * LANES), im: new Float64Array(rows * LANES) }));
  const dx = shiftFactors(columns);
  const dy = shiftFactors(rows);

  function forwardRows(list: readonly Rows[], x: ComplexVector, to: ComplexVector): void {
    for (let r0 = 0; r0 < list.length; r0 += LANES) {
      const lanes = Math.min(LANES, list.length - r0);
      line.re.fill(0);
      line.im.fill(0);
      for (let q = 0; q < lanes; q++) {
        const { unknown, column } = list[r0 + q];
        for (let n = 0; n < unknown.length; n++) {
          line.re[column[n] * LANES + q] = x.re[unknown[n]];
          line.im[column[n] * LANES + q] = x.im[unknown[n]];
        }
      }
      along.transform(line.re, line.im);
      for (let q = 0; q < lanes; q++) {
        const base = list[r0 + q].row * pad;
        for (let k = 0, p = q; k < columns; k++, p += LANES) {
          to.re[base + k] = line.re[p];
          to.im[base + k] = line.im[p];
        }
      }
    }
  }

  function inverseRows(list: readonly Rows[], from: ComplexVector, y: ComplexVector): void {
    for (let r0 = 0; r0 < list.length; r0 += LANES) {
      const lanes = Math.min(LANES, list.length - r0);
      for (let q = 0; q < lanes; q++) {
        const base = list[r0 + q].row * pad;
        for (let k = 0, p = q; k < columns; k++, p += LANES) {
          line.re[p] = from.re[base + k];
          line.im[p] = from.im[base + k];
        }
      }
      along.transform(line.im, line.re);
      for (let q = 0; q < lanes; q++) {
        const { unknown, column } = list[r0 + q];
        for (let n = 0; n < unknown.length; n++) {
          y.re[unknown[n]] = line.re[column[n] * LANES + q];
          y.im[unknown[n]] = line.im[column[n] * LANES + q];
        }
      }
    }
  }

  function columnPass(spectrum: ReactionSpectrum): void {
    const [px, py] = posts;
    for (let k0 = 0; k0 < columns; k0 += LANES) {
      loadPosts(currents[0], middle[0], px, k0);
      loadPosts(currents[1], middle[1], py, k0);
      across.transform(px.re, px.im);
      across.transform(py.re, py.im);
      react(spectrum, px, py, k0, Math.min(LANES, columns - k0));
      across.transform(px.im, px.re);
      across.transform(py.im, py.re);
      storePosts(currents[0], middle[0], px, k0);
      storePosts(currents[1], middle[1], py, k0);
    }
  }

  function loadPosts(list: readonly Rows[], from: ComplexVector, to: ComplexVector, k0: number): void {
    to.re.fill(0);
    to.im.fill(0);
    for (const { row } of list) {
      const a = row * pad + k0;
      const b = row * LANES;
      for (let q = 0; q < LANES; q++) {
        to.re[b + q] = from.re[a + q];
        to.im[b + q] = from.im[a + q];
      }
    }
  }

  function storePosts(list: readonly Rows[], to: ComplexVector, from: ComplexVector, k0: number): void {
    for (const { row } of list) {
      const a = row * pad + k0;
      const b = row * LANES;
      for (let q = 0; q < LANES; q++) {
        to.re[a + q] = from.re[b + q];
        to.im[a + q] = from.im[b + q];
      }
    }
  }

  /** Currents to fields at LANES wavenumbers along x and all across, in place. */
  function react(s: ReactionSpectrum, px: ComplexVector, py: ComplexVector, k0: number, lanes: number): void {
    const half = Math.floor(columns / 2) + 1;
    for (let l = 0; l < rows; l++) {
      const row = Math.min(l, rows - l) * half;
      const er = dy.re[l];
      const ei = dy.im[l];
      for (let q = 0; q < lanes; q++) {
        const k = k0 + q;
        const at = row + (k < half ? k : columns - k);
        const p = l * LANES + q;
        const dr = dx.re[k];
        const di = dx.im[k];
        const xr = px.re[p];
        const xi = px.im[p];
        const yr = py.re[p];
        const yi = py.im[p];
        const cr = dr * xr - di * xi + er * yr - ei * yi;
        const ci = dr * xi + di * xr + er * yi + ei * yr;
        const qr = s.qRe[at];
        const qi = s.qIm[at];
        const vr = qr * cr - qi * ci;
        const vi = qr * ci + qi * cr;
        const ar = s.axRe[at];
        const ai = s.axIm[at];
        const br = s.ayRe[at];
        const bi = s.ayIm[at];
        px.re[p] = ar * xr - ai * xi + dr * vr + di * vi;
        px.im[p] = ar * xi + ai * xr + dr * vi - di * vr;
        py.re[p] = br * yr - bi * yi + er * vr + ei * vi;
        py.im[p] = br * yi + bi * yr + er * vi - ei * vr;
      }
    }
  }

  return (spectrum) => (x, y) => {
    forwardRows(currents[0], x, middle[0]);
    forwardRows(currents[1], x, middle[1]);
    columnPass(spectrum);
    inverseRows(currents[0], middle[0], y);
    inverseRows(currents[1], middle[1], y);
  };
}

/** 1 − e^{−j2πk/N}: what leaves a cell by the edge behind it less what comes by the one before. */
function shiftFactors(n: number): ComplexVector {
  return {
    re: Float64Array.from({ length: n }, (_, k) => 1 - Math.cos((2 * Math.PI * k) / n)),
    im: Float64Array.from({ length: n }, (_, k) => Math.sin((2 * Math.PI * k) / n)),
  };
}

function gatherRows(mesh: Mesh, axis: 0 | 1): Rows[] {
  const found = new Map<number, { unknown: number[]; column: number[] }>();
  const [from, to] = axis === 0 ? [0, mesh.xCount] : [mesh.xCount, mesh.unknowns];
  for (let u = from; u < to; u++) {
    const column = mesh.cellOf[u] % mesh.nx;
    const row = (mesh.cellOf[u] - column) / mesh.nx;
    const known = found.get(row) ?? { unknown: [], column: [] };
    known.unknown.push(u);
    known.column.push(column);
    found.set(row, known);
  }
  return [...found]
    .sort(([a], [b]) => a - b)
    .map(([row, { unknown, column }]) => ({
      row,
      unknown: Int32Array.from(unknown),
      column: Int32Array.from(column),
    }));
}
