export { guidedWavePower } from './edge-power.js';
export type {
  ColumnConditions,
  ColumnEngine,
  ColumnGeometry,
  ColumnProblem,
  ColumnSolution,
  ExcitedArray,
  ExcitedEdges,
  ExcitedPatches,
  FarField,
  LineSection,
  MacroPatch,
  PowerBudget,
  RadiatingEdge,
  Slab,
  SolverEffort,
} from './engine.js';
export { edgeNetwork } from './network.js';
export { NETWORK_CONSTANTS, type NetworkConstants } from './network-constants.js';
export { slabGuidesOneWave, slabSpectrum, tm0Wavenumber } from './slab-spectrum.js';
