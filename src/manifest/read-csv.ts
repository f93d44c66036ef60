import { quoted } from '../quantity/index.js';
import type { Problem } from './problem.js';
import { type Mark, problemAt, type Source } from './tree.js';

/** One field of a record, with its place; quotes removed, doubled quotes resolved. */
export interface Field {
  readonly mark: Mark;
  readonly text: string;
}

/** Hand-written tables are far below this; a larger one is a mistake or an attack. */
const MOST_FIELDS = 100_000;

/**
 * Records of a CSV text (RFC 4180): fields parted by commas, records by CRLF, LF or CR; a field in quotes may hold
 * commas, line ends and doubled quotes. Empty lines are skipped. Every record has as many fields as the first.
 */
export function readCsv(
  source: Source,
): { readonly records: readonly (readonly Field[])[] } | { readonly problems: readonly Problem[] } {
  const { text } = source;
  const problems: Problem[] = [];
  const records: Field[][] = [];
  const report = (offset: number, found: string, allowed: string, fix?: string) =>
    problems.push(problemAt({ source, offset }, '', found, allowed, fix));
  let at = 0;
  let count = 0;
  while (at < text.length && problems.length === 0) {
    const record: Field[] = [];
    for (;;) {
      const field = text[at] === '"' ? quotedField(source, at) : plainField(source, at);
      if ('problem' in field) {
        problems.push(field.problem);
        return { problems };
      }
      record.push({ mark: { source, offset: at }, text: field.text });
      at = field.end;
      count += 1;
      if (count > MOST_FIELDS) {
        report(at, `more than ${MOST_FIELDS} fields`, `a table has at most ${MOST_FIELDS} fields`);
        return { problems };
      }
      if (text[at] !== ',') break;
      at += 1;
    }
    at += text.startsWith('\r\n', at) ? 2 : 1;
    if (record.length > 1 || record[0]!.text !== '') records.push(record);
  }
  const [header] = records;
  if (header === undefined) {
    report(0, 'an empty file', 'a table has a header line and a line for each entry');
    return { problems };
  }
  for (const record of records) {
    if (record.length === header.length) continue;
    const where = record[Math.min(record.length, header.length) - 1]!.mark.offset;
    const fix = record.length > header.length ? 'A field that holds a comma stands in quotes.' : undefined;
    report(where, `${record.length} fields`, `every line has as many as the header, ${header.length}`, fix);
  }
  return problems.length > 0 ? { problems } : { records };
}

type Scanned = { readonly text: string; readonly end: number } | { readonly problem: Problem };

function plainField(source: Source, start: number): Scanned {
  const { text } = source;
  let end = start;
  while (end < text.length && !',\r\n'.includes(text[end]!)) {
    if (text[end] === '"') {
      const mark = { source, offset: end };
      const allowed = 'a field with a quote in it stands in quotes itself, and the quote is doubled';
      return { problem: problemAt(mark, '', 'a quote inside a field', allowed) };
    }
    end += 1;
  }
  return { text: text.slice(start, end), end };
}

function quotedField(source: Source, start: number): Scanned {
  const { text } = source;
  let value = '';
  let at = start + 1;
  for (;;) {
    const quote = text.indexOf('"', at);
    if (quote < 0) {
      const allowed = 'a field that begins with a quote ends with one';
      return { problem: problemAt({ source, offset: start }, '', 'a quote that is never closed', allowed) };
    }
    value += text.slice(at, quote);
    at = quote + 1;
    if (text[at] !== '"') break;
    value += '"';
    at += 1;
  }
  if (at < text.length && !',\r\n'.includes(text[at]!)) {
    const rest = text.slice(at, at + 20).split(/[\r\n,]/)[0]!;
    const allowed = 'after the closing quote of a field comes a comma or the end of the line';
    return { problem: problemAt({ source, offset: at }, '', `${quoted(rest)} after a quoted field`, allowed) };
  }
  return { text: value, end: at };
}
