import type { Files, RevisionSummary } from '../publish/index.js';
import { renderIndex, styleSheet } from '../render/html/index.js';

/** The files at the top of an output folder: the page that lists packs and revisions, and its style sheet. */
export function renderTop(summaries: readonly RevisionSummary[]): Files {
  const entries = summaries.map(({ packId, title, revision, date, status, documentNumber, marking, boards }) => ({
    packId,
    title,
    revision,
    date,
    status,
    documentNumber,
    marking,
    href: `${packId}/${revision}/index.html`,
    summary: boardList(boards),
  }));
  return new Map([
    ['index.html', renderIndex(entries)],
    ['style.css', styleSheet()],
  ]);
}

/** `qb-1 meets, qb-2 misses` */
export function boardList(boards: RevisionSummary['boards']): string {
  return boards.map(({ id, status }) => `${id} ${status}`).join(', ');
}
