import { describe, expect, it } from 'vitest';
import { type StripSection, type StripSolution, stillStrip, stripAt } from '../../src/physics/line/index.js';
import { tabledStrip as fromTable } from '../../src/study/strip-table.js';

const um = 1e-6;
const off = (value: number, expected: number): number => Math.abs(value / expected - 1);
/** What the cells are laid around: near enough to the first cases to hold them in one. */
const anchor = {
  section: { width: 150e-6, height: 127e-6, thickness: 18e-6, permittivity: 3 } as StripSection,
  frequency: 76.5e9,
};
const tabledStrip = (section: StripSection, frequency: number) => {
  const cover = section.cover && { ...section.cover, permittivity: 3.5 };
  return fromTable(section, frequency, { ...anchor, section: { ...anchor.section, ...(cover ? { cover } : {}) } });
};
const sum = ({ weights }: StripSolution): number => Object.values(weights).reduce((a, b) => a + b, 0);

/** Feed lines as tolerances, textures and temperatures move them: width, height, thickness, permittivity; GHz. */
const cases: readonly (readonly [number, number, number, number, number])[] = [
  [150, 127, 18, 3, 76.5],
  [165, 121, 18.4, 3.04, 76],
  [135, 133, 14, 2.96, 77],
  [150, 117, 23, 3, 77],
  [320, 127, 18, 3, 76.5],
  [440, 200, 35, 3.55, 79],
  [240, 100, 18, 3.16, 24],
];

describe('tabled strips', () => {
  it.each(cases)('are as solved: w %d h %d t %d µm er %d at %d GHz', (w, h, t, er, ghz) => {
    const section: StripSection = { width: w * um, height: h * um, thickness: t * um, permittivity: er };
    const tabled = tabledStrip(section, ghz * 1e9);
    const solved = stripAt(stillStrip(section), ghz * 1e9);
    // A tenth of the solver's own accuracy, and half of what is wanted of the permittivity.
    expect(off(tabled.effectivePermittivity, solved.effectivePermittivity)).toBeLessThan(1e-4);
    expect(off(tabled.impedance, solved.impedance)).toBeLessThan(1.5e-4);
    expect(off(tabled.filling.slab, solved.filling.slab)).toBeLessThan(2e-4);
    expect(off(sum(tabled), sum(solved))).toBeLessThan(2e-4);
    for (const face of ['underside', 'top', 'edges', 'ground'] as const)
      expect(off(tabled.weights[face], solved.weights[face])).toBeLessThan(1.5e-3);
  });

  it('with a cover thicker than the strip too', () => {
    const section: StripSection = {
      width: 155 * um,
      height: 125 * um,
      thickness: 18.5 * um,
      permittivity: 3.02,
      cover: { permittivity: 3.4, thickness: 29 * um, shape: 'planar' },
    };
    const tabled = tabledStrip(section, 76.6e9);
    const solved = stripAt(stillStrip(section), 76.6e9);
    expect(off(tabled.effectivePermittivity, solved.effectivePermittivity)).toBeLessThan(1e-3);
    expect(off(tabled.filling.cover, solved.filling.cover)).toBeLessThan(0.01);
    expect(off(sum(tabled), sum(solved))).toBeLessThan(1e-3);
  });

  it('scale: all lengths and the wavelength alike change no ratio', () => {
    const section: StripSection = { width: 150 * um, height: 127 * um, thickness: 18 * um, permittivity: 3 };
    const twice = { ...section, width: 300 * um, height: 254 * um, thickness: 36 * um };
    const [a, b] = [tabledStrip(section, 76e9), tabledStrip(twice, 38e9)];
    expect(b.impedance).toBeCloseTo(a.impedance, 9);
    expect(b.weights.ground).toBeCloseTo(a.weights.ground / 2, 6);
  });

  it('carry the flags of the strip itself, not of its neighbours', () => {
    const section: StripSection = { width: 30 * um, height: 127 * um, thickness: 18 * um, permittivity: 3 };
    expect(tabledStrip(section, 76e9).flags.map(({ code }) => code)).toEqual(['strip.thickness-range']);
  });
});
