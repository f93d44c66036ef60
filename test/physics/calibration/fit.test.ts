import { describe, expect, it } from 'vitest';
import { calibrationCases } from '../../../src/physics/calibration/cases.js';
import { figuresOf, samplingOf } from '../../../src/physics/calibration/figures.js';
import { type CalibrationTarget, fitConstants, residualsOf } from '../../../src/physics/calibration/fit.js';
import { CALIBRATION_RANGE } from '../../../src/physics/calibration/range.js';
import { networkSolver } from '../../../src/physics/calibration/solver.js';
import { NETWORK_CONSTANTS, type NetworkConstants } from '../../../src/physics/column/index.js';

/** Two unlike patches of the range, as a network with other constants has them. */
function targetsBy(constants: NetworkConstants): CalibrationTarget[] {
  const cases = calibrationCases(CALIBRATION_RANGE);
  return [cases[7], cases[13]].map((of) => {
    const sampling = samplingOf(of, networkSolver(NETWORK_CONSTANTS));
    return { of, sampling, figures: figuresOf(of, sampling, networkSolver(constants)) };
  });
}

const FITTED = [
  'stepReactance',
  'edgeMoment',
  'coveredMoment',
  'modeConductance',
  'openEnd',
  'coveredSusceptance',
] as const;

describe('fit of the network constants', () => {
  it.each([
    ['openEnd', 1.06],
    ['stepReactance', 0.85],
    ['modeConductance', 1.1],
    ['coveredMoment', 0.95],
    ['coveredSusceptance', 0.93],
  ] as const)('finds again by how much %s was moved', (name, factor) => {
    const moved = { ...NETWORK_CONSTANTS, [name]: NETWORK_CONSTANTS[name] * factor };
    const { constants } = fitConstants(targetsBy(moved), NETWORK_CONSTANTS, 60);
    for (const key of FITTED) expect(constants[key] / moved[key]).toBeCloseTo(1, 3);
  });

  it('leaves less than it found where no constants fit', () => {
    const targets = targetsBy(NETWORK_CONSTANTS).map((target) => {
      const { gap, edge, between } = target.figures;
      return { ...target, figures: { gap, edge: { ...edge, resistance: edge.resistance * 1.2 }, between } };
    });
    const wanted = targets.map(({ figures }) => figures);
    const by = (constants: NetworkConstants) =>
      residualsOf(
        targets.map(({ of, sampling }) => figuresOf(of, sampling, networkSolver(constants))),
        wanted,
      );
    const before = by(NETWORK_CONSTANTS);
    expect(before.edgeResistance).toBeCloseTo(Math.log(1.2), 6);
    expect(before.edgeQuality).toBeCloseTo(0, 6);
    const after = by(fitConstants(targets, NETWORK_CONSTANTS, 60).constants);
    expect(after.edgeResistance).toBeLessThan(0.8 * before.edgeResistance);
    expect(after.edgeQuality).toBeGreaterThan(0.001);
  });
});
