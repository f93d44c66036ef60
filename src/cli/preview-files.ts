import { readFileSync, realpathSync, statSync } from 'node:fs';
import { extname, join, sep } from 'node:path';

const types: Readonly<Record<string, string>> = {
  '.html': 'text/html; charset=utf-8',
  '.css': 'text/css; charset=utf-8',
  '.js': 'text/javascript; charset=utf-8',
  '.json': 'application/json',
  '.pdf': 'application/pdf',
  '.csv': 'text/csv; charset=utf-8',
  '.xml': 'application/xml',
};

export interface ServedFile {
  readonly content: Uint8Array;
  readonly type: string;
}

/**
 * A file below a folder for a path of an address, without its leading slash; the index page for a path that ends in a
 * slash or is empty. Undefined for whatever is no plain name below the folder, and for links that lead out of it.
 */
export function servedFile(folder: string, encoded: string): ServedFile | undefined {
  const path = decoded(encoded);
  if (path === undefined) return undefined;
  const parts = (path === '' || path.endsWith('/') ? `${path}index.html` : path).split('/');
  if (!parts.every(isPlainName)) return undefined;
  try {
    const top = realpathSync(folder);
    const real = realpathSync(join(top, ...parts));
    if (!real.startsWith(top + sep) || !statSync(real).isFile()) return undefined;
    return { content: readFileSync(real), type: types[extname(real)] ?? 'application/octet-stream' };
  } catch (error) {
    // Not there, or gone since: a build may be swapping folders.
    if ((error as NodeJS.ErrnoException).code !== undefined) return undefined;
    throw error;
  }
}

function decoded(path: string): string | undefined {
  try {
    return decodeURIComponent(path);
  } catch {
    return undefined;
  }
}

/** Names of pages are made of these; `.` and `..`, hidden files, drives and links of any other spelling are not. */
const isPlainName = (name: string): boolean => /^[A-Za-z0-9_-][A-Za-z0-9._-]*$/.test(name);
