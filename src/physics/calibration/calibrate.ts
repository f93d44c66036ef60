/** The whole calibration: full wave of every patch, network against it, fit, and what each leaves. */
import type { CalibrationRange, CalibrationRecord } from '../column/calibration-record.js';
import type { NetworkConstants } from '../column/network-constants.js';
import { calibrationCases } from './cases.js';
import { figuresOf, samplingOf } from './figures.js';
import { type CalibrationTarget, fitConstants, residualsOf } from './fit.js';
import { fullWaveSolver, networkSolver, type Solver } from './solver.js';

/** Told of how a calibration goes on. */
export interface CalibrationProgress {
  stage(name: string, total?: number): void;
  step(): void;
}

/** What the constants are fitted to. */
const fine = (): Solver => fullWaveSolver(17);
/** A coarser grid with lines read over another length: what they differ by is the full wave's own doubt. */
const other = (): Solver => fullWaveSolver(13, 0.8);
/** Trials of a set of constants on all patches. */
const BUDGET = 60;

/**
 * Single patches without lines, at the end of a line and between two lines, never columns, through both engines.
 * Deterministic. Some minutes.
 *
 * @param inUse constants that the fit starts from and is compared with
 */
export function calibrate(
  range: CalibrationRange,
  inUse: NetworkConstants,
  progress: CalibrationProgress,
): CalibrationRecord {
  const network = networkSolver(inUse);
  const cases = calibrationCases(range);
  progress.stage('full wave', cases.length);
  const targets = cases.map((of): CalibrationTarget => {
    const sampling = samplingOf(of, network);
    const figures = figuresOf(of, sampling, fine());
    progress.step();
    return { of, sampling, figures };
  });
  const all = (by: () => Solver) =>
    targets.map(({ of, sampling }) => {
      const figures = figuresOf(of, sampling, by());
      progress.step();
      return figures;
    });
  const wanted = targets.map(({ figures }) => figures);
  progress.stage('full wave, other grid', cases.length);
  const floor = residualsOf(all(other), wanted);
  progress.stage('fit', BUDGET);
  const { constants } = fitConstants(targets, inUse, BUDGET, () => progress.step());
  progress.stage('network', 2 * cases.length);
  return {
    cases: cases.length,
    range,
    fitted: {
      stepReactance: constants.stepReactance,
      edgeMoment: constants.edgeMoment,
      coveredMoment: constants.coveredMoment,
      modeConductance: constants.modeConductance,
      openEnd: constants.openEnd,
      coveredSusceptance: constants.coveredSusceptance,
    },
    fittedResiduals: residualsOf(
      all(() => networkSolver(constants)),
      wanted,
    ),
    residuals: residualsOf(
      all(() => network),
      wanted,
    ),
    floor,
  };
}
