import { decimalsFor, formatNumber, fromBase, unitNamed } from '../quantity/index.js';
import type { HeldSide, SideAllowance } from '../verdict/index.js';
import { sideTitle } from './model-words.js';
import type { SheetItem } from './supplier-allowed-fields.js';
import { GAP, statedNumber } from './values.js';

type Measured = Pick<SheetItem, 'dimension' | 'unit'>;

/** In the unit of the item, free of the last bits of conversion. */
export function inUnit({ dimension, unit }: Measured, value: number): number {
  const plain = dimension === 'number' || unit === undefined ? value : fromBase(value, unitNamed(dimension, unit)!);
  return Number(plain.toPrecision(9));
}

export function unitText({ dimension, unit }: Measured): string {
  return dimension === 'number' || unit === undefined ? '–' : unitNamed(dimension, unit)!.symbol;
}

/** Most significant digits that people write; what has more comes from a conversion (Rq from Ra) or a measured file. */
const WRITTEN_DIGITS = 5;
/** With these such a number is printed: a part in a thousand and better, as good as any profile is known. */
const WORKED_OUT_DIGITS = 4;

const workedOut = (value: number): boolean =>
  Math.abs(Number(value.toPrecision(WRITTEN_DIGITS)) - value) > 1e-9 * Math.abs(value);

/** The unit as it stands behind a number, with its space. */
export function unitBehind(item: Measured): string {
  const unit = unitText(item);
  return unit === '–' ? '' : unit === '°' ? unit : `${GAP}${unit}`;
}

/** A manifest's number as it was written, one that was worked out from it rounded. */
const stated = (value: number): string =>
  workedOut(value)
    ? formatNumber(value, decimalsFor(value, WORKED_OUT_DIGITS))
    : statedNumber(value, decimalsFor(value, WRITTEN_DIGITS));

const decimalsOf = (text: string): number => (text.split('.')[1] ?? '').length;

/** The nominal value with as many decimals as its limits. */
export function nominalIn(item: SheetItem): string {
  const value = inUnit(item, item.nominal);
  const sides = item.upperOnly ? (['upper'] as const) : (['lower', 'upper'] as const);
  const decimals = [stated(value), ...sides.map((side) => rawLimit(item, side))].map(decimalsOf);
  return formatNumber(value, Math.max(...decimals));
}

/** Digits that tell a calculated limit from nominal to about two percent of its distance, rounded towards nominal. */
export function towardsNominal(item: Measured & { readonly nominal: number }, value: number): string {
  return cutTowardsNominal(item, value, 0);
}

function cutTowardsNominal(
  item: Measured & { readonly nominal: number },
  value: number,
  leastDecimals: number,
): string {
  const [at, nominal] = [inUnit(item, value), inUnit(item, item.nominal)];
  const decimals = Math.max(leastDecimals, at === nominal ? 0 : decimalsFor(at - nominal, 2));
  const scale = 10 ** decimals;
  const cut = at > nominal ? Math.floor(at * scale + 1e-6) : Math.ceil(at * scale - 1e-6);
  return formatNumber(cut / scale, decimals);
}

/** The limit asked on one side. */
export function limitIn(item: SheetItem, side: 'lower' | 'upper'): string {
  const raw = rawLimit(item, side);
  if (item.limits[side].origin === 'calculated' || workedOut(inUnit(item, item.limits[side].limit))) return raw;
  return formatNumber(inUnit(item, item.limits[side].limit), Math.max(decimalsOf(raw), decimalsOf(nominalIn(item))));
}

function rawLimit(item: SheetItem, side: 'lower' | 'upper'): string {
  const { limit, origin } = item.limits[side];
  if (origin === 'calculated') return towardsNominal(item, limit);
  const value = inUnit(item, limit);
  // Rounding must not allow more than was stated.
  return workedOut(value) ? cutTowardsNominal(item, limit, decimalsFor(value, WORKED_OUT_DIGITS)) : stated(value);
}

export function basisText({ limits: { lower, upper }, upperOnly }: SheetItem): string {
  const word = ({ origin }: HeldSide) => (origin === 'stated' ? 'stated' : 'calculated');
  if (upperOnly || lower.origin === upper.origin) return word(upper);
  return `from: ${word(lower)}; to: ${word(upper)}`;
}

/** What the calculation says of one side. Where allowances are kept inside, only what limits is told. */
export function allowanceText(item: SheetItem, side: 'lower' | 'upper', printed: boolean): string {
  const { allowance, origin } = item.limits[side];
  if (!printed && origin === 'stated') return 'not tighter than stated';
  // That some board does not meet is for nobody outside to read.
  if (allowance.kind === 'not met at nominal') return 'none calculated';
  return wording(item, allowance.kind === 'limited' ? { ...allowance, partly: false } : allowance);
}

/** The whole of it, for pages that stay inside. */
export function wording(item: Measured & { readonly nominal: number }, allowance: SideAllowance): string {
  const gap = unitBehind(item);
  switch (allowance.kind) {
    case 'limited': {
      const { tightest, loosest, byEstimate, partly } = allowance;
      const [near, far] = [towardsNominal(item, tightest), towardsNominal(item, loosest)];
      const estimates =
        byEstimate.length === 1
          ? ` (${byEstimate.map(({ side }) => sideTitle(side).toLowerCase()).join()} estimate)`
          : near === far
            ? ' (all estimates alike)'
            : ` (over the estimates ${near} to ${far}${gap})`;
      return `${near}${gap}${estimates}${partly ? '; some board or estimate already does not meet at nominal and sets none' : ''}`;
    }
    case 'not limited':
      return freeText(item, allowance.searchedTo);
    case 'not met at nominal':
      return 'none set: already not met at nominal';
    case 'not computed':
      return 'not computed';
  }
}

/** Nothing binds from nominal to the end of the search. */
export function freeText(item: Measured & { readonly nominal: number }, searchedTo: number): string {
  return `not limited ${searchedTo < item.nominal ? 'down' : 'up'} to ${stated(inUnit(item, searchedTo))}${unitBehind(item)}`;
}
