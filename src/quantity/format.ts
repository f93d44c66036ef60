import { DIMENSIONS, type Dimension, fromBase, type Unit, unitNamed } from './units.js';

/** A no-break space holds number and unit together on a line. */
const GAP = '\u00a0';
const MINUS = '\u2212';
const ABSENT = '\u2013';

export interface FormatOptions {
  /** A spelling of the dimension; otherwise the unit engineers use for this size. `1` prints a ratio as a plain number. */
  readonly unit?: string;
  /** Digits after the point; otherwise fixed by dimension and size. */
  readonly decimals?: number;
  /** `+` before positive values, for differences. */
  readonly plus?: boolean;
}

/** Number with a fixed count of decimals, U+2212 as minus, never a negative zero. En dash for NaN. */
export function formatNumber(value: number, decimals: number, options: { readonly plus?: boolean } = {}): string {
  if (Number.isNaN(value)) return ABSENT;
  const sign = (negative: boolean, zero: boolean) => (zero ? '' : negative ? MINUS : options.plus ? '+' : '');
  if (!Number.isFinite(value)) return `${sign(value < 0, false)}\u221e`;
  const digits = Math.abs(value).toFixed(decimals);
  return `${sign(value < 0, Number(digits) === 0)}${digits}`;
}

/** Decimals that leave about so many significant digits, between 0 and 9. */
export function decimalsFor(value: number, significant: number): number {
  if (value === 0 || !Number.isFinite(value)) return 0;
  const exponent = Math.floor(Math.log10(Math.abs(value)) + 1e-12);
  return Math.min(9, Math.max(0, significant - 1 - exponent));
}

function customaryUnit(dimension: Dimension, value: number): Unit | undefined {
  const size = Math.abs(value);
  const named = (spelling: string) => unitNamed(dimension, spelling);
  switch (dimension) {
    case 'length':
      return named(
        size === 0 || (size >= 1e-8 && size < 0.9995e-3) ? 'um' : size < 1e-8 ? 'nm' : size < 0.9995 ? 'mm' : 'm',
      );
    case 'frequency':
      return named(size >= 1e12 ? 'THz' : size >= 1e9 ? 'GHz' : size >= 1e6 ? 'MHz' : size >= 1e3 ? 'kHz' : 'Hz');
    case 'temperature_coefficient':
      return named(size < 1e-3 ? 'ppm/K' : '%/K');
    case 'conductivity':
      return named(size >= 1e5 ? 'MS/m' : 'S/m');
    case 'resistance':
      return named(size >= 1e3 ? 'kohm' : size >= 0.1 || size === 0 ? 'ohm' : 'mohm');
    default:
      return DIMENSIONS[dimension].units[0];
  }
}

/** Decimals that the trade prints: fixed for levels, angles and frequencies, three significant digits for the rest. */
function customaryDecimals(dimension: Dimension, inUnit: number, u: Unit | undefined): number {
  switch (dimension) {
    case 'level':
    case 'gain':
      return 2;
    case 'loss_per_length':
      return u?.symbol === 'dB/m' ? 1 : 3;
    case 'angle':
      return u?.symbol === 'rad' ? 4 : 1;
    case 'frequency':
      return u?.symbol === 'Hz' ? 0 : 2;
    case 'temperature':
      return Math.abs(inUnit - Math.round(inUnit)) < 0.05 ? 0 : 1;
    case 'ratio':
      return u ? 1 : decimalsFor(inUnit, 3);
    default:
      return decimalsFor(inUnit, 3);
  }
}

function withUnit(number: string, u: Unit | undefined): string {
  if (u === undefined) return number;
  return u.symbol === '°' ? `${number}${u.symbol}` : `${number}${GAP}${u.symbol}`;
}

function chooseUnit(dimension: Dimension, value: number, spelling: string | undefined): Unit | undefined {
  if (spelling === undefined) return customaryUnit(dimension, value);
  if (DIMENSIONS[dimension].bareNumber && spelling === '1') return undefined;
  const u = unitNamed(dimension, spelling);
  if (u === undefined) throw new RangeError(`"${spelling}" is no unit of ${DIMENSIONS[dimension].noun}`);
  return u;
}

/**
 * A quantity for people: `127 µm`, `76.50 GHz`, `−12.40 dB`, `3.1°`.
 *
 * @param value  in the base unit of the dimension; NaN prints an en dash
 * @throws RangeError when `unit` is not one of the dimension's
 */
export function formatQuantity(value: number, dimension: Dimension, options: FormatOptions = {}): string {
  const u = chooseUnit(dimension, value, options.unit);
  if (Number.isNaN(value)) return ABSENT;
  const inUnit = u ? fromBase(value, u) : value;
  const decimals = options.decimals ?? customaryDecimals(dimension, inUnit, u);
  return withUnit(formatNumber(inUnit, decimals, options), u);
}

/** Fewest decimals that print a spread to half a percent of itself and the value to two percent of the spread. */
function spreadDecimals(value: number, spreads: readonly number[]): number {
  const fits = (x: number, decimals: number, error: number) => Math.abs(Number(x.toFixed(decimals)) - x) <= error;
  const smallest = Math.min(...spreads.filter((s) => s > 0));
  for (let decimals = 0; decimals < 12; decimals++) {
    if (spreads.every((s) => fits(s, decimals, s * 0.005)) && fits(value, decimals, smallest * 0.02)) return decimals;
  }
  return 12;
}

/**
 * A value with its spread: `3.00 ± 0.05`, `127 ± 8 µm`, `0.0015 (−0.0002, +0.0004)`.
 * Without a spread only the value is printed, with as many digits as it needs (up to six).
 *
 * @param value      base unit of the dimension, or a plain number with dimension `number`
 * @param minus      distance to the lower limit, ≥ 0, same unit
 * @param plus       distance to the upper limit, ≥ 0, same unit
 */
export function formatSpread(
  value: number,
  minus: number,
  plus: number,
  dimension: Dimension | 'number',
  options: { readonly unit?: string } = {},
): string {
  const size = Math.max(Math.abs(value), minus, plus);
  const u = dimension === 'number' ? undefined : chooseUnit(dimension, size, options.unit);
  const spreadUnit = u && { ...u, offset: 0 };
  const [v, lower, upper] = [
    u ? fromBase(value, u) : value,
    spreadUnit ? fromBase(minus, spreadUnit) : minus,
    spreadUnit ? fromBase(plus, spreadUnit) : plus,
  ];
  if (!(lower > 0) && !(upper > 0)) {
    let decimals = 0;
    while (decimals < 12 && Number(v.toFixed(decimals)) !== Number(v.toPrecision(6))) decimals++;
    return withUnit(formatNumber(v, decimals), u);
  }
  const decimals = spreadDecimals(v, [lower, upper]);
  const text = (x: number, plusSign = false) => formatNumber(x, decimals, { plus: plusSign });
  const unitText = u ? (u.symbol === '°' ? '°' : `${GAP}${u.symbol}`) : '';
  return lower === upper
    ? `${text(v)} ± ${text(lower)}${unitText}`
    : `${text(v)} (${text(-lower)}, ${text(upper, true)})${unitText}`;
}
