import { spawnSync } from 'node:child_process';
import { readFileSync, statSync } from 'node:fs';
import { createRequire } from 'node:module';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { expect, it } from 'vitest';
import { filesUnder, realDisk } from '../../src/publish/index.js';
import { temporaryFolder } from '../publish/temporary-folder.js';
import { compareTrees } from './compare-trees.js';

const top = fileURLToPath(new URL('../..', import.meta.url));

function run(...args: string[]): void {
  // A date from outside must not change the demo.
  const env = { ...process.env, SOURCE_DATE_EPOCH: '1', TZ: 'Pacific/Auckland', LC_ALL: 'C' };
  const { status, stderr, stdout } = spawnSync(process.execPath, args, { cwd: top, env, encoding: 'utf8' });
  expect(status, `${stdout}\n${stderr}`).toBe(0);
}

it('the committed demo and schemas are what the program makes of the manifests: run `npm run demo` when they differ', async () => {
  const typescript = createRequire(import.meta.url).resolve('typescript/package.json');
  run(join(typescript, '..', 'bin/tsc'), '-p', 'tsconfig.json');
  const folder = temporaryFolder();
  const [site, schemas] = [join(folder, 'site'), join(folder, 'schema')];
  run(join('dist', 'cli', 'demo.js'), '--site', site, '--schemas', schemas);

  // A page with its charts opens at once, also over a slow line.
  const dossiers = filesUnder(realDisk, site).filter((path) => /\/board\/[^/]+\.html$/.test(path));
  expect(dossiers.length).toBeGreaterThan(3);
  for (const path of dossiers) expect(statSync(join(site, path)).size, path).toBeLessThan(600_000);

  const committedOn = readFileSync(join(top, '.nvmrc'), 'utf8').trim().replace(/^v/, '');
  const pdfs = process.versions.node === committedOn ? 'bytes' : 'text';
  expect(await compareTrees(join(top, 'site'), site, pdfs)).toEqual([]);
  expect(await compareTrees(join(top, 'manifests/schema'), schemas, 'bytes')).toEqual([]);
}, 600_000);
