import { describe, expect, it } from 'vitest';
import {
  crowdedFaceWeights,
  currentCrowding,
  microstripDispersive,
  microstripLine,
  microstripStatic,
  rectangularGuide,
  sheetFaceWeights,
  wheelerFaceWeights,
} from '../../../src/physics/line/index.js';
import { halfSpaceImpedance } from '../../../src/physics/material/index.js';

const strip = (width: number, height: number, permittivity: number, thickness: number) => ({
  width: width * 1e-6,
  height: height * 1e-6,
  thickness: thickness * 1e-6,
  permittivity,
});
const feed = strip(320, 127, 3, 18);
const smooth = (f: number) => {
  const z = halfSpaceImpedance(f, 5.8e7);
  return { underside: z, top: z, edges: z, ground: z };
};
const NONE = { re: 0, im: 0 };
const lossless = { underside: NONE, top: NONE, edges: NONE, ground: NONE };
const DB_PER_CM = 20 / Math.LN10 / 100;

describe('face weights by receding walls', () => {
  // Loss integrals of independent cross-section solutions: w, h, t, er; underside, ground, edges, top in % of the total.
  it.each([
    [320, 127, 18, 3, 39.3, 28.4, 21.3, 11.0],
    [160, 127, 18, 3, 35.6, 20.4, 28.8, 15.2],
    [100, 127, 18, 3, 33.3, 15.7, 33.3, 17.6],
    [1250, 127, 35, 3, 45.7, 42.6, 8.5, 3.2],
    [240, 100, 18, 3.16, 39.0, 28.4, 22.0, 10.6],
    [440, 200, 35, 3.55, 38.5, 27.3, 23.0, 11.2],
    [600, 250, 18, 3, 39.4, 26.3, 21.2, 13.1],
  ])('shares of w %d h %d t %d within half a point', (w, h, t, er, underside, ground, edges, top) => {
    const weights = wheelerFaceWeights(strip(w, h, er, t));
    const total = weights.underside + weights.top + weights.edges + weights.ground;
    const share = (x: number) => (100 * x) / total;
    expect(Math.abs(share(weights.underside) - underside)).toBeLessThan(0.5);
    expect(Math.abs(share(weights.ground) - ground)).toBeLessThan(0.5);
    expect(Math.abs(share(weights.edges) - edges)).toBeLessThan(0.5);
    expect(Math.abs(share(weights.top) - top)).toBeLessThan(0.5);
  });

  it('underside less top is the ground, for any strip: the force on the strip is that on the ground', () => {
    for (const g of [feed, strip(100, 127, 3, 18), strip(1250, 127, 3, 35)]) {
      const w = wheelerFaceWeights(g);
      expect((w.underside - w.top) / w.ground).toBeCloseTo(1, 5);
    }
  });

  it('growing the whole section changes no ratio: the weights obey the scaling of the inductance', () => {
    // L is a function of ratios only, so w dL/dw + h dL/dh + t dL/dt = 0.
    const w = wheelerFaceWeights(feed);
    const dLdw = -w.edges / 2;
    const dLdt = -w.top;
    const dLdh = w.ground;
    const terms = feed.width * dLdw + feed.height * dLdh + feed.thickness * dLdt;
    expect(Math.abs(terms)).toBeLessThan(1e-6 * feed.height * dLdh);
  });

  it('a strip without thickness has no walls', () => {
    expect(() => wheelerFaceWeights(strip(320, 127, 3, 0))).toThrow(RangeError);
    expect(sheetFaceWeights(300e-6, 100e-6)).toEqual({ underside: 1 / 300e-6, top: 0, edges: 0, ground: 1 / 500e-6 });
  });
});

describe('crowding with frequency', () => {
  it('vanishes at low frequency, and more as the slab thins', () => {
    const low = currentCrowding(feed, 1e8);
    expect(low.ground).toBeCloseTo(1, 3);
    expect(low.underLessTop).toBeCloseTo(1, 3);
    expect(currentCrowding(feed, 77e9).ground).toBeGreaterThan(currentCrowding(feed, 24e9).ground);
    expect(currentCrowding(strip(80, 32, 3, 5), 77e9).ground).toBeLessThan(currentCrowding(feed, 77e9).ground);
  });

  // Full-wave solutions made for this project: ratio of ground loss to its quasi-static value at equal Rs.
  it.each([
    [320, 127, 3, 77, 1.1765],
    [320, 127, 3, 24, 1.0406],
    [240, 100, 3.16, 77, 1.1418],
    [440, 200, 3.55, 77, 1.33],
    [1250, 127, 3, 77, 1.15],
  ])('ground loss of w %d h %d er %d at %d GHz is %d of its quasi-static value, within 2 %', (w, h, er, ghz, ratio) => {
    const g = strip(w, h, er, 0);
    const z = microstripDispersive(g, ghz * 1e9).impedance / microstripStatic(g).impedance;
    expect(Math.abs(currentCrowding(g, ghz * 1e9).ground / z / ratio - 1)).toBeLessThan(0.02);
  });

  it('moves current from top to underside and never makes a weight negative', () => {
    for (const g of [feed, strip(3000, 200, 3.5, 35), strip(100, 127, 3, 18)]) {
      const still = wheelerFaceWeights(g);
      const moved = crowdedFaceWeights(g, 77e9, still);
      expect(moved.underside).toBeGreaterThan(still.underside);
      expect(moved.top).toBeGreaterThanOrEqual(0);
      expect(moved.top).toBeLessThan(still.top);
    }
  });
});

