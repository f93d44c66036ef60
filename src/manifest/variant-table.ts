import type { z } from 'zod';
import { quoted } from '../quantity/index.js';
import { leaves } from './documents/fields.js';
import { variantDocument } from './documents/variant-document.js';
import { nearest } from './nearest.js';
import type { Problem } from './problem.js';
import { type Field, readCsv } from './read-csv.js';
import { readText } from './read-text.js';
import type { ReadResult } from './read-yaml.js';
import { bare, elementOf, optionsOf, shapeOf } from './schema-walk.js';
import { type Entry, type MapNode, type Node, problemAt } from './tree.js';

/** A table is a list of candidates for one comparison, not a data base. */
const MOST_ROWS = 100;
/** Columns that every table begins with, in this order. */
const FIRST = ['id', 'title', 'based_on'];
/** A cell that drops the inherited key, as an empty value does in YAML; an empty cell inherits. */
const DROP = '~';
/** Parts the entries of a list within one cell. */
const BETWEEN_ENTRIES = ';';

interface Column {
  readonly schema: z.ZodType;
  /** True when a cell holds a list of plain values. */
  readonly list: boolean;
  /** A cell without semicolon is then no list of one entry but a plain value: so many, in place of which. */
  readonly orOne?: boolean;
}

/** Manifest path → what a cell of that column holds. Lists of maps have no column. */
function columnsOf(schema: z.ZodType, path: string, columns: Map<string, Column>): Map<string, Column> {
  const plain = bare(schema);
  const shape = leaves.get(plain) ? undefined : shapeOf(plain);
  const options = leaves.get(plain) || shape ? undefined : optionsOf(plain);
  if (shape) {
    for (const [key, inner] of Object.entries(shape)) columnsOf(inner, path === '' ? key : `${path}.${key}`, columns);
  } else if (options) {
    for (const option of options) columnsOf(option, path, columns);
    if (options.every(isPlain)) {
      columns.set(path, { schema: plain, list: false });
    }
    const column = columns.get(path);
    if (column?.list && options.some(isPlain)) columns.set(path, { ...column, orOne: true });
  } else {
    const element = leaves.get(plain) ? undefined : elementOf(plain);
    const nested = element !== undefined && (shapeOf(element) || elementOf(element) || optionsOf(element));
    if (!nested) columns.set(path, { schema: element ?? plain, list: element !== undefined });
  }
  return columns;
}

const isPlain = (schema: z.ZodType): boolean => shapeOf(schema) === undefined && elementOf(schema) === undefined;

let known: ReadonlyMap<string, Column> | undefined;
const knownColumns = () => (known ??= columnsOf(variantDocument, '', new Map()));

/**
 * A table of variants to a list of maps, each as if its row were a YAML variant: columns are manifest paths, an empty
 * cell inherits. Nodes keep the place of their cell, so that whatever is wrong with a board is reported there.
 */
export function readVariantTable(path: string, bytes: Uint8Array): ReadResult {
  const text = readText(path, bytes, 'CSV');
  if ('problems' in text) return text;
  const read = readCsv(text.source);
  if ('problems' in read) return read;
  const [header, ...rows] = read.records as readonly [readonly Field[], ...(readonly Field[])[]];
  const problems: Problem[] = [];
  checkHeader(header, problems);
  if (rows.length === 0) {
    problems.push(problemAt(header[0]!.mark, '', 'a header and no row', 'a table has a row for each board'));
  }
  if (rows.length > MOST_ROWS) {
    const found = `${rows.length} rows`;
    problems.push(problemAt(rows[MOST_ROWS]![0]!.mark, '', found, `a table has at most ${MOST_ROWS} rows`));
  }
  if (problems.length > 0) return { problems };
  const items = rows.map((row) => rowNode(header, row, problems));
  if (problems.length > 0) return { problems };
  return { root: { kind: 'list', mark: header[0]!.mark, items } };
}

const nameOf = (field: Field): string => field.text.trim();

