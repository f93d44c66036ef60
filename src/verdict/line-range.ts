import type { Board } from '../manifest/model.js';
import { gigahertzRange } from './wording.js';

/**
 * Laminate heights, m, frequencies, Hz, and widths over height on which the solved line was compared: conductor loss with full
 * wave from w/h 1.2 to 10, shares of the faces at rest from 0.8 on, permittivity from 0.5 on.
 */
const HEIGHT = [0.1e-3, 0.25e-3] as const;
const HIGHEST_FREQUENCY = 100e9;
const WIDTH_OVER_HEIGHT = [0.75, 10] as const;
/** Thickness over the smaller of width and height, to which the change of loss with frequency is solved. */
const THICKEST = 0.5;

/** In which respects the feed line of a board lies outside what the line solver was compared on. */
export function lineOutside({ stackUp, columns, band }: Board): readonly string[] {
  const { cover, laminate, strip } = stackUp;
  const height = laminate.thickness.value;
  const { width } = columns[0].feedLine;
  const reasons: string[] = [];
  const beyond = (value: number, [low, high]: readonly [number, number]): boolean =>
    value < low * (1 - 1e-9) || value > high * (1 + 1e-9);
  if (cover) reasons.push('a cover layer, with which the line was compared at rest only');
  if (beyond(height, HEIGHT))
    reasons.push(`a laminate of ${(1e3 * height).toPrecision(3)} mm, compared from 0.1 to 0.25 mm`);
  if (band.high > HIGHEST_FREQUENCY)
    reasons.push(`the band of ${gigahertzRange(band.low, band.high)}, compared to 100 GHz`);
  const ratio = width / height;
  if (beyond(ratio, WIDTH_OVER_HEIGHT))
    reasons.push(
      `a line ${ratio.toPrecision(2)} times as wide as the laminate is high, compared from ${WIDTH_OVER_HEIGHT[0]} to ${WIDTH_OVER_HEIGHT[1]}`,
    );
  const thick = strip.thickness.value / Math.min(height, width);
  if (thick > THICKEST)
    reasons.push(
      `a strip ${thick.toPrecision(2)} times as thick as the smaller of width and height, compared to ${THICKEST}`,
    );
  return reasons;
}
