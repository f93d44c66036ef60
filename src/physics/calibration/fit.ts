/** Constants of the edge network from the figures of single patches. */
import { leastSquares } from '../../numerics/least-squares.js';
import type { CalibrationResiduals, FittedConstants } from '../column/calibration-record.js';
import type { NetworkConstants } from '../column/network-constants.js';
import type { CalibrationCase } from './cases.js';
import { type CaseFigures, figuresOf, type Sampling } from './figures.js';
import { networkSolver } from './solver.js';

/** A patch with what the network is to come to. */
export interface CalibrationTarget {
  readonly of: CalibrationCase;
  readonly sampling: Sampling;
  readonly figures: CaseFigures;
}

/**
 * What the network is held to: errors count in these units. Patches without a line are compared but not fitted to: no board
 * has them, and on tall slabs, with a Q below ten, a gap sees more than the one mode that the network has.
 */
const HELD_TO = { resonance: 0.003, level: 0.12, reflection: 0.06 };

const FITTED = [
  'stepReactance',
  'edgeMoment',
  'coveredMoment',
  'modeConductance',
  'openEnd',
  'coveredSusceptance',
] as const satisfies readonly (keyof FittedConstants)[];

/** Relative. */
const STEP = 0.005;
/** No constant goes further than this from where it starts: beyond, it no longer means what it is named for. */
const FURTHEST = 0.2;

export interface ConstantsFit {
  readonly constants: NetworkConstants;
  readonly calls: number;
}

/**
 * Least squares over resonance, resistance and Q of every target fed at its edge and its reflections between two lines.
 *
 * @param step called after every trial of all targets
 */
export function fitConstants(
  targets: readonly CalibrationTarget[],
  start: NetworkConstants,
  budget: number,
  step: () => void = () => {},
): ConstantsFit {
  const withValues = (x: Float64Array): NetworkConstants => ({
    ...start,
    ...Object.fromEntries(FITTED.map((name, i) => [name, start[name] * x[i]])),
  });
  const n = FITTED.length;
  const { x, calls } = leastSquares(
    (trial) => {
      const out = Float64Array.from(targets.flatMap((target) => errors(target, withValues(trial))));
      step();
      return out;
    },
    new Float64Array(n).fill(1),
    {
      step: new Float64Array(n).fill(STEP),
      low: new Float64Array(n).fill(1 - FURTHEST),
      high: new Float64Array(n).fill(1 + FURTHEST),
      reach: 30,
      tolerance: 1e-5,
      budget,
    },
  );
  return { constants: withValues(x), calls };
}

function errors(target: CalibrationTarget, constants: NetworkConstants): number[] {
  const { resonance, level, reflection } = HELD_TO;
  const found = figuresOf(target.of, target.sampling, networkSolver(constants));
  const each = differences(found, target.figures);
  const count = Math.sqrt(each.reflection.length);
  return [
    each.edgeResonance / resonance,
    each.edgeResistance / level,
    each.edgeQuality / level,
    ...each.reflection.flatMap(({ re, im }) => [re / (reflection * count), im / (reflection * count)]),
  ];
}

function differences(found: CaseFigures, wanted: CaseFigures) {
  const ratio = (a: number, b: number): number => Math.log(a / b);
  return {
    gapResonance: ratio(found.gap.frequency, wanted.gap.frequency),
    gapQuality: ratio(found.gap.quality, wanted.gap.quality),
    edgeResonance: ratio(found.edge.frequency, wanted.edge.frequency),
    edgeResistance: ratio(found.edge.resistance, wanted.edge.resistance),
    edgeQuality: ratio(found.edge.quality, wanted.edge.quality),
    reflection: found.between.map((s, i) => ({ re: s.re - wanted.between[i].re, im: s.im - wanted.between[i].im })),
  };
}

/** Root mean squares over patches of what two ways of solving them differ by. */
export function residualsOf(found: readonly CaseFigures[], wanted: readonly CaseFigures[]): CalibrationResiduals {
  const all = found.map((figures, i) => differences(figures, wanted[i]));
  const rms = (values: readonly number[]): number => Math.sqrt(values.reduce((s, v) => s + v * v, 0) / values.length);
  return {
    gapResonance: rms(all.map((d) => d.gapResonance)),
    gapQuality: rms(all.map((d) => d.gapQuality)),
    edgeResonance: rms(all.map((d) => d.edgeResonance)),
    edgeResistance: rms(all.map((d) => d.edgeResistance)),
    edgeQuality: rms(all.map((d) => d.edgeQuality)),
    reflection: rms(all.flatMap((d) => d.reflection.map(({ re, im }) => Math.hypot(re, im)))),
  };
}
