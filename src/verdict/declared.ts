import type { Board, DeclaredProperty, Requirement } from '../manifest/model.js';

/** A property as one part of the board declares it. */
export interface Declaration {
  readonly part: string;
  readonly property: DeclaredProperty;
}

/** Every declared property of a board: of the board itself, its laminate, foils and finish, each part once. */
export function declarationsByPart(board: Board): readonly Declaration[] {
  const { strip, laminate, ground } = board.stackUp;
  const parts: readonly (readonly [string, readonly DeclaredProperty[]])[] = [
    ['board', board.declared],
    [`laminate ${laminate.material.id}`, laminate.material.declared],
    [`foil ${strip.foil.id}`, strip.foil.declared],
    ...(ground.foil.id === strip.foil.id ? [] : [[`foil ${ground.foil.id}`, ground.foil.declared] as const]),
    [`finish ${strip.finish.id}`, strip.finish.declared],
  ];
  return parts.flatMap(([part, declared]) => declared.map((property) => ({ part, property })));
}

export interface DeclaredVerdict {
  readonly status: 'meets' | 'misses' | 'not evaluated';
  /** As declared, for print; the value that decides where several parts declare it. */
  readonly value?: number | string;
  readonly unit?: string;
  readonly margin?: number;
  readonly part?: string;
  readonly reason?: string;
}

interface Judged extends DeclaredVerdict {
  /** Sorts the declarations: the one with the smallest number decides. */
  readonly order: number;
}

function judgeOne(requirement: Requirement, { part, property }: Declaration): Judged {
  const { value, unit } = property;
  const given = { value, unit, part };
  const missing = (reason: string): Judged => ({
    ...given,
    status: 'not evaluated',
    reason,
    order: Number.NEGATIVE_INFINITY,
  });
  if (property.document === undefined) return missing(`${part} declares it without naming a document`);
  if (requirement.limit !== undefined) {
    if (typeof value !== 'number')
      return missing(`${part} declares the text "${value}", the requirement has a numeric limit`);
    const sign = requirement.limit.direction === 'at_least' ? 1 : -1;
    const margin = sign * (value - requirement.limit.value);
    return { ...given, margin, status: margin >= 0 ? 'meets' : 'misses', order: margin };
  }
  const allowed = (requirement.allowed ?? []).includes(String(value));
  return { ...given, status: allowed ? 'meets' : 'misses', order: allowed ? 0 : -1 };
}

/**
 * Compares a declared property with its requirement. Every part of the board that declares it must comply; the least
 * favourable declaration is reported. Uncertainty does not apply: a declared limit is the declarer's word.
 */
export function judgeDeclared(requirement: Requirement, board: Board): DeclaredVerdict {
  if (requirement.property === undefined)
    return { status: 'not evaluated', reason: 'the requirement names no property' };
  const declarations = declarationsByPart(board).filter(({ property }) => property.id === requirement.property);
  if (declarations.length === 0) {
    return { status: 'not evaluated', reason: `no part of this board declares "${requirement.property}"` };
  }
  const judged = declarations.map((declaration) => judgeOne(requirement, declaration));
  const { order: _, ...verdict } = judged.reduce((a, b) => (b.order < a.order ? b : a));
  return verdict;
}
