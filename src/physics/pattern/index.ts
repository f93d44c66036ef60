export { type CutShape, cutShape } from './cut-figures.js';
export { cutIntensity, type Intensity, radiationIntensity } from './edge-pattern.js';
export { farFieldPower, guidedWavePower } from './power-check.js';
