import { parseQuantity, quoted, toBase, unitNamed } from '../../quantity/index.js';
import { TextureFault } from './fault.js';
import {
  MOST_POINTS,
  readGuarded,
  requireHeights,
  requireSize,
  requireSpacing,
  type TextureFile,
  type TextureFileResult,
} from './texture-file.js';

const KEYS = ['texture', 'spacing', 'spacing_x', 'spacing_y', 'unit', 'instrument', 'note', 'heights'] as const;
type Key = (typeof KEYS)[number];
const LONGEST_HEADER = 40;
const LONGEST_TEXT = 400;
const NUMBER = /^[+-]?(?:[0-9]+(?:\.[0-9]*)?|\.[0-9]+)(?:[eE][+-]?[0-9]+)?$/;

/** Characters; longer lines would be taken apart at a cost before they could be refused. */
const LONGEST_LINE = 8 * 1024 * 1024;

interface Header {
  readonly values: ReadonlyMap<Key, { readonly text: string; readonly line: number }>;
  /** Line that says `heights`. */
  readonly end: number;
  readonly separator: ',' | ';' | '\t';
}

/**
 * Heights as text with separated values. A few lines of header, one key and its value each, then `heights` on a line of
 * its own, then the numbers:
 *
 *     texture,map            or: texture,profile
 *     spacing,0.5 um         of a map also spacing_x and spacing_y
 *     unit,um                of the heights
 *     instrument,...         optional; so is note
 *     heights
 *     0.12,0.10,,0.31        a row of the map; a profile may take any number of lines
 *
 * Separators are commas, semicolons or tabs, the decimal sign is a point. An empty field or `nan` is a point that was not
 * measured. UTF-8.
 */
export function readTextureCsv(path: string, bytes: Uint8Array): TextureFileResult {
  return readGuarded(path, bytes, () => {
    const lines = linesOf(textOf(bytes));
    const header = readHeader(lines);
    const kind = required(header, 'texture');
    if (kind.text !== 'profile' && kind.text !== 'map')
      throw new TextureFault(quoted(kind.text), 'a texture is a profile or a map', at('texture', kind.line));
    const unit = required(header, 'unit');
    const known = unitNamed('length', unit.text);
    if (!known) throw new TextureFault(quoted(unit.text), 'heights are in nm, um, mm, mil or m', at('unit', unit.line));
    const about = {
      ...described(header, 'instrument'),
      ...described(header, 'note'),
    };
    const rows = readRows(lines, header, (text) => toBase(text, known));
    return { heights: kind.text === 'profile' ? profileOf(header, rows) : mapOf(header, rows), ...about };
  });
}

interface Line {
  /** From 1. */
  readonly line: number;
  readonly text: string;
}

/** One line after the other, so that a file of line ends costs no memory. */
function* linesOf(text: string): Generator<Line> {
  const ends = /\r\n|\n|\r/g;
  for (let start = 0, line = 1; start < text.length; line++) {
    ends.lastIndex = start;
    const end = ends.exec(text);
    const stop = end ? end.index : text.length;
    if (stop - start > LONGEST_LINE)
      throw new TextureFault(`${stop - start} characters`, `a line has at most ${LONGEST_LINE}`, { line });
    yield { line, text: text.slice(start, stop) };
    start = end ? ends.lastIndex : text.length;
  }
}

const at = (path: string, line: number) => ({ path, line });

function textOf(bytes: Uint8Array): string {
  try {
    const text = new TextDecoder('utf-8', { fatal: true }).decode(bytes);
    if (!text.includes('\0')) return text;
  } catch {
    // Falls through to the same fault.
  }
  throw new TextureFault('bytes that are not UTF-8 text', 'a table of heights is a text file in UTF-8');
}

function readHeader(lines: Generator<Line>): Header {
  const values = new Map<Key, { text: string; line: number }>();
  let separator: Header['separator'] | undefined;
  for (let next = lines.next(); !next.done && next.value.line <= LONGEST_HEADER; next = lines.next()) {
    const { line, text } = next.value;
    if (text.trim() === '') continue;
    separator ??= /^[^,;\t]*([,;\t])/.exec(text)?.[1] as Header['separator'] | undefined;
    const cut = separator === undefined ? -1 : text.indexOf(separator);
    const name = unquoted(cut < 0 ? text : text.slice(0, cut));
    const key = KEYS.find((k) => k === name);
    if (key === undefined)
      throw new TextureFault(quoted(name), `a line before the heights begins with ${KEYS.join(', ')}`, { line });
    if (values.has(key)) throw new TextureFault(`${key} a second time`, 'each key stands once', at(key, line));
    if (key === 'heights') return { values, end: line, separator: separator ?? ',' };
    // A spreadsheet fills short rows with separators.
    const value = unquoted(cut < 0 ? '' : text.slice(cut + 1).replace(/[,;\t\s]+$/, ''));
    if (value.length > LONGEST_TEXT)
      throw new TextureFault(`${value.length} characters`, `at most ${LONGEST_TEXT}`, at(key, line));
    values.set(key, { text: value, line });
  }
  throw new TextureFault(
    'no line "heights"',
    `the heights follow a line of that name within the first ${LONGEST_HEADER} lines`,
  );
}

