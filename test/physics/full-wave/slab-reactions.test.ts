import { describe, expect, it } from 'vitest';
import { complex } from '../../../src/numerics/complex.js';
import { gaussLegendre } from '../../../src/numerics/gauss-legendre.js';
import { EPS0, ETA0, MU0, SPEED_OF_LIGHT } from '../../../src/physics/constants.js';
import { currentTransfers } from '../../../src/physics/full-wave/slab-field.js';
import { losslessMedium, type SlabMedium } from '../../../src/physics/full-wave/slab-medium.js';
import {
  prepareReactions,
  type ReactionGrid,
  type SlabReactions,
} from '../../../src/physics/full-wave/slab-reactions.js';
import { guidedPower } from '../../../src/physics/full-wave/slab-wave.js';

const F = 77e9;
const BAND = { low: 76e9, high: 81e9 };
const SLAB: SlabMedium = { permittivity: 3, lossTangent: 0, height: 127e-6, groundImpedance: complex(0) };
const COVERED: SlabMedium = { ...SLAB, cover: { permittivity: 3.5, lossTangent: 0, thickness: 25e-6 } };

/** A rooftop in steps of the grid: x-directed about whole, y-directed about half-odd places. */
interface Rooftop {
  readonly along: 'x' | 'y';
  readonly i: number;
  readonly j: number;
  readonly re: number;
  readonly im: number;
}

// Far and near, in line and beside, both directions, no symmetry.
const CURRENTS: readonly Rooftop[] = [
  { along: 'x', i: 0, j: 0, re: 1, im: 0 },
  { along: 'x', i: 30, j: 5, re: 0.3, im: 0.7 },
  { along: 'x', i: 2, j: -1, re: -0.2, im: 0.4 },
  { along: 'y', i: 10.5, j: 3.5, re: -0.4, im: 0.5 },
  { along: 'y', i: 1.5, j: 0.5, re: 0.6, im: 0.1 },
];

/** Real and imaginary part of the reaction of two rooftops from the three tables. */
function reaction(a: Rooftop, b: Rooftop, r: SlabReactions, nx: number): [number, number] {
  const at = (table: Float64Array, i: number, j: number): number => table[Math.abs(j) * nx + Math.abs(i)];
  const ends = (c: Rooftop): [number, number, number][] =>
    c.along === 'x'
      ? [
          [c.i + 0.5, c.j, 1],
          [c.i - 0.5, c.j, -1],
        ]
      : [
          [c.i, c.j + 0.5, 1],
          [c.i, c.j - 0.5, -1],
        ];
  let [re, im] = [0, 0];
  if (a.along === b.along) {
    re = at(a.along === 'x' ? r.axRe : r.ayRe, a.i - b.i, a.j - b.j);
    im = at(a.along === 'x' ? r.axIm : r.ayIm, a.i - b.i, a.j - b.j);
  }
  for (const [ia, ja, sa] of ends(a)) {
    for (const [ib, jb, sb] of ends(b)) {
      re += sa * sb * at(r.qRe, ia - ib, ja - jb);
      im += sa * sb * at(r.qIm, ia - ib, ja - jb);
    }
  }
  return [re, im];
}

function suppliedPower(r: SlabReactions, nx: number): number {
  let sum = 0;
  for (const a of CURRENTS)
    for (const b of CURRENTS) {
      const [re] = reaction(a, b, r, nx);
      // Re(a* Z b) summed over both orders: the imaginary part of Z cancels, since Z is symmetric.
      sum += 0.5 * re * (a.re * b.re + a.im * b.im);
    }
  return sum;
}

const sinc = (x: number): number => (x === 0 ? 1 : Math.sin(x) / x);

function spectrum({ dx, dy }: ReactionGrid): (kx: number, ky: number, out: Float64Array) => void {
  return (kx, ky, out) => {
    out.fill(0);
    for (const c of CURRENTS) {
      const [x, y] = [sinc((kx * dx) / 2), sinc((ky * dy) / 2)];
      const shape = c.along === 'x' ? dx * x * x * y : dy * y * y * x;
      const phase = kx * c.i * dx + ky * c.j * dy;
      const q = c.along === 'x' ? 0 : 2;
      out[q] += shape * (c.re * Math.cos(phase) - c.im * Math.sin(phase));
      out[q + 1] += shape * (c.re * Math.sin(phase) + c.im * Math.cos(phase));
    }
  };
}

