import { describe, expect, it } from 'vitest';
import { factoriseReal, solveReal } from '../../../src/numerics/real-lu.js';
import { MU0 } from '../../../src/physics/constants.js';
import { solvedMicrostrip, spectralLine, stillStrip, stripAt } from '../../../src/physics/line/index.js';
import { sheetSeries } from '../../../src/physics/line/sheet-strip.js';
import { halfSpaceImpedance } from '../../../src/physics/material/index.js';

/**
 * Inductance per length over µ0 of a strip of width 2 over a ground at height h, when the strip is a sheet with a magnetic
 * depth of its own: depth·J(x) + (1/2π) ∫ J ln(image/direct) dx' = L/µ0 for ∫J = 1. Pulses on a mesh that is geometric
 * towards the edges, distances counted from the edges; no spectral domain, no edge condition.
 */
function inductance(h: number, depth: number, n: number): number {
  const edge = Array.from({ length: n + 1 }, (_, i) => (i === 0 ? 0 : Math.sinh((14 * i) / n) / Math.sinh(14)));
  const length = edge.slice(1).map((e, i) => e - edge[i]!);
  const middle = edge.slice(1).map((e, i) => 0.5 * (e + edge[i]!));
  const primitive = (u: number): number => (u === 0 ? 0 : u * Math.log(Math.abs(u)) - u);
  const image = (u: number): number => 0.5 * u * Math.log(u * u + 4 * h * h) - u + 2 * h * Math.atan(u / (2 * h));
  const matrix = new Float64Array(n * n);
  for (let i = 0; i < n; i++)
    for (let j = 0; j < n; j++) {
      const [a, b] = [middle[i]! - edge[j]!, middle[i]! - edge[j + 1]!];
      const [c, d] = [2 - middle[i]! - edge[j + 1]!, 2 - middle[i]! - edge[j]!];
      const direct = primitive(a) - primitive(b) + primitive(d) - primitive(c);
      const mirrored = image(a) - image(b) + image(d) - image(c);
      matrix[i * n + j] = (mirrored - direct) / (2 * Math.PI) + (i === j ? depth : 0);
    }
  const current = new Float64Array(n).fill(1);
  solveReal(factoriseReal(matrix, n), current);
  return 1 / (2 * current.reduce((sum, j, i) => sum + j * length[i]!, 0));
}

describe('a strip without thickness as a sheet', () => {
  // Half the width is 1; in µm of a strip 320 µm wide 0.001 is a depth of 0.16 µm, near that of copper at 77 GHz.
  it.each([
    [0.5, 0.001],
    [0.8, 0.001],
    [0.8, 0.0005],
    [2.5, 0.001],
  ])('height %d and magnetic depth %d of half widths: series reactance against a strip solved directly', (h, depth) => {
    const width = 320e-6;
    const frequency = 1e8;
    const { squares } = spectralLine({ width, height: (h * width) / 2, permittivity: 1 }, frequency);
    const omega = 2 * Math.PI * frequency;
    const z = { re: 0, im: (omega * MU0 * depth * width) / 2 };
    const added = inductance(h, depth, 400) - inductance(h, 0, 400);
    const series = sheetSeries(squares, width, z, frequency);
    expect(series.re).toBeCloseTo(0, 9);
    // The edges are not quite apart from one another: 0.3 % at a depth of a thousandth of half the width.
    expect(Math.abs(series.im / (omega * MU0) / added - 1)).toBeLessThan(0.004);
  });

  it('of no impedance adds none', () => {
    const { squares } = spectralLine({ width: 320e-6, height: 127e-6, permittivity: 3 }, 77e9);
    expect(sheetSeries(squares, 320e-6, { re: 0, im: 0 }, 77e9)).toEqual({ re: 0, im: 0 });
  });

  it('takes power where its impedance does, and the more the more it resists', () => {
    const { squares } = spectralLine({ width: 320e-6, height: 127e-6, permittivity: 3 }, 77e9);
    const { re: rs } = halfSpaceImpedance(77e9, 5.8e7);
    const loss = [1, 2, 4].map((k) => sheetSeries(squares, 320e-6, { re: k * rs, im: k * rs }, 77e9).re);
    expect(loss[0]).toBeGreaterThan(0);
    // Less than in proportion: what resists spreads the current.
    expect(loss[1]! / loss[0]!).toBeGreaterThan(1.7);
    expect(loss[1]! / loss[0]!).toBeLessThan(2);
    expect(loss[2]! / loss[1]!).toBeLessThan(loss[1]! / loss[0]!);
  });
});

describe('solvedMicrostrip without thickness', () => {
  const geometry = { width: 320e-6, height: 127e-6, thickness: 0, permittivity: 3 };
  const z = halfSpaceImpedance(77e9, 5.8e7);
  const none = { re: 0, im: 0 };
  const faces = { underside: z, top: none, edges: none, ground: z };
  const input = { geometry, frequency: 77e9, lossTangent: 0.0015, faces };

  it('is the full wave of the strip, all of its current on the underside', () => {
    const wave = spectralLine(geometry, 77e9);
    const line = solvedMicrostrip(input);
    expect(line.impedance).toBe(wave.impedance);
    expect(line.effectivePermittivity).toBe(wave.effectivePermittivity);
    expect(line.seriesResistanceByFace.top).toBe(0);
    expect(line.seriesResistanceByFace.edges).toBe(0);
    expect(line.seriesResistanceByFace.ground).toBeCloseTo(z.re * wave.squares.ground, 9);
    expect(line.flags).toEqual([]);
  });

  it('impedances of top and edges mean nothing', () => {
    expect(solvedMicrostrip({ ...input, faces: { underside: z, top: z, edges: z, ground: z } })).toEqual(
      solvedMicrostrip(input),
    );
  });

  it('loses what its parts take', () => {
    const { gamma, seriesResistanceByFace: r, shuntConductance, impedance } = solvedMicrostrip(input);
    const parts = (r.underside + r.ground) / (2 * impedance) + 0.5 * shuntConductance * impedance;
    expect(Math.abs(gamma.re / parts - 1)).toBeLessThan(0.01);
  });

  it('weights without a sheet impedance are those of smooth copper', () => {
    const { weights } = stripAt(stillStrip(geometry), 77e9);
    expect(weights.underside * z.re).toBeCloseTo(solvedMicrostrip(input).seriesResistanceByFace.underside, 6);
  });

  it('loses more than strips with thickness, and they approach it as they thin', () => {
    const loss = (thickness: number): number =>
      solvedMicrostrip({
        ...input,
        lossTangent: 0,
        geometry: { ...geometry, thickness },
        faces: { underside: z, top: z, edges: z, ground: z },
      }).gamma.re;
    expect(loss(1e-6)).toBeGreaterThan(loss(5e-6));
    expect(loss(0)).toBeGreaterThan(loss(1e-6));
  });

  it('says where the sheet resists too much for its edges to be apart', () => {
    const codes = solvedMicrostrip({ ...input, geometry: { ...geometry, width: 50e-6 } }).flags.map((f) => f.code);
    expect(codes).toContain('strip.sheet-edge');
  });
});
