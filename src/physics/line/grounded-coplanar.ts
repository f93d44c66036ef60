import type { Complex } from '../../numerics/complex.js';
import { SPEED_OF_LIGHT } from '../constants.js';
import { skinDepth } from '../material/copper.js';
import type { ValidityFlag } from '../validity.js';
import type { CoplanarFace, CoplanarGeometry } from './coplanar-geometry.js';
import { coplanarSection } from './coplanar-section.js';
import { dielectricFilling } from './dielectric-filling.js';
import { type DistributedCircuit, distributedCircuit } from './distributed-circuit.js';

/** Surface impedance by kind of face, ohm. A rough face is referred to the plane that its height is measured to. */
export interface CoplanarFaceImpedances {
  /** Of strip and side grounds, towards the dielectric. */
  readonly underside: Complex;
  /** Of strip and side grounds. */
  readonly top: Complex;
  /** Side walls of strip and side grounds. */
  readonly edges: Complex;
  /** The ground below the dielectric. */
  readonly ground: Complex;
}

export interface GroundedCoplanarInput {
  readonly geometry: CoplanarGeometry;
  /** Hz, > 0 */
  readonly frequency: number;
  readonly lossTangent: number;
  readonly faces: CoplanarFaceImpedances;
}

export interface GroundedCoplanarLine extends DistributedCircuit<CoplanarFace> {
  /** Ohm, without loss. */
  readonly impedance: number;
  /** Quasi-static, without loss and without the metal's inner reactance. */
  readonly effectivePermittivity: number;
  readonly weights: Readonly<Record<CoplanarFace, number>>;
  readonly flags: readonly ValidityFlag[];
}

const MODEL = 'grounded coplanar line, quasi-static section';
/** Section over wavelength in the dielectric above which a quasi-static figure is not supported. */
const LARGEST_SECTION = 0.1;
/** Thickness in skin depths of copper below which current flows on both faces at once. */
const THINNEST = 4;
const COPPER = 5.8e7;

function rangeFlags(g: CoplanarGeometry, frequency: number): ValidityFlag[] {
  const flags: ValidityFlag[] = [];
  const flag = (code: string, severity: ValidityFlag['severity'], text: string): void => {
    flags.push({ code: `coplanar.${code}`, severity, model: MODEL, text });
  };
  const wavelength = SPEED_OF_LIGHT / (frequency * Math.sqrt(g.permittivity));
  const section = Math.max(g.height, g.width + 2 * g.gap);
  if (section > LARGEST_SECTION * wavelength)
    flag(
      'section-range',
      'outside',
      `The section measures ${(section / wavelength).toPrecision(2)} wavelengths in the dielectric; quasi-static impedance, permittivity and face weights are supported up to ${LARGEST_SECTION}. Permittivity then comes out too low, by up to a few per cent, and the ground's loss too low.`,
    );
  if (g.thickness < THINNEST * skinDepth(frequency, COPPER))
    flag(
      'thickness-range',
      'outside',
      `The metal is ${(g.thickness / skinDepth(frequency, COPPER)).toPrecision(2)} skin depths thick; face weights hold from ${THINNEST} upward.`,
    );
  flag(
    'side-grounds',
    'note',
    'Side grounds are taken as wide and at the potential of the ground below; vias must see to that, and leakage between the grounds is not part of the loss.',
  );
  return flags;
}

/**
 * Grounded coplanar line with loss by face, each kind of face with its own surface impedance.
 *
 * Impedance, permittivity and face weights from the solved section (`coplanarSection`), which carries the thickness of
 * the metal; `coplanarMapping` is its cross-check for thin metal and narrow slots. Quasi-static: no dispersion, no
 * leakage; flagged where the section is not small against the wavelength.
 *
 * @throws RangeError on arguments that are not physical, or metal without thickness
 */
export function groundedCoplanarLine(input: GroundedCoplanarInput): GroundedCoplanarLine {
  const { geometry, frequency, lossTangent, faces } = input;
  if (!(Number.isFinite(frequency) && frequency > 0))
    throw new RangeError(`frequency must be positive, got ${frequency}`);
  const { impedance, effectivePermittivity, weights } = coplanarSection(geometry);
  const { underside, top, edges, ground } = faces;
  const circuit = distributedCircuit<CoplanarFace>({
    impedance,
    effectivePermittivity,
    frequency,
    lossTangent: lossTangent * dielectricFilling(geometry.permittivity, effectivePermittivity),
    weights,
    faces: { underside, top, edges, sideUnderside: underside, sideTop: top, sideEdges: edges, ground },
  });
  return { ...circuit, impedance, effectivePermittivity, weights, flags: rangeFlags(geometry, frequency) };
}
