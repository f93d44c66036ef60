import type { HeightMap, Profile } from './surface.js';

/** The profile less its mean line by least squares over the measured points: height and slope removed, nothing else. */
export function withoutMeanLine({ spacing, heights }: Profile): Profile {
  const middle = (heights.length - 1) / 2;
  const [level, slope] = fitPlane(heights.length, 1, heights);
  return { spacing, heights: heights.map((z, i) => z - level - slope * (i - middle)) };
}

/** The map less its mean plane by least squares over the measured points. */
export function withoutMeanPlane(map: HeightMap): HeightMap {
  const { columns, rows, heights } = map;
  const [level, slopeX, slopeY] = fitPlane(columns, rows, heights);
  const [midX, midY] = [(columns - 1) / 2, (rows - 1) / 2];
  const levelled = heights.map(
    (z, i) => z - level - slopeX * ((i % columns) - midX) - slopeY * (Math.floor(i / columns) - midY),
  );
  return { ...map, heights: levelled };
}

/** Level, slope along rows and along columns, per step, about the middle of the grid. */
function fitPlane(columns: number, rows: number, heights: Float64Array): [number, number, number] {
  const [midX, midY] = [(columns - 1) / 2, (rows - 1) / 2];
  let [n, x1, y1, xx, xy, yy, z1, xz, yz] = [0, 0, 0, 0, 0, 0, 0, 0, 0];
  for (let r = 0, i = 0; r < rows; r++)
    for (let c = 0; c < columns; c++, i++) {
      const z = heights[i];
      if (Number.isNaN(z)) continue;
      const x = c - midX;
      const y = r - midY;
      n++;
      x1 += x;
      y1 += y;
      xx += x * x;
      xy += x * y;
      yy += y * y;
      z1 += z;
      xz += x * z;
      yz += y * z;
    }
  // Central moments: the slopes come from a two-by-two system, the level from the means.
  const sxx = xx - (x1 * x1) / n;
  const sxy = xy - (x1 * y1) / n;
  const syy = yy - (y1 * y1) / n;
  const sxz = xz - (x1 * z1) / n;
  const syz = yz - (y1 * z1) / n;
  const determinant = sxx * syy - sxy * sxy;
  const flat = rows === 1 || determinant <= 0;
  const slopeX = flat ? (sxx > 0 ? sxz / sxx : 0) : (sxz * syy - syz * sxy) / determinant;
  const slopeY = flat ? 0 : (syz * sxx - sxz * sxy) / determinant;
  return [(z1 - slopeX * x1 - slopeY * y1) / n, slopeX, slopeY];
}
