import { mkdirSync, symlinkSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { OutputError, openOutput, type RevisionSummary, realDisk } from '../../src/publish/index.js';
import { failingDisk } from './failing-disk.js';
import { plainIndex, summaryOf } from './summaries.js';
import { readTree, temporaryFolder, writeTree } from './temporary-folder.js';

function publish(out: string, summary: RevisionSummary, files: Record<string, string>, disk = realDisk): void {
  const output = openOutput(out, disk);
  try {
    output.publishRevision(summary, new Map(Object.entries(files)), plainIndex);
  } finally {
    output.close();
  }
}

const oldFiles = { 'overview.html': 'old', 'board/a.html': 'old a', 'gone.html': 'only in the old one' };
const newFiles = { 'overview.html': 'new', 'board/a.html': 'new a', 'data/a.json': '{}' };

function publishedOnce(): string {
  const out = join(temporaryFolder(), 'out');
  publish(out, summaryOf('p', 'A'), { 'overview.html': 'revision A' });
  publish(out, summaryOf('p', 'B', { title: 'old' }), oldFiles);
  return out;
}

describe('publishing a revision', () => {
  it('writes the files, the summary and an index of all packs and revisions, newest first', () => {
    const out = publishedOnce();
    publish(out, summaryOf('p', 'C', { date: '2027-01-01' }), newFiles);
    publish(out, summaryOf('a', '1'), newFiles);
    const tree = readTree(out);
    expect(tree['index.html']).toBe('a/1/Pack a\np/C/Pack p\np/B/old\np/A/Pack p');
    expect(tree['p/C/data/a.json']).toBe('{}');
    expect(JSON.parse(tree['p/C/revision.json'])).toMatchObject({ packId: 'p', revision: 'C' });
  });

  it('replaces its own revision whole and leaves the others as they are', () => {
    const out = publishedOnce();
    const before = readTree(out);
    publish(out, summaryOf('p', 'B', { title: 'new' }), newFiles);
    const after = readTree(out);
    expect(after['p/B/gone.html']).toBeUndefined();
    expect(after['p/B/overview.html']).toBe('new');
    for (const path of Object.keys(before).filter((each) => each.startsWith('p/A/')))
      expect(after[path]).toBe(before[path]);
  });

  it('gives the same bytes whatever order the packs were built in', () => {
    const [one, two] = [join(temporaryFolder(), 'out'), join(temporaryFolder(), 'out')];
    publish(one, summaryOf('p', 'A'), newFiles);
    publish(one, summaryOf('q', 'A'), newFiles);
    publish(two, summaryOf('q', 'A'), newFiles);
    publish(two, summaryOf('p', 'A'), newFiles);
    expect(readTree(one)).toEqual(readTree(two));
  });

  it('does not list a revision folder whose summary was changed by hand', () => {
    const out = publishedOnce();
    writeTree(out, {
      'p/A/revision.json': '{ "format": 1, "packId": "p" ',
      'x/1/revision.json': JSON.stringify(summaryOf('y', '1')),
    });
    publish(out, summaryOf('p', 'B', { title: 'new' }), newFiles);
    expect(readTree(out)['index.html']).toBe('p/B/new');
  });

  it.each(['../escape.html', '/etc/escape.html', 'a/../../b', 'a\\b', '', 'a//b', 'a/./b'])(
    'refuses the path "%s"',
    (path) => {
      const out = publishedOnce();
      const before = readTree(out);
      expect(() => publish(out, summaryOf('p', 'B'), { ...newFiles, [path]: 'x' })).toThrow(/was given the path/);
      expect(readTree(out)).toEqual(before);
    },
  );

  it.each([
    ['..', 'A'],
    ['p', '../../x'],
    ['p', 'A.tmp-old~'],
    ['', 'A'],
  ])('refuses pack "%s", revision "%s"', (packId, revision) => {
    const out = join(temporaryFolder(), 'out');
    expect(() => publish(out, summaryOf(packId, revision), newFiles)).toThrow(OutputError);
    expect(readTree(temporaryFolder())).toEqual({});
  });

  it('does not write through a symbolic link in the place of a pack', () => {
    const folder = temporaryFolder();
    const out = join(folder, 'out');
    publish(out, summaryOf('p', 'A'), newFiles);
    mkdirSync(join(folder, 'elsewhere'));
    symlinkSync(join(folder, 'elsewhere'), join(out, 'q'));
    expect(() => publish(out, summaryOf('q', 'A'), newFiles)).toThrow(/not a folder/);
    expect(readTree(join(folder, 'elsewhere'))).toEqual({});
  });
});

describe('failures while publishing', () => {
  // Every call that changes the disk is made to fail in turn, so no point of a kill or of a full disk is left out.
  const countedDisk = failingDisk(realDisk, Number.POSITIVE_INFINITY, 'once');
  const complete = (title: string, files: Record<string, string>) => ({ title, files });
  const states = [complete('old', oldFiles), complete('new', newFiles)];

  function revisionB(out: string) {
    const tree = readTree(out);
    const files = Object.fromEntries(
      Object.entries(tree)
        .filter(([path]) => path.startsWith('p/B/') && path !== 'p/B/revision.json')
        .map(([path, text]) => [path.slice(4), text]),
    );
    return complete(JSON.parse(tree['p/B/revision.json']).title, files);
  }

  it('leave the old output, bytes unchanged, when any one call fails', () => {
    const reference = publishedOnce();
    publish(reference, summaryOf('p', 'B', { title: 'new' }), newFiles, countedDisk);
    const total = countedDisk.calls();
    expect(total).toBeGreaterThan(10);
    let failed = 0;
    for (let at = 1; at <= total; at++) {
      const out = publishedOnce();
      const before = readTree(out);
      let thrown: unknown;
      try {
        publish(out, summaryOf('p', 'B', { title: 'new' }), newFiles, failingDisk(realDisk, at, 'once'));
      } catch (error) {
        thrown = error;
      }
      const after = readTree(out);
      const left = Object.keys(after).filter((path) => path.includes('.tmp-') && !path.endsWith('.tmp-lock'));
      if (thrown === undefined) {
        expect(revisionB(out), `call ${at}`).toEqual(states[1]);
      } else {
        failed += 1;
        expect(thrown, `call ${at}`).toBeInstanceOf(OutputError);
        // Only giving the lock back comes after the new output is in place.
        if (at < total)
          expect({ ...after, '.boardcase.tmp-lock': undefined }, `call ${at}`).toEqual({
            ...before,
            '.boardcase.tmp-lock': undefined,
          });
        expect(left, `call ${at}`).toEqual([]);
      }
    }
    expect(failed).toBeGreaterThan(total / 2);
  });

  it('of the kind that stops the program leave, after the next opening, the old output or the new one', () => {
    const seen = new Set<string>();
    for (let at = 1; ; at++) {
      const out = publishedOnce();
      const before = readTree(out);
      const disk = failingDisk(realDisk, at, 'forever');
      let stopped = false;
      try {
        publish(out, summaryOf('p', 'B', { title: 'new' }), newFiles, disk);
      } catch {
        stopped = true;
      }
      // The lock of a killed process names a process that is gone; here it names this one, so it is removed by hand.
      realDisk.remove(join(out, '.boardcase.tmp-lock'));
      openOutput(out, realDisk).close();
      const state = revisionB(out);
      expect(states, `call ${at}`).toContainEqual(state);
      seen.add(state.title);
      const after = readTree(out);
      expect(Object.keys(after).filter((path) => path.includes('.tmp-'))).toEqual([]);
      for (const path of Object.keys(before).filter((each) => each.startsWith('p/A/')))
        expect(after[path]).toBe(before[path]);
      if (!stopped) break;
    }
    expect([...seen].sort()).toEqual(['new', 'old']);
  });
});

describe('the output folder', () => {
  it('is refused, untouched, when it holds things that are not ours', () => {
    const out = temporaryFolder();
    writeTree(out, { 'thesis.txt': 'years of work', 'p/A/index.html': 'mine' });
    const before = readTree(out);
    expect(() => publish(out, summaryOf('p', 'A'), newFiles)).toThrow(
      /not empty and was not written by boardcase.*thesis\.txt.*--out/s,
    );
    expect(readTree(out)).toEqual(before);
  });

  it('is refused when it is a file', () => {
    const folder = temporaryFolder();
    writeTree(folder, { out: 'a file' });
    expect(() => publish(join(folder, 'out'), summaryOf('p', 'A'), newFiles)).toThrow(OutputError);
    expect(readTree(folder)).toEqual({ out: 'a file' });
  });

  it('that a build made and then did not use is gone again', () => {
    const folder = temporaryFolder();
    openOutput(join(folder, 'out'), realDisk).close();
    expect(realDisk.list(folder)).toEqual([]);
  });

  it('is open to one build at a time', () => {
    const out = join(temporaryFolder(), 'out');
    const first = openOutput(out, realDisk);
    expect(() => openOutput(out, realDisk)).toThrow(/another build.*process \d+.*remove .*tmp-lock/s);
    first.close();
    openOutput(out, realDisk).close();
  });

  it('leaves a lock alone whose holder cannot be asked: on another host, or not yet signed', () => {
    const out = publishedOnce();
    const lock = (text: string) => writeTree(out, { '.boardcase.tmp-lock': text });
    lock('7 another-host.invalid x\n');
    expect(() => openOutput(out, realDisk)).toThrow(/process 7 on another-host\.invalid/);
    lock('');
    expect(() => openOutput(out, realDisk)).toThrow(/another process/);
  });
});