function checkHeader(header: readonly Field[], problems: Problem[]): void {
  const columns = knownColumns();
  if (header.length === 1 && nameOf(header[0]!).includes(';')) {
    const allowed = 'the columns of a table are parted by commas';
    problems.push(problemAt(header[0]!.mark, '', 'columns parted by semicolons', allowed));
    return;
  }
  FIRST.forEach((name, i) => {
    const field = header[i];
    if (field !== undefined && nameOf(field) === name) return;
    const found = field === undefined ? `no column ${quoted(name)}` : `the column ${quoted(nameOf(field))}`;
    problems.push(
      problemAt((field ?? header[0]!).mark, '', found, `a table begins with the columns ${FIRST.join(', ')}`),
    );
  });
  if (problems.length > 0) return;
  const seen = new Set<string>();
  for (const field of header) {
    const name = nameOf(field);
    if (seen.has(name)) {
      problems.push(problemAt(field.mark, name, `the column ${quoted(name)} a second time`, 'a column stands once'));
    } else if (!columns.has(name)) {
      const close = nearest(name, columns.keys());
      const allowed =
        name === 'array.patches' || name === 'declared'
          ? 'a column holds one plain value or a list of them; lists of maps are written in a board file'
          : 'a column is named by the path of a plain value in a board file, for instance stack_up.strip.foil';
      const found = `the unknown column ${quoted(name)}`;
      problems.push(problemAt(field.mark, '', found, allowed, close && `Did you mean ${close}?`));
    }
    seen.add(name);
  }
}

type Branch = MapNode & { readonly entries: Map<string, Entry> };
const branch = (mark: Field['mark']): Branch => ({ kind: 'map', mark, entries: new Map() });

function rowNode(header: readonly Field[], row: readonly Field[], problems: Problem[]): MapNode {
  const root = branch(row[0]!.mark);
  header.forEach((column, i) => {
    const cell = row[i]!;
    const name = nameOf(column);
    if (cell.text.trim() === '') return;
    const keys = name.split('.');
    const last = keys.pop()!;
    const holder = keys.reduce<Branch | undefined>((map, key) => map && branchIn(map, key, cell), root);
    if (holder === undefined || holder.entries.has(last)) clash(cell, name, problems);
    else holder.entries.set(last, { keyMark: cell.mark, value: cellNode(cell, knownColumns().get(name)!) });
  });
  return root;
}

/** The map under a key, made where there is none yet; undefined where something else stands. */
function branchIn(map: Branch, key: string, { mark }: Field): Branch | undefined {
  const inner = map.entries.get(key)?.value ?? branch(mark);
  if (inner.kind !== 'map') return undefined;
  map.entries.set(key, { keyMark: mark, value: inner });
  return inner as Branch;
}

/** `spread` and `spread.minus` filled in the same row: a value cannot be one distance and a map. */
function clash(cell: Field, name: string, problems: Problem[]): void {
  const allowed = 'a column and a part of it are not filled in the same row';
  problems.push(problemAt(cell.mark, name, quoted(cell.text), allowed));
}

function cellNode(cell: Field, { schema, list, orOne = false }: Column): Node {
  const text = cell.text.trim();
  if (text === DROP) return { kind: 'scalar', mark: cell.mark, text, value: null };
  if (!list || (orOne && !text.includes(BETWEEN_ENTRIES))) return scalarNode(cell, text, schema);
  const items = text.split(BETWEEN_ENTRIES).map((item) => scalarNode(cell, item.trim(), schema));
  return { kind: 'list', mark: cell.mark, items };
}

/** A number or truth value only where the manifest has one: elsewhere `2` is the text that it is in quotes. */
function scalarNode({ mark }: Field, text: string, schema: z.ZodType): Node {
  const scalar = (value: string | number | boolean): Node => ({ kind: 'scalar', mark, text, value });
  if (schema.safeParse(text).success) return scalar(text);
  if (/^[+-]?(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d+)?$/.test(text)) return scalar(Number(text));
  return scalar(text === 'true' ? true : text === 'false' ? false : text);
}

/** What a missing key means in a table: a figure is stated whole, or not at all. */
export function inTable(problem: Problem): Problem {
  const key = /^no key "(.+)"$/.exec(problem.found)?.[1];
  if (key === undefined || problem.fix !== undefined) return problem;
  const fix =
    problem.path === ''
      ? `Fill the column ${key}.`
      : `What is stated here is stated whole: fill the column ${problem.path}.${key} as well.`;
  return { ...problem, fix };
}
