import type { Board } from '../../src/manifest/model.js';
import { type Complex, polar } from '../../src/numerics/complex.js';
import type { Confirmation, EngineComparison, EngineFigures, PointResult } from '../../src/study/results.js';

/** Two engines that differ as real ones do: the full wave resonates a little lower and loses a little less. */
const OFFSET = 0.12e9;

export function scatteringOf(columnReflection: readonly Complex[]): readonly (readonly Complex[])[] {
  return columnReflection.map((own, i) =>
    columnReflection.map((_, j) => (i === j ? own : polar(0.045 / (i - j) ** 2, -2.1 * Math.abs(i - j)))),
  );
}

function figuresOf(board: Board, point: PointResult, lost: number): EngineFigures {
  const metal = 0.12 - lost;
  return {
    scattering: scatteringOf(point.columnReflection),
    referenceImpedance: point.referenceImpedance,
    activeReflection: point.activeReflection,
    directivity: point.directivity,
    radiationEfficiency: 1 - metal - 0.075 - 0.004,
    mismatch: point.mismatch,
    elevation: point.elevation,
    azimuth: point.azimuth,
    cuts: point.cuts,
    power: { radiated: 1 - metal - 0.075 - 0.004, surfaceWave: 0.03, metal, dielectric: 0.045, load: 0 },
    powerResidual: 0.004,
    excitation: board.columns.map((column) =>
      column.patches.map((patch, i) => polar(patch.width / 1.1e-3, lost * i - 0.02 * i)),
    ),
  };
}

/** Band edges and centre by both engines. */
export function confirmedOf(
  board: Board,
  pointOf: (board: Board, frequency: number, temperatureC: number) => PointResult,
): Confirmation {
  const { low, high } = board.band;
  const points = [low, (low + high) / 2, high].map((frequency): EngineComparison => {
    const at = (f: number) => ({ ...pointOf(board, f, board.temperature.nominalC), frequency });
    return {
      frequency,
      fullWave: figuresOf(board, at(frequency + OFFSET), 0.01),
      network: figuresOf(board, at(frequency), 0),
      effort: {
        unknowns: 4310,
        iterations: 24,
        residual: 8.2e-5,
        cellLength: 82e-6,
        cellWidth: 80e-6,
        misfitLength: 6e-6,
        misfitWidth: 11e-6,
      },
    };
  });
  return { kind: 'full wave', points, flags: [] };
}
