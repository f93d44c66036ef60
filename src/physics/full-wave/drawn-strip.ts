/**
 * A strip as the grid draws it, at rest: rows of cells with even charge (or longitudinal current) over the slab, in one
 * section. Galerkin's averages of the static potential, so that it has the capacitance and the inductance per length that
 * the solved board will see.
 */
import { gaussLegendre } from '../../numerics/gauss-legendre.js';
import { factoriseReal, solveReal } from '../../numerics/real-lu.js';

export interface StaticLayers {
  readonly permittivity: number;
  readonly height: number;
  readonly cover?: { readonly permittivity: number; readonly thickness: number };
}

/** Mean of −ln|y − y′| over two unit cells k apart. */
function meanLogarithm(k: number): number {
  const twice = (x: number): number => (x === 0 ? 0 : (x * x * Math.log(Math.abs(x))) / 2 - (3 * x * x) / 4);
  return 2 * twice(k) - twice(k + 1) - twice(k - 1);
}

/** Sum of the permittivities on both sides of the metal: what fields at small distance see. */
export const ambientSum = ({ permittivity, cover }: StaticLayers): number => permittivity + (cover?.permittivity ?? 1);

/**
 * Average potentials of rows of width `step` 0, 1, … rows apart, in units of 1/(2πε0) for unit charge per length.
 *
 * Spectrum 1/(k (Y + εr coth kh)), Y that of cover and air; the far part (1 − e^{−2kh})/(k (εc + εr)) in closed form, the
 * rest by Gauss over wavenumbers.
 */
export function rowPotentials(layers: StaticLayers, step: number, rows: number): Float64Array {
  const { permittivity, height, cover } = layers;
  const whole = ambientSum(layers);
  const top = cover ? Math.min(cover.thickness, height) : height;
  const potentials = Float64Array.from({ length: rows }, (_, m) => {
    const image = Math.log(Math.hypot(m, (2 * height) / step));
    return (2 / whole) * (meanLogarithm(m) + image);
  });
  const { nodes, weights } = gaussLegendre(24);
  const panels = Math.ceil(((rows + 1) * step * 16) / top / 20) + 8;
  const limit = 16 / top;
  for (let p = 0; p < panels; p++)
    for (let g = 0; g < nodes.length; g++) {
      const k = (limit * (p + (1 + nodes[g]) / 2)) / panels;
      const t = Math.exp(-2 * k * height);
      const slab = (permittivity * (1 + t)) / (1 - t);
      let above = 1;
      if (cover) {
        const tanh = Math.tanh(k * cover.thickness);
        above = (cover.permittivity * (1 + cover.permittivity * tanh)) / (cover.permittivity + tanh);
      }
      const rest = (1 / (above + slab) - (1 - t) / whole) / k;
      const half = (k * step) / 2;
      const average = (Math.sin(half) / half) ** 2;
      const factor = ((2 * weights[g] * limit) / (2 * panels)) * rest * average;
      for (let m = 0; m < rows; m++) potentials[m] += factor * Math.cos(k * m * step);
    }
  return potentials;
}

/** Charges of the rows at unit potential, in units of 2πε0. */
export function rowCharges(potentials: Float64Array, ambient: number, first: number, last: number): Float64Array {
  const rows = potentials.length;
  const a = new Float64Array(rows * rows);
  for (let i = 0; i < rows; i++) for (let j = 0; j < rows; j++) a[i * rows + j] = potentials[Math.abs(i - j)];
  a[0] += (2 / ambient) * first;
  a[rows * rows - 1] += (2 / ambient) * last;
  const charge = new Float64Array(rows).fill(1);
  solveReal(factoriseReal(a, rows), charge);
  return charge;
}
