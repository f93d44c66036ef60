import { dirname, join } from 'node:path';
import { visible } from '../quantity/index.js';
import type { Disk } from './disk.js';
import type { Files } from './files.js';
import { takeLock } from './lock.js';
import { OutputError, onDisk } from './output-error.js';
import { isFolderName, isPlainPath } from './paths.js';
import { isReleased, type ReadRevision, releasedChanges } from './released.js';
import { type RevisionSummary, readSummary, revisionFile, sortSummaries, summaryText } from './revision.js';
import { attempt, recoverFrom, swapAll, unfinished } from './swap.js';

/** Whether a revision was written, or lies there as it was released. */
export type Publication = 'written' | 'left as released';

/** Where a build puts its result; held by one build at a time. */
export interface Output {
  /**
   * Puts a revision in place of its predecessor and brings the index up to date: all of it or, on any failure,
   * nothing. Other revisions are left as they are. A revision that was released stays as it is: where nothing of it
   * would change only the index is brought up to date, and where something would, an OutputError names it.
   *
   * @param files        path in the revision's folder → content
   * @param renderIndex  makes the files at the top, the index page among them, from the summaries of all revisions
   *                     found, this one included
   */
  publishRevision(
    summary: RevisionSummary,
    files: Files,
    renderIndex: (summaries: readonly RevisionSummary[]) => Files,
  ): Publication;
  /** A file of a revision that lies there; undefined where there is none. */
  readFile(packId: string, revision: string, path: string): Uint8Array | undefined;
  /** Lets the next build in. */
  close(): void;
}

export const markerName = '.boardcase';
const markerText =
  'Written by boardcase, which replaces and removes what lies here. Keep nothing of your own in this folder.\n';
const lockName = '.boardcase.tmp-lock';

/**
 * Opens a folder for publishing: checks that it is ours (new, empty or marked), locks it and clears what an earlier
 * build that was killed left behind, putting a revision back that it was about to replace.
 *
 * @throws OutputError when the folder holds other things, is in use or cannot be written
 */
export function openOutput(out: string, disk: Disk): Output {
  return onDisk(`cannot use ${out} as the output folder`, () => {
    const strangers = disk.list(out).filter((name) => name !== lockName);
    const ours = disk.exists(join(out, markerName));
    if (strangers.length > 0 && !ours) {
      throw new OutputError(
        `${out} is not empty and was not written by boardcase (it has no file ${markerName}, and it holds ` +
          `${strangers.slice(0, 3).join(', ')}${strangers.length > 3 ? ', …' : ''}). Nothing was changed: ` +
          'name a new or empty folder with --out',
      );
    }
    disk.makeFolder(out);
    const unlock = takeLock(disk, join(out, lockName));
    try {
      if (!ours) disk.write(join(out, markerName), markerText);
      recoverAll(disk, out);
    } catch (error) {
      unlock();
      throw error;
    }
    return outputIn(out, disk, unlock);
  });
}

