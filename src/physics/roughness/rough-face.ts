import { type Complex, complex } from '../../numerics/complex.js';
import { MU0 } from '../constants.js';
import { skinDepth } from '../material/copper.js';
import type { ValidityFlag } from '../validity.js';
import { gradient, gradientPlaneShift } from './gradient.js';
import { GROISS_LOWEST_RATIO, groiss } from './groiss.js';
import { CEILING, hammerstad, type LossFactor } from './hammerstad.js';

export type RoughnessModel = 'smooth' | 'hammerstad' | 'groiss' | 'gradient';

export interface RoughFaceInput {
  /** Root-mean-square height of the profile, m, ≥ 0. */
  readonly rq: number;
  /** Hz, > 0 */
  readonly frequency: number;
  /** Conductivity of the metal at the temperature in question, S/m. */
  readonly conductivity: number;
  /** Relative permittivity of the dielectric on this face (1 for air); it sets the electrostatic plane of the gradient model. */
  readonly permittivity: number;
}

/** Surface impedance of a face together with the planes it belongs to. */
export interface RoughFace {
  readonly model: RoughnessModel;
  readonly frequency: number;
  /** Ohm, referred to the mean plane of the profile. */
  readonly impedance: Complex;
  /** Electrostatic plane above the mean plane, towards the dielectric, m. */
  readonly planeShift: number;
  /** K: resistance over that of a smooth face. */
  readonly lossFactor: number;
  /** X: reactance to the mean plane in units of the smooth surface resistance; 1 when smooth. */
  readonly reactance: number;
  readonly flags: readonly ValidityFlag[];
}

/** Rq above which a texture is known to slow the wave more than a loss factor can say, m. */
const PHASE_MATTERS = 0.4e-6;
/** Rq/δ above which the gradient model is known to exceed compact solved textures. */
const GRADIENT_CLOSE_UP_TO = 0.6;

const TITLE = {
  hammerstad: 'roughness, Hammerstad',
  groiss: 'roughness, Groiss',
  gradient: 'roughness, gradient',
} as const;

const micrometres = (x: number): string => `${(x * 1e6).toPrecision(3)} µm`;

function lossFactorFlags(model: 'hammerstad' | 'groiss', rq: number, r: number, k: LossFactor): ValidityFlag[] {
  const flags: ValidityFlag[] = [];
  const flag = (code: string, severity: ValidityFlag['severity'], text: string): void => {
    flags.push({ code: `roughness.${model}.${code}`, severity, model: TITLE[model], text });
  };
  if (k.saturated)
    flag(
      'saturated',
      'saturated',
      `At Rq ${micrometres(rq)} (${r.toFixed(1)} skin depths) the loss factor ${k.factor.toFixed(2)} is within 5 % of the formula's ceiling of ${CEILING}: it cannot tell this foil from a rougher one. The ceiling belongs to the formula, not to copper.`,
    );
  if (model === 'groiss' && r > 0 && r < GROISS_LOWEST_RATIO)
    flag(
      'range',
      'outside',
      `Rq over skin depth is ${r.toFixed(2)}; the Groiss formula is supported from ${GROISS_LOWEST_RATIO} upward and falls to 1 too fast below.`,
    );
  if (rq > PHASE_MATTERS)
    flag(
      'phase',
      'note',
      `The formula gives loss only. Reactance is completed with X = K and no plane shift, which is too small for a textured foil of Rq ${micrometres(rq)}: roughness slows the wave by 0.2 to 3 % in permittivity on 0.127 mm in solved textures.`,
    );
  return flags;
}

function gradientFlags(rq: number, r: number): ValidityFlag[] {
  if (r <= GRADIENT_CLOSE_UP_TO) return [];
  return [
    {
      code: 'roughness.gradient.upper-side',
      severity: 'note',
      model: TITLE.gradient,
      text: `At Rq ${micrometres(rq)} (${r.toFixed(1)} skin depths) the gradient model is the upper side of the band: it describes texture much finer than the skin depth, and above ${GRADIENT_CLOSE_UP_TO} skin depths solved compact textures lose less and slow the wave less.`,
    },
  ];
}

/**
 * Surface impedance of a rough conductor face by one published model, with the plane it is referred to.
 *
 * Rq alone fixes neither loss nor phase: results of all models belong side by side. Hammerstad and Groiss give loss only;
 * their reactance is completed as X = K with no plane shift, as if the metal were one of lower conductivity.
 *
 * @throws RangeError on arguments that are not physical
 */
export function roughFace(model: RoughnessModel, input: RoughFaceInput): RoughFace {
  const { rq, frequency, conductivity, permittivity } = input;
  if (!(Number.isFinite(permittivity) && permittivity >= 1))
    throw new RangeError(`relative permittivity on the face must be 1 or more, got ${permittivity}`);
  const delta = skinDepth(frequency, conductivity);
  const rs = 1 / (conductivity * delta);
  const face = (z: Complex, planeShift: number, flags: readonly ValidityFlag[]): RoughFace => ({
    model,
    frequency,
    impedance: complex(rs * z.re, rs * z.im),
    planeShift,
    lossFactor: z.re,
    reactance: z.im,
    flags,
  });
  switch (model) {
    case 'smooth':
      return face(complex(1, 1), 0, []);
    case 'hammerstad':
    case 'groiss': {
      const k = (model === 'hammerstad' ? hammerstad : groiss)(rq, delta);
      return face(complex(k.factor, k.factor), 0, lossFactorFlags(model, rq, rq / delta, k));
    }
    case 'gradient':
      return face(
        gradient(rq, delta),
        gradientPlaneShift(rq, frequency, conductivity, permittivity),
        gradientFlags(rq, rq / delta),
      );
  }
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
  const equal = roughFace(model, { ...input, conductivity });
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
