import type { z } from 'zod';
import { parseQuantity, quoted } from '../quantity/index.js';
import { type Leaf, leaves, statements } from './documents/fields.js';
import { spreadDistance, spreadProblem } from './figures.js';
import { nearest } from './nearest.js';
import { dotted, type Path, type Problem } from './problem.js';
import { bare, choose, elementOf, isNullable, shapeOf, typeOf } from './schema-walk.js';
import {
  child,
  type ListNode,
  type MapNode,
  type Mark,
  type Node,
  problemAt,
  type ScalarNode,
  toData,
} from './tree.js';

/**
 * Compares a document with its schema and reports everything that does not fit, where it stands.
 * The walk follows the zod schema itself, so that shape, keys and words have one source; values that zod judges alone
 * (numbers, enumerations, counts) are handed to it.
 */
export function checkDocument(schema: z.ZodType, root: Node): readonly Problem[] {
  const problems: Problem[] = [];
  checkNode(schema, root, [], root.mark, problems);
  return problems;
}

function checkNode(schema: z.ZodType, node: Node, path: Path, keyMark: Mark, problems: Problem[]): void {
  const report = (mark: Mark, found: string, allowed: string, fix?: string) =>
    problems.push(problemAt(mark, dotted(path), found, allowed, fix));
  if (isNullable(schema) && node.kind === 'scalar' && node.value === null) return;
  const plain = choose(schema, node);
  const leaf = leaves.get(plain);
  const type = typeOf(plain);
  if (type === 'object' && !leaf) {
    if (node.kind !== 'map')
      return void report(placeFor(node, keyMark), describeNode(node), `a map with the keys ${keysOf(plain)}`);
    checkKeys(plain, node, path, keyMark, problems);
    for (const [key, inner] of Object.entries(shapeOf(plain)!)) {
      const entry = node.entries.get(key);
      if (entry) checkNode(inner, entry.value, [...path, key], entry.keyMark, problems);
    }
    checkFigure(plain, node, path, problems);
    return;
  }
  if (type === 'array' && !leaf) {
    if (node.kind !== 'list') return void report(placeFor(node, keyMark), describeNode(node), 'a list', listFix(node));
    const count = plain.safeParse(toData(node)).error?.issues.find((i) => i.path.length === 0);
    if (count) report(node.mark, countText(node), countLimit(count));
    node.items.forEach((item, i) => {
      checkNode(elementOf(plain)!, item, [...path, i], item.mark, problems);
    });
    return;
  }
  if (node.kind !== 'scalar') {
    return void report(node.mark, describeNode(node), leaf ? allowedFor(leaf) : scalarText(type));
  }
  const problem = leaf ? leafProblem(leaf, plain, node) : scalarProblem(plain, node);
  if (problem) report(placeFor(node, keyMark), problem.found, problem.allowed, problem.fix);
}

/** An empty value has no place of its own: point at its key. */
const placeFor = (node: Node, keyMark: Mark): Mark =>
  node.kind === 'scalar' && node.value === null && node.text === '' ? keyMark : node.mark;

interface Wrong {
  readonly found: string;
  readonly allowed: string;
  readonly fix?: string;
}

function describeNode(node: Node): string {
  if (node.kind === 'list') return 'a list';
  if (node.kind === 'map') return 'a map';
  if (node.value === null && node.text === '') return 'nothing';
  return typeof node.value === 'string' ? quoted(node.value) : node.text;
}

const keysOf = (schema: z.ZodType) => Object.keys(shapeOf(schema)!).join(', ');
const listFix = (node: Node) =>
  node.kind === 'scalar' && node.text !== '' ? `Write [${node.text}].`.replace(/[\n\r]/g, ' ') : undefined;
const countText = (node: ListNode) => (node.items.length === 0 ? 'an empty list' : `a list of ${node.items.length}`);

function countLimit(issue: { readonly code: string; readonly minimum?: unknown; readonly maximum?: unknown }): string {
  return issue.code === 'too_small' ? `at least ${issue.minimum} here` : `at most ${issue.maximum} here`;
}

function checkKeys(schema: z.ZodType, node: MapNode, path: Path, keyMark: Mark, problems: Problem[]): void {
  const shape = shapeOf(schema)!;
  const free = Object.keys(shape).filter((key) => !node.entries.has(key));
  const meant = new Set<string>();
  for (const [key, entry] of node.entries) {
    if (Object.hasOwn(shape, key)) continue;
    // First among the keys not given yet: a misspelt key is rarely one that is there as well.
    const close = nearest(key, free) ?? nearest(key, Object.keys(shape));
    if (close) meant.add(close);
    const fix = close ? `Did you mean ${close}?` : undefined;
    problems.push(
      problemAt(
        entry.keyMark,
        dotted([...path, key]),
        `the unknown key ${quoted(key)}`,
        `the keys here are ${keysOf(schema)}`,
        fix,
      ),
    );
  }
  for (const key of free) {
    const inner = shape[key]!;
    if (inner.safeParse(undefined).success || meant.has(key)) continue;
    const about = (bare(inner).description ?? inner.description ?? '').replace(/\.$/, '');
    problems.push(
      problemAt(keyMark, dotted(path), `no key ${quoted(key)}`, `it is needed${about ? `: ${about}` : ''}`),
    );
  }
}

function scalarText(type: string): string {
  if (type === 'boolean') return 'true or false';
  return type === 'number' || type === 'int' ? 'a number' : 'text';
}

