import { describe, expect, it } from 'vitest';
import { differencesBetween } from '../../src/dossier/differences.js';
import type { Board, Texture } from '../../src/manifest/model.js';
import { board, figure } from './board-fixture.js';

/** Fields that say where something comes from or what it is called, and change no result. */
const APART = new Set([
  'id',
  'title',
  'description',
  'basedOn',
  'file',
  'overrides',
  'path',
  'provenance',
  'declared',
  'stated',
  'instrument',
  'filter',
  'conversion',
  'basis',
  'invented',
  'untreatedFace',
  'treatedFace',
  // Of a file that is named: boards with other points name another file.
  'points',
]);

/** Every path to a number or text of the board that a result may depend on. */
function leaves(value: unknown, path: readonly string[] = []): readonly (readonly string[])[] {
  if (typeof value === 'number' || typeof value === 'string') return [path];
  if (typeof value !== 'object' || value === null) return [];
  return Object.entries(value).flatMap(([key, child]) => (APART.has(key) ? [] : leaves(child, [...path, key])));
}

function changed(value: unknown, [key, ...rest]: readonly string[]): unknown {
  if (key === undefined) return typeof value === 'number' ? value * 1.5 + 1e-6 : `${value}x`;
  const copy: Record<string, unknown> | unknown[] = Array.isArray(value) ? [...value] : { ...(value as object) };
  (copy as Record<string, unknown>)[key] = changed((value as Record<string, unknown>)[key], rest);
  return copy;
}

const base = board('qb-1');
/** All that may be known of a texture. */
const known = (path: string, texture: Texture): Texture => ({
  ...texture,
  rz: figure(`${path}.rz`, 2.2e-6, 0.3e-6),
  correlationLength: figure(`${path}.length`, 1.1e-6, 0.1e-6),
  developedAreaRatio: figure(`${path}.sdr`, 0.12, 0.02),
  lay: 'across',
  nodule: { radius: figure(`${path}.radius`, 0.2e-6, 0), pitch: figure(`${path}.pitch`, 0.6e-6, 0), layers: 2 },
});
const { strip, ground } = base.stackUp;
/** Every field that only some layouts have, on one column. */
const laidOut = base.columns.map((column, i) =>
  i === 0
    ? {
        ...column,
        direction: -1 as const,
        matching: [{ width: 0.3e-3, length: 0.6e-3 }],
        inset: { depth: 0.3e-3, gap: 0.1e-3 },
        termination: { width: 0.2e-3 },
        sideFeed: { link: 1, side: 1 as const },
      }
    : column,
);
const full: Board = {
  ...base,
  columns: laidOut,
  groups: [{ id: 'tx', columns: [0, 1] }],
  scan: { low: -0.5, high: 0.4 },
  sizedFor: {
    frequency: 76.5e9,
    patches: 6,
    taper: { kind: 'taylor', sidelobeDb: 25, nBar: 4 },
    leastWidth: 1e-4,
    leastGap: 1.1e-4,
    grid: 1e-6,
  },
  feedNetwork: {
    divider: 'tee',
    lineWidth: 0.2e-3,
    trunkLength: 3e-3,
    levelLength: 4e-3,
    transition: { file: 'launch.s2p', referenceImpedance: 50, points: [{ frequency: 76e9, s: [[0, 0]] }] },
  },
  referenceImpedance: 50,
  stackUp: {
    ...base.stackUp,
    strip: {
      ...strip,
      dielectricFace: { ...strip.dielectricFace, texture: known('s', strip.dielectricFace.texture) },
      outerFace: { ...strip.outerFace, texture: known('o', strip.outerFace.texture) },
    },
    ground: {
      ...ground,
      dielectricFace: { ...ground.dielectricFace, texture: known('g', ground.dielectricFace.texture) },
    },
    cover: {
      material: 'mask',
      permittivity: figure('c.permittivity', 3.5, 0.1),
      lossTangent: figure('c.loss_tangent', 0.02, 0.01),
      thickness: figure('c.thickness', 25e-6, 5e-6),
    },
    laminate: {
      ...base.stackUp.laminate,
      material: {
        ...base.stackUp.laminate.material,
        permittivityTemperatureCoefficient: figure('l.tce', -20e-6, 5e-6),
        lossTangentTemperatureCoefficient: figure('l.tcd', 2e-3, 5e-4),
        inPlanePermittivity: figure('l.plane', 3.1, 0.05),
        water: { uptake: figure('l.water', 4e-4, 1e-4), permittivityPerShare: 20, lossTangentPerShare: 1.5 },
      },
    },
  },
  feed: base.feed.map((path, i) =>
    i === 0 ? { ...path, line: { width: 0.16e-3, length: 4e-3 }, lossDb: undefined } : path,
  ),
};

describe('differences between boards', () => {
  it('are none between a board and itself', () => {
    expect(differencesBetween([full, { ...full, id: 'other', title: 'Other' }])).toEqual([]);
  });

  it('show what Rq cannot see, and the file that it was measured in', () => {
    const measured = {
      file: 'textures/kf.csv',
      sha256: 'cd'.repeat(32),
      kind: 'profile' as const,
      interval: 1e-7,
      extent: 1e-4,
      remarks: [],
    };
    const gentle = { ...strip.dielectricFace.texture, correlationLength: figure('c', 3e-6, 0), measured };
    const other = {
      ...base,
      stackUp: { ...base.stackUp, strip: { ...strip, dielectricFace: { ...strip.dielectricFace, texture: gentle } } },
    };
    const found = differencesBetween([base, other]);
    expect(found.map(({ label }) => label)).toEqual(['Strip, dielectric face']);
    expect(found[0].values[0]).toContain('no correlation length');
    expect(found[0].values[1]).toMatch(/correlation length 3.*measured: textures\/kf\.csv/);
  });

  it('show the frequency that a permittivity was taken at, from which dispersion counts', () => {
    const { laminate } = base.stackUp;
    const { permittivity } = laminate.material;
    const moved = { ...permittivity, provenance: { ...permittivity.provenance, frequency: 77e9 } };
    const other = {
      ...base,
      stackUp: {
        ...base.stackUp,
        laminate: { ...laminate, material: { ...laminate.material, permittivity: moved } },
      },
    };
    expect(differencesBetween([base, other]).map(({ label }) => label)).toEqual(['Permittivity taken at']);
  });

  it('show a declared property, of the board or of one of its materials', () => {
    const declared = [{ id: 'lead-time', value: 9, unit: 'weeks' }];
    const other = { ...full, declared };
    const [found] = differencesBetween([full, other]);
    expect(found?.label).toBe('Declared properties');
    expect(found?.values[1]).toContain('lead-time 9 weeks');
    const { laminate } = full.stackUp;
    const material = { ...laminate.material, declared: [] };
    expect(
      differencesBetween([full, { ...full, stackUp: { ...full.stackUp, laminate: { ...laminate, material } } }]),
    ).toHaveLength(1);
  });

  const paths = leaves(full);
  it('has something to walk', () => {
    expect(paths.length).toBeGreaterThan(80);
  });

  it.each(paths.map((path) => [path.join('.'), path] as const))('show a change of %s', (_, path) => {
    expect(differencesBetween([full, changed(full, path) as Board]).length).toBeGreaterThan(0);
  });
});
