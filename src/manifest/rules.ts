import { quoted } from '../quantity/index.js';
import { nearest } from './nearest.js';
import { dotted, type Path, type Problem } from './problem.js';
import type { Node } from './tree.js';
import { markAt, nodeAt, problemAt } from './tree.js';

/** Ids of one kind that boards may refer to; `complete` is false when a file of the kind could not be read. */
export interface KnownIds {
  readonly ids: ReadonlySet<string>;
  readonly complete: boolean;
}

/** Collects problems of one document whose shape has been checked. */
export class RuleReport {
  readonly problems: Problem[] = [];
  constructor(private readonly root: Node) {}

  /** At the value of a path, or where it ought to be. */
  at(path: Path, found: string, allowed: string, fix?: string): void {
    this.problems.push(problemAt(markAt(this.root, path), dotted(path), found, allowed, fix));
  }

  /** At the key of a path that should not be there. */
  atKey(path: Path, found: string, allowed: string, fix?: string): void {
    const holder = nodeAt(this.root, path.slice(0, -1));
    const entry = holder?.kind === 'map' ? holder.entries.get(String(path.at(-1))) : undefined;
    this.problems.push(problemAt(entry?.keyMark ?? markAt(this.root, path), dotted(path), found, allowed, fix));
  }

  /** Keys of one map that exclude each other: at the last of them that the document itself gives, not one it inherits. */
  clash(path: Path, keys: readonly string[], allowed: string, fix?: string): void {
    const map = nodeAt(this.root, path);
    const own = keys.filter(
      (key) => map?.kind === 'map' && map.entries.get(key)?.keyMark.source.path === this.root.mark.source.path,
    );
    this.atKey([...path, own.at(-1) ?? keys.at(-1)!], `${keys.join(' and ')} together`, allowed, fix);
  }

  /** As written at a path, quoted. */
  written(path: Path): string {
    const node = nodeAt(this.root, path);
    return node?.kind === 'scalar' ? quoted(node.text) : 'this';
  }
}

/** Exactly one of some keys of a map; reports and says whether it is so. */
export function exactlyOneOf(report: RuleReport, path: Path, doc: object, keys: readonly string[]): boolean {
  const given = keys.filter((key) => Object.hasOwn(doc, key));
  if (given.length === 1) return true;
  const allowed = `exactly one of ${keys.join(', ')} is needed`;
  if (given.length === 0) report.at(path, `none of ${keys.join(', ')}`, allowed);
  else report.atKey([...path, given[1]!], `${given.join(' and ')} together`, allowed);
  return false;
}

/** Two values of one dimension in ascending order. */
export function ascending(
  report: RuleReport,
  path: Path,
  low: number,
  high: number,
  keys: readonly [string, string],
  equal = false,
): void {
  if (low < high || (equal && low === high)) return;
  const [from, to] = keys;
  const found = `${from} ${report.written([...path, from])} and ${to} ${report.written([...path, to])}`;
  report.at([...path, to], found, `${to} lies above ${from}${equal ? ' or equals it' : ''}`);
}

export function knownId(report: RuleReport, path: Path, id: string, what: string, known: KnownIds): void {
  if (known.ids.has(id) || !known.complete) return;
  const names = [...known.ids];
  const listed = names.length === 0 ? 'none is in the libraries of the pack' : names.slice(0, 12).join(', ');
  const close = nearest(id, names);
  report.at(
    path,
    `the unknown ${what} ${quoted(id)}`,
    `the ${what} ids of the pack are: ${listed}`,
    close && `Did you mean ${close}?`,
  );
}

/** A list with one entry per column, where it is given. */
export function perColumn(report: RuleReport, path: Path, list: readonly unknown[] | undefined, columns: number): void {
  if (list === undefined || list.length === columns) return;
  report.at(path, `${list.length} ${list.length === 1 ? 'entry' : 'entries'}`, `one per column, ${columns} here`);
}
