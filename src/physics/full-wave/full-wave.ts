/**
 * Full wave of patch columns: surface currents of all metal on a grounded slab, by the mixed-potential integral equation and
 * Galerkin's method with rooftops on a uniform grid (J. R. Mosig and F. E. Gardiol, Adv. Electron. Electron Phys. 59, 1982;
 * K. A. Michalski and J. R. Mosig, IEEE Trans. Antennas Propag. 45(3), 1997). Products by transforms, solved by GMRES.
 *
 * Infinite slab and ground; metal as a sheet whose impedance and edges stand for thickness and faces.
 */
import type { ColumnConditions, ColumnEngine, ColumnSolution } from '../column/engine.js';
import { anchoredInverses } from './board-operator.js';
import { mediumOf, setUpBoard } from './board-setup.js';
import { solveBoard } from './board-solution.js';
import type { FullWaveProblem, FullWaveSettings } from './problem.js';
import { losslessMedium } from './slab-medium.js';

/**
 * Prepares a board for a band (Hz); each solve is then one frequency. Inverses that serve as preconditioner are
 * kept, so that the first frequency takes longest; no result hangs on the order of the calls.
 *
 * @throws RangeError on a layout that cannot be drawn, or a medium that guides more than TM0
 */
export function fullWave(
  problem: FullWaveProblem,
  band: { readonly low: number; readonly high: number },
  settings: FullWaveSettings = {},
): ColumnEngine {
  const setup = setUpBoard(problem, band, settings);
  const inverseAt = anchoredInverses(setup, losslessMedium(mediumOf(problem, problem.slab)), band);
  return {
    name: 'full wave',
    solve: (conditions: ColumnConditions): ColumnSolution =>
      solveBoard(setup, problem, conditions, settings, inverseAt),
  };
}
