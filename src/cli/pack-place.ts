import { statSync } from 'node:fs';
import { dirname, isAbsolute, relative, resolve, sep } from 'node:path';
import { UsageError } from './errors.js';

/** The root folder, and the pack's path below it in the way that manifests write paths. */
export interface PackPlace {
  readonly root: string;
  readonly packPath: string;
}

export function placeOf(packFile: string, rootOption: string | undefined): PackPlace {
  const root = resolve(rootOption ?? dirname(packFile));
  if (!statSync(root, { throwIfNoEntry: false })?.isDirectory()) {
    throw new UsageError(`the root folder ${root} is not there`);
  }
  const way = relative(root, resolve(packFile));
  if (way === '..' || way.startsWith(`..${sep}`) || isAbsolute(way)) {
    throw new UsageError(`${packFile} does not lie under the root folder ${root}; name a folder above it with --root`);
  }
  return { root, packPath: way.split(sep).join('/') };
}
