import type { Board, Figure, QuantityName } from '../manifest/model.js';
import type { Complex } from '../numerics/complex.js';
import type { SolverEffort } from '../physics/column/index.js';
import type { Narrowing, RoughnessModel } from '../physics/roughness/index.js';
import type { ValidityFlag } from '../physics/validity.js';
import type { Dimension } from '../quantity/index.js';
import type { Correction } from './correction-model.js';

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
  /** Into the terminations of travelling-wave columns. */
  readonly load: number;
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
  /** Power transmission through the feed paths, weighted by their power, 0…1; through the feed network where there is one. */
  readonly feedTransmission: number;
  /** 1 − reflected/incident power with all columns driven, 0…1: at the columns, or at the input of a feed network. */
  readonly mismatch: number;
  readonly shares: PowerShares;
  /** Passive: every column driven alone, the others terminated in the reference impedance. */
  readonly columnReflection: readonly Complex[];
  /** All columns driven with the feed's weights. */
  readonly activeReflection: readonly Complex[];
  readonly referenceImpedance: readonly number[];
  readonly elevation: CutFigures;
  readonly azimuth: CutFigures;
  /** Input power minus the sum of all sinks, over input power (circuit): below 1e-9. */
  readonly powerResidual: number;
  /** (far-field power + guided wave) over power into the edges: 1 within 1 % on the lossless network; NaN where not evaluated. */
  readonly farFieldClosure: number;
  readonly cuts: { readonly elevation: Cut; readonly azimuth: Cut };
  /** Between columns, row = leaving, column = driven: in the nominal sweep, and in every one where the board has groups. */
  readonly scattering?: readonly (readonly Complex[])[];
  /** Where the board has a feed network: what it does at its input, in shares of the power there. */
  readonly feed?: FeedFigures;
}

export interface FeedFigures {
  /** With the columns behind it. */
  readonly inputReflection: Complex;
  /** Power into the columns over power accepted at the input. */
  readonly transmission: number;
  /** Power burnt in isolation resistors over power accepted at the input. */
  readonly burnt: number;
}

/** What one engine says of the board at one frequency: nominal state, nominal temperature, feed's weights, no feed loss. */
export interface EngineFigures {
  /** Row = leaving, column = driven; referred to `referenceImpedance`. */
  readonly scattering: readonly (readonly Complex[])[];
  readonly referenceImpedance: readonly number[];
  readonly activeReflection: readonly Complex[];
  /** Linear. */
  readonly directivity: number;
  /** Radiated power over the accepted power that the engine accounts for: all but `powerResidual`. */
  readonly radiationEfficiency: number;
  readonly mismatch: number;
  readonly elevation: CutFigures;
  readonly azimuth: CutFigures;
  readonly cuts: { readonly elevation: Cut; readonly azimuth: Cut };
  /** Fractions of the accepted power; `metal` is strip and ground together. Sum with `powerResidual` to 1. */
  readonly power: {
    readonly radiated: number;
    readonly surfaceWave: number;
    readonly metal: number;
    readonly dielectric: number;
    readonly load: number;
  };
  readonly powerResidual: number;
  /** Longitudinal current of every patch of every column over the largest of the board. */
  readonly excitation: readonly (readonly Complex[])[];
}

/** Both engines at one frequency. */
export interface EngineComparison {
  readonly frequency: number;
  readonly fullWave: EngineFigures;
  readonly network: EngineFigures;
  readonly effort: SolverEffort;
}

/** How the fast engine's figures of a board are confirmed. */
export type Confirmation =
  | {
      readonly kind: 'full wave';
      readonly points: readonly EngineComparison[];
      readonly flags: readonly ValidityFlag[];
      /**
       * Reflections agree best when the network is solved `shift` below each frequency, Hz; what then remains of them, root
       * mean square over columns and frequencies as complex numbers.
       */
      readonly alignment?: { readonly shift: number; readonly remaining: number };
      /** What the network's figures were moved by; `network` of the points is the network as it is. */
      readonly correction?: Correction;
      /** Set where the full wave ran on another state of the board: which one, in words. */
      readonly carriedFrom?: string;
    }
  | { readonly kind: 'network only'; readonly reason: string };

/** The feed line (first column's width) at one frequency and temperature: evaluated with cover layers too. */
export interface LinePoint {
  readonly frequency: number;
  readonly temperatureC: number;
  /** dB/m (metres!). */
  readonly lossDbPerM: number;
  readonly effectivePermittivity: number;
  /** Ohm, power–current. */
  readonly impedance: number;
}

/** One full sweep over band × temperature under one set of assumptions. Points ordered by temperature, then frequency. */
export interface Sweep {
  readonly id: string;
  readonly label: string;
  /** Empty where the columns cannot be evaluated (`notEvaluated` says why). */
  readonly points: readonly PointResult[];
  /** Same grid as `points` would have. */
  readonly line: readonly LinePoint[];
}

