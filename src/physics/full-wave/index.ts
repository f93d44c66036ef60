export { fullWave } from './full-wave.js';
export type { FullWaveProblem, FullWaveSettings } from './problem.js';
