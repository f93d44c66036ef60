import type { Requirement } from '../manifest/model.js';
import { decimalsFor, formatNumber } from '../quantity/index.js';
import type { Place, RequirementVerdict } from '../verdict/index.js';

/** How numbers of each requirement unit are printed. Levels are printed to 0.01 dB, angles to 0.1 degree. */
interface Print {
  readonly decimals: number;
  readonly suffix: string;
  /** Of differences: gains differ by dB. */
  readonly difference: string;
}

const PRINT: Readonly<Record<string, Print>> = {
  dBi: { decimals: 2, suffix: ' dBi', difference: ' dB' },
  dB: { decimals: 2, suffix: ' dB', difference: ' dB' },
  deg: { decimals: 1, suffix: '°', difference: '°' },
  'dB/cm': { decimals: 3, suffix: ' dB/cm', difference: ' dB/cm' },
  '1': { decimals: 3, suffix: '', difference: '' },
};

function printOf(unit: string, value: number): Print {
  const own = unit === '' ? '' : ` ${unit}`;
  return PRINT[unit] ?? { decimals: decimalsFor(value, 4), suffix: own, difference: own };
}

/** Fewest decimals that print a stated number in full, for limits and other inputs. */
export function statedNumber(value: number, most = 9): string {
  let decimals = 0;
  while (decimals < most && Number(value.toFixed(decimals)) !== Number(value.toPrecision(12))) decimals++;
  return formatNumber(value, decimals);
}

export function valueText(value: number | string, unit: string): string {
  if (typeof value === 'string') return unit === '' ? value : `${value} ${unit}`;
  const { decimals, suffix } = printOf(unit, value);
  return formatNumber(value, decimals) + suffix;
}

/**
 * A difference with its sign. A margin that would round to zero gets more digits, so that a requirement missed by little
 * never reads as met by nothing.
 */
export function differenceText(value: number, unit: string): string {
  return differenceNumber(value, unit) + printOf(unit, value).difference;
}

function differenceNumber(value: number, unit: string): string {
  const { decimals } = printOf(unit, value);
  const rounds = Math.abs(value) < 0.5 * 10 ** -decimals;
  // Below a millionth of the printed unit a difference is rounding of the arithmetic.
  const digits = value !== 0 && rounds && Math.abs(value) > 1e-6 ? decimalsFor(value, 1) : decimals;
  return formatNumber(value, digits, { plus: true });
}

export function limitText(requirement: Requirement, unit: string): string {
  if (requirement.quantity === 'pattern_mask') return 'inside the mask';
  const { limit, allowed } = requirement;
  if (limit === undefined) return (allowed ?? []).join(' or ');
  const suffix = PRINT[unit]?.suffix ?? (unit === '' ? '' : ` ${unit}`);
  return `${limit.direction === 'at_least' ? '≥' : '≤'} ${statedNumber(limit.value)}${suffix}`;
}

export const gigahertz = (hertz: number, decimals = 2): string => `${formatNumber(hertz / 1e9, decimals)} GHz`;
export const bandText = ({ low, high }: { readonly low: number; readonly high: number }): string =>
  `${statedNumber(low / 1e9, 4)} to ${statedNumber(high / 1e9, 4)} GHz`;
export const celsius = (degrees: number): string => `${statedNumber(degrees, 1)} °C`;
export const temperatureText = ({ lowC, highC }: { readonly lowC: number; readonly highC: number }): string =>
  `${statedNumber(lowC, 1)} to ${statedNumber(highC, 1)} °C`;
export const placeText = (place: Place): string => `${gigahertz(place.frequency)}, ${celsius(place.temperatureC)}`;

/** `−1.42 / +0.44 dB`: how far the margin may be smaller and larger. */
export function uncertaintyText({ adverse, favourable }: RequirementVerdict, unit: string): string {
  if (adverse === undefined || favourable === undefined) return '–';
  return `${differenceNumber(-adverse, unit)} / ${differenceText(favourable, unit)}`;
}

const SUPERSCRIPT: Readonly<Record<string, string>> = Object.fromEntries(
  [...'0123456789-'].map((c, i) => [c, '⁰¹²³⁴⁵⁶⁷⁸⁹⁻'[i]]),
);

/** Very small or large numbers as `3.1 × 10⁻¹³`. */
export function scientific(value: number): string {
  if (value === 0 || !Number.isFinite(value)) return formatNumber(value, 0);
  const [mantissa, exponent] = value.toExponential(1).split('e');
  const power = [...String(Number(exponent))].map((c) => SUPERSCRIPT[c]).join('');
  return `${mantissa.replace('-', '−')} × 10${power}`;
}

export const count = (n: number, one: string, many = `${one}s`): string => `${n} ${n === 1 ? one : many}`;

/** For chart data: rounded so that pages do not carry digits nobody can read. */
export const rounded = (value: number, decimals: number): number => Number(value.toFixed(decimals)) + 0;
