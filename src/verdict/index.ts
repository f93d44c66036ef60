export {
  type AllowanceOutcome,
  type AllowanceResult,
  type AllowanceTask,
  type ModelCeiling,
  searchAllowance,
} from './allowance.js';
export { ALLOWANCE_REACH, planAllowances } from './allowance-plan.js';
export { BOARD_STATUS_RULE, type BoardStatus } from './board-status.js';
export { decide, type RequirementStatus } from './decision.js';
export { type Declaration, declarationsByPart } from './declared.js';
export { ENGINE_ACCURACY, type EngineAccuracy, UNCONFIRMED_FACTOR } from './engine-accuracy.js';
export { FULL_WAVE_ACCURACY } from './full-wave-accuracy.js';
export { furtherFrequencies } from './further-frequencies.js';
export { type Allowances, type HeldLimits, type HeldSide, heldLimits, type SideAllowance } from './held-limits.js';
export { type BoardVerdict, judgeBoard, judgePack, judgeRequirement, type RequirementVerdict } from './judge.js';
export { boardsOnOffer, type Offer, type ProcurementResults } from './procurement-results.js';
export { marginOf, QUANTITIES, type Quantity, type QuantityUnit, quantityOf, quantityTitle } from './quantities.js';
export type { SideWorst } from './uncertainty.js';
export type { UncertaintyPart } from './uncertainty-part.js';
export { type Place, type WorstValue, worstValue } from './worst.js';
