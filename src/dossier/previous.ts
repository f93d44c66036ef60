import { createHash } from 'node:crypto';
import { z } from 'zod';

/**
 * What is read of the data of an earlier revision. Only what is compared is asked for, so that data written by an older
 * program can still be read when other parts of it have changed.
 */
const text = z.string();
const value = z.number().nullable();

const revisionData = z.object({
  kind: z.literal('pack'),
  programVersion: text,
  pack: z.object({ id: text, revision: text, date: text, status: text }),
  boards: z.array(z.object({ id: text, title: text, overall: text })),
  requirements: z.array(z.looseObject({ id: text, text, source: text })),
  verdicts: z.array(
    z.object({
      boardId: text,
      requirementId: text,
      status: text,
      calculated: text.optional(),
      unit: text,
      value: z.union([z.number(), text]).nullable(),
      margin: value,
      adverse: value,
      favourable: value,
    }),
  ),
  inputs: z.array(z.object({ path: text, sha256: text })),
});

/** A revision as its `data/pack.json` states it, as far as two revisions are compared. */
export type RevisionData = z.infer<typeof revisionData>;

export interface PreviousData {
  readonly data: RevisionData;
  /** Of the bytes read. */
  readonly sha256: string;
}

/** Reads the `data/pack.json` of a revision; a text says what is wrong with it. */
export function readRevisionData(bytes: Uint8Array): PreviousData | string {
  let json: unknown;
  try {
    json = JSON.parse(new TextDecoder('utf-8', { fatal: true }).decode(bytes));
  } catch {
    return 'text that is not JSON';
  }
  const parsed = revisionData.safeParse(json);
  if (!parsed.success) return 'JSON that is not the data of a pack';
  return { data: parsed.data, sha256: createHash('sha256').update(bytes).digest('hex') };
}
