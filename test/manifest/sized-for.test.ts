import { describe, expect, it } from 'vitest';
import type { Taper } from '../../src/manifest/index.js';
import { boardOf, boardsOf } from './array-fixture.js';

const wanted = (taper: string, more = '') =>
  `  sized_for: { frequency: 76.5 GHz, patches: 6, taper: ${taper}, least_width: 75 um, least_gap: 100 um, grid: 1 um }\n${more}`;
const sized = (taper: string, more = '') => boardOf({ undrawn: true, array: wanted(taper, more) });

describe('a layout to be worked out', () => {
  it('states what is wanted of it', () => {
    const { sizedFor, sized: outcome } = sized('uniform');
    expect(sizedFor).toEqual({
      frequency: 76.5e9,
      patches: 6,
      taper: { kind: 'uniform' },
      leastWidth: 75e-6,
      leastGap: 100e-6,
      grid: 1e-6,
    });
    expect(outcome).toBeUndefined();
  });

  it.each<[string, Taper]>([
    ['{ dolph_chebyshev: 25 dB }', { kind: 'dolph-chebyshev', sidelobeDb: 25 }],
    ['{ taylor: { sidelobe: 22.5 dB, n_bar: 4 } }', { kind: 'taylor', sidelobeDb: 22.5, nBar: 4 }],
    ['{ given: [0.4, 0.8, 1, 1, 0.8, 0.4] }', { kind: 'given', amplitudes: [0.4, 0.8, 1, 1, 0.8, 0.4] }],
  ])('takes the taper %s', (written, taper) => {
    expect(sized(written).sizedFor!.taper).toEqual(taper);
  });

  it('holds a guess in its place: patches near half a guided wave, neighbours in phase', () => {
    const { columns, pitch } = sized('uniform', '  direction: alternate\n');
    expect(columns).toHaveLength(3);
    expect(columns[1]!.direction).toBe(-1);
    const halfWaveInAir = 299792458 / 76.5e9 / 2;
    for (const { patches, links, feedLine } of columns) {
      expect([patches.length, links.length]).toEqual([6, 5]);
      for (const { width, length } of patches) {
        // Between half a wave in the laminate (εr 3) and in air, and off the edges by the open ends.
        expect(length).toBeGreaterThan(0.9 * (halfWaveInAir / Math.sqrt(3)));
        expect(length).toBeLessThan(halfWaveInAir);
        expect(width).toBeLessThan(pitch);
      }
      for (const { width, length } of links) {
        expect(width).toBe(feedLine.width);
        expect(length).toBeGreaterThan(halfWaveInAir / Math.sqrt(3));
        expect(length).toBeLessThan(halfWaveInAir);
      }
      for (const { length } of [...patches, ...links]) expect(length * 1e6).toBeCloseTo(Math.round(length * 1e6), 6);
    }
  });

  it('takes the place of what is drawn in a variant, and gives way to it', () => {
    const MODELINE = 'id: qs-2\ntitle: Variant\nbased_on: qs-1\n';
    const variant = (array: string, parent: Parameters<typeof boardsOf>[0]) =>
      boardsOf(parent, { 'boards/qs-2.yaml': `${MODELINE}array:\n${array}` })[1]!;
    const fromDrawn = variant(wanted('uniform'), {});
    expect(fromDrawn.sizedFor!.patches).toBe(6);
    expect(fromDrawn.overrides).toEqual(['array.sized_for']);
    const parent = { undrawn: true, array: wanted('uniform') };
    const drawn = '  patches: { count: 2, width: 1 mm, length: 1 mm }\n  links: { width: 0.2 mm, length: 1.2 mm }\n';
    const fromSized = variant(drawn, parent);
    expect(fromSized.sizedFor).toBeUndefined();
    expect(fromSized.columns[0]!.links).toEqual([{ width: 0.2e-3, length: 1.2e-3 }]);
    const other = variant(wanted('uniform').replace('patches: 6', 'patches: 8'), parent);
    expect(other.sizedFor!.patches).toBe(8);
    expect(other.columns[0]!.patches).toHaveLength(8);
  });
});
