/** What one engine says of a board at one frequency, in the same words for both. */
import type { Board } from '../manifest/model.js';
import { abs, type Complex, div, ZERO } from '../numerics/complex.js';
import { arrayFigures, incidentWaves } from '../physics/array/index.js';
import type { ColumnSolution } from '../physics/column/index.js';
import type { CutShape } from '../physics/pattern/index.js';
import type { Cut, CutFigures, EngineFigures } from './results.js';

export function engineFigures(board: Board, solution: ColumnSolution): EngineFigures {
  const figures = arrayFigures(solution, incidentWaves(board.feed));
  const { power } = figures.excited;
  const share = (part: number): number => part / power.accepted;
  const residual = (figures.powerResidual * power.incident) / power.accepted;
  const radiationEfficiency = share(power.radiated) / (1 - residual);
  return {
    scattering: solution.scattering,
    referenceImpedance: solution.referenceImpedance,
    activeReflection: figures.activeReflection,
    directivity: figures.directivity,
    radiationEfficiency,
    mismatch: figures.mismatch,
    elevation: cutFigures(figures.elevation),
    azimuth: cutFigures(figures.azimuth),
    cuts: {
      elevation: gainCut('elevation', figures.elevation, radiationEfficiency / power.radiated),
      azimuth: gainCut('azimuth', figures.azimuth, radiationEfficiency / power.radiated),
    },
    power: {
      radiated: share(power.radiated),
      surfaceWave: share(power.surfaceWave),
      metal: share(power.underside + power.top + power.edges + power.ground),
      dielectric: share(power.dielectric),
      load: share(power.load),
    },
    powerResidual: residual,
    excitation: overLargest(figures.excited.patchCurrents),
  };
}

export function cutFigures({ beamDirection, halfPowerBeamwidth, sidelobeDb }: CutShape): CutFigures {
  return { beamDirection, halfPowerBeamwidth, sidelobeDb };
}

/** @param perWatt  share of the power at the reference plane that is radiated, over the power radiated, 1/W */
export const gainCut = (plane: Cut['plane'], { angle, intensity }: CutShape, perWatt: number): Cut => ({
  plane,
  angle,
  gainDbi: intensity.map((u) => 10 * Math.log10(Math.max(1e-6, 4 * Math.PI * u * perWatt))),
});

function overLargest(currents: readonly (readonly Complex[])[]): Complex[][] {
  const largest = currents.flat().reduce((a, b) => (abs(b) > abs(a) ? b : a), ZERO);
  if (abs(largest) === 0) return currents.map((column) => column.map(() => ZERO));
  return currents.map((column) => column.map((current) => div(current, largest)));
}
