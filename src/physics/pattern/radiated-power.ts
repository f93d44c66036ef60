/** Power radiated into the half space, by integrating the far field. */
import { gaussLegendre } from '../../numerics/gauss-legendre.js';
import type { FarField } from '../column/engine.js';
import { ETA0, SPEED_OF_LIGHT } from '../constants.js';

/** Power per solid angle, W/sr, both polarisations. */
export function intensity(field: FarField): (u: number, v: number) => number {
  const e = new Float64Array(4);
  return (u, v) => {
    field.at(u, v, e);
    return (e[0] * e[0] + e[1] * e[1] + e[2] * e[2] + e[3] * e[3]) / (2 * ETA0);
  };
}

/** ∫ U dΩ over z > 0, W; Gauss–Legendre in θ, equal steps in φ (exact for the band-limited field). */
export function farFieldPower(field: FarField): number {
  const k0 = (2 * Math.PI * field.frequency) / SPEED_OF_LIGHT;
  const bandwidth = Math.ceil(k0 * Math.hypot(field.extent.x, field.extent.y));
  const power = intensity(field);
  const rule = gaussLegendre(24 + Math.ceil(bandwidth / 2));
  const steps = 4 * Math.ceil((16 + 2 * bandwidth) / 4);
  let total = 0;
  for (let i = 0; i < rule.nodes.length; i++) {
    const theta = (Math.PI / 4) * (rule.nodes[i] + 1);
    let ring = 0;
    for (let p = 0; p < steps; p++) {
      const phi = (2 * Math.PI * (p + 0.5)) / steps;
      ring += power(Math.sin(theta) * Math.cos(phi), Math.sin(theta) * Math.sin(phi));
    }
    total += (Math.PI / 4) * rule.weights[i] * Math.sin(theta) * ring * ((2 * Math.PI) / steps);
  }
  return total;
}
