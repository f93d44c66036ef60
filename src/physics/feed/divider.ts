/**
 * Two-way dividers as impedances: what lines, a quarter wave long at the design frequency, stand between which nodes.
 * All arms and the input end in the same line impedance.
 */
export interface DividerPlan {
  /** Quarter-wave step before the junction, ohm; absent where none is needed. */
  readonly inputStep?: number;
  /** Quarter-wave steps of each arm from the junction out, ohm. */
  readonly arms: readonly [readonly number[], readonly number[]];
  /** Between the ends of the arms' first steps. */
  readonly isolation?: { readonly resistance: number };
}

/** Impedances closer than this to the line's own need no step. */
const SAME = 1e-9;

const steps = (line: number, ...impedances: readonly number[]): number[] =>
  impedances.filter((z) => Math.abs(z / line - 1) > SAME);

/**
 * T-junction without loss: the arms' admittances at the junction are as the powers. The level of impedance there is the one
 * for which the arms' steps lie equally far above and below the line's: Zj = Z0 √(p1 p2), arms Z0 (p2/p1)^(±1/4),
 * input step √(Z0 Zj). Outputs are neither matched nor isolated. Any text on microwave circuits.
 *
 * @param impedance of the lines, ohm
 * @param first     part of the power that goes into the first arm, between 0 and 1
 * @throws RangeError on arguments outside these ranges
 */
export function tJunction(impedance: number, first: number): DividerPlan {
  requireSplit(impedance, first);
  const second = 1 - first;
  const ratio = (second / first) ** 0.25;
  return {
    inputStep: impedance * (first * second) ** 0.25,
    arms: [steps(impedance, impedance * ratio), steps(impedance, impedance / ratio)],
  };
}

/** What is on the shelf or can be etched, ohm. */
export interface WilkinsonLimits {
  /** Resistor in place of the ideal one. */
  readonly resistance?: number;
  /** Highest impedance of a line. */
  readonly highest?: number;
}

/**
 * Wilkinson divider, equal or unequal: all three ports matched, the outputs isolated at the design frequency.
 *
 * Source: E. J. Wilkinson, IRE Trans. Microw. Theory Tech. 8(1), 1960; L. I. Parad and R. L. Moynihan, IEEE Trans. Microw.
 * Theory Tech. 13(1), 1965 (single quarter-wave section): with k² = P2/P1, Z2 = Zw √((1 + k²)/k³), Z1 = k² Z2,
 * R = Zw (k + 1/k), then steps to the line, √(Z0 Zw k) and √(Z0 Zw/k). Zw is the line's Z0 (equal: √2 Z0 and 2 Z0), or where
 * an arm would rise above `highest` so much lower that it does not; a step before the junction then leads down to it.
 *
 * @param impedance of the lines, ohm
 * @param first     part of the power that goes into the first arm, between 0 and 1
 * @throws RangeError on arguments outside these ranges
 */
export function wilkinson(impedance: number, first: number, limits: WilkinsonLimits = {}): DividerPlan {
  requireSplit(impedance, first);
  const { resistance, highest = Number.POSITIVE_INFINITY } = limits;
  for (const z of [resistance ?? 1, highest])
    if (!(z > 0)) throw new RangeError(`a resistor and the highest impedance must be above 0 ohm, got ${z}`);
  const k = Math.sqrt((1 - first) / first);
  const second = Math.sqrt((1 + k * k) / k ** 3);
  const inner = Math.min(impedance, highest / (second * Math.max(1, k * k)));
  const inputStep = Math.sqrt(impedance * inner);
  return {
    ...(inner < impedance * (1 - SAME) && { inputStep }),
    arms: [
      [k * k * second * inner, ...steps(impedance, inputStep * Math.sqrt(k))],
      [second * inner, ...steps(impedance, inputStep / Math.sqrt(k))],
    ],
    isolation: { resistance: resistance ?? inner * (k + 1 / k) },
  };
}

function requireSplit(impedance: number, first: number): void {
  if (!(Number.isFinite(impedance) && impedance > 0))
    throw new RangeError(`a line's impedance must be above 0 ohm, got ${impedance}`);
  if (!(first > 0 && first < 1)) throw new RangeError(`a split lies between 0 and 1, got ${first}`);
}