/** Estimates of a face for what is known of its texture: see physics/roughness. Not bounds, but what the verdict spans. */
export type RoughnessSide = 'low' | 'middle' | 'high';

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
   * The same under every estimate of the roughness band, so that a verdict does not depend on which is called nominal: the
   * largest effect counts. Without, low and high stand for all.
   */
  readonly bySide?: readonly { readonly side: RoughnessSide; readonly low: Sweep; readonly high: Sweep }[];
}

/** Curves over frequency or roughness, one per roughness model, with the band of what is known. */
export interface ModelCurves {
  readonly x: readonly number[];
  readonly curves: readonly { readonly model: RoughnessModel; readonly y: readonly number[] }[];
  readonly band: Readonly<Record<RoughnessSide, readonly number[]>>;
}

/** What one model or estimate says of a face. */
export interface FaceFigures {
  readonly lossFactor: number;
  /** X in Rs to the mean plane. */
  readonly reactance: number;
  /** Electrostatic plane above the mean plane, m. */
  readonly planeShift: number;
  /** s = Xδ/2 + plane shift, m. */
  readonly slowWaveLength: number;
}

/** A copper face at band centre and nominal temperature. */
export interface FaceState {
  readonly face: string;
  /** Which copper: `strip underside`, `ground`, `strip top and edges`; several foils are several faces. */
  readonly place: 'underside' | 'ground' | 'outer';
  /** m */
  readonly rq: number;
  readonly skinDepth: number;
  /** What is known of its texture, in words: `Rq and correlation length`. */
  readonly known: string;
  readonly band: readonly (FaceFigures & { readonly side: RoughnessSide; readonly reason: string })[];
  /** Every model that the knowledge suffices for, in the order of `applicableModels`, smooth first. */
  readonly models: readonly (FaceFigures & {
    readonly model: RoughnessModel;
    readonly flags: readonly ValidityFlag[];
  })[];
  /** Measurements that would narrow the band, the most useful first. */
  readonly narrowing: readonly Narrowing[];
  /** Plain sentences for models that are saturated at this texture. */
  readonly saturation: readonly { readonly model: RoughnessModel; readonly text: string }[];
}

/** Loss of the feed line by face at band centre and nominal temperature, dB/m; under each estimate. Sums to `total`. */
export interface LineLossByFace {
  readonly side: RoughnessSide;
  readonly faces: readonly {
    readonly face: 'underside' | 'top' | 'edges' | 'ground';
    readonly smooth: number;
    readonly finish: number;
    readonly texture: number;
  }[];
  readonly dielectric: number;
  readonly total: number;
  readonly effectivePermittivity: number;
  readonly impedance: number;
}

/** How texture slows the wave on this board: s of both faces over the laminate thickness, against smooth faces. */
export interface SlowWave {
  readonly side: RoughnessSide;
  /** Relative rise of effective permittivity of the feed line and of the widest patch. */
  readonly lineRise: number;
  readonly patchRise: number;
  /** Hz and rad at band centre, from the patch's rise. */
  readonly resonanceShift: number;
  readonly tiltShift: number;
  /** False where the laminate's permittivity is a design value, which holds the effect already: then it is printed, not applied. */
  readonly applied: boolean;
}

export interface BoardStudy {
  readonly board: Board;
  /** sha256 of everything the results depend on. */
  readonly hash: string;
  readonly nominal: Sweep;
  /** One sweep per estimate of the roughness band, the nominal one included where it is one of them (same object). */
  readonly sides: readonly { readonly side: RoughnessSide; readonly sweep: Sweep }[];
  readonly tolerances: readonly ToleranceStudy[];
  /** dB/m over Hz, feed line. */
  readonly lineLoss: ModelCurves;
  /** K of the underside over Rq in m, band centre, nominal temperature; what else is known of the texture is kept. */
  readonly lossFactor: ModelCurves;
  /** Effective permittivity of the feed line over the Rq of both faces to the laminate, same conditions. */
  readonly effectivePermittivity: ModelCurves;
  readonly lineLossByFace: readonly LineLossByFace[];
  readonly slowWave: readonly SlowWave[];
  readonly faces: readonly FaceState[];
  readonly flags: readonly ValidityFlag[];
  /** Quantities that this program cannot evaluate for this board, each with the reason. */
  readonly notEvaluated: readonly { readonly quantities: readonly QuantityName[]; readonly reason: string }[];
  /** Lossless variant of the board at the centre frequency: (far field + guided wave) / power into the edges. */
  readonly losslessClosure: number;
  readonly confirmation: Confirmation;
}
