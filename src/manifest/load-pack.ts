import type { z } from 'zod';
import { audienceRules } from './audience-rules.js';
import { chainBoards } from './board-chain.js';
import { boardRules } from './board-rules.js';
import { checkDocument } from './check.js';
import { type BoardDocument, boardDocument } from './documents/board-document.js';
import {
  type FinishDocument,
  type FoilDocument,
  finishesDocument,
  foilsDocument,
  type LaminateDocument,
  laminatesDocument,
} from './documents/library-documents.js';
import { type PackDocument, packDocument } from './documents/pack-document.js';
import { type RequirementsDocument, requirementsDocument } from './documents/requirement-document.js';
import { type ReviewDocument, reviewDocument } from './documents/review-document.js';
import { si } from './figures.js';
import type { PackFiles } from './files.js';
import { finishRules, foilRules, laminateRules } from './library-rules.js';
import { materialReferences } from './material-references.js';
import { MeasuredTextures } from './measured-textures.js';
import type { Board, Pack, PreviousRevision, Review } from './model.js';
import { openBoards, uniqueId } from './open-boards.js';
import { type OpenFile, Reader } from './open-files.js';
import { openProcurement, procurementFor } from './open-procurement.js';
import { packRules } from './pack-rules.js';
import { type Path, type Problem, sortProblems } from './problem.js';
import { groupReferences, requirementRules } from './requirement-rules.js';
import { boardOf, type Libraries } from './resolve-board.js';
import { finishOf, foilOf, laminateOf } from './resolve-library.js';
import { requirementsOf } from './resolve-requirements.js';
import { reviewOf } from './resolve-review.js';
import { type ReviewContext, reviewRules } from './review-rules.js';
import type { KnownIds } from './rules.js';
import { TransitionFiles } from './transitions.js';
import { child, type Node, nodeAt, problemAt, toData } from './tree.js';

export type LoadResult = { readonly pack: Pack } | { readonly problems: readonly Problem[] };

/** A document whose shape fits its schema, with the file it stands in. */
interface Checked<D> {
  readonly file: OpenFile;
  readonly doc: D;
}

/**
 * Reads a pack and everything it refers to.
 *
 * @param files     reads files under the root folder
 * @param packPath  path of the pack file, relative to the root, forward slashes
 * @returns         the typed pack, or all problems of all files, sorted by place
 */
export function loadPack(files: PackFiles, packPath: string): LoadResult {
  const reader = new Reader(files);
  const packFile = reader.openPack(packPath);
  if (packFile === undefined) return { problems: sortProblems(reader.problems) };
  const { problems } = reader;
  const pack = checked<PackDocument>(packDocument, packFile, problems);
  if (pack) problems.push(...packRules(packFile.root, pack.doc));

  const laminates = openLibrary<{ laminates: LaminateDocument[] }>(
    reader,
    packFile,
    'laminates',
    laminatesDocument,
    laminateRules,
  );
  const foils = openLibrary<{ foils: FoilDocument[] }>(reader, packFile, 'foils', foilsDocument, foilRules);
  const measured = new MeasuredTextures(reader);
  for (const { file, doc } of foils.checked) {
    doc.foils.forEach((foil, i) => {
      measured.read(file.root, ['foils', i, 'treated_face'], foil.treated_face);
      measured.read(file.root, ['foils', i, 'untreated_face'], foil.untreated_face);
    });
  }
  const finishes = openLibrary<{ finishes: FinishDocument[] }>(
    reader,
    packFile,
    'finishes',
    finishesDocument,
    finishRules,
  );

  const requirementFiles = reader.openReferences(packFile, ['requirements']);
  const sets = requirementFiles.files.map((file) =>
    checked<RequirementsDocument>(requirementsDocument, file, problems),
  );
  for (const set of sets) if (set) problems.push(...requirementRules(set.file.root, set.doc));

  const boards = openBoards(reader, packFile);
  const { chained, problems: chainProblems } = chainBoards(boards.files, boards.complete);
  problems.push(...chainProblems);
  const materials = { laminates: laminates.known, foils: foils.known, finishes: finishes.known };
  for (const board of boards.files) problems.push(...materialReferences(board.root, materials));
  const context = {
    ...(pack ? { frequencyStep: si(pack.doc.analysis.frequency_step, 'frequency') } : {}),
  };
  const transitions = new TransitionFiles(reader);
  const complete = chained.flatMap((board) => {
    const merged = checked<BoardDocument>(boardDocument, { path: board.file.path, root: board.root }, problems);
    if (!merged) return [];
    problems.push(...boardRules(board.root, merged.doc, context));
    transitions.read(board.root, merged.doc.feed.network?.transition, bandOf(merged.doc));
    const outer = merged.doc.stack_up.strip.outer_face.texture;
    measured.read(board.root, ['stack_up', 'strip', 'outer_face', 'texture'], outer);
    return [{ doc: merged.doc, board }];
  });

  const set = sets[0];
  const groups = complete.flatMap(({ doc }) => doc.array.groups ?? []).map(({ id }) => id);
  if (set) {
    const known = { ids: new Set(groups), complete: boards.complete && complete.length === boards.files.length };
    problems.push(...groupReferences(set.file.root, set.doc, known));
  }
  const boardIds = boards.files.flatMap((file) => file.id ?? []);
  const requirementIds = set?.doc.requirements.map((requirement) => requirement.id) ?? [];
  const review = openReview(reader, packFile, {
    boards: { ids: new Set(boardIds), complete: boards.complete && boardIds.length === boards.files.length },
    requirements: { ids: new Set(requirementIds), complete: set !== undefined },
    ...(pack ? { revision: pack.doc.revision, date: pack.doc.date } : {}),
  });
  const previous = previousOf(reader, packFile, pack?.doc.previous);
  const procurement = openProcurement(reader, packFile, checked);
  if (problems.length > 0 || !pack || !set) return { problems: sortProblems(problems) };
  const libraries: Libraries = {
    laminates: byId(laminates.checked, (d) => d.laminates, laminateOf),
    foils: byId(
      foils.checked,
      (d) => d.foils,
      (foil, file) => foilOf(foil, file, measured.all),
    ),
    finishes: byId(finishes.checked, (d) => d.finishes, finishOf),
    measurements: measured.all,
    transitions: transitions.all,
  };
  const resolved = complete.map(({ doc, board }) => boardOf(doc, { ...board, file: board.file.path }, libraries));
  const parts = { boards: resolved, requirements: requirementsOf(set.doc, set.file.path), review, previous };
  const made = packOf(pack.doc, parts, reader);
  const hiding = audienceRules(packFile.root, pack.doc.audiences ?? [], made);
  if (hiding.length > 0) return { problems: sortProblems(hiding) };
  if (!procurement) return { pack: made };
  const asked = procurementFor(procurement, made);
  if ('problems' in asked) return { problems: sortProblems(asked.problems) };
  return { pack: { ...made, procurement: asked.procurement } };
}

