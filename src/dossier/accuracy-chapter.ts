import type { Accuracy } from '../evidence/index.js';
import { decimalsFor, formatNumber } from '../quantity/index.js';
import { cell, chapter, number, prose, table } from './blocks.js';
import type { Chapter } from './document.js';
import { count, GAP, scientific } from './values.js';

/** A size with so many significant digits; very small ones as a power of ten. */
function sized(value: number, digits: number): string {
  if (!Number.isFinite(value)) return 'no number';
  if (value !== 0 && Math.abs(value) < 1e-4) return scientific(value);
  return formatNumber(value, decimalsFor(value, digits));
}

/** A unit of several words may break from its number. */
const withUnit = (text: string, unit: string): string =>
  unit === '1' || unit === '' ? text : `${text}${unit.includes(' ') ? ' ' : GAP}${unit}`;

/** Far below the target a deviation is rounding noise, which differs from one machine to the next. */
const FAR_BELOW = 0.01;

function reachedText({ reached, target, unit }: Accuracy): string {
  return reached < FAR_BELOW * target
    ? `below ${withUnit(sized(FAR_BELOW * target, 1), unit)}`
    : withUnit(sized(reached, 2), unit);
}

/** What the solvers are held to and what they reach, the largest deviation over all cases of a line. */
export function accuracyChapter(accuracy: readonly Accuracy[]): Chapter {
  const missed = accuracy.filter(({ met }) => !met).length;
  if (accuracy.length === 0) {
    return chapter(
      'solver-accuracy',
      'Accuracy of the solvers',
      prose('The solvers were not compared for this build.'),
    );
  }
  return chapter(
    'solver-accuracy',
    'Accuracy of the solvers',
    prose(
      `Worked out anew for this build: ${accuracy.length - missed} of ${count(accuracy.length, 'figure')} within the target. `,
      'Reached is the largest deviation over all cases. Nothing here is compared with a measurement.',
    ),
    table(
      'solver-accuracy-table',
      'Accuracy of the solvers: what each figure is compared with, the target, and what is reached',
      ['Figure|1.8', 'Compared with|1.4', 'Range|1.8', '#Target|0.8', '#Reached|0.9', 'Result|2'],
      accuracy.map((entry) => [
        cell(entry.figure),
        cell(entry.comparedWith),
        cell(`${entry.range}; ${count(entry.cases, 'case')}`),
        number(withUnit(sized(entry.target, 2), entry.unit)),
        number(reachedText(entry)),
        cell(
          entry.met ? 'within target' : { strong: 'target missed' },
          ...(entry.remark === undefined ? [] : [`. ${entry.remark}`]),
        ),
      ]),
    ),
  );
}
