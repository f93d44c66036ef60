export { arrayFactor, peakSidelobeDb } from './array-factor.js';
export { type Taper, taperAmplitudes, taperEfficiency } from './taper.js';