const bandOf = ({ band }: BoardDocument): Board['band'] => ({
  low: si(band.low, 'frequency'),
  high: si(band.high, 'frequency'),
});

function checked<D>(schema: z.ZodType, file: OpenFile, problems: Problem[]): Checked<D> | undefined {
  const found = checkDocument(schema, file.root);
  problems.push(...found);
  if (found.length > 0) return undefined;
  // The walk reports in our words; zod has the last one, so that no shape slips through a gap between the two.
  const parsed = schema.safeParse(toData(file.root));
  if (parsed.success) return { file, doc: parsed.data as D };
  for (const issue of parsed.error.issues) {
    const mark = nodeAt(file.root, issue.path as Path)?.mark ?? file.root.mark;
    problems.push(problemAt(mark, issue.path.join('.'), 'something that does not fit', issue.message));
  }
  return undefined;
}

function openLibrary<D>(
  reader: Reader,
  packFile: OpenFile,
  kind: 'laminates' | 'foils' | 'finishes',
  schema: z.ZodType,
  rules: (root: Node, doc: never) => readonly Problem[],
): { readonly checked: readonly Checked<D>[]; readonly known: KnownIds } {
  const { files, complete } = reader.openReferences(packFile, ['libraries', kind]);
  const ids = new Map<string, string>();
  const documents: Checked<D>[] = [];
  for (const file of files) {
    const one = checked<D>(schema, file, reader.problems);
    if (one) {
      reader.problems.push(...rules(file.root, one.doc as never));
      documents.push(one);
    }
    const list = child(file.root, kind);
    for (const [i, item] of (list?.kind === 'list' ? list.items : []).entries()) {
      uniqueId(item, `${kind}[${i}].id`, file.path, ids, `the ${kind} of a pack have one id each`, reader.problems);
    }
  }
  return { checked: documents, known: { ids: new Set(ids.keys()), complete } };
}

function openReview(reader: Reader, packFile: OpenFile, context: ReviewContext): Review | undefined {
  const [file] = reader.openReferences(packFile, ['review']).files;
  const one = file && checked<ReviewDocument>(reviewDocument, file, reader.problems);
  if (!one) return undefined;
  reader.problems.push(...reviewRules(one.file.root, one.doc, context));
  return reviewOf(one.doc, one.file.path);
}

function previousOf(
  reader: Reader,
  packFile: OpenFile,
  previous: PackDocument['previous'],
): PreviousRevision | undefined {
  if (previous?.revision !== undefined) return { revision: previous.revision };
  const file = reader.openData(packFile, ['previous', 'data']);
  return file === undefined ? undefined : { file };
}

function byId<D, I, M>(
  documents: readonly Checked<D>[],
  items: (doc: D) => readonly (I & { readonly id: string })[],
  make: (item: I, file: string) => M,
): ReadonlyMap<string, M> {
  return new Map(
    documents.flatMap(({ doc, file }) => items(doc).map((item) => [item.id, make(item, file.path)] as const)),
  );
}

const STATUS = { draft: 'draft', for_review: 'for review', released: 'released' } as const;

interface Parts {
  readonly boards: readonly Board[];
  readonly requirements: Pack['requirements'];
  readonly review: Review | undefined;
  readonly previous: PreviousRevision | undefined;
}

const audienceFrom = ({ id, marking, hide }: NonNullable<PackDocument['audiences']>[number]) => ({
  id,
  ...(marking === undefined ? {} : { marking }),
  hide,
});

function packOf(doc: PackDocument, { boards, requirements, review, previous }: Parts, reader: Reader): Pack {
  return {
    id: doc.id,
    title: doc.title,
    documentNumber: doc.document_number,
    revision: doc.revision,
    date: doc.date,
    status: STATUS[doc.status],
    authors: doc.authors,
    owner: doc.owner,
    ...(doc.notice === undefined ? {} : { notice: doc.notice }),
    ...(doc.marking === undefined ? {} : { marking: doc.marking }),
    ...(review === undefined ? {} : { review }),
    ...(previous === undefined ? {} : { previous }),
    ...(doc.audiences === undefined ? {} : { audiences: doc.audiences.map(audienceFrom) }),
    boards,
    requirements,
    analysis: {
      roughnessModel: doc.analysis.roughness_model ?? 'band',
      frequencyStep: si(doc.analysis.frequency_step, 'frequency'),
      fullWave: doc.analysis.full_wave !== 'off',
    },
    inputs: reader.inputs(),
  };
}
