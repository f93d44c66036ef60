export {
  type CorporateFeed,
  corporateFeed,
  type FeedConditions,
  type FeedState,
} from './corporate-feed.js';
export { type DividerPlan, tJunction, type WilkinsonLimits, wilkinson } from './divider.js';
export { type CircuitState, type FeedCircuit, solveCircuit } from './feed-circuit.js';
export { type FeedDimension, LEAST_WIDTH } from './feed-drawing.js';
export { type BoardPorts, type FedBoard, feedOnBoard } from './feed-on-board.js';
export type { FeedSpec } from './feed-spec.js';
export { type LineSurroundings, lineOfWidth, widthOfImpedance } from './line-width.js';
export { scatteringAt, type TransitionTwoPort, tableOf, transitionOf } from './scattering-at.js';
export { parseTouchstone, type ScatteringTable, TouchstoneError } from './touchstone.js';
export { formatTouchstone } from './touchstone-text.js';
