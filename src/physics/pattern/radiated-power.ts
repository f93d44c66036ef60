/** Power radiated into the half space, by integrating the far field. */
import { gaussLegendre } from '../../numerics/gauss-legendre.js';
import type { FarField } from '../column/engine.js';
import { ETA0 } from '../constants.js';
import { electricalExtent } from './sampling.js';

/** Power per solid angle, W/sr, both polarisations. */
export function intensity(field: FarField): (u: number, v: number) => number {
  const e = new Float64Array(4);
  return (u, v) => {
    field.at(u, v, e);
    return (e[0] * e[0] + e[1] * e[1] + e[2] * e[2] + e[3] * e[3]) / (2 * ETA0);
  };
}

/** ∫ U dΩ over z > 0, W. */
export const farFieldPower = (field: FarField): number => overHalfSpace(field, intensity(field));

/**
 * ∫ f dΩ over z > 0 of a function that varies as the square of the field does, to 1e-4 or better on slabs from 50 µm.
 *
 * The polar axis lies along the longer side of the sources, so that the angle around it needs few steps: u = sin α,
 * v = cos α sin ω, dΩ = cos α dα dω, Gauss–Legendre in both. Its orders follow the extents; what is left at no extent
 * resolves the fall towards the horizon, a few degrees wide on a thin slab.
 */
export function overHalfSpace(field: FarField, f: (u: number, v: number) => number): number {
  const { x, y } = electricalExtent(field);
  const long = gaussLegendre(ORDER + Math.ceil(0.6 * Math.max(x, y)));
  const short = gaussLegendre(ORDER + Math.ceil(0.6 * Math.min(x, y)));
  let total = 0;
  for (let i = 0; i < long.nodes.length; i++) {
    const alpha = (Math.PI / 2) * long.nodes[i];
    const [sine, cosine] = [Math.sin(alpha), Math.cos(alpha)];
    let arc = 0;
    for (let j = 0; j < short.nodes.length; j++) {
      const across = cosine * Math.sin((Math.PI / 2) * short.nodes[j]);
      arc += short.weights[j] * (x >= y ? f(sine, across) : f(across, sine));
    }
    total += long.weights[i] * cosine * arc;
  }
  return (Math.PI / 2) ** 2 * total;
}

const ORDER = 18;
