import { dirname } from 'node:path';
import type { Disk } from './disk.js';

/** Endings of folders and files that stand beside the good ones only while a build is at work; no name of a pack or revision ends so. */
export const unfinished = '.tmp-new~';
export const previous = '.tmp-old~';

/**
 * Puts the finished `<target>.tmp-new~`, a folder or a file, in the place of `target`, one target after the other.
 * If anything fails all the old ones are back in their places. Only a kill between two renames leaves a `target`
 * missing; `recover` mends that.
 */
export function swapAll(disk: Disk, targets: readonly string[]): void {
  const undo: (() => void)[] = [];
  try {
    for (const target of targets) {
      if (disk.exists(target)) {
        disk.rename(target, target + previous);
        undo.push(() => disk.rename(target + previous, target));
      }
      disk.rename(target + unfinished, target);
      undo.push(() => disk.rename(target, target + unfinished));
    }
    for (const folder of new Set(targets.map((target) => dirname(target)))) disk.flushFolder(folder);
  } catch (error) {
    for (const step of undo.reverse()) attempt(step);
    throw error;
  }
  for (const target of targets) attempt(() => disk.remove(target + previous));
}

/** For tidying up: when it fails too, the first error is the one to tell, and the next build tidies. */
export function attempt(step: () => void): void {
  try {
    step();
  } catch {
    // Left to recoverFrom in the next build.
  }
}

/** Clears what a killed build left of a target; the old one returns if nothing stands in its place. */
export function recover(disk: Disk, target: string): void {
  if (!disk.exists(target) && disk.exists(target + previous)) disk.rename(target + previous, target);
  disk.remove(target + previous);
  disk.remove(target + unfinished);
}

/** The same for everything in a folder. */
export function recoverFrom(disk: Disk, folder: string): void {
  for (const name of disk.list(folder)) {
    const ending = [unfinished, previous].find((each) => name.endsWith(each));
    if (ending) recover(disk, `${folder}/${name.slice(0, -ending.length)}`);
  }
}
