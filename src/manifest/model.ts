/**
 * The typed model of a pack after reading, checking and resolving references: what the rest of the program sees.
 * All numbers are SI (Hz, m, K differences in K, temperatures in degC where named so, S/m, Np-free ratios),
 * except levels, which are dB and say so in their name.
 */
import type { CoverLayer, DeclaredProperty, Figure, Finish, Foil, Laminate, Texture } from './material-model.js';
import type { Procurement } from './procurement-model.js';

export type * from './material-model.js';

export interface StackUp {
  readonly cover?: CoverLayer;
  readonly strip: {
    readonly foil: Foil;
    readonly thickness: Figure;
    readonly finish: Finish;
    readonly outerFace: { readonly kind: 'foil' | 'plated' | 'micro-etched'; readonly texture: Texture };
    readonly dielectricFace: { readonly kind: 'treated' | 'untreated'; readonly texture: Texture };
  };
  /** Thickness is between the mean planes of the copper faces. */
  readonly laminate: { readonly material: Laminate; readonly thickness: Figure };
  readonly ground: {
    readonly foil: Foil;
    readonly thickness: Figure;
    readonly dielectricFace: { readonly kind: 'treated' | 'untreated'; readonly texture: Texture };
  };
  /** Below the ground: declared and drawn, not computed. */
  readonly below: readonly { readonly name: string; readonly thickness: number }[];
}

export interface Patch {
  /** Across the column (y), m. */
  readonly width: number;
  /** Along the column (x), m. */
  readonly length: number;
}
export interface Link {
  readonly width: number;
  readonly length: number;
}

/** A series-fed column: along +x, fed at the small-x end, last patch open, unless it says otherwise. */
export interface ColumnLayout {
  /** Centre line of the column, m; the array is centred on y = 0. */
  readonly y: number;
  /** x of the true edge of the first patch, m. */
  readonly x: number;
  readonly feedLine: Link;
  readonly patches: readonly Patch[];
  /** One fewer than patches. */
  readonly links: readonly Link[];
  /** See `ColumnGeometry` of physics/column for these five. */
  readonly direction?: 1 | -1;
  readonly matching?: readonly Link[];
  readonly inset?: { readonly depth: number; readonly gap: number };
  readonly termination?: { readonly width: number };
  readonly sideFeed?: { readonly link: number; readonly side: 1 | -1 };
  /** Never driven: its feed line ends in the reference impedance. */
  readonly dummy?: true;
}

/** Amplitudes asked for along a column. */
export type Taper =
  | { readonly kind: 'uniform' }
  /** Sidelobe level in dB, positive. */
  | { readonly kind: 'dolph-chebyshev'; readonly sidelobeDb: number }
  | { readonly kind: 'taylor'; readonly sidelobeDb: number; readonly nBar: number }
  | { readonly kind: 'given'; readonly amplitudes: readonly number[] };

/** A layout that is not given but worked out: every column alike. Lengths m. */
export interface SizedFor {
  readonly frequency: number;
  readonly patches: number;
  readonly taper: Taper;
  /** What the board maker can hold. */
  readonly leastWidth: number;
  readonly leastGap: number;
  readonly grid: number;
}

/** Outcome of sizing, or why there is none. */
export type Sized =
  | {
      /** Where the dimensions come from: the network alone, or once corrected by the full wave. */
      readonly by: 'network' | 'full wave';
      /** Reflection at the frequency asked for, dB, by the network and, where it ran, by the full wave. */
      readonly networkDb: number;
      readonly fullWaveDb?: number;
      readonly notes: readonly string[];
    }
  | { readonly reason: string };

/** Two-port between the feed network and the radar's port, as measured or simulated elsewhere. */
export interface Transition {
  /** Path relative to the root folder, forward slashes. */
  readonly file: string;
  /** Ohm, real; both ports. */
  readonly referenceImpedance: number;
  /** Over the band and some beyond: Hz, ascending; S as [S11, S21, S12, S22], each re, im. Port 2 faces the antenna. */
  readonly points: readonly { readonly frequency: number; readonly s: readonly (readonly [number, number])[] }[];
}

/** A corporate network from one input to all driven columns, drawn on the same laminate and foil. Lengths m. */
export interface FeedNetwork {
  readonly divider: 'tee' | 'wilkinson';
  /** Width of every line that is not a quarter-wave step. */
  readonly lineWidth: number;
  /** From the input to the first divider, and from one level to the next. */
  readonly trunkLength: number;
  readonly levelLength: number;
  readonly transition?: Transition;
}

