import { printable } from '../../chart/svg.js';
import { checkRelativeHref } from './paths.js';
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

/** The page that lists packs and their revisions, in the order given; `styleSheet()` lies beside it as `style.css`. */
export function renderIndex(packs: readonly IndexEntry[]): string {
  const groups = new Map<string, IndexEntry[]>();
  for (const entry of printable(packs)) {
    const group = groups.get(entry.packId) ?? [];
    group.push({ ...entry, href: checkRelativeHref(entry.href) });
    groups.set(entry.packId, group);
  }
  return fillTemplate('index', {
    style: 'style.css',
    packs: [...groups.values()].map((entries, index) => ({
      id: `pack-${index + 1}`,
      title: entries[0].title,
      entries,
    })),
    empty: groups.size === 0,
  });
}
