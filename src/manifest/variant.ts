import { z } from 'zod';
import { replacements, statements } from './documents/fields.js';
import { dotted, type Path } from './problem.js';
import { bare, shapeOf } from './schema-walk.js';
import { type Entry, type MapNode, type Node, toData } from './tree.js';

/** True when a map is merged key by key; figures and other single statements are replaced as a whole. */
const merges = (schema: z.ZodType) => shapeOf(schema) !== undefined && statements.get(bare(schema)) === undefined;

/** Shape of a variant: the same keys, every one optional or empty (which drops the inherited key), `required` ones aside. */
export function variantOf(schema: z.ZodType, required: readonly string[] = []): z.ZodType {
  const shape = shapeOf(schema);
  if (shape === undefined || !merges(schema)) return bare(schema);
  const entries = Object.entries(shape).map(([key, value]) => {
    const inner = variantOf(value);
    if (required.includes(key)) return [key, inner];
    const description = bare(value).description ?? value.description ?? '';
    return [key, inner.nullable().describe(description).optional()];
  });
  return z.strictObject(Object.fromEntries(entries)).describe(bare(schema).description ?? '');
}

/** Keys of a variant that say what it is; they are never inherited and are no overrides. */
const OWN = ['id', 'title', 'based_on', 'description'];

/**
 * A variant over the board it is based on: maps merge, everything else replaces, an empty value drops the inherited
 * key (as in JSON Merge Patch, RFC 7396), and so does a key that takes its place. Nodes keep the place where they were
 * written.
 *
 * @param overrides  receives the dotted paths whose value now differs, in the order of the variant's file
 */
export function mergeBoards(schema: z.ZodType, parent: MapNode, variant: MapNode, overrides: string[]): MapNode {
  const own = new Map([...variant.entries].filter(([key]) => OWN.includes(key)));
  const inheritable = new Map([...parent.entries].filter(([key]) => !OWN.includes(key)));
  const given = new Map([...variant.entries].filter(([key]) => !OWN.includes(key)));
  const merged = mergeMaps(schema, { ...parent, entries: inheritable }, { ...variant, entries: given }, [], overrides);
  return { ...merged, entries: new Map([...own, ...merged.entries]) };
}

function mergeMaps(schema: z.ZodType, parent: MapNode, variant: MapNode, path: Path, overrides: string[]): MapNode {
  const entries = new Map<string, Entry>(parent.entries);
  for (const key of replaced(schema, variant)) entries.delete(key);
  for (const [key, entry] of variant.entries) {
    const here = [...path, key];
    const former = parent.entries.get(key)?.value;
    const { value } = entry;
    if (value.kind === 'scalar' && value.value === null) {
      if (former) overrides.push(dotted(here));
      entries.delete(key);
      continue;
    }
    const inner = shapeOf(schema)?.[key];
    if (inner && merges(inner) && former?.kind === 'map' && value.kind === 'map') {
      entries.set(key, { keyMark: entry.keyMark, value: mergeMaps(inner, former, value, here, overrides) });
      continue;
    }
    if (former === undefined || !sameData(former, value)) overrides.push(dotted(here));
    entries.set(key, entry);
  }
  return { kind: 'map', mark: variant.mark, entries };
}

/** Keys that are not inherited, because the variant gives what takes their place. */
function replaced(schema: z.ZodType, { entries }: MapNode): readonly string[] {
  return Object.entries(replacements.get(bare(schema)) ?? {}).flatMap(([key, others]) => {
    const given = entries.get(key)?.value;
    return given === undefined || (given.kind === 'scalar' && given.value === null) ? [] : others;
  });
}

/** Deep equality of checked, hence small, nodes; key order does not matter. */
function sameData(a: Node, b: Node): boolean {
  const ordered = (data: unknown): unknown =>
    Array.isArray(data)
      ? data.map(ordered)
      : data !== null && typeof data === 'object'
        ? Object.fromEntries(
            Object.entries(data)
              .sort(([x], [y]) => (x < y ? -1 : 1))
              .map(([k, v]) => [k, ordered(v)]),
          )
        : data;
  return JSON.stringify(ordered(toData(a))) === JSON.stringify(ordered(toData(b)));
}
