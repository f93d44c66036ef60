/** The metal of a corporate feed: pieces of line between nodes, their widths and lengths, for circuit and print. */
import { type DividerPlan, tJunction, wilkinson } from './divider.js';
import type { CircuitResistor } from './feed-circuit.js';
import type { FeedSpec } from './feed-spec.js';
import { depthOf, type FeedTree, feedTree, reachOfLevel } from './feed-tree.js';
import { type LineSurroundings, lineOfWidth, widthOfImpedance } from './line-width.js';

/** One straight or meandered piece, m. */
export interface FeedDimension {
  /** `trunk`, `level 1`, …: where it lies. */
  readonly part: string;
  readonly kind: 'line' | 'quarter-wave step';
  readonly width: number;
  readonly length: number;
  /** Of a line that ends at a column: which (from 0, in the order of the weights), and how much of it sets the phase. */
  readonly output?: number;
  readonly phaseLength?: number;
}

export interface FeedDrawing {
  readonly nodes: number;
  readonly input: number;
  readonly outputs: readonly number[];
  readonly pieces: readonly (FeedDimension & { readonly from: number; readonly to: number })[];
  readonly resistors: readonly CircuitResistor[];
  readonly lineWidth: number;
  readonly dimensions: readonly FeedDimension[];
  readonly notes: readonly string[];
}

/** Narrowest line that common etching holds, m: stands where the specification names none. */
export const LEAST_WIDTH = 75e-6;

/** @param trims length added before each output, m, ≥ 0 */
export function drawFeed(spec: FeedSpec, nominal: LineSurroundings, trims: ArrayLike<number>): FeedDrawing {
  const { designFrequency, lineWidth } = spec;
  const grid = spec.grid ?? 0;
  const snap = (value: number): number => (grid > 0 ? Math.round(value / grid) * grid : value);
  const impedance = lineOfWidth(nominal, designFrequency, lineWidth).impedance;
  const leastWidth = spec.leastWidth ?? LEAST_WIDTH;
  const highest = Math.max(impedance, lineOfWidth(nominal, designFrequency, leastWidth).impedance);
  const tree = feedTree(
    spec.weights.map((w) => w.amplitude ** 2),
    spec.positions,
  );
  const depth = depthOf(tree);
  const notes = new Set<string>();
  const pieces: FeedDrawing['pieces'][number][] = [];
  const resistors: CircuitResistor[] = [];
  const outputs: number[] = [];
  let nodes = 1;

  const levels = Array.from({ length: depth }, (_, i) => {
    const reach = reachOfLevel(tree, i + 1);
    if (reach > spec.levelLength)
      notes.add(`Level ${i + 1} is ${mm(reach)} long, not ${mm(spec.levelLength)}: so far apart lie what it connects.`);
    return Math.max(reach, spec.levelLength);
  });

  const planOf = (first: number): DividerPlan =>
    spec.divider === 'tee'
      ? tJunction(impedance, first)
      : wilkinson(impedance, first, { resistance: spec.isolationResistance, highest });

  function draw(piece: FeedDimension, from: number): number {
    const to = nodes++;
    pieces.push({ ...piece, from, to });
    return to;
  }
  function step(part: string, z: number): FeedDimension {
    const exact = widthOfImpedance(nominal, designFrequency, z, leastWidth);
    const width = Math.max(snap(exact), grid);
    const line = lineOfWidth(nominal, designFrequency, width);
    if (Math.abs(line.impedance / z - 1) > 0.02)
      notes.add(`A step of ${z.toFixed(1)} ohm is drawn with ${line.impedance.toFixed(1)} ohm, ${mm(width)} wide.`);
    return { part, kind: 'quarter-wave step', width, length: snap(Math.PI / 2 / line.gamma.im) };
  }
  /** From `node` over what is left of `length` beside the steps to the tree's next divider or column. */
  function connect(
    node: number,
    part: string,
    length: number,
    before: FeedDimension[],
    below: FeedTree,
    level: number,
  ) {
    const plan = below.kind === 'divider' ? planOf(below.first) : undefined;
    const after = plan?.inputStep === undefined ? [] : [step(part, plan.inputStep)];
    const used = [...before, ...after].reduce((sum, piece) => sum + piece.length, 0);
    // A line at least as long as it is wide keeps steps and junctions apart.
    const rest = Math.max(length - used, lineWidth);
    if (rest > length - used + 1e-9)
      notes.add(`${part} is ${mm(used + rest)} long, not ${mm(length)}: its quarter-wave steps take ${mm(used)}.`);
    let at = node;
    before.forEach((piece) => {
      at = draw(piece, at);
    });
    if (below.kind === 'output') {
      const { output } = below;
      // Columns that hang higher in the tree get the length of the levels they miss, so that all delays are alike.
      const missed = levels.slice(level).reduce((sum, l) => sum + l, 0);
      const phaseLength = snap(missed + trims[output]);
      outputs[output] = draw(
        { part, kind: 'line', width: lineWidth, length: snap(rest) + phaseLength, output, phaseLength },
        at,
      );
      return;
    }
    at = draw({ part, kind: 'line', width: lineWidth, length: snap(rest) }, at);
    for (const piece of after) at = draw(piece, at);
    branch(at, below, plan!, level + 1);
  }
  function branch(junction: number, tree: FeedTree & { kind: 'divider' }, plan: DividerPlan, level: number): void {
    const part = `level ${level}`;
    const starts = tree.arms.map((arm, i) => {
      const steps = plan.arms[i].map((z) => step(part, z));
      // The resistor sits where the first step ends: that step is drawn before anything else.
      const end = plan.isolation ? draw(steps[0], junction) : junction;
      const used = plan.isolation ? steps[0].length : 0;
      return { arm, end, used, rest: plan.isolation ? steps.slice(1) : steps };
    });
    if (plan.isolation)
      resistors.push({
        from: starts[0].end,
        to: starts[1].end,
        resistance: plan.isolation.resistance,
        part: 'isolation resistors',
      });
    for (const { arm, end, used, rest } of starts) connect(end, part, levels[level - 1] - used, rest, arm, level);
  }

  connect(0, 'trunk', spec.trunkLength, [], tree, 0);
  const dimensions = pieces.map(({ from: _from, to: _to, ...dimension }) => dimension);
  return { nodes, input: 0, outputs, pieces, resistors, lineWidth, dimensions, notes: [...notes] };
}

const mm = (length: number): string => `${(length * 1e3).toFixed(3)} mm`;
