/** Frequencies and temperatures at which a board is evaluated. */
import type { Analysis, Board } from '../manifest/model.js';

/** Band edges and equal steps between them, none larger than the analysis asks for; an even count of steps, so that the centre is one. */
export function frequencies(board: Board, analysis: Analysis): number[] {
  const { low, high } = board.band;
  const steps = Math.max(2, 2 * Math.ceil((high - low) / analysis.frequencyStep / 2 - 1e-9));
  return Array.from({ length: steps + 1 }, (_, i) => low + ((high - low) * i) / steps);
}

/** Lowest, nominal and highest, each once. */
export function temperatures(board: Board): number[] {
  const { lowC, nominalC, highC } = board.temperature;
  return [...new Set([lowC, nominalC, highC])].sort((a, b) => a - b);
}

export const bandCentre = ({ band }: Board): number => (band.low + band.high) / 2;
