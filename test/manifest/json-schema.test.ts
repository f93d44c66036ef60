import { readFileSync } from 'node:fs';
import { Ajv2020 } from 'ajv/dist/2020.js';
import { CORE_SCHEMA, load as parse } from 'js-yaml';
import { describe, expect, it } from 'vitest';
import { manifestSchemas, schemaText } from '../../src/manifest/index.js';
import { FIXTURE_FILES, fixtureText } from './fixture.js';

const schemas = manifestSchemas();
const ajv = new Ajv2020({ strict: true, strictTypes: false, strictRequired: false, allErrors: false });
const validators = new Map(Object.entries(schemas).map(([name, schema]) => [name, ajv.compile(schema)]));

const schemaFor = (file: string) =>
  file.startsWith('boards/') ? 'board.schema.json' : `${file.replace('.yaml', '')}.schema.json`;
const accepts = (file: string, text: string) => validators.get(schemaFor(file))!(parse(text, { schema: CORE_SCHEMA }));

const SIZED_FOR =
  'sized_for: { frequency: 76.5 GHz, patches: 6, taper: uniform, least_width: 75 um, least_gap: 100 um, grid: 1 um }';
const NETWORK = 'network: { divider: tee, line_width: 0.15 mm, trunk_length: 3 mm, level_length: 4 mm }';

