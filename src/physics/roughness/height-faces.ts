import { complex } from '../../numerics/complex.js';
import { ASSUMED_RZ_OVER_RQ } from '../texture/conversion.js';
import { BALL_PILE_HIGHEST_RATIO, ballPile } from './ball-pile.js';
import { CANNONBALL_RADIUS_OVER_RZ, cannonball } from './cannonball.js';
import { groissImpedance, hammerstadImpedance } from './causal-reactance.js';
import { type FaceModel, flagger, type ModelFace, micrometres } from './face-model.js';
import { gradient, gradientPlaneShift } from './gradient.js';
import { GROISS_LOWEST_RATIO, groiss } from './groiss.js';
import { CEILING, hammerstad, type LossFactor } from './hammerstad.js';
import { HURAY_LOWEST_RADIUS } from './huray.js';
import { sphereOverstatement } from './sphere.js';

/** Rq above which a texture is known to slow the wave more than a loss factor can say, m. */
const PHASE_MATTERS = 0.4e-6;
/** Rq/δ above which the gradient model is known to exceed compact solved textures. */
const GRADIENT_CLOSE_UP_TO = 0.6;

const lossOnly =
  (model: 'hammerstad' | 'groiss', title: string, loss: (rq: number, delta: number) => LossFactor): FaceModel =>
  (input, delta): ModelFace => {
    const { rq } = input;
    const r = rq / delta;
    const k = loss(rq, delta);
    const flag = flagger(model, title);
    const flags = [];
    if (k.saturated)
      flags.push(
        flag(
          'saturated',
          'saturated',
          `At Rq ${micrometres(rq)} (${r.toFixed(1)} skin depths) the loss factor ${k.factor.toFixed(2)} is within 5 % of the formula's ceiling of ${CEILING}: it cannot tell this foil from a rougher one. The ceiling belongs to the formula, not to copper.`,
        ),
      );
    if (model === 'groiss' && r > 0 && r < GROISS_LOWEST_RATIO)
      flags.push(
        flag(
          'range',
          'outside',
          `Rq over skin depth is ${r.toFixed(2)}; the Groiss formula is supported from ${GROISS_LOWEST_RATIO} upward and falls to 1 too fast below.`,
        ),
      );
    if (rq > PHASE_MATTERS)
      flags.push(
        flag(
          'phase',
          'note',
          `The formula gives loss only. Its reactance is completed by causality, without plane shift, which is the least phase that such a loss can have and too small for a textured foil of Rq ${micrometres(rq)}: roughness slows the wave by 0.2 to 3 % in permittivity on 0.127 mm in solved textures.`,
        ),
      );
    const full = (model === 'hammerstad' ? hammerstadImpedance : groissImpedance)(rq, delta);
    return { impedance: complex(k.factor, full.im), plane: 'assumed-mean', planeShift: 0, flags };
  };

const gradientFace: FaceModel = ({ rq, frequency, conductivity, permittivity }, delta) => {
  const r = rq / delta;
  const flag = flagger('gradient', 'roughness, gradient');
  return {
    impedance: gradient(rq, delta),
    plane: 'mean',
    planeShift: gradientPlaneShift(rq, frequency, conductivity, permittivity),
    flags:
      r <= GRADIENT_CLOSE_UP_TO
        ? []
        : [
            flag(
              'upper-side',
              'note',
              `At Rq ${micrometres(rq)} (${r.toFixed(1)} skin depths) the gradient model is the upper side of the band: it describes texture much finer than the skin depth, and above ${GRADIENT_CLOSE_UP_TO} skin depths solved compact textures lose less and slow the wave less.`,
            ),
          ],
  };
};

const cannonballFace: FaceModel = ({ rq, rz }, delta) => {
  if (rq === 0 && rz === undefined)
    return { impedance: complex(1, 1), plane: 'assumed-mean', planeShift: 0, flags: [] };
  const height = rz ?? ASSUMED_RZ_OVER_RQ * rq;
  const radius = CANNONBALL_RADIUS_OVER_RZ * height;
  const flag = flagger('cannonball', 'roughness, cannonball stacking');
  const flags = [];
  if (rz === undefined)
    flags.push(
      flag(
        'rz',
        'note',
        `Rz is not stated; ${ASSUMED_RZ_OVER_RQ} Rq (${micrometres(height)}) is assumed. Foils of one Rq scatter from about 4 to 8.`,
      ),
    );
  if (radius < HURAY_LOWEST_RADIUS * delta)
    flags.push(
      flag(
        'ball-size',
        'outside',
        `The balls have a radius of ${micrometres(radius)}, ${(radius / delta).toFixed(2)} skin depths; below ${HURAY_LOWEST_RADIUS} the sphere term overstates the loss, here ${sphereOverstatement(radius, delta).toPrecision(2)} times for a free ball. As a calibration the formula still lies near the gradient model.`,
      ),
    );
  return { impedance: cannonball(height, delta), plane: 'assumed-mean', planeShift: 0, flags };
};

const ballPileFace: FaceModel = ({ rq }, delta) => {
  const r = rq / delta;
  const flag = flagger('ball-pile', 'roughness, solved pile of balls');
  return {
    ...ballPile(rq, delta),
    plane: 'mean',
    flags:
      r <= BALL_PILE_HIGHEST_RATIO
        ? []
        : [
            flag(
              'range',
              'outside',
              `Rq is ${r.toFixed(1)} skin depths; the pile of touching balls is solved to ${BALL_PILE_HIGHEST_RATIO}. Its loss factor is held at its last value of 2.14.`,
            ),
          ],
  };
};

/** Models that ask for the height of the texture alone. */
export const heightFaces = {
  hammerstad: lossOnly('hammerstad', 'roughness, Hammerstad', hammerstad),
  groiss: lossOnly('groiss', 'roughness, Groiss', groiss),
  gradient: gradientFace,
  cannonball: cannonballFace,
  'ball-pile': ballPileFace,
} as const satisfies Readonly<Record<string, FaceModel>>;
