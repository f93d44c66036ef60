import { describe, expect, it } from 'vitest';
import { type Complex, complex, div, mul, sub } from '../../../src/numerics/complex.js';
import { ellipticRatio } from '../../../src/numerics/elliptic.js';
import { ETA0, MU0 } from '../../../src/physics/constants.js';
import {
  type CoplanarGeometry,
  coplanarMapping,
  coplanarSection,
  groundedCoplanarLine,
  rectangularGuide,
  type SiwGeometry,
  type StriplineGeometry,
  siwEquivalentWidth,
  siwLine,
  stripline,
  striplineFaceWeights,
  striplineImpedance,
  thinStriplineImpedance,
} from '../../../src/physics/line/index.js';
import { halfSpaceImpedance } from '../../../src/physics/material/index.js';

const DB_PER_CM = 20 / Math.LN10 / 100;
const F77 = 77e9;
const copper = halfSpaceImpedance(F77, 5.8e7);
const times = (z: Complex, k: number): Complex => complex(k * z.re, k * z.im);
const sum = (record: Readonly<Record<string, number>> | readonly number[]): number =>
  Object.values(record).reduce((a, b) => a + b, 0);
const codes = (flags: readonly { code: string }[]): string[] => flags.map((f) => f.code);

describe('elliptic integrals', () => {
  it('K(k)/K(k′) against Abramowitz and Stegun 1964, table 17.1', () => {
    // m = 0.1: K 1.612441348720219, K′ = K(m = 0.9) 2.578092113348173.
    expect(ellipticRatio(Math.sqrt(0.1))).toBeCloseTo(1.612441348720219 / 2.578092113348173, 13);
    expect(ellipticRatio(Math.SQRT1_2)).toBeCloseTo(1, 14);
  });
});

describe('rectangular guide with a wall impedance each', () => {
  const NONE = complex(0);
  const guide = (walls: Partial<Record<'top' | 'bottom' | 'left' | 'right', Complex>>, frequency = F77) =>
    rectangularGuide({
      width: 3.0988e-3,
      height: 1.5494e-3,
      permittivity: 1,
      lossTangent: 0,
      frequency,
      walls: { top: NONE, bottom: NONE, left: NONE, right: NONE, ...walls },
    });

  it('a rough wall costs only its own share', () => {
    const all = { top: copper, bottom: copper, left: copper, right: copper };
    const smooth = guide(all).conductorLoss;
    const rough = guide({ ...all, bottom: times(copper, 3) }).conductorLoss;
    expect(rough.bottom / smooth.bottom).toBeCloseTo(3, 12);
    expect({ ...rough, bottom: 0 }).toEqual({ ...smooth, bottom: 0 });
    expect(guide(all).gamma.re).toBeCloseTo(sum(smooth), 3);
  });

  it('side walls of a given impedance: the exact transverse resonance cot(kx a/2) = Z kx/(jωµ)', () => {
    const a = 3.0988e-3;
    const z = complex(0.4, 0.7);
    const omega = 2 * Math.PI * F77;
    // Newton on kx from π/a; u = kx a/2, f(u) = cot u − u·c with c = 2Z/(jωµ a).
    const c = div(times(z, 2), complex(0, omega * MU0 * a));
    let u = complex(Math.PI / 2);
    for (let i = 0; i < 20; i++) {
      const s = { re: Math.sin(u.re) * Math.cosh(u.im), im: Math.cos(u.re) * Math.sinh(u.im) };
      const co = { re: Math.cos(u.re) * Math.cosh(u.im), im: -Math.sin(u.re) * Math.sinh(u.im) };
      const f = sub(div(co, s), mul(u, c));
      const slope = sub(times(div(complex(1), mul(s, s)), -1), c);
      u = sub(u, div(f, slope));
    }
    const kx2 = mul(times(u, 2 / a), times(u, 2 / a));
    const k0 = (omega * MU0) / ETA0;
    const gamma2 = complex(kx2.re - k0 * k0, kx2.im);
    const mine = guide({ left: z, right: z });
    const mine2 = mul(mine.gamma, mine.gamma);
    const still = mine.beta * mine.beta;
    // First order in Z/η0 of about 2e-3: the second order is a few thousandths of the change.
    expect((mine2.re + still) / (gamma2.re + still)).toBeCloseTo(1, 2);
    expect(mine2.im / gamma2.im).toBeCloseTo(1, 2);
  });

  it('reactance of a broad wall is magnetic depth: k² d/(2bβ) of phase for a depth d', () => {
    // A depth that holds H but no E scales both transverse and axial µ by 1 + d/b, so β² = k²(1 + d/b) − (π/a)².
    const d = 2e-6;
    const omega = 2 * Math.PI * F77;
    const line = guide({ top: complex(0, omega * MU0 * d) });
    const k = (omega * MU0) / ETA0;
    expect(line.gamma.im - line.beta).toBeCloseTo((k * k * d) / (2 * 1.5494e-3 * line.beta), 2);
    expect(line.gamma.re).toBeCloseTo(0, 12);
  });

  it('stays finite and is flagged close to cut-off, and flags a second mode', () => {
    const all = { top: copper, bottom: copper, left: copper, right: copper };
    const close = guide(all, 48.38e9);
    expect(close.gamma.re).toBeLessThan(sum(close.conductorLoss));
    expect(codes(close.flags)).toEqual(['guide.cutoff-range']);
    expect(codes(guide(all, 97e9).flags)).toEqual(['guide.higher-mode']);
    expect(guide(all).flags).toEqual([]);
  });
});

