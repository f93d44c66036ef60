import type { EvidenceCheck } from './check.js';
import { columnEngineChecks } from './column.js';
import { conductorChecks } from './conductor.js';
import { guideChecks } from './guide.js';
import { lineChecks } from './line.js';
import { lineLossChecks } from './line-loss.js';
import { roughnessChecks } from './roughness.js';
import { samplingChecks } from './sampling.js';

/** Every check of the engine against a value from outside it, in the order of the evidence page. */
export const allChecks: readonly EvidenceCheck[] = [
  ...conductorChecks,
  ...roughnessChecks,
  ...lineChecks,
  ...lineLossChecks,
  ...guideChecks,
  ...columnEngineChecks,
  ...samplingChecks,
];
