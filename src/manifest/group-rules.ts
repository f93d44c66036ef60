import { quoted } from '../quantity/index.js';
import type { BoardDocument } from './documents/board-document.js';
import { si } from './figures.js';
import type { Path } from './problem.js';
import { dummyColumns } from './resolve-array.js';
import { ascending, type RuleReport } from './rules.js';

/** Which columns are driven, which never, which belong together, and whether a beam can be steered. */
export function groupRules(report: RuleReport, board: BoardDocument): void {
  const dummies = dummyRules(report, board);
  const { groups = [], columns, scan } = board.array;
  const ids = new Set<string>();
  const owner = new Map<number, string>();
  groups.forEach((group, g) => {
    const path: Path = ['array', 'groups', g];
    if (ids.has(group.id)) report.at([...path, 'id'], `${quoted(group.id)} a second time`, 'a group is given once');
    ids.add(group.id);
    group.columns.forEach((number, i) => {
      const where: Path = [...path, 'columns', i];
      const first = owner.get(number);
      if (number > columns) report.at(where, String(number), `the columns are 1 to ${columns}`);
      else if (first !== undefined)
        report.at(where, `column ${number} a second time`, `a column belongs to one group; it is in ${first}`);
      else if (dummies.has(number))
        report.at(where, `the dummy column ${number}`, 'a dummy column belongs to no group');
      owner.set(number, first ?? group.id);
    });
  });
  if (scan === undefined) return;
  ascending(report, ['array', 'scan'], si(scan.low, 'angle'), si(scan.high, 'angle'), ['low', 'high']);
  if (board.feed.amplitude.filter((a) => a > 0).length < 2)
    report.at(['array', 'scan'], 'a scan of a single driven column', 'two driven columns or more steer a beam');
}

/** Numbers (from 1) of the dummy columns that exist. */
function dummyRules(report: RuleReport, { array, feed }: BoardDocument): ReadonlySet<number> {
  const { dummy_columns: dummies, columns } = array;
  const path: Path = ['array', 'dummy_columns'];
  if (dummies === undefined) return new Set();
  if (typeof dummies === 'number' && 2 * dummies >= columns) {
    report.at(path, report.written(path), `so many at each side leave none of the ${columns} columns to be driven`);
    return new Set();
  }
  const found = new Set<number>();
  for (const [i, number] of dummyColumns(array)
    .map((index) => index + 1)
    .entries()) {
    if (number > columns) report.at([...path, i], String(number), `the columns are 1 to ${columns}`);
    else if (found.has(number)) report.at([...path, i], `column ${number} a second time`, 'a column is named once');
    else if ((feed.amplitude[number - 1] ?? 0) > 0) {
      const where: Path = ['feed', 'amplitude', number - 1];
      report.at(where, report.written(where), `column ${number} is a dummy and never driven`, 'Write 0.');
    }
    found.add(number);
  }
  return found;
}
