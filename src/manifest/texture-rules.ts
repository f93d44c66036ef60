import { areaRatiosOf } from '../physics/roughness/index.js';
import { formatQuantity } from '../quantity/index.js';
import {
  MAXIMUM_HEIGHTS,
  MEAN_HEIGHTS,
  MEASURED_INSTEAD,
  type MeasuredDocument,
  type NodulesDocument,
  TEXTURE_PARAMETERS,
  type TextureDocument,
} from './documents/texture-document.js';
import { figureOf, spreadDistance } from './figures.js';
import type { Path } from './problem.js';
import { noduleOf, sharesOf, textureOf } from './resolve-texture.js';
import { exactlyOneOf, type RuleReport } from './rules.js';

/** A larger plain number as Sdr is rather a forgotten % than a surface five times as large as its base. */
const LARGEST_BARE_SDR = 5;
const LARGEST_SDR = 20;
/**
 * Correlation length and area ratio that no spectrum with the Rq brings together within this factor are a wrong unit
 * somewhere. Within it the estimates weigh them: lateral resolution takes off area, nodules add some.
 */
const FACTOR_AT_ODDS = 20;

const written = (doc: TextureDocument, keys: readonly string[]): readonly string[] =>
  keys.filter((key) => Object.hasOwn(doc, key));

/** What must hold between the keys of one texture whose shape has been checked. */
export function textureRules(report: RuleReport, path: Path, doc: TextureDocument): void {
  const sound = report.problems.length;
  if (doc.measured) measuredRules(report, path, doc, doc.measured);
  else heightRules(report, path, doc);
  if (doc.Sal && doc.correlation_length) {
    report.atKey(
      [...path, 'correlation_length'],
      'Sal and correlation_length together',
      'one of them is stated: each gives the other',
    );
  }
  if (doc.Sal_threshold !== undefined && !doc.Sal) {
    report.atKey([...path, 'Sal_threshold'], 'Sal_threshold without Sal', 'it says at which value Sal was taken');
  }
  if (doc.nodules) noduleRules(report, [...path, 'nodules'], doc.nodules);
  if (doc.Sdr) areaRules(report, [...path, 'Sdr'], doc.Sdr);
  if (report.problems.length === sound) oddsRules(report, path, doc);
}

function measuredRules(report: RuleReport, path: Path, doc: TextureDocument, measured: MeasuredDocument): void {
  for (const key of written(doc, MEASURED_INSTEAD)) {
    report.atKey(
      [...path, key],
      `measured and ${key} together`,
      `the measured file ${report.written([...path, 'measured', 'file'])} gives heights, length and area itself, with the filters stated there`,
      `Remove ${key}, or remove measured.`,
    );
  }
  if (!filtersAscend(measured)) {
    const at = [...path, 'measured'];
    const [short, long] = ['short_nesting_index', 'long_nesting_index'].map((key) => report.written([...at, key]));
    report.at(
      [...at, 'long_nesting_index'],
      `short_nesting_index ${short} and long_nesting_index ${long}`,
      'the long nesting index lies above the short one',
    );
  }
  if (sharesOf(measured).minus >= 1) {
    report.at(
      [...path, 'measured', 'spread'],
      'a spread of 100 % or more',
      'with it the lower limit of every figure falls to 0 or below',
    );
  }
}

export function filtersAscend(measured: MeasuredDocument): boolean {
  const [short, long] = [indexOf(measured.short_nesting_index), indexOf(measured.long_nesting_index)];
  return short === undefined || long === undefined || short < long;
}

const indexOf = (text: string | undefined): number | undefined =>
  text === undefined ? undefined : spreadDistance(text, 0, 'length');

function heightRules(report: RuleReport, path: Path, doc: TextureDocument): void {
  const means = written(doc, MEAN_HEIGHTS);
  const maxima = written(doc, MAXIMUM_HEIGHTS);
  if (means.length + maxima.length === 0) {
    const keys = TEXTURE_PARAMETERS.join(', ');
    report.at(path, `none of ${keys}, measured`, 'a height or a measured file is needed');
    return;
  }
  for (const [keys, allowed] of [
    [means, `one of ${MEAN_HEIGHTS.join(', ')} is stated; Rz or Sz may stand beside it`],
    [maxima, 'one of Rz, Sz is stated'],
  ] as const) {
    if (keys.length > 1) report.atKey([...path, keys[1]!], `${keys.join(' and ')} together`, allowed);
  }
  if (means.length !== 1 || maxima.length !== 1) return;
  const [mean, most] = [means[0]!, maxima[0]!];
  const { stated, rz } = textureOf({ ...doc, nodules: undefined }, '');
  // Of heights about their mean between −v and p the mean square is at most pv, and p + v at least twice its root.
  if (rz && rz.value < 2 * stated.value * (1 - 1e-9)) {
    report.at(
      [...path, most, 'value'],
      `${most} ${report.written([...path, most, 'value'])} with ${mean} ${report.written([...path, mean, 'value'])}`,
      `a maximum height is at least twice ${mean}`,
      rz.value < stated.value ? 'Are the two exchanged?' : undefined,
    );
  }
}

