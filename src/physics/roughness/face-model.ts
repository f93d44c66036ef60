import type { Complex } from '../../numerics/complex.js';
import type { ValidityFlag } from '../validity.js';
import type { TextureKnowledge } from './texture.js';

/**
 * `perturbation` needs correlation length or Sdr; `area-limited` is the same held to the area ratio; `hall`, `huray` and
 * `nodules` need the nodules; `ball-pile` is the solved pile of touching balls.
 */
export type RoughnessModel =
  | 'smooth'
  | 'hammerstad'
  | 'groiss'
  | 'hall'
  | 'huray'
  | 'cannonball'
  | 'gradient'
  | 'perturbation'
  | 'area-limited'
  | 'ball-pile'
  | 'nodules';

/** Where the face is and when: what turns a texture into an impedance. */
export interface FaceConditions {
  /** Hz, > 0 */
  readonly frequency: number;
  /** Conductivity of the metal at the temperature in question, S/m. */
  readonly conductivity: number;
  /** Relative permittivity of the dielectric on this face (1 for air); it sets the electrostatic plane of the gradient model. */
  readonly permittivity: number;
}

export interface RoughFaceInput extends TextureKnowledge, FaceConditions {}

/**
 * `mean`: the model's reactance refers to the mean plane of the profile. `assumed-mean`: the model states no plane; its
 * reactance is taken as referred to the mean plane.
 */
export type ReferencePlane = 'mean' | 'assumed-mean';

/** What one model says of a face, in units of the smooth surface resistance. */
export interface ModelFace {
  readonly impedance: Complex;
  readonly plane: ReferencePlane;
  /** Electrostatic plane above the mean plane, m. */
  readonly planeShift: number;
  readonly flags: readonly ValidityFlag[];
}

/** A model's view of a texture at a skin depth; `input` has been checked. */
export type FaceModel = (input: RoughFaceInput, delta: number) => ModelFace;

export const micrometres = (x: number): string => `${(x * 1e6).toPrecision(3)} µm`;

/** Makes the flags of one model. */
export const flagger =
  (model: RoughnessModel, title: string) =>
  (code: string, severity: ValidityFlag['severity'], text: string): ValidityFlag => ({
    code: `roughness.${model}.${code}`,
    severity,
    model: title,
    text,
  });
