/**
 * What a page says, as plain data: no HTML, no drawing, everything rounded for people. The HTML and PDF renderers
 * print the same document, so that page and PDF cannot differ.
 */
export type Status = 'meets' | 'undecided' | 'misses' | 'not evaluated' | 'open until measured' | 'incomplete';

/** Text with the few marks a sentence needs. Plain strings are text, never markup: renderers escape them. */
export type Inline =
  | string
  | { readonly strong: string }
  | { readonly code: string }
  | { readonly status: Status }
  /** Link to a page of the same pack by page id, optionally to a block or chapter on it. */
  | { readonly text: string; readonly page: string; readonly anchor?: string }
  /** Link to a file of the same revision by its path below the folder of the revision: `pdf/pack.pdf`. */
  | { readonly text: string; readonly file: string };

export interface Cell {
  readonly content: readonly Inline[];
  /** Numbers align right. Default left. */
  readonly numeric?: boolean;
  /** Room and a line to sign on, on paper. */
  readonly signature?: boolean;
}

export interface TableBlock {
  readonly kind: 'table';
  readonly id: string;
  readonly caption: string;
  readonly columns: readonly {
    readonly title: string;
    readonly numeric?: boolean /** Relative width hint, default 1. */;
    readonly width?: number;
  }[];
  readonly rows: readonly (readonly Cell[])[];
  /** The first cell of each row names the row. */
  readonly rowHeaders: boolean;
}

export interface FigureBlock {
  readonly kind: 'figure';
  readonly id: string;
  /** Says what it shows. */
  readonly title: string;
  /** One sentence of reading: what to see, with the number. */
  readonly reading: string;
  /** For a screen reader: what the picture contains. */
  readonly alt: string;
  readonly content: Chart | DrawingData;
}

export type Block =
  | { readonly kind: 'prose'; readonly content: readonly Inline[] }
  | { readonly kind: 'list'; readonly ordered?: boolean; readonly items: readonly (readonly Inline[])[] }
  | {
      readonly kind: 'facts';
      readonly id: string;
      readonly items: readonly { readonly label: string; readonly content: readonly Inline[] }[];
    }
  /** The conclusion of a page: status with one sentence. */
  | { readonly kind: 'verdict'; readonly status: Status; readonly content: readonly Inline[] }
  /** A caution or limit that must not be overlooked. */
  | { readonly kind: 'caution'; readonly title: string; readonly content: readonly (readonly Inline[])[] }
  | TableBlock
  | FigureBlock;

export interface Chapter {
  readonly id: string;
  readonly title: string;
  readonly blocks: readonly Block[];
}

/** Data fields of ISO 7200, as far as they apply. */
export interface TitleBlock {
  readonly legalOwner: string;
  readonly identificationNumber: string;
  readonly revision: string;
  readonly dateOfIssue: string;
  readonly title: string;
  readonly supplementaryTitle?: string;
  readonly documentType: string;
  readonly documentStatus: string;
  readonly creator: string;
  readonly approver: string;
  readonly language: 'en';
  /** Set by the PDF; pages have no sheets. */
  readonly segment?: string;
}

export type PageKind =
  | 'overview'
  | 'pack'
  | 'dossier'
  | 'compare'
  | 'requirement'
  | 'offers'
  | 'evidence'
  | 'definitions';

export interface DocumentPage {
  /** Unique in the pack: `overview`, `board/qb-1`, `compare/qb-1--qb-2`, `requirement/r-gain`, `evidence`, `definitions`; `pack` for the document of the whole pack. */
  readonly id: string;
  readonly kind: PageKind;
  readonly title: string;
  readonly subtitle: string;
  readonly titleBlock: TitleBlock;
  /** Who may see it; stands at the head of every page. */
  readonly marking?: string;
  /** Printed on every page: notice that data are invented, cautions. */
  readonly notices: readonly string[];
  readonly chapters: readonly Chapter[];
}

export interface PackDocument {
  readonly packId: string;
  readonly revision: string;
  readonly title: string;
  /** overview first, then dossiers, comparisons, requirements, evidence, definitions. */
  readonly pages: readonly DocumentPage[];
}

// ---------------------------------------------------------------- charts: data ready to draw, units in the axis titles

export type Chart = BudgetChart | CutChart | LinesChart;

/** Waterfall from directivity down to realized gain. */
export interface BudgetChart {
  readonly chart: 'budget';
  readonly unit: 'dBi';
  /** First step is the start level (directivity), then losses as negative dB, in order; the last level is derived by the renderer as the running sum and must equal `end`. */
  readonly start: { readonly label: string; readonly level: number };
  readonly losses: readonly { readonly label: string; readonly change: number }[];
  readonly end: { readonly label: string; readonly level: number };
}

/** Pattern cut over angle, relative dB or dBi, with masks. */
export interface CutChart {
  readonly chart: 'cut';
  readonly xTitle: string;
  readonly yTitle: string;
  readonly xDomain: readonly [number, number];
  readonly yDomain: readonly [number, number];
  readonly series: readonly { readonly label: string; readonly points: readonly (readonly [number, number])[] }[];
  /** Drawn as a limit: horizontal pieces not to be exceeded, with a label. */
  readonly masks: readonly {
    readonly label: string;
    readonly pieces: readonly { readonly from: number; readonly to: number; readonly level: number }[];
  }[];
}