const unquoted = (text: string): string => text.trim().replace(/^"(.*)"$/, '$1');

function required(header: Header, key: Key): { readonly text: string; readonly line: number } {
  const value = header.values.get(key);
  if (value === undefined) throw new TextureFault(`no line "${key}"`, `the header states ${key}`, { path: key });
  return value;
}

const described = (header: Header, key: 'instrument' | 'note'): Partial<TextureFile> => {
  const text = header.values.get(key)?.text;
  return text ? { [key]: text } : {};
};

function spacingOf(header: Header, key: 'spacing_x' | 'spacing_y'): number {
  const own = header.values.get(key);
  if (own && header.values.has('spacing'))
    throw new TextureFault(`spacing and ${key} together`, 'one or the other', at(key, own.line));
  const value = own ?? header.values.get('spacing');
  if (value === undefined) throw new TextureFault('no line "spacing"', 'the header states the spacing', { path: key });
  const result = parseQuantity(value.text, 'length');
  if (!result.ok)
    throw new TextureFault(result.problem.found, result.problem.allowed, at(key, value.line), result.problem.fix);
  return requireSpacing(result.value, at(key, value.line));
}

interface Row {
  readonly line: number;
  readonly values: Float64Array;
}

function readRows(lines: Generator<Line>, header: Header, metres: (text: string) => number): Row[] {
  const rows: Row[] = [];
  let count = 0;
  for (const { line, text } of lines) {
    if (text.trim() === '' && !text.includes(header.separator)) continue;
    const fields = text.split(header.separator);
    count += fields.length;
    if (count > MOST_POINTS)
      throw new TextureFault(`more than ${MOST_POINTS} heights`, `at most ${MOST_POINTS} points are read`, { line });
    const values = new Float64Array(fields.length);
    for (let k = 0; k < fields.length; k++) values[k] = height(fields[k]!, metres, line, k + 1);
    rows.push({ line, values });
  }
  return rows;
}

function height(field: string, metres: (text: string) => number, line: number, place: number): number {
  const text = field.trim();
  if (text === '' || text === 'nan' || text === 'NaN') return Number.NaN;
  if (!NUMBER.test(text))
    throw new TextureFault(
      quoted(text),
      `field ${place} of the line is a height: a number with a decimal point, or empty where nothing was measured`,
      { line, path: 'heights' },
      /^[+-]?[0-9]+,[0-9]+$/.test(text) ? 'Write a point for the decimal comma.' : undefined,
    );
  const value = metres(text);
  if (!Number.isFinite(value)) throw new TextureFault(quoted(text), 'a height is finite', { line, path: 'heights' });
  return value;
}

function profileOf(header: Header, rows: readonly Row[]): TextureFile['heights'] {
  const heights = new Float64Array(rows.reduce((n, row) => n + row.values.length, 0));
  let filled = 0;
  for (const { values } of rows) {
    heights.set(values, filled);
    filled += values.length;
  }
  requireSize('profile', heights.length, 1, { path: 'heights', line: header.end });
  return {
    kind: 'profile',
    profile: {
      spacing: spacingOf(header, 'spacing_x'),
      heights: requireHeights(heights, { path: 'heights', line: header.end }),
    },
  };
}

function mapOf(header: Header, rows: readonly Row[]): TextureFile['heights'] {
  const columns = rows[0]?.values.length ?? 0;
  for (const row of rows)
    if (row.values.length !== columns)
      throw new TextureFault(
        `${row.values.length} heights`,
        `every row of the map has ${columns} like the first`,
        at('heights', row.line),
      );
  requireSize('map', columns, rows.length, { path: 'heights', line: header.end });
  const heights = new Float64Array(columns * rows.length);
  for (const [r, { values }] of rows.entries()) heights.set(values, r * columns);
  return {
    kind: 'map',
    map: {
      columns,
      rows: rows.length,
      spacingX: spacingOf(header, 'spacing_x'),
      spacingY: spacingOf(header, 'spacing_y'),
      heights: requireHeights(heights, { path: 'heights', line: header.end }),
    },
  };
}
