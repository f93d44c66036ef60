/**
 * Corporate feed network on the board's own laminate: from one input over two-way dividers to every driven column.
 *
 * Dimensions are worked out once, at the design frequency: quarter-wave steps from their impedances, lengths so that the
 * waves arrive with the phases asked for. At any other frequency the same metal is solved as a circuit, with dispersion and
 * loss by face. Not in it: steps and junctions beyond their ideal circuit, bends of meanders, coupling between lines, and
 * what the feed radiates.
 */
import { arg, type Complex } from '../../numerics/complex.js';
import type { MicrostripLine } from '../line/index.js';
import type { ValidityFlag } from '../validity.js';
import { type CircuitState, solveCircuit } from './feed-circuit.js';
import { drawFeed, type FeedDimension, type FeedDrawing } from './feed-drawing.js';
import { type FeedSpec, requireSpec } from './feed-spec.js';
import { type LineSurroundings, lineOfWidth } from './line-width.js';

export interface FeedConditions extends LineSurroundings {
  readonly frequency: number;
  /** Reference of the input, ohm; default: the feed line's own impedance. */
  readonly inputReference?: number;
  /** Reference of each output, ohm: that of the board's ports; default: the feed line's own impedance. */
  readonly outputReferences?: readonly number[];
  /** Solved microstrip of a width at these conditions, where there is better than the closed forms. */
  readonly line?: (width: number) => MicrostripLine;
}

/** The network at one frequency. Port 0 is the input, the others the columns in the order of the weights. */
export interface FeedState extends CircuitState {
  readonly frequency: number;
  readonly referenceImpedance: readonly number[];
  readonly flags: readonly ValidityFlag[];
}

export interface CorporateFeed {
  readonly dimensions: readonly FeedDimension[];
  /** Ohm, of each divider that has one. */
  readonly resistors: readonly number[];
  readonly notes: readonly string[];
  /** @throws RangeError on conditions that are not physical */
  at(conditions: FeedConditions): FeedState;
}

/** Rounds of lengthening: each measures what the one before left, a phase error of some 1e-3 of it. */
const TRIMS = 4;

/**
 * @param nominal surroundings at the design frequency
 * @throws RangeError on a specification that is not physical
 */
export function corporateFeed(spec: FeedSpec, nominal: LineSurroundings): CorporateFeed {
  requireSpec(spec);
  const trims = new Float64Array(spec.weights.length);
  const conditions = { ...nominal, frequency: spec.designFrequency };
  let drawing = drawFeed(spec, nominal, trims);
  const beta = lineOfWidth(nominal, spec.designFrequency, spec.lineWidth).gamma.im;
  for (let round = 0; round < TRIMS && spec.weights.length > 1; round++) {
    const { scattering } = solveDrawing(drawing, conditions);
    const lead = spec.weights.map(({ phase }, i) => leadOver(scattering[i + 1][0], phase));
    // Relative to the first, so that all turn together over ±π.
    for (let i = 0; i < trims.length; i++) trims[i] += wrap(lead[i] - lead[0]) / beta;
    const least = Math.min(...trims);
    for (let i = 0; i < trims.length; i++) trims[i] -= least;
    drawing = drawFeed(spec, nominal, trims);
  }
  const { dimensions, notes, resistors } = drawing;
  return {
    dimensions,
    notes,
    resistors: resistors.map((r) => r.resistance),
    at: (at) => solveDrawing(drawing, at),
  };
}

function solveDrawing(drawing: FeedDrawing, conditions: FeedConditions): FeedState {
  const { frequency } = conditions;
  const known = new Map<number, MicrostripLine>();
  const line = (width: number): MicrostripLine => {
    let found = known.get(width);
    if (!found) {
      found = conditions.line?.(width) ?? lineOfWidth(conditions, frequency, width);
      known.set(width, found);
    }
    return found;
  };
  const own = line(drawing.lineWidth).impedance;
  const references = [
    conditions.inputReference ?? own,
    ...drawing.outputs.map((_, i) => conditions.outputReferences?.[i] ?? own),
  ];
  const state = solveCircuit({
    nodes: drawing.nodes,
    lines: drawing.pieces.map((piece) => ({ ...piece, ...pick(line(piece.width)) })),
    resistors: drawing.resistors,
    ports: [drawing.input, ...drawing.outputs].map((node, p) => ({ node, reference: references[p] })),
  });
  const flags = new Map<string, ValidityFlag>();
  for (const { flags: found } of known.values()) for (const flag of found) flags.set(flag.code, flag);
  return {
    ...state,
    frequency,
    referenceImpedance: references,
    flags: [...flags.values(), IDEAL_JUNCTIONS],
  };
}

const pick = ({ gamma, characteristic }: MicrostripLine) => ({ gamma, characteristic });

const IDEAL_JUNCTIONS: ValidityFlag = {
  code: 'feed.junctions',
  severity: 'note',
  model: 'corporate feed network',
  text: 'Lines, quarter-wave steps and resistors are solved as a circuit; the fields at junctions, steps and bends, coupling between its lines, and what the feed radiates are not in it.',
};

/** Lead of a wave over the phase asked for, rad. */
const leadOver = (wave: Complex, phase: number): number => arg(wave) - phase;
const wrap = (angle: number): number => angle - 2 * Math.PI * Math.round(angle / (2 * Math.PI));
