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

/** A straight piece of metal along the column, m. */
export interface LineSection {
  readonly width: number;
  readonly length: number;
}

export interface ColumnGeometry {
  /** Near edge of the first patch and centre line, m. */
  readonly x: number;
  readonly y: number;
  readonly feedLineWidth: number;
  readonly patches: readonly LineSection[];
  /** From each patch to the next: one fewer than patches. */
  readonly links: readonly LineSection[];
  /** −1: the column runs from its first patch towards −x, and `x` is the large-x edge of that patch. Default +1. */
  readonly direction?: 1 | -1;
  /** Sections between feed line and first patch, from the feed line on (quarter-wave steps). The port is where they begin. */
  readonly matching?: readonly LineSection[];
  /** The line enters the first patch between two slots; the port stays at the patch's edge. */
  readonly inset?: { readonly depth: number; readonly gap: number };
  /** A line of this width after the last patch that ends without reflection. Absent: open edge. */
  readonly termination?: { readonly width: number };
  /** Fed in the middle of link number `link` by a feed line along y that comes from `side`·y; port at the link's edge. */
  readonly sideFeed?: { readonly link: number; readonly side: 1 | -1 };
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
  /** Into the terminations of columns that have one. */
  readonly load: number;
}

/** Far field of an excited board over the half space above it. */
export interface FarField {
  readonly frequency: number;
  /** Of the sources, m: says how finely directions must be sampled. */
  readonly extent: { readonly x: number; readonly y: number };
  /**
   * r e^{jk0r} E, V peak, at direction cosines u = sin θ cos φ, v = sin θ sin φ (u² + v² < 1).
   * @param out [Re Eθ, Im Eθ, Re Eφ, Im Eφ]
   */
  at(u: number, v: number, out: Float64Array): void;
  /** Power per solid angle over the signed angle (rad) of a principal cut, W/sr: many angles at little cost. */
  cut(plane: 'azimuth' | 'elevation'): (angle: number) => number;
}

/** A patch as seen by its neighbours: number of column and patch, centre, length along x and width along y, m. */
export interface MacroPatch {
  readonly column: number;
  readonly patch: number;
  readonly x: number;
  readonly y: number;
  readonly length: number;
  readonly width: number;
  /** Lines at its edges: width, m, and the part of the patch's current moment that each takes away. */
  readonly lines: readonly { readonly width: number; readonly share: number }[];
}

/** Patches with the amplitude of their macro currents: all that pattern and guided wave need. */
export interface ExcitedPatches {
  readonly frequency: number;
  readonly slab: Slab;
  readonly patches: readonly MacroPatch[];
  /** Total current in the middle of each patch, A. */
  readonly re: Float64Array;
  readonly im: Float64Array;
}

/** The network's radiating edges with their voltages, and the currents that stand for them outside their patch. */
export interface ExcitedEdges {
  readonly frequency: number;
  readonly slab: Slab;
  readonly currents: ExcitedPatches;
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
  readonly field: FarField;
  /** Of the edge network only, for its power check. */
  readonly edges?: ExcitedEdges;
  /** Integral of the longitudinal current over each patch of each column, A m. */
  readonly patchCurrents: readonly (readonly Complex[])[];
}

/** What it cost to solve, for print. */
export interface SolverEffort {
  readonly unknowns: number;
  /** Most that any right-hand side took. */
  readonly iterations: number;
  /** Relative residual reached. */
  readonly residual: number;
  /** m */
  readonly cellLength: number;
  readonly cellWidth: number;
  /** Largest difference of a length and of a width from what the grid can draw, m, before it is trimmed. */
  readonly misfitLength: number;
  readonly misfitWidth: number;
}

export interface ColumnSolution {
  readonly frequency: number;
  /** S-matrix of the board's columns, row = leaving, column = driven. */
  readonly scattering: readonly (readonly Complex[])[];
  /** Real reference impedance of each port, ohm. */
  readonly referenceImpedance: readonly number[];
  readonly flags: readonly ValidityFlag[];
  readonly effort?: SolverEffort;
  /** @param incident wave into each port, √W peak */
  excite(incident: readonly Complex[]): ExcitedArray;
}

export interface ColumnEngine {
  readonly name: string;
  solve(conditions: ColumnConditions): ColumnSolution;
}
