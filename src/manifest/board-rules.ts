import { formatQuantity } from '../quantity/index.js';
import type { BoardDocument } from './documents/board-document.js';
import { si } from './figures.js';
import { expandPieces, patchCount, piecesRules } from './pieces.js';
import type { Path, Problem } from './problem.js';
import { ascending, exactlyOneOf, RuleReport } from './rules.js';
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

function arrayRules(report: RuleReport, { array }: BoardDocument): void {
  const patches = patchCount(array.patches);
  const why = 'one per patch';
  const whole = piecesRules(report, ['array', 'patches'], array.patches, patches, why);
  if (array.links === undefined) {
    if (patches > 1)
      report.at(['array', 'links'], 'no links', `${patches} patches have ${patches - 1} links between them`);
  } else piecesRules(report, ['array', 'links'], array.links, patches - 1, `one fewer than the ${patches} patches`);
  perColumn(report, ['array', 'offset_x'], array.offset_x, array.columns);
  if (!whole || array.columns === 1) return;
  const widest = Math.max(...expandPieces(array.patches, patches).map((p) => p.width));
  if (si(array.pitch, 'length') <= widest) {
    const allowed = `columns of patches ${formatQuantity(widest, 'length')} wide overlap at this pitch`;
    report.at(['array', 'pitch'], report.written(['array', 'pitch']), allowed);
  }
}

function feedRules(report: RuleReport, { feed, array }: BoardDocument): void {
  perColumn(report, ['feed', 'amplitude'], feed.amplitude, array.columns);
  perColumn(report, ['feed', 'phase'], feed.phase, array.columns);
  if (feed.amplitude.every((a) => a === 0)) {
    report.at(['feed', 'amplitude'], 'nothing but 0', 'at least one column is driven');
  }
  if (Array.isArray(feed.path)) {
    perColumn(report, ['feed', 'path'], feed.path, array.columns);
    feed.path.forEach((path, i) => {
      exactlyOneOf(report, ['feed', 'path', i], path, ['loss', 'line']);
    });
  } else exactlyOneOf(report, ['feed', 'path'], feed.path, ['loss', 'line']);
}

function perColumn(report: RuleReport, path: Path, list: readonly unknown[] | undefined, columns: number): void {
  if (list === undefined || list.length === columns) return;
  report.at(path, `${list.length} ${list.length === 1 ? 'entry' : 'entries'}`, `one per column, ${columns} here`);
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
