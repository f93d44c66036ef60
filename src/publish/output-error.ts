/** Something about the output folder that the user can mend: not ours, locked, full, not writable. */
export class OutputError extends Error {
  override name = 'OutputError';
}

/** Runs a step on the disk and says in words what failed, for errors that the operating system reports. */
export function onDisk<T>(doing: string, step: () => T): T {
  try {
    return step();
  } catch (error) {
    const code = (error as NodeJS.ErrnoException).code;
    if (code === undefined || error instanceof OutputError) throw error;
    throw new OutputError(`${doing}: ${reasons[code] ?? (error as Error).message}`, { cause: error });
  }
}

const reasons: Readonly<Record<string, string>> = {
  EACCES: 'permission denied',
  EPERM: 'not permitted',
  EROFS: 'the file system is read-only',
  ENOSPC: 'no space left on the device',
  EDQUOT: 'the disk quota is used up',
  ENOTDIR: 'a part of the path is a file, not a folder',
  ENAMETOOLONG: 'the path is too long',
};
