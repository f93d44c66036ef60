import { formatQuantity } from '../quantity/index.js';
import { arrayRules } from './array-rules.js';
import type { BoardDocument } from './documents/board-document.js';
import { feedRules } from './feed-rules.js';
import { si } from './figures.js';
import type { Path, Problem } from './problem.js';
import { ascending, RuleReport } from './rules.js';
import { textureRules } from './texture-rules.js';
import type { Node } from './tree.js';

/** A finer sweep than this is a slip of the unit, not an analysis. */
const MOST_FREQUENCIES = 2000;

export interface BoardContext {
  /** Hz; absent when the pack's own is faulty. */
  readonly frequencyStep?: number;
}

/** What ties the parts of one complete board together. The frequency range of a model is no rule: models flag it. */
export function boardRules(root: Node, board: BoardDocument, context: BoardContext): readonly Problem[] {
  const report = new RuleReport(root);
  stackUpRules(report, board);
  const [low, high] = [si(board.band.low, 'frequency'), si(board.band.high, 'frequency')];
  ascending(report, ['band'], low, high, ['low', 'high']);
  const step = context.frequencyStep;
  if (step !== undefined && (high - low) / step > MOST_FREQUENCIES) {
    const allowed = `with the frequency step of the pack, ${formatQuantity(step, 'frequency')}, the band has at most ${MOST_FREQUENCIES} steps`;
    report.at(['band'], `${Math.ceil((high - low) / step)} steps`, allowed);
  }
  const t = board.temperature;
  ascending(report, ['temperature'], si(t.low, 'temperature'), si(t.nominal, 'temperature'), ['low', 'nominal'], true);
  ascending(
    report,
    ['temperature'],
    si(t.nominal, 'temperature'),
    si(t.high, 'temperature'),
    ['nominal', 'high'],
    true,
  );
  arrayRules(report, board);
  feedRules(report, board);
  uniqueDeclared(report, board.declared ?? []);
  return report.problems;
}

function stackUpRules(report: RuleReport, { stack_up: stack }: BoardDocument): void {
  const outer: Path = ['stack_up', 'strip', 'outer_face'];
  const { kind, texture } = stack.strip.outer_face;
  if (kind === 'foil' && texture) {
    report.atKey(
      [...outer, 'texture'],
      'a texture of its own',
      'an outer face of kind foil has the texture of its foil',
      'Remove texture, or write kind: plated or micro_etched.',
    );
  }
  if (kind !== 'foil' && !texture) {
    report.at(
      [...outer, 'texture'],
      'no texture',
      `a ${kind} outer face has a texture of its own: Rq or another height`,
    );
  }
  if (texture) textureRules(report, [...outer, 'texture'], texture);
}

export function uniqueDeclared(
  report: RuleReport,
  declared: readonly { readonly id: string }[],
  path: Path = [],
): void {
  const seen = new Set<string>();
  declared.forEach(({ id }, i) => {
    if (seen.has(id)) report.at([...path, 'declared', i, 'id'], `"${id}" a second time`, 'a property is declared once');
    seen.add(id);
  });
}
