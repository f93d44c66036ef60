import { existsSync, readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { type LoadResult, loadPack, type PackFiles, type Problem } from '../../src/manifest/index.js';

const folder = fileURLToPath(new URL('./fixtures/quillback-small/', import.meta.url));

export const FIXTURE_FILES = [
  'boards/qs-1.yaml',
  'boards/qs-2.yaml',
  'finishes.yaml',
  'foils.yaml',
  'laminates.yaml',
  'pack.yaml',
  'requirements.yaml',
] as const;

export const fixtureText = (path: string): string => readFileSync(folder + path, 'utf8');

export type Contents = Readonly<Record<string, string | Uint8Array | undefined>>;

/** The example pack with some files replaced (undefined: removed). */
export function files(changes: Contents = {}): PackFiles {
  return {
    read(path) {
      if (Object.hasOwn(changes, path)) {
        const content = changes[path];
        return typeof content === 'string' ? new TextEncoder().encode(content) : content;
      }
      return existsSync(folder + path) ? new Uint8Array(readFileSync(folder + path)) : undefined;
    },
  };
}

export const load = (changes: Contents = {}, pack = 'pack.yaml'): LoadResult => loadPack(files(changes), pack);

/** Text of an example file with one passage replaced; the passage must be there. */
export function edited(path: string, from: string, to: string): Contents {
  const text = fixtureText(path);
  if (!text.includes(from)) throw new Error(`${path} does not hold ${from}`);
  return { [path]: text.replace(from, () => to) };
}

export function problemsOf(result: LoadResult): readonly Problem[] {
  if ('pack' in result) throw new Error('the pack was accepted');
  return result.problems;
}

export function packOf(result: LoadResult) {
  if ('problems' in result) throw new Error(JSON.stringify(result.problems, null, 1));
  return result.pack;
}
