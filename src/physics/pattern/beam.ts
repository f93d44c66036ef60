/** Figures of the beam as a whole: purity of polarisation, share of power inside it, squint over the band. */
import { gaussLegendre } from '../../numerics/gauss-legendre.js';
import type { FarField } from '../column/engine.js';
import type { StrongestDirection } from './half-space.js';
import { polarIntensity } from './polarisation.js';
import { farFieldPower, intensity } from './radiated-power.js';
import { electricalExtent } from './sampling.js';

export interface Polarisation {
  /** Co over cross at the maximum, dB; infinite where there is no cross-polar field. */
  readonly atPeakDb: number;
  /** Highest cross-polar level within the half-power contour, under the co-polar maximum, dB, positive. */
  readonly withinBeamDb: number;
  /** Highest cross-polar level anywhere above the board, under the co-polar maximum, dB, positive. */
  readonly anywhereDb: number;
}

/** Cross-polar discrimination (IEEE Std 145-2013) after Ludwig's third definition, on a grid of eight points to a lobe. */
export function crossPolarDiscrimination(field: FarField, peak: StrongestDirection): Polarisation {
  const at = polarIntensity(field);
  const both = new Float64Array(2);
  at(peak.u, peak.v, both);
  const [top, there] = both;
  const { x, y } = electricalExtent(field);
  const [nu, nv] = [x, y].map((extent) => 41 + 2 * Math.ceil((4 * extent) / Math.PI / 2));
  let [within, anywhere] = [there, there];
  for (let i = 0; i < nu; i++)
    for (let j = 0; j < nv; j++) {
      const [u, v] = [-1 + (2 * i + 1) / nu, -1 + (2 * j + 1) / nv];
      if (u * u + v * v >= 1) continue;
      at(u, v, both);
      anywhere = Math.max(anywhere, both[1]);
      if (both[0] >= top / 2) within = Math.max(within, both[1]);
    }
  const under = (cross: number): number => 10 * Math.log10(top / cross);
  return { atPeakDb: under(there), withinBeamDb: under(within), anywhereDb: under(anywhere) };
}

/**
 * Share of the radiated power within a cone about a direction (beam efficiency, IEEE Std 145-2013), in [0, 1].
 *
 * Gauss–Legendre from the axis outward, equal steps around it; to 1e-4 for a beam that the cone does not cut at the horizon.
 *
 * @param halfAngle of the cone, rad, in (0, π/2]
 * @throws RangeError on another half angle
 */
export function beamEfficiency(
  field: FarField,
  axis: { readonly theta: number; readonly phi: number },
  halfAngle: number,
): number {
  if (!(halfAngle > 0 && halfAngle <= Math.PI / 2)) throw new RangeError(`beamEfficiency: half angle ${halfAngle} rad`);
  const power = intensity(field);
  const { x, y } = electricalExtent(field);
  const reach = Math.hypot(x, y) * Math.sin(halfAngle);
  const rule = gaussLegendre(16 + Math.ceil(reach / 2));
  const steps = 2 * Math.ceil((24 + 2 * reach) / 2);
  const [ct, st, cp, sp] = [Math.cos(axis.theta), Math.sin(axis.theta), Math.cos(axis.phi), Math.sin(axis.phi)];
  let total = 0;
  for (let i = 0; i < rule.nodes.length; i++) {
    const away = (halfAngle / 2) * (rule.nodes[i] + 1);
    const [ca, sa] = [Math.cos(away), Math.sin(away)];
    let ring = 0;
    for (let p = 0; p < steps; p++) {
      const turn = (2 * Math.PI * (p + 0.5)) / steps;
      const [a, b] = [sa * Math.cos(turn), sa * Math.sin(turn)];
      // The cone's own axes turned by θ about y, then by φ about z.
      if (ct * ca - st * a <= 0) continue;
      const along = ct * a + st * ca;
      ring += power(cp * along - sp * b, sp * along + cp * b);
    }
    total += (halfAngle / 2) * rule.weights[i] * sa * ring * ((2 * Math.PI) / steps);
  }
  return total / farFieldPower(field);
}

/**
 * Share of the radiated power within the half-power contour about the maximum, in (0, 1); to 1e-3 where the contour stays
 * above the horizon, and up to the horizon where it does not.
 *
 * Rays from the maximum in direction cosines, stretched as the beam is: the contour by bisection, the power inside by
 * Gauss–Legendre along each ray.
 */
export function halfPowerShare(field: FarField, peak: StrongestDirection): number {
  const power = intensity(field);
  const { x, y } = electricalExtent(field);
  const [a, b] = [1 / (2 + x), 1 / (2 + y)];
  const rule = gaussLegendre(10);
  const rays = 48;
  let inside = 0;
  for (let ray = 0; ray < rays; ray++) {
    const turn = (2 * Math.PI * (ray + 0.5)) / rays;
    const [du, dv] = [a * Math.cos(turn), b * Math.sin(turn)];
    const holds = (r: number): boolean => power(peak.u + r * du, peak.v + r * dv) >= peak.intensity / 2;
    let [low, high] = [0, 0.1];
    while (holds(high)) [low, high] = [high, high + 0.1];
    for (let k = 0; k < 16; k++) {
      const middle = (low + high) / 2;
      if (holds(middle)) low = middle;
      else high = middle;
    }
    for (let i = 0; i < rule.nodes.length; i++) {
      const r = (low / 2) * (rule.nodes[i] + 1);
      const [u, v] = [peak.u + r * du, peak.v + r * dv];
      inside += ((low / 2) * rule.weights[i] * r * power(u, v)) / Math.sqrt(1 - u * u - v * v);
    }
  }
  return (inside * a * b * ((2 * Math.PI) / rays)) / farFieldPower(field);
}

export interface Squint {
  /** Least-squares slope of beam direction over frequency, rad/Hz. */
  readonly perHertz: number;
  /** Largest minus smallest direction, rad. */
  readonly span: number;
  /** Largest departure from the line, rad: a beam that jumps is no squint. */
  readonly residual: number;
}

/**
 * How the beam moves over the band.
 *
 * @param points frequency in Hz, direction in rad; two different frequencies at least
 * @throws RangeError on fewer
 */
export function squint(points: readonly { readonly frequency: number; readonly direction: number }[]): Squint {
  const n = points.length;
  const mean = (of: (p: (typeof points)[number]) => number): number => points.reduce((sum, p) => sum + of(p), 0) / n;
  const [f0, d0] = [mean((p) => p.frequency), mean((p) => p.direction)];
  const spread = mean((p) => (p.frequency - f0) ** 2);
  if (!(spread > 0)) throw new RangeError(`squint: ${n} points, two different frequencies are needed`);
  const perHertz = mean((p) => (p.frequency - f0) * (p.direction - d0)) / spread;
  const directions = points.map((p) => p.direction);
  return {
    perHertz,
    span: Math.max(...directions) - Math.min(...directions),
    residual: Math.max(...points.map((p) => Math.abs(p.direction - d0 - perHertz * (p.frequency - f0)))),
  };
}
