/** Currents of an excited board as a source of fields: all of the metal, and feed lines that go on for ever. */
import { type Complex, complex, exp, sub } from '../../numerics/complex.js';
import type { ComplexVector } from '../../numerics/gmres.js';
import type { Mesh } from './mesh.js';
import type { LineWaves, MeshPort } from './port-waves.js';
import type { CurrentSpectrum } from './slab-wave.js';

/** A feed line whose gap and stub are left out: the two waves go on to where they come from. */
interface Continuation {
  readonly port: MeshPort;
  readonly waves: LineWaves;
  readonly gamma: Complex;
}

export interface BoardCurrents {
  readonly spectrum: CurrentSpectrum;
  readonly extent: { readonly x: number; readonly y: number };
}

/** @param current of every unknown, A */
export function boardCurrents(mesh: Mesh, current: ComplexVector, feeds: readonly Continuation[]): BoardCurrents {
  const kept = keptCurrents(mesh, feeds);
  const along = planeOf(mesh, current, kept, 'x');
  const across = planeOf(mesh, current, kept, 'y');
  const lines = feeds.map((feed) => continuedLine(mesh, current, feed));
  const { grid } = mesh;
  const sum = new Float64Array(2);
  const spectrum: CurrentSpectrum = (kx, ky, out) => {
    const sx = sinc((kx * grid.dx) / 2);
    const sy = sinc((ky * grid.dy) / 2);
    along(kx, ky, sum);
    out[0] = sum[0] * grid.dx * sx * sx * sy;
    out[1] = sum[1] * grid.dx * sx * sx * sy;
    across(kx, ky, sum);
    out[2] = sum[0] * grid.dy * sx * sy * sy;
    out[3] = sum[1] * grid.dy * sx * sy * sy;
    for (const line of lines) line(kx, ky, out);
  };
  let [low, high, bottom, top] = [mesh.nx, 0, mesh.ny, 0];
  for (const { metal, i0, i1, j0, j1 } of mesh.rectangles) {
    if (metal.kind === 'feed') continue;
    low = Math.min(low, i0);
    high = Math.max(high, i1);
    bottom = Math.min(bottom, j0);
    top = Math.max(top, j1);
  }
  return { spectrum, extent: { x: (high - low) * grid.dx, y: (top - bottom) * grid.dy } };
}

const sinc = (a: number): number => (a === 0 ? 1 : Math.sin(a) / a);

/** All unknowns but those of a feed line behind its last fit station, that station with them. */
function keptCurrents(mesh: Mesh, feeds: readonly Continuation[]): Uint8Array {
  const kept = new Uint8Array(mesh.unknowns).fill(1);
  for (const { port } of feeds) {
    const { i0, i1, j0, j1 } = port.cells;
    const last = port.fit[port.fit.length - 1];
    for (let u = 0; u < mesh.unknowns; u++) {
      const i = mesh.cellOf[u] % mesh.nx;
      const j = (mesh.cellOf[u] - i) / mesh.nx;
      if (i < i0 || i >= i1 || j < j0 || j >= j1) continue;
      const along = port.line.axis === 'x';
      const flows = u < mesh.xCount === along;
      const at = along
        ? mesh.grid.x0 + (flows ? i + 1 : i + 0.5) * mesh.grid.dx
        : mesh.grid.y0 + (flows ? j + 1 : j + 0.5) * mesh.grid.dy;
      if ((at - port.line.plane) * port.line.into <= last.s + 1e-9) kept[u] = 0;
    }
  }
  return kept;
}

/**
 * Σ I e^{j(kx x + ky y)} over the currents of one direction. Sums over rows, and over columns, are kept for the last kx
 * and ky: directions are mostly asked for along lines of one of the two.
 */
function planeOf(
  mesh: Mesh,
  current: ComplexVector,
  kept: Uint8Array,
  axis: 'x' | 'y',
): (kx: number, ky: number, out: Float64Array) => void {
  const { nx, ny, grid, xCount, unknowns, cellOf } = mesh;
  const [from, to] = axis === 'x' ? [0, xCount] : [xCount, unknowns];
  const list: number[] = [];
  for (let u = from; u < to; u++) if (kept[u]) list.push(u);
  const column = Int32Array.from(list, (u) => cellOf[u] % nx);
  const row = Int32Array.from(list, (u) => Math.floor(cellOf[u] / nx));
  const re = Float64Array.from(list, (u) => current.re[u]);
  const im = Float64Array.from(list, (u) => current.im[u]);
  const x0 = grid.x0 + (axis === 'x' ? 1 : 0.5) * grid.dx;
  const y0 = grid.y0 + (axis === 'x' ? 0.5 : 1) * grid.dy;
  const rows = collapse(re, im, column, row, nx, ny, x0, grid.dx);
  const columns = collapse(re, im, row, column, ny, nx, y0, grid.dy);
  let [lastX, lastY] = [Number.NaN, Number.NaN];
  return (kx, ky, out) => {
    if (kx === rows.known()) rows.sum(ky, y0, grid.dy, out);
    else if (ky === columns.known()) columns.sum(kx, x0, grid.dx, out);
    else if (ky === lastY && kx !== lastX) {
      columns.take(ky);
      columns.sum(kx, x0, grid.dx, out);
    } else {
      rows.take(kx);
      rows.sum(ky, y0, grid.dy, out);
    }
    [lastX, lastY] = [kx, ky];
  };
}

