/** Which columns hang on which divider: halves, halves of halves, each carrying the power of its columns. */
export type FeedTree =
  | { readonly kind: 'output'; readonly output: number; readonly y: number | undefined }
  | {
      readonly kind: 'divider';
      /** Part of the power into `arms[0]`. */
      readonly first: number;
      readonly arms: readonly [FeedTree, FeedTree];
      /** Between its arms, m, where positions are known. */
      readonly y: number | undefined;
    };

/**
 * @param powers    of the outputs in the order in which they lie, > 0
 * @param positions y of the outputs, m, in the same order
 */
export function feedTree(powers: readonly number[], positions?: readonly number[], from = 0): FeedTree {
  if (powers.length === 1) return { kind: 'output', output: from, y: positions?.[from] };
  const half = Math.ceil(powers.length / 2);
  const sum = (p: readonly number[]): number => p.reduce((a, b) => a + b, 0);
  const arms = [
    feedTree(powers.slice(0, half), positions, from),
    feedTree(powers.slice(half), positions, from + half),
  ] as const;
  const [a, b] = [arms[0].y, arms[1].y];
  return {
    kind: 'divider',
    first: sum(powers.slice(0, half)) / sum(powers),
    arms,
    y: a === undefined || b === undefined ? undefined : (a + b) / 2,
  };
}

export const depthOf = (tree: FeedTree): number =>
  tree.kind === 'output' ? 0 : 1 + Math.max(depthOf(tree.arms[0]), depthOf(tree.arms[1]));

/** Longest way along y from any divider of a level (from 1) to what hangs on it, m; 0 where positions are unknown. */
export function reachOfLevel(tree: FeedTree, level: number): number {
  if (tree.kind === 'output') return 0;
  if (level > 1) return Math.max(...tree.arms.map((arm) => reachOfLevel(arm, level - 1)));
  return Math.max(
    ...tree.arms.map((arm) => (arm.y === undefined || tree.y === undefined ? 0 : Math.abs(arm.y - tree.y))),
  );
}