/** Balls that touch at the most, also with radius or pitch alone at its limit. */
function noduleRules(report: RuleReport, path: Path, nodules: NodulesDocument): void {
  if (!exactlyOneOf(report, path, nodules, ['pitch', 'per_area'])) return;
  const key = nodules.pitch ? 'pitch' : 'per_area';
  const { radius, pitch } = noduleOf(nodules, '');
  const um = (x: number) => formatQuantity(x, 'length');
  const tight = (a: number, b: number) => a < 2 * b * (1 - 1e-9);
  if (tight(pitch.value, radius.value)) {
    const half = report.written([...path, 'radius', 'value']);
    const meant = !tight(pitch.value, radius.value / 2) ? 'Is the radius a diameter?' : undefined;
    const apart = key === 'pitch' ? '' : `, that is a pitch of ${um(pitch.value)}`;
    report.at(
      [...path, key, 'value'],
      `${report.written([...path, key, 'value'])}${apart}, for a radius of ${half}`,
      `nodules do not overlap: their pitch is at least two radii, ${um(2 * radius.value)}`,
      meant,
    );
    return;
  }
  const spreads = [
    [key, pitch.value - pitch.minus, radius.value],
    ['radius', pitch.value, radius.value + radius.plus],
  ] as const;
  for (const [which, p, r] of spreads) {
    if (!tight(p, r)) continue;
    report.at(
      [...path, which, 'spread'],
      `a spread to a ${which === 'radius' ? 'radius' : 'pitch'} of ${um(which === 'radius' ? r : p)}`,
      `with it nodules overlap: the pitch is at least two radii, ${um(2 * r)}, and here ${um(p)}`,
    );
  }
}

function areaRules(report: RuleReport, at: Path, sdr: NonNullable<TextureDocument['Sdr']>): void {
  const { value } = sdr;
  const ratio = figureOf(sdr, 'ratio', '');
  if (typeof value === 'number' && value > LARGEST_BARE_SDR) {
    report.at(
      [...at, 'value'],
      String(value),
      `a plain number is the ratio itself, so that this is ${100 * value} %`,
      `Did you mean ${value} %? Write ${100 * value} % where it is meant.`,
    );
    return;
  }
  if (ratio.value + ratio.plus > LARGEST_SDR) {
    report.at([...at, 'spread'], 'an upper limit above 2000 %', 'the developed area ratio of copper ends at 2000 %');
  }
}

/** Correlation length and area ratio of one Rq, where a wrong unit is the likelier explanation. */
function oddsRules(report: RuleReport, path: Path, doc: TextureDocument): void {
  if (doc.measured || written(doc, TEXTURE_PARAMETERS).length === 0) return;
  const { rq, correlationLength: length, developedAreaRatio: ratio, lay } = textureOf(doc, '');
  if (!length || !ratio || !(rq.value > 0)) return;
  const { least, most } = areaRatiosOf(rq.value, length.value, lay ?? 'isotropic');
  if (ratio.value >= least / FACTOR_AT_ODDS && ratio.value <= most * FACTOR_AT_ODDS) return;
  const percent = (x: number) => `${Number((100 * x).toPrecision(2))} %`;
  const from = doc.Sal ? 'Sal' : 'correlation_length';
  report.at(
    [...path, 'Sdr', 'value'],
    `Sdr ${report.written([...path, 'Sdr', 'value'])} with ${from} ${report.written([...path, from, 'value'])}`,
    `a texture of this Rq and correlation length has an area ratio of some ${percent(least)} to ${percent(most)}; a factor of ${FACTOR_AT_ODDS} beyond is no texture`,
    'Are all units right? Otherwise state only the one that you trust.',
  );
}