const siw: SiwGeometry = {
  rowDistance: 1.6e-3,
  viaDiameter: 0.3e-3,
  viaPitch: 0.5e-3,
  height: 127e-6,
  permittivity: 3,
};

describe('substrate-integrated waveguide', () => {
  const line = (foil: number, g = siw) =>
    siwLine({
      geometry: g,
      lossTangent: 0.0013,
      frequency: F77,
      walls: { top: times(copper, foil), bottom: times(copper, foil), vias: copper },
    });

  // Independent evaluation of the wall integrals, made for this project.
  it.each([
    [1, 0.37643],
    [2, 0.75286],
  ])('loss by face with K %d on the foils', (k, broad) => {
    const result = line(k);
    expect(result.cutoff * 1e-9).toBeCloseTo(61.324, 3);
    expect(result.beta).toBeCloseTo(1690.4, 1);
    expect(result.dielectricLoss * DB_PER_CM).toBeCloseTo(0.26096, 5);
    expect((result.conductorLoss.top + result.conductorLoss.bottom) * DB_PER_CM).toBeCloseTo(broad, 4);
    expect(result.conductorLoss.vias * DB_PER_CM).toBeCloseTo(0.042974, 5);
    expect(Math.abs(result.gamma.re / (result.dielectricLoss + sum(result.conductorLoss)) - 1)).toBeLessThan(0.01);
    expect(result.flags).toEqual([]);
  });

  it('both width rules, and their agreement', () => {
    expect(siwEquivalentWidth(siw, 'xu-wu') * 1e3).toBeCloseTo(1.4112, 4);
    expect(siwEquivalentWidth(siw, 'cassivi') * 1e3).toBeCloseTo(1.4105, 4);
  });

  it.each([
    [{ viaPitch: 0.7e-3 }, ['siw.leakage']],
    [{ viaPitch: 0.95e-3 }, ['siw.pitch-range', 'siw.leakage']],
    [{ viaDiameter: 0.35e-3 }, ['siw.diameter-range']],
  ])('flags %o', (change, expected) => {
    expect(codes(line(1, { ...siw, ...change }).flags)).toEqual(expected);
  });

  it.each([
    [{ viaPitch: 0.3e-3 }, /run into each other/],
    [{ viaDiameter: 1.7e-3, viaPitch: 2e-3 }, /fill rows/],
    [{ rowDistance: 1e-3, viaDiameter: 0.15e-3, viaPitch: 0.25e-3 }, /cut-off/],
    [{ height: 0 }, /height/],
  ])('refuses %o', (change, message) => {
    expect(() => line(1, { ...siw, ...change })).toThrow(message);
  });
});

const buried = (
  width: number,
  below: number,
  above: number,
  thickness: number,
  permittivity = 1,
): StriplineGeometry => ({
  width: width * 1e-6,
  heightBelow: below * 1e-6,
  heightAbove: above * 1e-6,
  thickness: thickness * 1e-6,
  permittivity,
});

