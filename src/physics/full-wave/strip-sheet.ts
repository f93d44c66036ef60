/** Sheet impedances that give the drawn metal the series impedance of the true strip, and the faces that share its loss. */
import { add, type Complex, scale, ZERO } from '../../numerics/complex.js';
import { factoriseReal, solveReal } from '../../numerics/real-lu.js';
import { type FaceImpedances, type StripSolution, stillStrip, stripAt } from '../line/index.js';
import { sheetSeries } from '../line/sheet-strip.js';
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

export function stripSheet(
  strip: StripSolution,
  faces: FaceImpedances,
  frequency: number,
  squares: number,
): StripSheet {
  const { underside, top, edges } = seriesByFace(strip, faces, frequency);
  const whole = add(add(underside, top), edges);
  const share = (z: Complex): number => (whole.re > 0 ? z.re / whole.re : 0);
  return {
    impedance: scale(whole, 1 / squares),
    shares: { underside: share(underside), top: share(top), edges: share(edges) },
  };
}

/**
 * ∫J²/(∫J)² over rows of cells with piecewise constant current, 1/m: current spread as that of a strip over its image, as
 * the solved currents are.
 *
 * @param rows  of width `step`, m
 * @param trims κ of the first and of the last row
 */
export function drawnSquares(rows: number, step: number, height: number, trims: readonly [number, number]): number {
  const a = new Float64Array(rows * rows);
  const mean = (k: number): number => {
    const twice = (x: number): number => (x === 0 ? 0 : (x * x * Math.log(Math.abs(x))) / 2 - (3 * x * x) / 4);
    const image = Math.log(Math.hypot(k, (2 * height) / step));
    return 2 * twice(k) - twice(k + 1) - twice(k - 1) + image;
  };
  for (let i = 0; i < rows; i++) for (let j = 0; j < rows; j++) a[i * rows + j] = mean(i - j);
  a[0] += trims[0];
  a[rows * rows - 1] += trims[1];
  const current = new Float64Array(rows).fill(1);
  solveReal(factoriseReal(a, rows), current);
  let [sum, squares] = [0, 0];
  for (const i of current) {
    sum += i;
    squares += i * i;
  }
  return squares / (step * sum * sum);
}
