import { complex } from '../../numerics/complex.js';
import { type FaceModel, flagger, type ModelFace, micrometres, type RoughnessModel } from './face-model.js';
import { HALL_LOWEST_PITCH, HALL_LOWEST_RADIUS, hallHemispheres } from './hall.js';
import { HURAY_LOWEST_PITCH, HURAY_LOWEST_RADIUS, hurayImpedance } from './huray.js';
import { noduleStacks } from './nodules.js';
import {
  areaLimitedPerturbation,
  correlationLengthFromAreaRatio,
  PERTURBATION_SLOPE_LIMIT,
  type Perturbed,
  smallPerturbation,
} from './small-perturbation.js';
import { sphereOverstatement } from './sphere.js';
import { type NoduleKnowledge, noduleLattice, type TextureKnowledge } from './texture.js';

const SMOOTH: ModelFace = { impedance: complex(1, 1), plane: 'mean', planeShift: 0, flags: [] };
/** Slope up to which the area-limited extension has been compared closely. */
const AREA_LIMITED_SLOPE = 1;

/** Correlation length as stated, or that of a Gaussian spectrum with the stated Sdr. */
export function knownCorrelationLength(texture: TextureKnowledge): number | undefined {
  const { rq, correlationLength, developedAreaRatio, lay = 'isotropic' } = texture;
  if (correlationLength !== undefined) return correlationLength;
  return developedAreaRatio !== undefined && developedAreaRatio > 0 && rq > 0
    ? correlationLengthFromAreaRatio(rq, developedAreaRatio, lay)
    : undefined;
}

const perturbationOf =
  (
    model: 'perturbation' | 'area-limited',
    title: string,
    solve: typeof smallPerturbation,
    limit: number,
    beyond: string,
  ): FaceModel =>
  (input, delta) => {
    if (input.rq === 0 || input.developedAreaRatio === 0) return SMOOTH;
    const correlationLength = knownCorrelationLength(input);
    if (correlationLength === undefined)
      throw new RangeError(`model ${model} needs a correlation length or a developed area ratio beside Rq`);
    const p: Perturbed = solve({ rq: input.rq, correlationLength, lay: input.lay ?? 'isotropic' }, delta);
    const flag = flagger(model, title);
    return {
      impedance: p.impedance,
      plane: 'mean',
      planeShift: p.planeShift,
      flags:
        p.profileSlope <= limit
          ? []
          : [
              flag(
                'slope',
                'outside',
                `The texture's rms slope is ${p.profileSlope.toFixed(2)}; the method holds to ${limit}. ${beyond}`,
              ),
            ],
    };
  };

const needNodule = (model: RoughnessModel, nodule: NoduleKnowledge | undefined): NoduleKnowledge => {
  if (!nodule) throw new RangeError(`model ${model} needs the radius and pitch of the nodules`);
  return nodule;
};

const hallFace: FaceModel = ({ nodule }, delta) => {
  const { radius, pitch } = noduleLattice(needNodule('hall', nodule));
  const k = hallHemispheres(radius, pitch, delta);
  const flag = flagger('hall', 'roughness, Hall');
  const flags = [];
  if (radius < HALL_LOWEST_RADIUS * delta || pitch < HALL_LOWEST_PITCH * radius)
    flags.push(
      flag(
        'range',
        'outside',
        `Hemispheres of ${(radius / delta).toFixed(2)} skin depths at a pitch of ${(pitch / radius).toFixed(1)} radii; the method holds from ${HALL_LOWEST_RADIUS} skin depths and ${HALL_LOWEST_PITCH} radii.${k.clipped ? ' The formula falls below the loss of a smooth face there and is held at 1.' : ''}`,
      ),
    );
  return { impedance: complex(k.factor, k.impedance.im), plane: 'assumed-mean', planeShift: 0, flags };
};

const hurayFace: FaceModel = ({ nodule }, delta) => {
  const { radius, pitch, layers } = noduleLattice(needNodule('huray', nodule));
  const flag = flagger('huray', 'roughness, Huray');
  const flags = [];
  if (radius < HURAY_LOWEST_RADIUS * delta)
    flags.push(
      flag(
        'radius',
        'outside',
        `The nodules' radius of ${micrometres(radius)} is ${(radius / delta).toFixed(2)} skin depths; the sphere formula holds from ${HURAY_LOWEST_RADIUS} and overstates the loss of such a ball ${sphereOverstatement(radius, delta).toPrecision(2)} times.`,
      ),
    );
  if (pitch < HURAY_LOWEST_PITCH * radius)
    flags.push(
      flag(
        'pitch',
        'outside',
        `The nodules stand ${(pitch / radius).toFixed(1)} radii apart; the sphere formula holds from ${HURAY_LOWEST_PITCH}: closer balls shade one another and lose less than it says.`,
      ),
    );
  return {
    impedance: hurayImpedance([{ radius, perArea: layers / (pitch * pitch) }], delta),
    plane: 'assumed-mean',
    planeShift: 0,
    flags,
  };
};

const nodulesFace: FaceModel = ({ nodule }, delta) => {
  const needed = needNodule('nodules', nodule);
  const { radius, pitch } = noduleLattice(needed);
  const { impedance, planeShift } = noduleStacks(needed, delta);
  const [a, p] = [radius / delta, pitch / radius];
  const flag = flagger('nodules', 'roughness, solved stacks of nodules');
  return {
    impedance,
    plane: 'mean',
    planeShift,
    flags:
      a >= 0.25 && a <= 2 && p >= 2.2 && p <= 6
        ? []
        : [
            flag(
              'range',
              'outside',
              `Nodules of ${a.toFixed(2)} skin depths at a pitch of ${p.toFixed(1)} radii; stacks are solved for 0.25 to 2 skin depths and 2.2 to 6 radii.`,
            ),
          ],
  };
};

/** Models that ask for the shape of the texture: its lateral scale, or its nodules. */
export const shapeFaces = {
  perturbation: perturbationOf(
    'perturbation',
    'roughness, small perturbation',
    smallPerturbation,
    PERTURBATION_SLOPE_LIMIT,
    'Steeper texture loses less than it says.',
  ),
  'area-limited': perturbationOf(
    'area-limited',
    'roughness, perturbation held to the area ratio',
    areaLimitedPerturbation,
    AREA_LIMITED_SLOPE,
    'Steeper texture was compared at single cases only, and its excess loss overstated by up to a half.',
  ),
  hall: hallFace,
  huray: hurayFace,
  nodules: nodulesFace,
} as const satisfies Readonly<Record<string, FaceModel>>;