describe('stripline', () => {
  it('no thickness: Wheeler 1978 against the exact mapping of Cohn 1954', () => {
    for (const w of [50, 100, 200, 400, 1000]) {
      const g = buried(w, 127, 127, 0, 3);
      const exact = thinStriplineImpedance(g.width, 254e-6) / Math.sqrt(3);
      expect(Math.abs(striplineImpedance(g) / exact - 1)).toBeLessThan(0.005);
    }
  });

  // Sections solved by boundary integrals in separate code, made for this project (air): impedance; weights in 1/m of one
  // broad face, both edges, one ground.
  it.each([
    [2655, 1595, 10, 73.546, 138.5, 97.6, 40.2],
    [200, 127, 18, 70.997, 1087.8, 1123.6, 484.2],
    [100, 127, 18, 101.449, 1801.7, 2357.7, 552.0],
    [150, 100, 35, 68.02, 1108.9, 1307.6, 581.9],
    [400, 127, 18, 44.544, 600.6, 441.9, 363.6],
  ])('w %d h %d t %d: impedance within 0.5 %, weights within 2 %', (w, h, t, impedance, face, edges, ground) => {
    const g = buried(w, h, h, t);
    const weights = striplineFaceWeights(g);
    expect(Math.abs(striplineImpedance(g) / impedance - 1)).toBeLessThan(0.005);
    for (const [mine, theirs] of [
      [weights.underside, face],
      [weights.top, face],
      [weights.edges, edges],
      [weights.lowerGround, ground],
    ])
      expect(Math.abs(mine / theirs - 1)).toBeLessThan(0.02);
  });

  // The same separate sections off centre, heights 1.42 and 2.5 to 1: impedance; underside, top, edges, grounds; how close.
  it.each([
    [127, 180, 78.385, [1269.1, 933.1, 1173.0, 616.4, 280.6], 0.005, 0.08],
    [100, 250, 75.416, [1552.0, 718.1, 1140.2, 951.1, 117.9], 0.02, 0.3],
  ])('off centre, %d below and %d above', (below, above, impedance, sections, close, closeByFace) => {
    const g = buried(200, below, above, 18);
    const { underside, top, edges, lowerGround, upperGround } = striplineFaceWeights(g);
    expect(Math.abs(striplineImpedance(g) / impedance - 1)).toBeLessThan(close);
    const mine = [underside, top, edges, lowerGround, upperGround];
    for (const [i, theirs] of sections.entries()) expect(Math.abs(mine[i] / theirs - 1)).toBeLessThan(closeByFace);
    expect(sum(mine) / sum(sections)).toBeCloseTo(1, 1);
  });

  it('flags what lies beyond the comparisons and takes losses by face', () => {
    const faces = { underside: copper, top: copper, edges: copper, lowerGround: times(copper, 2), upperGround: copper };
    const at = (g: StriplineGeometry) => stripline({ geometry: g, frequency: F77, lossTangent: 0.001, faces });
    const line = at(buried(200, 127, 127, 18, 3));
    expect(line.conductorLoss.lowerGround / line.conductorLoss.upperGround).toBeCloseTo(2, 9);
    expect(line.gamma.re / (line.dielectricLoss + sum(line.conductorLoss))).toBeCloseTo(1, 2);
    expect(line.flags).toEqual([]);
    expect(codes(at(buried(60, 127, 300, 120, 3)).flags)).toEqual([
      'stripline.off-centre',
      'stripline.thickness-range',
      'stripline.width-range',
    ]);
    expect(() => at(buried(200, 127, 127, 0, 3))).toThrow(/thickness/);
  });
});

const coplanar = (w: number, gap: number, h: number, t: number, permittivity: number): CoplanarGeometry => ({
  width: w * 1e-6,
  gap: gap * 1e-6,
  height: h * 1e-6,
  thickness: t * 1e-6,
  permittivity,
});

