import { join } from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';
import { parseArgs } from 'node:util';
import { formatProblem } from '../manifest/index.js';
import { openOutput, packFilesUnder, realDisk, recover, swapAll, unfinished } from '../publish/index.js';
import { buildPack } from './build.js';
import { writeSchemas } from './command-schema.js';
import { UsageError } from './errors.js';
import { tellFailure } from './failures.js';
import { processIo } from './io.js';
import { noProgress, type Progress, terminalProgress } from './progress.js';
import { boardList } from './render-top.js';
import { studyWorkers } from './study-job.js';
import { programVersion } from './version.js';
import type { Workers } from './workers.js';

export interface Demo {
  /** Root folder of the manifests; every `packs/<name>/pack.yaml` in it is built. */
  readonly manifests: string;
  /** Replaced whole once all packs are built, so that it never holds what no pack makes. */
  readonly site: string;
  /** Where the schemas of the manifests go. */
  readonly schemas: string;
}

/**
 * Builds the demo, always with the packs' own dates: the same bytes on every machine.
 *
 * @returns one line per pack
 */
export async function buildDemo(demo: Demo, workers: Workers, progress: Progress): Promise<string[]> {
  const packs = realDisk.list(join(demo.manifests, 'packs')).map((name) => `packs/${name}/pack.yaml`);
  if (packs.length === 0) throw new UsageError(`no pack in ${demo.manifests}`);
  // Opened to see that it may be replaced.
  openOutput(demo.site, realDisk).close();
  recover(realDisk, demo.site);
  const lines: string[] = [];
  for (const packPath of packs) {
    const outcome = await buildPack(
      { packPath, programVersion },
      {
        files: packFilesUnder(demo.manifests),
        openOutput: () => openOutput(demo.site + unfinished, realDisk),
        progress,
        workers,
      },
    );
    if (outcome.kind === 'bad input') throw new UsageError(outcome.problems.map(formatProblem).join('\n'));
    const { packId, revision, boards } = outcome.summary;
    lines.push(`${packId} revision ${revision}: ${boardList(boards)}`);
  }
  swapAll(realDisk, [demo.site]);
  writeSchemas(demo.schemas);
  return lines;
}

async function main(): Promise<void> {
  const { values } = parseArgs({ options: { site: { type: 'string' }, schemas: { type: 'string' } } });
  const top = fileURLToPath(new URL('../..', import.meta.url));
  const demo = {
    manifests: join(top, 'manifests'),
    site: values.site ?? join(top, 'site'),
    schemas: values.schemas ?? join(top, 'manifests/schema'),
  };
  const progress = processIo.terminal ? terminalProgress(processIo.terminal) : noProgress;
  for (const line of await buildDemo(demo, studyWorkers(), progress)) processIo.out(line);
  processIo.out(`Written to ${demo.site}: open index.html there`);
}

if (import.meta.url === pathToFileURL(process.argv[1] ?? '').href) {
  await main().catch((error) => {
    process.exitCode = tellFailure(error, processIo);
  });
}
