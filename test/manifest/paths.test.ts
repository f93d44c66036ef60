import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { resolveReference } from '../../src/manifest/index.js';

describe('resolveReference', () => {
  it.each([
    ['pack.yaml', 'boards/a.yaml', 'boards/a.yaml'],
    ['packs/side/pack.yaml', '../../libraries/foils.yaml', 'libraries/foils.yaml'],
    ['packs/side/pack.yaml', './boards/./a.yaml', 'packs/side/boards/a.yaml'],
    ['packs/side/pack.yaml', 'boards//a.yaml', 'packs/side/boards/a.yaml'],
    ['a/b.yaml', 'c/../d.yaml', 'a/d.yaml'],
    ['', 'pack.yaml', 'pack.yaml'],
    ['pack.yaml', '..a/b.yaml', '..a/b.yaml'],
    ['pack.yaml', 'Über maß.yaml', 'Über maß.yaml'],
  ])('from %s to %s is %s', (from, reference, path) => {
    expect(resolveReference(from, reference)).toEqual({ path });
  });

  it.each([
    ['pack.yaml', '../pack.yaml'],
    ['packs/side/pack.yaml', '../../../etc/passwd'],
    ['packs/pack.yaml', 'a/../../../b.yaml'],
    ['pack.yaml', '/etc/passwd'],
    ['pack.yaml', 'C:/boards/a.yaml'],
    ['pack.yaml', 'file:///etc/passwd'],
    ['pack.yaml', 'https://example.org/a.yaml'],
    ['pack.yaml', 'boards\\a.yaml'],
    ['pack.yaml', '..\\a.yaml'],
    ['pack.yaml', 'a\0.yaml'],
    ['pack.yaml', 'a\n.yaml'],
    ['pack.yaml', ''],
    ['pack.yaml', '  '],
    ['pack.yaml', '.'],
    ['a/pack.yaml', '..'],
    ['pack.yaml', 'boards/'],
  ])('from %s to %j is refused', (from, reference) => {
    expect(resolveReference(from, reference)).toHaveProperty('refused');
  });

  it('never yields a path that leaves the root', () => {
    const joined = (...parts: string[]) =>
      fc.array(fc.constantFrom(...parts), { maxLength: 8 }).map((some) => some.join('/'));
    const file = joined('a', 'b.yaml', '...', '~');
    fc.assert(
      fc.property(file, joined('..', '.', '', 'a', 'b.yaml', '...', '~'), (from, reference) => {
        const result = resolveReference(from, reference);
        if ('refused' in result) return;
        expect(result.path.split('/').every((p) => p !== '..' && p !== '.')).toBe(true);
        expect(result.path.startsWith('/')).toBe(false);
      }),
      { seed: 3, numRuns: 1000 },
    );
  });
});
