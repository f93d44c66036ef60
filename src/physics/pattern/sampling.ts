/** How finely directions must be sampled: by the size of the sources in wavelengths. */
import type { FarField } from '../column/engine.js';
import { SPEED_OF_LIGHT } from '../constants.js';

/** k0 times the extent of the sources along x and y, rad: half as many radians of phase from middle to edge. */
export function electricalExtent(field: FarField): { readonly x: number; readonly y: number } {
  const k0 = (2 * Math.PI * field.frequency) / SPEED_OF_LIGHT;
  return { x: k0 * field.extent.x, y: k0 * field.extent.y };
}

/**
 * Samples over a signed angle from −90° to +90° in the half plane at azimuth `phi` (rad): odd, so that one is the zenith;
 * at least 12 to the narrowest lobe (λ over the extent seen there), 181 at least.
 */
export function cutSamples(field: FarField, phi: number): number {
  const { x, y } = electricalExtent(field);
  const seen = Math.abs(x * Math.cos(phi)) + Math.abs(y * Math.sin(phi));
  // Lobes repeat every 2π/seen in sin θ; over ±90° the finest are at the zenith.
  return Math.max(181, 2 * Math.ceil((6 * seen) / 2) + 1);
}
