import { join } from 'node:path';
import { expect, it, vi } from 'vitest';
import { runCommandLine } from '../../src/cli/program.js';
import { realDisk } from '../../src/publish/index.js';
import { temporaryFolder, writeTree } from '../publish/temporary-folder.js';
import { smallPack } from './small-pack.js';

vi.mock('../../src/verdict/index.js', async (original) => ({
  ...(await original<object>()),
  judgePack: () => {
    throw new TypeError('a planted error');
  },
}));

it('a fault of the program says so, asks for the hash of the pack, exits with 3 and writes nothing', async () => {
  const folder = temporaryFolder();
  writeTree(folder, smallPack({ covered: true }));
  const [outs, errors]: string[][] = [[], []];
  const io = { out: (text: string) => outs.push(text), err: (text: string) => errors.push(text), env: {} };
  const code = await runCommandLine(['build', join(folder, 'pack.yaml'), '--out', join(folder, 'out')], io);
  expect(code).toBe(3);
  expect(outs).toEqual([]);
  const text = errors.join('\n');
  expect(text).toMatch(/^A fault in boardcase, not in your files, while judging the boards/);
  expect(text).toMatch(/report it/);
  expect(text).toMatch(/pack's hash [0-9a-f]{64}\n/);
  expect(text).toContain('a planted error');
  expect(realDisk.exists(join(folder, 'out'))).toBe(false);
});
