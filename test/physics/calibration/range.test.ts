import { describe, expect, it } from 'vitest';
import { CALIBRATION_RANGE } from '../../../src/physics/calibration/index.js';
import { CALIBRATION, MIDDLE_CALIBRATION } from '../../../src/physics/column/calibration-data.js';
import type { ColumnProblem } from '../../../src/physics/column/engine.js';
import { edgeNetwork } from '../../../src/physics/column/index.js';
import { SPEED_OF_LIGHT } from '../../../src/physics/constants.js';

const FREQUENCY = 77e9;
const ZERO = { re: 0, im: 0 };
const FACES = { underside: ZERO, top: ZERO, edges: ZERO, ground: ZERO };

interface Quantities {
  readonly electricalHeight: number;
  readonly permittivity: number;
  readonly patchWidth: number;
  readonly lineWidthOverHeight: number;
}
const MIDDLE: Quantities = {
  electricalHeight: 0.2,
  permittivity: 3,
  patchWidth: 1.1e-3,
  lineWidthOverHeight: 1,
};

function flagsAt(q: Quantities): string[] {
  const height = (q.electricalHeight * SPEED_OF_LIGHT) / (2 * Math.PI * FREQUENCY);
  const problem: ColumnProblem = {
    slab: { permittivity: q.permittivity, lossTangent: 0, height },
    stripThickness: 0,
    referenceImpedance: 'line',
    columns: [
      {
        x: 0,
        y: 0,
        feedLineWidth: height * q.lineWidthOverHeight,
        patches: [{ width: q.patchWidth, length: 1e-3 }],
        links: [],
      },
    ],
  };
  const { flags } = edgeNetwork(problem, FREQUENCY).solve({ frequency: FREQUENCY, faces: FACES });
  return flags.map(({ code }) => code);
}

describe('range of the calibration', () => {
  it.each([
    ['electricalHeight', 'column.k0h'],
    ['permittivity', 'column.permittivity'],
    ['patchWidth', 'column.patch-width'],
    ['lineWidthOverHeight', 'column.line-width'],
  ] as const)('is what the network flags by: %s', (name, code) => {
    const [low, high] = CALIBRATION.range[name];
    const flags = (value: number): string[] => flagsAt({ ...MIDDLE, [name]: value });
    expect(flags(low * 1.001)).toEqual([]);
    expect(flags(high * 0.999)).toEqual([]);
    expect(flags(low * 0.99)).toEqual([code]);
    expect(flags(high * 1.01)).toEqual([code]);
  });

  it('in the data file is that of the calibration as it would be made now', () => {
    expect(CALIBRATION.range).toEqual(CALIBRATION_RANGE);
  });

  it.each([
    ['the whole range', CALIBRATION],
    ['its middle', MIDDLE_CALIBRATION],
  ])('holds the constants in use to what the network promises over %s', (_, { residuals, floor }) => {
    expect(residuals.edgeResonance).toBeLessThan(0.003);
    expect(residuals.edgeResistance).toBeLessThan(0.12);
    expect(residuals.edgeQuality).toBeLessThan(0.12);
    expect(residuals.reflection).toBeLessThan(0.06);
    // A comparison says something only where the full wave is surer of itself than the network is held to.
    expect(floor.edgeResonance).toBeLessThan(0.003);
    expect(floor.reflection).toBeLessThan(0.06);
  });
});
