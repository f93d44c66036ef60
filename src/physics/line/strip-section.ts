import { type MicrostripGeometry, requireMicrostrip } from './microstrip-geometry.js';

/** A dielectric coat over strip and laminate, such as solder mask. */
export interface CoverCoat {
  /** Relative permittivity, ≥ 1. */
  readonly permittivity: number;
  /** m, > 0. Above the surface of the laminate; of a conformal coat also above the top and beside the walls of the strip. */
  readonly thickness: number;
  /** `planar`: its surface is flat, whether it buries the strip or not. `conformal`: it follows the strip with the same thickness. */
  readonly shape: 'planar' | 'conformal';
}

/** A microstrip whose side walls may slope and that may carry a coat. */
export interface StripSection extends MicrostripGeometry {
  /** Width of the strip's top, m, > 0; default: that of the underside, which `width` is. */
  readonly topWidth?: number;
  readonly cover?: CoverCoat;
}

/** @throws RangeError naming the quantity and the value received */
export function requireSection(s: StripSection): void {
  requireMicrostrip(s);
  const { topWidth, cover } = s;
  if (topWidth !== undefined && !(Number.isFinite(topWidth) && topWidth > 0))
    throw new RangeError(`top width of the strip must be a positive length in m, got ${topWidth}`);
  if (!cover) return;
  if (!(Number.isFinite(cover.thickness) && cover.thickness > 0))
    throw new RangeError(`thickness of the cover must be a positive length in m, got ${cover.thickness}`);
  if (!(Number.isFinite(cover.permittivity) && cover.permittivity >= 1))
    throw new RangeError(`relative permittivity of the cover must be 1 or more, got ${cover.permittivity}`);
}