describe('manifestSchemas', () => {
  it.each(Object.keys(schemas))('%s is committed as it is generated', (name) => {
    const committed = readFileSync(new URL(`../../manifests/schema/${name}`, import.meta.url), 'utf8');
    expect(committed === schemaText(schemas[name]!), `write it again with the command schema`).toBe(true);
  });

  it.each(FIXTURE_FILES)('accepts %s', (file) => {
    expect(accepts(file, fixtureText(file))).toBe(true);
    expect(fixtureText(file)).toMatch(
      new RegExp(
        `^# yaml-language-server: \\$schema=(\\.\\./)+manifests/schema/${schemaFor(file).replaceAll('.', '\\.')}\\n`,
      ),
    );
  });

  it.each([
    ['boards/qs-1.yaml', '  pitch:', '  pich:'],
    ['boards/qs-1.yaml', 'value: 127 um', 'value: 127'],
    ['boards/qs-1.yaml', 'value: 127 um', 'value: 127 GHz'],
    ['boards/qs-1.yaml', 'spread: 8 um', 'spread: -8 um'],
    ['boards/qs-1.yaml', '  pitch: 2.15 mm\n', ''],
    ['boards/qs-1.yaml', 'kind: foil', 'kind: plated'],
    ['boards/qs-1.yaml', 'count: 4,', 'count: 4, width: 1 mm,'],
    ['boards/qs-1.yaml', '  path:\n', '  path:\n    line: { width: 1 mm, length: 1 mm }\n'],
    ['boards/qs-1.yaml', 'reference_impedance: line', 'reference_impedance: 50'],
    ['boards/qs-1.yaml', 'id: qs-1', 'id: QS 1'],
    ['boards/qs-2.yaml', 'based_on: qs-1\n', ''],
    ['boards/qs-2.yaml', 'foil: kf-10', 'foli: kf-10'],
    ['laminates.yaml', 'spread: 0.05, ', ''],
    ['laminates.yaml', 'basis: guaranteed, ', ''],
    ['laminates.yaml', 'value: 3.00', 'value: 300'],
    ['laminates.yaml', 'invented: true', 'invented: yes'],
    [
      'foils.yaml',
      '      Rq: { value: 0.4 um',
      '      Ra: { value: 0.3 um, spread: 0 um, basis: typical }\n      Rq: { value: 0.4 um',
    ],
    ['foils.yaml', '      filter: S-filter', '      measured: { file: a.csv, spread: 0 }\n      filter: S-filter'],
    ['foils.yaml', '      instrument: white', '      Sal_threshold: 0.3\n      instrument: white'],
    [
      'foils.yaml',
      '      instrument: white',
      '      nodules: { radius: { value: 0.2 um, spread: 0 um, basis: typical } }\n      instrument: white',
    ],
    ['foils.yaml', '      instrument: white', '      lay: crosswise\n      instrument: white'],
    [
      'laminates.yaml',
      '    declared:',
      '    water: { uptake: { value: 0.04 %, spread: 0, basis: typical } }\n    declared:',
    ],
    ['finishes.yaml', 'relative_permeability: 1', 'relative_permeability: one'],
    ['pack.yaml', 'status: for_review', 'status: for review'],
    ['pack.yaml', 'date: 2026-11-02', 'date: 2.11.2026'],
    ['pack.yaml', 'revision: A', 'revision: 1'],
    ['pack.yaml', '  frequency_step', '  full_wave: yes\n  frequency_step'],
    ['boards/qs-1.yaml', 'feed:\n', '  direction: backwards\nfeed:\n'],
    ['boards/qs-1.yaml', 'feed:\n', '  dummy_columns: [0]\nfeed:\n'],
    ['boards/qs-1.yaml', 'feed:\n', '  side_feed: { link: 1 }\nfeed:\n'],
    ['boards/qs-1.yaml', 'feed:\n', '  inset: { depth: 0.2 mm }\nfeed:\n'],
    ['boards/qs-1.yaml', 'feed:\n', '  groups: [{ id: tx, columns: [] }]\nfeed:\n'],
    ['boards/qs-1.yaml', 'feed:\n', `  ${SIZED_FOR}\nfeed:\n`],
    ['boards/qs-1.yaml', / {2}patches:.*\n/, ''],
    ['boards/qs-1.yaml', / {2}patches:.*\n/, `  ${SIZED_FOR.replace('uniform', 'triangular')}\n`],
    [
      'boards/qs-1.yaml',
      / {2}patches:.*\n/,
      `  ${SIZED_FOR.replace('uniform', '{ dolph_chebyshev: 25 dB, given: [1, 2] }')}\n`,
    ],
    ['boards/qs-1.yaml', '  path:\n', `  ${NETWORK}\n  path:\n`],
    ['boards/qs-1.yaml', / {2}path:\n.*\n/, ''],
    ['boards/qs-1.yaml', / {2}path:\n.*\n/, `  ${NETWORK.replace('tee', 'tea')}\n`],
    ['requirements.yaml', 'at_most: -12 dB }', 'at_most: -12 dB }\n    between: [tx]'],
    ['requirements.yaml', 'at_least: 13 dBi', 'at_least: 13 dB'],
    ['requirements.yaml', 'at_least: 13 dBi', 'at_least: 13 dBi, at_most: 14 dBi'],
    ['requirements.yaml', '    cut: azimuth\n', ''],
    ['requirements.yaml', '    limit: { at_least: 13 dBi }\n', ''],
    ['requirements.yaml', '    property: flammability\n', ''],
  ])('refuses %s with %j as %j', (file, from, to) => {
    const text = fixtureText(file);
    expect(text).toMatch(from);
    expect(accepts(file, text.replace(from, to))).toBe(false);
  });

  it('accepts all that a texture and a laminate may state', () => {
    const more = (file: string, from: string, to: string) => accepts(file, fixtureText(file).replace(from, to));
    const known = `Sal: { value: 1.2 um, spread: 10 %, basis: measured }
      Sal_threshold: 0.3
      Sdr: { value: 0.2, spread: 0.05, basis: measured }
      Rz: { value: 2.4 um, spread: 0 um, basis: typical }
      lay: isotropic
      nodules: { radius: { value: 0.1 um, spread: 0 um, basis: typical }, per_area: { value: 9 1/um2, spread: 10 %, basis: typical }, layers: 3 }
      instrument: white`;
    expect(more('foils.yaml', 'instrument: white', known)).toBe(true);
    const measured = 'measured: { file: a.x3p, long_nesting_index: 25 um, spread: { minus: 0.1, plus: 20 % } }';
    expect(
      more(
        'foils.yaml',
        'Ra: { value: 0.25 um, spread: 0.05 um, basis: typical, document: KF-DS-10, revision: B, date: 2026-01-19 }',
        measured,
      ),
    ).toBe(true);
    const water = `in_plane_permittivity: { value: 3.2, spread: 0.1, basis: typical }
    water: { uptake: { value: 0.04 %, spread: 50 %, basis: typical }, permittivity_per_share: 8 }
    declared:`;
    expect(more('laminates.yaml', 'declared:', water)).toBe(true);
    expect(more('pack.yaml', '  roughness_model: gradient\n', '')).toBe(true);
    expect(more('pack.yaml', 'gradient', 'band')).toBe(true);
  });

  it('accepts all that an array and a feed may state', () => {
    const board = fixtureText('boards/qs-1.yaml');
    const form = `  direction: alternate
  stagger: 0.4 mm
  dummy_columns: [1, 3]
  matching: [{ width: 0.3 mm, length: 0.6 mm }]
  inset: { depth: 0.2 mm, gap: 0.1 mm }
  termination: { width: 0.15 mm }
  side_feed: { link: 2, side: outward }
  groups: [{ id: tx, columns: [1, 2] }, { id: rx, columns: [3] }]
  scan: { low: -30 deg, high: 30 deg }
feed:
`;
    expect(accepts('boards/qs-1.yaml', board.replace('feed:\n', form))).toBe(true);
    for (const taper of [
      'uniform',
      '{ dolph_chebyshev: 25 dB }',
      '{ taylor: { sidelobe: 25 dB, n_bar: 4 } }',
      '{ given: [1, 2, 1] }',
    ]) {
      const sized = board.replace(/ {2}patches:.*\n {2}links:.*\n/, `  ${SIZED_FOR.replace('uniform', taper)}\n`);
      expect(accepts('boards/qs-1.yaml', sized), taper).toBe(true);
    }
    const transition = NETWORK.replace(' }', ', transition: { file: x.s2p } }');
    expect(accepts('boards/qs-1.yaml', board.replace(/ {2}path:\n.*\n/, `  ${transition}\n`))).toBe(true);
    const isolation = fixtureText('requirements.yaml').replace(
      /quantity: reflection\n.*\n/,
      'quantity: isolation\n    between: [tx, rx]\n    limit: { at_least: 25 dB }\n',
    );
    expect(accepts('requirements.yaml', isolation)).toBe(true);
  });

  it('takes an empty value in a variant only', () => {
    expect(accepts('boards/qs-2.yaml', `${fixtureText('boards/qs-2.yaml').replace(/cost:.*/, 'cost:')}`)).toBe(true);
    expect(accepts('boards/qs-1.yaml', fixtureText('boards/qs-1.yaml').replace(/cost:.*/, 'cost:'))).toBe(false);
  });

  it('describes every field', () => {
    const bare: string[] = [];
    let fields = 0;
    const visit = (node: unknown, path: string) => {
      if (Array.isArray(node)) for (const [i, item] of node.entries()) visit(item, `${path}/${i}`);
      if (node === null || typeof node !== 'object' || Array.isArray(node)) return;
      // Conditions (if, then, else of our own) repeat fields described elsewhere.
      const { properties, if: _if, ...rest } = node as Record<string, unknown>;
      const conditional = 'if' in node && !('properties' in node) && !path.endsWith('board.schema.json');
      if (conditional) return;
      for (const [key, field] of Object.entries((properties ?? {}) as Record<string, { description?: string }>)) {
        fields++;
        if (!field.description) bare.push(`${path}.${key}`);
        visit(field, `${path}.${key}`);
      }
      for (const [key, inner] of Object.entries(rest)) visit(inner, `${path}/${key}`);
    };
    for (const [name, schema] of Object.entries(schemas)) visit(schema, name);
    expect(bare).toEqual([]);
    expect(fields).toBeGreaterThan(200);
  });
});
