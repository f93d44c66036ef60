import { describe, expect, it } from 'vitest';
import { complexVector } from '../../../src/numerics/gmres.js';
import { blockInverse } from '../../../src/physics/full-wave/block-inverse.js';
import { anchoredInverses, boardOperator } from '../../../src/physics/full-wave/board-operator.js';
import { mediumOf, setUpBoard } from '../../../src/physics/full-wave/board-setup.js';

const slab = { permittivity: 3.16, lossTangent: 0.0025, height: 0.1e-3 };
const problem = {
  slab,
  stripThickness: 0,
  columns: [
    {
      x: 0,
      y: 0,
      feedLineWidth: 0.13e-3,
      patches: [{ width: 0.7e-3, length: 1.05e-3 }],
      links: [],
    },
  ],
  referenceImpedance: 'line' as const,
};
const band = { low: 76e9, high: 80e9 };
const setup = setUpBoard(problem, band, { cellsPerPatch: 13 });
const medium = mediumOf(problem, slab, { re: 0.07, im: 0.09 });
const sheets = setup.mesh.rectangles.map(() => ({ re: 0.1, im: 0.12 }));
const operator = boardOperator(setup, medium, 77e9, sheets);
const n = setup.mesh.unknowns;
const vector = (seed: number) => {
  const v = complexVector(n);
  for (let u = 0; u < n; u++) {
    v.re[u] = Math.sin(seed * u * u + 1);
    v.im[u] = Math.cos(3 * u + seed);
  }
  return v;
};

describe('product of all reactions with a current', () => {
  const [a, b] = [vector(1), vector(2)];
  const [za, zb] = [complexVector(n), complexVector(n)];
  operator.apply(a, za);
  operator.apply(b, zb);

  it('is reciprocal: b Z a equals a Z b', () => {
    const form = (x: typeof a, y: typeof a) => {
      let [re, im] = [0, 0];
      for (let u = 0; u < n; u++) {
        re += x.re[u] * y.re[u] - x.im[u] * y.im[u];
        im += x.re[u] * y.im[u] + x.im[u] * y.re[u];
      }
      return { re, im, size: Math.hypot(re, im) };
    };
    const [bza, azb] = [form(b, za), form(a, zb)];
    expect(Math.hypot(bza.re - azb.re, bza.im - azb.im) / bza.size).toBeLessThan(1e-10);
  });

  it('takes power from any current', () => {
    for (const [x, y] of [
      [a, za],
      [b, zb],
    ]) {
      let power = 0;
      for (let u = 0; u < n; u++) power += x.re[u] * y.re[u] + x.im[u] * y.im[u];
      expect(power).toBeGreaterThan(0);
    }
  });

  it('is undone by the dense inverse of the board', () => {
    const all = {
      unknowns: Int32Array.from({ length: n }, (_, u) => u),
      own: new Uint8Array(n).fill(1),
      key: 'all',
    };
    const x = complexVector(n);
    blockInverse(setup.mesh, [all], operator.reactions, operator.local)(za, x);
    const back = complexVector(n);
    operator.apply(x, back);
    let [off, size] = [0, 0];
    for (let u = 0; u < n; u++) {
      off = Math.max(off, Math.hypot(back.re[u] - za.re[u], back.im[u] - za.im[u]));
      size = Math.max(size, Math.hypot(za.re[u], za.im[u]));
    }
    expect(off / size).toBeLessThan(1e-9);
  });

  it('has the same inverse for preconditioning whatever was asked before', () => {
    const inverses = () => anchoredInverses(setup, medium, band);
    const [first, second] = [complexVector(n), complexVector(n)];
    inverses()(77e9)(a, first);
    const used = inverses();
    used(80e9);
    used(77e9)(a, second);
    expect(second.re).toEqual(first.re);
  });
});
