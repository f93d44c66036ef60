import type { Confirmation, EngineFigures } from '../study/results.js';
import type { BoardData } from './data-schema.js';
import { complexData, cutFiguresData, matrixData, maybe, num } from './data-values.js';
import { exponentAbove } from './values.js';

/** Residuals of an iteration differ from machine to machine in their digits: the power of ten above is kept. */
const above = (residual: number): number | null =>
  Number.isFinite(residual) ? num(10 ** exponentAbove(residual)) : null;
/** The same for balances that close to rounding; a balance that does not is a figure. */
const residualData = (residual: number): number | null =>
  Math.abs(residual) < 1e-8 ? above(residual) : maybe(residual);

const engineData = (f: EngineFigures) => ({
  scattering: matrixData(f.scattering),
  activeReflection: f.activeReflection.map(complexData),
  directivity: maybe(f.directivity),
  radiationEfficiency: maybe(f.radiationEfficiency),
  mismatch: maybe(f.mismatch),
  elevation: cutFiguresData(f.elevation),
  azimuth: cutFiguresData(f.azimuth),
  power: {
    radiated: maybe(f.power.radiated),
    surfaceWave: maybe(f.power.surfaceWave),
    metal: maybe(f.power.metal),
    dielectric: maybe(f.power.dielectric),
    load: maybe(f.power.load),
  },
  powerResidual: residualData(f.powerResidual),
  excitation: matrixData(f.excitation),
});

export function confirmationData(confirmation: Confirmation): BoardData['confirmation'] {
  if (confirmation.kind === 'network only') return { kind: 'network only', reason: confirmation.reason };
  const { points, alignment, carriedFrom } = confirmation;
  return {
    kind: 'full wave',
    ...(carriedFrom === undefined ? {} : { carriedFrom }),
    ...(alignment === undefined
      ? {}
      : { alignment: { shiftHz: num(alignment.shift), remaining: maybe(alignment.remaining) } }),
    points: points.map(({ frequency, fullWave, network, effort }) => ({
      frequencyHz: num(frequency),
      referenceImpedanceOhm: fullWave.referenceImpedance.map(maybe),
      fullWave: engineData(fullWave),
      network: engineData(network),
      effort: {
        unknowns: effort.unknowns,
        iterations: effort.iterations,
        residual: above(effort.residual),
        cellLengthM: maybe(effort.cellLength),
        cellWidthM: maybe(effort.cellWidth),
        misfitLengthM: maybe(effort.misfitLength),
        misfitWidthM: maybe(effort.misfitWidth),
      },
    })),
  };
}
