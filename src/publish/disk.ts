import * as fs from 'node:fs';
import { join } from 'node:path';

/** The few things that publishing asks of a disk; tests put one that fails or stops in its place. */
export interface Disk {
  exists(path: string): boolean;
  /** Names in a folder, sorted; a folder that is not there has none. */
  list(folder: string): readonly string[];
  isFolder(path: string): boolean;
  read(path: string): Uint8Array;
  /** Creates the folder and those above it. */
  makeFolder(path: string): void;
  /** Writes a new or existing file and waits until it is on the medium. */
  write(path: string, content: Uint8Array | string): void;
  /** Creates a file; false when there is one already. */
  create(path: string, content: string): boolean;
  rename(from: string, to: string): void;
  /** Removes a file or a whole folder; nothing there is no error. */
  remove(path: string): void;
  /** Removes a folder if it is empty. */
  removeEmptyFolder(path: string): void;
  /** Waits until the names in a folder are on the medium. */
  flushFolder(folder: string): void;
}

export const realDisk: Disk = {
  exists: (path) => fs.lstatSync(path, { throwIfNoEntry: false }) !== undefined,
  list: (folder) => (fs.existsSync(folder) ? fs.readdirSync(folder).sort() : []),
  isFolder: (path) => fs.lstatSync(path, { throwIfNoEntry: false })?.isDirectory() ?? false,
  read: (path) => fs.readFileSync(path),
  makeFolder: (path) => void fs.mkdirSync(path, { recursive: true }),
  write: (path, content) => fs.writeFileSync(path, content, { flush: true }),
  create(path, content) {
    try {
      fs.writeFileSync(path, content, { flag: 'wx' });
      return true;
    } catch (error) {
      if ((error as NodeJS.ErrnoException).code === 'EEXIST') return false;
      throw error;
    }
  },
  rename: (from, to) => fs.renameSync(from, to),
  remove: (path) => fs.rmSync(path, { recursive: true, force: true }),
  removeEmptyFolder(path) {
    if (fs.readdirSync(path).length === 0) fs.rmdirSync(path);
  },
  flushFolder(folder) {
    // Windows cannot open a folder for this; there the rename itself has to do.
    if (process.platform === 'win32') return;
    const handle = fs.openSync(folder, 'r');
    try {
      fs.fsyncSync(handle);
    } finally {
      fs.closeSync(handle);
    }
  },
};

/** Every file under a folder as paths with forward slashes, sorted; links and other special files included by name. */
export function filesUnder(disk: Disk, folder: string, prefix = ''): string[] {
  return disk.list(folder).flatMap((name) => {
    const path = join(folder, name);
    return disk.isFolder(path) ? filesUnder(disk, path, `${prefix}${name}/`) : [`${prefix}${name}`];
  });
}