export interface FeedPath {
  /** Relative amplitude of the incident wave at the column, > 0 or 0. */
  readonly amplitude: number;
  /** Phase of the incident wave, rad. */
  readonly phase: number;
  /** Loss from the gain reference plane to the column, either given (dB ≥ 0) … */
  readonly lossDb?: Figure;
  /** … or from a length of microstrip on this stack-up. */
  readonly line?: Link;
}

export interface Tolerances {
  /** All copper outlines grow (+) or shrink (−) by this much in width and length, m (total, both edges together). */
  readonly etch?: Figure;
}

export interface Cost {
  readonly amount: number;
  readonly currency: string;
  readonly basis?: string;
}

/** Outcome of scaling patch and link lengths to the band centre, or why there is none. */
export type Retuned =
  | {
      /** Applied to every patch and link length; four decimals, so that the printed factor is the one used. */
      readonly factor: number;
      /** Passive reflection of the worst column at band centre, nominal conditions, dB: as drawn and as retuned. */
      readonly drawnDb: number;
      readonly retunedDb: number;
      /** Columns before scaling. */
      readonly drawn: readonly ColumnLayout[];
    }
  | { readonly reason: string };

export interface Board {
  readonly id: string;
  readonly title: string;
  readonly description?: string;
  /** Ids from this board's parent to the root of its `based_on` chain; empty when it stands alone. */
  readonly basedOn: readonly string[];
  /** File path relative to the root folder, with forward slashes. */
  readonly file: string;
  /** Dotted paths overridden relative to the parent, in file order. */
  readonly overrides: readonly string[];
  /** This board, its parent, … to the one that stands alone, each with what it overrides of the next. */
  readonly lineage?: readonly {
    readonly board: string;
    readonly file: string;
    readonly overrides: readonly { readonly path: string; readonly text: string }[];
  }[];
  readonly stackUp: StackUp;
  readonly columns: readonly ColumnLayout[];
  /** Asked for by the manifest; done by the study before anything else, which then says so in `retuned`. */
  readonly retune?: 'length';
  readonly retuned?: Retuned;
  /** Asked for by the manifest in place of dimensions; done by the study before anything else, which says so in `sized`. */
  readonly sizedFor?: SizedFor;
  readonly sized?: Sized;
  readonly pitch: number;
  readonly feed: readonly FeedPath[];
  readonly feedNetwork?: FeedNetwork;
  /** Columns (from 0) that belong together, such as transmit and receive. */
  readonly groups?: readonly { readonly id: string; readonly columns: readonly number[] }[];
  /** Beam directions in azimuth over which active reflection is shown, rad. */
  readonly scan?: { readonly low: number; readonly high: number };
  /** `line`: reflections are referred to the feed line's own impedance; a number: ohm. */
  readonly referenceImpedance: 'line' | number;
  readonly band: { readonly low: number; readonly high: number };
  readonly temperature: { readonly lowC: number; readonly nominalC: number; readonly highC: number };
  readonly tolerances: Tolerances;
  readonly cost?: Cost;
  readonly declared: readonly DeclaredProperty[];
}

/** Names of requirement quantities; the catalogue in `verdict/quantities.ts` says what each means, its unit and its cut. */
export type QuantityName =
  | 'gain'
  | 'realized_gain'
  | 'directivity'
  | 'radiation_efficiency'
  | 'reflection'
  | 'active_reflection'
  | 'half_power_beamwidth'
  | 'sidelobe_level'
  | 'beam_direction'
  | 'pattern_mask'
  | 'isolation'
  | 'line_loss'
  | 'declared';

export interface MaskPiece {
  /** Angles in rad in the cut, from < to. */
  readonly from: number;
  readonly to: number;
  /** Level relative to the beam's maximum, dB, not to be exceeded. */
  readonly levelDb: number;
}

