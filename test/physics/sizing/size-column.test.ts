import { describe, expect, it } from 'vitest';
import { abs, complex, ONE } from '../../../src/numerics/complex.js';
import { type ColumnGeometry, edgeNetwork, type Slab } from '../../../src/physics/column/index.js';
import { surfaceResistance } from '../../../src/physics/material/index.js';
import { cutShape } from '../../../src/physics/pattern/index.js';
import {
  correctSizing,
  goalNotes,
  type SizingRequest,
  shortfall,
  sizeColumn,
} from '../../../src/physics/sizing/index.js';

const FREQUENCY = 77e9;
const rs = surfaceResistance(FREQUENCY, 5.8e7);
const z = complex(2 * rs, 3 * rs);
const faces = { underside: z, top: z, edges: z, ground: z };

const request = (more: Partial<SizingRequest> = {}): SizingRequest => ({
  frequency: FREQUENCY,
  patches: 6,
  taper: { kind: 'uniform' },
  slab: { permittivity: 3, lossTangent: 0.0015, height: 127e-6 },
  stripThickness: 18e-6,
  faces,
  feedLineWidth: 150e-6,
  leastWidth: 75e-6,
  leastGap: 75e-6,
  grid: 1e-6,
  ...more,
});

/** The network on another slab, as a stand-in for an engine that sees the same metal differently. */
function seen(geometry: ColumnGeometry, slab: Slab) {
  const solution = edgeNetwork(
    { slab, stripThickness: 18e-6, columns: [geometry], referenceImpedance: 'line' },
    FREQUENCY,
  ).solve({ frequency: FREQUENCY, faces });
  const excited = solution.excite([ONE]);
  const { beamDirection, sidelobeDb } = cutShape(excited.field.cut('elevation'));
  return {
    reflection: solution.scattering[0][0],
    patchCurrents: excited.patchCurrents[0],
    beamDirection,
    sidelobeDb,
  };
}
const db = (s: { re: number; im: number }): number => 20 * Math.log10(abs(s));
const deg = (rad: number): number => (rad * 180) / Math.PI;

