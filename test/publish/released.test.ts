import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { OutputError, openOutput, type RevisionSummary, realDisk } from '../../src/publish/index.js';
import { plainIndex, summaryOf } from './summaries.js';
import { readTree, temporaryFolder, writeTree } from './temporary-folder.js';

interface Wish {
  readonly status?: string;
  readonly programVersion?: string;
  readonly inputs?: Readonly<Record<string, string>>;
  readonly verdict?: string;
  readonly gain?: number;
  readonly boards?: readonly string[];
  readonly page?: string;
  readonly notice?: string;
}

const standing = { inputs: { 'foils.yaml': 'f', 'pack.yaml': 'p' }, verdict: 'meets', gain: 17, boards: ['a'] };

/** A revision as a build hands it over, with one requirement per board. */
function built(wish: Wish = {}) {
  const { inputs, verdict, gain, boards } = { ...standing, ...wish };
  const { status = 'released', programVersion = '1.0.0', page = 'page', notice = 'n' } = wish;
  const summary = summaryOf('p', 'A', { status, programVersion, packHash: JSON.stringify(inputs) });
  const header = { program: 'boardcase', programVersion, notices: [notice] };
  const verdicts = boards.map((boardId) => ({
    boardId,
    requirementId: 'r-gain',
    status: verdict,
    unit: 'dBi',
    value: gain,
    margin: gain - 16,
    adverse: 0.5,
    favourable: 0.5,
  }));
  const pack = {
    ...header,
    kind: 'pack',
    pack: { id: 'p', revision: 'A', date: '2026-11-02', status },
    boards: boards.map((id) => ({ id, title: id, overall: verdict, data: `board-${id}.json`, inputsHash: 'h' })),
    requirements: [{ id: 'r-gain', text: 't', source: 's' }],
    verdicts,
    inputs: Object.entries(inputs).map(([path, sha256]) => ({ path, sha256 })),
  };
  const files: Record<string, string> = {
    'index.html': page,
    'data/pack.json': JSON.stringify(pack),
    ...Object.fromEntries(boards.map((id) => [`data/board-${id}.json`, JSON.stringify({ ...header, gain })])),
  };
  return { summary, files };
}

function publish(out: string, { summary, files }: { summary: RevisionSummary; files: Record<string, string> }) {
  const output = openOutput(out, realDisk);
  try {
    return output.publishRevision(summary, new Map(Object.entries(files)), plainIndex);
  } finally {
    output.close();
  }
}

function published(wish?: Wish): string {
  const out = join(temporaryFolder(), 'out');
  expect(publish(out, built(wish))).toBe('written');
  return out;
}

function refusal(out: string, wish: Wish): string {
  const before = readTree(out);
  let message = '';
  try {
    publish(out, built(wish));
  } catch (error) {
    expect(error).toBeInstanceOf(OutputError);
    message = (error as Error).message;
  }
  expect(readTree(out)).toEqual(before);
  return message;
}

describe('a released revision', () => {
  it('is left untouched where neither inputs nor program nor figures change, whatever the pages would be', () => {
    const out = published();
    const before = readTree(out);
    expect(publish(out, built({ page: 'drawn anew', notice: 'other words' }))).toBe('left as released');
    expect(readTree(out)).toEqual(before);
  });

  it.each<[string, Wish, readonly RegExp[]]>([
    [
      'inputs',
      { inputs: { 'foils.yaml': 'g', 'pack.yaml': 'p', 'more.yaml': 'm' } },
      [/^ {2}input files: more\.yaml added; foils\.yaml changed$/m],
    ],
    ['an input that went', { inputs: { 'pack.yaml': 'p' } }, [/^ {2}input files: foils\.yaml removed$/m]],
    ['the program', { programVersion: '1.1.0' }, [/^ {2}program: boardcase 1\.0\.0, now 1\.1\.0$/m]],
    ['figures', { gain: 17.1 }, [/^ {2}figures: data\/pack\.json; data\/board-a\.json$/m]],
    [
      'a verdict',
      { verdict: 'misses' },
      [/^ {2}figures: data\/pack\.json$/m, /^ {2}verdicts: a overall meets, now misses; a r-gain meets, now misses$/m],
    ],
    ['its boards', { boards: ['b'] }, [/^ {2}boards added: b$/m, /^ {2}boards removed: a$/m, /data\/board-b\.json/]],
    ['its status, back to draft', { status: 'draft' }, [/^ {2}status: released, now draft$/m]],
  ])('refuses a build that would change %s, and names it', (_, wish, lines) => {
    const message = refusal(published(), wish);
    expect(message).toMatch(/^p revision A is released and would change: raise the revision\. Nothing was written\./);
    for (const line of lines) expect(message).toMatch(line);
  });

  it('names nothing that does not change', () => {
    expect(refusal(published(), { programVersion: '1.1.0' }).split('\n')).toHaveLength(2);
  });

  it('does not stand in the way of the next revision', () => {
    const out = published();
    const next = built({ gain: 18 });
    expect(publish(out, { ...next, summary: { ...next.summary, revision: 'B' } })).toBe('written');
    expect(Object.keys(readTree(out))).toEqual(expect.arrayContaining(['p/A/index.html', 'p/B/index.html']));
  });

  it.each([
    ['revision.json', '{ "format": 9, "status": "released" }'],
    ['revision.json', '{ broken'],
    ['data/pack.json', '{ broken'],
  ])('is kept although its %s cannot be read any more', (file, text) => {
    const out = published();
    writeTree(join(out, 'p/A'), { [file]: text });
    expect(refusal(out, {})).toMatch(/raise the revision.*\n.*cannot be read/);
  });
});

describe('an unreleased revision', () => {
  it.each(['draft', 'for review'])('of status %s is built again freely, and can be released', (status) => {
    const out = published({ status });
    expect(publish(out, built({ status, gain: 12, verdict: 'misses', programVersion: '2.0.0' }))).toBe('written');
    expect(publish(out, built({ gain: 12, verdict: 'misses' }))).toBe('written');
    expect(refusal(out, { gain: 13, verdict: 'misses' })).toMatch(/raise the revision/);
  });
});

describe('files of a revision', () => {
  it('are read by name, and nothing outside the revision is', () => {
    const out = published();
    const output = openOutput(out, realDisk);
    const read = (packId: string, revision: string, path: string) => {
      const bytes = output.readFile(packId, revision, path);
      return bytes && Buffer.from(bytes).toString();
    };
    expect(read('p', 'A', 'index.html')).toBe('page');
    expect(read('p', 'B', 'index.html')).toBeUndefined();
    expect(read('p', 'A', 'data')).toBeUndefined();
    expect(read('p', 'A', '../../index.html')).toBeUndefined();
    expect(read('..', 'A', 'index.html')).toBeUndefined();
    output.close();
  });
});
