/** How a published or reference value reached this project. */
export type HowKnown =
  /** The source itself, or the place named with it, was seen. */
  | 'read'
  /** Recalled; the source was not at hand. */
  | 'memory'
  /** Another calculation by another method, made for this project; nothing was measured. */
  | 'independent solution';

/** One value from outside the engine, and how the engine obtains its own. */
export interface EvidenceCheck {
  /** Unique, stable. */
  readonly id: string;
  readonly topic: string;
  readonly quantity: string;
  /** Author, year, where. */
  readonly source: string;
  readonly howKnown: HowKnown;
  readonly expected: number;
  /** Unit of `expected`, `tolerance` and the result; `1` when dimensionless. */
  readonly unit: string;
  /** Largest absolute deviation that passes. */
  readonly tolerance: number;
  /** Why that much. */
  readonly toleranceReason: string;
  readonly compute: () => number;
}

export interface EvidenceResult extends Omit<EvidenceCheck, 'compute'> {
  readonly value: number;
  /** value − expected */
  readonly deviation: number;
  readonly ok: boolean;
}

/** Runs every check, in order. A deviation that is not a number does not pass. */
export function runChecks(checks: readonly EvidenceCheck[]): EvidenceResult[] {
  return checks.map(({ compute, ...check }) => {
    const value = compute();
    const deviation = value - check.expected;
    return { ...check, value, deviation, ok: Math.abs(deviation) <= check.tolerance };
  });
}

/** Words for values that come from the independent calculations. */
export const INDEPENDENT_EDDY =
  'independent eddy-current solutions (2-D surfaces, layered profiles) made for this project, not measured';
export const INDEPENDENT_SECTION =
  'independent quasi-static cross-section solutions made for this project, not measured';
export const INDEPENDENT_FULL_WAVE =
  'independent full-wave spectral-domain solutions made for this project, not measured';

/** Works a value out when first asked for, for checks that share one solution. */
export function once<T>(compute: () => T): () => T {
  let known: { readonly value: T } | undefined;
  return () => {
    known ??= { value: compute() };
    return known.value;
  };
}
