/**
 * Cross-section of a single microstrip: a strip of rectangular section on a grounded dielectric slab, open above.
 * All lengths in m.
 */
export interface MicrostripGeometry {
  /** Width of the strip, m, > 0. */
  readonly width: number;
  /** Height of the dielectric between ground and underside of the strip, m, > 0. */
  readonly height: number;
  /** Thickness of the strip, m; 0 for the limit of vanishing thickness. */
  readonly thickness: number;
  /** Relative permittivity of the dielectric, ≥ 1. */
  readonly permittivity: number;
}

/** @throws RangeError naming the quantity and the value received */
export function requireMicrostrip(g: MicrostripGeometry): void {
  const positive = (value: number): boolean => Number.isFinite(value) && value > 0;
  if (!positive(g.width)) throw new RangeError(`microstrip width must be a positive length in m, got ${g.width}`);
  if (!positive(g.height)) throw new RangeError(`microstrip height must be a positive length in m, got ${g.height}`);
  if (!(Number.isFinite(g.thickness) && g.thickness >= 0))
    throw new RangeError(`microstrip thickness must be a length in m, 0 or more, got ${g.thickness}`);
  if (!(Number.isFinite(g.permittivity) && g.permittivity >= 1))
    throw new RangeError(`relative permittivity must be 1 or more, got ${g.permittivity}`);
}
