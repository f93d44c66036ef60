import { randomUUID } from 'node:crypto';
import { hostname } from 'node:os';
import type { Disk } from './disk.js';
import { OutputError } from './output-error.js';

/**
 * Keeps two builds from writing into one folder. The lock is a file with the process id and host of its holder;
 * a lock whose holder died on this host (a kill, a power cut) is taken over.
 *
 * @returns a function that gives the lock back
 * @throws OutputError when another build holds it
 */
export function takeLock(disk: Disk, path: string): () => void {
  const mine = `${process.pid} ${hostname()} ${randomUUID()}\n`;
  if (!disk.create(path, mine)) {
    const holder = contentOf(disk, path);
    if (isAlive(holder)) throw heldBy(holder, path);
    removeDeadLock(disk, path, holder);
    if (!disk.create(path, mine)) throw heldBy(contentOf(disk, path), path);
  }
  return () => {
    if (contentOf(disk, path) === mine) disk.remove(path);
  };
}

/** Of two builds that find the same dead lock only one gets to move it; the other may have caught a new one, which goes back. */
function removeDeadLock(disk: Disk, path: string, holder: string): void {
  const aside = `${path}-${process.pid}`;
  try {
    disk.rename(path, aside);
  } catch {
    throw heldBy(contentOf(disk, path), path);
  }
  const caught = contentOf(disk, aside);
  if (caught !== holder) {
    disk.rename(aside, path);
    throw heldBy(caught, path);
  }
  disk.remove(aside);
}

function contentOf(disk: Disk, path: string): string {
  try {
    return Buffer.from(disk.read(path)).toString();
  } catch {
    return '';
  }
}

/** A holder that cannot be asked counts as alive: one on another host, or one that has not yet written its name. */
function isAlive(holder: string): boolean {
  const [id, host] = holder.trim().split(' ');
  const processId = Number(id);
  if (!Number.isInteger(processId) || processId <= 0 || host !== hostname()) return true;
  try {
    process.kill(processId, 0);
    return true;
  } catch (error) {
    return (error as NodeJS.ErrnoException).code === 'EPERM';
  }
}

function heldBy(holder: string, path: string): OutputError {
  const [id, host] = holder.trim().split(' ');
  const who = id && host ? `process ${id} on ${host}` : 'another process';
  return new OutputError(
    `another build is writing into this folder (${who}). Wait for it; if no build is running, remove ${path}`,
  );
}
