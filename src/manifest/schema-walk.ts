import type { z } from 'zod';
import { leaves } from './documents/fields.js';
import type { Node } from './tree.js';

/** The parts of a zod definition that a walk needs. */
type Schema = z.ZodType;
interface Definition {
  readonly type: string;
  readonly innerType?: Schema;
  readonly shape?: Readonly<Record<string, Schema>>;
  readonly element?: Schema;
  readonly options?: readonly Schema[];
}
const definition = (schema: Schema) => (schema as unknown as { def: Definition }).def;

/** The schema without `optional`, `nullable` and their like around it. */
export function bare(schema: Schema): Schema {
  const { type, innerType } = definition(schema);
  return (type === 'optional' || type === 'nullable' || type === 'nonoptional') && innerType ? bare(innerType) : schema;
}

export const shapeOf = (schema: Schema): Readonly<Record<string, Schema>> | undefined => definition(bare(schema)).shape;
export const elementOf = (schema: Schema): Schema | undefined => {
  const def = definition(bare(schema));
  return def.type === 'array' ? def.element : undefined;
};
export const optionsOf = (schema: Schema): readonly Schema[] | undefined => definition(bare(schema)).options;
export const isNullable = (schema: Schema): boolean => {
  const { type, innerType } = definition(schema);
  return type === 'nullable' || (type === 'optional' && innerType !== undefined && isNullable(innerType));
};
export const typeOf = (schema: Schema): string => definition(bare(schema)).type;

/** Of a choice between a map, a list and a plain value, the one that the written value is; the schema itself if it is no choice. */
export function choose(schema: Schema, node: Node): Schema {
  const plain = bare(schema);
  const options = leaves.get(plain) ? undefined : optionsOf(plain);
  if (options === undefined) return plain;
  const wanted = node.kind === 'map' ? 'object' : node.kind === 'list' ? 'array' : undefined;
  const fits = (option: Schema) => {
    const type = typeOf(option);
    return wanted ? type === wanted : type !== 'object' && type !== 'array';
  };
  const fitting = options.filter(fits);
  // Among several plain values the last is the general one (a literal word stands before a quantity).
  const chosen = fitting.at(-1) ?? options[0]!;
  const literal = node.kind === 'scalar' ? fitting.find((o) => o.safeParse(node.value).success) : undefined;
  return choose(literal ?? chosen, node);
}
