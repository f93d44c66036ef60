import {
  CORE_SCHEMA,
  constructFromEvents,
  EVENT_ID,
  type Event,
  getScalarValue,
  type MappingEvent,
  parseEvents,
  SCALAR_STYLE,
  type ScalarEvent,
  type SequenceEvent,
} from 'js-yaml';
import { quoted } from '../quantity/index.js';
import { dotted, type Path, type Problem } from './problem.js';
import { readText } from './read-text.js';
import { type Mark, type Node, problemAt, type Source } from './tree.js';

export type ReadResult = { readonly root: Node } | { readonly problems: readonly Problem[] };

const DEEPEST = 24;
const MOST_ALIASES = 50;
/** Values after aliases are followed: what a walk over the document meets. */
const MOST_VALUES = 100_000;
const FORBIDDEN_KEYS = new Set(['__proto__', 'constructor', 'prototype']);

/** Node under construction: containers are filled while the events are walked. */
type Draft =
  | { kind: 'scalar'; mark: Mark; text: string; value: string | number | boolean | null; size: number }
  | { kind: 'list'; mark: Mark; items: Draft[]; size: number; open: boolean }
  | { kind: 'map'; mark: Mark; entries: Map<string, { keyMark: Mark; value: Draft }>; size: number; open: boolean };

/** Bytes of one manifest to a tree that knows its places, or everything that keeps it from being read. */
export function readYaml(path: string, bytes: Uint8Array): ReadResult {
  const read = readText(path, bytes, 'YAML');
  if ('problems' in read) return read;
  const { source } = read;
  try {
    return walk(source);
  } catch (error) {
    // The parser may throw more than its own exception on hostile input; whatever it is, the file is at fault.
    const { reason, mark } = error as { reason?: string; mark?: { position?: number } };
    const why = reason ?? (error instanceof Error ? error.message : String(error));
    const offset = Math.min(mark?.position ?? 0, source.text.length);
    return { problems: [problemAt({ source, offset }, '', `YAML that cannot be read (${why})`, adviceFor(why))] };
  }
}

function adviceFor(why: string): string {
  if (/depth/.test(why)) return `a manifest nests at most ${DEEPEST} deep`;
  if (/alias/.test(why) && /max/i.test(why)) return `a manifest uses at most ${MOST_ALIASES} aliases`;
  if (/tab char/.test(why)) return 'YAML indents with spaces';
  return 'a manifest is one YAML document of keys, lists and plain values';
}

function walk(source: Source): ReadResult {
  const { text, path } = source;
  const events = parseEvents(text, { filename: path, maxDepth: DEEPEST });
  const documents = events.filter((e) => e.type === EVENT_ID.DOCUMENT).length;
  const aliases = events.filter((e) => e.type === EVENT_ID.ALIAS);
  const start: Mark = { source, offset: 0 };
  if (documents === 0)
    return { problems: [problemAt(start, '', 'an empty file', 'a manifest holds one YAML document')] };
  if (documents > 1) {
    const found = `${documents} YAML documents`;
    return { problems: [problemAt(start, '', found, 'a manifest holds exactly one', 'Remove the lines "---".')] };
  }
  if (aliases.length > MOST_ALIASES) {
    const mark = { source, offset: aliases[MOST_ALIASES]!.anchorStart };
    return {
      problems: [problemAt(mark, '', `${aliases.length} aliases`, `a manifest uses at most ${MOST_ALIASES} aliases`)],
    };
  }
  const problems: Problem[] = [];
  const root = drawTree(source, events, problems);
  // Duplicate keys have been reported with both places; `json` keeps the constructor from stopping at the first.
  const data = constructFromEvents(events, { source: text, schema: CORE_SCHEMA, json: true, maxAliases: MOST_ALIASES });
  if (problems.length > 0) return { problems };
  if (root === undefined)
    return { problems: [problemAt(start, '', 'an empty file', 'a manifest holds one YAML document')] };
  attach(root, data[0], new Set());
  return { root: root as Node };
}

/** Gives every scalar the value that the YAML core schema resolved for it. */
function attach(node: Draft, data: unknown, done: Set<Draft>): void {
  if (done.has(node)) return;
  done.add(node);
  if (node.kind === 'scalar') node.value = data as string | number | boolean | null;
  else if (node.kind === 'list') {
    for (const [i, item] of node.items.entries()) attach(item, (data as unknown[])[i], done);
  } else for (const [key, { value }] of node.entries) attach(value, (data as Record<string, unknown>)[key], done);
}

interface Frame {
  readonly node: Extract<Draft, { items: unknown } | { entries: unknown }>;
  readonly path: Path;
  key?: { readonly text: string; readonly mark: Mark };
}

