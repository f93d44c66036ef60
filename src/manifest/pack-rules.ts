import { quoted } from '../quantity/index.js';
import type { PackDocument } from './documents/pack-document.js';
import type { Problem } from './problem.js';
import { exactlyOneOf, RuleReport } from './rules.js';
import { child, type Node, problemAt } from './tree.js';

/** What ties the keys of a pack file together. */
export function packRules(root: Node, { revision, previous }: PackDocument): readonly Problem[] {
  const report = new RuleReport(root);
  if (
    previous &&
    exactlyOneOf(report, ['previous'], previous, ['revision', 'data']) &&
    previous.revision === revision
  ) {
    report.at(['previous', 'revision'], `${quoted(revision)}, the revision of this pack`, 'an earlier revision');
  }
  return report.problems;
}

/** Names of PDFs that are not those of a board. */
const RESERVED = /^(?:pack|supplier-.*)$/;

/** Boards name their PDF, which lies beside those of the pack and of supplier sheets. */
export function boardNameRules(root: Node): readonly Problem[] {
  const id = child(root, 'id');
  if (id?.kind !== 'scalar' || !RESERVED.test(String(id.value))) return [];
  return [
    problemAt(
      id.mark,
      'id',
      quoted(id.value),
      'another id: PDFs of the pack as a whole and of supplier sheets have such names',
    ),
  ];
}
