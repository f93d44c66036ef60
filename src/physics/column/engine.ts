/**
 * The one interface behind which a column solver stands: series-fed patch columns on a grounded slab at one frequency.
 *
 * Axes: columns along +x, fed at the small-x end, y across, z away from the board. e^{+jωt}, peak amplitudes.
 * Reflections are taken at the true near edge of each column's first patch.
 */
import type { Complex } from '../../numerics/complex.js';
import type { FaceImpedances } from '../line/index.js';
import type { ValidityFlag } from '../validity.js';

export interface Slab {
  /** Relative, real. */
  readonly permittivity: number;
  readonly lossTangent: number;
  /** Between the planes that the face impedances are referred to, m. */
  readonly height: number;
}

export interface ColumnGeometry {
  /** Near edge of the first patch and centre line, m. */
  readonly x: number;
  readonly y: number;
  readonly feedLineWidth: number;
  readonly patches: readonly { readonly width: number; readonly length: number }[];
  /** From each patch to the next: one fewer than patches. */
  readonly links: readonly { readonly width: number; readonly length: number }[];
}

export interface ColumnProblem {
  /** What the solver prepares for; a condition may move it by a few per cent. */
  readonly slab: Slab;
  /** 0 for a sheet: then `faces.underside` is the sheet impedance and carries all current, `faces.ground` the ground's. */
  readonly stripThickness: number;
  readonly columns: readonly ColumnGeometry[];
  /** `line`: each column's own feed line; a number: ohm. */
  readonly referenceImpedance: 'line' | number;
}

/** What changes from frequency to frequency beside the frequency itself. */
export interface ColumnConditions {
  readonly frequency: number;
  readonly faces: FaceImpedances;
  /** Slab at this temperature and with this texture, where it differs from the one prepared for. */
  readonly slab?: Slab;
  /** The same for the strip: its underside follows the electrostatic plane of a rough face, its top stays. */
  readonly stripThickness?: number;
}

/** Power in W for the excitation asked for (peak amplitudes: a wave of amplitude a carries |a|²/2). */
export interface PowerBudget {
  readonly incident: number;
  readonly accepted: number;
  readonly radiated: number;
  readonly surfaceWave: number;
  readonly underside: number;
  readonly top: number;
  readonly edges: number;
  readonly ground: number;
  readonly dielectric: number;
}

/** Radiating edges with their voltages: all that pattern and power need. */
export interface ExcitedEdges {
  readonly frequency: number;
  readonly slab: Slab;
  readonly edges: readonly RadiatingEdge[];
  /** Voltage of each edge, V. */
  readonly re: Float64Array;
  readonly im: Float64Array;
}

/** A magnetic current along y on the ground plane; voltage times `density` is its strength over `width`, V. */
export interface RadiatingEdge {
  readonly column: number;
  readonly patch: number;
  readonly x: number;
  readonly y: number;
  /** −1 at the near edge of a patch, +1 at its far edge. */
  readonly sign: 1 | -1;
  readonly pulses: readonly { readonly width: number; readonly density: number }[];
}

export interface ExcitedArray {
  readonly power: PowerBudget;
  /** Waves leaving each port, √W peak. */
  readonly reflected: readonly Complex[];
  readonly edges: ExcitedEdges;
}

export interface ColumnSolution {
  readonly frequency: number;
  /** S-matrix of the board's columns, row = leaving, column = driven. */
  readonly scattering: readonly (readonly Complex[])[];
  /** Real reference impedance of each port, ohm. */
  readonly referenceImpedance: readonly number[];
  readonly flags: readonly ValidityFlag[];
  /** @param incident wave into each port, √W peak */
  excite(incident: readonly Complex[]): ExcitedArray;
}

export interface ColumnEngine {
  readonly name: string;
  solve(conditions: ColumnConditions): ColumnSolution;
}
