import { z } from 'zod';
import { DIMENSIONS, type Dimension, type PlausibleRange, quantityPattern } from '../../quantity/index.js';

/**
 * Building blocks of the manifest documents. The zod schemas are the one source of types, shape checks and JSON
 * Schema; what JSON Schema cannot say (units in words, plausible ranges, which maps are one statement) is kept in
 * registries beside them and used by the second pass of the check.
 */

/** A value whose text is judged as a whole. */
export type Leaf =
  | { readonly kind: 'quantity'; readonly dimension: Dimension; readonly range?: PlausibleRange }
  | { readonly kind: 'spread'; readonly dimension: Dimension | 'number' }
  | { readonly kind: 'date' }
  | { readonly kind: 'words'; readonly allowed: string };

export const leaves = z.registry<Leaf>();

/** A map that states one thing: in a variant it replaces the inherited one as a whole and is never merged into it. */
export interface Statement {
  readonly what: string;
  /** For figures: what the value is, and what its lower limit may not fall below (base unit). */
  readonly figure?: { readonly dimension: Dimension | 'number'; readonly floor?: number };
}
export const statements = z.registry<Statement>();

/** Keys of a map that take the place of others: a variant that gives one does not inherit those it names. */
export const replacements = z.registry<Readonly<Record<string, readonly string[]>>>();

function leaf<S extends z.ZodType>(schema: S, info: Leaf): S {
  leaves.add(schema, info);
  return schema;
}
export function statement<S extends z.ZodType>(schema: S, info: Statement): S {
  statements.add(schema, info);
  return schema;
}

export function replacing<S extends z.ZodType>(
  schema: S,
  keys: Readonly<Record<string, readonly (keyof z.infer<S> & string)[]>>,
): S {
  replacements.add(schema, keys);
  return schema;
}

const unitsOf = (dimension: Dimension) => DIMENSIONS[dimension].units.map((u) => u.spellings[0]).join(', ');

/** A number with its unit in one text. */
export function quantity(dimension: Dimension, description: string, range?: PlausibleRange) {
  const schema = z
    .string()
    .regex(new RegExp(quantityPattern(dimension), 'u'))
    .describe(`${description} Number with unit: ${unitsOf(dimension)}.`);
  return leaf(schema, { kind: 'quantity', dimension, ...(range ? { range } : {}) });
}

export const range = (low: number, high: number, subject: string, unit?: string): PlausibleRange => ({
  low,
  high,
  subject,
  ...(unit ? { unit } : {}),
});

/** Some visible text without control characters, lone surrogates and characters that reorder a line: it is printed and signed. */
const PRINTABLE =
  '^(?=[\\s\\S]*\\S)[^\\u0000-\\u0008\\u000b-\\u001f\\u007f-\\u009f\\u202a-\\u202e\\u2066-\\u2069\\ud800-\\udfff]*$';

/** Words for people: one line or a paragraph. */
export const text = (description: string) =>
  leaf(z.string().regex(new RegExp(PRINTABLE, 'u')).max(2000).describe(description), {
    kind: 'words',
    allowed: 'text without control characters, at most 2000 characters',
  });

/** Text of a form of its own, with the words that say what is allowed. */
export const words = <S extends z.ZodType>(schema: S, allowed: string): S => leaf(schema, { kind: 'words', allowed });

/** Name that becomes part of file names and addresses. */
export const id = (description: string) =>
  leaf(
    z
      .string()
      .regex(/^[a-z0-9]+(?:-[a-z0-9]+)*$/u)
      .max(60)
      .describe(`${description} Lower-case letters, digits and single hyphens.`),
    { kind: 'words', allowed: 'an id holds lower-case letters, digits and single hyphens between them, at most 60' },
  );

export const revision = (description: string) =>
  leaf(
    z
      .string()
      .regex(/^[A-Za-z0-9]+(?:[._-][A-Za-z0-9]+)*$/u)
      .max(30)
      .describe(description),
    { kind: 'words', allowed: 'a revision holds letters and digits, joined by point, hyphen or underscore' },
  );

export const date = (description: string) =>
  leaf(
    z
      .string()
      .regex(/^[0-9]{4}-(?:0[1-9]|1[0-2])-(?:0[1-9]|[12][0-9]|3[01])$/u)
      .describe(`${description} YYYY-MM-DD.`),
    { kind: 'date' },
  );

export const reference = (description: string) =>
  leaf(z.string().min(1).max(500).describe(`${description} Relative to this file, with forward slashes.`), {
    kind: 'words',
    allowed: 'a path relative to this file',
  });

export const invented = () =>
  z.boolean().describe('true when the data are invented for demonstration, false when real.');

