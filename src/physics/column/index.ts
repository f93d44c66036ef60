export { guidedWavePower } from './edge-power.js';
export type {
  ColumnConditions,
  ColumnEngine,
  ColumnGeometry,
  ColumnProblem,
  ColumnSolution,
  ExcitedArray,
  ExcitedEdges,
  FarField,
  LineSection,
  PowerBudget,
  RadiatingEdge,
  Slab,
  SolverEffort,
} from './engine.js';
export { edgeNetwork } from './network.js';
export { NETWORK_CONSTANTS } from './network-constants.js';
export { slabGuidesOneWave, slabSpectrum, tm0Wavenumber } from './slab-spectrum.js';
