import type { Complex } from '../../numerics/complex.js';
import { abs2, complex } from '../../numerics/complex.js';
import type { ColumnGeometry } from '../column/index.js';
import { lineOfWidth, widthOfImpedance } from '../feed/index.js';
import { type ColumnUnknowns, columnUnknowns, unknownsOf } from './column-unknowns.js';
import type { SizingRequest } from './request.js';

/**
 * Unknowns of a column with one more section before its first patch, about a quarter wave long: for where the widths that
 * patches may have cannot make the input resistance the line's, and where links are narrower than it. Its width starts at √(Z0 R), R from the reflection without it.
 *
 * @param geometry   sized as far as widths go; its own section, if it has one, is the start
 * @param reflection of it, referred to the feed line
 */
export function withMatching(request: SizingRequest, geometry: ColumnGeometry, reflection: Complex): ColumnUnknowns {
  const { frequency, feedLineWidth, leastWidth } = request;
  const base = columnUnknowns(
    request,
    geometry.patches.map(() => 1),
  );
  const first = geometry.matching?.[0] ?? startingSection(request, reflection);
  const n = base.step.length;
  const extend = (values: Float64Array, width: number, length: number): Float64Array =>
    Float64Array.from([...values, width, length]);
  const quarter = Math.PI / 2 / lineOfWidth(request, frequency, feedLineWidth).gamma.im;
  const widest = geometry.patches.reduce((w, p) => Math.max(w, p.width), 0);
  return {
    start: extend(unknownsOf(request, geometry), Math.log(first.width), first.length / quarter),
    step: extend(base.step, 1e-2, 5e-3),
    low: extend(base.low, Math.log(leastWidth), 0.6),
    high: extend(base.high, Math.log(Math.max(widest, 2 * feedLineWidth)), 1.4),
    geometry: (x) => ({
      ...base.geometry(x.subarray(0, n)),
      matching: [{ width: Math.exp(x[n]), length: x[n + 1] * quarter }],
    }),
  };
}

/** Reflection in the feed line of a column whose input resistance is this many times that of a line of the links' width. */
export function reflectionInFeedLine(request: SizingRequest, ratio: number): Complex {
  const { frequency, feedLineWidth, linkWidth = feedLineWidth } = request;
  const line = lineOfWidth(request, frequency, feedLineWidth).impedance;
  const resistance = ratio * lineOfWidth(request, frequency, linkWidth).impedance;
  return complex((resistance - line) / (resistance + line), 0);
}

function startingSection(request: SizingRequest, s: Complex): { width: number; length: number } {
  const { frequency, feedLineWidth, leastWidth } = request;
  const line = lineOfWidth(request, frequency, feedLineWidth).impedance;
  // Re Z of (1 + S)/(1 − S).
  const resistance = (line * (1 - abs2(s))) / ((1 - s.re) ** 2 + s.im ** 2);
  const width = widthOfImpedance(request, frequency, Math.sqrt(line * resistance), leastWidth);
  return { width, length: Math.PI / 2 / lineOfWidth(request, frequency, width).gamma.im };
}
