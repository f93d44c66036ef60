import { createHash } from 'node:crypto';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { loadPack, type PackFiles } from '../../src/manifest/index.js';
import { edited, FIXTURE_FILES, files, fixtureText, load, packOf, problemsOf } from './fixture.js';

const pack = packOf(load());
const [first, second] = pack.boards as [(typeof pack.boards)[0], (typeof pack.boards)[0]];

describe('loadPack', () => {
  it('gives the title block as written', () => {
    expect(pack).toMatchObject({
      id: 'quillback-small',
      documentNumber: 'NF-CD-0042',
      revision: 'A',
      date: '2026-11-02',
      status: 'for review',
      authors: ['M. Ellery', 'S. Oduya'],
      analysis: { roughnessModel: 'gradient', frequencyStep: 100e6, fullWave: true },
    });
  });

  it('leaves the full wave to the pack: on, unless it says off', () => {
    const fullWave = (written: string) =>
      packOf(load(edited('pack.yaml', '  frequency_step', `  full_wave: ${written}\n  frequency_step`))).analysis
        .fullWave;
    expect([fullWave('on'), fullWave('off')]).toEqual([true, false]);
  });

  it('gives SI numbers and says where each figure stands', () => {
    expect(first.stackUp.laminate.thickness).toEqual({
      value: 127e-6,
      minus: 8e-6,
      plus: 8e-6,
      provenance: {
        basis: 'guaranteed',
        method: 'cross-section, mean planes',
        document: 'NF-DS-30',
        revision: 'C',
        date: '2026-03-02',
      },
      path: 'boards/qs-1.yaml: stack_up.laminate.thickness',
    });
    expect(first.stackUp.laminate.material.permittivity).toMatchObject({
      value: 3,
      minus: 0.05,
      plus: 0.05,
      provenance: { frequency: 10e9, direction: 'through-thickness' },
      path: 'laminates.yaml: nl-30.permittivity',
    });
    expect(first.stackUp.laminate.material.lossTangent).toMatchObject({ value: 0.0015, minus: 0.0002, plus: 0.0004 });
    expect(first.stackUp.laminate.material.permittivityTemperatureCoefficient?.value).toBe(-40e-6);
    expect(first.temperature).toEqual({ lowC: -40, nominalC: 23, highC: 105 });
    expect(first.band).toEqual({ low: 76.1e9, high: 76.9e9 });
    expect(
      second.stackUp.strip.finish.layers.map((l) => [l.material, l.conductivity.value, l.thickness.value]),
    ).toEqual([
      ['Ni-P', 1.7e6, 4e-6],
      ['Au', 41e6, 0.05e-6],
    ]);
  });

  it('lays out columns about y = 0 and mirrors the short form', () => {
    expect(first.columns.map((c) => c.y)).toEqual([-2.15e-3, 0, 2.15e-3]);
    expect(first.columns[0]!.patches.map((p) => p.width)).toEqual([0.7e-3, 1e-3, 1e-3, 0.7e-3]);
    expect(first.columns[0]!.links).toHaveLength(3);
    expect(first.columns.map((c) => c.x)).toEqual([0, 0, 0]);
  });

  it('mirrors an odd count about its middle', () => {
    const odd = packOf(
      load(
        edited(
          'boards/qs-1.yaml',
          'count: 4, length: 1.06 mm, widths: [0.70 mm, 1.00 mm]',
          'count: 5, length: 1.06 mm, widths: [0.5 mm, 0.7 mm, 1 mm]',
        ),
      ),
    );
    expect(odd.boards[0]!.columns[0]!.patches.map((p) => p.width)).toEqual([0.5e-3, 0.7e-3, 1e-3, 0.7e-3, 0.5e-3]);
    expect(odd.boards[0]!.columns[0]!.links).toHaveLength(4);
  });

  it('takes explicit patches, links, offsets and paths per column', () => {
    const { boards } = packOf(
      load({
        'boards/qs-1.yaml': fixtureText('boards/qs-1.yaml')
          .replace(/patches: .*/, 'patches: [{ width: 1 mm, length: 1.06 mm }, { width: 0.8 mm, length: 1.07 mm }]')
          .replace(/links: .*/, 'links: [{ width: 0.15 mm, length: 1.2 mm }]\n  offset_x: [0 mm, 0.5 mm, 0 mm]')
          .replace(
            /path:\n.*\n/,
            'path:\n    - line: { width: 0.15 mm, length: 9 mm }\n    - loss: { value: 1 dB, spread: 20 %, basis: measured }\n    - line: { width: 0.15 mm, length: 9 mm }\n',
          ),
      }),
    );
    const [board] = boards;
    expect(board!.columns[1]).toEqual({
      y: 0,
      x: 0.5e-3,
      feedLine: { width: 0.15e-3, length: 2e-3 },
      patches: [
        { width: 1e-3, length: 1.06e-3 },
        { width: 0.8e-3, length: 1.07e-3 },
      ],
      links: [{ width: 0.15e-3, length: 1.2e-3 }],
    });
    expect(board!.feed[0]).toEqual({ amplitude: 0.7, phase: 0, line: { width: 0.15e-3, length: 9e-3 } });
    expect(board!.feed[1]!.lossDb).toMatchObject({
      value: 1,
      minus: 0.2,
      plus: 0.2,
      path: 'boards/qs-1.yaml: feed.path[1].loss',
    });
  });

  it('a single patch needs no links', () => {
    const single = packOf(
      load({
        'boards/qs-1.yaml': fixtureText('boards/qs-1.yaml')
          .replace(/patches: .*/, 'patches: { count: 1, width: 1 mm, length: 1.06 mm }')
          .replace(/ {2}links: .*\n/, ''),
      }),
    );
    expect(single.boards[0]!.columns[0]!.links).toEqual([]);
  });

  it('converts Ra by the normal distribution and says so', () => {
    // E|z| of a normal distribution is sigma·sqrt(2/π): Ra = 0.7979 Rq. The ratio 1.2533 is printed to five digits.
    const { rq, stated, conversion } = second.stackUp.strip.outerFace.texture;
    expect(stated).toEqual({ parameter: 'Ra', value: 0.25e-6 });
    expect(rq.value / 0.25e-6).toBeCloseTo(1.2533, 4);
    // Up to √2 for heights that fall off exponentially, down to π/(2√2) for a sine.
    expect(rq.plus).toBeCloseTo(0.05e-6 * 1.25331 + 0.25e-6 * (Math.SQRT2 - 1.25331), 11);
    expect(rq.minus).toBeCloseTo(0.05e-6 * 1.25331 + 0.25e-6 * (1.25331 - 1.11072), 11);
    expect(conversion).toMatch(/1\.2533 times the stated Ra/);
    expect(first.stackUp.strip.outerFace.texture.conversion).toBeUndefined();
  });

  it('converts Rz with a widened spread', () => {
    const changed = packOf(
      load(edited('foils.yaml', 'Rq: { value: 1.0 um, spread: 0.15 um', 'Rz: { value: 5.5 um, spread: 0.55 um')),
    );
    const { rq, conversion } = changed.boards[1]!.stackUp.ground.dielectricFace.texture;
    expect(rq.value).toBeCloseTo(1e-6, 12);
    expect(rq.minus).toBeCloseTo(0.1e-6 + 0.25e-6, 12);
    expect(conversion).toMatch(/divided by 5\.5, an assumption .*; 25 %/);
  });

  it('gives the outer face of a foil the texture of its other side', () => {
    expect(first.stackUp.strip.dielectricFace.texture.rq.path).toBe('foils.yaml: kf-04.treated_face.Rq');
    expect(first.stackUp.strip.outerFace.texture.rq.path).toBe('foils.yaml: kf-04.untreated_face.Rq');
    const reversed = packOf(load(edited('boards/qs-1.yaml', 'dielectric_face: treated', 'dielectric_face: untreated')));
    expect(reversed.boards[0]!.stackUp.strip.dielectricFace.texture.rq.path).toContain('untreated_face');
    expect(reversed.boards[0]!.stackUp.strip.outerFace.texture.rq.path).toBe('foils.yaml: kf-04.treated_face.Rq');
  });

  it('gives a plated outer face its own texture', () => {
    const plated = packOf(
      load(
        edited(
          'boards/qs-1.yaml',
          'outer_face: { kind: foil }',
          'outer_face: { kind: micro_etched, texture: { Sq: { value: 0.6 um, spread: 0.1 um, basis: measured } } }',
        ),
      ),
    );
    expect(plated.boards[0]!.stackUp.strip.outerFace).toMatchObject({
      kind: 'micro-etched',
      texture: {
        rq: { value: 0.6e-6, path: 'boards/qs-1.yaml: stack_up.strip.outer_face.texture.Sq' },
        stated: { parameter: 'Sq' },
      },
    });
  });

  it('keeps a design value with its foil and thickness', () => {
    const design = packOf(
      load(edited('laminates.yaml', 'kind: bulk', 'kind: design, fitted_on: { foil: kf-10, thickness: 5 mil }')),
    );
    expect(design.boards[0]!.stackUp.laminate.material).toMatchObject({
      permittivityKind: 'design',
      fittedOn: { foil: 'kf-10' },
    });
    expect(design.boards[0]!.stackUp.laminate.material.fittedOn!.thickness).toBeCloseTo(127e-6, 12);
  });

  it('gives in-plane permittivity and water of a laminate, and neither where nothing is stated', () => {
    const stated = `in_plane_permittivity: { value: 3.2, spread: 0.1, basis: typical, direction: in_plane }
    water: { uptake: { value: 0.04 %, spread: 50 %, basis: typical }, permittivity_per_share: 8, loss_tangent_per_share: 1 }
    declared:`;
    const laminate = (changes = {}) => packOf(load(changes)).boards[0]!.stackUp.laminate.material;
    expect(laminate(edited('laminates.yaml', 'declared:', stated))).toMatchObject({
      inPlanePermittivity: { value: 3.2, plus: 0.1, path: 'laminates.yaml: nl-30.in_plane_permittivity' },
      water: {
        uptake: { value: 0.0004, minus: 0.0002, path: 'laminates.yaml: nl-30.water.uptake' },
        permittivityPerShare: 8,
        lossTangentPerShare: 1,
      },
    });
    expect(laminate()).not.toHaveProperty('water');
    expect(laminate()).not.toHaveProperty('inPlanePermittivity');
  });

  it('takes the middle of the band where no roughness model is named', () => {
    const without = packOf(load(edited('pack.yaml', '  roughness_model: gradient\n', '')));
    expect(without.analysis.roughnessModel).toBe('band');
    expect(packOf(load(edited('pack.yaml', 'gradient', 'band'))).analysis.roughnessModel).toBe('band');
  });

  it('gives limits in the unit of their quantity', () => {
    const limits = Object.fromEntries(pack.requirements.requirements.map((r) => [r.id, r.limit]));
    expect(limits['r-gain']).toEqual({ direction: 'at_least', value: 13 });
    expect(limits['r-match']).toEqual({ direction: 'at_most', value: -12 });
    expect(limits['r-beamwidth']).toEqual({ direction: 'at_most', value: 30 });
    expect(limits['r-line-loss']).toEqual({ direction: 'at_most', value: 0.9 });
    expect(limits['r-azimuth-mask']).toBeUndefined();
    const lead = pack.requirements.requirements.find((r) => r.id === 'r-lead-time');
    expect(lead).toMatchObject({ limit: { direction: 'at_most', value: 12 }, unit: 'weeks', property: 'lead-time' });
  });

  it('reads the same limit from another unit', () => {
    const other = packOf(load(edited('requirements.yaml', 'at_most: 0.9 dB/cm', 'at_most: 0.09 dB/mm')));
    expect(other.requirements.requirements.find((r) => r.id === 'r-line-loss')?.limit?.value).toBe(0.9);
  });

  it('masks are in rad and dB', () => {
    const mask = pack.requirements.requirements.find((r) => r.id === 'r-azimuth-mask')!.mask!;
    expect(mask[1]!.from).toBeCloseTo((50 * Math.PI) / 180, 14);
    expect(mask[1]!.levelDb).toBe(-8);
  });

  it('takes a board outside the range of any model: that is a flag, not a fault', () => {
    const low = packOf(
      load(edited('boards/qs-1.yaml', 'low: 76.1 GHz, high: 76.9 GHz', 'low: 2.4 GHz, high: 2.5 GHz')),
    );
    expect(low.boards[0]!.band.low).toBe(2.4e9);
  });

  it('names an unknown material also where another key of the board is at fault', () => {
    const text = fixtureText('boards/qs-1.yaml').replace('foil: kf-04', 'foil: kf-4').replace('pitch:', 'pich:');
    const result = load({ 'boards/qs-1.yaml': text });
    const found = 'problems' in result ? result.problems.map((problem) => problem.found) : [];
    expect(found).toContain('the unknown foil "kf-4"');
    expect(found).toContain('the unknown key "pich"');
  });

  it('hashes every file that it read, sorted by path', () => {
    expect(pack.inputs.map((i) => i.path)).toEqual([...FIXTURE_FILES].sort());
    for (const { path, sha256 } of pack.inputs) {
      expect(sha256).toBe(createHash('sha256').update(fixtureText(path)).digest('hex'));
    }
  });

  it('reads shared libraries from under a wider root', () => {
    const nested: PackFiles = {
      read: (path) => {
        const match = /^(?:packs\/small\/(pack\.yaml|requirements\.yaml|boards\/.*)|shared\/(.*))$/.exec(path);
        if (!match) return undefined;
        const text = fixtureText(match[1] ?? match[2]!);
        return new TextEncoder().encode(text.replace(/: \[(\w+\.yaml)\]/g, ': [../../shared/$1]'));
      },
    };
    const wide = packOf(loadPack(nested, 'packs/small/pack.yaml'));
    expect(wide.boards[0]!.file).toBe('packs/small/boards/qs-1.yaml');
    expect(wide.boards[0]!.stackUp.laminate.material.permittivity.path).toBe(
      'shared/laminates.yaml: nl-30.permittivity',
    );
  });

  it('passes on why a file was refused', () => {
    const inner = files();
    const refusing: PackFiles = { read: (p) => (p === 'foils.yaml' ? { refused: 'it is a folder' } : inner.read(p)) };
    expect(problemsOf(loadPack(refusing, 'pack.yaml'))).toMatchObject([
      { file: 'pack.yaml', path: 'libraries.foils[0]', allowed: 'a file that may be read; it is a folder' },
    ]);
  });

  it('reads the same pack twice to the same model', () => {
    expect(JSON.stringify(packOf(load()))).toBe(JSON.stringify(pack));
  });

  it('answers any mangled manifest with a pack or problems, never with an exception', () => {
    const scrap = fc.constantFrom(
      '',
      '~',
      '[]',
      '{}',
      '1',
      '-1',
      '.inf',
      'true',
      '"x"',
      '\n',
      ': ',
      '*a',
      '&a ',
      '- ',
      '"\\u0000"',
      '__proto__: 1',
    );
    const cut = fc.tuple(
      fc.constantFrom(...FIXTURE_FILES),
      fc.double({ min: 0, max: 1, noNaN: true }),
      fc.integer({ min: 0, max: 30 }),
      scrap,
    );
    fc.assert(
      fc.property(cut, ([file, at, length, insert]) => {
        const text = fixtureText(file);
        const start = Math.floor(at * text.length);
        const result = load({ [file]: text.slice(0, start) + insert + text.slice(start + length) });
        if ('problems' in result) expect(result.problems.length).toBeGreaterThan(0);
        else expect(result.pack.boards.length).toBeGreaterThan(0);
      }),
      { seed: 17, numRuns: 100 },
    );
  });
});
