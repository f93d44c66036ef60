/** Status of one requirement; `incomplete` belongs to boards only. */
export type RequirementStatus = 'meets' | 'undecided' | 'misses' | 'not evaluated' | 'open until measured';

/** Bounds of the margin (distance to the limit, positive inside), in the unit of the quantity. */
export interface Bounds {
  /** Smallest margin over the roughness band less the adverse uncertainty. */
  readonly lower: number;
  /** Largest margin over the roughness band plus the favourable uncertainty. */
  readonly upper: number;
}

/**
 * Decision with a guard band (JCGM 106:2012, 8.3; ILAC-G8:09/2019, guard band on both sides of the limit).
 *
 * Meets where the margin holds under every estimate of the roughness band and with the whole adverse uncertainty; misses
 * where it fails under every estimate and the whole favourable uncertainty; else undecided. Both bounds are taken over the
 * band alone, so the decision is the same whatever is called nominal.
 */
export function decide({ lower, upper }: Bounds): 'meets' | 'undecided' | 'misses' {
  if (lower >= 0) return 'meets';
  if (upper < 0) return 'misses';
  return 'undecided';
}
