import type { z } from 'zod';
import { answersOf } from './answer-rules.js';
import { readAnswerTable } from './answer-table.js';
import { askedItems, askedWords } from './asked-items.js';
import {
  type AnswersDocument,
  answersDocument,
  type ProcurementDocument,
  procurementDocument,
} from './documents/procurement-document.js';
import type { OpenFile, Reader } from './open-files.js';
import type { Problem } from './problem.js';
import type { Procurement } from './procurement-model.js';
import { type ProcurementContext, procurementRules } from './procurement-rules.js';
import { procurementOf } from './resolve-procurement.js';

interface Checked<D> {
  readonly file: OpenFile;
  readonly doc: D;
}

/** Compares a file with its schema; the pack's reader brings its own, so that all manifests are checked alike. */
type Check = <D>(schema: z.ZodType, file: OpenFile, problems: Problem[]) => Checked<D> | undefined;

/** A procurement file whose shape fits, with the returned sheets in the order of its recipients. */
export interface OpenProcurement {
  readonly procurement: Checked<ProcurementDocument>;
  readonly answers: readonly (Checked<AnswersDocument> | undefined)[];
}

/** Opens the procurement file of a pack and the answers it names; what does not fit goes to the reader's problems. */
export function openProcurement(reader: Reader, packFile: OpenFile, check: Check): OpenProcurement | undefined {
  const [file] = reader.openReferences(packFile, ['procurement']).files;
  const procurement = file && check<ProcurementDocument>(procurementDocument, file, reader.problems);
  if (!procurement) return undefined;
  const answers = procurement.doc.recipients.map((_, i) => {
    const [table] = reader.openReferences(procurement.file, ['recipients', i, 'answers'], readAnswerTable).files;
    return table && check<AnswersDocument>(answersDocument, table, reader.problems);
  });
  return { procurement, answers };
}

/** What only the resolved boards can decide: materials, names that must not go out, items answered. */
export function procurementFor(
  { procurement: { file, doc }, answers }: OpenProcurement,
  context: ProcurementContext,
): { readonly procurement: Procurement } | { readonly problems: readonly Problem[] } {
  const problems: Problem[] = [...procurementRules(file.root, doc, context)];
  if (problems.length > 0) return { problems };
  const asked = procurementOf(doc, file.path);
  const recipients = asked.recipients.map((recipient, i) => {
    const answered = answers[i];
    if (!answered) return recipient;
    const found = answersOf(answered.file.root, answered.doc, {
      rfqNumber: asked.rfqNumber,
      items: askedItems(recipient, context.boards, asked),
      words: askedWords(recipient, context.boards, context.requirements.requirements, asked),
    });
    problems.push(...found.problems);
    return { ...recipient, answers: { file: answered.file.path, rows: found.rows } };
  });
  return problems.length > 0 ? { problems } : { procurement: { ...asked, recipients } };
}
