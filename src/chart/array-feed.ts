import type { ArrayDrawing } from '../dossier/document.js';
import type { Shape, Stroke } from './shapes.js';
import type { Theme } from './theme.js';

type Column = ArrayDrawing['columns'][number];

const STEPS = { '+x': [1, 0], '-x': [-1, 0], '+y': [0, -1], '-y': [0, 1] } as const;
const reach = 18;
const gap = 2;

/** Where the wave enters a column, as an arrow; a port that is terminated and the load of a travelling wave as a resistor. */
export function columnEnds(
  { feed, load }: Column,
  px: (x: number) => number,
  py: (y: number) => number,
  theme: Theme,
): Shape[] {
  const stroke: Stroke = { color: theme.figure.ink, width: 0.8 };
  const resistor = (x: number, y: number, along: boolean): Shape => ({
    shape: 'rect',
    x: along ? x - 4 : x - 2,
    y: along ? y - 2 : y - 4,
    width: along ? 8 : 4,
    height: along ? 4 : 8,
    fill: theme.figure.paper,
    stroke,
  });
  const shapes: Shape[] = load === undefined ? [] : [resistor(px(load.x), py(load.y), true)];
  const [dx, dy] = STEPS[feed.towards];
  const [x, y] = [px(feed.x), py(feed.y)];
  if (feed.terminated === true) {
    shapes.push(
      { shape: 'line', from: [x - dx * 8, y - dy * 8], to: [x, y], stroke },
      resistor(x - dx * 8, y - dy * 8, dx !== 0),
    );
  } else {
    shapes.push({
      shape: 'arrow',
      from: [x - dx * reach, y - dy * reach],
      to: [x - dx * gap, y - dy * gap],
      head: 5,
      stroke,
    });
  }
  return shapes;
}

const levelStep = 13;
const levels = (n: number): number => Math.max(1, Math.ceil(Math.log2(Math.max(2, n))));

/** Room that a tree over this many columns takes to the left of the feeds. */
export const treeWidth = (n: number): number => levels(n) * levelStep + 14;

/** Corporate network: neighbours are joined in pairs, level by level, down to one input. Not to scale. */
export function feedTree(ys: readonly number[], x: number, theme: Theme): Shape[] {
  const stroke: Stroke = { color: theme.figure.ink, width: 0.9 };
  const line = (from: readonly [number, number], to: readonly [number, number]): Shape => ({
    shape: 'line',
    from,
    to,
    stroke,
  });
  const shapes: Shape[] = [];
  let nodes = [...ys].sort((a, b) => a - b);
  let at = x;
  while (nodes.length > 1) {
    const next: number[] = [];
    for (let i = 0; i < nodes.length; i += 2) {
      const [a, b] = [nodes[i], nodes[i + 1] ?? nodes[i]];
      shapes.push(line([at, a], [at - levelStep, a]));
      if (b !== a) shapes.push(line([at, b], [at - levelStep, b]), line([at - levelStep, a], [at - levelStep, b]));
      next.push((a + b) / 2);
    }
    nodes = next;
    at -= levelStep;
  }
  for (const y of nodes) shapes.push({ shape: 'arrow', from: [at - 14, y], to: [at, y], head: 5, stroke });
  return shapes;
}
