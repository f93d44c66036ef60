import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { dirname, join, posix, relative } from 'node:path';
import { fileURLToPath } from 'node:url';
import { Ajv2020 } from 'ajv/dist/2020.js';
import { CORE_SCHEMA, load as parse } from 'js-yaml';
import { describe, expect, it } from 'vitest';
import { formatProblem, loadPack, manifestSchemas } from '../../src/manifest/index.js';

const root = fileURLToPath(new URL('../../manifests/', import.meta.url));
const manifests = readdirSync(root, { recursive: true, encoding: 'utf8' })
  .map((path) => path.replaceAll('\\', '/'))
  .filter((path) => path.endsWith('.yaml'))
  .sort();
const ajv = new Ajv2020({ strict: true, strictTypes: false, strictRequired: false });
const validators = new Map(Object.entries(manifestSchemas()).map(([name, schema]) => [name, ajv.compile(schema)]));

describe('the manifests of this repository', () => {
  it.each(manifests)('%s names its schema for editors and fits it', (path) => {
    const text = readFileSync(join(root, path), 'utf8');
    const schema = /^# yaml-language-server: \$schema=(\S+)\n/.exec(text)?.[1] ?? 'no modeline';
    const target = join(root, dirname(path), schema);
    expect(existsSync(target), schema).toBe(true);
    const validate = validators.get(relative(join(root, 'schema'), target).replaceAll('\\', '/'))!;
    validate(parse(text, { schema: CORE_SCHEMA }));
    expect(validate.errors).toBeNull();
  });

  it.each(manifests.filter((path) => posix.basename(path) === 'pack.yaml'))('%s loads without a problem', (path) => {
    const read = (file: string) => (existsSync(join(root, file)) ? readFileSync(join(root, file)) : undefined);
    const result = loadPack({ read }, path);
    expect('problems' in result ? result.problems.map(formatProblem) : []).toEqual([]);
  });

  it('compare boards that differ only in what Rq and a permittivity cannot see', () => {
    const read = (file: string) => (existsSync(join(root, file)) ? readFileSync(join(root, file)) : undefined);
    const result = loadPack({ read }, 'packs/side-radar/pack.yaml');
    if ('problems' in result) throw new Error(result.problems.map(formatProblem).join('\n'));
    const board = (id: string) => result.pack.boards.find((b) => b.id === id)!;
    const [gentle, nodular] = [board('side-2'), board('side-6')];
    expect(nodular.overrides).toEqual(['stack_up.strip.foil', 'stack_up.ground.foil', 'cost.amount']);
    const [a, b] = [gentle, nodular].map(({ stackUp }) => stackUp.strip.dielectricFace.texture);
    expect(b!.rq.value).toBe(a!.rq.value);
    expect(a!.developedAreaRatio).toBeDefined();
    expect(b!.nodule).toBeDefined();
    const [bulk, design] = [board('side-1'), board('side-7')].map(({ stackUp }) => stackUp.laminate.material);
    expect(design!.permittivity).toMatchObject({ value: bulk!.permittivity.value, plus: bulk!.permittivity.plus });
    expect([bulk!.permittivityKind, design!.permittivityKind]).toEqual(['bulk', 'design']);
    expect(board('side-1').stackUp.ground.dielectricFace.texture.measured).toMatchObject({ kind: 'profile' });
  });

  it('include a pack', () => {
    expect(manifests.some((path) => posix.basename(path) === 'pack.yaml')).toBe(true);
  });
});
