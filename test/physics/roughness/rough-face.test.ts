import { describe, expect, it } from 'vitest';
import { microstripStatic, wheelerFaceWeights } from '../../../src/physics/line/index.js';
import { platedImpedance, surfaceResistance } from '../../../src/physics/material/index.js';
import {
  type RoughnessModel,
  referToElectrostaticPlane,
  roughFace,
  roughPlatedFace,
} from '../../../src/physics/roughness/index.js';

const MODELS: RoughnessModel[] = ['smooth', 'hammerstad', 'groiss', 'gradient'];
const input = (rq: number, frequency = 77e9) => ({ rq, frequency, conductivity: 5.8e7, permittivity: 3 });
const codes = (model: RoughnessModel, rq: number) => roughFace(model, input(rq)).flags.map((f) => f.code);

describe.each(MODELS)('a rough face, %s', (model) => {
  it('is smooth copper at Rq 0', () => {
    const face = roughFace(model, input(0));
    const rs = surfaceResistance(77e9, 5.8e7);
    expect(face.impedance.re).toBeCloseTo(rs, 14);
    expect(face.impedance.im).toBeCloseTo(rs, 14);
    expect(face.planeShift).toBe(0);
    expect(face.flags).toEqual([]);
  });

  it('tends to smooth copper at low frequency', () => {
    expect(roughFace(model, input(1e-6, 10e6)).lossFactor).toBeCloseTo(1, 2);
  });

  it('never returns power, and is inductive at its electrostatic plane', () => {
    for (const rq of [0.1e-6, 0.4e-6, 1e-6, 3e-6])
      for (const f of [1e9, 24e9, 77e9, 100e9]) {
        const face = roughFace(model, input(rq, f));
        expect(face.impedance.re).toBeGreaterThan(0);
        expect(referToElectrostaticPlane(face).impedance.im).toBeGreaterThan(0);
      }
  });

  it('refuses a negative height', () => {
    if (model !== 'smooth') expect(() => roughFace(model, input(-1e-6))).toThrow(/got -0.000001/);
  });
});

describe('flags of a rough face', () => {
  it('a saturated factor is said to be saturated, and only then', () => {
    expect(codes('hammerstad', 0.3e-6)).toEqual([]);
    expect(codes('hammerstad', 1e-6)).toEqual(['roughness.hammerstad.saturated', 'roughness.hammerstad.phase']);
    expect(codes('groiss', 1e-6)).toContain('roughness.groiss.saturated');
  });

  it('Groiss on fine copper is outside its range', () => {
    expect(codes('groiss', 0.05e-6)).toEqual(['roughness.groiss.range']);
  });

  it('gradient on coarse copper is the upper side', () => {
    expect(codes('gradient', 0.1e-6)).toEqual([]);
    expect(codes('gradient', 1e-6)).toEqual(['roughness.gradient.upper-side']);
  });
});

describe('reference planes', () => {
  it('each micrometre of plane shift is 0.61 Ω at 77 GHz', () => {
    const face = { ...roughFace('smooth', input(0)), planeShift: 1e-6 };
    const moved = referToElectrostaticPlane(face);
    // ωµ0 · 1 µm = 2π·77e9·4πe-7·1e-6 = 0.608 Ω
    expect(moved.impedance.im - face.impedance.im).toBeCloseTo(0.608, 3);
    expect(moved.impedance.re).toBe(face.impedance.re);
    expect(moved.heightReduction).toBe(1e-6);
  });
});

describe('one plane or two', () => {
  it('a thinner dielectric with added reactance is, to first order, two separate planes', () => {
    // A small shift of both faces: inductance must stay as it was, since only the capacitance plane moved.
    const g = { width: 320e-6, height: 127e-6, thickness: 18e-6, permittivity: 3 };
    const shift = 20e-9;
    const moved = { ...g, height: g.height - 2 * shift, thickness: g.thickness + shift };
    const inductance = (x: typeof g) => {
      const s = microstripStatic(x);
      return (s.impedance * Math.sqrt(s.effectivePermittivity)) / 299792458;
    };
    const weight = wheelerFaceWeights(g);
    const added = 4e-7 * Math.PI * shift * (weight.underside + weight.ground);
    const lost = inductance(g) - inductance(moved);
    expect(Math.abs(added / lost - 1)).toBeLessThan(2e-3);
  });
});

describe('texture over a finish', () => {
  const layers = [
    { conductivity: 1.7e6, thickness: 4e-6, relativePermeability: 1 },
    { conductivity: 4.1e7, thickness: 50e-9, relativePermeability: 1 },
  ];
  const flat = platedImpedance(77e9, 5.8e7, layers);
  const at = (rq: number) => roughPlatedFace('hammerstad', flat, { rq, frequency: 77e9, permittivity: 1 });

  it('leaves a flat finish alone', () => {
    expect(at(0).impedance.re).toBeCloseTo(flat.re, 14);
    expect(at(0).impedance.im).toBeCloseTo(flat.im, 14);
  });

  it('on bare copper equals the rough face', () => {
    const bare = platedImpedance(77e9, 5.8e7, []);
    const plated = roughPlatedFace('gradient', bare, { rq: 0.4e-6, frequency: 77e9, permittivity: 3 });
    const direct = roughFace('gradient', input(0.4e-6));
    expect(plated.impedance.re).toBeCloseTo(direct.impedance.re, 9);
    expect(plated.impedance.im).toBeCloseTo(direct.impedance.im, 9);
  });

  it('hurts nickel less than copper, relatively', () => {
    expect(at(0.4e-6).lossFactor).toBeGreaterThan(1);
    expect(at(0.4e-6).lossFactor).toBeLessThan(roughFace('hammerstad', input(0.4e-6)).lossFactor);
  });
});
