import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  applicableModels,
  type BandEstimates,
  type FaceConditions,
  roughFace,
  roughnessBand,
  roughnessEstimates,
  saturationRq,
  saturationStatement,
  slowWaveLength,
  type TextureKnowledge,
} from '../../../src/physics/roughness/index.js';

const AT: FaceConditions = { frequency: 77e9, conductivity: 5.8e7, permittivity: 3 };
const um = 1e-6;
const width = (b: BandEstimates): number => b.high.lossFactor - b.low.lossFactor;
const lossOf = (b: BandEstimates): number[] => [b.low, b.middle, b.high].map((f) => f.lossFactor);

/** Rq of production foils and finer; correlation length, Sdr and nodules as such foils can have them. */
const texture = fc.record({
  rq: fc.double({ min: 0.08, max: 2.5, noNaN: true }).map((x) => x * um),
  lengthOverRq: fc.double({ min: 1.4, max: 8, noNaN: true }),
  areaRatio: fc.double({ min: 0.02, max: 0.6, noNaN: true }),
  pitchOverRadius: fc.double({ min: 2.6, max: 6, noNaN: true }),
});

describe('the band', () => {
  it('is in order in loss and in phase, whatever is known', () => {
    fc.assert(
      fc.property(texture, ({ rq, lengthOverRq, areaRatio }) => {
        const known: TextureKnowledge[] = [
          { rq },
          { rq, correlationLength: lengthOverRq * rq },
          { rq, developedAreaRatio: areaRatio },
          { rq, correlationLength: lengthOverRq * rq, developedAreaRatio: areaRatio },
        ];
        for (const t of known) {
          const band = roughnessEstimates(t, AT);
          const [low, middle, high] = lossOf(band);
          expect(low).toBeGreaterThanOrEqual(1);
          expect(middle).toBeGreaterThanOrEqual(low!);
          expect(high).toBeGreaterThanOrEqual(middle!);
        }
        const { low, middle, high } = roughnessEstimates({ rq }, AT);
        expect(slowWaveLength(middle)).toBeGreaterThan(slowWaveLength(low));
        expect(slowWaveLength(high)).toBeGreaterThan(slowWaveLength(middle));
      }),
      { numRuns: 60, seed: 7 },
    );
  });

  it('narrows with every lateral measure', () => {
    fc.assert(
      fc.property(texture, ({ rq, lengthOverRq, areaRatio }) => {
        const correlationLength = lengthOverRq * rq;
        const height = width(roughnessEstimates({ rq }, AT));
        const length = width(roughnessEstimates({ rq, correlationLength }, AT));
        const area = width(roughnessEstimates({ rq, developedAreaRatio: areaRatio }, AT));
        expect(length).toBeLessThan(height);
        expect(area).toBeLessThan(height);
        // The lay of known grooves narrows again.
        expect(width(roughnessEstimates({ rq, correlationLength, lay: 'across' }, AT))).toBeLessThan(length);
      }),
      { numRuns: 60, seed: 11 },
    );
  });

  it('narrows with the size of the nodules', () => {
    fc.assert(
      fc.property(texture, ({ rq, pitchOverRadius }) => {
        // Stacks of four balls at three radii have an Rq of 3.19 radii (as solved); rarer ones less.
        const radius = rq / 3.19;
        const nodule = { radius, pitch: pitchOverRadius * radius, layers: 4 };
        expect(width(roughnessEstimates({ rq, nodule }, AT))).toBeLessThan(width(roughnessEstimates({ rq }, AT)));
      }),
      { numRuns: 40, seed: 13 },
    );
  });

  it('narrows when area ratio and correlation length agree on a spectrum', () => {
    // Gaussian spectrum of length 3 Rq: Sdq 0.667, Sdr 18.3 %; a little more for finer content.
    const rq = 0.5 * um;
    const both = roughnessEstimates({ rq, correlationLength: 3 * rq, developedAreaRatio: 0.22 }, AT);
    expect(width(both)).toBeLessThan(width(roughnessEstimates({ rq, developedAreaRatio: 0.22 }, AT)));
    expect(width(both)).toBeLessThan(width(roughnessEstimates({ rq, correlationLength: 3 * rq }, AT)));
  });

  it('says so when the area ratio is too small for the correlation length', () => {
    const rq = 0.5 * um;
    const band = roughnessEstimates({ rq, correlationLength: 3 * rq, developedAreaRatio: 0.05 }, AT);
    expect(band.high.reason).toContain('lateral resolution');
  });

  it('closes on smooth copper', () => {
    for (const face of Object.values(roughnessEstimates({ rq: 0 }, AT))) expect(face.lossFactor).toBe(1);
    expect(roughnessBand({ rq: 0 }, AT).narrowing).toEqual([]);
    expect(width(roughnessEstimates({ rq: 1e-9 }, AT))).toBeLessThan(1e-4);
  });

  it('of Rq 0.4 µm runs from gentle profile over pile to gradient model', () => {
    // Independent solutions at 1.68 skin depths: random profile 1.10, pile 1.90 ± 0.03, gradient 2.592.
    const [low, middle, high] = lossOf(roughnessEstimates({ rq: 0.4 * um }, AT));
    expect(low).toBeCloseTo(1.1, 1);
    expect(Math.abs(middle! - 1.9)).toBeLessThan(0.03);
    expect(high).toBeCloseTo(2.592, 3);
  });

  // Independently solved shapes with what a supplier would report of them: all within the band of that knowledge.
  it.each<[string, TextureKnowledge, number]>([
    [
      'stacks of four, radius 0.12 µm',
      { rq: 0.38 * um, nodule: { radius: 0.119 * um, pitch: 0.357 * um, layers: 4 } },
      1.13,
    ],
    [
      'stacks of four, radius 0.24 µm',
      { rq: 0.76 * um, nodule: { radius: 0.238 * um, pitch: 0.714 * um, layers: 4 } },
      1.96,
    ],
    [
      'stacks of four, radius 0.48 µm',
      { rq: 1.51 * um, nodule: { radius: 0.476 * um, pitch: 1.43 * um, layers: 4 } },
      5.22,
    ],
    [
      'single balls, radius 0.48 µm, four radii apart',
      { rq: 0.4 * um, nodule: { radius: 0.476 * um, pitch: 1.9 * um } },
      1.584,
    ],
    ['touching pile, by Rq', { rq: 0.28 * um }, 1.79],
    ['egg box, by Rq', { rq: 0.48 * um }, 1.9],
    ['random grooves, by correlation length', { rq: 0.4 * um, correlationLength: 1.132 * um }, 1.107],
    ['random grooves, steeper', { rq: 0.4 * um, correlationLength: 0.564 * um }, 1.31],
    ['random grooves with fine content', { rq: 0.4 * um, correlationLength: 1.132 * um }, 1.246],
  ])('holds %s', (_name, known, k) => {
    const [low, , high] = lossOf(roughnessEstimates(known, AT));
    // 2 % for the reference itself.
    expect(k).toBeGreaterThan(low! * 0.98);
    expect(k).toBeLessThan(high! * 1.02);
  });
});

