import { skinDepth } from '../material/copper.js';
import { lateral } from './band-lateral.js';
import { fromNodules, upon } from './band-nodules.js';
import { gentlest, k, type Made, randomTexture, type Three } from './band-parts.js';
import type { FaceConditions, ModelFace } from './face-model.js';
import { faceOf, type RoughFace, roughFace } from './rough-face.js';
import type { TextureKnowledge } from './texture.js';

/** One edge of the band, or its middle, with the reason for it in a sentence. */
export interface BandEstimate extends RoughFace {
  readonly reason: string;
}

export interface BandEstimates {
  readonly low: BandEstimate;
  readonly middle: BandEstimate;
  readonly high: BandEstimate;
}

/** Correlation length over Rq of the gentle texture behind the lower side where nothing lateral is known: rms slope 0.5. */
export const GENTLE_LENGTH_OVER_RQ = 2 * Math.SQRT2;
/** Solved dense stacks lie up to this much above the gradient model. */
const ABOVE_GRADIENT = 1.1;

/** What the height alone says at its middle and upper side; the slowest part of a band, and the same for one Rq. */
export interface HeightSides {
  readonly middle: Made;
  readonly high: Made;
}

export function heightSides(rq: number, conditions: FaceConditions): HeightSides {
  const pile: Made = {
    model: 'ball-pile',
    view: viewOf(roughFace('ball-pile', { rq, ...conditions })),
    reason:
      'Middle: solved pile of touching balls of this Rq; Groiss lies within 9 % of its loss, Hammerstad up to 13 % below.',
  };
  const gradient: Made = {
    model: 'gradient',
    view: viewOf(roughFace('gradient', { rq, ...conditions })),
    reason: 'Upper side: gradient model, the limit of texture much finer than the skin depth.',
  };
  // In fine texture the solved pile loses slightly more than the gradient model, and slows the wave far less.
  const high =
    k(gradient) >= k(pile)
      ? gradient
      : {
          ...withLoss(gradient, k(pile)),
          reason:
            'Upper side: loss of the solved pile of touching balls, here above the gradient model; phase of the gradient model.',
        };
  return { middle: pile, high };
}

const fromHeight = (texture: TextureKnowledge, sides: HeightSides, delta: number): Three => ({
  ...sides,
  low: randomTexture(
    { rq: texture.rq, correlationLength: GENTLE_LENGTH_OVER_RQ * texture.rq, ...gentlest(texture) },
    delta,
    `Lower side: a gentle texture of this Rq, correlation length ${GENTLE_LENGTH_OVER_RQ.toFixed(1)} Rq (rms slope 27°), assumed because no lateral measure is stated.`,
  ),
});

/** Units of the smooth face again, from a face. */
const viewOf = (face: RoughFace): ModelFace => ({
  impedance: { re: face.lossFactor, im: face.reactance },
  plane: face.plane,
  planeShift: face.planeShift,
  flags: face.flags,
});

const withLoss = (made: Made, loss: number): Made => ({
  ...made,
  view: { ...made.view, impedance: { re: loss, im: made.view.impedance.im } },
});

/** Keeps single-valued textures under the fine-texture limit, and the three in order. */
function ordered(three: Three, limit: Made): Three {
  const under = (made: Made): Made =>
    k(made) <= k(limit)
      ? made
      : { ...withLoss(made, k(limit)), reason: `${made.reason} Its loss is held to the upper side of height alone.` };
  const middle = under(three.middle);
  const high = under(three.high);
  return {
    low: withLoss(three.low, Math.min(k(three.low), k(middle))),
    middle,
    high: withLoss(high, Math.max(k(high), k(middle))),
  };
}

function held(three: Three, limit: Made): Three {
  const most = Math.max(ABOVE_GRADIENT * k(limit), k(three.middle));
  if (k(three.high) <= most) return three;
  const reason = `${three.high.reason} Its loss is held to a tenth above the gradient model.`;
  return { ...three, high: { ...withLoss(three.high, most), reason } };
}

/**
 * Low, middle and high estimate of a rough face for what is known of its texture. Rq only: gentle random texture, solved pile
 * of balls, gradient model. With correlation length or Sdr: perturbation held to the area ratio over spectra that share what
 * is known. With nodules: solved stacks between the free ball and the published sphere formula. More knowledge replaces the
 * assumptions of less; estimates are not bounds.
 *
 * Sweeps use this; `roughnessBand` adds what a further measurement would bring.
 */
export function roughnessEstimates(
  texture: TextureKnowledge,
  conditions: FaceConditions,
  sides: HeightSides = heightSides(texture.rq, conditions),
): BandEstimates {
  const finish = (made: Made): BandEstimate => ({ ...faceOf(made.model, made.view, conditions), reason: made.reason });
  if (texture.rq === 0) {
    const smooth: BandEstimate = { ...roughFace('smooth', { rq: 0, ...conditions }), reason: 'Smooth: Rq is zero.' };
    return { low: smooth, middle: smooth, high: smooth };
  }
  const delta = skinDepth(conditions.frequency, conditions.conductivity);
  const known = lateral(texture, delta);
  let three = ordered(known ?? fromHeight(texture, sides, delta), sides.high);
  if (texture.nodule) {
    const n = fromNodules(texture.nodule, delta);
    // The fine content of the base's upper side is the nodules themselves: it is not counted a second time.
    three = held(
      known
        ? { low: upon(n.low, three.low), middle: upon(n.middle, three.middle), high: upon(n.high, three.middle) }
        : n,
      sides.high,
    );
  }
  return { low: finish(three.low), middle: finish(three.middle), high: finish(three.high) };
}
