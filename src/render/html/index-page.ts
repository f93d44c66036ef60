import { printable } from '../../chart/svg.js';
import { checkRelativeHref } from './paths.js';
import { styleSheet } from './style.js';
import { fillTemplate } from './templates.js';

export interface IndexEntry {
  readonly packId: string;
  readonly title: string;
  readonly revision: string;
  readonly date: string;
  readonly status: string;
  /** Relative to the folder of the index. */
  readonly href: string;
  readonly summary: string;
}

/** The page that lists packs and their revisions, in the order given: one file that needs no other. */
export function renderIndex(packs: readonly IndexEntry[]): string {
  const groups = new Map<string, IndexEntry[]>();
  for (const entry of printable(packs)) {
    const group = groups.get(entry.packId) ?? [];
    group.push({ ...entry, href: checkRelativeHref(entry.href) });
    groups.set(entry.packId, group);
  }
  return fillTemplate('index', {
    // The index is one file: its style stands in it.
    css: styleSheet(),
    packs: [...groups.values()].map((entries, index) => ({
      id: `pack-${index + 1}`,
      title: entries[0].title,
      entries,
    })),
    empty: groups.size === 0,
  });
}
