import type { PointResult } from '../study/results.js';

/** One step of the budget, in hundredths of a dB so that printed figures add up to the last digit. */
export interface BudgetStep {
  readonly label: string;
  /** Share of the power accepted at the column ports; absent for feed loss and mismatch, which act on all of it. */
  readonly share?: number;
  readonly change: number;
  readonly level: number;
}

export interface GainBudget {
  /** dBi */
  readonly directivity: number;
  readonly steps: readonly BudgetStep[];
  readonly realizedGain: number;
}

const SHARES: readonly (readonly [keyof PointResult['shares'], string])[] = [
  ['surfaceWave', 'Surface wave'],
  ['dielectric', 'Dielectric'],
  ['stripUnderside', 'Strip underside, smooth copper'],
  ['stripTop', 'Strip top, smooth copper'],
  ['stripEdges', 'Strip edges, smooth copper'],
  ['ground', 'Ground, smooth copper'],
  ['roughness', 'Roughness of the copper'],
  ['finish', 'Plated finish'],
];

/** Only columns that end in a termination have this line. */
const LOAD = ['load', 'Termination loads'] as const;

/**
 * Gain budget of one point, from directivity down to realized gain with every loss named.
 *
 * The shares of the accepted power are linear and act at once; a budget in dB needs an order. Each step is the ratio of
 * what is left after the loss to what was left before, so a loss later in the order weighs a little more in dB than the
 * same share earlier; the sum does not depend on the order. Levels are rounded, steps are differences of rounded levels:
 * the printed figures close to the last digit.
 *
 * @throws Error when the product of the parts is not the realized gain of the point, which is a fault of the study
 */
export function gainBudget(point: PointResult): GainBudget {
  const hundredths = (ratio: number) => Math.round(1000 * Math.log10(ratio));
  const steps: BudgetStep[] = [];
  const start = hundredths(point.directivity);
  let before = start;
  const step = (label: string, ratio: number, share?: number) => {
    const level = hundredths(ratio);
    steps.push({
      label,
      ...(share === undefined ? {} : { share }),
      change: (level - before) / 100,
      level: level / 100,
    });
    before = level;
  };
  let left = 1;
  for (const [key, label] of point.shares.load > 0 ? [...SHARES, LOAD] : SHARES) {
    left -= point.shares[key];
    step(label, point.directivity * left, point.shares[key]);
  }
  const fed = point.directivity * left * point.feedTransmission;
  step('Feed paths', fed);
  step('Mismatch', fed * point.mismatch);
  if (!(Math.abs(10 * Math.log10((fed * point.mismatch) / point.realizedGain)) < 1e-6)) {
    throw new Error(
      `gain budget does not close at ${point.frequency} Hz, ${point.temperatureC} degC: parts give ${fed * point.mismatch}, realized gain is ${point.realizedGain}`,
    );
  }
  return { directivity: start / 100, steps, realizedGain: before / 100 };
}
