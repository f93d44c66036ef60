import { describe, expect, it } from 'vitest';
import {
  type CoverCoat,
  microstripLine,
  type StripSection,
  solvedMicrostrip,
  spectralLine,
  stillStrip,
  stripAt,
} from '../../../src/physics/line/index.js';
import { halfSpaceImpedance } from '../../../src/physics/material/index.js';

const um = 1e-6;
const DB_PER_CM = 20 / Math.LN10 / 100;
const strip = (w: number, h: number, t: number, er: number): StripSection => ({
  width: w * um,
  height: h * um,
  thickness: t * um,
  permittivity: er,
});
const feed = strip(320, 127, 18, 3);
const copper = (frequency: number) => {
  const z = halfSpaceImpedance(frequency, 5.8e7);
  return { underside: z, top: z, edges: z, ground: z };
};
const off = (value: number, expected: number): number => Math.abs(value / expected - 1);
const line = (geometry: StripSection, frequency = 77e9, lossTangent = 0, coverLossTangent = 0) =>
  solvedMicrostrip({ geometry, frequency, lossTangent, coverLossTangent, faces: copper(frequency) });
const mask = (shape: CoverCoat['shape'], thickness: number): CoverCoat => ({ shape, permittivity: 3.5, thickness });

describe('conductor loss of smooth copper', () => {
  // Independent full-wave growth times independent quasi-static loss of the thick strip, made for this project; the last
  // three are known to two digits of growth. dB/cm.
  it.each([
    [320, 127, 18, 3, 77, 0.22899, 0.01],
    [320, 127, 18, 3, 24, 0.12251, 0.01],
    [240, 100, 18, 3.16, 77, 0.28922, 0.01],
    [160, 127, 18, 3, 77, 0.2386 * 1.034, 0.01],
    [1250, 127, 35, 3, 77, 0.2026 * 1.1, 0.02],
    [440, 200, 35, 3.55, 77, 0.1467 * 1.1, 0.02],
  ])('w %d h %d t %d er %d at %d GHz: %d dB/cm', (w, h, t, er, ghz, expected, tolerance) => {
    expect(off(line(strip(w, h, t, er), ghz * 1e9).gamma.re * DB_PER_CM, expected)).toBeLessThan(tolerance);
  });

  it('the closed forms stay within 1.5 % of it on feed lines', () => {
    for (const g of [feed, strip(240, 100, 18, 3.16), strip(160, 127, 18, 3)]) {
      const closed = microstripLine({ geometry: g, frequency: 77e9, lossTangent: 0, faces: copper(77e9) });
      const solved = line(g);
      expect(off(closed.gamma.re, solved.gamma.re)).toBeLessThan(0.015);
      expect(off(closed.effectivePermittivity, solved.effectivePermittivity)).toBeLessThan(0.006);
      expect(off(closed.impedance, solved.impedance)).toBeLessThan(0.01);
    }
  });
});

