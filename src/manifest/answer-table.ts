import type { AnswersDocument } from './documents/procurement-document.js';
import { answersDocument } from './documents/procurement-document.js';
import { nearest } from './nearest.js';
import type { Problem } from './problem.js';
import { type Field, readCsv } from './read-csv.js';
import { readText } from './read-text.js';
import type { ReadResult } from './read-yaml.js';
import { elementOf, shapeOf, typeOf } from './schema-walk.js';
import { type Entry, type MapNode, type Node, problemAt } from './tree.js';

/** Columns that a returned sheet must still have; the rest of what was sent may be dropped. */
const NEEDED = ['item', 'unit', 'guaranteed_lower', 'guaranteed_upper', 'typical', 'not_offered', 'method'];
/** Columns that are sent for reading only. */
export const READ_ONLY = ['what', 'worst_permitted', 'why', 'definition', 'verification', 'sample_size'] as const;

type Row = AnswersDocument[number];
const shape = shapeOf(elementOf(answersDocument)!)!;

/**
 * A returned sheet to a list of maps whose nodes keep the place of their cell. Empty cells are no answer and left out.
 * An apostrophe that the sheet put before a sign which spreadsheets take for a formula is taken off again.
 */
export function readAnswerTable(path: string, bytes: Uint8Array): ReadResult {
  const text = readText(path, bytes, 'CSV');
  if ('problems' in text) return text;
  const read = readCsv(text.source);
  if ('problems' in read) return read;
  const [header, ...rows] = read.records as readonly [readonly Field[], ...(readonly Field[])[]];
  const problems: Problem[] = [];
  checkHeader(header, problems);
  if (problems.length > 0) return { problems };
  return { root: { kind: 'list', mark: header[0]!.mark, items: rows.map((row) => rowNode(header, row)) } };
}

const nameOf = (field: Field): string => field.text.trim().toLowerCase();

function checkHeader(header: readonly Field[], problems: Problem[]): void {
  const names = header.map(nameOf);
  const known = [...Object.keys(shape), ...READ_ONLY];
  if (header.length === 1 && names[0]!.includes(';')) {
    const allowed = 'the columns of the sheet, parted by commas';
    const fix = 'Save the table with commas between columns and points in numbers.';
    problems.push(problemAt(header[0]!.mark, '', 'columns parted by semicolons', allowed, fix));
    return;
  }
  header.forEach((field, i) => {
    const name = names[i]!;
    const report = (found: string, allowed: string, fix?: string) =>
      problems.push(problemAt(field.mark, '', found, allowed, fix));
    if (names.indexOf(name) < i) report(`the column "${name}" a second time`, 'a column stands once');
    else if (!known.includes(name)) {
      const close = nearest(name, known);
      report(
        `the unknown column "${name}"`,
        `the columns are those of the sheet: ${known.join(', ')}`,
        close && `Did you mean ${close}?`,
      );
    }
  });
  for (const name of NEEDED) {
    if (names.includes(name)) continue;
    problems.push(
      problemAt(header[0]!.mark, '', `no column "${name}"`, 'a returned sheet keeps the columns of the answer'),
    );
  }
}

function rowNode(header: readonly Field[], row: readonly Field[]): MapNode {
  const entries = new Map<string, Entry>();
  header.forEach((column, i) => {
    const name = nameOf(column);
    const cell = row[i]!;
    const text = cell.text.trim().replace(/^'(?=[=+\-@])/, '');
    if (text === '' || !Object.hasOwn(shape, name)) return;
    entries.set(name, { keyMark: cell.mark, value: cellNode(cell, text, name as keyof Row) });
  });
  return { kind: 'map', mark: row[0]!.mark, entries };
}

function cellNode({ mark }: Field, text: string, name: keyof Row): Node {
  const isNumber = typeOf(shape[name]!) === 'number' && /^[+-]?(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d+)?$/.test(text);
  if (name === 'not_offered')
    return { kind: 'scalar', mark, text, value: /^(x|y|yes|true)$/i.test(text) ? 'yes' : text.toLowerCase() };
  return { kind: 'scalar', mark, text, value: isNumber ? Number(text) : text };
}
