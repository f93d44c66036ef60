import { describe, expect, it } from 'vitest';
import type { ColumnGeometry } from '../../../src/physics/column/engine.js';
import { fullWave } from '../../../src/physics/full-wave/index.js';

const sheet = (re: number, im = re) => ({
  underside: { re, im },
  top: { re, im },
  edges: { re, im },
  ground: { re, im },
});
const column = (y: number, patches: number, x = 0): ColumnGeometry => ({
  x,
  y,
  feedLineWidth: 0.15e-3,
  patches: Array.from({ length: patches }, () => ({ width: 0.995e-3, length: 1.061e-3 })),
  links: Array.from({ length: patches - 1 }, () => ({ width: 0.15e-3, length: 1.238e-3 })),
});
const slab = { permittivity: 3, lossTangent: 0.0015, height: 0.127e-3 };
const band = { low: 76e9, high: 80e9 };
const settings = { cellsPerPatch: 14 };
const board = (columns: readonly ColumnGeometry[], stripThickness = 0) =>
  fullWave({ slab, stripThickness, columns, referenceImpedance: 'line' }, band, settings);

describe('columns by full wave', () => {
  const pair = board([column(-1.06e-3, 2), column(1.06e-3, 3)]).solve({ frequency: 78e9, faces: sheet(0.07) });

  it('scatter passively, also columns that differ', () => {
    const s = pair.scattering;
    for (const k of [0, 1])
      expect(s[0][k].re ** 2 + s[0][k].im ** 2 + s[1][k].re ** 2 + s[1][k].im ** 2).toBeLessThan(1);
  });

  it('balance their power but for what the feed lines disturb', () => {
    const { power } = pair.excite([
      { re: 1, im: 0 },
      { re: 0, im: 0.5 },
    ]);
    const { radiated, surfaceWave, underside, ground, dielectric, accepted } = power;
    expect(Math.abs((radiated + surfaceWave + underside + ground + dielectric) / accepted - 1)).toBeLessThan(0.05);
    for (const part of Object.values({ radiated, surfaceWave, underside, ground, dielectric }))
      expect(part).toBeGreaterThan(0);
  });

  it('two mirror images see the same, and hardly each other when far apart', () => {
    const alone = board([column(0, 2)]).solve({ frequency: 78e9, faces: sheet(0.07) }).scattering[0][0];
    const s = board([column(-9e-3, 2), column(9e-3, 2)]).solve({ frequency: 78e9, faces: sheet(0.07) }).scattering;
    expect(Math.hypot(s[0][0].re - s[1][1].re, s[0][0].im - s[1][1].im)).toBeLessThan(1e-12);
    expect(Math.hypot(s[0][0].re - alone.re, s[0][0].im - alone.im)).toBeLessThan(0.02);
    expect(Math.hypot(s[1][0].re, s[1][0].im)).toBeLessThan(0.02);
  });

  it('fed from the other end radiate the mirrored pattern', () => {
    const forth = board([column(0, 2)]).solve({ frequency: 78e9, faces: sheet(0) });
    const back = board([{ ...column(0, 2), direction: -1 }]).solve({ frequency: 78e9, faces: sheet(0) });
    expect(back.scattering[0][0].re).toBeCloseTo(forth.scattering[0][0].re, 2);
    const cuts = [forth, back].map((s) => s.excite([{ re: 1, im: 0 }]).field.cut('elevation'));
    expect(cuts[1](-0.3) / cuts[0](0.3)).toBeCloseTo(1, 1);
  });

  it('resonate lower with thicker metal, and give the rest of their wave to a termination', () => {
    const phase = (thickness: number): number => {
      const { re, im } = board([column(0, 1)], thickness).solve({ frequency: 77e9, faces: sheet(0.07) })
        .scattering[0][0];
      return Math.atan2(im, re);
    };
    expect(phase(35e-6)).not.toBeCloseTo(phase(0), 3);
    const ended = board([{ ...column(0, 2), termination: { width: 0.15e-3 } }]);
    const { power } = ended.solve({ frequency: 78e9, faces: sheet(0.07) }).excite([{ re: 1, im: 0 }]);
    expect(power.load).toBeGreaterThan(0.01);
    const { radiated, surfaceWave, underside, top, edges, ground, dielectric, load, accepted } = power;
    const sum = radiated + surfaceWave + underside + top + edges + ground + dielectric + load;
    expect(Math.abs(sum / accepted - 1)).toBeLessThan(0.08);
  });
});