/** Sums along one direction at one wavenumber, one for each line of the other. */
function collapse(
  re: Float64Array,
  im: Float64Array,
  place: Int32Array,
  line: Int32Array,
  places: number,
  lines: number,
  origin: number,
  step: number,
) {
  const cos = new Float64Array(places);
  const sin = new Float64Array(places);
  const sumRe = new Float64Array(lines);
  const sumIm = new Float64Array(lines);
  const used = Int32Array.from(new Set(line)).sort();
  let k = Number.NaN;
  return {
    known: () => k,
    take(wavenumber: number): void {
      k = wavenumber;
      for (let p = 0; p < places; p++) {
        const phase = k * (origin + p * step);
        cos[p] = Math.cos(phase);
        sin[p] = Math.sin(phase);
      }
      sumRe.fill(0);
      sumIm.fill(0);
      for (let n = 0; n < re.length; n++) {
        const c = cos[place[n]];
        const s = sin[place[n]];
        sumRe[line[n]] += re[n] * c - im[n] * s;
        sumIm[line[n]] += re[n] * s + im[n] * c;
      }
    },
    sum(other: number, otherOrigin: number, otherStep: number, out: Float64Array): void {
      let [totalRe, totalIm] = [0, 0];
      for (const l of used) {
        const phase = other * (otherOrigin + l * otherStep);
        const c = Math.cos(phase);
        const s = Math.sin(phase);
        totalRe += sumRe[l] * c - sumIm[l] * s;
        totalIm += sumRe[l] * s + sumIm[l] * c;
      }
      out[0] = totalRe;
      out[1] = totalIm;
    },
  };
}

/**
 * Adds the spectrum of the two waves at all stations from the last fit station back: a geometric series, continued
 * analytically where loss makes the wave grow towards its source.
 */
function continuedLine(
  mesh: Mesh,
  current: ComplexVector,
  { port, waves, gamma }: Continuation,
): (kx: number, ky: number, out: Float64Array) => void {
  const { grid } = mesh;
  const { line, cells } = port;
  const along = line.axis === 'x';
  const [step, width] = along ? [grid.dx, grid.dy] : [grid.dy, grid.dx];
  const last = port.fit[port.fit.length - 1];
  // How the current spreads across: its mean over the fit stations, which the waves have in common.
  const shares = new Float64Array(last.unknowns.length);
  for (const { unknowns } of port.fit)
    unknowns.forEach((u, k) => {
      shares[k] += Math.hypot(current.re[u], current.im[u]);
    });
  const whole = shares.reduce((sum, s) => sum + s, 0);
  const acrossOrigin = along ? grid.y0 + (cells.j0 + 0.5) * grid.dy : grid.x0 + (cells.i0 + 0.5) * grid.dx;
  const geometric = (amplitude: Complex, g: Complex, k: number): Complex => {
    // Σ over n ≥ 0 of amplitude e^{−g (s − n step)} e^{jk (s − n step)}
    const ratio = exp(complex(g.re * step, (g.im - k) * step));
    const first = exp(complex(-g.re * last.s, (k - g.im) * last.s));
    const over = sub(complex(1), ratio);
    const size = over.re * over.re + over.im * over.im;
    const a = complex(
      amplitude.re * first.re - amplitude.im * first.im,
      amplitude.re * first.im + amplitude.im * first.re,
    );
    return complex((a.re * over.re + a.im * over.im) / size, (a.im * over.re - a.re * over.im) / size);
  };
  return (kx, ky, out) => {
    const [kAlong, kAcross] = along ? [kx, ky] : [ky, kx];
    // s runs into the board.
    const k = kAlong * line.into;
    const forth = geometric(waves.forward, gamma, k);
    const back = geometric(waves.backward, complex(-gamma.re, -gamma.im), k);
    const re = line.into * (forth.re - back.re);
    const im = line.into * (forth.im - back.im);
    let [cr, ci] = [0, 0];
    for (let n = 0; n < shares.length; n++) {
      const phase = kAcross * (acrossOrigin + n * width);
      cr += (shares[n] / whole) * Math.cos(phase);
      ci += (shares[n] / whole) * Math.sin(phase);
    }
    const plane = kAlong * line.plane;
    const [pr, pi] = [Math.cos(plane), Math.sin(plane)];
    const [ar, ai] = [cr * pr - ci * pi, cr * pi + ci * pr];
    const f = step * sinc((kAlong * step) / 2) ** 2 * sinc((kAcross * width) / 2);
    const at = along ? 0 : 2;
    out[at] += f * (re * ar - im * ai);
    out[at + 1] += f * (re * ai + im * ar);
  };
}