function allowedFor(leaf: Leaf): string {
  if (leaf.kind === 'quantity') {
    const read = parseQuantity('', leaf.dimension);
    return read.ok ? '' : read.problem.allowed;
  }
  if (leaf.kind === 'spread') return 'one distance, or a map of minus and plus';
  return leaf.kind === 'date' ? 'a date as YYYY-MM-DD' : leaf.allowed;
}

function leafProblem(leaf: Leaf, schema: z.ZodType, node: ScalarNode): Wrong | undefined {
  if (leaf.kind === 'quantity') {
    // The text keeps what the number lost: 3.00 stays 3.00 in the message.
    const written = typeof node.value === 'number' ? node.text : node.value;
    const read = parseQuantity(written, leaf.dimension, leaf.range);
    if (read.ok) return undefined;
    return typeof node.value === 'number' ? { ...read.problem, found: node.text } : read.problem;
  }
  if (leaf.kind === 'spread') return spreadProblem(node.value, leaf.dimension);
  if (typeof node.value === 'number') {
    return { found: node.text, allowed: allowedFor(leaf), fix: `Write it in quotes: "${node.text}".` };
  }
  if (typeof node.value !== 'string' || !schema.safeParse(node.value).success) {
    const fix = leaf.kind === 'words' && typeof node.value === 'string' ? idFix(schema, node.value) : undefined;
    return { found: describeNode(node), allowed: allowedFor(leaf), ...(fix ? { fix } : {}) };
  }
  if (leaf.kind === 'date' && !isCalendarDate(node.value)) {
    return { found: quoted(node.value), allowed: 'a date of the calendar as YYYY-MM-DD' };
  }
  return undefined;
}

function isCalendarDate(text: string): boolean {
  const time = Date.parse(`${text}T00:00:00Z`);
  return Number.isFinite(time) && new Date(time).toISOString().startsWith(text);
}

/** The same word in the permitted letters, when that makes it an id. */
function idFix(schema: z.ZodType, written: string): string | undefined {
  const tame = written
    .slice(0, 100)
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, '-')
    .replace(/^-|-$/g, '');
  return tame !== written && schema.safeParse(tame).success ? `Did you mean ${tame}?` : undefined;
}

/** Numbers, yes and no, enumerated words: zod judges, this words it. */
function scalarProblem(schema: z.ZodType, node: ScalarNode): Wrong | undefined {
  const issue = schema.safeParse(node.value).error?.issues[0];
  if (issue === undefined) return undefined;
  const found = describeNode(node);
  if (issue.code === 'invalid_value') {
    const words = issue.values.map(String);
    const close = nearest(node.text, words);
    return { found, allowed: `one of ${words.join(', ')}`, ...(close ? { fix: `Did you mean ${close}?` } : {}) };
  }
  if (issue.code === 'too_small' || issue.code === 'too_big') {
    const { minValue, maxValue } = schema as z.ZodNumber;
    const [low, high] = [minValue ?? -Infinity, maxValue ?? Infinity];
    const allowed =
      Number.isFinite(low) && high < Number.MAX_SAFE_INTEGER
        ? `a number from ${low} to ${high}`
        : `a number, at least ${low}`;
    return { found: node.text, allowed };
  }
  const type = typeOf(schema);
  if (type === 'boolean') {
    const yes = /^(yes|on|y)$/i.test(node.text);
    const no = /^(no|off|n)$/i.test(node.text);
    return { found, allowed: 'true or false', ...(yes || no ? { fix: `Write ${yes}.` } : {}) };
  }
  if (type === 'number' || type === 'int') {
    const number =
      typeof node.value === 'string' && schema.safeParse(Number(node.value)).success && node.value.trim() !== '';
    const allowed = issue.code === 'invalid_type' && issue.expected === 'int' ? 'a whole number' : 'a plain number';
    return { found, allowed, ...(number ? { fix: `Write ${Number(node.value)} without quotes.` } : {}) };
  }
  return { found, allowed: 'text' };
}

/** The lower limit of a figure must be possible: no negative thickness within the spread. */
function checkFigure(schema: z.ZodType, node: MapNode, path: Path, problems: Problem[]): void {
  const figure = statements.get(schema)?.figure;
  const value = child(node, 'value');
  const spread = child(node, 'spread');
  if (figure?.floor === undefined || value?.kind !== 'scalar' || spread === undefined) return;
  const { dimension, floor } = figure;
  const number = dimension === 'number' ? Number(value.value) : readable(value.value, dimension);
  const lower = spread.kind === 'map' ? child(spread, 'minus') : spread;
  if (number === undefined || number < floor || lower?.kind !== 'scalar') return;
  const distance = spreadDistance(lower.value, number, dimension);
  if (distance === undefined || number - distance >= floor - 1e-12 * Math.abs(number)) return;
  const where = dotted([...path, 'spread', ...(spread.kind === 'map' ? ['minus'] : [])]);
  const limit = floor === 0 ? 'falls below 0' : dimension === 'number' ? `falls below ${floor}` : 'falls to 0 or below';
  problems.push(
    problemAt(lower.mark, where, quoted(lower.text), `with it the lower limit of "${value.text}" ${limit}`),
  );
}

function readable(written: unknown, dimension: Parameters<typeof parseQuantity>[1]): number | undefined {
  const read = parseQuantity(written, dimension);
  return read.ok ? read.value : undefined;
}
