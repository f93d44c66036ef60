import type { BoardDocument } from './documents/board-document.js';
import { exactlyOneOf, perColumn, type RuleReport } from './rules.js';

/** How the columns are driven: weights for each, and one way from the gain reference plane to them. */
export function feedRules(report: RuleReport, { feed, array }: BoardDocument): void {
  const { path, network } = feed;
  perColumn(report, ['feed', 'amplitude'], feed.amplitude, array.columns);
  perColumn(report, ['feed', 'phase'], feed.phase, array.columns);
  if (feed.amplitude.every((a) => a === 0)) {
    report.at(['feed', 'amplitude'], 'nothing but 0', 'at least one column is driven');
  }
  exactlyOneOf(report, ['feed'], feed, ['path', 'network']);
  if (network !== undefined && feed.amplitude.filter((a) => a > 0).length === 1)
    report.at(['feed', 'network'], 'a network to a single driven column', 'two driven columns or more', 'Write path.');
  if (Array.isArray(path)) {
    perColumn(report, ['feed', 'path'], path, array.columns);
    path.forEach((one, i) => {
      exactlyOneOf(report, ['feed', 'path', i], one, ['loss', 'line']);
    });
  } else if (path !== undefined) exactlyOneOf(report, ['feed', 'path'], path, ['loss', 'line']);
}
