/**
 * What happens where a narrow line meets the edge of a wide patch: corrections 1 and 3 of the edge network.
 */
import { ETA0, MU0, SPEED_OF_LIGHT } from '../constants.js';
import type { NetworkConstants } from './network-constants.js';

/** Width of the parallel-plate line of the same impedance and permittivity, m: η0 h/(Zc √εeff). */
export function effectiveWidth(height: number, impedance: number, effectivePermittivity: number): number {
  return (ETA0 * height) / (impedance * Math.sqrt(effectivePermittivity));
}

/**
 * Series reactance of the step, ohm: the even higher transverse modes (n = 2, 4 … 12) of the patch, seen as a planar
 * cavity of width We with magnetic walls, excited over the line's effective width; times a fitted factor.
 * Classic planar-circuit sum (Wolff & Knoppik 1974; from memory).
 */
export function stepReactance(
  frequency: number,
  height: number,
  patchWidth: number,
  patchEffectiveWidth: number,
  patchEffectivePermittivity: number,
  lineEffectiveWidth: number,
  constants: NetworkConstants,
): number {
  const omega = 2 * Math.PI * frequency;
  const k0 = omega / SPEED_OF_LIGHT;
  const cavity = patchWidth + constants.cavityWidening * (patchEffectiveWidth - patchWidth);
  let sum = 0;
  for (let n = 2; n <= 12; n += 2) {
    const transverse = (n * Math.PI) / cavity;
    const gamma2 = transverse * transverse - k0 * k0 * patchEffectivePermittivity;
    // A patch so wide that its n = 2 mode propagates has no reactive step; the caller flags such widths.
    if (gamma2 <= 0) continue;
    const a = (n * Math.PI * lineEffectiveWidth) / (2 * cavity);
    const sinc = a === 0 ? 1 : Math.sin(a) / a;
    sum += ((2 * omega * MU0 * height) / (Math.sqrt(gamma2) * cavity)) * sinc * sinc;
  }
  return constants.stepReactance * sum;
}

/**
 * Open-end susceptance of a patch edge, S, less what an attached line covers.
 *
 * @param openEnd  open-end length of the patch-wide line, m (Kirschning, Jansen, Koster 1981)
 * @param thick    what the metal's thickness adds to it, m
 * @param beta     phase constant of the patch-wide line, rad/m
 * @param coverage effective width of the attached line over that of the patch, 0 at an open edge
 */
export function edgeSusceptance(
  openEnd: number,
  thick: number,
  beta: number,
  impedance: number,
  coverage: number,
  constants: NetworkConstants,
): number {
  const open = constants.openEnd * openEnd + thick;
  const length = open * (1 - constants.coveredSusceptance * coverage);
  return Math.tan(beta * length) / impedance;
}
