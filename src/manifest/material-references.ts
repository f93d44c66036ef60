import type { Path, Problem } from './problem.js';
import { type KnownIds, knownId, RuleReport } from './rules.js';
import { type Node, nodeAt } from './tree.js';

export interface MaterialIds {
  readonly laminates: KnownIds;
  readonly foils: KnownIds;
  readonly finishes: KnownIds;
}

const ID = /^[a-z0-9]+(-[a-z0-9]+)*$/;

const PLACES: readonly { readonly path: Path; readonly what: string; readonly among: keyof MaterialIds }[] = [
  { path: ['stack_up', 'strip', 'foil'], what: 'foil', among: 'foils' },
  { path: ['stack_up', 'strip', 'finish'], what: 'finish', among: 'finishes' },
  { path: ['stack_up', 'laminate', 'material'], what: 'laminate', among: 'laminates' },
  { path: ['stack_up', 'ground', 'foil'], what: 'foil', among: 'foils' },
];

/** Materials that a board file names, as it is written: also of a variant, and also where other keys are at fault. */
export function materialReferences(root: Node, ids: MaterialIds): readonly Problem[] {
  const report = new RuleReport(root);
  for (const { path, what, among } of PLACES) {
    const node = nodeAt(root, path);
    // What is no id at all the schema reports.
    if (node?.kind === 'scalar' && typeof node.value === 'string' && ID.test(node.value))
      knownId(report, path, node.value, what, ids[among]);
  }
  return report.problems;
}
