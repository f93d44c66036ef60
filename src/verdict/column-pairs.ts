import type { Board, Requirement } from '../manifest/model.js';

/** Pairs of columns (from 0) of which one belongs to each of two groups: those that a requirement names, or any two. */
export function columnPairs({ groups = [] }: Board, between: Requirement['between']): (readonly [number, number])[] {
  const pairs = groups.flatMap((a, i) => groups.slice(i + 1).map((b) => [a, b] as const));
  return pairs
    .filter(([a, b]) => between === undefined || (between.includes(a.id) && between.includes(b.id)))
    .flatMap(([a, b]) => a.columns.flatMap((m) => b.columns.map((n) => [m, n] as const)));
}
