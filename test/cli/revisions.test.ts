import { spawnSync } from 'node:child_process';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { expect, it } from 'vitest';
import { buildPack } from '../../src/cli/build.js';
import { noProgress } from '../../src/cli/progress.js';
import { carryOut } from '../../src/cli/study-job.js';
import { inThisThread } from '../../src/cli/workers.js';
import { OutputError } from '../../src/publish/index.js';
import { readTree, temporaryFolder, writeTree } from '../publish/temporary-folder.js';
import { filesOf, smallPack } from './small-pack.js';

const main = fileURLToPath(new URL('../../src/cli/main.ts', import.meta.url));
/** Declared properties only: nothing is computed. */
const wish = { covered: true, requirements: ['r-flammability'] } as const;

function packWith(change: (text: string) => string): Record<string, string> {
  const files = smallPack(wish);
  const text = change(files['pack.yaml']);
  if (text === files['pack.yaml']) throw new Error('nothing was changed');
  return { ...files, 'pack.yaml': text };
}
const released = packWith((text) => text.replace('status: for_review', 'status: released'));
const raised = (previous: string) => (text: string) =>
  `${text.replace('revision: A', 'revision: B')}previous: ${previous}\n`;

function build(folder: string) {
  const args = ['--import', 'tsx', main, 'build', join(folder, 'pack.yaml'), '--out', join(folder, 'out')];
  const { status, stdout, stderr } = spawnSync(process.execPath, args, { encoding: 'utf8' });
  return { status, stdout, stderr };
}

it('a released revision is built once; a second build leaves it as it is, one that would change it ends with 2', () => {
  const folder = temporaryFolder();
  writeTree(folder, released);
  expect(build(folder)).toMatchObject({ status: 0, stderr: '' });
  const before = readTree(join(folder, 'out'));

  const again = build(folder);
  expect(again).toMatchObject({ status: 0, stderr: '' });
  expect(again.stdout).toContain('released and unchanged, left as it is in');
  expect(readTree(join(folder, 'out'))).toEqual(before);

  writeTree(folder, { 'laminates.yaml': released['laminates.yaml'].replace('value: V-0', 'value: V-2') });
  const refused = build(folder);
  expect(refused.status).toBe(2);
  expect(refused.stdout).toBe('');
  expect(refused.stderr).toBe(
    [
      'quillback-small revision A is released and would change: raise the revision. Nothing was written.',
      '  input files: laminates.yaml changed',
      '  figures: data/pack.json; data/board-qs-1.json; data/board-qs-2.json',
      '  verdicts: qs-1 overall meets, now misses; qs-2 overall meets, now misses; ' +
        'qs-1 r-flammability meets, now misses; qs-2 r-flammability meets, now misses',
      '',
    ].join('\n'),
  );
  expect(readTree(join(folder, 'out'))).toEqual(before);
}, 300_000);

it('the next revision begins with what changed since the one before, which stays as it is beside it', () => {
  const folder = temporaryFolder();
  writeTree(folder, released);
  expect(build(folder).status).toBe(0);
  const before = readTree(join(folder, 'out/quillback-small/A'));
  writeTree(folder, {
    ...packWith(raised('{ revision: A }')),
    'laminates.yaml': released['laminates.yaml'].replace('value: V-0', 'value: V-1'),
  });
  expect(build(folder)).toMatchObject({ status: 0, stderr: '' });
  const tree = readTree(join(folder, 'out'));
  expect(readTree(join(folder, 'out/quillback-small/A'))).toEqual(before);
  expect(tree['quillback-small/B/index.html']).toContain('What changed since revision A');
  expect(tree['quillback-small/B/index.html']).toContain('href="pdf/pack.pdf"');
  expect(tree['quillback-small/B/pdf/pack.pdf']).toMatch(/^%PDF-/);
  for (const text of ['Revision A', 'Revision B', '2026-11-02, released', '2026-11-02, for review'])
    expect(tree['index.html']).toContain(text);
}, 300_000);

it('a previous revision that the output folder does not hold ends with 2 and says what to do', () => {
  const folder = temporaryFolder();
  writeTree(folder, packWith(raised('{ revision: A }')));
  const { status, stderr } = build(folder);
  expect(status).toBe(2);
  expect(stderr).toMatch(/revision A as its previous one.*which is not there\. Build that revision first/);
  expect(Object.keys(readTree(folder))).not.toContain('out/index.html');
}, 60_000);

/** A build without a disk, with files of earlier revisions at hand. */
async function inMemory(files: Record<string, string>, earlier: Record<string, Uint8Array> = {}) {
  const made = new Map<string, Uint8Array | string>();
  const outcome = await buildPack(
    { packPath: 'pack.yaml', programVersion: '9.9.9' },
    {
      files: filesOf(files),
      openOutput: () => ({
        publishRevision(_summary, published) {
          for (const [path, content] of published) made.set(path, content);
          return 'written';
        },
        readFile: (packId, revision, path) => earlier[`${packId}/${revision}/${path}`],
        close() {},
      }),
      progress: noProgress,
      workers: inThisThread(carryOut),
    },
  );
  return { outcome, made };
}

it('a build without a disk is compared with data from a file under the root too, and refuses what is no such data', async () => {
  const first = await inMemory(released);
  const data = String(first.made.get('data/pack.json'));
  const pack = packWith(raised('{ data: old/pack.json }'));

  const { outcome, made } = await inMemory({ ...pack, 'old/pack.json': data });
  expect(outcome.kind).toBe('built');
  expect(String(made.get('index.html'))).toContain('What changed since revision A');
  expect(JSON.parse(String(made.get('data/pack.json')))).toMatchObject({
    previous: { revision: 'A', status: 'released' },
  });

  const foreign = data.replace('"id": "quillback-small"', '"id": "another"');
  for (const [text, found] of [
    ['{', 'text that is not JSON'],
    ['{}', 'JSON that is not the data of a pack'],
    [foreign, 'data of the pack another'],
    [data.replace('"revision": "A"', '"revision": "B"'), 'data of revision B, which is this one'],
  ]) {
    const refused = await inMemory({ ...pack, 'old/pack.json': text });
    expect(refused.outcome).toMatchObject({ kind: 'bad input', problems: [{ file: 'old/pack.json', found }] });
    expect(refused.made.size).toBe(0);
  }
});

it('a build without a disk refuses other data in the place of the previous revision', async () => {
  const place = 'quillback-small/A/data/pack.json';
  const pack = packWith(raised('{ revision: A }'));
  await expect(inMemory(pack, { [place]: Buffer.from('{}') })).rejects.toThrow(OutputError);
  await expect(inMemory(pack, { [place]: Buffer.from('{}') })).rejects.toThrow(/JSON that is not the data of a pack/);
});

it('every link of the pages to a file leads to one that the build makes', async () => {
  const { made } = await inMemory(released);
  const links = [...made].flatMap(([path, content]) =>
    path.endsWith('.html')
      ? [...String(content).matchAll(/href="((?:\.\.\/)?(?:pdf|data)\/[^"]+)"/g)].map(([, href]) =>
          href.replace('../', ''),
        )
      : [],
  );
  expect(links).toContain('pdf/pack.pdf');
  for (const link of links) expect([...made.keys()]).toContain(link);
});