export interface Requirement {
  readonly id: string;
  readonly text: string;
  readonly quantity: QuantityName;
  readonly cut?: 'azimuth' | 'elevation';
  /** For `isolation`: ids of the two groups of columns. Absent: between any two different groups of the board. */
  readonly between?: readonly [string, string];
  /** Absent for masks (the pieces are the limit) and for declared text. Value in the catalogue unit of the quantity (dBi, dB, deg, dB/cm, 1). */
  readonly limit?: { readonly direction: 'at_least' | 'at_most'; readonly value: number };
  /** For `declared` with a numeric limit: the unit it is written with, which the property must carry too. */
  readonly unit?: string;
  readonly mask?: readonly MaskPiece[];
  /** For `declared`: which property, and the text allowed (any of) or the numeric limit above. */
  readonly property?: string;
  readonly allowed?: readonly string[];
  /** Limits the board's own band and temperature range; absent parts mean the board's. */
  readonly condition: {
    readonly band?: { readonly low: number; readonly high: number };
    readonly temperature?: { readonly lowC: number; readonly highC: number };
  };
  readonly weight: 'binding' | 'target';
  readonly source: string;
  readonly verification: 'calculation' | 'test';
  readonly testMethod?: string;
}

export interface RequirementSet {
  readonly id: string;
  readonly title: string;
  readonly file: string;
  readonly invented: boolean;
  readonly requirements: readonly Requirement[];
}

export type RoughnessModelName = 'hammerstad' | 'groiss' | 'gradient';

/** `band`: middle estimate of what is known of each face. */
export type RoughnessChoice = 'band' | RoughnessModelName;

export interface Analysis {
  /** What stands behind the nominal figures; the spread always covers the band from its low to its high estimate. */
  readonly roughnessModel: RoughnessChoice;
  /** Largest frequency step over the band, Hz. */
  readonly frequencyStep: number;
  /** Whether the full-wave engine confirms every board. Absent means no. */
  readonly fullWave?: boolean;
}

export interface InputFile {
  readonly path: string;
  readonly sha256: string;
}

/** What people decided about a pack. Nothing of it changes a verdict. Days are ISO dates, YYYY-MM-DD. */
export interface Review {
  /** File path relative to the root folder, with forward slashes. */
  readonly file: string;
  /** Absent as long as nothing is decided; without `board` the decision is for no board. */
  readonly decision?: {
    readonly board?: string;
    readonly statement: string;
    readonly reason: string;
    readonly date: string;
    readonly by: string;
  };
  readonly openPoints: readonly {
    readonly id: string;
    readonly text: string;
    readonly owner: string;
    readonly due: string;
    readonly status: 'open' | 'in work' | 'closed';
  }[];
  readonly concessions: readonly Concession[];
  readonly approvals: readonly {
    readonly role: string;
    readonly name?: string;
    readonly organisation: string;
    /** Of a signature already given. */
    readonly date?: string;
    readonly attests: string;
  }[];
  /** Oldest first; the last is the revision of the pack. Empty when the review has no such table. */
  readonly revisions: readonly {
    readonly revision: string;
    readonly date: string;
    readonly author: string;
    readonly change: string;
  }[];
}

export interface Concession {
  readonly number: string;
  readonly board: string;
  readonly requirement: string;
  readonly text: string;
  readonly approver: string;
  readonly granted: string;
  /** Last day on which it holds. */
  readonly expiry: string;
}

/** Where the data of the previous revision lie: in the output folder under its name, or in a file under the root. */
export type PreviousRevision = { readonly revision: string } | { readonly file: string };

/** A kind of reader who gets a copy of the pack with entries left out. */
export interface Audience {
  readonly id: string;
  /** Of the copy; that of the pack where absent. */
  readonly marking?: string;
  /** `cost`, `authors`, `descriptions`, `sources`, `review`, `declared`, `declared/<id>`, `boards/<id>`, `requirements/<id>`. */
  readonly hide: readonly string[];
}

export interface Pack {
  readonly id: string;
  readonly title: string;
  readonly documentNumber: string;
  readonly revision: string;
  /** ISO date, YYYY-MM-DD. */
  readonly date: string;
  readonly status: 'draft' | 'for review' | 'released';
  readonly authors: readonly string[];
  readonly owner: string;
  /** Printed on every page when the data are invented. */
  readonly notice?: string;
  /** Who may see it, printed on every page; `internal: not for suppliers` where absent. */
  readonly marking?: string;
  readonly review?: Review;
  readonly procurement?: Procurement;
  readonly previous?: PreviousRevision;
  readonly audiences?: readonly Audience[];
  /** Set in a copy for an audience: its id. */
  readonly audience?: string;
  readonly boards: readonly Board[];
  readonly requirements: RequirementSet;
  readonly analysis: Analysis;
  /** Every file that was read, sorted by path. */
  readonly inputs: readonly InputFile[];
}
