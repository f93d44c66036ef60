/** The ways in which a sweep may see the texture of a board's faces. */
import type { RoughnessChoice } from '../manifest/model.js';
import type { RoughnessModel } from '../physics/roughness/index.js';
import type { RoughnessSide } from './results.js';

/** An estimate of the band for what is known of each face, or one model for all of them. */
export type RoughnessView = RoughnessSide | RoughnessModel;

export const ROUGHNESS_SIDES: readonly RoughnessSide[] = ['low', 'middle', 'high'];

export const isSide = (view: RoughnessView): view is RoughnessSide =>
  (ROUGHNESS_SIDES as readonly RoughnessView[]).includes(view);

/** What stands behind the nominal figures: the middle estimate, or the model that the analysis names. */
export const nominalView = (choice: RoughnessChoice): RoughnessView => (choice === 'band' ? 'middle' : choice);

/** `high estimate of the texture`, `texture by hammerstad`. */
export const viewText = (view: RoughnessView): string =>
  isSide(view) ? `${view} estimate of the texture` : `texture by ${view}`;
