/**
 * What a reader must know of how far a figure can be trusted. Physics returns these beside its numbers;
 * the dossier prints them. A flag never stops a calculation.
 */
export interface ValidityFlag {
  /** Stable short name, unique per cause, e.g. `column.k0h-range`. */
  readonly code: string;
  /** `outside`: the model is used outside its stated range. `saturated`: the model no longer distinguishes its input. `note`: worth knowing. */
  readonly severity: 'outside' | 'saturated' | 'note';
  /** Which model or method it concerns, in words. */
  readonly model: string;
  /** A sentence a reviewer understands, with the value and the range. */
  readonly text: string;
}
