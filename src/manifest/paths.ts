/** Rules for references between manifests. Purely textual: symbolic links are the reader's business. */
export type PathResult = { readonly path: string } | { readonly refused: string; readonly fix?: string };

/**
 * Resolves a reference written in one manifest to a path under the root folder.
 *
 * @param from       path of the file that holds the reference, relative to the root; '' for the root itself
 * @param reference  as written: relative to that file's folder, forward slashes
 * @returns          normalised path without `.` and `..`, or why it is refused
 */
export function resolveReference(from: string, reference: string): PathResult {
  if (reference.trim() === '') return { refused: 'the reference is empty' };
  // biome-ignore lint/suspicious/noControlCharactersInRegex: control characters are what is looked for
  if (/[\u0000-\u001f\u007f]/.test(reference)) return { refused: 'a reference holds no control characters' };
  if (reference.includes('\\')) {
    return { refused: 'a reference uses forward slashes', fix: `Write ${reference.replaceAll('\\', '/')}.` };
  }
  if (reference.startsWith('/') || /^[A-Za-z][A-Za-z0-9+.-]*:/.test(reference)) {
    return { refused: 'a reference is relative to the file that holds it: no absolute paths, no drives, no addresses' };
  }
  const parts = from.split('/').slice(0, -1);
  for (const part of reference.split('/')) {
    if (part === '' || part === '.') continue;
    if (part !== '..') parts.push(part);
    else if (parts.pop() === undefined) {
      return {
        refused: 'a reference stays under the root folder',
        fix: 'Widen the root with --root, or move the file.',
      };
    }
  }
  if (parts.length === 0 || reference.endsWith('/')) return { refused: 'a reference names a file, not a folder' };
  return { path: parts.join('/') };
}
