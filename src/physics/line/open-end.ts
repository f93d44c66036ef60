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
