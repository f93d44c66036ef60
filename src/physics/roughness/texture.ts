import { gaussLegendre } from '../../numerics/gauss-legendre.js';
import { normalCdf } from '../../numerics/normal.js';

/** How the texture lies to the current: the same in all directions, or grooves across it or along it. */
export type Lay = 'isotropic' | 'across' | 'along';

/** Nodules of the treatment, taken as equal balls on a flat base, stacked one above another. */
export interface NoduleKnowledge {
  /** m, > 0 */
  readonly radius: number;
  /** Centre to centre on a square lattice, m, ≥ 2 radii. Exactly one of `pitch` and `perArea`. */
  readonly pitch?: number;
  /** Stacks of balls per area, 1/m². */
  readonly perArea?: number;
  /** Balls per stack; 1 when left out. */
  readonly layers?: number;
}

/** What is known of the texture of a face. Rq alone fixes neither loss nor phase. */
export interface TextureKnowledge {
  /** Root-mean-square height of the profile, m, ≥ 0 (ISO 21920-2; Sq of ISO 25178-2 for a surface). */
  readonly rq: number;
  /** Distance at which the autocorrelation has fallen to 1/e, m, > 0; see `correlationLengthFromSal`. */
  readonly correlationLength?: number;
  /** Developed interfacial area ratio Sdr (ISO 25178-2) as a ratio: 0.113 for 11.3 %. */
  readonly developedAreaRatio?: number;
  /** Isotropic when left out. */
  readonly lay?: Lay;
  readonly nodule?: NoduleKnowledge;
  /** Maximum height of the profile, m; `ASSUMED_RZ_OVER_RQ` times Rq when left out (cannonball stacking alone needs it). */
  readonly rz?: number;
}

function requirePositive(name: string, value: number): number {
  if (!(Number.isFinite(value) && value > 0)) throw new RangeError(`${name} must be positive and finite, got ${value}`);
  return value;
}

/**
 * Correlation length (fall to 1/e) of a Gaussian autocorrelation from the autocorrelation length Sal, which ISO 25178-2
 * takes where the autocorrelation falls to 0.2 unless stated otherwise.
 */
export function correlationLengthFromSal(sal: number, threshold = 0.2): number {
  if (!(threshold > 0 && threshold < 1)) throw new RangeError(`threshold must lie between 0 and 1, got ${threshold}`);
  return requirePositive('Sal', sal) / Math.sqrt(Math.log(1 / threshold));
}

/**
 * Developed area ratio of an isotropic surface of Gaussian slopes: mean of sqrt(1 + g²) less 1,
 * (√π/2) s exp(1/s²) erfc(1/s) with s = Sdq, the rms of the whole gradient. Exact for Gaussian surfaces.
 */
export function isotropicAreaRatio(sdq: number): number {
  if (sdq < 0.15) {
    const v = sdq * sdq;
    return v * (0.5 + v * (-0.25 + v * (0.375 + v * (-0.9375 + v * 3.28125))));
  }
  const erfc = 2 * normalCdf(-Math.SQRT2 / sdq);
  return 0.5 * Math.sqrt(Math.PI) * sdq * Math.exp(1 / (sdq * sdq)) * erfc;
}

/** Developed length ratio of a profile of Gaussian slopes of rms s, less 1: the area ratio of grooves. */
export function profileLengthRatio(slope: number): number {
  const { nodes, weights } = gaussLegendre(48);
  let sum = 0;
  for (let i = 0; i < nodes.length; i++) {
    const t = 4.25 * (nodes[i] + 1);
    const g = slope * t;
    sum += weights[i] * Math.exp(-0.5 * t * t) * ((g * g) / (Math.sqrt(1 + g * g) + 1));
  }
  return 4.25 * Math.sqrt(2 / Math.PI) * sum;
}

/** Area ratio at an rms gradient, for the lay: the whole gradient of an isotropic surface, or across grooves. */
export const areaRatio = (gradient: number, lay: Lay): number =>
  lay === 'isotropic' ? isotropicAreaRatio(gradient) : profileLengthRatio(gradient);

/**
 * The rms gradient whose area ratio is given, by bisection to 1e-12.
 *
 * @throws RangeError outside 0 to 20 (2000 %), beyond which no foil lies
 */
export function gradientFromAreaRatio(ratio: number, lay: Lay): number {
  if (!(ratio >= 0 && ratio <= 20)) throw new RangeError(`developed area ratio must be 0 to 20, got ${ratio}`);
  let low = 0;
  let high = 40;
  while (high - low > 1e-12 * (1 + high)) {
    const middle = 0.5 * (low + high);
    if (areaRatio(middle, lay) < ratio) low = middle;
    else high = middle;
  }
  return 0.5 * (low + high);
}

/** Stacks per area and balls per stack. */
export function noduleLattice(nodule: NoduleKnowledge): { radius: number; pitch: number; layers: number } {
  const radius = requirePositive('nodule radius', nodule.radius);
  const layers = requirePositive('balls per stack', nodule.layers ?? 1);
  if ((nodule.pitch === undefined) === (nodule.perArea === undefined))
    throw new RangeError('exactly one of nodule pitch and nodules per area is needed');
  const pitch = nodule.pitch ?? 1 / Math.sqrt(requirePositive('nodules per area', nodule.perArea as number));
  if (!(pitch >= 2 * radius * (1 - 1e-9)))
    throw new RangeError(`nodules of radius ${radius} m do not fit a pitch of ${pitch} m: two radii at least`);
  return { radius, pitch, layers };
}
