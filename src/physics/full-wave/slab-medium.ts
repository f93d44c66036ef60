/** What lies under and over the sheet of metal: a slab on a ground plane, and perhaps a cover above the metal. */
import { type Complex, complex } from '../../numerics/complex.js';

export interface SlabMedium {
  /** Relative, real. */
  readonly permittivity: number;
  readonly lossTangent: number;
  /** m; the metal is a sheet at z = height. */
  readonly height: number;
  /** Of the ground plane's surface, ohm. */
  readonly groundImpedance: Complex;
  /** Planar dielectric above the metal, solder mask or radome film in contact. */
  readonly cover?: { readonly permittivity: number; readonly lossTangent: number; readonly thickness: number };
}

/** @throws RangeError on what is no passive slab */
export function checkMedium(medium: SlabMedium): void {
  const { permittivity, lossTangent, height, groundImpedance, cover } = medium;
  const layer = (name: string, er: number, tan: number, thickness: number): void => {
    if (!(er >= 1 && Number.isFinite(er)))
      throw new RangeError(`${name}: relative permittivity ${er}, from 1 is needed`);
    if (!(tan >= 0 && Number.isFinite(tan))) throw new RangeError(`${name}: loss tangent ${tan}, from 0 is needed`);
    if (!(thickness > 0 && Number.isFinite(thickness)))
      throw new RangeError(`${name}: thickness ${thickness} m, more than 0 is needed`);
  };
  layer('slab', permittivity, lossTangent, height);
  if (cover) layer('cover', cover.permittivity, cover.lossTangent, cover.thickness);
  if (!(groundImpedance.re >= 0 && Number.isFinite(groundImpedance.im)))
    throw new RangeError(`ground: impedance ${groundImpedance.re} + ${groundImpedance.im}j ohm is not passive`);
}

/** εr (1 − j tan δ) */
export const slabPermittivity = (medium: SlabMedium): Complex =>
  complex(medium.permittivity, -medium.permittivity * medium.lossTangent);

/** Of the cover; 1 without one. */
export const coverPermittivity = ({ cover }: SlabMedium): Complex =>
  cover ? complex(cover.permittivity, -cover.permittivity * cover.lossTangent) : complex(1);

/** The same without what takes power: no loss tangent, no resistance of the ground (its reactance stays). */
export function losslessMedium(medium: SlabMedium): SlabMedium {
  return {
    ...medium,
    lossTangent: 0,
    groundImpedance: complex(0, medium.groundImpedance.im),
    ...(medium.cover && { cover: { ...medium.cover, lossTangent: 0 } }),
  };
}
