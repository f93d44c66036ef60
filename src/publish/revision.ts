import { z } from 'zod';

/** What each revision folder says of itself in `revision.json`; the index of all packs is made from these files. */
export const revisionSummary = z.object({
  format: z.literal(1),
  packId: z.string(),
  title: z.string(),
  documentNumber: z.string(),
  revision: z.string(),
  date: z.string(),
  status: z.string(),
  marking: z.string().optional(),
  /** Hash over the pack's input files. */
  packHash: z.string(),
  programVersion: z.string(),
  boards: z.array(z.object({ id: z.string(), title: z.string(), status: z.string() })),
});
export type RevisionSummary = z.infer<typeof revisionSummary>;

export const revisionFile = 'revision.json';

export function summaryText(summary: RevisionSummary): string {
  return `${JSON.stringify(summary, null, 2)}\n`;
}

/** The summary, or undefined where the text is none: a folder that someone changed by hand is not listed. */
export function readSummary(content: Uint8Array): RevisionSummary | undefined {
  try {
    return revisionSummary.parse(JSON.parse(Buffer.from(content).toString()));
  } catch {
    return undefined;
  }
}

/** By pack, then newest first by date and by revision, so that the list never depends on the order of the disk. */
export function sortSummaries(summaries: readonly RevisionSummary[]): RevisionSummary[] {
  const compare = (a: string, b: string) => (a < b ? -1 : a > b ? 1 : 0);
  return [...summaries].sort(
    (a, b) => compare(a.packId, b.packId) || compare(b.date, a.date) || compare(b.revision, a.revision),
  );
}
