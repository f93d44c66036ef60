/** A feed network and the board's columns as one circuit: every reflection goes back into the feed and comes again. */
import { abs2, add, type Complex, complex, div, mul, ONE, scale, sub, ZERO } from '../../numerics/complex.js';
import { complexMatrix, factorise, solveInPlace } from '../../numerics/complex-lu.js';
import type { ValidityFlag } from '../validity.js';
import type { FeedState } from './corporate-feed.js';
import { scatteringAt, type TransitionTwoPort, tableOf } from './scattering-at.js';

/** S-matrix of the board's columns at the same frequency; its driven ports have the references of the feed's outputs. */
export interface BoardPorts {
  readonly scattering: readonly (readonly Complex[])[];
  readonly referenceImpedance: readonly number[];
}

export interface FedBoard {
  /** Wave into every column of the board, √W peak, for a wave of 1 W available at the input; 0 at those not driven. */
  readonly incident: readonly Complex[];
  /** At the radar's side of the transition, or at the network's input without one. */
  readonly inputReflection: Complex;
  /** Parts of the 1 W: what goes into the columns (not back again), and where the rest stays. They sum to 1. */
  readonly delivered: number;
  readonly reflected: number;
  readonly burnt: number;
  readonly lineLoss: number;
  readonly transitionLoss: number;
  /** Loss of lines and resistors by part, W. */
  readonly lossByPart: ReadonlyMap<string, number>;
  /** Delivered over accepted: the transmission of network and transition without mismatch at the input. */
  readonly transmission: number;
  readonly flags: readonly ValidityFlag[];
}

/**
 * @param driven     columns (from 0) on the feed's outputs, in the order of the feed's weights; the others end in their
 *                   reference impedance
 * @param transition two-port before the input; the feed's input must then have its reference impedance
 * @throws RangeError where ports, frequencies or reference impedances do not belong together
 */
export function feedOnBoard(
  feed: FeedState,
  board: BoardPorts,
  driven: readonly number[],
  transition?: TransitionTwoPort,
): FedBoard {
  requireFit(feed, board, driven, transition);
  const n = driven.length;
  const s = feed.scattering;
  const load = driven.map((row) => driven.map((column) => board.scattering[row][column]));
  // What leaves the outputs for a unit wave into the network: (1 − Soo Sb) b = So1.
  const matrix = complexMatrix(n);
  const [re, im] = [new Float64Array(n), new Float64Array(n)];
  for (let i = 0; i < n; i++) {
    for (let j = 0; j < n; j++) {
      let sum: Complex = i === j ? ONE : ZERO;
      for (let k = 0; k < n; k++) sum = sub(sum, mul(s[i + 1][k + 1], load[k][j]));
      matrix.re[i * n + j] = sum.re;
      matrix.im[i * n + j] = sum.im;
    }
    re[i] = s[i + 1][0].re;
    im[i] = s[i + 1][0].im;
  }
  solveInPlace(factorise(matrix), re, im);
  const into = Array.from({ length: n }, (_, i) => complex(re[i], im[i]));
  const back = load.map((row) => row.reduce((sum, value, j) => add(sum, mul(value, into[j])), ZERO));
  const networkReflection = back.reduce((sum, wave, i) => add(sum, mul(s[0][i + 1], wave)), s[0][0]);

  const before = transition ? passage(transition, feed.frequency, networkReflection) : NO_TRANSITION(networkReflection);
  // √2: a peak amplitude of √2 √W carries 1 W.
  const wave = scale(before.into, Math.SQRT2);
  const lossByPart = feed.loss([wave, ...back.map((b) => mul(b, wave))]);
  const incident: Complex[] = board.scattering.map(() => ZERO);
  driven.forEach((column, i) => {
    incident[column] = mul(into[i], wave);
  });
  const delivered = into.reduce((sum, a, i) => sum + (abs2(a) - abs2(back[i])) * abs2(before.into), 0);
  let [burnt, lineLoss] = [0, 0];
  for (const [part, power] of lossByPart) {
    if (part === 'isolation resistors') burnt += power;
    else lineLoss += power;
  }
  const reflected = abs2(before.reflection);
  return {
    incident,
    inputReflection: before.reflection,
    delivered,
    reflected,
    burnt,
    lineLoss,
    transitionLoss: 1 - reflected - abs2(before.into) * (1 - abs2(networkReflection)),
    lossByPart,
    transmission: delivered / (1 - reflected),
    flags: [...feed.flags, ...before.flags],
  };
}

interface Passage {
  /** Wave into the network for a unit wave at the input. */
  readonly into: Complex;
  readonly reflection: Complex;
  readonly flags: readonly ValidityFlag[];
}

const NO_TRANSITION = (reflection: Complex): Passage => ({ into: ONE, reflection, flags: [] });

/** Two-port ended in a reflection: a2 = S21/(1 − S22 Γ), Γin = S11 + S12 Γ a2. */
function passage(transition: TransitionTwoPort, frequency: number, load: Complex): Passage {
  const { s, flags } = scatteringAt(tableOf(transition), frequency);
  const round = sub(ONE, mul(s[1][1], load));
  const into = div(s[1][0], round);
  const active = largestGain(s) > 1 + 1e-3 ? [ACTIVE] : [];
  return { into, reflection: add(s[0][0], mul(mul(s[0][1], load), into)), flags: [...flags, ...active] };
}

const ACTIVE: ValidityFlag = {
  code: 'feed.transition-active',
  severity: 'outside',
  model: 'measured or simulated transition',
  text: 'The transition’s data give out more power than goes in, so that they cannot be right as they stand.',
};

/** Largest eigenvalue of SᴴS of a two-port: power out over power in for the worst pair of waves. */
function largestGain(s: readonly (readonly Complex[])[]): number {
  const a = abs2(s[0][0]) + abs2(s[1][0]);
  const b = abs2(s[0][1]) + abs2(s[1][1]);
  const re = s[0][0].re * s[0][1].re + s[0][0].im * s[0][1].im + s[1][0].re * s[1][1].re + s[1][0].im * s[1][1].im;
  const im = s[0][0].re * s[0][1].im - s[0][0].im * s[0][1].re + s[1][0].re * s[1][1].im - s[1][0].im * s[1][1].re;
  return (a + b) / 2 + Math.sqrt(((a - b) / 2) ** 2 + re * re + im * im);
}

function requireFit(feed: FeedState, board: BoardPorts, driven: readonly number[], transition?: TransitionTwoPort) {
  const same = (a: number, b: number): boolean => Math.abs(a / b - 1) < 1e-9;
  if (driven.length !== feed.scattering.length - 1)
    throw new RangeError(`feedOnBoard: ${driven.length} driven columns on ${feed.scattering.length - 1} outputs`);
  driven.forEach((column, i) => {
    const reference = board.referenceImpedance[column];
    if (!same(reference, feed.referenceImpedance[i + 1]))
      throw new RangeError(
        `feedOnBoard: output ${i} is referred to ${feed.referenceImpedance[i + 1]} ohm, column ${column} to ${reference}`,
      );
  });
  if (transition && !same(transition.referenceImpedance, feed.referenceImpedance[0]))
    throw new RangeError(
      `feedOnBoard: the transition is referred to ${transition.referenceImpedance} ohm, the input to ${feed.referenceImpedance[0]}`,
    );
}
