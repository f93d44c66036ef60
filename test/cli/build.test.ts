import { describe, expect, it } from 'vitest';
import { type BuildEffects, buildPack } from '../../src/cli/build.js';
import { Fault } from '../../src/cli/errors.js';
import { noProgress } from '../../src/cli/progress.js';
import { carryOut } from '../../src/cli/study-job.js';
import { inThisThread, type Workers } from '../../src/cli/workers.js';
import { type Files, hashOfSet, OutputError, sha256 } from '../../src/publish/index.js';
import { standIn } from '../study/stand-in-engine.js';
import { filesOf, smallPack } from './small-pack.js';

interface Published {
  readonly files: Map<string, string>;
  readonly top: Files;
}

/** Effects that keep everything in memory. */
function effectsFor(
  files: Record<string, string>,
  changed: Partial<BuildEffects> = {},
  earlier: Record<string, Uint8Array> = {},
) {
  const published: Published[] = [];
  const log: string[] = [];
  const effects: BuildEffects = {
    files: filesOf(files),
    openOutput: () => {
      log.push('open');
      return {
        publishRevision(summary, revisionFiles, renderTop) {
          log.push('publish');
          const texts = [...revisionFiles].map(
            ([path, content]) => [path, Buffer.from(content).toString('latin1')] as const,
          );
          published.push({ files: new Map(texts), top: renderTop([summary]) });
          return 'written';
        },
        readFile: (packId, revision, path) => earlier[`${packId}/${revision}/${path}`],
        close: () => void log.push('close'),
      };
    },
    progress: noProgress,
    workers: inThisThread(carryOut),
    ...changed,
  };
  return { effects, published, log };
}

const options = { packPath: 'pack.yaml', programVersion: '9.9.9' };

describe('a build without a disk', () => {
  it('publishes pages, data with their schemas, and a PDF for each board, under an index that leads to them', async () => {
    const { effects, published, log } = effectsFor(smallPack({ covered: true }));
    const outcome = await buildPack(options, effects);
    expect(log).toEqual(['open', 'publish', 'close']);
    const [{ files, top }] = published;
    expect([...files.keys()]).toEqual(
      expect.arrayContaining([
        'index.html',
        'board/qs-1.html',
        'evidence.html',
        'pdf/qs-1.pdf',
        'pdf/qs-2.pdf',
        'data/pack.json',
        'data/pack.schema.json',
      ]),
    );
    expect(files.get('pdf/qs-2.pdf')).toMatch(/^%PDF-1\.\d/);
    expect(JSON.parse(files.get('data/pack.json') ?? '')).toMatchObject({ pack: { id: 'quillback-small' } });
    expect(top.get('index.html')).toContain('href="quillback-small/A/index.html"');
    expect([...top.keys()]).toContain('style.css');
    expect(outcome).toMatchObject({
      kind: 'built',
      summary: {
        packId: 'quillback-small',
        revision: 'A',
        boards: [{ id: 'qs-1', status: 'incomplete' }, { id: 'qs-2' }],
      },
    });
  });

  it('gives the same bytes whatever the order in which tasks are done, and with copies of their data', async () => {
    const pack = smallPack({ covered: false, fullWave: true });
    const solver = standIn({ shift: 0.1e9, loss: 1.1 });
    const copyingBackwards: Workers = {
      async run<Result>(jobs: readonly unknown[]) {
        const results: Result[] = new Array(jobs.length);
        for (let i = jobs.length - 1; i >= 0; i--)
          results[i] = structuredClone(carryOut(structuredClone(jobs[i]), solver)) as Result;
        return results;
      },
    };
    const stages: string[] = [];
    const [one, two] = [
      effectsFor(pack, {
        workers: inThisThread((job) => carryOut(job, solver)),
        progress: { ...noProgress, stage: (name) => void stages.push(name) },
      }),
      effectsFor(pack, { workers: copyingBackwards }),
    ];
    await buildPack(options, one.effects);
    await buildPack(options, two.effects);
    expect(stages.slice(0, 3)).toEqual(['reading the manifests', 'solving the full wave', 'calculating']);
    const [files, others] = [one.published[0].files, two.published[0].files];
    expect([...others.keys()]).toEqual([...files.keys()]);
    for (const [path, content] of files) expect(others.get(path) === content, path).toBe(true);
  });

  it('dates the PDFs by the pack, or by SOURCE_DATE_EPOCH, and nothing else', async () => {
    const pack = smallPack({ covered: true });
    const [plain, dated] = [effectsFor(pack), effectsFor(pack, { epoch: Date.UTC(2030, 4, 6) / 1000 })];
    await buildPack(options, plain.effects);
    await buildPack(options, dated.effects);
    const differing = [...plain.published[0].files].filter(
      ([path, text]) => dated.published[0].files.get(path) !== text,
    );
    expect(differing.map(([path]) => path)).toEqual(['pdf/pack.pdf', 'pdf/qs-1.pdf', 'pdf/qs-2.pdf']);
    expect(plain.published[0].files.get('pdf/qs-1.pdf')).toContain('D:20261102000000Z');
    expect(dated.published[0].files.get('pdf/qs-1.pdf')).toContain('D:20300506000000Z');
  });

  it('does not open the output when the manifests are bad, and lists every problem', async () => {
    const pack = smallPack({ covered: true });
    pack['pack.yaml'] = pack['pack.yaml'].replace('owner:', 'ovner:');
    pack['boards/qs-1.yaml'] = pack['boards/qs-1.yaml'].replace('pitch: 2.15 mm', 'pitch: -2.15 GHz');
    const { effects, log } = effectsFor(pack);
    const outcome = await buildPack(options, effects);
    expect(log).toEqual([]);
    expect(outcome).toMatchObject({ kind: 'bad input' });
    const files = outcome.kind === 'bad input' ? outcome.problems.map((problem) => problem.file) : [];
    expect(files).toEqual(expect.arrayContaining(['pack.yaml', 'boards/qs-1.yaml']));
  });

  it('tells the stages and counts every task', async () => {
    const stages: [string, number | undefined][] = [];
    let steps = 0;
    const progress = {
      stage: (name: string, total?: number) => void stages.push([name, total]),
      step() {
        steps += 1;
      },
      end() {},
    };
    const { effects } = effectsFor(smallPack({ covered: true }), { progress });
    await buildPack(options, effects);
    expect(stages[0][0]).toBe('reading the manifests');
    expect(stages.at(-1)?.[0]).toBe('publishing');
    expect(steps).toBe(stages.reduce((sum, [, total]) => sum + (total ?? 0), 0));
    expect(steps).toBeGreaterThan(0);
  });

  it('turns an error of the program into a fault with the stage and the hash of what was read, and publishes nothing', async () => {
    const pack = smallPack({ covered: true });
    const broken: Workers = { run: () => Promise.reject(new RangeError('no root in the interval')) };
    const { effects, log } = effectsFor(pack, { workers: broken });
    const fault = await buildPack(options, effects).catch((error) => error);
    expect(fault).toBeInstanceOf(Fault);
    expect(fault.message).toBe('no root in the interval');
    expect(fault.stage).toBe('calculating');
    expect(fault.packHash).toBe(hashOfSet(Object.entries(pack).map(([path, text]) => [path, sha256(text)])));
    expect(log).toEqual(['open', 'close']);
  });

  it('lets what is wrong with the output folder through to the user', async () => {
    const { effects } = effectsFor(smallPack({ covered: true }), {
      openOutput: () => {
        throw new OutputError('the folder is taken');
      },
    });
    await expect(buildPack(options, effects)).rejects.toThrow(OutputError);
  });
});
