/** One part of the uncertainty of a worst value, in the unit of the quantity. One-sided: for and against the limit. */
export interface UncertaintyPart {
  readonly id: string;
  readonly kind: 'engine' | 'roughness' | 'tolerance';
  readonly label: string;
  /** What was done and where the figure comes from. */
  readonly detail: string;
  /** How far the margin may be smaller than the nominal one, ≥ 0; for roughness see `combine`. */
  readonly adverse: number;
  /** How far the margin may be larger than the nominal one, ≥ 0; for roughness see `combine`. */
  readonly favourable: number;
  /** Worst values with the tolerance at its lower and upper limit, nominal view of the texture. */
  readonly atLimits?: { readonly low: number; readonly high: number };
}
