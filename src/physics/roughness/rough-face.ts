import { type Complex, complex } from '../../numerics/complex.js';
import { MU0 } from '../constants.js';
import { skinDepth, surfaceResistance } from '../material/copper.js';
import type { ValidityFlag } from '../validity.js';
import type { FaceConditions, ModelFace, ReferencePlane, RoughFaceInput, RoughnessModel } from './face-model.js';
import { heightFaces } from './height-faces.js';
import { shapeFaces } from './shape-faces.js';
import type { TextureKnowledge } from './texture.js';

/** Surface impedance of a face together with the planes it belongs to. */
export interface RoughFace {
  readonly model: RoughnessModel;
  readonly frequency: number;
  /** Ohm, referred to the mean plane of the profile. */
  readonly impedance: Complex;
  /** Whether the model itself refers its reactance to the mean plane, or states none. */
  readonly plane: ReferencePlane;
  /** Electrostatic plane above the mean plane, towards the dielectric, m. */
  readonly planeShift: number;
  /** K: resistance over that of a smooth face. */
  readonly lossFactor: number;
  /** X: reactance to the mean plane in units of the smooth surface resistance; 1 when smooth. */
  readonly reactance: number;
  readonly flags: readonly ValidityFlag[];
}

const SMOOTH: ModelFace = { impedance: complex(1, 1), plane: 'mean', planeShift: 0, flags: [] };
const faces = { smooth: (): ModelFace => SMOOTH, ...heightFaces, ...shapeFaces } as const;

/** The models that a texture's knowledge suffices for, in the order of their age. */
export function applicableModels(texture: TextureKnowledge): RoughnessModel[] {
  const lateral = texture.correlationLength !== undefined || texture.developedAreaRatio !== undefined;
  return [
    'smooth',
    'hammerstad',
    'groiss',
    ...(texture.nodule ? (['hall', 'huray'] as const) : []),
    'cannonball',
    'gradient',
    ...(lateral ? (['perturbation', 'area-limited'] as const) : []),
    'ball-pile',
    ...(texture.nodule ? (['nodules'] as const) : []),
  ];
}

/**
 * Surface impedance of a rough conductor face by one model, with the plane it is referred to.
 *
 * Rq alone fixes neither loss nor phase: results of all models belong side by side, see `roughnessBand`. Models that give
 * loss only (Hammerstad, Groiss) are completed with the reactance that causality demands and no plane shift.
 *
 * @throws RangeError on arguments that are not physical, and where the texture lacks what the model needs
 * @example
 * const face = roughFace('perturbation', {
 *   rq: 0.3e-6, correlationLength: 1e-6, frequency: 77e9, conductivity: 5.8e7, permittivity: 3,
 * });
 * face.lossFactor; // K
 */
export function roughFace(model: RoughnessModel, input: RoughFaceInput): RoughFace {
  const { rq, frequency, conductivity, permittivity } = input;
  if (!(Number.isFinite(permittivity) && permittivity >= 1))
    throw new RangeError(`relative permittivity on the face must be 1 or more, got ${permittivity}`);
  if (model !== 'smooth' && !(Number.isFinite(rq) && rq >= 0))
    throw new RangeError(`Rq must be 0 m or more, got ${rq}`);
  return faceOf(model, faces[model](input, skinDepth(frequency, conductivity)), input);
}

/** A model's view of a face, given the units of the metal and frequency it stands in. */
export function faceOf(model: RoughnessModel, view: ModelFace, conditions: FaceConditions): RoughFace {
  const { frequency, conductivity } = conditions;
  const rs = surfaceResistance(frequency, conductivity);
  const { impedance: z, plane, planeShift, flags } = view;
  return {
    model,
    frequency,
    impedance: complex(rs * z.re, rs * z.im),
    plane,
    planeShift,
    lossFactor: z.re,
    reactance: z.im,
    flags,
  };
}

/**
 * A rough face over a plated finish: the flat layers' impedance with the texture of an equal half space laid over it.
 *
 * The equal half space is the one with the flat impedance's resistance, so that a poor conductor such as nickel, with its
 * deep skin, feels the same texture less. The layers are taken as following the profile. An approximation of our own,
 * exact for smooth faces and for bare metal.
 *
 * @param flat impedance of the smooth layered face, ohm
 */
export function roughPlatedFace(
  model: RoughnessModel,
  flat: Complex,
  input: Omit<RoughFaceInput, 'conductivity'>,
): RoughFace {
  const conductivity = (Math.PI * input.frequency * MU0) / (flat.re * flat.re);
  return overFlatImpedance(roughFace(model, { ...input, conductivity }), flat);
}

/** The same for a face already calculated over the equal half space. */
export function overFlatImpedance(equal: RoughFace, flat: Complex): RoughFace {
  const added = (equal.reactance - 1) * flat.re;
  return {
    ...equal,
    impedance: complex(flat.re * equal.lossFactor, flat.im + added),
    reactance: (flat.im + added) / flat.re,
  };
}

/** A face referred to its electrostatic plane, so that one dielectric height serves capacitance and inductance alike. */
export interface ElectrostaticFace {
  /** Ohm, reactance of the skipped depth included. */
  readonly impedance: Complex;
  /** What to take off the dielectric height measured between mean planes (and, on a strip, to add to its thickness), m. */
  readonly heightReduction: number;
}

/**
 * Moves the reference of a face from the mean plane to its electrostatic plane: the dielectric gets thinner by the plane
 * shift, and the inductance of the depth between the planes joins the face, Z + jωµ0·es.
 *
 * Every face of a line moves: a microstrip's height loses the shifts of underside and ground, and its strip, whose top stays
 * where it is, gains the underside's shift in thickness. Then C and L agree with those of two separate planes to first order.
 */
export function referToElectrostaticPlane(face: RoughFace): ElectrostaticFace {
  const omega = 2 * Math.PI * face.frequency;
  return {
    impedance: complex(face.impedance.re, face.impedance.im + omega * MU0 * face.planeShift),
    heightReduction: face.planeShift,
  };
}
