import { describe, expect, it } from 'vitest';
import { microstripStatic, thicknessEndExtension } from '../../../src/physics/line/index.js';

const strip = (width: number, thickness: number) => ({ width, height: 127e-6, thickness, permittivity: 3 });

describe('open end of thick metal', () => {
  it('is nothing for a sheet and grows with thickness', () => {
    expect(thicknessEndExtension(strip(1.25e-3, 0))).toBe(0);
    const [thin, thick] = [18e-6, 35e-6].map((t) => thicknessEndExtension(strip(1.25e-3, t)));
    expect(thin).toBeGreaterThan(0);
    expect(thick).toBeGreaterThan(thin);
    // Below the metal's own thickness: the side wall adds less than a plate of its size at the height of the strip would.
    expect(thick).toBeLessThan(35e-6);
  });

  it('rests on what thickness adds to the capacitance of a line, as independent sections have it', () => {
    // Independent quasi-static sections (made for this project, not measured): w 320, h 127 µm, permittivity 3:
    // t 18 µm 48.205 Ω, 2.3802; t 35 µm 47.178 Ω, 2.3515.
    const capacitance = (z: number, e: number): number => Math.sqrt(e) / z;
    const expected = capacitance(47.178, 2.3515) - capacitance(48.205, 2.3802);
    const at = (t: number): number => {
      const line = microstripStatic(strip(320e-6, t));
      return capacitance(line.impedance, line.effectivePermittivity);
    };
    // A difference of two capacitances that agree within 0.1 %, itself 1.6 % of them: 10 % of it.
    expect(Math.abs((at(35e-6) - at(18e-6)) / expected - 1)).toBeLessThan(0.1);
  });

  it('does not depend on the width once the line is wide: it is a property of the edge', () => {
    const perEdge = (w: number): number => {
      const line = microstripStatic(strip(w, 18e-6));
      return (thicknessEndExtension(strip(w, 18e-6)) * Math.sqrt(line.effectivePermittivity)) / line.impedance / w;
    };
    expect(perEdge(2.5e-3) / perEdge(1.25e-3)).toBeCloseTo(1, 1);
  });
});
