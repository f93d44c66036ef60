/** Heights along a line at even distances. NaN where nothing was measured. */
export interface Profile {
  /** Distance of neighbours, m, > 0. */
  readonly spacing: number;
  /** m, away from the metal positive */
  readonly heights: Float64Array;
}

/** Heights on an even grid, row after row. NaN where nothing was measured. */
export interface HeightMap {
  readonly columns: number;
  readonly rows: number;
  /** Distance of neighbours along a row and along a column, m, > 0. */
  readonly spacingX: number;
  readonly spacingY: number;
  /** m, `columns × rows` of them */
  readonly heights: Float64Array;
}

/** Fewest points of a profile, and along either side of a map, from which figures of texture are taken. */
export const FEWEST_POINTS = 16;

const evenDistance = (d: number): boolean => Number.isFinite(d) && d > 0;

/** @throws RangeError naming what is wrong */
export function requireProfile({ spacing, heights }: Profile): void {
  if (!evenDistance(spacing)) throw new RangeError(`the spacing of a profile must be positive, got ${spacing}`);
  if (heights.length < FEWEST_POINTS)
    throw new RangeError(`a profile needs ${FEWEST_POINTS} points or more, got ${heights.length}`);
  requireSomeHeights(heights);
}

/** @throws RangeError naming what is wrong */
export function requireMap(map: HeightMap): void {
  const { columns, rows, spacingX, spacingY, heights } = map;
  if (!(evenDistance(spacingX) && evenDistance(spacingY)))
    throw new RangeError(`the spacings of a height map must be positive, got ${spacingX} and ${spacingY}`);
  if (!(columns >= FEWEST_POINTS && rows >= FEWEST_POINTS))
    throw new RangeError(`a height map needs ${FEWEST_POINTS} points or more each way, got ${columns} by ${rows}`);
  if (heights.length !== columns * rows)
    throw new RangeError(`${columns} by ${rows} points need ${columns * rows} heights, got ${heights.length}`);
  requireSomeHeights(heights);
}

function requireSomeHeights(heights: Float64Array): void {
  const share = measuredShare(heights);
  if (share < 0.5)
    throw new RangeError(`only ${(100 * share).toFixed(0)} % of the points were measured, half are needed`);
  if (heights.some((z) => z === Number.POSITIVE_INFINITY || z === Number.NEGATIVE_INFINITY))
    throw new RangeError('a height is infinite');
}

/** Share of the points that were measured, 0 to 1. */
export function measuredShare(heights: Float64Array): number {
  let count = 0;
  for (const z of heights) if (!Number.isNaN(z)) count++;
  return count / heights.length;
}

/** Largest distance of a measured point from zero, m; 1 for a flat surface, so that it can be divided by. */
export function largestHeight(heights: Float64Array): number {
  let largest = 0;
  for (const z of heights) if (Math.abs(z) > largest) largest = Math.abs(z);
  return largest > 0 ? largest : 1;
}

/** The profile without its points closer than `margin` to either end. */
export function withoutEnds({ spacing, heights }: Profile, margin: number): Profile {
  const cut = Math.ceil(margin / spacing - 1e-9);
  return { spacing, heights: heights.slice(cut, Math.max(cut, heights.length - cut)) };
}

/** The map without its points closer than `margin` to a side. */
export function withoutRim(map: HeightMap, margin: number): HeightMap {
  const cutX = Math.ceil(margin / map.spacingX - 1e-9);
  const cutY = Math.ceil(margin / map.spacingY - 1e-9);
  const columns = Math.max(0, map.columns - 2 * cutX);
  const rows = Math.max(0, map.rows - 2 * cutY);
  const heights = new Float64Array(columns * rows);
  for (let r = 0; r < rows; r++) {
    const start = (r + cutY) * map.columns + cutX;
    heights.set(map.heights.subarray(start, start + columns), r * columns);
  }
  return { ...map, columns, rows, heights };
}
