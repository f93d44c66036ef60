export { type CutShape, cutShape } from './cut-figures.js';
export { farFieldPower, intensity } from './radiated-power.js';