describe('a lossy line', () => {
  it('without loss propagates at the effective permittivity with a real impedance', () => {
    const line = microstripLine({ geometry: feed, frequency: 77e9, lossTangent: 0, faces: lossless });
    expect(line.gamma.re).toBeLessThan(1e-9 * line.gamma.im);
    const k0 = (2 * Math.PI * 77e9) / 299792458;
    expect(line.gamma.im / (k0 * Math.sqrt(line.effectivePermittivity))).toBeCloseTo(1, 12);
    expect(line.characteristic.re).toBeCloseTo(line.impedance, 9);
  });

  it('loses what its faces and its dielectric take, per unit of current and voltage', () => {
    // Power balance of a travelling wave: 2α P = ½R|I|² + ½G|V|² with P = ½ Re(Zc)|I|².
    const line = microstripLine({ geometry: feed, frequency: 77e9, lossTangent: 0.002, faces: smooth(77e9) });
    const r = Object.values(line.seriesResistanceByFace).reduce((a, b) => a + b, 0);
    const zc = line.characteristic;
    const taken = r + line.shuntConductance * (zc.re * zc.re + zc.im * zc.im);
    expect(2 * line.gamma.re * zc.re).toBeCloseTo(taken, 9);
  });

  it('the reactance of smooth copper slows the wave', () => {
    const ideal = microstripLine({ geometry: feed, frequency: 77e9, lossTangent: 0, faces: lossless });
    const real = microstripLine({ geometry: feed, frequency: 77e9, lossTangent: 0, faces: smooth(77e9) });
    // An independent section gives 2.49 1/m quasi-static; crowding with frequency adds about 6 %.
    expect(real.gamma.im - ideal.gamma.im).toBeGreaterThan(2.45);
    expect(real.gamma.im - ideal.gamma.im).toBeLessThan(2.75);
  });

  it('loss of smooth copper grows a little faster than the square root of frequency', () => {
    const alpha = (f: number) =>
      microstripLine({ geometry: feed, frequency: f, lossTangent: 0, faces: smooth(f) }).gamma.re;
    const ratio = alpha(77e9) / alpha(24e9) / Math.sqrt(77 / 24);
    // Independent full wave: 0.22899/0.12251 dB/cm, 1.0435 over the square root.
    expect(Math.abs(ratio - 1.0435)).toBeLessThan(0.01);
  });

  it('a thin sheet takes the given impedance on the underside only', () => {
    const sheet = { ...feed, thickness: 0 };
    const z = halfSpaceImpedance(77e9, 5.8e7);
    const line = microstripLine({ geometry: sheet, frequency: 77e9, lossTangent: 0, faces: smooth(77e9) });
    const r = line.seriesResistanceByFace;
    expect(r.underside).toBeCloseTo(z.re / 320e-6, 9);
    expect(r.ground).toBeCloseTo(z.re / 574e-6, 9);
    expect([r.top, r.edges]).toEqual([0, 0]);
  });

  // Sheet solutions made for this project (strip and ground of smooth copper, zero thickness): w, h, er, tan δ, dB/mm.
  // A sheet of even current is crude below w/h 2: 5 % is what it is known to miss by.
  it.each([
    [80, 127, 3, 0.0015, 0.06153],
    [300, 127, 3, 0.0015, 0.043801],
    [80, 100, 3.16, 0.0025, 0.078743],
    [250, 100, 3.16, 0.0025, 0.062716],
    [300, 200, 3.55, 0.005, 0.077624],
  ])('sheet of w %d h %d: total loss within 5 % of full wave', (w, h, er, tand, dbPerMm) => {
    const line = microstripLine({
      geometry: strip(w, h, er, 0),
      frequency: 77e9,
      lossTangent: tand,
      faces: smooth(77e9),
    });
    expect(Math.abs((line.gamma.re * DB_PER_CM) / 10 / dbPerMm - 1)).toBeLessThan(0.05);
  });

  it('explicit weights are taken as they are', () => {
    const weights = { underside: 1, top: 2, edges: 3, ground: 4 };
    const one = { re: 1, im: 0 };
    const faces = { underside: one, top: one, edges: one, ground: one };
    const line = microstripLine({
      geometry: feed,
      frequency: 77e9,
      lossTangent: 0,
      faces,
      weights,
      groundDispersion: 2,
    });
    expect(line.seriesResistanceByFace).toEqual({ underside: 1, top: 2, edges: 3, ground: 8 });
  });
});

describe('rectangular guide', () => {
  it('refuses a frequency below cut-off', () => {
    const wall = { re: 0.07, im: 0.07 };
    expect(() =>
      rectangularGuide({
        width: 3e-3,
        height: 1.5e-3,
        permittivity: 1,
        lossTangent: 0,
        frequency: 40e9,
        walls: { top: wall, bottom: wall, left: wall, right: wall },
      }),
    ).toThrow(/cut-off/);
  });
});
