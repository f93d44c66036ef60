import { BALL_PILE_RADIUS_RATIO, ballPile } from './ball-pile.js';
import type { Made, Three } from './band-parts.js';
import { micrometres } from './face-model.js';
import { HURAY_LOWEST_RADIUS } from './huray.js';
import { noduleStacks } from './nodules.js';
import { type NoduleKnowledge, noduleLattice } from './texture.js';

/** Nodules nearer than this many radii begin to close the gaps between them. */
const CLOSING_PITCH = 2.2;
/** Spread of K − 1 and of the slow-wave length of the estimate for nodules. */
const NODULE_LOSS_SPREAD = 0.25;
const NODULE_PHASE_SPREAD = 0.15;
/** Estimates from the nodules on a flat base. */
export function fromNodules(nodule: NoduleKnowledge, delta: number): Three {
  const { radius, pitch } = noduleLattice(nodule);
  const stack = noduleStacks(nodule, delta);
  const words = `nodules of radius ${micrometres(radius)} (${(radius / delta).toFixed(2)} skin depths), ${(pitch / radius).toFixed(1)} radii apart`;
  const slowness = 0.5 * delta * (stack.impedance.im - 1) + stack.planeShift;
  const made = (loss: number, share: number, reason: string): Made => ({
    model: 'nodules',
    view: {
      impedance: { re: loss, im: stack.impedance.im },
      plane: 'mean',
      planeShift: stack.planeShift + share * NODULE_PHASE_SPREAD * Math.max(0, slowness),
      flags: [],
    },
    reason,
  });
  const open = stack.impedance.re;
  const wide =
    radius >= HURAY_LOWEST_RADIUS * delta
      ? stack.published
      : Math.min(stack.published, 1 + (1 + NODULE_LOSS_SPREAD) * (open - 1));
  const bound =
    radius >= HURAY_LOWEST_RADIUS * delta
      ? 'published sphere formula, which holds from two skin depths'
      : 'a quarter above the solved stacks; the published sphere formula overstates balls this small';
  const high = made(wide, 1, `Upper side: ${words}; ${bound}.`);
  const pile = ballPile(BALL_PILE_RADIUS_RATIO * radius, delta).impedance.re;
  if (pitch < CLOSING_PITCH * radius && pile < open) {
    const t = (pitch / radius - 2) / (CLOSING_PITCH - 2);
    return {
      low: made(pile, -1, `Lower side: ${words}, closed to a pile as solved.`),
      middle: made(pile + t * (open - pile), 0, `Middle: ${words}, between the solved pile and open stacks.`),
      high,
    };
  }
  return {
    low: made(Math.min(stack.free, open), -1, `Lower side: ${words}, each as a free ball (exact solution).`),
    middle: made(open, 0, `Middle: ${words}, loss of solved stacks.`),
    high,
  };
}

/** Nodules upon an undulating base: loss factors multiply, depths add. */
export function upon(nodules: Made, base: Made): Made {
  const [n, b] = [nodules.view, base.view];
  return {
    ...nodules,
    view: {
      ...n,
      impedance: { re: n.impedance.re * b.impedance.re, im: n.impedance.im + b.impedance.im - 1 },
      planeShift: n.planeShift + b.planeShift,
    },
    reason: `${nodules.reason} On the base that the lateral measure describes.`,
  };
}
