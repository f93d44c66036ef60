/** What the full wave says of a board beyond the network, as plain data that any task can take along. */
import type { Complex } from '../numerics/complex.js';

export interface CutDifference {
  /** Full wave less network, rad. */
  readonly direction: number;
  /** ln of the ratio of half-power widths. */
  readonly width: number;
  readonly sidelobeDb: number;
}

/** ln of the ratio of shares of accepted power, full wave over network. */
export interface ShareRatios {
  readonly radiated: number;
  readonly surfaceWave: number;
  /** Strip and ground together. */
  readonly metal: number;
  readonly dielectric: number;
  readonly load: number;
}

/** Full wave against the network shifted by `Correction.shift`, nominal state. */
export interface EngineDifference {
  readonly frequency: number;
  /** Full wave less network. */
  readonly reflection: readonly Complex[];
  /** ln of the ratio, row = leaving, column = driven; 0 on the diagonal. */
  readonly coupling: readonly (readonly Complex[])[];
  /** Full wave less network; 0 at a column that is not driven. */
  readonly activeReflection: readonly Complex[];
  readonly directivityDb: number;
  readonly mismatchDb: number;
  readonly shares: ShareRatios;
  readonly elevation: CutDifference;
  readonly azimuth: CutDifference;
}

export interface Correction {
  /** The network is solved this much below the frequency that its figures are given for, Hz. */
  readonly shift: number;
  /** Frequency over which a remaining difference of reflections keeps its phase, Hz. */
  readonly reach: number;
  /** Ascending. */
  readonly differences: readonly EngineDifference[];
}
