import { mkdirSync, symlinkSync, truncateSync } from 'node:fs';
import { join } from 'node:path';
import { beforeEach, describe, expect, it } from 'vitest';
import { packFilesUnder } from '../../src/publish/index.js';
import { temporaryFolder, writeTree } from './temporary-folder.js';

describe('reading the files of a pack', () => {
  let root: string;
  beforeEach(() => {
    const folder = temporaryFolder();
    root = join(folder, 'root');
    writeTree(folder, {
      'secret.yaml': 'secret',
      'root/pack.yaml': 'pack',
      'root/lib/foils.yaml': 'foils',
      'root-two/x.yaml': 'x',
    });
  });

  const text = (path: string) => {
    const found = packFilesUnder(root).read(path);
    return found instanceof Uint8Array ? Buffer.from(found).toString() : found;
  };

  it('reads a file under the root, also by a way round inside it', () => {
    expect(text('pack.yaml')).toBe('pack');
    expect(text('lib/../lib/foils.yaml')).toBe('foils');
  });

  it('has nothing where there is no file', () => {
    expect(text('missing.yaml')).toBeUndefined();
    expect(text('pack.yaml/below-a-file')).toBeUndefined();
  });

  it.each([
    ['../secret.yaml', /leaves the root/],
    ['lib/../../secret.yaml', /leaves the root/],
    ['../root-two/x.yaml', /leaves the root/],
    ['/etc/hostname', /relative/],
    ['C:/x.yaml', /relative/],
    ['lib', /folder/],
    ['pack.yaml\0.png', /zero byte/],
  ])('refuses %j', (path, reason) => {
    expect(text(path)).toEqual({ refused: expect.stringMatching(reason) });
  });

  it('refuses a symbolic link to a file or folder outside, follows one that stays inside', () => {
    symlinkSync(join(root, '..', 'secret.yaml'), join(root, 'link.yaml'));
    symlinkSync(join(root, '..', 'root-two'), join(root, 'two'));
    symlinkSync(join('lib', 'foils.yaml'), join(root, 'inside.yaml'));
    symlinkSync('nowhere.yaml', join(root, 'dangling.yaml'));
    expect(text('link.yaml')).toEqual({ refused: expect.stringMatching(/link leads out/) });
    expect(text('two/x.yaml')).toEqual({ refused: expect.stringMatching(/link leads out/) });
    expect(text('inside.yaml')).toBe('foils');
    expect(text('dangling.yaml')).toEqual({ refused: expect.stringMatching(/nowhere/) });
  });

  it('reads a file as large as measured heights may be, and none that is larger', () => {
    const sized = (bytes: number) => {
      truncateSync(join(root, 'pack.yaml'), bytes);
      return packFilesUnder(root).read('pack.yaml');
    };
    expect(sized(17 * 1024 * 1024)).toHaveLength(17 * 1024 * 1024);
    expect(sized(64 * 1024 * 1024 + 1)).toEqual({ refused: expect.stringMatching(/larger than 64 MiB/) });
  });

  it('reads under a root that is itself reached through a link', () => {
    const folder = temporaryFolder();
    mkdirSync(join(folder, 'a'));
    writeTree(folder, { 'a/pack.yaml': 'via link' });
    symlinkSync(join(folder, 'a'), join(folder, 'b'));
    expect(packFilesUnder(join(folder, 'b')).read('pack.yaml')).toEqual(Buffer.from('via link'));
  });
});
