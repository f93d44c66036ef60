import { join } from 'node:path';
import { expect, it } from 'vitest';
import { buildDemo, type Demo } from '../../src/cli/demo.js';
import { noProgress } from '../../src/cli/progress.js';
import { carryOut } from '../../src/cli/study-job.js';
import { inThisThread } from '../../src/cli/workers.js';
import { readTree, temporaryFolder, writeTree } from '../publish/temporary-folder.js';
import { smallPack } from './small-pack.js';

function demoWith(packs: readonly string[]): Demo {
  const folder = temporaryFolder();
  for (const name of packs) {
    const files = smallPack({ covered: true, requirements: ['r-flammability'] });
    files['pack.yaml'] = files['pack.yaml'].replace('id: quillback-small', `id: quillback-${name}`);
    writeTree(join(folder, 'manifests/packs', name), files);
  }
  return { manifests: join(folder, 'manifests'), site: join(folder, 'site'), schemas: join(folder, 'schema') };
}

const build = (demo: Demo) => buildDemo(demo, inThisThread(carryOut), noProgress);

it('builds every pack, and on the next run replaces the site by exactly what the packs make', async () => {
  const demo = demoWith(['left', 'right']);
  const lines = await build(demo);
  expect(lines).toEqual([
    'quillback-left revision A: qs-1 meets, qs-2 meets',
    'quillback-right revision A: qs-1 meets, qs-2 meets',
  ]);
  const first = readTree(demo.site);
  expect(first['index.html']).toMatch(/quillback-left.*quillback-right/s);
  expect(Object.keys(readTree(demo.schemas))).toContain('pack.schema.json');

  writeTree(demo.site, { 'quillback-gone/A/index.html': 'of a pack that is no more' });
  await build(demo);
  expect(readTree(demo.site)).toEqual(first);
  expect(Object.keys(readTree(join(demo.site, '..'))).filter((path) => path.includes('.tmp-'))).toEqual([]);
});

it('leaves the site as it was when a pack is bad, and one that is not ours alone', async () => {
  const demo = demoWith(['left']);
  await build(demo);
  const before = readTree(demo.site);
  writeTree(demo.manifests, { 'packs/left/pack.yaml': 'id: 7' });
  await expect(build(demo)).rejects.toThrow(/packs\/left\/pack\.yaml:1/);
  expect(readTree(demo.site)).toEqual(before);

  const other = demoWith(['left']);
  writeTree(other.site, { 'mine.txt': 'x' });
  await expect(build(other)).rejects.toThrow(/not written by boardcase/);
  expect(readTree(other.site)).toEqual({ 'mine.txt': 'x' });
});
