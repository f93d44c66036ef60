/**
 * One macro electric current along x per patch, unit total current in the middle of the patch:
 *   the patch's cavity mode cos(πx/L), and on every line that leaves it, a distance ξ from the edge on a line of length l,
 *   − share · (½ sin(πξ/l) + ¼ sin(2πξ/l)):
 * the half wave of a link, shared smoothly by the two patches at its ends (their parts add up to sin(πξ/l)). A line's
 * current runs against the patch's and takes a third of its moment away; it is what silences the part of an edge that a
 * line covers, seen as electric current. Across, a line has the edge singularity 2/(πw√(1 − (2y/w)²)); a patch of ten
 * heights has it beside a flat current, here half and half: the second moment of flat current under the metal with what
 * fringes at its edges.
 */
import { besselJ0 } from '../../numerics/bessel.js';
import { gaussLegendre } from '../../numerics/gauss-legendre.js';
import type { MacroPatch } from './engine.js';

/** Part of a patch's current that is flat across. */
const FLAT = Number(process.env.EVEN ?? 0.5);

/** Quadrature points of a current: places, current and charge times weight. */
export interface CurrentPoints {
  readonly x: Float64Array;
  readonly y: Float64Array;
  readonly current: Float64Array;
  readonly charge: Float64Array;
}

interface Sampled {
  readonly along: number;
  readonly across: number;
  readonly from: number;
  readonly length: number;
  readonly y: number;
  readonly width: number;
  readonly flat: number;
  /** Current and its slope at t in 0..1 of the length, slope per metre. */
  shape(t: number): readonly [number, number];
}

function sample({ along, across, from, length, y, width, flat, shape }: Sampled): CurrentPoints {
  const rule = gaussLegendre(along);
  const make = (): Float64Array => new Float64Array(along * across);
  const out = { x: make(), y: make(), current: make(), charge: make() };
  // Gauss–Chebyshev: equal weights take the square root's place; the flat part is weighted by what it divides by.
  const sines = Array.from({ length: across }, (_, k) => Math.sin((Math.PI * (k + 0.5)) / across));
  const sum = sines.reduce((s, v) => s + v, 0);
  for (let i = 0, q = 0; i < along; i++) {
    const t = (rule.nodes[i] + 1) / 2;
    const [current, slope] = shape(t);
    for (let k = 0; k < across; k++, q++) {
      const weight = (length / 2) * rule.weights[i] * ((1 - flat) / across + (flat * sines[k]) / sum);
      out.x[q] = from + length * t;
      out.y[q] = y + (width / 2) * Math.cos((Math.PI * (k + 0.5)) / across);
      out.current[q] = weight * current;
      out.charge[q] = weight * slope;
    }
  }
  return out;
}

/** Points on the patch alone. */
export function patchPoints(patch: MacroPatch, along: number, across: number): CurrentPoints {
  const { length, width, y } = patch;
  return sample({
    along,
    across,
    from: patch.x - length / 2,
    length,
    y,
    width,
    flat: FLAT,
    shape: (t) => [Math.sin(Math.PI * t), (Math.PI / length) * Math.cos(Math.PI * t)],
  });
}

/** Points on each line that leaves it. */
export function linePoints(patch: MacroPatch, along: number, across: number): CurrentPoints[] {
  return patch.lines.map(({ side, width, length, share }) => {
    const edge = patch.x + (side * patch.length) / 2;
    return sample({
      along,
      across,
      from: side === 1 ? edge : edge - length,
      length,
      y: patch.y,
      width,
      flat: 0,
      shape: (t) => {
        const a = Math.PI * (side === 1 ? t : 1 - t);
        const slope = (side * Math.PI * (Math.cos(a) + Math.cos(2 * a))) / (2 * length);
        return [-share * (Math.sin(a) / 2 + Math.sin(2 * a) / 4), -share * slope];
      },
    });
  });
}

/** ∫ sin(nπξ/l) e^{jkξ} dξ over 0..l, m, added to out times a weight. */
function sineTransform(n: number, length: number, k: number, weight: number, out: Float64Array): void {
  const p = (n * Math.PI) / length;
  const phase = k * length;
  if (Math.abs(Math.abs(k) - p) < 1e-6 * p) {
    // k = ±p: half of the length, turned by ±j.
    out[1] += (Math.sign(k) * weight * length) / 2;
    return;
  }
  // p (1 − (−1)^n e^{jkl})/(p² − k²)
  const sign = n % 2 === 0 ? 1 : -1;
  const scale = (weight * p) / (p * p - k * k);
  out[0] += scale * (1 - sign * Math.cos(phase));
  out[1] -= scale * sign * Math.sin(phase);
}

/**
 * Spectrum ∫∫ J e^{j(kx x + ky y)} dx dy of the macro current about the patch's centre, A m.
 * @param out [re, im]
 */
export function currentSpectrum(patch: MacroPatch, kx: number, ky: number, out: Float64Array): void {
  const singular = (width: number): number => (ky === 0 ? 1 : besselJ0(Math.abs(ky * width) / 2));
  const z = (ky * patch.width) / 2;
  const across = z === 0 ? 1 : (1 - FLAT) * singular(patch.width) + (FLAT * Math.sin(z)) / z;
  out[0] = 0;
  out[1] = 0;
  const scratch = SCRATCH;
  // From the small-x edge of the patch, then to its centre.
  scratch[0] = 0;
  scratch[1] = 0;
  sineTransform(1, patch.length, kx, across, scratch);
  const half = (-kx * patch.length) / 2;
  out[0] = scratch[0] * Math.cos(half) - scratch[1] * Math.sin(half);
  out[1] = scratch[0] * Math.sin(half) + scratch[1] * Math.cos(half);
  for (const { side, width, length, share } of patch.lines) {
    scratch[0] = 0;
    scratch[1] = 0;
    const weight = -share * singular(width);
    sineTransform(1, length, side * kx, weight / 2, scratch);
    sineTransform(2, length, side * kx, weight / 4, scratch);
    const phase = (side * kx * patch.length) / 2;
    out[0] += scratch[0] * Math.cos(phase) - scratch[1] * Math.sin(phase);
    out[1] += scratch[0] * Math.sin(phase) + scratch[1] * Math.cos(phase);
  }
}

const SCRATCH = new Float64Array(2);

/** Half the extent of the current along and across, lines included, m. */
export function currentExtent(patch: MacroPatch): { readonly x: number; readonly y: number } {
  return {
    x: patch.length / 2 + patch.lines.reduce((l, { length }) => Math.max(l, length), 0),
    y: patch.width / 2,
  };
}

/** Two currents of one shape, so that they share what hangs on the shape. */
export function sameShape(a: MacroPatch, b: MacroPatch): boolean {
  if (a.length !== b.length || a.width !== b.width || a.lines.length !== b.lines.length) return false;
  return a.lines.every((line, i) => {
    const other = b.lines[i];
    return (
      line.side === other.side &&
      line.width === other.width &&
      line.length === other.length &&
      line.share === other.share
    );
  });
}
