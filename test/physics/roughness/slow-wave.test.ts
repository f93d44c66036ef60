import { describe, expect, it } from 'vitest';
import { skinDepth } from '../../../src/physics/material/index.js';
import {
  permittivityRise,
  type RoughFaceInput,
  roughFace,
  SLOW_WAVE_SHARE,
  slowWaveExcess,
  slowWaveLength,
} from '../../../src/physics/roughness/index.js';

const input = (rq: number, more: Partial<RoughFaceInput> = {}): RoughFaceInput => ({
  rq,
  frequency: 77e9,
  conductivity: 5.8e7,
  permittivity: 3,
  ...more,
});
const rise = (face: ReturnType<typeof roughFace>, height = 127e-6): number =>
  permittivityRise({ strip: face, ground: face, height, share: SLOW_WAVE_SHARE.fiftyOhm });

describe('slow-wave length', () => {
  it('of a smooth face is half a skin depth, and its excess nothing', () => {
    const face = roughFace('smooth', input(0));
    expect(slowWaveLength(face)).toBeCloseTo(0.5 * skinDepth(77e9, 5.8e7), 15);
    expect(slowWaveExcess(face)).toBeCloseTo(0, 18);
    expect(rise(face)).toBeCloseTo(0, 12);
  });

  it('does not depend on the plane that the face is referred to', () => {
    const face = roughFace('gradient', input(0.4e-6));
    const up = 0.3e-6;
    const moved = {
      ...face,
      impedance: { re: face.impedance.re, im: face.impedance.im + 2 * Math.PI * 77e9 * 4e-7 * Math.PI * up },
      planeShift: face.planeShift - up,
    };
    expect(slowWaveLength(moved)).toBeCloseTo(slowWaveLength(face), 13);
  });

  // Independent sections, both faces of 127 µm, 50 ohm, gradient model: 1.87, 4.02, 8.21 %. First order in s/h, so 5 %.
  it.each([
    [0.4e-6, 1.87],
    [1e-6, 4.02],
    [2.4e-6, 8.21],
  ])('gradient model, Rq %d m: permittivity rises by %d %', (rq, percent) => {
    expect(Math.abs((100 * rise(roughFace('gradient', input(rq)))) / percent - 1)).toBeLessThan(0.05);
  });

  it('scales with the thinness of the laminate', () => {
    const face = roughFace('ball-pile', input(0.5e-6));
    expect(rise(face, 100e-6) / rise(face)).toBeCloseTo(1.27, 10);
  });

  it('solved piles of balls slow the wave by 0.26 to 0.88 %', () => {
    // Rq 0.14, 0.28, 0.57, 0.85 µm of the independent solutions; 3 % for the share of 0.75, 2 % for interpolation and rounding.
    for (const [rq, percent] of [
      [0.14e-6, 0.26],
      [0.28e-6, 0.39],
      [0.57e-6, 0.64],
      [0.85e-6, 0.88],
    ] as const)
      expect(Math.abs((100 * rise(roughFace('ball-pile', input(rq)))) / percent - 1)).toBeLessThan(0.05);
  });
});
