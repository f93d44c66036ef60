export { fullWave } from './full-wave.js';
export { type GapPatch, type GapPatchSolution, gapPatch } from './gap-patch.js';
export type { FullWaveProblem, FullWaveSettings } from './problem.js';