describe('grounded coplanar line', () => {
  // Solved in separate code (even charges, twice as many elements), made for this project.
  it.each([
    [200, 100, 127, 18, 3, 56.818, 2.1121, 5127],
    [250, 150, 127, 18, 3, 53.106, 2.2195, 4094],
    [300, 100, 254, 35, 3, 55.885, 1.9493, 3842],
    [150, 60, 127, 18, 3.55, 54.795, 2.2425, 7169],
    [300, 300, 127, 18, 3, 49.596, 2.332, 3475],
  ])('w %d slot %d h %d t %d er %d', (w, gap, h, t, er, impedance, permittivity, total) => {
    const section = coplanarSection(coplanar(w, gap, h, t, er));
    expect(Math.abs(section.impedance / impedance - 1)).toBeLessThan(0.001);
    expect(Math.abs(section.effectivePermittivity / permittivity - 1)).toBeLessThan(0.001);
    expect(Math.abs(sum(section.weights) / total - 1)).toBeLessThan(0.004);
  });

  it('far side grounds leave the microstrip: faces of the independent section of 320 µm on 127 µm', () => {
    const { weights, impedance } = coplanarSection(coplanar(320, 5000, 127, 18, 3));
    expect(Math.abs(impedance / 48.205 - 1)).toBeLessThan(0.002);
    for (const [mine, theirs] of [
      [weights.underside, 1306],
      [weights.top, 364],
      [weights.edges, 706.63],
      [weights.ground, 943.13],
    ])
      expect(Math.abs(mine / theirs - 1)).toBeLessThan(0.01);
    expect(weights.sideTop + weights.sideUnderside + weights.sideEdges).toBeLessThan(0.1);
  });

  it('thin metal and narrow slots: the conformal mapping of Ghione and Naldi', () => {
    const g = coplanar(200, 20, 127, 0.2, 3);
    const mapped = coplanarMapping(g);
    const solved = coplanarSection(g);
    // Thickness of a hundredth of the slot still lowers the impedance by some 2 %, by t/π (1 + ln 4πw/t) of slot.
    expect(solved.impedance / mapped.impedance).toBeGreaterThan(0.97);
    expect(solved.impedance / mapped.impedance).toBeLessThan(1);
    expect(Math.abs(solved.effectivePermittivity / mapped.effectivePermittivity - 1)).toBeLessThan(0.015);
  });

  it('a ground far below leaves the coplanar line: exact mapping in air', () => {
    const g = coplanar(100, 50, 20000, 0.05, 1);
    expect(coplanarMapping(g).impedance).toBeCloseTo(ETA0 / 4 / ellipticRatio(0.5), 2);
    expect(Math.abs(coplanarSection(g).impedance / coplanarMapping(g).impedance - 1)).toBeLessThan(0.005);
  });

  it('vertical force on the metal is that on the ground', () => {
    for (const g of [coplanar(200, 100, 127, 18, 3), coplanar(300, 100, 254, 35, 3)]) {
      const { underside, sideUnderside, top, sideTop, ground } = coplanarSection(g).weights;
      expect(Math.abs((underside + sideUnderside - top - sideTop) / ground - 1)).toBeLessThan(0.003);
    }
  });

  it('the stop distance t/(4π e^π) of Lewin and Vainshtein for thin metal, in air without ground', () => {
    // Holloway and Kuester, IEEE Trans. Microwave Theory Tech. 43(12), 1995: closed form from the current of thin metal.
    const [a, b, t] = [50e-6, 100e-6, 0.25e-6];
    const stop = t / (4 * Math.PI * Math.exp(Math.PI));
    // K(1/2) of modulus, Abramowitz and Stegun 1964, table 17.1.
    const K = 1.6857503548125961;
    const bracket =
      Math.log((2 * a * (b - a)) / (stop * (b + a))) / a + Math.log((2 * b * (b - a)) / (stop * (b + a))) / b;
    const closed = (b * b * bracket) / (8 * K ** 2 * (b * b - a * a));
    const total = sum(coplanarSection(coplanar(100, 50, 20000, 0.25, 1)).weights);
    expect(Math.abs(total / closed - 1)).toBeLessThan(0.03);
  });

  it('converges with the mesh', () => {
    const g = coplanar(200, 100, 127, 18, 3);
    const [one, two] = [coplanarSection(g), coplanarSection(g, 2)];
    expect(Math.abs(one.impedance / two.impedance - 1)).toBeLessThan(5e-4);
    for (const face of Object.keys(one.weights) as (keyof typeof one.weights)[])
      expect(Math.abs(one.weights[face] / two.weights[face] - 1)).toBeLessThan(0.005);
  });

  it('loss by face and what it flags', () => {
    const faces = { underside: times(copper, 2), top: copper, edges: copper, ground: copper };
    const line = (frequency: number) =>
      groundedCoplanarLine({ geometry: coplanar(150, 60, 127, 18, 3), frequency, lossTangent: 0.0013, faces });
    const at = line(F77);
    expect(at.conductorLoss.underside / at.conductorLoss.top).toBeCloseTo(
      (2 * at.weights.underside) / at.weights.top,
      9,
    );
    expect(at.gamma.re / (at.dielectricLoss + sum(at.conductorLoss))).toBeCloseTo(1, 2);
    expect(codes(at.flags)).toEqual(['coplanar.section-range', 'coplanar.side-grounds']);
    expect(codes(line(10e9).flags)).toEqual(['coplanar.side-grounds']);
  });
});
