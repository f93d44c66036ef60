export { type Accuracy, accuracyTable } from './accuracy.js';
export { type EvidenceCheck, type EvidenceResult, type HowKnown, runChecks } from './check.js';
export { type Method, methods } from './methods.js';
export { allChecks } from './registry.js';
