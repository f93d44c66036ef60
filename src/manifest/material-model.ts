/**
 * Materials of a board and where their figures come from: laminates, copper and its texture, finishes, cover layers.
 * All numbers are SI, as in `model.ts`, which passes these types on.
 */
export type Basis = 'guaranteed' | 'typical' | 'measured' | 'estimated';
export type Direction = 'through-thickness' | 'in-plane';

/** Where a figure comes from. Empty strings never occur: what is not given is absent. */
export interface Provenance {
  readonly basis: Basis;
  readonly method?: string;
  /** Hz at which the figure was taken. */
  readonly frequency?: number;
  readonly direction?: Direction;
  readonly document?: string;
  readonly revision?: string;
  readonly date?: string;
}

/** A material or fabrication figure: nominal value, how far it may lie below and above, and where it comes from. */
export interface Figure {
  readonly value: number;
  /** Absolute, ≥ 0, same unit: lower limit is value − minus, upper limit value + plus. */
  readonly minus: number;
  readonly plus: number;
  readonly provenance: Provenance;
  /** Where it is written, for the dossier: `laminates.yaml: nf-30.permittivity`. */
  readonly path: string;
}

/** A property stated by a document and compared as declared, not computed. */
export interface DeclaredProperty {
  readonly id: string;
  /** Text such as `V-0`, or a number with its unit kept for print. */
  readonly value: string | number;
  readonly unit?: string;
  readonly document?: string;
  readonly revision?: string;
  readonly date?: string;
}

export interface Laminate {
  readonly id: string;
  readonly maker: string;
  readonly name: string;
  readonly invented: boolean;
  /** `bulk`: process value of the dielectric alone. `design`: fitted on lines with the named foil and thickness, so part of the roughness effect is already in it. */
  readonly permittivityKind: 'bulk' | 'design';
  readonly fittedOn?: { readonly foil: string; readonly thickness: number };
  readonly permittivity: Figure;
  readonly lossTangent: Figure;
  /** Relative change of permittivity per kelvin, 1/K. */
  readonly permittivityTemperatureCoefficient?: Figure;
  /** Relative change of loss tangent per kelvin, 1/K. */
  readonly lossTangentTemperatureCoefficient?: Figure;
  /** In the plane of the board, where it differs from `permittivity`; absent: not stated, taken as equal and said so. */
  readonly inPlanePermittivity?: Figure;
  /** Moisture: share of mass taken up in service (0.0004 for 0.04 %) and what it changes per unit of that share. */
  readonly water?: {
    readonly uptake: Figure;
    /** Relative change of permittivity per mass share. */
    readonly permittivityPerShare?: number;
    /** Change of the loss tangent itself per mass share. */
    readonly lossTangentPerShare?: number;
  };
  readonly declared: readonly DeclaredProperty[];
}

export type TextureParameter = 'Rq' | 'Sq' | 'Ra' | 'Sa' | 'Rz' | 'Sz';

/** Texture of one copper face; `rq` is what every model uses, with how it was obtained. What is known beside it narrows the band. */
export interface Texture {
  readonly rq: Figure;
  /** Distance at which the autocorrelation has fallen to 1/e, m: stated, or from Sal. */
  readonly correlationLength?: Figure;
  /** Developed interfacial area ratio Sdr (ISO 25178-2) as a ratio: 0.113 for 11.3 %. */
  readonly developedAreaRatio?: Figure;
  /** Maximum height stated beside Rq, m. */
  readonly rz?: Figure;
  /** To the current along a column; absent: not known. */
  readonly lay?: 'isotropic' | 'across' | 'along';
  /** Equal balls on a flat base, stacked `layers` high, on a square lattice. */
  readonly nodule?: { readonly radius: Figure; readonly pitch: Figure; readonly layers: number };
  /** Set when the figures were evaluated from a measured profile or height map of the pack. */
  readonly measured?: MeasuredTexture;
  readonly stated: { readonly parameter: TextureParameter; readonly value: number };
  /** Set when Rq was not stated: a sentence naming the conversion and its assumption. */
  readonly conversion?: string;
  /** Set when the correlation length comes from Sal: a sentence naming the conversion and its assumption. */
  readonly lengthConversion?: string;
  readonly instrument?: string;
  readonly filter?: string;
}

/** A measured profile or height map and how it was evaluated (ISO 21920-2, ISO 25178-2, Gaussian filter of ISO 16610-21/-61). */
export interface MeasuredTexture {
  /** Path relative to the root folder. */
  readonly file: string;
  readonly sha256: string;
  readonly kind: 'profile' | 'map';
  /** Nesting indices, m; absent where no such filter was applied. */
  readonly shortNestingIndex?: number;
  readonly longNestingIndex?: number;
  /** Sampling interval and extent, m. */
  readonly interval: number;
  readonly extent: number;
  /** A piece of the evaluated heights for the drawing, m above the mean, at its own interval (m); a few hundred at most. */
  readonly section?: { readonly interval: number; readonly heights: readonly number[] };
  /** What the reviewer must know of it: form removed, points missing, resolution coarser than the skin depth. */
  readonly remarks: readonly string[];
}

export interface Foil {
  readonly id: string;
  readonly maker: string;
  readonly name: string;
  readonly invented: boolean;
  readonly conductivity: Figure;
  /** 1/K at 20 degC. */
  readonly temperatureCoefficient: number;
  readonly treatedFace: Texture;
  readonly untreatedFace: Texture;
  readonly declared: readonly DeclaredProperty[];
}

export interface FinishLayer {
  readonly material: string;
  readonly conductivity: Figure;
  readonly thickness: Figure;
  readonly relativePermeability: number;
}

/** Layers from the copper outward; empty for bare copper. */
export interface Finish {
  readonly id: string;
  readonly name: string;
  readonly invented: boolean;
  readonly layers: readonly FinishLayer[];
  readonly declared: readonly DeclaredProperty[];
}

export interface CoverLayer {
  readonly material: string;
  readonly permittivity: Figure;
  readonly lossTangent: Figure;
  readonly thickness: Figure;
}
