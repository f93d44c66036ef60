export {
  activeReflections,
  type ScanReflection,
  type ScatteringMatrix,
  scanReflection,
  steeringWaves,
} from './active-reflection.js';
export { type ArrayFigures, arrayFigures, incidentWaves } from './array-figures.js';
export { embeddedField } from './embedded.js';
export { type Isolation, isolation } from './isolation.js';
export { renormalise } from './renormalise.js';
