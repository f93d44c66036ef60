import {
  boardData,
  boardPdf,
  composePack,
  dataSchemas,
  markingOf,
  PACK_DATA,
  PACK_PDF,
  type PackInput,
  packData,
  packPage,
} from '../dossier/index.js';
import { accuracyTable, allChecks, methods, runChecks } from '../evidence/index.js';
import { audienceOf, loadPack, type PackFiles, type Problem, packFor } from '../manifest/index.js';
import type { Pack } from '../manifest/model.js';
import {
  type Files,
  hashOfSet,
  type Output,
  OutputError,
  type Publication,
  type RevisionSummary,
  sha256,
} from '../publish/index.js';
import { renderPack } from '../render/html/index.js';
import { renderPdf } from '../render/pdf/index.js';
import { type BoardVerdict, judgePack } from '../verdict/index.js';
import { Fault } from './errors.js';
import { findPrevious } from './previous.js';
import type { Progress } from './progress.js';
import { renderTop } from './render-top.js';
import { resultsAttachment } from './results-attachment.js';
import { studyFurther } from './study-further.js';
import { boardsToReady, readyPack } from './study-job.js';
import { confirmBoards, type Room, studyBoards } from './study-pack.js';
import { studyProcurement } from './study-procurement.js';
import { supplierFiles } from './supplier-files.js';
import type { Workers } from './workers.js';

export interface BuildOptions {
  /** Relative to the root folder of the files, with forward slashes. */
  readonly packPath: string;
  readonly programVersion: string;
  /** Builds the copy for this audience of the pack instead, as a pack of its own. */
  readonly audience?: string;
  /** Leaves out the second round of the full wave, at the frequencies that verdicts hang on. */
  readonly quick?: boolean;
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
  | {
      readonly kind: 'built';
      readonly summary: RevisionSummary;
      readonly verdicts: readonly BoardVerdict[];
      readonly publication: Publication;
    };

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
    const shown = shownPack(loaded.pack, options);
    if ('problem' in shown) return { kind: 'bad input', problems: [shown.problem] };
    output = effects.openOutput();
    const found = findPrevious(shown.pack, effects.files, output);
    if ('problem' in found) return { kind: 'bad input', problems: [found.problem] };
    const room = { ...effects, enter };
    const pack = await workedOut(shown.pack, room);
    const { boards, analysis, requirements } = pack;
    const confirmations = await confirmBoards(boards, analysis, room);
    const first = await studyBoards(boards, analysis, confirmations, 'calculating', room);
    enter('judging the boards');
    const studies = options.quick ? first : await studyFurther(first, requirements, analysis, room);
    const verdicts = judgePack(studies, requirements);
    const procurement = await studyProcurement(pack, studies, verdicts, room);
    enter('checking the engine against published values');
    const evidence = runChecks(allChecks);
    const accuracy = accuracyTable();
    enter('composing the pages');
    const { programVersion } = options;
    const parts = { pack, studies, verdicts, evidence, methods, accuracy, programVersion, ...found, procurement };
    const files = await drawPack(parts, effects, enter);
    enter('publishing');
    // A hash over files with hidden entries would confirm a guess at them.
    const packHash = pack.audience === undefined ? hashOfSet(reads) : sha256(JSON.stringify(shown.pack));
    const summary = summaryOf(pack, verdicts, packHash, options.programVersion);
    const publication = output.publishRevision(summary, files, renderTop);
    return { kind: 'built', summary, verdicts, publication };
  } catch (error) {
    if (error instanceof OutputError) throw error;
    throw new Fault(stage, hashOfSet(reads), error);
  } finally {
    effects.progress.end();
    output?.close();
  }
}

type Enter = (stage: string, total?: number) => void;

/** The pack, or its copy for an audience: what the copy hides is gone before anything is calculated. */
function shownPack(
  pack: Pack,
  { audience, packPath }: BuildOptions,
): { readonly pack: Pack } | { readonly problem: Problem } {
  if (audience === undefined) return { pack };
  const found = audienceOf(pack, packPath, audience);
  return 'hide' in found ? { pack: packFor(pack, found) } : { problem: found };
}

/** Boards that ask for it get their layout here, once: all that follows speaks of the same copper. */
async function workedOut(pack: Pack, { workers, progress, enter }: Room): Promise<Pack> {
  const total = boardsToReady(pack).length;
  if (total > 0) enter('working out layouts', total);
  return readyPack(pack, workers, () => progress.step());
}

async function drawPack(parts: PackInput, effects: BuildEffects, enter: Enter): Promise<Files> {
  const document = composePack(parts);
  const data = Object.entries({ ...packData(parts), ...dataSchemas() }).map(
    ([path, content]) => [path, `${JSON.stringify(content, null, 1)}\n`] as const,
  );
  const wholePack = packPage(parts, new Map(data.map(([path, text]) => [path, sha256(text)])));
  const dossiers = document.pages.filter((page) => page.kind === 'dossier');
  enter('writing the pages');
  const files = new Map<string, Uint8Array | string>([...(await renderPack(document)), ...data]);
  const created = new Date(effects.epoch === undefined ? `${parts.pack.date}T00:00:00Z` : effects.epoch * 1000);
  for (const [path, content] of await supplierFiles(parts.pack, parts.procurement, created)) files.set(path, content);
  enter('drawing the PDFs', dossiers.length + 1);
  const titles = new Map(document.pages.map((page) => [page.id, page.title]));
  const context = {
    packTitle: document.title,
    revision: document.revision,
    date: created,
    pageTitle: (id: string) => titles.get(id),
  };
  for (const page of [wholePack, ...dossiers]) {
    const board = page === wholePack ? undefined : page.id.replace(/^board\//, '');
    const path = board === undefined ? PACK_PDF : boardPdf(board);
    const attachments = [resultsAttachment(board === undefined ? PACK_DATA : boardData(board), files)];
    files.set(path, await renderPdf(page, { ...context, attachments }));
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
  const marking = markingOf(pack);
  const boards = pack.boards.map((board, i) => ({ id: board.id, title: board.title, status: verdicts[i].overall }));
  return {
    format: 1,
    packId,
    title,
    documentNumber,
    revision,
    date,
    status,
    marking,
    packHash,
    programVersion,
    boards,
  };
}
