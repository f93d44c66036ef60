import type { RevisionSummary } from '../../src/publish/index.js';

export function summaryOf(packId: string, revision: string, more: Partial<RevisionSummary> = {}): RevisionSummary {
  return {
    format: 1,
    packId,
    title: `Pack ${packId}`,
    documentNumber: `D-${packId}`,
    revision,
    date: '2026-11-02',
    status: 'draft',
    packHash: '0'.repeat(64),
    programVersion: '0.0.0',
    boards: [{ id: 'a', title: 'A', status: 'meets' }],
    ...more,
  };
}

/** An index page that names what it was given, in the order given, and a style sheet that changes with it. */
export function plainIndex(summaries: readonly RevisionSummary[]): ReadonlyMap<string, string> {
  const text = summaries.map((s) => `${s.packId}/${s.revision}/${s.title}`).join('\n');
  return new Map([
    ['style.css', `/* ${text} */`],
    ['index.html', text],
  ]);
}