function radiatedPower(medium: SlabMedium, grid: ReactionGrid): number {
  const k0 = (2 * Math.PI * F) / SPEED_OF_LIGHT;
  const transfer = currentTransfers(medium, F);
  const { nodes, weights } = gaussLegendre(80);
  const current = new Float64Array(4);
  const j = spectrum(grid);
  const steps = 64;
  let sum = 0;
  nodes.forEach((x, n) => {
    const theta = (Math.PI / 4) * (1 + x);
    const sine = Math.sin(theta);
    const { tm, te } = transfer(sine * sine);
    for (let m = 0; m < steps; m++) {
      const phi = (2 * Math.PI * (m + 0.5)) / steps;
      const [c, s] = [Math.cos(phi), Math.sin(phi)];
      j(k0 * sine * c, k0 * sine * s, current);
      const along = (current[0] * c + current[2] * s) ** 2 + (current[1] * c + current[3] * s) ** 2;
      const across = (current[2] * c - current[0] * s) ** 2 + (current[3] * c - current[1] * s) ** 2;
      const u = (tm.re ** 2 + tm.im ** 2) * along + (te.re ** 2 + te.im ** 2) * across;
      sum += ((weights[n] * Math.PI) / 4) * sine * ((2 * Math.PI) / steps) * (u / (2 * ETA0));
    }
  });
  return sum;
}

