import { spawnSync } from 'node:child_process';
import { hostname } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { expect, it } from 'vitest';
import { openOutput, realDisk } from '../../src/publish/index.js';
import { plainIndex, summaryOf } from './summaries.js';
import { readTree, temporaryFolder, writeTree } from './temporary-folder.js';

const victim = fileURLToPath(new URL('./fixtures/killed-while-publishing.ts', import.meta.url));

function publishedOnce(): string {
  const out = join(temporaryFolder(), 'out');
  const output = openOutput(out, realDisk);
  output.publishRevision(summaryOf('p', 'A', { title: 'old' }), new Map([['overview.html', 'old']]), plainIndex);
  output.close();
  return out;
}

// write 2 is in the middle of the new files; rename 1 has moved the old revision away and nothing is in its place.
it.each([
  ['write', 2],
  ['rename', 1],
  ['rename', 2],
])('a process killed by the system after %s %i leaves a folder that the next build opens, whole', (call, count) => {
  const out = publishedOnce();
  const { signal } = spawnSync(process.execPath, ['--import', 'tsx', victim, out, call, String(count)], {
    encoding: 'utf8',
  });
  expect(signal).toBe('SIGKILL');
  expect(readTree(out)['.boardcase.tmp-lock']).toMatch(/^\d+ /);
  openOutput(out, realDisk).close();
  const tree = readTree(out);
  expect(Object.keys(tree).filter((path) => path.includes('.tmp-'))).toEqual([]);
  const expected = call === 'rename' && count === 2 ? 'new' : 'old';
  expect(tree['p/A/overview.html']).toBe(expected);
  expect(JSON.parse(tree['p/A/revision.json']).title).toBe(expected);
});

it('a lock whose process is gone is taken over', () => {
  const out = publishedOnce();
  const gone = spawnSync(process.execPath, ['-e', '']).pid;
  writeTree(out, { '.boardcase.tmp-lock': `${gone} ${hostname()} x\n` });
  openOutput(out, realDisk).close();
  expect(Object.keys(readTree(out))).not.toContain('.boardcase.tmp-lock');
});
