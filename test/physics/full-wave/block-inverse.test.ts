import { describe, expect, it } from 'vitest';
import { complexVector } from '../../../src/numerics/gmres.js';
import { blockInverse } from '../../../src/physics/full-wave/block-inverse.js';
import { boardOperator } from '../../../src/physics/full-wave/board-operator.js';
import { mediumOf, setUpBoard } from '../../../src/physics/full-wave/board-setup.js';
import type { FullWaveProblem } from '../../../src/physics/full-wave/problem.js';

const slab = { permittivity: 3, lossTangent: 0.0015, height: 0.127e-3 };
const column = {
  x: 0,
  y: 0,
  feedLineWidth: 0.15e-3,
  patches: [
    { width: 0.6e-3, length: 1.05e-3 },
    { width: 0.6e-3, length: 1.05e-3 },
  ],
  links: [{ width: 0.15e-3, length: 1.2e-3 }],
};

function inverses(columns: FullWaveProblem['columns']) {
  const problem: FullWaveProblem = { slab, stripThickness: 18e-6, columns, referenceImpedance: 'line' };
  const setup = setUpBoard(problem, { low: 76e9, high: 80e9 }, { cellsPerPatch: 11, cellsPerLine: 2 });
  const { mesh, blocks } = setup;
  const sheets = mesh.rectangles.map(() => ({ re: 0.1, im: 0.12 }));
  const { reactions, local } = boardOperator(setup, mediumOf(problem, slab), 77e9, sheets);
  const x = complexVector(mesh.unknowns);
  for (let u = 0; u < mesh.unknowns; u++) {
    x.re[u] = Math.sin(u * u + 1);
    x.im[u] = Math.cos(3 * u);
  }
  const solved = (list: typeof blocks) => {
    const y = complexVector(mesh.unknowns);
    blockInverse(mesh, list, reactions, local)(x, y);
    return y;
  };
  return { blocks, solved };
}

/** Largest difference over the largest value. */
function difference(a: { re: Float64Array; im: Float64Array }, b: { re: Float64Array; im: Float64Array }): number {
  let [most, off] = [0, 0];
  for (let u = 0; u < a.re.length; u++) {
    most = Math.max(most, Math.hypot(a.re[u], a.im[u]));
    off = Math.max(off, Math.hypot(a.re[u] - b.re[u], a.im[u] - b.im[u]));
  }
  return off / most;
}

describe('inverse of a block', () => {
  it('by even and odd currents is that of the whole block', () => {
    const { blocks, solved } = inverses([column]);
    expect(blocks.some((b) => b.mirror)).toBe(true);
    const whole = blocks.map(({ mirror, ...block }) => block);
    expect(difference(solved(blocks), solved(whole))).toBeLessThan(1e-8);
  });

  it('is shared only by blocks that feeds from the side join alike', () => {
    const fed = (y: number, side: 1 | -1) => ({ ...column, y, sideFeed: { link: 0, side } });
    const { blocks, solved } = inverses([fed(-1e-3, -1), fed(1e-3, 1)]);
    const own = blocks.map((block, b) => ({ ...block, key: `${b}` }));
    // Equal columns share inverses where trims differ by what rounding of a column's place leaves.
    expect(difference(solved(blocks), solved(own))).toBeLessThan(1e-6);
  });
});
