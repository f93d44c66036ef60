/** The shift in frequency that best aligns the network's reflections with the full wave's. */
import { abs2, type Complex, sub } from '../numerics/complex.js';
import { minimumBetween } from '../numerics/golden-section.js';

/** Share of the frequency up to which a shift is looked for: what 3 % of permittivity or a thick strip may do to a resonance. */
export const FARTHEST_SHIFT = 0.015;
const STEPS = 24;
/** A shift that takes away less than this share of the difference is as likely chance: a few frequencies are compared. */
const WORTH_SHARE = 0.15;
/** Resolution, Hz. */
const FINE = 2e6;

export interface Reflections {
  readonly frequency: number;
  readonly reflection: readonly Complex[];
}

/**
 * @param network  reflection of every column at any frequency; the second argument is the frequency that conditions are for
 * @returns        Hz, positive where the full wave lies above: network(f − shift) stands for f. 0 where a shift takes away
 *                 little of the difference
 */
export function aligningShift(
  fullWave: readonly Reflections[],
  network: (frequency: number, conditionsFor: number) => readonly Complex[],
): number {
  const farthest = FARTHEST_SHIFT * fullWave[0].frequency;
  const off = (shift: number): number => {
    const squares = fullWave.flatMap(({ frequency, reflection }) => {
      const other = network(frequency - shift, frequency);
      return reflection.map((s, c) => abs2(sub(s, other[c])));
    });
    return Math.sqrt(squares.reduce((a, b) => a + b, 0) / squares.length);
  };
  const step = (2 * farthest) / STEPS;
  const scan = Array.from({ length: STEPS + 1 }, (_, i) => {
    const shift = i * step - farthest;
    return { shift, off: off(shift) };
  });
  const best = scan.reduce((a, b) => (b.off < a.off ? b : a));
  const low = Math.max(-farthest, best.shift - step);
  const high = Math.min(farthest, best.shift + step);
  const found = minimumBetween(off, low, high, FINE);
  return found.value <= (1 - WORTH_SHARE) * off(0) ? Math.round(found.x / FINE) * FINE : 0;
}
