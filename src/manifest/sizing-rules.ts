import { taperAmplitudes } from '../physics/taper/index.js';
import { formatQuantity } from '../quantity/index.js';
import type { ArrayDocument } from './documents/array-document.js';
import type { BoardDocument } from './documents/board-document.js';
import { si } from './figures.js';
import type { Path } from './problem.js';
import { taperOf } from './resolve-array.js';
import { exactlyOneOf, type RuleReport } from './rules.js';

/** What the program works out itself, and so is not given beside it. */
const WORKED_OUT: readonly (keyof ArrayDocument)[] = [
  'patches',
  'links',
  'matching',
  'inset',
  'side_feed',
  'termination',
  'retune',
];

/** A layout to be worked out: nothing of it is given, its frequency lies in the band, its taper exists. */
export function sizingRules(report: RuleReport, { array, band }: BoardDocument): void {
  const wanted = array.sized_for;
  if (wanted === undefined) return;
  const path: Path = ['array', 'sized_for'];
  const given = WORKED_OUT.filter((key) => array[key] !== undefined);
  if (given.length > 0) {
    const drop = given.map((key) => `${key}: ~`).join(', ');
    const fix = `Remove what is given beside sized_for; where it is inherited write ${drop}.`;
    report.clash(['array'], [...given, 'sized_for'], 'with sized_for the program works out the column', fix);
  }
  const frequency = si(wanted.frequency, 'frequency');
  if (frequency < si(band.low, 'frequency') || frequency > si(band.high, 'frequency'))
    report.at([...path, 'frequency'], report.written([...path, 'frequency']), 'a frequency in the band of the board');
  const [line, least] = [array.feed_line.width, wanted.least_width].map((text) => si(text, 'length'));
  if (line! < least!) {
    const allowed = `at least the narrowest copper of sized_for, ${formatQuantity(least!, 'length')}`;
    report.at(['array', 'feed_line', 'width'], report.written(['array', 'feed_line', 'width']), allowed);
  }
  taperRules(report, [...path, 'taper'], wanted.taper, wanted.patches);
}

type TaperDocument = NonNullable<ArrayDocument['sized_for']>['taper'];

function taperRules(report: RuleReport, path: Path, taper: TaperDocument, patches: number): void {
  if (taper === 'uniform' || !exactlyOneOf(report, path, taper, ['dolph_chebyshev', 'taylor', 'given'])) return;
  if (taper.given !== undefined && taper.given.length !== patches)
    return void report.at([...path, 'given'], `${taper.given.length} amplitudes`, `one per patch, ${patches} here`);
  if (taper.taylor !== undefined && taper.taylor.n_bar > patches) {
    const where: Path = [...path, 'taylor', 'n_bar'];
    return void report.at(where, String(taper.taylor.n_bar), `at most the number of patches, ${patches}`);
  }
  const amplitudes = taperAmplitudes(taperOf(taper), patches);
  if (amplitudes.some((a) => !(a > 0)))
    report.at(path, 'a taper with amplitudes of 0 or below', 'every patch radiates in phase with the others');
}
