import { DIMENSIONS, type Dimension, toBase, type Unit, unitNamed } from './units.js';

/** What is wrong with a quantity as written, in words for the person who wrote it. */
export interface QuantityProblem {
  /** As written, quoted. */
  readonly found: string;
  readonly allowed: string;
  /** A whole sentence, when there is a likely mend. */
  readonly fix?: string;
}

/** Values that make sense in a place, in the base unit of the dimension. */
export interface PlausibleRange {
  readonly low: number;
  readonly high: number;
  /** What the place holds, with article: `the thickness of a laminate`. */
  readonly subject: string;
  /** Unit in which the limits are said, a spelling of the dimension. */
  readonly unit?: string;
}

export type QuantityResult =
  | { readonly ok: true; readonly value: number }
  | { readonly ok: false; readonly problem: QuantityProblem };

/** Spaces that editors and typesetters put between number and unit: plain, no-break, narrow no-break, thin. */
const SPACE = '[ \\t\\u00a0\\u202f\\u2009]*';
const NUMBER = '[+\\u2212-]?(?:[0-9]+(?:\\.[0-9]*)?|\\.[0-9]+)(?:[eE][+\\u2212-]?[0-9]+)?';
const WHOLE = new RegExp(`^${SPACE}(${NUMBER})${SPACE}(.*?)${SPACE}$`, 'u');

const escapePattern = (text: string) => text.replace(/[\\^$.*+?()[\]{}|/]/g, '\\$&');

/** Regular expression source (for the `u` flag, as JSON Schema wants it) that a written quantity matches. */
export function quantityPattern(
  dimension: Dimension,
  options: { nonNegative?: boolean; percent?: boolean } = {},
): string {
  const { units, bareNumber } = DIMENSIONS[dimension];
  const spellings = units.flatMap((u) => u.spellings);
  if (options.percent && !spellings.includes('%')) spellings.push('%');
  const number = options.nonNegative ? NUMBER.replace('[+\\u2212-]?', '\\+?') : NUMBER;
  // A unit that begins with a digit stands apart: 0.003931/K is not 0.00393 1/K.
  return `^${SPACE}${number}(?![0-9])${SPACE}(?:${spellings.map(escapePattern).join('|')})${bareNumber ? '?' : ''}${SPACE}$`;
}

const ascii = (number: string) => number.replaceAll('\u2212', '-').replace(/^\+/, '');

/** Splits `1.2e-3 m` into number and rest; undefined when it does not begin with a number. */
export function splitQuantity(text: string): { readonly number: string; readonly unit: string } | undefined {
  const match = WHOLE.exec(text);
  return match ? { number: ascii(match[1]!), unit: match[2]! } : undefined;
}

/** As written, for a message: quoted, shortened, control characters made visible. */
export function quoted(value: unknown): string {
  if (typeof value !== 'string') return value === null ? 'an empty value' : String(value);
  return `"${visible(value.length > 60 ? `${value.slice(0, 57)}...` : value)}"`;
}

/** Makes control, bidirectional-override and lone surrogate characters visible: messages go to terminals. */
export function visible(text: string): string {
  return text.replace(
    // biome-ignore lint/suspicious/noControlCharactersInRegex: control characters are what is looked for
    /[\u0000-\u001f\u007f-\u009f\u200b-\u200f\u2028-\u202e\u2066-\u2069\ufeff\ud800-\udfff]/gu,
    (c) => `\\u${c.charCodeAt(0).toString(16).padStart(4, '0')}`,
  );
}

function allowedUnits(dimension: Dimension): string {
  const { noun, units, bareNumber } = DIMENSIONS[dimension];
  const names = units.map((u) => u.spellings[0]).join(', ');
  return bareNumber ? `${noun} is a plain number or carries ${names}` : `${noun} here carries its unit: ${names}`;
}

const within = (value: number, range: PlausibleRange | undefined) =>
  Number.isFinite(value) && (range === undefined || (value >= range.low && value <= range.high));

