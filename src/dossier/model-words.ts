import type { RoughnessChoice } from '../manifest/model.js';
import type { RoughnessModel } from '../physics/roughness/index.js';
import type { RoughnessSide } from '../study/results.js';

/** Names of the models of rough copper and of the estimates of the band, as every page, chart and sheet says them. */
const MODELS: Readonly<Record<RoughnessModel, { readonly title: string; readonly what: string }>> = {
  smooth: { title: 'Smooth copper', what: 'no texture; what every loss factor is counted from' },
  hammerstad: {
    title: 'Hammerstad',
    what: 'grooves of 60° across the current, fitted; ends at a factor of two, whatever the foil',
  },
  groiss: { title: 'Groiss', what: 'fitted to finite-element results; ends at a factor of two as well' },
  hall: { title: 'Hall', what: 'hemispheres on a plane; needs the nodules' },
  huray: {
    title: 'Huray',
    what: 'free spheres; needs the nodules, and overstates those smaller than a skin depth many times over',
  },
  cannonball: {
    title: 'Cannonball stacking',
    what: 'pyramids of fourteen spheres whose size follows from Rz; Rz is taken as 5.5 Rq where it is not stated',
  },
  gradient: {
    title: 'Gradient',
    what: 'conductivity that fades over the height: the limit of texture much finer than a skin depth, with current along it; an upper side for compact nodules',
  },
  perturbation: {
    title: 'Small perturbation',
    what: 'second order in the heights; needs correlation length or Sdr, and holds for gentle slopes',
  },
  'area-limited': {
    title: 'Perturbation, area-limited',
    what: 'small perturbation held to the developed area ratio where slopes are steep',
  },
  'ball-pile': { title: 'Solved ball pile', what: 'three-dimensional solution of touching balls of this Rq' },
  nodules: { title: 'Solved nodule stacks', what: 'three-dimensional solution of stacked balls; needs the nodules' },
};

export const modelTitle = (model: RoughnessModel): string => MODELS[model].title;

/** Every model with what it is, in the order of their age. */
export const MODEL_WORDS: readonly (readonly [string, string])[] = Object.values(MODELS).map(({ title, what }) => [
  title,
  what,
]);

const SIDES: Readonly<Record<RoughnessSide, string>> = { low: 'Low', middle: 'Middle', high: 'High' };
export const sideTitle = (side: RoughnessSide): string => SIDES[side];

/** What stands behind the nominal figures, within a sentence. */
export const choiceText = (choice: RoughnessChoice): string =>
  choice === 'band' ? 'the middle estimate of the band' : `the ${modelTitle(choice)} model`;