describe('sizing of a column', () => {
  it.each([
    ['four uniform patches, εr 2.2', { patches: 4, slab: { permittivity: 2.2, lossTangent: 0.001, height: 127e-6 } }],
    [
      'five patches for −25 dB, εr 4 on 0.1 mm',
      {
        patches: 5,
        taper: { kind: 'dolph-chebyshev', sidelobeDb: 25 },
        slab: { permittivity: 4, lossTangent: 0.004, height: 100e-6 },
        feedLineWidth: 120e-6,
      },
    ],
    [
      'six patches for −22 dB after Taylor, 0.25 mm',
      {
        taper: { kind: 'taylor', sidelobeDb: 22, nBar: 3 },
        slab: { permittivity: 3, lossTangent: 0.0015, height: 250e-6 },
        feedLineWidth: 200e-6,
      },
    ],
  ] as const)('%s: matched, at broadside, with the lobes of its taper', (_, more) => {
    const asked = request(more as Partial<SizingRequest>);
    const sized = sizeColumn(asked);
    expect(db(sized.reflection)).toBeLessThan(-20);
    expect(Math.abs(deg(sized.beamDirection))).toBeLessThan(0.2);
    // The pattern of a single patch helps the lobes of the array factor down.
    const level = 'sidelobeDb' in asked.taper ? asked.taper.sidelobeDb : 11;
    expect(sized.sidelobeDb).toBeLessThan(-level + 0.5);
    for (const e of sized.excitationError) expect(abs({ re: e.re - 1, im: e.im })).toBeLessThan(0.03);
    for (const note of sized.notes) expect(note).toContain('before the first patch makes the match');
    // As anyone sees it who solves what is drawn.
    const { reflection } = seen(sized.geometry, asked.slab);
    expect(abs({ re: reflection.re - sized.reflection.re, im: reflection.im - sized.reflection.im })).toBeLessThan(
      1e-9,
    );
    for (const { width, length } of [...sized.geometry.patches, ...sized.geometry.links])
      for (const value of [width, length]) expect(Math.abs(value * 1e6 - Math.round(value * 1e6))).toBeLessThan(1e-6);
  });

  it('adds a quarter-wave section where patches may not be wide enough for the match', () => {
    const { geometry, reflection, notes } = sizeColumn(request({ patches: 4, greatestWidth: 1e-3 }));
    expect(geometry.matching).toHaveLength(1);
    expect(geometry.matching![0].width).toBeLessThan(150e-6);
    expect(Math.max(...geometry.patches.map((p) => p.width))).toBeLessThanOrEqual(1e-3 + 1e-12);
    expect(db(reflection)).toBeLessThan(-15);
    expect(notes.join(' ')).toContain('before the first patch makes the match');
  });

  it('draws narrower links where the feed line is wide, and matches by a section between the two in width', () => {
    const { geometry, reflection, excitationError } = sizeColumn(request({ patches: 4, feedLineWidth: 320e-6 }));
    const link = geometry.links[0].width;
    expect(link).toBeLessThan(200e-6);
    expect(geometry.feedLineWidth).toBe(320e-6);
    expect(geometry.matching![0].width).toBeGreaterThan(link);
    expect(geometry.matching![0].width).toBeLessThan(320e-6);
    expect(db(reflection)).toBeLessThan(-20);
    for (const e of excitationError) expect(abs({ re: e.re - 1, im: e.im })).toBeLessThan(0.03);
  });

  it('says which goals another engine sees missed, with its figures', () => {
    const asked = { taper: { kind: 'dolph-chebyshev', sidelobeDb: 20 } } as const;
    const poor = { reflection: complex(0.3, 0.4), beamDirection: 0.02, sidelobeDb: -17 };
    expect(shortfall(asked, poor)).toBeCloseTo(0.5 / 10 ** -0.75, 9);
    expect(goalNotes(asked, poor, 'full wave')).toEqual([
      'Reflection is -6.0 dB by the full wave; the goal is -15 dB.',
      'The beam points 1.1° off broadside by the full wave; the goal is 0.5°.',
      'The highest sidelobe is -17.0 dB by the full wave; asked for are −20 dB.',
    ]);
    const good = { reflection: complex(0.1, 0), beamDirection: 0.001, sidelobeDb: -19 };
    expect(shortfall(asked, good)).toBeLessThan(1);
    expect(goalNotes(asked, good)).toEqual([]);
  });

  it('says which limit binds and what is missed for it', () => {
    const { notes, geometry } = sizeColumn(
      request({ patches: 3, taper: { kind: 'given', amplitudes: [1, 1, 0.1] }, feedLineWidth: 200e-6 }),
    );
    expect(geometry.patches[2].width).toBeCloseTo(240e-6, 6);
    expect(notes.join(' ')).toContain('as narrow as it may be, 0.240 mm');
  });

  it.each([[{ kind: 'uniform' }], [{ kind: 'dolph-chebyshev', sidelobeDb: 25 }]] as const)(
    'comes right by one correction in the eyes of another engine: %o',
    (taper) => {
      const asked = request({ taper, patches: 4 });
      // Half a gigahertz away: as far as the network lies from full wave at worst.
      const slab = { permittivity: 3.03, lossTangent: 0.0015, height: 124e-6 };
      const sized = sizeColumn(asked);
      const before = seen(sized.geometry, slab);
      const corrected = correctSizing(asked, sized, before);
      const after = seen(corrected.geometry, slab);
      expect(db(before.reflection)).toBeGreaterThan(-22);
      expect(db(after.reflection)).toBeLessThan(-30);
      expect(Math.abs(deg(after.beamDirection))).toBeLessThan(Math.abs(deg(before.beamDirection)) / 4);
      expect(corrected.solves).toBeLessThan(sized.solves);
      // The next correction starts from the corrected column and keeps what was gained.
      const next = seen(correctSizing(asked, sized, after, corrected.geometry).geometry, slab);
      expect(db(next.reflection)).toBeLessThan(-30);
      expect(Math.abs(deg(next.beamDirection))).toBeLessThan(0.1);
    },
  );

  it('leaves alone what is right already', () => {
    const asked = request({ patches: 4 });
    const sized = sizeColumn(asked);
    const { geometry } = correctSizing(asked, sized, seen(sized.geometry, asked.slab));
    geometry.patches.forEach((p, i) => {
      expect(Math.abs(p.length - sized.geometry.patches[i].length)).toBeLessThan(1.5e-6);
      expect(p.width).toBeCloseTo(sized.geometry.patches[i].width, 9);
    });
  });

  it('refuses nonsense with the value received', () => {
    expect(() => sizeColumn(request({ patches: 1 }))).toThrow('got 1');
    expect(() => sizeColumn(request({ grid: 0 }))).toThrow('got 0');
    expect(() => sizeColumn(request({ feedLineWidth: 50e-6 }))).toThrow('narrower than the least width');
    const sized = sizeColumn(request({ patches: 2 }));
    expect(() => correctSizing(request({ patches: 2 }), sized, { reflection: ONE, patchCurrents: [] })).toThrow(
      '0 currents for 2 patches',
    );
  });
});
