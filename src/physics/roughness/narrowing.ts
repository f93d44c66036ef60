import { BALL_PILE_RADIUS_RATIO } from './ball-pile.js';
import { type BandEstimates, heightSides, roughnessEstimates } from './band.js';
import { areaRatiosOf } from './band-lateral.js';
import type { FaceConditions } from './face-model.js';
import { correlationLengthFromAreaRatio } from './small-perturbation.js';
import type { TextureKnowledge } from './texture.js';

/** A measurement that is missing, and what it would leave of the band. */
export interface Narrowing {
  readonly quantity: 'correlation-length' | 'area-ratio' | 'nodules' | 'lay';
  /** What to measure, in words. */
  readonly measurement: string;
  /** Width of the band of the loss factor now: high less low. */
  readonly spreadNow: number;
  /** Mean width over plausible outcomes of the measurement. */
  readonly wouldNarrowTo: number;
}

export interface RoughnessBand extends BandEstimates {
  /** Missing measurements that would narrow the band, the most useful first. */
  readonly narrowing: readonly Narrowing[];
}

const WORDS: Readonly<Record<Narrowing['quantity'], string>> = {
  'correlation-length':
    'autocorrelation length Sal (ISO 25178-2) of the face, with nesting index and lateral resolution',
  'area-ratio': 'developed area ratio Sdr (ISO 25178-2) of the face, with lateral resolution below a skin depth',
  nodules: 'radius, pitch and number of layers of the nodules, from a micrograph of face and section',
  lay: 'direction of the texture: isotropic, or grooves across or along the current (texture aspect ratio Str, ISO 25178-2)',
};

const width = (band: BandEstimates): number => band.high.lossFactor - band.low.lossFactor;

/** Rq over radius of solved stacks of four balls at three radii. */
const STACK_RADIUS_RATIO = 3.19;

/** Outcomes that each missing measurement might have, given what is known. */
function outcomes(texture: TextureKnowledge): Partial<Record<Narrowing['quantity'], TextureKnowledge[]>> {
  const { rq, correlationLength: length, developedAreaRatio: ratio, lay = 'isotropic', nodule } = texture;
  const withLength = (of: number[]): TextureKnowledge[] =>
    of.map((correlationLength) => ({ ...texture, correlationLength }));
  const withRatio = (of: number[]): TextureKnowledge[] =>
    of.map((developedAreaRatio) => ({ ...texture, developedAreaRatio }));
  const found: Partial<Record<Narrowing['quantity'], TextureKnowledge[]>> = {};
  if (length === undefined && ratio === undefined && !nodule) {
    found['correlation-length'] = withLength([1.41, 2.83, 5].map((l) => l * rq));
    found['area-ratio'] = withRatio([0.05, 0.2, 0.6]);
    // Textures of this Rq: slender stacks, an open layer and a nearly closed one.
    const stack = rq / STACK_RADIUS_RATIO;
    const ball = rq / BALL_PILE_RADIUS_RATIO;
    found.nodules = [
      { radius: stack, pitch: 3 * stack, layers: 4 },
      { radius: ball, pitch: 4 * ball, layers: 1 },
      { radius: ball, pitch: 2.1 * ball, layers: 1 },
    ].map((n) => ({ ...texture, nodule: n }));
  } else if (length !== undefined && ratio === undefined) {
    const { least, most } = areaRatiosOf(rq, length, lay);
    found['area-ratio'] = withRatio([least, Math.sqrt(least * most), most].map((r) => Math.min(r, 20)));
  } else if (length === undefined && ratio !== undefined) {
    const longest = correlationLengthFromAreaRatio(rq, ratio, lay, 'exponential');
    const shortest = correlationLengthFromAreaRatio(rq, ratio, lay);
    found['correlation-length'] = withLength([shortest, Math.sqrt(shortest * longest), longest]);
  }
  if (texture.lay === undefined && (length !== undefined || ratio !== undefined))
    found.lay = [
      { ...texture, lay: 'isotropic' },
      { ...texture, lay: 'across' },
      { ...texture, lay: 'along' },
    ];
  return found;
}

/**
 * The band of a rough face with what would narrow it: for each missing measurement the estimates are made for plausible
 * outcomes, and the mean width of the band that would be left is given.
 *
 * @example
 * const band = roughnessBand({ rq: 0.4e-6 }, { frequency: 77e9, conductivity: 5.8e7, permittivity: 3 });
 * [band.low.lossFactor, band.middle.lossFactor, band.high.lossFactor]; // 1.10, 1.90, 2.59
 * band.narrowing[0].measurement; // what to ask the supplier for first
 */
export function roughnessBand(texture: TextureKnowledge, conditions: FaceConditions): RoughnessBand {
  const sides = heightSides(texture.rq, conditions);
  const band = roughnessEstimates(texture, conditions, sides);
  const spreadNow = width(band);
  const narrowing: Narrowing[] = [];
  if (texture.rq > 0)
    for (const [quantity, textures] of Object.entries(outcomes(texture)) as [
      Narrowing['quantity'],
      TextureKnowledge[],
    ][]) {
      const left = textures.map((t) => width(roughnessEstimates(t, conditions, sides)));
      const wouldNarrowTo = left.reduce((sum, w) => sum + w, 0) / left.length;
      if (wouldNarrowTo < spreadNow)
        narrowing.push({ quantity, measurement: WORDS[quantity], spreadNow, wouldNarrowTo });
    }
  narrowing.sort((a, b) => a.wouldNarrowTo - b.wouldNarrowTo);
  return { ...band, narrowing };
}
