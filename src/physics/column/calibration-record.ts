/** What a calibration of the edge network leaves behind: the range it went over, and how close the network came. */

export type Interval = readonly [number, number];

export interface CalibrationRange {
  /** k0 h */
  readonly electricalHeight: Interval;
  readonly permittivity: Interval;
  /** m */
  readonly patchWidth: Interval;
  /** w/h of feed line and links */
  readonly lineWidthOverHeight: Interval;
}

/** Constants that are fitted; the cavity's widening stays as the planar-cavity model has it. */
export interface FittedConstants {
  readonly stepReactance: number;
  readonly edgeMoment: number;
  readonly coveredMoment: number;
  readonly modeConductance: number;
  readonly openEnd: number;
  readonly coveredSusceptance: number;
}

/** Root mean square over the cases of network against full wave. */
export interface CalibrationResiduals {
  /** Relative, patches driven by a gap. */
  readonly gapResonance: number;
  readonly gapQuality: number;
  /** Relative, patches fed at their edge. */
  readonly edgeResonance: number;
  readonly edgeResistance: number;
  readonly edgeQuality: number;
  /** |ΔS11| of patches between two lines. */
  readonly reflection: number;
}

export interface CalibrationRecord {
  readonly cases: number;
  readonly range: CalibrationRange;
  readonly fitted: FittedConstants;
  readonly fittedResiduals: CalibrationResiduals;
  /** Of the constants in use. */
  readonly residuals: CalibrationResiduals;
  /** How far two grids of the full wave itself are apart: no fit can be known to be better. */
  readonly floor: CalibrationResiduals;
}
