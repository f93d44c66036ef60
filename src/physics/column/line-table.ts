/** Microstrip of every width that occurs on a board, each worked out once per frequency, and the steps between widths. */
import { SPEED_OF_LIGHT } from '../constants.js';
import {
  type FaceImpedances,
  type MicrostripLine,
  microstripLine,
  openEndExtension,
  thicknessEndExtension,
} from '../line/index.js';
import type { Slab } from './engine.js';
import { edgeSusceptance, effectiveWidth, stepReactance } from './junction.js';
import type { NetworkConstants } from './network-constants.js';

export interface LineTable {
  line(width: number): MicrostripLine;
  effectiveWidth(width: number): number;
  /** Phase constant without loss, rad/m. */
  phaseConstant(width: number): number;
  /** Open-end length of the metal without thickness, m. */
  openEnd(width: number): number;
  /** Series reactance between two widths, ohm; 0 where the second is 0. */
  step(width: number, across: number): number;
  /** Susceptance of a patch edge with metal attached over the width `covered`, S. */
  edge(width: number, covered: number): number;
}

export function lineTable(
  slab: Slab,
  thickness: number,
  frequency: number,
  faces: FaceImpedances,
  constants: NetworkConstants,
): LineTable {
  const once = <T>(work: (width: number) => T): ((width: number) => T) => {
    const known = new Map<number, T>();
    return (width) => {
      let found = known.get(width);
      if (found === undefined) {
        found = work(width);
        known.set(width, found);
      }
      return found;
    };
  };
  const geometry = (width: number) => ({ width, height: slab.height, thickness, permittivity: slab.permittivity });
  const line = once((width) =>
    microstripLine({ geometry: geometry(width), frequency, lossTangent: slab.lossTangent, faces }),
  );
  const wide = once((width) => {
    const { impedance, effectivePermittivity } = line(width);
    return effectiveWidth(slab.height, impedance, effectivePermittivity);
  });
  const openEnd = once((width) => openEndExtension({ ...geometry(width), thickness: 0 }, frequency));
  const thick = once((width) => thicknessEndExtension(geometry(width)));
  const phaseConstant = (width: number): number =>
    (2 * Math.PI * frequency * Math.sqrt(line(width).effectivePermittivity)) / SPEED_OF_LIGHT;
  return {
    line,
    effectiveWidth: wide,
    phaseConstant,
    openEnd,
    step(width, across) {
      if (across === 0) return 0;
      const [narrow, broad] = width < across ? [width, across] : [across, width];
      const permittivity = line(broad).effectivePermittivity;
      return stepReactance(frequency, slab.height, broad, wide(broad), permittivity, wide(narrow), constants);
    },
    edge(width, covered) {
      const { impedance } = line(width);
      const coverage = covered > 0 ? wide(covered) / wide(width) : 0;
      return edgeSusceptance(openEnd(width), thick(width), phaseConstant(width), impedance, coverage, constants);
    },
  };
}