describe('reactions of rooftops on a slab', () => {
  const grid: ReactionGrid = { dx: 60e-6, dy: 125e-6, nx: 40, ny: 20 };

  for (const [name, medium] of [
    ['bare', SLAB],
    ['with a reactive ground', { ...SLAB, permittivity: 3.55, height: 200e-6, groundImpedance: complex(0, 0.3) }],
    ['covered', COVERED],
  ] as const)
    it(`give the power of the far field and of the guided wave (${name})`, () => {
      const supplied = suppliedPower(prepareReactions(grid, BAND, medium).at(F), grid.nx);
      const guided = guidedPower(medium, F, spectrum(grid), 30 * grid.dx);
      const radiated = radiatedPower(medium, grid);
      expect(guided / supplied).toBeGreaterThan(0.05);
      expect(Math.abs(supplied / (radiated + guided) - 1)).toBeLessThan(1e-6);
    });

  it('take more power with loss, in proportion to a small one', () => {
    const prepared = prepareReactions(grid, BAND, SLAB);
    const lost = (tan: number, zg: number): number => {
      const medium = { ...SLAB, lossTangent: tan, groundImpedance: complex(zg) };
      return (
        suppliedPower(prepared.at(F, medium), grid.nx) - suppliedPower(prepared.at(F, losslessMedium(medium)), grid.nx)
      );
    };
    expect(lost(1e-3, 0)).toBeGreaterThan(0);
    expect(lost(0, 0.05)).toBeGreaterThan(0);
    expect(lost(2e-3, 0) / lost(1e-3, 0)).toBeCloseTo(2, 1);
    expect(lost(0, 0.1) / lost(0, 0.05)).toBeCloseTo(2, 1);
  });

  it('on a grid are sums of those on one twice as fine', () => {
    // Two-scale relation of B-splines: binomial weights. Ties integrated to sampled cells, and every table to the others.
    const [cubic, linear] = [[1, 4, 6, 4, 1].map((w) => w / 16), [0.25, 0.5, 0.25]];
    for (const [medium, dx, dy] of [
      [SLAB, 60e-6, 110e-6],
      [COVERED, 150e-6, 50e-6],
    ] as const) {
      const n = 20;
      const fineCount = 2 * n + 4;
      const coarse = prepareReactions({ dx, dy, nx: n, ny: n }, BAND, medium).at(F);
      const fine = prepareReactions({ dx: dx / 2, dy: dy / 2, nx: fineCount, ny: fineCount }, BAND, medium).at(F);
      for (const kind of ['ax', 'ay', 'q'] as const) {
        const [wx, wy] = [kind === 'ax' ? cubic : linear, kind === 'ay' ? cubic : linear];
        let worst = 0;
        for (let j = 0; j < n; j++) {
          for (let i = 0; i < n; i++) {
            let [re, im] = [0, 0];
            wx.forEach((a, k) => {
              wy.forEach((b, l) => {
                const column = Math.abs(2 * i + k - (wx.length - 1) / 2);
                const row = Math.abs(2 * j + l - (wy.length - 1) / 2);
                const w = a * b * (kind === 'q' ? 1 : 4);
                re += w * fine[`${kind}Re`][row * fineCount + column];
                im += w * fine[`${kind}Im`][row * fineCount + column];
              });
            });
            const [cr, ci] = [coarse[`${kind}Re`][j * n + i], coarse[`${kind}Im`][j * n + i]];
            worst = Math.max(worst, Math.hypot(cr - re, ci - im) / Math.hypot(re, im));
          }
        }
        expect(worst).toBeLessThan(5e-6);
      }
    }
  });

  it('of one cell are those of electrostatics where all is small', () => {
    // Mean of 1/|r − r'| over a unit square, twice: 4 (ln(1 + √2) + (1 − √2)/3) = 2.97321 (potential of a uniform square).
    // Images across a slab of εr: 1, then −(1 + K) K^{n−1} (−1)^{n−1} at 2nh, K = (εr − 1)/(εr + 1) (Silvester 1968).
    const side = 2e-6;
    const [er, h] = [4, 50e-6];
    const low = { low: 0.9e9, high: 1.1e9 };
    const medium: SlabMedium = { permittivity: er, lossTangent: 0, height: h, groundImpedance: complex(0) };
    const r = prepareReactions({ dx: side, dy: side, nx: 2, ny: 2 }, low, medium).at(1e9);
    const square = 4 * (Math.log(1 + Math.SQRT2) + (1 - Math.SQRT2) / 3);
    const k = (er - 1) / (er + 1);
    let images = 0;
    for (let n = 1; n < 60; n++) images -= ((1 + k) * (-k) ** (n - 1)) / (2 * n * h);
    const omega = 2 * Math.PI * 1e9;
    const potential = (square / side + images) / (2 * Math.PI * EPS0 * (er + 1));
    // Image distances differ over the cell by (side/2h)²/6 of themselves.
    expect(Math.abs((-r.qIm[0] * omega) / potential - 1)).toBeLessThan(1e-5);
    // μ0/4π times the same with rooftops: between the square's and that of a sheet 4/3 as long, image at 2h.
    const [lower, upper] = [0.8, 1].map(
      (f) => (omega * MU0 * side * side * ((f * square) / side - 1 / (2 * h))) / (4 * Math.PI),
    );
    expect(r.axIm[0]).toBeGreaterThan(lower);
    expect(r.axIm[0]).toBeLessThan(upper);
    expect(r.ayIm[0]).toBeCloseTo(r.axIm[0], 14);
  });

  it('are the same whatever was prepared near them', () => {
    const small = prepareReactions({ ...grid, nx: 12, ny: 6 }, BAND, { ...SLAB, height: 120e-6, permittivity: 3.1 });
    const [a, b] = [small.at(F, SLAB), prepareReactions(grid, { low: 70e9, high: 85e9 }, SLAB).at(F)];
    for (let j = 0; j < 6; j++)
      for (let i = 0; i < 12; i++) {
        const [p, q] = [j * 12 + i, j * grid.nx + i];
        expect(Math.abs(a.axIm[p] / b.axIm[q] - 1)).toBeLessThan(1e-6);
        expect(Math.abs(a.qRe[p] - b.qRe[q]) / Math.hypot(b.qRe[q], b.qIm[q])).toBeLessThan(1e-6);
      }
  });

  it('refuse a grid that is none', () => {
    expect(() => prepareReactions({ ...grid, dx: 0 }, BAND, SLAB)).toThrow(RangeError);
    expect(() => prepareReactions({ ...grid, ny: 2.5 }, BAND, SLAB)).toThrow(RangeError);
  });
});
