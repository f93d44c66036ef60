/** Sheet impedances that give the drawn metal the series impedance of the true strip, and the faces that share its loss. */
import { add, type Complex, scale, ZERO } from '../../numerics/complex.js';
import { type FaceImpedances, type StripSolution, stillStrip, stripAt } from '../line/index.js';
import { sheetSeries } from '../line/sheet-strip.js';
import { rowCharges, rowPotentials } from './drawn-strip.js';
import type { EdgeTrim } from './edge-trim.js';
import type { FullWaveProblem } from './problem.js';

export interface StripSheet {
  /** Of the drawn metal, ohm. */
  readonly impedance: Complex;
  /** Of the power lost in the strip, sum 1; 0 each where nothing is lost. */
  readonly shares: { readonly underside: number; readonly top: number; readonly edges: number };
}

/** What the strip of a width is without loss; hangs on slab and thickness, hardly on the frequency. */
export function solvedStrip(
  problem: Pick<FullWaveProblem, 'cover'>,
  slab: FullWaveProblem['slab'],
  thickness: number,
  width: number,
  frequency: number,
): StripSolution {
  const cover = problem.cover && { ...problem.cover, shape: 'planar' as const };
  return stripAt(
    stillStrip({
      width,
      height: slab.height,
      thickness,
      permittivity: slab.permittivity,
      ...(cover && { cover }),
    }),
    frequency,
  );
}

/** Series impedance per length by face, ohm/m. */
export function seriesByFace(strip: StripSolution, faces: FaceImpedances, frequency: number) {
  const { weights, sheet, section } = strip;
  const underside = sheet
    ? sheetSeries(sheet, section.width, faces.underside, frequency)
    : scale(faces.underside, weights.underside);
  return {
    underside,
    top: sheet ? ZERO : scale(faces.top, weights.top),
    edges: sheet ? ZERO : scale(faces.edges, weights.edges),
  };
}

/** Of the solved strip, ohm/m. */
export function wholeSeries(strip: StripSolution, faces: FaceImpedances, frequency: number): Complex {
  const { underside, top, edges } = seriesByFace(strip, faces, frequency);
  return add(add(underside, top), edges);
}

/**
 * Without thickness the sheet impedance is that of the drawn metal as it is: the current spreads as the grid lets it. With
 * thickness the drawn metal gets what gives a line of this width the series impedance of the solved strip.
 */
export function stripSheet(
  strip: StripSolution,
  faces: FaceImpedances,
  frequency: number,
  squares: number,
): StripSheet {
  if (strip.sheet) return { impedance: faces.underside, shares: { underside: 1, top: 0, edges: 0 } };
  const { underside, top, edges } = seriesByFace(strip, faces, frequency);
  const whole = add(add(underside, top), edges);
  const share = (z: Complex): number => (whole.re > 0 ? z.re / whole.re : 0);
  return {
    impedance: scale(whole, 1 / squares),
    shares: { underside: share(underside), top: share(top), edges: share(edges) },
  };
}

/** ∫J²/(∫J)² over rows of cells with even current, 1/m: it spreads as on a strip over its image, as the solved one does. */
export function drawnSquares(rows: number, step: number, height: number, trims: readonly [EdgeTrim, EdgeTrim]): number {
  const potentials = rowPotentials({ permittivity: 1, height }, step, rows);
  const current = rowCharges(potentials, 2, trims[0].current, trims[1].current);
  let [sum, squares] = [0, 0];
  for (const i of current) {
    sum += i;
    squares += i * i;
  }
  return squares / (step * sum * sum);
}
