import type { Dimension } from '../quantity/index.js';

/**
 * What a pack asks of its suppliers, after reading and checking. Numbers are SI. Every text in here was written to be
 * sent, except ids, board lists and answers, which stay inside.
 */
export type RecipientKind = 'laminate maker' | 'foil maker' | 'board fabricator';

/** What can be asked to be held, one item of a sheet each. */
export type HeldParameter =
  | 'laminate-thickness'
  | 'permittivity'
  | 'loss-tangent'
  | 'treated-face-texture'
  | 'untreated-face-texture'
  | 'copper-thickness'
  | 'etched-width'
  | 'edge-slope'
  | 'finish-thickness'
  | 'outer-face-texture';

/** Sample size from a confidence and a reliability with no failure, or the words of a cited sampling standard. */
export type Sampling = { readonly confidence: number; readonly reliability: number } | { readonly plan: string };

export interface Verification {
  readonly method?: string;
  readonly specimen?: string;
}

export interface Recipient {
  readonly id: string;
  readonly kind: RecipientKind;
  readonly name: string;
  /** Ids of the boards it concerns. */
  readonly boards: readonly string[];
  /** Library ids of the laminates or foils asked of it; empty for a fabricator. */
  readonly materials: readonly string[];
  /** Its own, or those that all are asked. */
  readonly quantities: readonly string[];
  readonly answers?: Answers;
}

/** Limits of one dimension, with a value between them. */
export interface HeldRange {
  readonly nominal: number;
  readonly lower: number;
  readonly upper: number;
}

/** An item asked of a recipient, merged over the boards that need it. */
export interface AskedItem extends HeldRange {
  /** Stands on the sheet and in its answers: `A-permittivity`. */
  readonly id: string;
  /** A letter per material, so that no name is needed. */
  readonly group: string;
  readonly parameter: HeldParameter;
  /** Library id of the laminate, foil or finish; inside only. */
  readonly material?: string;
  /** Metal of a finish layer, counted from the copper outward. */
  readonly layer?: string;
  readonly dimension: Dimension | 'number';
  /** Spelling of the unit in which it is asked and answered; absent for plain numbers. */
  readonly unit?: string;
  /** Less is better: no lower limit is asked. */
  readonly upperOnly: boolean;
  /** Where the figure stands on each board that it was merged from. */
  readonly figures: readonly { readonly board: string; readonly path: string }[];
}

/** Something asked in words: a declared property, a substance rule, a price. */
export interface AskedWords {
  readonly id: string;
  readonly kind: 'property' | 'substance' | 'other' | 'quantity';
  readonly what: string;
  /** What is needed, where something is: `V-0`, `at least 0.5 N/mm`. */
  readonly needed?: string;
}

/** One line of a returned sheet. Numbers are SI. */
export interface Answer {
  readonly item: string;
  readonly line: number;
  readonly guaranteedLower?: number;
  readonly guaranteedUpper?: number;
  readonly typical?: number;
  readonly alternative?: string;
  readonly notOffered: boolean;
  readonly method?: string;
  readonly declaration?: string;
  /** What was asked when the sheet was answered, as far as it came back. */
  readonly asked: { readonly nominal?: number; readonly lower?: number; readonly upper?: number };
}

export interface Answers {
  readonly file: string;
  readonly rows: readonly Answer[];
}

export interface Procurement {
  readonly file: string;
  readonly rfqNumber: string;
  readonly replyDate: string;
  readonly contact: { readonly who: string; readonly address: string };
  readonly nda?: string;
  /** m */
  readonly panel: { readonly width: number; readonly length: number };
  readonly certificate: string;
  readonly sampling: Sampling;
  /** Sheets say how far a calculated allowance reaches beyond the limit that is asked. */
  readonly printAllowances: boolean;
  /** How textures are to be measured; absent: to be stated with the answer. */
  readonly texture?: { readonly standard: 'profile' | 'areal'; readonly instrument: string; readonly filter: string };
  /** rad, between laminate and etched edge; 90° stands upright. */
  readonly edgeSlope?: HeldRange;
  readonly verification: Readonly<Partial<Record<HeldParameter, Verification>>>;
  /** Asked of everyone beside the substance rules. */
  readonly declare: readonly string[];
  readonly recipients: readonly Recipient[];
}
