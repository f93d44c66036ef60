import type { Complex } from '../../numerics/complex.js';
import { ellipticRatio } from '../../numerics/elliptic.js';
import { ETA0 } from '../constants.js';
import type { ValidityFlag } from '../validity.js';
import { type DistributedCircuit, distributedCircuit } from './distributed-circuit.js';

/** A flat strip buried in a homogeneous dielectric between two grounds. Lengths in m. */
export interface StriplineGeometry {
  readonly width: number;
  readonly thickness: number;
  /** Dielectric between the strip and the lower and the upper ground. */
  readonly heightBelow: number;
  readonly heightAbove: number;
  /** Relative permittivity of the dielectric, ≥ 1. */
  readonly permittivity: number;
}

export type StriplineFace = 'underside' | 'top' | 'edges' | 'lowerGround' | 'upperGround';

export interface StriplineInput {
  readonly geometry: StriplineGeometry;
  /** Hz, > 0 */
  readonly frequency: number;
  readonly lossTangent: number;
  /** Surface impedance of each face, ohm. A rough face is referred to the plane that its height is measured to. */
  readonly faces: Readonly<Record<StriplineFace, Complex>>;
}

export interface StriplineLine extends DistributedCircuit<StriplineFace> {
  /** Ohm, without loss. */
  readonly impedance: number;
  readonly weights: Readonly<Record<StriplineFace, number>>;
  readonly flags: readonly ValidityFlag[];
}

function requireStripline(g: StriplineGeometry): void {
  const lengths = { width: g.width, 'height below': g.heightBelow, 'height above': g.heightAbove };
  for (const [name, value] of Object.entries(lengths))
    if (!(Number.isFinite(value) && value > 0))
      throw new RangeError(`stripline ${name} must be a positive length in m, got ${value}`);
  if (!(Number.isFinite(g.thickness) && g.thickness >= 0))
    throw new RangeError(`stripline thickness must be a length in m, 0 or more, got ${g.thickness}`);
  if (!(Number.isFinite(g.permittivity) && g.permittivity >= 1))
    throw new RangeError(`relative permittivity must be 1 or more, got ${g.permittivity}`);
}

/**
 * Impedance in air of a strip of no thickness midway between grounds, ohm: (η0/4) K(k′)/K(k), k = tanh(πw/2b).
 * S. B. Cohn, IRE Trans. Microwave Theory Tech. 2(2), 1954, pp. 52–57. Exact.
 *
 * @param width   m, > 0
 * @param spacing of the grounds, m, > 0
 */
export function thinStriplineImpedance(width: number, spacing: number): number {
  const x = (Math.PI * width) / (2 * spacing);
  return ETA0 / 4 / ellipticRatio(Math.tanh(x), 1 / Math.cosh(x));
}

/**
 * Impedance in air of a strip with thickness midway between grounds, ohm.
 * H. A. Wheeler, IEEE Trans. Microwave Theory Tech. 26(11), 1978, pp. 866–876 (coefficients from memory); stated to 0.5 %.
 */
function centredImpedance(width: number, spacing: number, thickness: number): number {
  const x = thickness / spacing;
  const gap = spacing - thickness;
  let widened = width / gap;
  if (x > 0) {
    const m = 2 / (1 + ((2 / 3) * x) / (1 - x));
    const inner = (x / (2 - x)) ** 2 + ((0.0796 * x) / (width / spacing + 1.1 * x)) ** m;
    widened += (x / (Math.PI * (1 - x))) * (1 - 0.5 * Math.log(inner));
  }
  const q = 8 / (Math.PI * widened);
  return (ETA0 / 4 / Math.PI) * Math.log(1 + (q / 2) * (q + Math.sqrt(q * q + 6.27)));
}

/** The two halves of a strip, each with half the metal, as halves of centred lines in parallel; L/µ0 in air. */
interface Halves {
  readonly width: number;
  readonly below: number;
  readonly above: number;
  /** Twice the half's metal. */
  readonly lowerThickness: number;
  readonly upperThickness: number;
}

function inductanceOverMu0(s: Halves): number {
  const lower = centredImpedance(s.width, 2 * s.below + s.lowerThickness, s.lowerThickness);
  const upper = centredImpedance(s.width, 2 * s.above + s.upperThickness, s.upperThickness);
  return 2 / (1 / lower + 1 / upper) / ETA0;
}

const halves = (g: StriplineGeometry): Halves => ({
  width: g.width,
  below: g.heightBelow,
  above: g.heightAbove,
  lowerThickness: g.thickness,
  upperThickness: g.thickness,
});