function drawTree(source: Source, events: readonly Event[], problems: Problem[]): Draft | undefined {
  const anchors = new Map<string, Draft>();
  const stack: Frame[] = [];
  let root: Draft | undefined;
  let multiplied = false;

  const pathHere = (): Path => {
    const frame = stack.at(-1);
    if (!frame) return [];
    return [...frame.path, frame.node.kind === 'list' ? frame.node.items.length : (frame.key?.text ?? '?')];
  };
  const place = (node: Draft) => {
    const frame = stack.at(-1);
    if (!frame) root = node;
    else if (frame.node.kind === 'list') frame.node.items.push(node);
    else if (frame.key) {
      const { text, mark } = frame.key;
      const former = frame.node.entries.get(text);
      const where = dotted([...frame.path, text]);
      if (former) {
        const first = source.lineStarts.filter((s) => s <= former.keyMark.offset).length;
        problems.push(
          problemAt(mark, where, `${quoted(text)} a second time`, `a key stands once; the first is in line ${first}`),
        );
      } else if (FORBIDDEN_KEYS.has(text)) {
        problems.push(problemAt(mark, where, `the key ${quoted(text)}`, 'this word is not allowed as a key'));
      } else frame.node.entries.set(text, { keyMark: mark, value: node });
      frame.key = undefined;
    }
  };
  /** A key is a plain scalar; anything else in its place is reported and skipped. */
  const awaitsKey = () => {
    const frame = stack.at(-1);
    return frame !== undefined && frame.node.kind === 'map' && frame.key === undefined;
  };

  for (const event of events) {
    if (event.type === EVENT_ID.DOCUMENT) continue;
    if (event.type === EVENT_ID.POP) {
      const frame = stack.pop();
      if (!frame) continue;
      const { node } = frame;
      node.open = false;
      const inside = node.kind === 'list' ? node.items : [...node.entries.values()].map((e) => e.value);
      node.size = 1 + inside.reduce((sum, item) => sum + item.size, 0);
      if (node.size > MOST_VALUES && !multiplied) {
        multiplied = true;
        const allowed = `a manifest holds at most ${MOST_VALUES} values, those repeated by aliases counted`;
        problems.push(problemAt(node.mark, dotted(frame.path), 'aliases that multiply', allowed));
      }
      continue;
    }
    if (event.type === EVENT_ID.ALIAS) {
      const mark = { source, offset: event.anchorStart - 1 };
      const target = anchors.get(source.text.slice(event.anchorStart, event.anchorEnd));
      if (target === undefined || (target.kind !== 'scalar' && target.open) || awaitsKey()) {
        const name = source.text.slice(event.anchorStart, event.anchorEnd);
        problems.push(
          problemAt(
            mark,
            dotted(pathHere()),
            `the alias *${name}`,
            'an alias stands for a value that is complete before it',
          ),
        );
        if (awaitsKey()) stack.at(-1)!.key = { text: name, mark };
        else place(scalar(mark, ''));
      } else place(target);
      continue;
    }
    const node = draftOf(source, event, stack.at(-1)?.key?.mark ?? stack.at(-1)?.node.mark ?? { source, offset: 0 });
    if (node.kind === 'scalar' && awaitsKey()) {
      stack.at(-1)!.key = { text: node.text, mark: node.mark };
      continue;
    }
    if (awaitsKey()) throw new Error('a list or map as a key');
    const path = pathHere();
    if (event.anchorStart >= 0) anchors.set(source.text.slice(event.anchorStart, event.anchorEnd), node);
    place(node);
    if (node.kind !== 'scalar') stack.push({ node, path });
  }
  return root;
}

const scalar = (mark: Mark, text: string): Draft => ({ kind: 'scalar', mark, text, value: null, size: 1 });

function draftOf(source: Source, event: ScalarEvent | SequenceEvent | MappingEvent, empty: Mark): Draft {
  if (event.type === EVENT_ID.SCALAR) {
    const quote = event.style === SCALAR_STYLE.SINGLE_QUOTED || event.style === SCALAR_STYLE.DOUBLE_QUOTED ? 1 : 0;
    const mark = event.valueStart < 0 ? empty : { source, offset: event.valueStart - quote };
    return scalar(mark, event.valueStart < 0 ? '' : getScalarValue(source.text, event));
  }
  const mark = { source, offset: event.start };
  return event.type === EVENT_ID.SEQUENCE
    ? { kind: 'list', mark, items: [], size: 1, open: true }
    : { kind: 'map', mark, entries: new Map(), size: 1, open: true };
}
