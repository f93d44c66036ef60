import { formatQuantity } from '../quantity/index.js';
import type { BoardDocument } from './documents/board-document.js';
import { figureOf } from './figures.js';
import type { ColumnLayout } from './model.js';
import type { RuleReport } from './rules.js';

/** At both limits of the etch tolerance there is still copper where copper is drawn, and none between. */
export function etchRules(report: RuleReport, { tolerances }: BoardDocument, column: ColumnLayout): void {
  if (!tolerances?.etch) return;
  const { value, minus, plus } = figureOf(tolerances.etch, 'length', '');
  const { patches, links, matching = [], feedLine, termination, inset } = column;
  const gap = Math.min(...links.map((link) => link.length), inset?.gap ?? Number.POSITIVE_INFINITY);
  const copper = Math.min(
    ...[...patches, ...links, ...matching, feedLine, ...(termination ? [termination] : [])].map((p) => p.width),
    ...patches.map((patch) => patch.length),
  );
  const limit = (found: string, by: number, narrowest: string, width: number): void => {
    if (by >= width)
      report.at(
        ['tolerances', 'etch'],
        `copper that ${found} by up to ${formatQuantity(by, 'length')}`,
        `the narrowest ${narrowest} of a column is ${formatQuantity(width, 'length')} wide`,
      );
  };
  limit('grows', value + plus, 'gap', gap);
  limit('shrinks', minus - value, 'copper', copper);
}
