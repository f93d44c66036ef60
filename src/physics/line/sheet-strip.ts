import { add, type Complex, complex, log, mul, scale, ZERO } from '../../numerics/complex.js';
import { MU0 } from '../constants.js';
import type { SheetSquares } from './spectral-line.js';

/** c over Zs/(jωµ0): ½ e^−γ with Euler's constant, found in strips solved numerically to 3e-4 of it. */
const EDGE_CUT = 0.5 * Math.exp(-0.5772156649015329);
/** |Zs|/(ωµ0) over the width up to which the edges of a sheet are apart: the cut is then within 8 %, its weight 1.5 %. */
export const SHEET_WIDEST_EDGE = 0.002;

/** Length at which a sheet impedance stops the current's rise towards an edge, m, complex: Zs/(jωµ0). */
const edgeLength = (sheet: Complex, frequency: number): Complex =>
  scale(mul(complex(0, -1), sheet), 1 / (2 * Math.PI * frequency * MU0));

/** |Zs|/(ωµ0) over the width. */
export function edgeShare(sheet: Complex, width: number, frequency: number): number {
  const { re, im } = edgeLength(sheet, frequency);
  return Math.hypot(re, im) / width;
}

/**
 * Series impedance per length of a strip that is a sheet of a given impedance, ohm/m: Zs [S + E (ln(w/c) + 1)],
 * c = ½ e^−γ Zs/(jωµ0), with the sheet's squared current ∫J² = S + E ln(w/c) short of both edges.
 *
 * A current without thickness has an infinite ∫J²; the sheet's own impedance ends its rise at the edges, within a length of
 * the order of a skin depth. The added 1 makes the sum of all small steps of Zs from zero, so that it is Z′ itself. Own
 * derivation, to first order but for the edges; the constant from strips solved numerically.
 *
 * @param sheet ohm, the current of both sides together
 */
export function sheetSeries(squares: SheetSquares, width: number, sheet: Complex, frequency: number): Complex {
  if (sheet.re === 0 && sheet.im === 0) return ZERO;
  const cut = scale(edgeLength(sheet, frequency), EDGE_CUT / width);
  const rise = add(complex(squares.strip + squares.edge), scale(log(cut), -squares.edge));
  return mul(sheet, rise);
}