const provenance = {
  basis: z
    .enum(['guaranteed', 'typical', 'measured', 'estimated'])
    .describe('What the figure rests on. Typical and estimated figures are listed first in the dossier.'),
  method: text('How the figure was obtained.').optional(),
  frequency: quantity(
    'frequency',
    'Frequency at which the figure was taken.',
    range(0, 1e12, 'this frequency', 'GHz'),
  ).optional(),
  direction: z
    .enum(['through_thickness', 'in_plane'])
    .describe('Direction of the field or stress in the laminate when the figure was taken.')
    .optional(),
  document: text('Number of the document that states the figure.').optional(),
  revision: text('Revision of that document, in quotes when it is a number.').optional(),
  date: date('Date of that document.').optional(),
};

const SPREAD = 'How far the figure may lie from its value. 0 when it is exact by definition.';

export function spread(dimension: Dimension | 'number', description = SPREAD) {
  const one = (description: string) => {
    const info: Leaf = { kind: 'spread', dimension };
    if (dimension === 'number') {
      const percent = z
        .string()
        .regex(
          new RegExp(quantityPattern('ratio', { nonNegative: true }).replace('(?:%|percent)?', '(?:%|percent)'), 'u'),
        );
      return leaf(z.union([z.number().min(0), percent]).describe(`${description} A number, or % of the value.`), info);
    }
    const pattern = new RegExp(quantityPattern(dimension, { nonNegative: true, percent: true }), 'u');
    return leaf(z.string().regex(pattern).describe(`${description} With unit, or % of the value.`), info);
  };
  return z
    .union([
      one('Same distance to both limits.'),
      z
        .strictObject({
          minus: one('Distance to the lower limit, at least 0.'),
          plus: one('Distance to the upper limit, at least 0.'),
        })
        .describe('Different distances to the lower and the upper limit.'),
    ])
    .describe(description);
}

/** A figure with a unit: value, spread, basis and source. `extra` adds keys to the same map. */
export function figure<X extends z.ZodRawShape = Record<never, never>>(
  dimension: Dimension,
  description: string,
  plausible: PlausibleRange | undefined,
  options: { readonly floor?: number; readonly extra?: X } = {},
) {
  const schema = z
    .strictObject({
      value: quantity(dimension, 'Nominal value.', plausible),
      spread: spread(dimension),
      ...provenance,
      ...((options.extra ?? {}) as X),
    })
    .describe(description);
  return statement(schema, {
    what: 'a figure',
    figure: { dimension, ...(options.floor === undefined ? {} : { floor: options.floor }) },
  });
}

/** A figure that is a plain number between two limits. */
export function numberFigure<X extends z.ZodRawShape = Record<never, never>>(
  description: string,
  low: number,
  high: number,
  options: { readonly extra?: X } = {},
) {
  const schema = z
    .strictObject({
      value: z.number().min(low).max(high).describe(`Nominal value, a plain number from ${low} to ${high}.`),
      spread: spread('number'),
      ...provenance,
      ...((options.extra ?? {}) as X),
    })
    .describe(description);
  return statement(schema, { what: 'a figure', figure: { dimension: 'number', floor: low } });
}

/** A figure that is a ratio: a plain number, or a text in %. Its spread in % is of the value, as everywhere. */
export function ratioFigure(description: string, plausible: PlausibleRange, options: { readonly floor?: number } = {}) {
  const value = z.union([z.number(), z.string().regex(new RegExp(quantityPattern('ratio'), 'u'))]);
  const schema = z
    .strictObject({
      value: leaf(value.describe('Nominal value: a plain number, or a number in %.'), {
        kind: 'quantity',
        dimension: 'ratio',
        range: plausible,
      }),
      spread: spread('number'),
      ...provenance,
    })
    .describe(description);
  return statement(schema, {
    what: 'a figure',
    figure: { dimension: 'ratio', ...(options.floor === undefined ? {} : { floor: options.floor }) },
  });
}

/** Any figure as it comes out of the check. */
export interface FigureDocument {
  readonly value: string | number;
  readonly spread: string | number | { readonly minus: string | number; readonly plus: string | number };
  readonly basis: 'guaranteed' | 'typical' | 'measured' | 'estimated';
  readonly method?: string | undefined;
  readonly frequency?: string | undefined;
  readonly direction?: 'through_thickness' | 'in_plane' | undefined;
  readonly document?: string | undefined;
  readonly revision?: string | undefined;
  readonly date?: string | undefined;
}

export const declared = () =>
  z
    .array(
      z
        .strictObject({
          id: id('Which property, for instance flammability or peel-strength.'),
          value: z.union([z.number(), text('Words.')]).describe('What is declared: words such as V-0, or a number.'),
          unit: text('Unit of a number.').optional(),
          document: text('Number of the document that declares it.').optional(),
          revision: text('Revision of that document.').optional(),
          date: date('Date of that document.').optional(),
        })
        .describe('One declared property.'),
    )
    .max(100)
    .describe('Properties that a document declares and requirements compare; they are not computed.');

/** Adds keywords to the exported JSON Schema that zod cannot express, such as "exactly one of". */
export const exactlyOne = (...keys: readonly string[]) => ({ oneOf: keys.map((key) => ({ required: [key] })) });
