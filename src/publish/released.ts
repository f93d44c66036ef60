import { changesBetween } from '../dossier/changes.js';
import { type RevisionData, readRevisionData } from '../dossier/previous.js';
import type { Files } from './files.js';
import { type RevisionSummary, readSummary, revisionFile } from './revision.js';

/** Reads a file of an existing revision by its path below the folder; undefined where there is none. */
export type ReadRevision = (path: string) => Uint8Array | undefined;

/** True where the revision that lies there says that it is released, whichever version of the program wrote it. */
export function isReleased(read: ReadRevision): boolean {
  const said = [read(revisionFile), read(packFile)].map((bytes) => bytes && parsed(bytes));
  const statuses = said.flatMap((json) => [field(json, 'status'), field(field(json, 'pack'), 'status')]);
  return statuses.includes('released');
}

/**
 * What would change if a released revision were built again: one line per kind, none where inputs, program and figures
 * are the same. Pages and PDFs are not compared: they follow from these.
 */
export function releasedChanges(read: ReadRevision, summary: RevisionSummary, files: Files): readonly string[] {
  const stored = read(revisionFile);
  const before = stored && readSummary(stored);
  const old = dataOf(read(packFile));
  const next = dataOf(bytesOf(files.get(packFile)));
  if (before === undefined || old === undefined || next === undefined) {
    return ['its summary or data cannot be read, so nothing shows that it would stay the same'];
  }
  const { inputs, flips, boards, requirements } = changesBetween(old, next);
  const listed = (['added', 'removed', 'changed'] as const).flatMap((kind) =>
    inputs[kind].length === 0 ? [] : [`${inputs[kind].join(', ')} ${kind}`],
  );
  const inputText = listed.length > 0 ? listed.join('; ') : before.packHash === summary.packHash ? '' : 'changed';
  const sets = [...listLines('boards', boards), ...listLines('requirements', requirements)];
  return [
    ...(before.status === summary.status ? [] : [`status: ${before.status}, now ${summary.status}`]),
    ...(inputText === '' ? [] : [`input files: ${inputText}`]),
    ...(before.programVersion === summary.programVersion
      ? []
      : [`program: boardcase ${before.programVersion}, now ${summary.programVersion}`]),
    ...sets,
    ...listLine('figures', figureFiles(read, files)),
    ...listLine(
      'verdicts',
      flips.map(
        ({ boardId, requirementId, from, to }) =>
          `${boardId} ${requirementId ?? 'overall'} ${standText(from)}, now ${standText(to)}`,
      ),
    ),
  ];
}

const packFile = 'data/pack.json';

const listLine = (name: string, items: readonly string[]): readonly string[] =>
  items.length === 0 ? [] : [`${name}: ${items.join('; ')}`];

const listLines = (
  name: string,
  { added, removed }: { readonly added: readonly string[]; readonly removed: readonly string[] },
): readonly string[] => [
  ...(added.length === 0 ? [] : [`${name} added: ${added.join(', ')}`]),
  ...(removed.length === 0 ? [] : [`${name} removed: ${removed.join(', ')}`]),
];

const standText = ({ status, calculated }: { readonly status: string; readonly calculated?: string | undefined }) =>
  calculated === undefined ? status : `${status} (calculated: ${calculated})`;

function dataOf(bytes: Uint8Array | undefined): RevisionData | undefined {
  const found = bytes && readRevisionData(bytes);
  return found === undefined || typeof found === 'string' ? undefined : found.data;
}

function bytesOf(content: Uint8Array | string | undefined): Uint8Array | undefined {
  return typeof content === 'string' ? Buffer.from(content) : content;
}

/** Data files whose figures would differ, would come or would go. */
function figureFiles(read: ReadRevision, files: Files): readonly string[] {
  const old = dataNames(parsed(read(packFile) ?? new Uint8Array()));
  const next = dataNames(parsed(bytesOf(files.get(packFile)) ?? new Uint8Array()));
  const names = [...new Set([packFile, ...old, ...next])];
  return names.filter((name) => figuresOf(read(name)) !== figuresOf(bytesOf(files.get(name))));
}

/** Names of the data files of the boards, as the data of the pack list them. */
function dataNames(json: unknown): readonly string[] {
  const boards = field(json, 'boards');
  if (!Array.isArray(boards)) return [];
  return boards.flatMap((board) => {
    const name = field(board, 'data');
    return typeof name === 'string' ? [`data/${name}`] : [];
  });
}

/** What data files say beside figures: inputs and program are named on their own, the words of people are inputs. */
const notFigures: ReadonlySet<string> = new Set([
  'programVersion',
  'marking',
  'notices',
  'pack',
  'review',
  'inputs',
  'inputsHash',
]);

/** The figures of a data file in one text, so that equal texts mean equal figures. */
function figuresOf(bytes: Uint8Array | undefined): string | undefined {
  if (bytes === undefined) return undefined;
  return JSON.stringify(parsed(bytes), (key, value) => (notFigures.has(key) ? undefined : value));
}

function parsed(bytes: Uint8Array): unknown {
  try {
    return JSON.parse(Buffer.from(bytes).toString());
  } catch {
    return undefined;
  }
}

function field(json: unknown, name: string): unknown {
  return typeof json === 'object' && json !== null && !Array.isArray(json)
    ? (json as Readonly<Record<string, unknown>>)[name]
    : undefined;
}
