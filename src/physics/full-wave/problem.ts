import type { ColumnProblem } from '../column/engine.js';

/** Columns of patches, perhaps under a flat dielectric cover. */
export interface FullWaveProblem extends ColumnProblem {
  readonly cover?: { readonly permittivity: number; readonly lossTangent: number; readonly thickness: number };
}

export interface FullWaveSettings {
  /** Cells along a patch; default 17. 13, 18 and 26 show convergence. */
  readonly cellsPerPatch?: number;
  /** Cells across the narrowest line; default 2. */
  readonly cellsPerLine?: number;
  /** Relative residual of the solver; default 1e-4. */
  readonly tolerance?: number;
}
