import type { ColumnGeometry, LineSection } from '../column/index.js';

/** All widths and lengths to the nearest multiple of the grid, and never to none. */
export function onGrid(geometry: ColumnGeometry, grid: number): ColumnGeometry {
  const snap = (value: number): number => Math.max(1, Math.round(value / grid)) * grid;
  const section = ({ width, length }: LineSection): LineSection => ({ width: snap(width), length: snap(length) });
  const { patches, links, matching } = geometry;
  // Feed line and links are drawn as wide as they were given.
  return {
    ...geometry,
    patches: patches.map(section),
    links: links.map(({ width, length }) => ({ width, length: snap(length) })),
    ...(matching && { matching: matching.map(section) }),
  };
}