/** Limit of a range as people write it in the given unit. */
function limitText(value: number, u: Unit | undefined): string {
  if (u === undefined) return String(value);
  const raw = (value - (u.offset ?? 0)) / (u.multiplier ?? 1) / 10 ** u.power;
  return String(Number(raw.toPrecision(6)));
}

function rangeText(dimension: Dimension, range: PlausibleRange): string {
  const info = DIMENSIONS[dimension];
  const u = info.bareNumber ? undefined : (unitNamed(dimension, range.unit ?? '') ?? info.units[0]);
  const unitText = u ? ` ${u.spellings[0]}` : '';
  return `${range.subject} lies between ${limitText(range.low, u)} and ${limitText(range.high, u)}${unitText}`;
}

/** The same number in the unit most likely meant, or nothing when none is plausible. */
function mend(
  number: string,
  written: string,
  dimension: Dimension,
  range: PlausibleRange | undefined,
): string | undefined {
  const { units, bareNumber } = DIMENSIONS[dimension];
  const folded = written.toLowerCase().replace(/\s+/g, '').replace(/^c$/, 'degc');
  const alike = units.filter((u) => u.spellings.some((s) => s.toLowerCase() === folded));
  const say = (n: string, u: Unit | undefined) => `Did you mean ${u ? `${n} ${u.spellings[0]}` : n}?`;
  const negated = number.startsWith('-') ? number.slice(1) : `-${number}`;
  for (const n of [number, negated]) {
    // A sign that nobody wrote is guessed only for the unit as written.
    const candidates = n.startsWith('-') && n !== number ? [] : [...alike, ...units.filter((u) => !alike.includes(u))];
    // Without a range to choose by, only a mere misspelling or a missing unit has a likely mend.
    const worthTrying = range ? candidates : alike.length > 0 ? alike : written === '' ? [units[0]!] : [];
    const same = unitNamed(dimension, written);
    if (same && n !== number && within(toBase(n, same), range)) return say(n, same);
    const hit = worthTrying.find((u) => u !== same && within(toBase(n, u), range));
    if (hit) return say(n, hit);
    if (bareNumber && n === number && within(toBase(n, undefined), range)) return say(n, undefined);
  }
  return undefined;
}

/**
 * Reads a quantity as people write it: `127 um`, `-40 degC`, `1.2e-3 m`, `0.9 dB/cm`.
 *
 * @param written    text from a manifest; a number is accepted only where the dimension needs no unit
 * @param dimension  what is due in this place
 * @param range      values that make sense here, in the base unit; outside is a problem too
 * @returns          the number in the base unit of the dimension (SI; degC, dB, dBi, dB/m where it says so), or the problem
 */
export function parseQuantity(written: unknown, dimension: Dimension, range?: PlausibleRange): QuantityResult {
  const fail = (allowed: string, fix?: string): QuantityResult => ({
    ok: false,
    problem: { found: quoted(written), allowed, ...(fix ? { fix } : {}) },
  });
  const { bareNumber } = DIMENSIONS[dimension];
  if (typeof written !== 'string' && typeof written !== 'number') return fail(allowedUnits(dimension));
  const text = String(written);
  const parts = splitQuantity(text);
  if (parts === undefined) return fail(allowedUnits(dimension));
  const u = unitNamed(dimension, parts.unit);
  if (u === undefined && (parts.unit !== '' || !bareNumber)) {
    const comma = /^,([0-9]+)(.*)$/.exec(parts.unit);
    if (comma) return fail('decimals are written with a point', `Write ${parts.number}.${comma[1]}${comma[2]}.`);
    return fail(
      range ? `${allowedUnits(dimension)}; ${rangeText(dimension, range)}` : allowedUnits(dimension),
      mend(parts.number, parts.unit, dimension, range),
    );
  }
  const value = toBase(parts.number, u);
  if (!Number.isFinite(value)) return fail('a finite number');
  if (range && !within(value, range)) {
    return fail(rangeText(dimension, range), mend(parts.number, parts.unit, dimension, range));
  }
  // −0 would print a sign that nobody wrote on purpose.
  return { ok: true, value: value === 0 ? 0 : value };
}
