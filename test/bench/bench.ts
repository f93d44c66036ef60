import { join } from 'node:path';
import { performance } from 'node:perf_hooks';
import { fileURLToPath } from 'node:url';
import { buildPack } from '../../src/cli/build.js';
import type { Progress } from '../../src/cli/progress.js';
import { carryOut } from '../../src/cli/study-job.js';
import { inThisThread } from '../../src/cli/workers.js';
import { type Files, packFilesUnder, realDisk } from '../../src/publish/index.js';

/**
 * Builds each demo pack once, in one thread and in memory, and writes what it took to standard output as JSON:
 * seconds per stage, tasks, bytes made, and the highest memory of the process so far.
 */
interface Stage {
  readonly name: string;
  readonly seconds: number;
  readonly steps: number;
}

/** A progress that keeps the time between one stage and the next. */
function stopwatch(): Progress & { readonly stages: Stage[] } {
  const stages: Stage[] = [];
  let current: { name: string; start: number; steps: number } | undefined;
  const finish = () => {
    if (!current) return;
    const seconds = Number(((performance.now() - current.start) / 1000).toFixed(3));
    stages.push({ name: current.name, seconds, steps: current.steps });
    current = undefined;
  };
  return {
    stages,
    stage(name) {
      finish();
      current = { name, start: performance.now(), steps: 0 };
    },
    step() {
      if (current) current.steps += 1;
    },
    end: finish,
  };
}

/** Revisions built so far, which later ones are compared with. */
const published = new Map<string, Files>();

async function measure(manifests: string, packPath: string) {
  const progress = stopwatch();
  let made: Files = new Map();
  const outcome = await buildPack(
    { packPath, programVersion: 'bench' },
    {
      files: packFilesUnder(manifests),
      openOutput: () => ({
        publishRevision({ packId, revision }, files) {
          made = files;
          published.set(`${packId}/${revision}`, files);
          return 'written';
        },
        readFile(packId, revision, path) {
          const content = published.get(`${packId}/${revision}`)?.get(path);
          return content === undefined ? undefined : Buffer.from(content);
        },
        close() {},
      }),
      progress,
      workers: inThisThread(carryOut),
    },
  );
  if (outcome.kind === 'bad input') throw new Error(`${packPath} has problems; run boardcase validate on it`);
  return {
    pack: outcome.summary.packId,
    boards: outcome.summary.boards.length,
    seconds: Number(progress.stages.reduce((sum, stage) => sum + stage.seconds, 0).toFixed(3)),
    stages: progress.stages,
    files: made.size,
    bytes: [...made.values()].reduce((sum, content) => sum + Buffer.byteLength(content), 0),
    // Linux counts in kibibytes.
    peakMemoryMiB: Math.round(process.resourceUsage().maxRSS / 1024),
  };
}

const manifests = fileURLToPath(new URL('../../manifests', import.meta.url));
const packs = [];
for (const name of realDisk.list(join(manifests, 'packs')))
  packs.push(await measure(manifests, `packs/${name}/pack.yaml`));
console.log(JSON.stringify({ node: process.version, threads: 1, packs }, null, 2));