/** Symbols differ in shape and filling, so that they are told apart without colour. */
export type PointSymbol = 'disc' | 'square' | 'diamond';

/** Lines over a common axis: match over frequency, line loss over frequency, loss factor over roughness. */
export interface LinesChart {
  readonly chart: 'lines';
  readonly xTitle: string;
  readonly yTitle: string;
  readonly xScale?: 'linear' | 'log';
  /** The axis counts: whole numbers only. */
  readonly xWhole?: true;
  readonly yScale?: 'linear' | 'log';
  readonly xDomain?: readonly [number, number];
  readonly yDomain?: readonly [number, number];
  readonly series: readonly {
    readonly label: string;
    readonly emphasis?: boolean;
    /** Single values, not joined by a line: each point gets this symbol. */
    readonly symbol?: PointSymbol;
    /** From here on the curve is dotted: its model has reached its ceiling and tells nothing apart. */
    readonly saturatedFrom?: number;
    readonly points: readonly (readonly [number, number])[];
  }[];
  /** Shaded between lower and upper, with both edges drawn: the band of what is known. */
  readonly band?: { readonly label: string; readonly points: readonly (readonly [number, number, number])[] };
  readonly limits?: readonly {
    readonly label: string;
    readonly level: number;
    readonly from?: number;
    readonly to?: number;
    /** Side of the level on which the requirement is missed: hatched. */
    readonly forbidden?: 'above' | 'below';
  }[];
  /** Vertical marks: the board's foils, band edges. */
  readonly marks?: readonly { readonly label: string; readonly at: number }[];
}

// ---------------------------------------------------------------- drawings to scale: data, not shapes

export type DrawingData = StackUpDrawing | ArrayDrawing | ToothDrawing | MatrixDrawing;

/** A square table of numbers whose cells are shaded by level; every cell carries its number. */
export interface MatrixDrawing {
  readonly drawing: 'matrix';
  readonly rowTitle: string;
  readonly columnTitle: string;
  readonly unit: string;
  readonly labels: readonly string[];
  /** By row and column from 0; a cell without an entry stays empty. */
  readonly cells: readonly { readonly row: number; readonly column: number; readonly value: number }[];
  /** Levels shaded from palest to darkest. */
  readonly range: readonly [number, number];
  /** Pairs of cells outlined: between groups. */
  readonly outlined?: readonly (readonly [number, number])[];
}

/** Sections through copper faces, µm, one true scale in both directions and for all faces; copper is drawn below. */
export interface ToothDrawing {
  readonly drawing: 'tooth';
  readonly widthUm: number;
  readonly faces: readonly {
    readonly label: string;
    /** What is drawn: measured, or a sketch from which figures. */
    readonly note: string;
    readonly above: 'laminate' | 'outside';
    readonly skinDepthUm: number;
    readonly rqUm: number;
    readonly rz: { readonly um: number; readonly assumed: boolean };
    /** Heights above the mean plane from the left edge on. */
    readonly profile: { readonly intervalUm: number; readonly heightsUm: readonly number[] };
    /** Balls by the place of their centres, x from the left edge and height above the mean plane. */
    readonly nodules?: { readonly radiusUm: number; readonly centres: readonly (readonly [number, number])[] };
  }[];
}

export interface StackUpDrawing {
  readonly drawing: 'stack-up';
  /** From the top; thickness in µm; the drawing is to scale in thickness (layers below the ground may be broken). */
  readonly layers: readonly {
    readonly label: string;
    readonly detail: string;
    readonly thicknessUm: number;
    readonly material: 'cover' | 'copper-strip' | 'dielectric' | 'copper-ground' | 'below';
    readonly computed: boolean;
  }[];
}

export interface ArrayDrawing {
  readonly drawing: 'array';
  /** mm; x along the column away from the feed, y across. */
  readonly columns: readonly {
    readonly label: string;
    readonly rectangles: readonly {
      /** `slot`: laminate bare of copper inside a patch. */
      readonly kind: 'patch' | 'line' | 'slot';
      readonly x: number;
      readonly y: number;
      readonly length: number;
      readonly width: number;
      /** Amplitude of the current of a patch over the largest of the board, 0…1, as text of two digits. */
      readonly amplitude?: { readonly share: number; readonly text: string };
    }[];
    /** Where the wave enters and which way it goes. */
    readonly feed: {
      readonly x: number;
      readonly y: number;
      readonly towards: '+x' | '-x' | '+y' | '-y';
      /** The port ends in the reference impedance. */
      readonly terminated?: boolean;
    };
    /** End of a travelling-wave column. */
    readonly load?: { readonly x: number; readonly y: number };
  }[];
  /** Drawn beside the feeds, not to scale. */
  readonly network?: { readonly label: string; readonly driven: readonly number[] };
  readonly extent: { readonly x: readonly [number, number]; readonly y: readonly [number, number] };
  /** Labels for the axes, cuts, the sign of tilt and the polarisation, printed on the drawing. */
  readonly axisNotes: {
    readonly x: string;
    readonly y: string;
    readonly tilt: string;
    readonly polarisation: string;
    readonly cuts: string;
    /** What the numbers in the patches are, where there are any. */
    readonly amplitude?: string;
  };
}
