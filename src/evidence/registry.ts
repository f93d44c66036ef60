import { arrayPatternChecks } from './array-patterns.js';
import type { EvidenceCheck } from './check.js';
import { columnEngineChecks } from './column.js';
import { conductorChecks } from './conductor.js';
import { couplingDecayChecks } from './coupling-decay.js';
import { guideChecks } from './guide.js';
import { laminateChecks } from './laminate.js';
import { lineChecks } from './line.js';
import { lineLossChecks } from './line-loss.js';
import { lineSolvedChecks } from './line-solved.js';
import { patchResonanceChecks } from './measured-patches.js';
import { otherLineChecks } from './other-lines.js';
import { roughShapeChecks } from './rough-shapes.js';
import { roughnessChecks } from './roughness.js';
import { samplingChecks } from './sampling.js';
import { slabWaveChecks } from './slab-waves.js';
import { textureChecks } from './texture.js';

/** Every check of the engine against a value from outside it, in the order of the evidence page. */
export const allChecks: readonly EvidenceCheck[] = [
  ...conductorChecks,
  ...textureChecks,
  ...roughnessChecks,
  ...roughShapeChecks,
  ...laminateChecks,
  ...lineChecks,
  ...lineLossChecks,
  ...lineSolvedChecks,
  ...guideChecks,
  ...otherLineChecks,
  ...columnEngineChecks,
  ...patchResonanceChecks,
  ...couplingDecayChecks,
  ...slabWaveChecks,
  ...arrayPatternChecks,
  ...samplingChecks,
];
