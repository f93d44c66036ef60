import type { EvidenceCheck } from './check.js';

/** A figure of the solvers held against something better, before it is worked out. */
export interface AccuracyClaim {
  /** Unique, stable. */
  readonly id: string;
  /** What is held to it. */
  readonly figure: string;
  /** Against what. */
  readonly comparedWith: string;
  /** Over which cases. */
  readonly range: string;
  /** Largest deviation asked for. */
  readonly target: number;
  /** Of `target` and `reached`; `1` when dimensionless. */
  readonly unit: string;
  /** What a reader must know to judge it: why a target is missed, or what the comparison cannot show. */
  readonly remark?: string;
  /** Deviation of each case, in `unit`. */
  readonly deviations: () => readonly number[];
}

/** Deviations of the checks whose id matches, in per cent of what is expected, or in the checks' own unit. */
export function deviationsOf(checks: readonly EvidenceCheck[], id: RegExp, per: 'percent' | 'unit'): number[] {
  const found = checks.filter((check) => id.test(check.id));
  if (found.length === 0) throw new Error(`no check matches ${id}`);
  return found.map(({ compute, expected }) => {
    const deviation = compute() - expected;
    return per === 'percent' ? (100 * deviation) / Math.abs(expected) : deviation;
  });
}

/** Deviation of a value in per cent. */
export const percent = (value: number, expected: number): number => 100 * (value / expected - 1);