function outputIn(out: string, disk: Disk, unlock: () => void): Output {
  return {
    publishRevision(summary, files, renderIndex) {
      const { packId, revision } = summary;
      for (const name of [packId, revision]) {
        if (!isFolderName(name)) throw new OutputError(`"${name}" cannot name a folder of the output`);
      }
      const packFolder = join(out, packId);
      if (disk.exists(packFolder) && !disk.isFolder(packFolder)) {
        throw new OutputError(`${packFolder} is not a folder; remove it, or give the pack another id`);
      }
      return onDisk(`cannot write ${join(packFolder, revision)}; the last good output is unchanged`, () => {
        const kept = keepsReleased(summary, files, (path) => fileIn(disk, join(packFolder, revision), path));
        const others = summariesIn(disk, out).filter((s) => s.packId !== packId || s.revision !== revision);
        const index = renderIndex(sortSummaries([...others, summary]));
        const target = join(packFolder, revision);
        const tops = [...index.keys()].filter((name) => !holds(disk, join(out, name), index.get(name) ?? ''));
        try {
          if (!kept) writeFolder(disk, target + unfinished, new Map([...files, [revisionFile, summaryText(summary)]]));
          for (const name of tops) disk.write(join(out, name) + unfinished, index.get(name) ?? '');
          swapAll(disk, [...(kept ? [] : [target]), ...tops.map((name) => join(out, name))]);
        } catch (error) {
          attempt(() => recoverAll(disk, out));
          throw error;
        }
        return kept ? 'left as released' : 'written';
      });
    },
    readFile(packId, revision, path) {
      if (!isFolderName(packId) || !isFolderName(revision)) return undefined;
      return onDisk(`cannot read ${join(out, packId, revision)}`, () =>
        fileIn(disk, join(out, packId, revision), path),
      );
    },
    close() {
      onDisk(`cannot tidy up ${out}`, () => {
        // A build that published nothing into a new folder leaves no trace of itself.
        const names = disk.list(out).filter((name) => name !== lockName);
        const unused = names.length === 1 && names[0] === markerName;
        if (unused) disk.remove(join(out, markerName));
        unlock();
        if (unused) disk.removeEmptyFolder(out);
      });
    },
  };
}

/** True where a released revision is to be left as it is. */
function keepsReleased({ packId, revision, ...rest }: RevisionSummary, files: Files, read: ReadRevision): boolean {
  if (!isReleased(read)) return false;
  const changes = releasedChanges(read, { packId, revision, ...rest }, files);
  if (changes.length === 0) return true;
  throw new OutputError(
    [
      `${packId} revision ${revision} is released and would change: raise the revision. Nothing was written.`,
      ...changes.map((line) => `  ${visible(line)}`),
    ].join('\n'),
  );
}

function fileIn(disk: Disk, folder: string, path: string): Uint8Array | undefined {
  const file = join(folder, path);
  return isPlainPath(path) && disk.exists(file) && !disk.isFolder(file) ? disk.read(file) : undefined;
}

function holds(disk: Disk, file: string, content: Uint8Array | string): boolean {
  if (!disk.exists(file)) return false;
  return Buffer.from(disk.read(file)).equals(typeof content === 'string' ? Buffer.from(content) : content);
}

/** The summaries of all revisions in an output folder. A revision counts only under its own names. */
export function summariesIn(disk: Disk, out: string): RevisionSummary[] {
  return revisionFolders(disk, out).flatMap(({ packId, revision, folder }) => {
    const file = join(folder, revisionFile);
    if (!disk.exists(file)) return [];
    const summary = readSummary(disk.read(file));
    return summary?.packId === packId && summary.revision === revision ? [summary] : [];
  });
}

function revisionFolders(disk: Disk, out: string) {
  return disk
    .list(out)
    .filter((packId) => isFolderName(packId) && disk.isFolder(join(out, packId)))
    .flatMap((packId) =>
      disk
        .list(join(out, packId))
        .filter((revision) => isFolderName(revision) && disk.isFolder(join(out, packId, revision)))
        .map((revision) => ({ packId, revision, folder: join(out, packId, revision) })),
    );
}

function writeFolder(disk: Disk, folder: string, files: Files): void {
  const folders = new Set([folder]);
  disk.remove(folder);
  for (const [path, content] of files) {
    if (!isPlainPath(path)) throw new Error(`a page was given the path "${path}"`);
    const file = join(folder, path);
    if (!folders.has(dirname(file))) folders.add(dirname(file));
    disk.makeFolder(dirname(file));
    disk.write(file, content);
  }
  for (const each of folders) disk.flushFolder(each);
}

function recoverAll(disk: Disk, out: string): void {
  recoverFrom(disk, out);
  for (const name of disk.list(out).filter((each) => disk.isFolder(join(out, each)))) {
    recoverFrom(disk, join(out, name));
    disk.removeEmptyFolder(join(out, name));
  }
}
