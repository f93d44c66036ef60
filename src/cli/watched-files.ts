import { type Stats, unwatchFile, watchFile } from 'node:fs';
import { join } from 'node:path';
import type { PackFiles } from '../manifest/index.js';

/** How often a file is looked at, ms. */
const EVERY = 250;

export interface WatchedFiles {
  /** The same files; each one that is asked for is watched from then on, also where it is not there yet. */
  readonly files: PackFiles;
  stop(): void;
}

/**
 * Watches the files that a build reads, and no others. They are looked at again and again rather than announced by the
 * system: editors replace files instead of writing them, and shared folders announce nothing.
 */
export function watchedFiles(root: string, files: PackFiles, changed: () => void): WatchedFiles {
  const watched = new Set<string>();
  const look = (now: Stats, before: Stats) => {
    if (now.mtimeMs !== before.mtimeMs || now.size !== before.size || now.ino !== before.ino) changed();
  };
  return {
    files: {
      read(path) {
        const file = join(root, path);
        // Before it is read, so that no change falls in between.
        if (!path.includes('\0') && !watched.has(file)) {
          watched.add(file);
          watchFile(file, { interval: EVERY }, look);
        }
        return files.read(path);
      },
    },
    stop() {
      for (const file of watched) unwatchFile(file, look);
      watched.clear();
    },
  };
}
