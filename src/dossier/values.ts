import type { Cost, Requirement } from '../manifest/model.js';
import { decimalsFor, formatNumber } from '../quantity/index.js';
import type { Place, RequirementVerdict } from '../verdict/index.js';

/** A no-break space holds number and unit together on a line. */
export const GAP = '\u00a0';

/** How numbers of each requirement unit are printed. Levels are printed to 0.01 dB, angles to 0.1 degree. */
interface Print {
  readonly decimals: number;
  readonly suffix: string;
  /** Of differences: gains differ by dB. */
  readonly difference: string;
}

const PRINT: Readonly<Record<string, Print>> = {
  dBi: { decimals: 2, suffix: `${GAP}dBi`, difference: `${GAP}dB` },
  dB: { decimals: 2, suffix: `${GAP}dB`, difference: `${GAP}dB` },
  deg: { decimals: 1, suffix: '°', difference: '°' },
  'dB/cm': { decimals: 3, suffix: `${GAP}dB/cm`, difference: `${GAP}dB/cm` },
  '1': { decimals: 3, suffix: '', difference: '' },
};

function printOf(unit: string, value: number): Print {
  const own = unit === '' ? '' : `${GAP}${unit}`;
  return PRINT[unit] ?? { decimals: statedDecimals(Number(value.toPrecision(6)), 9), suffix: own, difference: own };
}

function statedDecimals(value: number, most: number): number {
  let decimals = 0;
  while (decimals < most && Number(value.toFixed(decimals)) !== Number(value.toPrecision(12))) decimals++;
  return decimals;
}

/** Fewest decimals that print a stated number in full, for limits and other inputs. */
export const statedNumber = (value: number, most = 9): string => formatNumber(value, statedDecimals(value, most));

export function valueText(value: number | string, unit: string): string {
  if (typeof value === 'string') return unit === '' ? value : `${value}${GAP}${unit}`;
  const { decimals, suffix } = printOf(unit, value);
  return formatNumber(value, decimals) + suffix;
}

/** A signed change or a part of an uncertainty. */
export function changeText(value: number, unit: string): string {
  const { decimals, difference } = printOf(unit, value);
  return formatNumber(value, decimals, { plus: true }) + difference;
}

/** Two changes with one unit: `−1.42 / +0.44 dB`. */
export const changePair = (a: number, b: number, unit: string): string =>
  `${formatNumber(a, printOf(unit, a).decimals, { plus: true })} / ${changeText(b, unit)}`;

/**
 * A margin with its sign. One that would round to zero gets more digits, so that a requirement missed by little never
 * reads as met by nothing.
 */
export function marginText(value: number, unit: string): string {
  const { decimals, difference } = printOf(unit, value);
  const rounds = Math.abs(value) < 0.5 * 10 ** -decimals;
  // Below a millionth of the printed unit a margin is rounding of the arithmetic.
  const digits = rounds && Math.abs(value) > 1e-6 ? decimalsFor(value, 1) : decimals;
  return formatNumber(value, digits, { plus: true }) + difference;
}

export function limitText(requirement: Requirement, unit: string): string {
  if (requirement.quantity === 'pattern_mask') return 'inside the mask';
  const { limit, allowed } = requirement;
  if (limit === undefined) return (allowed ?? []).join(' or ');
  const suffix = PRINT[unit]?.suffix ?? (unit === '' ? '' : `${GAP}${unit}`);
  return `${limit.direction === 'at_least' ? '≥' : '≤'}${GAP}${statedNumber(limit.value)}${suffix}`;
}

export const gigahertz = (hertz: number, decimals = 2): string => `${formatNumber(hertz / 1e9, decimals)}${GAP}GHz`;
export const bandText = ({ low, high }: { readonly low: number; readonly high: number }): string =>
  `${statedNumber(low / 1e9, 4)} to ${statedNumber(high / 1e9, 4)}${GAP}GHz`;
/** Prices to the hundredth, as quotations have them. */
export const costText = (cost: Cost): string => `${formatNumber(cost.amount, 2)}${GAP}${cost.currency}`;

export const celsius = (degrees: number): string => `${statedNumber(degrees, 1)}${GAP}°C`;
export const temperatureText = ({ lowC, highC }: { readonly lowC: number; readonly highC: number }): string =>
  `${statedNumber(lowC, 1)} to ${statedNumber(highC, 1)}${GAP}°C`;
export const placeText = (place: Place): string => `${gigahertz(place.frequency)}, ${celsius(place.temperatureC)}`;

/** `−1.42 / +0.44 dB`: how far the margin may be smaller and larger. */
export function uncertaintyText({ adverse, favourable }: RequirementVerdict, unit: string): string {
  if (adverse === undefined || favourable === undefined) return '–';
  return changePair(-adverse, favourable, unit);
}

const SUPERSCRIPT: Readonly<Record<string, string>> = Object.fromEntries(
  [...'0123456789-'].map((c, i) => [c, '⁰¹²³⁴⁵⁶⁷⁸⁹⁻'[i]]),
);

/** Very small or large numbers as `3.1 × 10⁻¹³`. */
export function scientific(value: number): string {
  if (value === 0 || !Number.isFinite(value)) return formatNumber(value, 0);
  const [mantissa, exponent] = value.toExponential(1).split('e');
  const power = [...String(Number(exponent))].map((c) => SUPERSCRIPT[c]).join('');
  return `${mantissa.replace('-', '−')}${GAP}×${GAP}10${power}`;
}

export const count = (n: number, one: string, many = `${one}s`): string => `${n} ${n === 1 ? one : many}`;

/** Below this a residual is rounding noise, which differs from one machine to the next and must not reach a page. */
const NOISE = -12;

/** Exponent of the power of ten above a residual. */
export const exponentAbove = (value: number): number =>
  value === 0 ? NOISE : Math.max(NOISE, Math.ceil(Math.log10(Math.abs(value))));

/** The power of ten above a residual: `10⁻¹²`. */
export function powerAbove(value: number): string {
  const power = exponentAbove(value);
  return `10${[...String(power)].map((c) => SUPERSCRIPT[c]).join('')}`;
}

/** For chart data: rounded so that pages do not carry digits nobody can read. */
export const rounded = (value: number, decimals: number): number => Number(value.toFixed(decimals)) + 0;
