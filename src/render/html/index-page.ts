import { printable } from '../../chart/svg.js';
import { checkRelativeHref } from './paths.js';
import { fillTemplate } from './templates.js';

export interface IndexEntry {
  readonly packId: string;
  readonly title: string;
  readonly revision: string;
  readonly date: string;
  readonly status: string;
  readonly documentNumber?: string;
  readonly marking?: string;
  /** Relative to the folder of the index. */
  readonly href: string;
  readonly summary: string;
}

/** The page that lists packs and their revisions, in the order given; `styleSheet()` lies beside it as `style.css`. */
export function renderIndex(packs: readonly IndexEntry[]): string {
  const groups = new Map<string, IndexEntry[]>();
  const entries = printable(packs);
  for (const entry of entries) {
    const group = groups.get(entry.packId) ?? [];
    group.push({ documentNumber: '', ...entry, href: checkRelativeHref(entry.href) });
    groups.set(entry.packId, group);
  }
  return fillTemplate('index', {
    style: 'style.css',
    packs: [...groups.values()].map((group, index) => ({
      id: `pack-${index + 1}`,
      title: group[0].title,
      entries: group,
    })),
    markings: [...new Set(entries.flatMap((entry) => entry.marking ?? []))],
    empty: groups.size === 0,
  });
}
