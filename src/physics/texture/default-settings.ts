export interface DefaultSettings {
  /** Nesting index Nic of the filter that takes the waviness off, also the section length, m. */
  readonly longFilter: number;
  /** Five sections, m. */
  readonly evaluationLength: number;
}

/** Largest Ra and Rz of a class, and its nesting index: µm, µm, mm. ISO 21920-3:2021 (from a summary of its default table). */
const CLASSES = [
  [0.02, 0.16, 0.08],
  [0.1, 0.8, 0.25],
  [2, 16, 0.8],
  [10, 80, 2.5],
  [Number.POSITIVE_INFINITY, Number.POSITIVE_INFINITY, 8],
] as const;

/**
 * Settings that a drawing means which states a limit on Ra or Rz and nothing else. Copper foils of 0.1 to 2 µm Ra fall
 * under 0.8 mm: the same foil through a shorter filter shows a lower figure.
 *
 * @param limit largest value that the drawing allows, m, > 0; a class includes its upper limit
 */
export function defaultSettings(parameter: 'Ra' | 'Rz', limit: number): DefaultSettings {
  if (!(limit > 0)) throw new RangeError(`a limit on ${parameter} must be positive, got ${limit}`);
  // A limit of 0.1 µm in metres may lie a rounding above the table's.
  const micrometres = limit * 1e6 * (1 - 1e-12);
  const found = CLASSES.find(([ra, rz]) => micrometres <= (parameter === 'Ra' ? ra : rz)) as (typeof CLASSES)[number];
  return { longFilter: found[2] * 1e-3, evaluationLength: 5 * found[2] * 1e-3 };
}
