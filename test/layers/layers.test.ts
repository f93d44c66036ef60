import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { expect, it } from 'vitest';
import { temporaryFolder } from '../publish/temporary-folder.js';
import { checkLayers } from './layers.js';

const fixture = (name: string) => fileURLToPath(new URL(`./fixtures/${name}`, import.meta.url));

it('a tree that keeps the layers passes, and was looked at', async () => {
  expect(await checkLayers(fixture('good'))).toEqual({ modules: 2, dependencies: 1, violations: [] });
});

it('every planted violation is found, and nothing else', async () => {
  const { violations } = await checkLayers(fixture('bad'));
  expect(violations).toEqual([
    'calculating layers have no effects: src/physics/reads-a-file.ts → fs',
    'calculating layers have no effects: src/study/starts-a-process.ts → child_process',
    'every import is found: src/dossier/broken.ts → ./not-there.js',
    'every module belongs to a layer: src/attic/forgotten.ts',
    'no cycles: src/verdict/egg.ts → src/verdict/hen.ts → src/verdict/egg.ts',
    'physics and what it stands on import nothing of the machine: src/physics/reads-a-file.ts → fs',
    'physics imports only the layers before it: src/physics/knows-a-manifest.ts → src/manifest/board.ts',
    expect.stringMatching(/^the program needs no development package: src\/cli\/uses-a-test-tool.ts → .*vitest/),
  ]);
});

it('an empty tree is seen to be empty', async () => {
  const folder = temporaryFolder();
  mkdirSync(join(folder, 'src'));
  expect(await checkLayers(folder)).toEqual({ modules: 0, dependencies: 0, violations: [] });
});
