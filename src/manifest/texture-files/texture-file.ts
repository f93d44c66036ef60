import type { HeightMap, Profile } from '../../physics/texture/index.js';
import type { Problem } from '../problem.js';
import { TextureFault } from './fault.js';

export type MeasuredHeights =
  | { readonly kind: 'profile'; readonly profile: Profile }
  | { readonly kind: 'map'; readonly map: HeightMap };

/** Heights as an instrument gave them, form and tilt included, with what the file says of itself. */
export interface TextureFile {
  readonly heights: MeasuredHeights;
  readonly instrument?: string;
  readonly note?: string;
}

export type TextureFileResult = { readonly file: TextureFile } | { readonly problems: readonly Problem[] };

/** Bytes of a file of heights; larger ones are refused unread. */
export const LARGEST_TEXTURE_FILE = 64 * 1024 * 1024;
/** Points of a height map: 2048 by 2048. */
export const MOST_POINTS = 2048 * 2048;
const FEWEST = 16;
/** Between neighbouring points, m. */
const SPACINGS = { low: 1e-9, high: 1e-3 };
/** Highest less lowest point of a copper face with its form, m. */
const TALLEST = 1e-3;

/** Runs a reader and turns what it throws into a problem of the file; what is no fault of the file goes on. */
export function readGuarded(path: string, bytes: Uint8Array, read: () => TextureFile): TextureFileResult {
  try {
    if (bytes.length > LARGEST_TEXTURE_FILE)
      throw new TextureFault(`${bytes.length} bytes`, `a file of heights has at most ${LARGEST_TEXTURE_FILE} bytes`);
    return { file: read() };
  } catch (error) {
    if (error instanceof TextureFault) return { problems: [error.problemIn(path)] };
    throw error;
  }
}

export function requireSpacing(spacing: number, place: TextureFault['place']): number {
  if (!(spacing >= SPACINGS.low && spacing <= SPACINGS.high))
    throw new TextureFault(`a spacing of ${spacing} m`, 'points lie 1 nm to 1 mm apart', place);
  return spacing;
}

/** @throws TextureFault where there are too few or too many points for a profile or map */
export function requireSize(
  kind: 'profile' | 'map',
  columns: number,
  rows: number,
  place: TextureFault['place'],
): void {
  const enough = columns >= FEWEST && (kind === 'profile' || rows >= FEWEST);
  if (!enough)
    throw new TextureFault(
      kind === 'profile' ? `${columns} points` : `${columns} by ${rows} points`,
      kind === 'profile'
        ? `a profile has ${FEWEST} points or more`
        : `a height map has ${FEWEST} points or more each way`,
      place,
    );
  if (columns * rows > MOST_POINTS)
    throw new TextureFault(`${columns} by ${rows} points`, `at most ${MOST_POINTS} points are read`, place);
}

/** @throws TextureFault where heights are missing by more than half, or so tall that the unit must be wrong */
export function requireHeights(heights: Float64Array, place: TextureFault['place']): Float64Array {
  let [count, low, high] = [0, Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY];
  for (const z of heights) {
    if (Number.isNaN(z)) continue;
    count++;
    if (z < low) low = z;
    if (z > high) high = z;
  }
  if (count < heights.length / 2)
    throw new TextureFault(
      `heights at ${count} of ${heights.length} points`,
      'half of the points or more were measured',
      place,
    );
  if (!(high - low <= TALLEST))
    throw new TextureFault(
      `heights that span ${(high - low).toPrecision(3)} m`,
      'a face of copper with its form spans at most 1 mm',
      place,
      'Is the unit of the heights right?',
    );
  return heights;
}
