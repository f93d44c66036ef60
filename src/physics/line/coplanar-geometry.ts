/**
 * Cross-section of a grounded coplanar line: a strip between two wide coplanar grounds on a dielectric slab over a ground,
 * open above; all grounds at one potential. All lengths in m.
 */
export interface CoplanarGeometry {
  /** Width of the strip, > 0. */
  readonly width: number;
  /** Width of each slot between strip and side ground, > 0. */
  readonly gap: number;
  /** Height of the dielectric, > 0. */
  readonly height: number;
  /** Thickness of strip and side grounds, ≥ 0. */
  readonly thickness: number;
  /** Relative permittivity of the dielectric, ≥ 1. */
  readonly permittivity: number;
}

/** Faces that current flows on; `side…` are both side grounds together, `edges` both side walls of the strip. */
export type CoplanarFace = 'underside' | 'top' | 'edges' | 'sideUnderside' | 'sideTop' | 'sideEdges' | 'ground';

/** @throws RangeError naming the quantity and the value received */
export function requireCoplanar(g: CoplanarGeometry): void {
  for (const [name, value] of Object.entries({ width: g.width, gap: g.gap, height: g.height }))
    if (!(Number.isFinite(value) && value > 0))
      throw new RangeError(`coplanar ${name} must be a positive length in m, got ${value}`);
  if (!(Number.isFinite(g.thickness) && g.thickness >= 0))
    throw new RangeError(`coplanar thickness must be a length in m, 0 or more, got ${g.thickness}`);
  if (!(Number.isFinite(g.permittivity) && g.permittivity >= 1))
    throw new RangeError(`relative permittivity must be 1 or more, got ${g.permittivity}`);
}
