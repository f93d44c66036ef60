import type { ModelFace, RoughnessModel } from './face-model.js';
import { areaLimitedPerturbation, type RandomTexture } from './small-perturbation.js';
import type { TextureKnowledge } from './texture.js';

/** An estimate in the making: a view of the face and the reason for it. */
export type Made = { readonly model: RoughnessModel; readonly view: ModelFace; readonly reason: string };
export type Three = { readonly low: Made; readonly middle: Made; readonly high: Made };

/** Loss factor. */
export const k = (made: Made): number => made.view.impedance.re;

/**
 * What the perturbation held to the area ratio is off by, as a share of K − 1: a tenth for profile slopes to 0.8, a third for
 * 1.6 and steeper, by comparison with solved random profiles and egg boxes (of which one is off by half).
 */
function lateralSpread(profileSlope: number): number {
  return 0.1 + 0.25 * Math.min(1, Math.max(0, (profileSlope - 0.8) / 0.8));
}

export function randomTexture(texture: RandomTexture, delta: number, reason: string, side: -1 | 0 | 1 = 0): Made {
  const p = areaLimitedPerturbation(texture, delta);
  const { re, im } = p.impedance;
  const loss = 1 + (re - 1) * (1 + side * lateralSpread(p.profileSlope));
  return {
    model: 'area-limited',
    view: { impedance: { re: loss, im }, plane: 'mean', planeShift: p.planeShift, flags: [] },
    reason,
  };
}

/** Between two views: a at 0, b at 1. */
export function between(a: Made, b: Made, share: number, reason: string): Made {
  const mix = (x: number, y: number): number => x + share * (y - x);
  return {
    model: a.model,
    view: {
      ...a.view,
      impedance: {
        re: mix(a.view.impedance.re, b.view.impedance.re),
        im: mix(a.view.impedance.im, b.view.impedance.im),
      },
      planeShift: mix(a.view.planeShift, b.view.planeShift),
    },
    reason,
  };
}

/** Grooves of unknown direction, or the lay that is known. */
export const gentlest = (texture: TextureKnowledge): Pick<RandomTexture, 'lay' | 'fluxWeight'> =>
  texture.lay ? { lay: texture.lay } : { lay: 'across', fluxWeight: 0.5 };
