import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { performance } from 'node:perf_hooks';
import { fileURLToPath, pathToFileURL } from 'node:url';
import { buildPack } from '../../src/cli/build.js';
import type { Progress } from '../../src/cli/progress.js';
import { carryOut } from '../../src/cli/study-job.js';
import { inThisThread } from '../../src/cli/workers.js';
import { type Files, packFilesUnder, realDisk } from '../../src/publish/index.js';
import { findBrowser, startBrowser } from '../browser/browser.js';
import { measureSolvers } from './solvers.js';

/**
 * Builds each demo pack once, in one thread and in memory, and writes what it took to standard output as JSON:
 * seconds per stage, tasks, bytes made, and the highest memory of the process so far. Then, for each dossier, the size of
 * page and PDF, and the time of its PDF beside the time in which a browser, where one is found, prints its page. Before
 * that, the milliseconds of each solver.
 */
interface Stage {
  readonly name: string;
  readonly seconds: number;
  readonly steps: number;
}
const pdfStage = 'drawing the PDFs';

const rounded = (seconds: number): number => Number(seconds.toFixed(3));

/** A progress that keeps the time between one stage and the next. */
function stopwatch(): Progress & { readonly stages: Stage[]; readonly pdfSeconds: number[] } {
  const stages: Stage[] = [];
  const pdfSeconds: number[] = [];
  let lastStep = 0;
  let current: { name: string; start: number; steps: number } | undefined;
  const finish = () => {
    if (!current) return;
    const seconds = rounded((performance.now() - current.start) / 1000);
    stages.push({ name: current.name, seconds, steps: current.steps });
    current = undefined;
  };
  return {
    stages,
    pdfSeconds,
    stage(name) {
      finish();
      lastStep = performance.now();
      current = { name, start: performance.now(), steps: 0 };
    },
    step() {
      if (current) current.steps += 1;
      const now = performance.now();
      if (current?.name === pdfStage) pdfSeconds.push(rounded((now - lastStep) / 1000));
      lastStep = now;
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
    dossiers: await measureDossiers(made, progress.pdfSeconds),
    // Linux counts in kibibytes.
    peakMemoryMiB: Math.round(process.resourceUsage().maxRSS / 1024),
  };
}

/** The PDF of the whole pack is drawn first, then those of the boards in the order of the list. */
async function measureDossiers(files: Files, pdfSeconds: readonly number[]) {
  const pdfs = [...files.keys()].filter((path) => path.startsWith('pdf/') && files.has(pageOf(path)));
  const pages = pdfs.map(pageOf);
  const printed = await printPages(files, pages);
  return pages.map((page, i) => ({
    page,
    pageBytes: Buffer.byteLength(files.get(page)!),
    pdfBytes: Buffer.byteLength(files.get(pdfs[i])!),
    pdfSeconds: pdfSeconds[i + 1],
    ...printed[i],
    pdfShareOfBrowser: printed[i] && rounded(pdfSeconds[i + 1] / printed[i].browserSeconds),
  }));
}
const pageOf = (pdf: string): string => pdf.replace(/^pdf\/(.*)\.pdf$/, 'board/$1.html');

/** Seconds in which a browser that runs already opens a page and prints it, and of that for printing alone. */
async function printPages(files: Files, pages: readonly string[]) {
  const path = findBrowser();
  if (path === undefined) {
    console.error('LEFT OUT: no browser is found, its time for printing is not measured');
    return [];
  }
  const folder = mkdtempSync(join(tmpdir(), 'boardcase-bench-'));
  const browser = await startBrowser(path);
  try {
    for (const [name, content] of files) {
      mkdirSync(dirname(join(folder, name)), { recursive: true });
      writeFileSync(join(folder, name), content);
    }
    const printed: { browserSeconds: number; browserPrintSeconds: number; browserBytes: number }[] = [];
    // The first is printed twice: the PDF of the pack has warmed the program as well.
    for (const page of [pages[0], ...pages]) {
      const tab = await browser.newPage();
      const start = performance.now();
      await tab.goto(pathToFileURL(join(folder, page)).href);
      const loaded = performance.now();
      const pdf = await tab.pdf({ format: 'A4', tagged: true, outline: true });
      const end = performance.now();
      await tab.close();
      printed.push({
        browserSeconds: rounded((end - start) / 1000),
        browserPrintSeconds: rounded((end - loaded) / 1000),
        browserBytes: pdf.length,
      });
    }
    return printed.slice(1);
  } finally {
    await browser.close();
    rmSync(folder, { recursive: true });
  }
}

const solvers = measureSolvers();
const manifests = fileURLToPath(new URL('../../manifests', import.meta.url));
const packs = [];
for (const name of realDisk.list(join(manifests, 'packs')))
  packs.push(await measure(manifests, `packs/${name}/pack.yaml`));
console.log(JSON.stringify({ node: process.version, threads: 1, ...solvers, packs }, null, 2));
