import { describe, expect, it } from 'vitest';
import { complexVector } from '../../../src/numerics/gmres.js';
import { SPEED_OF_LIGHT } from '../../../src/physics/constants.js';
import { boardOperator } from '../../../src/physics/full-wave/board-operator.js';
import { mediumOf, setUpBoard } from '../../../src/physics/full-wave/board-setup.js';
import { drawMesh } from '../../../src/physics/full-wave/mesh.js';
import type { MetalRectangle } from '../../../src/physics/full-wave/outline.js';
import type { FullWaveProblem } from '../../../src/physics/full-wave/problem.js';
import { solvedStrip } from '../../../src/physics/full-wave/strip-sheet.js';

const slab = { permittivity: 3, lossTangent: 0, height: 0.127e-3 };

describe('metal on the grid', () => {
  it('carries the trims of all four edges of a rectangle', () => {
    const step = 50e-6;
    const piece: MetalRectangle = {
      x0: 0,
      x1: 5 * step,
      y0: 0,
      y1: 4 * step,
      kind: 'patch',
      width: 4 * step,
      column: 0,
      patch: 0,
    };
    const trims = { of: (cells: number) => ({ charge: cells, current: 10 * cells }) };
    const { cells, nx } = drawMesh([piece], { dx: step, dy: step, x0: 0, y0: 0, beyond: 0 }, trims);
    const at = (i: number, j: number): number[] => {
      const n = cells.place.indexOf(j * nx + i);
      return [cells.chargeX[n], cells.currentX[n], cells.chargeY[n], cells.currentY[n]];
    };
    // Edges along x take what the four cells across ask for, those along y what the five along do; corners take both.
    const [low, high] = [at(0, 1), at(4, 1)];
    expect(low).toEqual([0, 0, 5, 50]);
    expect(high).toEqual(low);
    const [bottom, top] = [at(2, 0), at(2, 3)];
    expect(top).toEqual(bottom);
    expect(bottom[0]).toBeCloseTo(4, 0);
    expect(bottom[1]).toBeCloseTo(40, -1);
    expect(bottom.slice(2)).toEqual([0, 0]);
    expect(at(0, 0)).toEqual([...bottom.slice(0, 2), 5, 50]);
    expect(at(2, 2)).toEqual([0, 0, 0, 0]);
  });

  // A travelling current under a smooth envelope: its field is ωL' − β²/(ωC') at any β, of a strip without end.
  it.each([0, 18e-6, 35e-6])('gives a line %f m thick the inductance and capacitance of its strip', (thickness) => {
    const width = 0.15e-3;
    const patch = { width: 0.965e-3, length: 1.061e-3 };
    const problem: FullWaveProblem = {
      slab,
      stripThickness: thickness,
      columns: [{ x: 0, y: 0, feedLineWidth: width, patches: [patch, patch], links: [{ width, length: 30e-3 }] }],
      referenceImpedance: 'line',
    };
    const setup = setUpBoard(problem, { low: 74e9, high: 80e9 }, { cellsPerPatch: 13 });
    const { mesh } = setup;
    const [frequency, dx] = [77e9, mesh.grid.dx];
    const omega = 2 * Math.PI * frequency;
    const nothing = mesh.rectangles.map(() => ({ re: 0, im: 0 }));
    const operator = boardOperator(setup, mediumOf(problem, slab), frequency, nothing);
    const strip = solvedStrip(problem, slab, thickness, width, frequency);
    const link = mesh.rectangles.filter((r) => r.metal.kind === 'line')[0];
    const middle = Math.round((link.i0 + link.i1) / 2);
    const rows = link.j1 - link.j0;
    const reactance = (beta: number): number => {
      const x = complexVector(mesh.unknowns);
      const y = complexVector(mesh.unknowns);
      for (let j = link.j0; j < link.j1; j++)
        for (let i = link.i0; i + 1 < link.i1; i++) {
          const s = (i - middle) * dx;
          const envelope = Math.exp(-((s / 6e-3) ** 2)) / rows;
          const u = mesh.xEdge[j * mesh.nx + i];
          x.re[u] = envelope * Math.cos(beta * s);
          x.im[u] = -envelope * Math.sin(beta * s);
        }
      operator.apply(x, y);
      let sum = 0;
      for (let j = link.j0; j < link.j1; j++) sum += y.im[mesh.xEdge[j * mesh.nx + middle]];
      return sum / rows / dx;
    };
    const beta = (omega * Math.sqrt(strip.effectivePermittivity)) / SPEED_OF_LIGHT;
    const [b1, b2] = [0.95 * beta, 1.1 * beta];
    const [z1, z2] = [reactance(b1), reactance(b2)];
    const slope = (z2 - z1) / (b2 * b2 - b1 * b1);
    const capacitance = -1 / (omega * slope);
    const inductance = (z1 - slope * b1 * b1) / omega;
    const slowness = Math.sqrt(inductance * capacitance) * SPEED_OF_LIGHT;
    expect(Math.abs(slowness / Math.sqrt(strip.effectivePermittivity) - 1)).toBeLessThan(0.008);
    // The strip's impedance is that of its power and current, with dispersion: not quite √(L/C).
    expect(Math.abs(Math.sqrt(inductance / capacitance) / strip.impedance - 1)).toBeLessThan(0.022);
  });
});
