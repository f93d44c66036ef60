export { type ArrayFigures, arrayFigures, incidentWaves } from './array-figures.js';
