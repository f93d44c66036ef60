/**
 * How manifests are read. Paths are relative to the root folder, with forward slashes, already normalised
 * (see `paths.ts`); the implementation on disk lives in `publish`, a test uses a map.
 */
export interface PackFiles {
  /** Bytes of a file; undefined when there is none; `refused` with a reason when it may not be read. */
  read(path: string): Uint8Array | undefined | { readonly refused: string };
}

/** Manifests are written by hand; a larger file is a mistake or an attack. */
export const LARGEST_FILE = 1024 * 1024;
