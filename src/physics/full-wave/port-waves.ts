/** Waves on the feed lines: where each is driven, where its current is read, and the two waves that the current holds. */
import { type Complex, complex, exp, scale } from '../../numerics/complex.js';
import type { ComplexVector } from '../../numerics/gmres.js';
import type { Mesh } from './mesh.js';
import type { PortLine } from './outline.js';

/** One cross-section of a feed line. */
export interface Station {
  /** Distance from the reference plane in the direction into the board, m: negative on the line. */
  readonly s: number;
  /** Currents across it. */
  readonly unknowns: Int32Array;
}

export interface MeshPort {
  readonly line: PortLine;
  /** Index of the feed line's rectangle. */
  readonly rectangle: number;
  readonly gap: Station;
  /** Where the current is read, from the gap's side to the plane's. */
  readonly fit: readonly Station[];
  /** Cells of the line, in which currents beyond the last fit station are replaced by the two waves. */
  readonly cells: { readonly i0: number; readonly i1: number; readonly j0: number; readonly j1: number };
}

/**
 * @param clear distance from gap and plane within which other fields than the line's wave disturb the current, m
 * @throws RangeError where too little of the line is left to read
 */
export function meshPort(mesh: Mesh, line: PortLine, clear: number): MeshPort {
  const { grid, nx } = mesh;
  const feed = mesh.rectangles.find(
    ({ metal }) =>
      metal.kind === 'feed' &&
      metal.column === line.column &&
      (line.axis === 'x'
        ? metal.x0 - 1e-9 < Math.min(line.plane, line.gap) && metal.x1 + 1e-9 > Math.max(line.plane, line.gap)
        : metal.y0 - 1e-9 < Math.min(line.plane, line.gap) && metal.y1 + 1e-9 > Math.max(line.plane, line.gap)),
  );
  if (!feed) throw new RangeError('meshPort: no feed line was drawn for the port');
  const alongX = line.axis === 'x';
  const [from, to] = alongX ? [feed.i0, feed.i1] : [feed.j0, feed.j1];
  const [low, high] = alongX ? [feed.j0, feed.j1] : [feed.i0, feed.i1];
  const stations: Station[] = [];
  for (let e = from; e + 1 < to; e++) {
    const at = alongX ? grid.x0 + (e + 1) * grid.dx : grid.y0 + (e + 1) * grid.dy;
    const unknowns = Int32Array.from({ length: high - low }, (_, k) =>
      alongX ? mesh.xEdge[(low + k) * nx + e] : mesh.yEdge[e * nx + low + k],
    );
    stations.push({ s: (at - line.plane) * line.into, unknowns });
  }
  stations.sort((a, b) => a.s - b.s);
  const gapAt = (line.gap - line.plane) * line.into;
  const gap = stations.reduce((best, st) => (Math.abs(st.s - gapAt) < Math.abs(best.s - gapAt) ? st : best));
  const fit = stations.filter((st) => st.s > gap.s + clear && st.s < -clear);
  if (fit.length < 6) throw new RangeError('meshPort: the feed line is too short to tell its waves apart');
  return {
    line,
    rectangle: mesh.rectangles.indexOf(feed),
    gap,
    fit,
    cells: { i0: feed.i0, i1: feed.i1, j0: feed.j0, j1: feed.j1 },
  };
}

/** Amplitudes at the reference plane, A: I(s) = forward e^{−γs} − backward e^{γs}, current into the board. */
export interface LineWaves {
  readonly forward: Complex;
  readonly backward: Complex;
  /** Root mean square of what the two waves leave, over that of the current. */
  readonly misfit: number;
}

/** Current through a station into the board, A. */
export function stationCurrent(station: Station, into: 1 | -1, x: ComplexVector): Complex {
  let re = 0;
  let im = 0;
  for (const u of station.unknowns) {
    re += x.re[u];
    im += x.im[u];
  }
  return complex(into * re, into * im);
}

/** Least squares over the fit stations with the line's own propagation constant. */
export function fitWaves(port: MeshPort, gamma: Complex, x: ComplexVector): LineWaves {
  // Normal equations of two complex unknowns: columns p = e^{−γs}, q = −e^{γs}.
  let pp = 0;
  let qq = 0;
  let total = 0;
  let [pqRe, pqIm, prRe, prIm, qrRe, qrIm] = [0, 0, 0, 0, 0, 0];
  const samples = port.fit.map((station) => ({
    p: exp(scale(gamma, -station.s)),
    q: scale(exp(scale(gamma, station.s)), -1),
    r: stationCurrent(station, port.line.into, x),
  }));
  for (const { p, q, r } of samples) {
    pp += p.re * p.re + p.im * p.im;
    qq += q.re * q.re + q.im * q.im;
    total += r.re * r.re + r.im * r.im;
    pqRe += p.re * q.re + p.im * q.im;
    pqIm += p.re * q.im - p.im * q.re;
    prRe += p.re * r.re + p.im * r.im;
    prIm += p.re * r.im - p.im * r.re;
    qrRe += q.re * r.re + q.im * r.im;
    qrIm += q.re * r.im - q.im * r.re;
  }
  const determinant = pp * qq - (pqRe * pqRe + pqIm * pqIm);
  const forward = complex(
    (qq * prRe - (pqRe * qrRe - pqIm * qrIm)) / determinant,
    (qq * prIm - (pqRe * qrIm + pqIm * qrRe)) / determinant,
  );
  const backward = complex(
    (pp * qrRe - (pqRe * prRe + pqIm * prIm)) / determinant,
    (pp * qrIm - (pqRe * prIm - pqIm * prRe)) / determinant,
  );
  let left = 0;
  for (const { p, q, r } of samples) {
    const re = r.re - (p.re * forward.re - p.im * forward.im) - (q.re * backward.re - q.im * backward.im);
    const im = r.im - (p.re * forward.im + p.im * forward.re) - (q.re * backward.im + q.im * backward.re);
    left += re * re + im * im;
  }
  return { forward, backward, misfit: Math.sqrt(left / total) };
}
