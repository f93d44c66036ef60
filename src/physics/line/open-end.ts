import { SPEED_OF_LIGHT } from '../constants.js';
import { microstripStatic } from './hammerstad-jensen.js';
import { microstripDispersive } from './kirschning-jansen.js';
import type { MicrostripGeometry } from './microstrip-geometry.js';

/**
 * Length by which an open microstrip end appears longer than the metal, m.
 *
 * Source: M. Kirschning, R. H. Jansen and N. H. L. Koster, "Accurate model for open end effect of microstrip lines",
 * Electron. Lett. 17(3), 1981, pp. 123–125 (coefficients from memory). Stated accuracy 2.5 % for width over height
 * 0.01 to 100 and permittivity up to 50, quasi-static. The effective permittivity put into it is the dispersive one
 * at the frequency asked for. At 77 GHz on 0.1 to 0.2 mm laminates full wave lies 0 to 8 % above it.
 *
 * @param frequency Hz, ≥ 0
 * @throws RangeError on a geometry or frequency that is not physical
 */
export function openEndExtension(g: MicrostripGeometry, frequency: number): number {
  return (
    openEndOverHeight(g.width / g.height, g.permittivity, microstripDispersive(g, frequency).effectivePermittivity) *
    g.height
  );
}

function openEndOverHeight(u: number, er: number, e: number): number {
  const e81 = e ** 0.81;
  const u85 = u ** 0.8544;
  const xi1 = (0.434907 * ((e81 + 0.26) / (e81 - 0.189)) * (u85 + 0.236)) / (u85 + 0.87);
  const xi2 = 1 + u ** 0.371 / (2.358 * er + 1);
  const xi3 = 1 + (0.5274 * Math.atan(0.084 * u ** (1.9413 / xi2))) / e ** 0.9236;
  const xi4 = 1 + 0.0377 * Math.atan(0.067 * u ** 1.456) * (6 - 5 * Math.exp(0.036 * (1 - er)));
  const xi5 = 1 - 0.218 * Math.exp(-7.5 * u);
  return (xi1 * xi3 * xi5) / xi4;
}

/**
 * What the thickness of the metal adds to the open-end length of a wide line, m.
 *
 * The field at the end of a wide line is that at its side, seen from another direction: thickness adds the same
 * capacitance per length of edge to both. Of the side it is known from the cross-section: half of what thickness adds to
 * the line's capacitance. Own argument, for widths of several heights; the capacitance is that of Hammerstad and Jensen,
 * whose increase from 18 to 35 µm is within 10 % of that of independent sections (w/h 2.5).
 * Without it thicker metal would raise the resonance of a patch (its effective permittivity falls), where in truth it
 * lowers it by some 0.1 % per 3 µm on 0.127 mm.
 */
export function thicknessEndExtension(g: MicrostripGeometry): number {
  if (g.thickness === 0) return 0;
  const capacitance = (thickness: number): number => {
    const { impedance, effectivePermittivity } = microstripStatic({ ...g, thickness });
    return Math.sqrt(effectivePermittivity) / (SPEED_OF_LIGHT * impedance);
  };
  const thick = capacitance(g.thickness);
  return ((thick - capacitance(0)) / 2 / thick) * g.width;
}
