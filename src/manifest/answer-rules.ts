import { DIMENSIONS, type Dimension, toBase, unitNamed } from '../quantity/index.js';
import type { AnswersDocument } from './documents/procurement-document.js';
import { nearest } from './nearest.js';
import type { Path } from './problem.js';
import type { Answer, AskedItem, AskedWords } from './procurement-model.js';
import { RuleReport } from './rules.js';
import { type Node, nodeAt, placeOf } from './tree.js';

export interface AnswerContext {
  readonly rfqNumber: string;
  readonly items: readonly AskedItem[];
  readonly words: readonly AskedWords[];
}

/** A number as answered, in the base unit. */
function inBase(item: AskedItem, written: number): number {
  if (item.dimension === 'number') return written;
  return toBase(String(written), unitNamed(item.dimension, item.unit!));
}

/** All spellings of the unit in which an item is asked; a plain number has none, or 1. */
function spellings({ dimension, unit }: AskedItem): readonly string[] {
  if (dimension === 'number') return ['', '1'];
  return DIMENSIONS[dimension as Dimension].units.find((u) => u.spellings.includes(unit!))!.spellings;
}

/** What is wrong with a returned sheet whose shape has been checked, each at its cell; else its rows. */
export function answersOf(
  root: Node,
  doc: AnswersDocument,
  context: AnswerContext,
): { readonly problems: RuleReport['problems']; readonly rows: readonly Answer[] } {
  const report = new RuleReport(root);
  const items = new Map(context.items.map((item) => [item.id, item]));
  const words = new Set(context.words.map(({ id }) => id));
  const first = new Map<string, number>();
  const rows = doc.map((row, i): Answer => {
    const path: Path = [i];
    if (row.rfq !== undefined && row.rfq !== context.rfqNumber) {
      report.at([...path, 'rfq'], report.written([...path, 'rfq']), `the sheet answers ${context.rfqNumber}`);
    }
    const line = placeOf((nodeAt(root, path) ?? root).mark).line;
    const before = first.get(row.item);
    if (before !== undefined) {
      report.at(
        [...path, 'item'],
        `${report.written([...path, 'item'])} a second time`,
        `an item is answered once; the first is in line ${before}`,
      );
    }
    first.set(row.item, line);
    const item = items.get(row.item);
    if (item) itemRules(report, path, row, item);
    else if (words.has(row.item)) wordRules(report, path, row);
    else unknownItem(report, path, row.item, [...items.keys(), ...words]);
    return answerOf(row, line, item);
  });
  return { problems: report.problems, rows };
}

type Row = AnswersDocument[number];

function unknownItem(report: RuleReport, path: Path, id: string, known: readonly string[]): void {
  const close = nearest(id, known);
  report.at(
    [...path, 'item'],
    report.written([...path, 'item']),
    `the items of this sheet are ${known.join(', ')}`,
    close && `Did you mean ${close}?`,
  );
}

const NUMBERS = ['guaranteed_lower', 'guaranteed_upper', 'typical'] as const;

function itemRules(report: RuleReport, path: Path, row: Row, item: AskedItem): void {
  const at = (key: keyof Row, allowed: string, fix?: string) =>
    report.at([...path, key], report.written([...path, key]), allowed, fix);
  if (!spellings(item).includes(row.unit ?? '')) {
    report.at(
      [...path, 'unit'],
      row.unit === undefined ? 'no unit' : report.written([...path, 'unit']),
      `${item.id} is asked and answered in ${item.unit ?? 'plain numbers'}`,
    );
  }
  const answered = NUMBERS.filter((key) => row[key] !== undefined);
  if (row.not_offered === 'yes' && answered.length > 0) {
    at(answered[0]!, 'an item that is not offered has no figures', 'Empty not_offered or the figures.');
  }
  const { guaranteed_lower: lower, guaranteed_upper: upper, typical } = row;
  if (lower !== undefined && upper !== undefined && lower > upper)
    at('guaranteed_upper', 'it lies above guaranteed_lower or equals it');
  if (lower !== undefined && upper === undefined)
    at('guaranteed_lower', 'a guaranteed range has an upper limit as well', 'Fill guaranteed_upper.');
  if (upper !== undefined && lower === undefined && !item.upperOnly)
    at('guaranteed_upper', 'a guaranteed range has a lower limit as well', 'Fill guaranteed_lower.');
  if (typical !== undefined && ((upper !== undefined && typical > upper) || (lower !== undefined && typical < lower))) {
    at('typical', 'a typical value lies within the guaranteed range');
  }
  for (const key of answered) {
    if (row[key]! < 0 && item.parameter !== 'etched-width') at(key, 'this is at least 0');
    if (item.parameter === 'permittivity' && row[key]! < 1) at(key, 'a relative permittivity is at least 1');
  }
}

function wordRules(report: RuleReport, path: Path, row: Row): void {
  const figure = NUMBERS.find((key) => row[key] !== undefined);
  if (figure)
    report.at(
      [...path, figure],
      report.written([...path, figure]),
      'this item is answered in words',
      'Write it into declaration.',
    );
}

function answerOf(row: Row, line: number, item: AskedItem | undefined): Answer {
  const { alternative, method, declaration } = row;
  const base = (written: number | undefined) => (written === undefined || !item ? undefined : inBase(item, written));
  const some = <K extends string, V>(key: K, value: V | undefined) => (value === undefined ? {} : { [key]: value });
  return {
    item: row.item,
    line,
    notOffered: row.not_offered === 'yes',
    ...some('guaranteedLower', base(row.guaranteed_lower)),
    ...some('guaranteedUpper', base(row.guaranteed_upper)),
    ...some('typical', base(row.typical)),
    ...some('alternative', alternative),
    ...some('method', method),
    ...some('declaration', declaration),
    asked: {
      ...some('nominal', base(row.nominal)),
      ...some('lower', base(row.lower_limit)),
      ...some('upper', base(row.upper_limit)),
    },
  };
}
