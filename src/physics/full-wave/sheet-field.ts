import type { FarField } from '../column/engine.js';
import { ETA0, SPEED_OF_LIGHT } from '../constants.js';
import type { BoardCurrents } from './board-currents.js';
import { currentTransfers } from './slab-field.js';
import type { SlabMedium } from './slab-medium.js';

/** Far field of the currents of a board through slab and cover; |z| measured from the plane of the metal. */
export function sheetField(medium: SlabMedium, frequency: number, currents: BoardCurrents): FarField {
  const k0 = (2 * Math.PI * frequency) / SPEED_OF_LIGHT;
  const transfer = currentTransfers(medium, frequency);
  const j = new Float64Array(4);
  const e = new Float64Array(4);
  function at(u: number, v: number, out: Float64Array): void {
    const sin2 = u * u + v * v;
    out.fill(0);
    if (sin2 >= 1) return;
    currents.spectrum(k0 * u, k0 * v, j);
    const { tm, te } = transfer(sin2);
    const sine = Math.sqrt(sin2);
    const [c, s] = sine === 0 ? [1, 0] : [u / sine, v / sine];
    const [rho, phi] = [j[0] * c + j[2] * s, -j[0] * s + j[2] * c];
    const [rhoIm, phiIm] = [j[1] * c + j[3] * s, -j[1] * s + j[3] * c];
    out[0] = tm.re * rho - tm.im * rhoIm;
    out[1] = tm.re * rhoIm + tm.im * rho;
    out[2] = te.re * phi - te.im * phiIm;
    out[3] = te.re * phiIm + te.im * phi;
  }
  return {
    frequency,
    extent: currents.extent,
    at,
    cut: (plane) => (angle) => {
      const sine = Math.sin(angle);
      if (Math.abs(sine) >= 1) return 0;
      at(plane === 'elevation' ? sine : 0, plane === 'elevation' ? 0 : sine, e);
      return (e[0] * e[0] + e[1] * e[1] + e[2] * e[2] + e[3] * e[3]) / (2 * ETA0);
    },
  };
}
