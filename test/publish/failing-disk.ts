import type { Disk } from '../../src/publish/index.js';

/**
 * A disk that fails. Counts the calls that change something; from call number `at` on, `mode`
 * - `once` lets that one call throw ENOSPC (a full disk, then a tidy program),
 * - `forever` lets every call from then on throw it, so that no tidying can run: what a kill leaves at that point.
 */
export function failingDisk(disk: Disk, at: number, mode: 'once' | 'forever'): Disk & { readonly calls: () => number } {
  let calls = 0;
  const changing = new Set<PropertyKey>([
    'makeFolder',
    'write',
    'create',
    'rename',
    'remove',
    'removeEmptyFolder',
    'flushFolder',
  ]);
  const wrapped = new Proxy(disk, {
    get(target, name) {
      const method = Reflect.get(target, name);
      return (...args: unknown[]) => {
        if (changing.has(name)) calls += 1;
        if (mode === 'once' ? changing.has(name) && calls === at : calls >= at) {
          throw Object.assign(new Error('no space'), { code: 'ENOSPC' });
        }
        return Reflect.apply(method, target, args);
      };
    },
  });
  return Object.assign(wrapped, { calls: () => calls });
}