describe('what a solved line obeys', () => {
  it.each([
    [feed],
    [{ ...feed, cover: mask('conformal', 15e-6) }],
    [strip(3000, 200, 35, 3.5)],
    [strip(40, 127, 18, 3)],
    [{ ...strip(200, 100, 30, 3), topWidth: 170 * um, cover: mask('planar', 40e-6) }],
  ])('passive, every face takes power, and the faces’ shares make the whole (%#)', (g) => {
    const { gamma, characteristic, seriesResistanceByFace, shuntConductance } = line(g, 77e9, 0.002, 0.02);
    const faces = Object.values(seriesResistanceByFace);
    for (const r of faces) expect(r).toBeGreaterThan(0);
    expect(shuntConductance).toBeGreaterThan(0);
    // 2α P = ½R|I|² + ½G|V|² with P = ½ Re(Zc)|I|².
    const zc = characteristic.re ** 2 + characteristic.im ** 2;
    const taken = faces.reduce((a, b) => a + b, 0) + shuntConductance * zc;
    expect(off(2 * gamma.re * characteristic.re, taken)).toBeLessThan(1e-9);
  });

  it('metal that only stores takes no power and slows the wave', () => {
    const z = { re: 0, im: 0.07 };
    const at = (k: number) => {
      const face = { re: 0, im: k * z.im };
      return solvedMicrostrip({
        geometry: feed,
        frequency: 77e9,
        lossTangent: 0,
        faces: { underside: face, top: face, edges: face, ground: face },
      }).gamma;
    };
    expect(at(1).re).toBeLessThan(1e-9 * at(1).im);
    expect(at(1).im).toBeGreaterThan(at(0).im);
  });

  it('at low frequency it is the quasi-static section', () => {
    const still = stillStrip(feed);
    const low = stripAt(still, 1e7);
    expect(off(low.impedance, still.thick!.impedance)).toBeLessThan(1e-6);
    expect(off(low.effectivePermittivity, still.thick!.effectivePermittivity)).toBeLessThan(1e-6);
    for (const face of ['underside', 'top', 'edges', 'ground'] as const)
      expect(off(low.weights[face], still.thick!.weights[face])).toBeLessThan(1e-5);
    expect(low.filling.slab).toBeCloseTo(still.thick!.filling.slab, 6);
  });

  it('a vanishing thickness leaves the full wave of the sheet', () => {
    const sheet = spectralLine({ width: 320 * um, height: 127 * um, permittivity: 3 }, 77e9);
    const solved = stripAt(stillStrip({ ...feed, thickness: 0.01 * um }), 77e9);
    expect(off(solved.effectivePermittivity, sheet.effectivePermittivity)).toBeLessThan(5e-4);
    expect(off(solved.impedance, sheet.impedance)).toBeLessThan(5e-4);
  });

  it('with frequency current leaves the top for underside and ground', () => {
    const still = stillStrip(feed);
    const [low, high] = [still.thick!.weights, stripAt(still, 77e9).weights];
    expect(high.top).toBeLessThan(low.top);
    expect(high.underside).toBeGreaterThan(low.underside);
    expect(high.ground).toBeGreaterThan(low.ground);
  });

  it('a solution kept by the caller is taken as it is', () => {
    const solution = stripAt(stillStrip(feed), 77e9);
    const input = { geometry: feed, frequency: 77e9, lossTangent: 0.002, faces: copper(77e9) };
    expect(solvedMicrostrip({ ...input, solution })).toEqual(solvedMicrostrip(input));
  });
});

describe('a cover on a line at 77 GHz', () => {
  it('slows the wave about as much as at rest and takes power by its own loss tangent', () => {
    const covered = { ...feed, cover: mask('planar', 25e-6) };
    const [bare, lossless, lossy] = [line(feed), line(covered), line(covered, 77e9, 0, 0.02)];
    const rise = lossless.effectivePermittivity / bare.effectivePermittivity - 1;
    // 7.7 % at rest; the field draws down into the slab with frequency, so a cover can only count for little less or more.
    expect(rise).toBeGreaterThan(0.065);
    expect(rise).toBeLessThan(0.095);
    expect(lossy.gamma.re).toBeGreaterThan(lossless.gamma.re * 1.2);
  });

  it('of permittivity 1 is none', () => {
    const empty = line({ ...feed, cover: { shape: 'planar', permittivity: 1, thickness: 25e-6 } });
    expect(off(empty.gamma.im, line(feed).gamma.im)).toBeLessThan(1e-6);
    expect(off(empty.gamma.re, line(feed).gamma.re)).toBeLessThan(1e-4);
  });
});

describe('flags and refusals', () => {
  const codes = (g: StripSection, frequency = 77e9) => line(g, frequency).flags.map((flag) => flag.code);

  it.each([24e9, 60e9, 77e9])('none on an ordinary feed line, bare or under a flat cover, at %d Hz', (frequency) => {
    expect(codes(feed, frequency)).toEqual([]);
    expect(codes({ ...feed, cover: mask('planar', 25e-6) }, frequency)).toEqual([]);
  });

  it.each([
    ['strip.thickness-range', strip(30, 127, 18, 3), 77e9],
    ['strip.width-range', strip(20, 127, 2, 3), 77e9],
    ['strip.width-range', strip(3300, 127, 18, 3), 77e9],
    ['strip.permittivity-range', strip(60, 127, 5, 12.9), 24e9],
    ['strip.height-range', strip(600, 254, 18, 3), 81e9],
    ['strip.slab-modes', strip(600, 1000, 18, 3), 77e9],
    ['strip.conformal-dispersion', { ...feed, cover: mask('conformal', 15e-6) }, 77e9],
    ['strip.skin-depths', strip(320, 127, 5, 3), 1e9],
  ])('%s', (code, g, frequency) => {
    expect(codes(g, frequency)).toContain(code);
  });

  it('refuses what is not physical, quoting it', () => {
    expect(() => line(feed, -1)).toThrow(/frequency.*got -1/);
    expect(() => line(feed, 77e9, -0.1)).toThrow(/loss tangent.*got -0.1/);
    expect(() => line({ ...feed, thickness: -1e-6 })).toThrow(/thickness.*got -0.000001/);
  });
});