describe('what would narrow the band', () => {
  it('names missing measurements only, the most useful first, each narrower than now', () => {
    const { narrowing } = roughnessBand({ rq: 0.4 * um }, AT);
    expect(narrowing.map((n) => n.quantity).sort()).toEqual(['area-ratio', 'correlation-length', 'nodules']);
    for (const [i, n] of narrowing.entries()) {
      expect(n.wouldNarrowTo).toBeLessThan(n.spreadNow);
      if (i > 0) expect(n.wouldNarrowTo).toBeGreaterThanOrEqual(narrowing[i - 1]!.wouldNarrowTo);
    }
  });

  it('asks for less where more is known', () => {
    const quantities = (t: TextureKnowledge) => roughnessBand(t, AT).narrowing.map((n) => n.quantity);
    expect(quantities({ rq: 0.4 * um, correlationLength: 1.2 * um })).not.toContain('correlation-length');
    expect(quantities({ rq: 0.4 * um, developedAreaRatio: 0.2, lay: 'isotropic' })).not.toContain('lay');
  });
});

describe('models behind one input', () => {
  const full: TextureKnowledge = {
    rq: 0.4 * um,
    correlationLength: 1.5 * um,
    nodule: { radius: 0.1 * um, pitch: 0.3 * um },
  };

  it('all run where everything is known, and take back power only', () => {
    const models = applicableModels(full);
    expect(models).toHaveLength(11);
    for (const model of models) {
      const face = roughFace(model, { ...full, ...AT });
      expect(face.lossFactor, model).toBeGreaterThanOrEqual(1);
      expect(face.model).toBe(model);
    }
  });

  it('say what they lack', () => {
    expect(() => roughFace('perturbation', { rq: um, ...AT })).toThrow(/correlation length or a developed area ratio/);
    expect(() => roughFace('huray', { rq: um, ...AT })).toThrow(/radius and pitch/);
    expect(applicableModels({ rq: um })).not.toContain('huray');
  });

  it('flag what they are not made for', () => {
    const codes = (model: Parameters<typeof roughFace>[0], more: Partial<TextureKnowledge> = {}) =>
      roughFace(model, { ...full, ...AT, ...more }).flags.map((f) => f.code);
    expect(codes('huray')).toEqual(['roughness.huray.radius', 'roughness.huray.pitch']);
    expect(codes('hall')).toEqual(['roughness.hall.range']);
    expect(codes('cannonball')).toEqual(['roughness.cannonball.rz', 'roughness.cannonball.ball-size']);
    expect(codes('perturbation')).toEqual([]);
    expect(codes('perturbation', { correlationLength: 0.8 * um })).toEqual(['roughness.perturbation.slope']);
    expect(codes('ball-pile', { rq: um })).toEqual(['roughness.ball-pile.range']);
  });

  it('an area ratio does as well as the correlation length that has it', () => {
    // Sdq 0.5: 11.3169 % (definition of ISO 25178-2, integrated separately); Gaussian spectrum: length = 2 Rq/Sdq.
    const byArea = roughFace('perturbation', { rq: 0.3 * um, developedAreaRatio: 0.113169, ...AT });
    const byLength = roughFace('perturbation', { rq: 0.3 * um, correlationLength: 1.2 * um, ...AT });
    expect(byArea.lossFactor).toBeCloseTo(byLength.lossFactor, 5);
  });
});

describe('saturation', () => {
  it('is stated in words from the Rq on at which the model cannot rank foils', () => {
    const from = saturationRq('hammerstad', AT)!;
    expect(from).toBeCloseTo(0.506 * um, 9);
    expect(saturationStatement('hammerstad', { rq: 0.99 * from }, AT)).toBeUndefined();
    expect(saturationStatement('hammerstad', { rq: 1.01 * from }, AT)).toContain('neither rank foils');
    expect(saturationStatement('groiss', { rq: um }, AT)).toContain('between 1.10 and 5.08');
    expect(saturationStatement('gradient', { rq: um }, AT)).toBeUndefined();
  });

  it('agrees with the flag of the face', () => {
    for (const model of ['hammerstad', 'groiss'] as const)
      for (const rq of [0.98, 1.02].map((x) => x * saturationRq(model, AT)!)) {
        const flagged = roughFace(model, { rq, ...AT }).flags.some((f) => f.severity === 'saturated');
        expect(saturationStatement(model, { rq }, AT) !== undefined).toBe(flagged);
      }
  });
});
