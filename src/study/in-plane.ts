import { microstripStatic } from '../physics/line/index.js';

/**
 * The permittivity of an isotropic laminate of the same height on which a strip has the effective permittivity that it has on
 * a laminate whose permittivity through the thickness differs from that in its plane.
 *
 * Quasi-static: stretching the height by √(in-plane/through) turns the laminate into an isotropic one of permittivity
 * √(in-plane·through). Exact for a strip without thickness. Source: B. T. Szentkuti, "Simple analysis of anisotropic
 * microstrip lines by a transform method", Electronics Letters 12(25), 1976 (from memory).
 *
 * @param width, height m, > 0
 * @param through permittivity through the thickness, > 1
 * @param inPlane permittivity in the plane, > 1
 */
export function equivalentPermittivity(width: number, height: number, through: number, inPlane: number): number {
  const still = (permittivity: number, at: number): { effectivePermittivity: number; airCapacitance: number } => {
    const { impedance, effectivePermittivity } = microstripStatic({ width, height: at, thickness: 0, permittivity });
    // Up to a constant: that of the line in air is one over its impedance.
    return { effectivePermittivity, airCapacitance: 1 / (impedance * Math.sqrt(effectivePermittivity)) };
  };
  const effective = (permittivity: number): number => still(permittivity, height).effectivePermittivity;
  const stretched = still(Math.sqrt(through * inPlane), height * Math.sqrt(inPlane / through));
  // Stretching keeps the capacitance with the laminate, not that in air.
  const wanted = (stretched.effectivePermittivity * stretched.airCapacitance) / still(through, height).airCapacitance;
  // Effective permittivity grows steadily with permittivity: by secants from the stated value.
  let [e0, e1] = [through, through * (wanted / effective(through))];
  let f0 = effective(e0) - wanted;
  for (let i = 0; i < 30 && e1 !== e0; i++) {
    const f1 = effective(e1) - wanted;
    if (Math.abs(f1) < 1e-12 || f1 === f0) break;
    [e0, e1, f0] = [e1, e1 - (f1 * (e1 - e0)) / (f1 - f0), f1];
  }
  return e1;
}
