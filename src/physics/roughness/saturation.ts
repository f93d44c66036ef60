import { skinDepth } from '../material/copper.js';
import { roughnessEstimates } from './band.js';
import { type FaceConditions, micrometres, type RoughnessModel } from './face-model.js';
import { roughFace } from './rough-face.js';
import type { TextureKnowledge } from './texture.js';

/** Rq/δ from which the factor is within 5 % of its ceiling. */
const SATURATES_AT = {
  hammerstad: Math.sqrt(Math.tan(0.45 * Math.PI) / 1.4),
  groiss: 0.5 * (-Math.log(0.9)) ** (-1 / 1.6),
} as const;

const NAMES = { hammerstad: 'Hammerstad', groiss: 'Groiss' } as const;

/** Rq from which a model with a ceiling is saturated, m; undefined for models without one. */
export function saturationRq(model: RoughnessModel, conditions: FaceConditions): number | undefined {
  if (model !== 'hammerstad' && model !== 'groiss') return undefined;
  return SATURATES_AT[model] * skinDepth(conditions.frequency, conditions.conductivity);
}

/**
 * A plain sentence when a model is saturated at a texture's roughness, with what other knowledge says of it; undefined where
 * the model still distinguishes.
 */
export function saturationStatement(
  model: RoughnessModel,
  texture: TextureKnowledge,
  conditions: FaceConditions,
): string | undefined {
  const from = saturationRq(model, conditions);
  if (from === undefined || texture.rq < from || (model !== 'hammerstad' && model !== 'groiss')) return undefined;
  const { lossFactor } = roughFace(model, { ...texture, ...conditions });
  const { low, high } = roughnessEstimates(texture, conditions);
  return `${NAMES[model]}'s formula is saturated here: from Rq ${micrometres(from)} upward at ${(conditions.frequency / 1e9).toPrecision(3)} GHz it gives every foil a loss factor of 1.90 to 2.00 (this one ${lossFactor.toFixed(2)}), so it can neither rank foils nor yield a limit on their roughness. For what is known of this texture the loss factor lies between ${low.lossFactor.toFixed(2)} and ${high.lossFactor.toFixed(2)}.`;
}
