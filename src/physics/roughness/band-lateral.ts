import { between, gentlest, type Made, randomTexture, type Three } from './band-parts.js';
import { type ModelFace, micrometres } from './face-model.js';
import { areaLimitedPerturbation, correlationLengthFromAreaRatio, type HeightSpectrum } from './small-perturbation.js';
import { areaRatio, type Lay, type TextureKnowledge } from './texture.js';

/** Profiles steeper than slope 1 are not given more loss than slope 1 on the lower side: none is compared closely. */
const STEEPEST_LENGTH_OVER_RQ = Math.SQRT2;
function fromLength(texture: TextureKnowledge, correlationLength: number, delta: number): Three {
  const { rq, lay = 'isotropic' } = texture;
  const length = `correlation length ${micrometres(correlationLength)}`;
  const low = randomTexture(
    { rq, correlationLength: Math.max(correlationLength, STEEPEST_LENGTH_OVER_RQ * rq), ...gentlest(texture) },
    delta,
    `Lower side: perturbation for Gaussian autocorrelation, ${length}${texture.lay ? '' : ', grooves in one direction'}, no finer content.`,
    -1,
  );
  const high = randomTexture(
    { rq, correlationLength, lay, spectrum: 'exponential' },
    delta,
    `Upper side: perturbation held to the area ratio for exponential autocorrelation, ${length}, fine content to a twelfth of it; no overhanging nodules.`,
    1,
  );
  const gauss = randomTexture(
    { rq, correlationLength, lay },
    delta,
    `Middle: perturbation held to the area ratio for an isotropic Gaussian autocorrelation, ${length}.`,
  );
  const middle = texture.lay
    ? between(gauss, high, 0.5, `Middle: between Gaussian and exponential autocorrelation, ${length}.`)
    : gauss;
  return { low, middle, high };
}

function fromAreaRatio(texture: TextureKnowledge, ratio: number, delta: number): Three {
  const { rq, lay = 'isotropic' } = texture;
  const area = `developed area ratio ${(100 * ratio).toPrecision(3)} %`;
  const of = (spectrum: HeightSpectrum, side: -1 | 0 | 1, reason: string): Made => {
    const correlationLength = correlationLengthFromAreaRatio(rq, ratio, lay, spectrum);
    return randomTexture({ rq, lay, spectrum, correlationLength }, delta, reason, side);
  };
  return {
    low: of('exponential', -1, `Lower side: ${area}, much of it in structure too fine to count.`),
    middle: of('gaussian', 0, `Middle: perturbation held to the area ratio, Gaussian spectrum of ${area}.`),
    high: of('single', 1, `Upper side: ${area}, all in one wavelength; no overhanging nodules.`),
  };
}

/** Area ratios that a correlation length goes with: Gaussian spectrum, and exponential with its fine content. */
export function areaRatiosOf(rq: number, correlationLength: number, lay: Lay): { least: number; most: number } {
  const ratio = (spectrum: HeightSpectrum): number =>
    areaRatio(areaLimitedPerturbation({ rq, correlationLength, lay, spectrum }, correlationLength).gradient, lay);
  return { least: ratio('gaussian'), most: ratio('exponential') };
}

/** The area ratio fixes the loss at high frequency; the correlation length then says how much of it is fine. */
function fromBoth(texture: TextureKnowledge, correlationLength: number, ratio: number, delta: number): Three {
  const { rq, lay = 'isotropic' } = texture;
  const area = fromAreaRatio(texture, ratio, delta);
  const { least, most } = areaRatiosOf(rq, correlationLength, lay);
  const fine = (ratio - least) / (most - least);
  if (fine < 0) {
    const coarse = randomTexture(
      { rq, lay, correlationLength },
      delta,
      'Upper side: the correlation length, since the area ratio is less than it implies and slopes may have been lost to lateral resolution.',
      1,
    );
    return {
      low: area.low,
      middle: between(area.middle, coarse, 0.5, 'Middle: between what area ratio and correlation length imply.'),
      high: coarse,
    };
  }
  if (fine > 1) return area;
  const exponential = { ...area.low, view: unscaled(texture, ratio, delta) };
  const middle = between(
    area.middle,
    exponential,
    fine,
    'Middle: spectrum between Gaussian and exponential that has both the correlation length and the area ratio.',
  );
  return {
    low: between(area.low, middle, 0.5, `${area.low.reason} The correlation length halves the distance to the middle.`),
    middle,
    high: between(
      area.high,
      middle,
      0.5,
      `${area.high.reason} The correlation length halves the distance to the middle.`,
    ),
  };
}

/** Exponential spectrum of an area ratio, as calculated. */
function unscaled({ rq, lay = 'isotropic' }: TextureKnowledge, ratio: number, delta: number): ModelFace {
  const correlationLength = correlationLengthFromAreaRatio(rq, ratio, lay, 'exponential');
  return randomTexture({ rq, lay, spectrum: 'exponential', correlationLength }, delta, '').view;
}

/** Estimates from correlation length, area ratio or both; undefined where neither is known. */
export function lateral(texture: TextureKnowledge, delta: number): Three | undefined {
  const { correlationLength: length, developedAreaRatio: ratio } = texture;
  if (ratio === 0) throw new RangeError('a developed area ratio of 0 belongs to Rq 0 only');
  if (length !== undefined && ratio !== undefined) return fromBoth(texture, length, ratio, delta);
  if (length !== undefined) return fromLength(texture, length, delta);
  if (ratio !== undefined) return fromAreaRatio(texture, ratio, delta);
  return undefined;
}
