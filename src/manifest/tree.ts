import type { Path, Problem } from './problem.js';

/** A manifest's text with what is needed to turn offsets into lines. */
export interface Source {
  readonly path: string;
  readonly text: string;
  readonly lineStarts: readonly number[];
}

export interface Mark {
  readonly source: Source;
  readonly offset: number;
}

export interface ScalarNode {
  readonly kind: 'scalar';
  readonly mark: Mark;
  readonly value: string | number | boolean | null;
  /** As written, quotes removed and escapes resolved. */
  readonly text: string;
}
export interface ListNode {
  readonly kind: 'list';
  readonly mark: Mark;
  readonly items: readonly Node[];
}
export interface Entry {
  readonly keyMark: Mark;
  readonly value: Node;
}
export interface MapNode {
  readonly kind: 'map';
  readonly mark: Mark;
  readonly entries: ReadonlyMap<string, Entry>;
}
/** A YAML value that knows where it was written; merged boards hold nodes of several files. */
export type Node = ScalarNode | ListNode | MapNode;

export function makeSource(path: string, text: string): Source {
  const lineStarts = [0];
  for (const match of text.matchAll(/\r\n|\n|\r/g)) lineStarts.push(match.index + match[0].length);
  return { path, text, lineStarts };
}

/** Line and column from 1; the column counts characters, not UTF-16 units. */
export function placeOf(mark: Mark): { readonly file: string; readonly line: number; readonly column: number } {
  const { lineStarts, text, path } = mark.source;
  let low = 0;
  let high = lineStarts.length - 1;
  while (low < high) {
    const middle = (low + high + 1) >> 1;
    if (lineStarts[middle]! <= mark.offset) low = middle;
    else high = middle - 1;
  }
  return { file: path, line: low + 1, column: [...text.slice(lineStarts[low], mark.offset)].length + 1 };
}

/** A problem at a mark. */
export function problemAt(mark: Mark, path: string, found: string, allowed: string, fix?: string): Problem {
  return { ...placeOf(mark), path, found, allowed, ...(fix ? { fix } : {}) };
}

export function child(node: Node | undefined, key: string | number): Node | undefined {
  if (node?.kind === 'map') return node.entries.get(String(key))?.value;
  return node?.kind === 'list' && typeof key === 'number' ? node.items[key] : undefined;
}

export function nodeAt(root: Node, path: Path): Node | undefined {
  let node: Node | undefined = root;
  for (const key of path) node = child(node, key);
  return node;
}

/** Where to point for a path: the value; for a missing one the nearest key above it, which ought to hold it. */
export function markAt(root: Node, path: Path): Mark {
  const node = nodeAt(root, path);
  if (node) return node.mark;
  for (let depth = path.length - 1; depth > 0; depth--) {
    const holder = nodeAt(root, path.slice(0, depth - 1));
    const key = path[depth - 1]!;
    if (holder?.kind === 'map' && holder.entries.has(String(key))) return holder.entries.get(String(key))!.keyMark;
    if (holder?.kind === 'list' && typeof key === 'number' && holder.items[key]) return holder.items[key]!.mark;
  }
  return root.mark;
}

/** Plain data of a node; shared nodes (aliases) give shared data. */
export function toData(node: Node, seen = new Map<Node, unknown>()): unknown {
  if (node.kind === 'scalar') return node.value;
  const known = seen.get(node);
  if (known !== undefined) return known;
  const data =
    node.kind === 'list'
      ? node.items.map((item) => toData(item, seen))
      : Object.fromEntries([...node.entries].map(([key, entry]) => [key, toData(entry.value, seen)]));
  seen.set(node, data);
  return data;
}