/** Impedance of the line without loss, ohm. @throws RangeError on a geometry that is not physical */
export function striplineImpedance(g: StriplineGeometry): number {
  requireStripline(g);
  return (ETA0 * inductanceOverMu0(halves(g))) / Math.sqrt(g.permittivity);
}

/**
 * Face weights of a stripline by receding each wall alone (H. A. Wheeler, Proc. IRE 30(9), 1942), 1/m. Of an off-centre
 * strip the halves know the two broad faces together; their difference is that of the grounds, since the force on the strip
 * is that on the grounds.
 *
 * @throws RangeError for a strip without thickness, whose edges carry an infinite loss
 */
export function striplineFaceWeights(g: StriplineGeometry): Record<StriplineFace, number> {
  requireStripline(g);
  if (g.thickness === 0) throw new RangeError('face weights need a strip with thickness');
  const s = halves(g);
  const step = 1e-4 * Math.min(g.width, g.thickness, g.heightBelow, g.heightAbove);
  const slope = (recede: (n: number) => Partial<Halves>): number =>
    (inductanceOverMu0({ ...s, ...recede(step) }) - inductanceOverMu0({ ...s, ...recede(-step) })) / (2 * step);
  const lower = slope((n) => ({ below: s.below + n, lowerThickness: s.lowerThickness - 2 * n }));
  const upper = slope((n) => ({ above: s.above + n, upperThickness: s.upperThickness - 2 * n }));
  const lowerGround = slope((n) => ({ below: s.below + n }));
  const upperGround = slope((n) => ({ above: s.above + n }));
  const force = lowerGround - upperGround;
  return {
    underside: (lower + upper + force) / 2,
    top: (lower + upper - force) / 2,
    edges: slope((n) => ({ width: s.width - 2 * n })),
    lowerGround,
    upperGround,
  };
}

/** Ratio of the two heights up to which the halves serve an off-centre strip within 0.5 % of impedance. */
const NEAR_CENTRE = 1.5;
/** Thickness over spacing, and width over the height of the dielectric, of the sections that the formulas were compared with. */
const THICKEST = 0.2;
const NARROWEST = 0.5;

function rangeFlags(g: StriplineGeometry): ValidityFlag[] {
  const flags: ValidityFlag[] = [];
  const outside = (code: string, text: string): void => {
    flags.push({ code: `stripline.${code}`, severity: 'outside', model: 'stripline, Wheeler', text });
  };
  const offCentre = Math.max(g.heightBelow / g.heightAbove, g.heightAbove / g.heightBelow);
  if (offCentre > NEAR_CENTRE)
    outside(
      'off-centre',
      `The strip lies off centre, heights ${offCentre.toFixed(2)} to 1; taken as two halves of centred lines, which holds up to ${NEAR_CENTRE} to 1 and is 2 % high in impedance at 2.5 to 1.`,
    );
  const ratio = g.thickness / (g.heightBelow + g.heightAbove + g.thickness);
  if (ratio > THICKEST)
    outside(
      'thickness-range',
      `The strip takes ${ratio.toFixed(2)} of the ground spacing; compared up to ${THICKEST}.`,
    );
  const narrow = g.width / Math.min(g.heightBelow, g.heightAbove);
  if (narrow < NARROWEST)
    outside(
      'width-range',
      `Strip width is ${narrow.toFixed(2)} of the dielectric's height; compared from ${NARROWEST} upward.`,
    );
  return flags;
}

/**
 * Stripline with loss by face, each face with its own surface impedance.
 *
 * TEM in a homogeneous dielectric: no dispersion but that of the material and the metal. Impedance by Wheeler 1978, face
 * weights by receding walls. Against separate sections solved by boundary integrals (width 0.8 to 3.2 heights, thickness up to 0.15
 * of the spacing): impedance within 0.4 %, weights within 2 %, 3 % at heights of 1.4 to 1. No coupling to the mode between the grounds.
 *
 * @throws RangeError on arguments that are not physical, and for a strip without thickness
 */
export function stripline(input: StriplineInput): StriplineLine {
  const { geometry, frequency, lossTangent, faces } = input;
  const impedance = striplineImpedance(geometry);
  const weights = striplineFaceWeights(geometry);
  const circuit = distributedCircuit({
    impedance,
    effectivePermittivity: geometry.permittivity,
    frequency,
    lossTangent,
    weights,
    faces,
  });
  return { ...circuit, impedance, weights, flags: rangeFlags(geometry) };
}
