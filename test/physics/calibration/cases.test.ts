import { describe, expect, it } from 'vitest';
import { calibrationCases } from '../../../src/physics/calibration/cases.js';
import { samplingOf } from '../../../src/physics/calibration/figures.js';
import { CALIBRATION_FREQUENCY, CALIBRATION_RANGE } from '../../../src/physics/calibration/range.js';
import { networkSolver } from '../../../src/physics/calibration/solver.js';
import { NETWORK_CONSTANTS } from '../../../src/physics/column/index.js';
import { SPEED_OF_LIGHT } from '../../../src/physics/constants.js';

describe('calibration patches', () => {
  const cases = calibrationCases(CALIBRATION_RANGE);

  it('reach both ends of every range and stay within', () => {
    const k0 = (2 * Math.PI * CALIBRATION_FREQUENCY) / SPEED_OF_LIGHT;
    const { electricalHeight, permittivity, lineWidthOverHeight, patchWidth } = CALIBRATION_RANGE;
    for (const [values, [low, high]] of [
      [cases.map((c) => c.slab.height * k0), electricalHeight],
      [cases.map((c) => c.slab.permittivity), permittivity],
      [cases.map((c) => c.lineWidth / c.slab.height), lineWidthOverHeight],
    ] as const) {
      expect(Math.min(...values)).toBeCloseTo(low, 9);
      expect(Math.max(...values)).toBeCloseTo(high, 9);
      expect(new Set(values.map((v) => v.toPrecision(6))).size).toBe(cases.length);
    }
    for (const { patchWidth: width, lineWidth } of cases) {
      expect(width).toBeGreaterThanOrEqual(patchWidth[0] - 1e-12);
      expect(width).toBeLessThanOrEqual(patchWidth[1] + 1e-12);
      expect(lineWidth).toBeLessThan(width);
    }
  });

  it('resonate without a line near the frequency they are meant for', () => {
    const network = networkSolver(NETWORK_CONSTANTS);
    for (const of of cases.filter((_, i) => i % 4 === 0)) {
      const [, middle] = samplingOf(of, network).gap;
      expect(Math.abs(middle / CALIBRATION_FREQUENCY - 1)).toBeLessThan(0.02);
    }
  });
});
