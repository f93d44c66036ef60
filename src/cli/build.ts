import { composePack, dataSchemas, type PackInput, packData } from '../dossier/index.js';
import { allChecks, methods, runChecks } from '../evidence/index.js';
import { loadPack, type PackFiles, type Problem } from '../manifest/index.js';
import type { Pack } from '../manifest/model.js';
import { type Files, hashOfSet, type Output, OutputError, type RevisionSummary, sha256 } from '../publish/index.js';
import { renderPack } from '../render/html/index.js';
import { renderPdf } from '../render/pdf/index.js';
import { assembleStudy, type BoardStudy, planBoard, type TaskResult } from '../study/index.js';
import { type BoardVerdict, judgePack } from '../verdict/index.js';
import { Fault } from './errors.js';
import type { Progress } from './progress.js';
import { renderTop } from './render-top.js';
import type { StudyJob } from './study-job.js';
import type { Workers } from './workers.js';

export interface BuildOptions {
  /** Relative to the root folder of the files, with forward slashes. */
  readonly packPath: string;
  readonly programVersion: string;
}

/** All that a build touches of the world. */
export interface BuildEffects {
  readonly files: PackFiles;
  /** Opened only when the manifests are good. */
  readonly openOutput: () => Output;
  readonly progress: Progress;
  readonly workers: Workers;
  /** Seconds since 1970: the time that documents carry. Without it, the pack's date. */
  readonly epoch?: number;
}

export type BuildOutcome =
  | { readonly kind: 'bad input'; readonly problems: readonly Problem[] }
  | { readonly kind: 'built'; readonly summary: RevisionSummary; readonly verdicts: readonly BoardVerdict[] };

/**
 * A whole build: from manifests to a published revision.
 *
 * @throws OutputError when the output folder cannot be used, Fault when the program is wrong
 */
export async function buildPack(options: BuildOptions, effects: BuildEffects): Promise<BuildOutcome> {
  const reads = new Map<string, string>();
  let stage = 'reading the manifests';
  const enter = (name: string, total?: number) => {
    stage = name;
    effects.progress.stage(name, total);
  };
  let output: Output | undefined;
  try {
    enter(stage);
    const loaded = loadPack(recording(effects.files, reads), options.packPath);
    if ('problems' in loaded) return { kind: 'bad input', problems: loaded.problems };
    const { pack } = loaded;
    output = effects.openOutput();
    const studies = await studyPack(pack, effects, enter);
    enter('judging the boards');
    const verdicts = judgePack(studies, pack.requirements);
    enter('checking the engine against published values');
    const evidence = runChecks(allChecks);
    enter('composing the pages');
    const parts = { pack, studies, verdicts, evidence, methods, programVersion: options.programVersion };
    const files = await drawPack(parts, effects, enter);
    enter('publishing');
    const summary = summaryOf(pack, verdicts, hashOfSet(reads), options.programVersion);
    output.publishRevision(summary, files, renderTop);
    return { kind: 'built', summary, verdicts };
  } catch (error) {
    if (error instanceof OutputError) throw error;
    throw new Fault(stage, hashOfSet(reads), error);
  } finally {
    effects.progress.end();
    output?.close();
  }
}

type Enter = (stage: string, total?: number) => void;

async function studyPack(pack: Pack, { workers, progress }: BuildEffects, enter: Enter): Promise<BoardStudy[]> {
  const { analysis } = pack;
  const plans = pack.boards.map((board) =>
    planBoard(board, analysis).map((task): StudyJob => ({ board, analysis, task })),
  );
  const jobs = plans.flat();
  enter('calculating', jobs.length);
  const results = await workers.run<TaskResult>(jobs, () => progress.step());
  const resultOf = new Map(jobs.map((job, i) => [job, results[i]]));
  return plans.map((plan, i) =>
    assembleStudy(
      pack.boards[i],
      analysis,
      plan.map((job) => resultOf.get(job)!),
    ),
  );
}

async function drawPack(parts: PackInput, effects: BuildEffects, enter: Enter): Promise<Files> {
  const document = composePack(parts);
  const dossiers = document.pages.filter((page) => page.kind === 'dossier');
  enter('writing the pages');
  const files = new Map<string, Uint8Array | string>(await renderPack(document));
  for (const [path, content] of Object.entries({ ...packData(parts), ...dataSchemas() })) {
    files.set(path, `${JSON.stringify(content, null, 1)}\n`);
  }
  const created = new Date(effects.epoch === undefined ? `${parts.pack.date}T00:00:00Z` : effects.epoch * 1000);
  enter('drawing the PDF dossiers', dossiers.length);
  const titles = new Map(document.pages.map((page) => [page.id, page.title]));
  const context = {
    packTitle: document.title,
    revision: document.revision,
    date: created,
    pageTitle: (id: string) => titles.get(id),
  };
  for (const page of dossiers) {
    files.set(`pdf/${page.id.replace(/^board\//, '')}.pdf`, await renderPdf(page, context));
    effects.progress.step();
  }
  return files;
}

/** Notes the hash of every file that is read, for the hash of the pack as far as it was read. */
function recording(files: PackFiles, reads: Map<string, string>): PackFiles {
  return {
    read(path) {
      const found = files.read(path);
      if (found instanceof Uint8Array) reads.set(path, sha256(found));
      return found;
    },
  };
}

function summaryOf(
  pack: Pack,
  verdicts: readonly BoardVerdict[],
  packHash: string,
  programVersion: string,
): RevisionSummary {
  const { id: packId, title, documentNumber, revision, date, status } = pack;
  const boards = pack.boards.map((board, i) => ({ id: board.id, title: board.title, status: verdicts[i].overall }));
  return { format: 1, packId, title, documentNumber, revision, date, status, packHash, programVersion, boards };
}
