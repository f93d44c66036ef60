import { successRunSize } from '../numerics/success-run.js';
import type { EvidenceCheck } from './check.js';

const TABLE: readonly (readonly [reliability: number, confidence: number, size: number])[] = [
  [0.9, 0.9, 22],
  [0.9, 0.95, 29],
  [0.95, 0.95, 59],
  [0.99, 0.95, 299],
];

export const samplingChecks: readonly EvidenceCheck[] = TABLE.map(([reliability, confidence, size]) => ({
  id: `sampling.r${reliability}-c${confidence}`,
  topic: 'Sample size',
  quantity: `reliability ${reliability} with confidence ${confidence}, no failure`,
  source: 'Tables of the success-run formula in reliability handbooks',
  howKnown: 'memory',
  expected: size,
  unit: '1',
  tolerance: 1e-9,
  toleranceReason: 'a count of pieces is exact',
  compute: () => successRunSize(confidence, reliability),
}));
