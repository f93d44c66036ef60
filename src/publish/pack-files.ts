import { lstatSync, readFileSync, realpathSync, statSync } from 'node:fs';
import { isAbsolute, join, relative, sep } from 'node:path';
import { LARGEST_TEXTURE_FILE, type PackFiles } from '../manifest/index.js';

/** Measured heights are the largest that a pack holds; a manifest as large is refused when it is read as one. */
const largestFile = LARGEST_TEXTURE_FILE;

/**
 * The files of a pack under a root folder. A path is relative to the root, with forward slashes.
 * Nothing outside the root can be read: neither by `..`, nor by an absolute path, nor through a symbolic link.
 * Refusals say why, so that the message to the user can.
 */
export function packFilesUnder(root: string): PackFiles {
  const realRoot = realpathSync(root);
  return {
    read(path) {
      if (path.includes('\0')) return { refused: 'the path holds a zero byte' };
      if (isAbsolute(path) || /^[A-Za-z]:/.test(path))
        return { refused: 'the path must be relative to the root folder' };
      const wanted = join(realRoot, path);
      if (!isInside(realRoot, wanted)) return { refused: 'the path leaves the root folder' };
      try {
        if (lstatSync(wanted, { throwIfNoEntry: false }) === undefined) return undefined;
        const real = realpathSync(wanted);
        if (!isInside(realRoot, real)) return { refused: 'a symbolic link leads out of the root folder' };
        const status = statSync(real);
        if (!status.isFile()) return { refused: status.isDirectory() ? 'it is a folder' : 'it is not a regular file' };
        if (status.size > largestFile) {
          return { refused: `it is larger than ${largestFile / 1024 / 1024} MiB, too large for a file of a pack` };
        }
        return readFileSync(real);
      } catch (error) {
        const code = (error as NodeJS.ErrnoException).code;
        if (code === 'ENOENT') return { refused: 'a symbolic link leads nowhere' };
        if (code === 'ENOTDIR') return undefined;
        return { refused: `it cannot be read (${code ?? (error as Error).message})` };
      }
    },
  };
}

function isInside(root: string, path: string): boolean {
  const way = relative(root, path);
  return way !== '..' && !way.startsWith(`..${sep}`) && !isAbsolute(way);
}
