import { type Dimension, parseQuantity, quoted, splitQuantity } from '../quantity/index.js';
import type { FigureDocument } from './documents/fields.js';
import type { Figure, Provenance } from './model.js';
import type { Path } from './problem.js';

/** Distance to a limit, in the base unit; `%` means of the value. Undefined when it cannot be read. */
export function spreadDistance(written: unknown, value: number, dimension: Dimension | 'number'): number | undefined {
  const parts = typeof written === 'string' ? splitQuantity(written) : undefined;
  if (parts && (parts.unit === '%' || parts.unit === 'percent')) {
    const share = parseQuantity(written, 'ratio');
    return share.ok && share.value >= 0 ? Math.abs(value) * share.value : undefined;
  }
  if (dimension === 'number') return typeof written === 'number' && written >= 0 ? written : undefined;
  // A distance between temperatures has no offset; no other dimension has one.
  const read = parseQuantity(written, dimension === 'temperature' ? 'temperature_difference' : dimension);
  return read.ok && read.value >= 0 ? read.value : undefined;
}

/** What is wrong with a spread as written; undefined when nothing is. */
export function spreadProblem(
  written: unknown,
  dimension: Dimension | 'number',
): { readonly found: string; readonly allowed: string; readonly fix?: string } | undefined {
  if (spreadDistance(written, 1, dimension) !== undefined) return undefined;
  const found = quoted(written);
  if (dimension === 'number') {
    const bare = typeof written === 'string' && splitQuantity(written)?.unit === '' ? Number(written) : Number.NaN;
    const fix = bare >= 0 ? `Write ${bare} without quotes.` : undefined;
    return { found, allowed: 'a spread here is a number, at least 0, or % of the value', ...(fix ? { fix } : {}) };
  }
  const read = parseQuantity(written, dimension);
  if (read.ok) return { found, allowed: 'a spread is a distance, at least 0' };
  const { allowed, fix } = read.problem;
  return { found, allowed: `${allowed}, or % of the value`, ...(fix ? { fix } : {}) };
}

/** Number in the base unit from a text that the check has accepted. */
export function si(written: string | number, dimension: Dimension): number {
  const read = parseQuantity(written, dimension);
  if (!read.ok) throw new Error(`unchecked quantity ${quoted(written)} reached the model`);
  return read.value;
}

const DIRECTIONS = { through_thickness: 'through-thickness', in_plane: 'in-plane' } as const;

function provenanceOf(doc: FigureDocument): Provenance {
  const { basis, method, frequency, direction, document, revision, date } = doc;
  return {
    basis,
    ...(method === undefined ? {} : { method }),
    ...(frequency === undefined ? {} : { frequency: si(frequency, 'frequency') }),
    ...(direction === undefined ? {} : { direction: DIRECTIONS[direction] }),
    ...(document === undefined ? {} : { document }),
    ...(revision === undefined ? {} : { revision }),
    ...(date === undefined ? {} : { date }),
  };
}

/** A checked figure document as the model holds it. `path` says where it is written. */
export function figureOf(doc: FigureDocument, dimension: Dimension | 'number', path: string): Figure {
  const value = dimension === 'number' ? Number(doc.value) : si(doc.value, dimension);
  const distance = (written: string | number) => {
    const d = spreadDistance(written, value, dimension);
    if (d === undefined) throw new Error(`unchecked spread ${quoted(written)} reached the model`);
    return d;
  };
  const [minus, plus] =
    typeof doc.spread === 'object'
      ? [distance(doc.spread.minus), distance(doc.spread.plus)]
      : [distance(doc.spread), distance(doc.spread)];
  return { value, minus, plus, provenance: provenanceOf(doc), path };
}

/** The figure that stands at a path of a board. */
export type MakeFigure = (doc: FigureDocument, dimension: Dimension | 'number', path: Path) => Figure;
