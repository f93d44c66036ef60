/** One patch in the three surroundings that it is looked at in, by either engine. */
import { add, type Complex, complex, div, ONE, scale, sub } from '../../numerics/complex.js';
import type { ColumnEngine, ColumnProblem } from '../column/engine.js';
import { edgeNetwork } from '../column/network.js';
import type { NetworkConstants } from '../column/network-constants.js';
import { fullWave, gapPatch } from '../full-wave/index.js';
import type { CalibrationCase } from './cases.js';
import { gapNetwork } from './gap-network.js';

export interface Solver {
  /** Impedances at a gap across the patch's middle, no line attached, ohm. */
  gap(of: CalibrationCase, frequencies: readonly number[]): Complex[];
  /** Impedances at the edge where a line arrives, the other open, ohm. */
  edge(of: CalibrationCase, frequencies: readonly number[]): Complex[];
  /** Reflections of the patch between that line and another that goes on without end. */
  between(of: CalibrationCase, frequencies: readonly number[]): Complex[];
}

const ZERO = complex(0);
const FACES = { underside: ZERO, top: ZERO, edges: ZERO, ground: ZERO };

export function networkSolver(constants: NetworkConstants): Solver {
  return solver(
    (patch, highest) => gapNetwork(patch, highest, constants),
    (problem, frequencies) => edgeNetwork(problem, Math.max(...frequencies), constants),
  );
}

/**
 * @param cells    along a patch; the gap needs an even number and gets the next
 * @param downTo   lowest frequency of the band that feed lines are laid out for, over the lowest asked for: a lower one
 *                 lengthens the line that is read and the stub behind the gap
 */
export function fullWaveSolver(cells: number, downTo = 1): Solver {
  const along = 2 * Math.ceil(cells / 2);
  return solver(
    (patch, highest, lowest) => {
      const solve = gapPatch(patch, { low: lowest, high: highest }, { along, across: Math.round(0.8 * along) });
      return (frequency, faces) => solve(frequency, faces).impedance;
    },
    (problem, frequencies) => {
      const band = { low: downTo * Math.min(...frequencies), high: Math.max(...frequencies) };
      return fullWave(problem, band, { cellsPerPatch: cells });
    },
  );
}

function solver(
  gap: (
    patch: { length: number; width: number; slab: CalibrationCase['slab'] },
    highest: number,
    lowest: number,
  ) => (frequency: number, faces: typeof FACES) => Complex,
  engine: (problem: ColumnProblem, frequencies: readonly number[]) => ColumnEngine,
): Solver {
  const solutions = (problem: ColumnProblem, frequencies: readonly number[]) => {
    const prepared = engine(problem, frequencies);
    return frequencies.map((frequency) => prepared.solve({ frequency, faces: FACES }));
  };
  return {
    gap({ slab, patchLength, patchWidth }, frequencies) {
      const solve = gap(
        { length: patchLength, width: patchWidth, slab },
        Math.max(...frequencies),
        Math.min(...frequencies),
      );
      return frequencies.map((frequency) => solve(frequency, FACES));
    },
    edge: (of, frequencies) =>
      solutions(problemOf(of, false), frequencies).map(({ scattering, referenceImpedance }) => {
        const [[s]] = scattering;
        return scale(div(add(ONE, s), sub(ONE, s)), referenceImpedance[0]);
      }),
    between: (of, frequencies) => solutions(problemOf(of, true), frequencies).map(({ scattering }) => scattering[0][0]),
  };
}

function problemOf(of: CalibrationCase, goesOn: boolean): ColumnProblem {
  const { slab, lineWidth, patchWidth, patchLength } = of;
  return {
    slab,
    stripThickness: 0,
    referenceImpedance: 'line',
    columns: [
      {
        x: 0,
        y: 0,
        feedLineWidth: lineWidth,
        patches: [{ width: patchWidth, length: patchLength }],
        links: [],
        ...(goesOn && { termination: { width: lineWidth } }),
      },
    ],
  };
}
