import { spawnSync } from 'node:child_process';
import { symlinkSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { describe, expect, it } from 'vitest';
import { exitCodes } from '../../src/cli/exit-codes.js';
import { realDisk } from '../../src/publish/index.js';
import { readTree, temporaryFolder, writeTree } from '../publish/temporary-folder.js';
import { smallPack, type Wish } from './small-pack.js';

const main = fileURLToPath(new URL('../../src/cli/main.ts', import.meta.url));

/** Runs the real program. The codes are written out here: they are what scripts of users rely on. */
function boardcase(args: readonly string[], env: Record<string, string> = {}) {
  const { status, stdout, stderr } = spawnSync(process.execPath, ['--import', 'tsx', main, ...args], {
    encoding: 'utf8',
    env: { ...process.env, ...env },
  });
  return { status, stdout, stderr };
}

function folderWith(wish: Wish, changed: Record<string, (text: string) => string> = {}): string {
  const folder = temporaryFolder();
  const files = smallPack(wish);
  for (const [path, change] of Object.entries(changed)) files[path] = change(files[path]);
  writeTree(folder, files);
  return folder;
}

const declaredOnly: Wish = { covered: true, requirements: ['r-flammability'] };

describe('boardcase build', () => {
  it('ends with 0, says what was built and where, and is quiet otherwise', () => {
    const folder = folderWith({ covered: true });
    const { status, stdout, stderr } = boardcase(['build', join(folder, 'pack.yaml'), '--out', join(folder, 'out')]);
    expect(stderr).toBe('');
    expect(stdout).toBe(
      `quillback-small revision A, 2 boards: qs-1 incomplete, qs-2 incomplete; written to ${join(folder, 'out/quillback-small/A')}\n`,
    );
    expect(status).toBe(0);
    expect(Object.keys(readTree(join(folder, 'out')))).toContain('quillback-small/A/board/qs-1.html');
  });

  it('under --gate ends with 0 where every binding requirement meets', () => {
    const folder = folderWith(declaredOnly);
    const { status, stdout } = boardcase(['build', join(folder, 'pack.yaml'), '--gate', '--out', join(folder, 'out')]);
    expect(stdout).toContain('qs-1 meets, qs-2 meets');
    expect(status).toBe(0);
  });

  it('under --gate ends with 1 where one does not, says why, and has written everything all the same', () => {
    const folder = folderWith({ covered: true, requirements: ['r-flammability', 'r-gain'] });
    const { status, stderr, stdout } = boardcase([
      'build',
      join(folder, 'pack.yaml'),
      '--gate',
      '--out',
      join(folder, 'out'),
    ]);
    expect(status).toBe(1);
    expect(stderr).toMatch(/qs-1 incomplete: .*r-gain/);
    expect(stdout).toContain('written to');
    expect(Object.keys(readTree(join(folder, 'out')))).toContain('quillback-small/A/index.html');
  });

  it('ends with 2 on bad input, prints every problem, and leaves the last good output as it was', () => {
    const folder = folderWith(declaredOnly);
    const args = ['build', join(folder, 'pack.yaml'), '--out', join(folder, 'out')];
    expect(boardcase(args).status).toBe(0);
    const before = readTree(join(folder, 'out'));
    writeTree(folder, {
      'pack.yaml': smallPack(declaredOnly)['pack.yaml'].replace('owner:', 'ovner:'),
      'boards/qs-2.yaml': smallPack(declaredOnly)['boards/qs-2.yaml'].replace('foil: kf-10', 'foil: kf-99'),
    });
    const { status, stdout, stderr } = boardcase(args);
    expect(status).toBe(2);
    expect(stderr).toMatch(/pack\.yaml:\d+:\d+/);
    expect(stderr).toMatch(/boards\/qs-2\.yaml:\d+:\d+[^\n]*\n[^\n]*kf-99/);
    expect(stdout).toMatch(/^\d+ problems found; nothing was written\n$/);
    expect(readTree(join(folder, 'out'))).toEqual(before);
  });

  it('ends with 2 and touches nothing where the output folder is not ours', () => {
    const folder = folderWith(declaredOnly);
    writeTree(folder, { 'home/thesis.txt': 'years of work' });
    const { status, stderr } = boardcase(['build', join(folder, 'pack.yaml'), '--out', join(folder, 'home')]);
    expect(status).toBe(2);
    expect(stderr).toMatch(/not written by boardcase/);
    expect(readTree(join(folder, 'home'))).toEqual({ 'thesis.txt': 'years of work' });
  });

  it('ends with 2 on a SOURCE_DATE_EPOCH that is no number of seconds', () => {
    const folder = folderWith(declaredOnly);
    const args = ['build', join(folder, 'pack.yaml'), '--out', join(folder, 'out')];
    const { status, stderr } = boardcase(args, { SOURCE_DATE_EPOCH: 'today' });
    expect(status).toBe(2);
    expect(stderr).toMatch(/SOURCE_DATE_EPOCH is "today"/);
    expect(realDisk.exists(join(folder, 'out'))).toBe(false);
  });
});

describe('boardcase validate', () => {
  it('ends with 0 on a good pack, also with a root above it', () => {
    const folder = folderWith({ covered: false });
    const { status, stdout } = boardcase(['validate', join(folder, 'pack.yaml'), '--root', join(folder, '..')]);
    expect(stdout).toBe('quillback-small: 1 board, 7 requirements, 6 files: no problem found\n');
    expect(status).toBe(0);
  });

  it('prints all problems of all files at once', () => {
    const folder = folderWith(
      { covered: false },
      {
        'pack.yaml': (text) => text.replace('status: for_review', 'status: perhaps'),
        'foils.yaml': (text) => text.replace(/conductivity: [^\n]*/, 'conductivity: 58'),
        'requirements.yaml': (text) => text.replace('at_least: 13 dBi', 'at_least: 13 GHz'),
      },
    );
    const { status, stderr } = boardcase(['validate', join(folder, 'pack.yaml')]);
    expect(status).toBe(2);
    for (const file of ['pack.yaml', 'foils.yaml', 'requirements.yaml'])
      expect(stderr).toMatch(new RegExp(`^${file}:\\d+:\\d+`, 'm'));
  });

  it('reads nothing outside the root, not even through a link', () => {
    const folder = folderWith(
      { covered: false },
      { 'pack.yaml': (text) => text.replace('[foils.yaml]', '[link.yaml]') },
    );
    const outside = temporaryFolder();
    writeTree(outside, { 'foils.yaml': smallPack({ covered: false })['foils.yaml'] });
    symlinkSync(join(outside, 'foils.yaml'), join(folder, 'link.yaml'));
    const { status, stderr } = boardcase(['validate', join(folder, 'pack.yaml')]);
    expect(status).toBe(2);
    expect(stderr).toMatch(/link leads out of the root/);
  });
});

describe('boardcase', () => {
  it('lists commands and exit codes on --help', () => {
    const { status, stdout } = boardcase(['--help']);
    expect(status).toBe(0);
    for (const word of ['build', 'validate', 'schema']) expect(stdout).toContain(word);
    for (const code of Object.values(exitCodes)) expect(stdout).toMatch(new RegExp(`^ +${code} +\\w`, 'm'));
  });

  it('prints its version, and the schemas as JSON', () => {
    expect(boardcase(['--version']).stdout).toMatch(/^\d+\.\d+\.\d+\n$/);
    const { status, stdout } = boardcase(['schema']);
    expect(status).toBe(0);
    expect(Object.keys(JSON.parse(stdout))).toContain('pack.schema.json');
  });

  it('writes the schemas as files', () => {
    const folder = temporaryFolder();
    expect(boardcase(['schema', '--out', join(folder, 'schema')]).status).toBe(0);
    const texts = Object.values(readTree(join(folder, 'schema')));
    expect(texts.length).toBeGreaterThanOrEqual(6);
    for (const text of texts) expect(JSON.parse(text)).toHaveProperty('$schema');
  });

  it.each([
    [[], /Usage/],
    [['bild', 'pack.yaml'], /unknown command.*\n.*build/],
    [['build'], /missing required argument/],
    [['build', 'pack.yaml', '--gait'], /unknown option.*\n.*--gate/],
    [['validate', 'no-such-folder/pack.yaml'], /root folder .*no-such-folder is not there/],
    [['validate', 'package.json', '--root', 'src'], /does not lie under the root folder/],
  ])('ends with 2 on the wrong words %j and says which', (args, message) => {
    const { status, stderr } = boardcase(args);
    expect(status).toBe(2);
    expect(stderr).toMatch(message);
  });
});
