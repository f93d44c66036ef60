import type { Board, Figure, QuantityName, RoughnessModelName } from '../manifest/model.js';
import type { Complex } from '../numerics/complex.js';
import type { ValidityFlag } from '../physics/validity.js';
import type { Dimension } from '../quantity/index.js';

/** Where the accepted power of the whole array goes, as fractions of the power accepted at the column ports; they sum to 1. */
export interface PowerShares {
  readonly radiated: number;
  readonly surfaceWave: number;
  /** Smooth bare copper at this temperature, by face. */
  readonly stripUnderside: number;
  readonly stripTop: number;
  readonly stripEdges: number;
  readonly ground: number;
  /** Extra over smooth copper from the texture of the dielectric faces and outer faces. */
  readonly roughness: number;
  /** Extra over bare copper from plated finish on top and edges. */
  readonly finish: number;
  readonly dielectric: number;
}

export interface CutFigures {
  /** Angle of the maximum in this cut, rad. */
  readonly beamDirection: number;
  /** rad; NaN when the half-power points lie outside the cut. */
  readonly halfPowerBeamwidth: number;
  /** Highest lobe other than the main one relative to the maximum of the cut, dB (negative); NaN when there is none. */
  readonly sidelobeDb: number;
}

export interface Cut {
  readonly plane: 'azimuth' | 'elevation';
  /** rad, ascending, −π/2 … π/2. */
  readonly angle: Float64Array;
  /** Gain (no mismatch), dBi, co-polar. */
  readonly gainDbi: Float64Array;
}

/** One board at one frequency and temperature. */
export interface PointResult {
  readonly frequency: number;
  readonly temperatureC: number;
  /** Linear. Reference plane of gain: the input of the feed network (feed loss in, mismatch out). */
  readonly directivity: number;
  readonly gain: number;
  readonly realizedGain: number;
  /** Radiated over accepted power at the column ports (surface wave counted as lost). */
  readonly radiationEfficiency: number;
  /** Power transmission through the feed paths, weighted by their power, 0…1. */
  readonly feedTransmission: number;
  /** 1 − reflected/incident power with all columns driven, 0…1. */
  readonly mismatch: number;
  readonly shares: PowerShares;
  /** Passive: every column driven alone, the others terminated in the reference impedance. */
  readonly columnReflection: readonly Complex[];
  /** All columns driven with the feed's weights. */
  readonly activeReflection: readonly Complex[];
  readonly referenceImpedance: readonly number[];
  readonly elevation: CutFigures;
  readonly azimuth: CutFigures;
  /** Feed line width on this stack-up, loss dB/m (metres!) and effective permittivity. */
  readonly lineLossDbPerM: number;
  readonly lineEffectivePermittivity: number;
  /** Input power minus the sum of all sinks, over input power (circuit): below 1e-9. */
  readonly powerResidual: number;
  /** (far-field power + guided wave) over power into the edges: 1 within 1 % on the lossless network; NaN where not evaluated. */
  readonly farFieldClosure: number;
  readonly cuts: { readonly elevation: Cut; readonly azimuth: Cut };
}

/** One full sweep over band × temperature under one set of assumptions. Points ordered by temperature, then frequency. */
export interface Sweep {
  readonly id: string;
  readonly label: string;
  readonly points: readonly PointResult[];
}

/** One declared tolerance moved alone to both its limits. */
export interface ToleranceStudy {
  readonly id: string;
  readonly label: string;
  /** The figure with its spread, as written in the manifest. */
  readonly figure: Figure;
  /** For print; `number` for plain ratios. */
  readonly dimension?: Dimension | 'number';
  readonly low: Sweep;
  readonly high: Sweep;
  /**
   * The same under every roughness model. With these a verdict does not depend on the nominal model at all: a saturated
   * model makes a tolerance on Rq look harmless, and the largest effect over the models counts. Without, low and high stand for all.
   */
  readonly byModel?: readonly { readonly model: RoughnessModelName; readonly low: Sweep; readonly high: Sweep }[];
}

/** A curve over frequency or roughness with a value per roughness model. */
export interface ModelCurves {
  readonly x: readonly number[];
  readonly curves: readonly { readonly model: RoughnessModelName | 'smooth'; readonly y: readonly number[] }[];
}

export interface FaceState {
  readonly face: string;
  /** m */
  readonly rq: number;
  readonly skinDepth: number;
  /** Per model, loss factor K, reactance X in Rs to the mean plane and electrostatic plane shift in m. */
  readonly models: readonly {
    readonly model: RoughnessModelName;
    readonly lossFactor: number;
    readonly reactance: number;
    readonly planeShift: number;
  }[];
}

export interface BoardStudy {
  readonly board: Board;
  /** sha256 of everything the results depend on. */
  readonly hash: string;
  readonly nominal: Sweep;
  /** One sweep per roughness model, the nominal one included (same object allowed). */
  readonly models: readonly { readonly model: RoughnessModelName; readonly sweep: Sweep }[];
  readonly tolerances: readonly ToleranceStudy[];
  readonly lineLoss: ModelCurves; // dB/m over Hz, feed line width
  readonly lossFactor: ModelCurves; // K over Rq in m, at the centre frequency and nominal temperature
  readonly faces: readonly FaceState[];
  readonly flags: readonly ValidityFlag[];
  /** Quantities that this program cannot evaluate for this board, each with the reason. */
  readonly notEvaluated: readonly { readonly quantities: readonly QuantityName[]; readonly reason: string }[];
  /** Lossless variant of the board at the centre frequency: (far field + guided wave) / power into the edges. */
  readonly losslessClosure: number;
}
