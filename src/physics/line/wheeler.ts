import { ETA0 } from '../constants.js';
import { airImpedance, thicknessWidening } from './hammerstad-jensen.js';
import { type MicrostripGeometry, requireMicrostrip } from './microstrip-geometry.js';

/**
 * How strongly each face of a microstrip carries the current: the series resistance per length of a face is its
 * surface resistance times its weight, so that α = Σ Rs·weight / (2 Z0). 1/m. `edges` is both side walls together.
 */
export interface FaceWeights {
  readonly underside: number;
  readonly top: number;
  readonly edges: number;
  readonly ground: number;
}

/** Inductance per length over µ0 of the line as in air, with thickness: L/µ0 = Z(air)/η0. */
function inductanceOverMu0(width: number, height: number, thickness: number): number {
  const u = width / height;
  return airImpedance(u + thicknessWidening(u, thickness / height, 1).air) / ETA0;
}

/**
 * Face weights from the incremental inductance rule: each wall alone is receded into the metal by n, and its weight
 * is (1/µ0) dL/dn.
 *
 * Sources: H. A. Wheeler, "Formulas for the skin effect", Proc. IRE 30(9), 1942, pp. 412–424, applied to the air line
 * of Hammerstad and Jensen 1980. Holds while the strip is thicker than about four skin depths and the quasi-static
 * current distribution stands. Against independent sections of 0.1 to 0.25 mm: total loss +1 %, shares within
 * 0.4 points.
 *
 * @throws RangeError for a strip without thickness, which has no walls to recede
 */
export function wheelerFaceWeights(g: MicrostripGeometry): FaceWeights {
  requireMicrostrip(g);
  if (g.thickness === 0)
    throw new RangeError('face weights need a strip with thickness; for a given sheet impedance use sheetFaceWeights');
  const n = 1e-4 * Math.min(g.width, g.height, g.thickness);
  const slope = (l: (n: number) => number): number => (l(n) - l(-n)) / (2 * n);
  return {
    underside: slope((d) => inductanceOverMu0(g.width, g.height + d, g.thickness - d)),
    top: slope((d) => inductanceOverMu0(g.width, g.height, g.thickness - d)),
    edges: slope((d) => inductanceOverMu0(g.width - 2 * d, g.height, g.thickness)),
    ground: slope((d) => inductanceOverMu0(g.width, g.height + d, g.thickness)),
  };
}

/**
 * Face weights of a strip treated as a sheet of given impedance: all current on the underside, spread evenly, and a
 * ground current spread over the width plus one height to each side. Right for strips much wider than the height;
 * for narrow ones it belongs to comparisons with sheet solutions only.
 *
 * @param width  m, > 0
 * @param height m, > 0
 */
export function sheetFaceWeights(width: number, height: number): FaceWeights {
  return { underside: 1 / width, top: 0, edges: 0, ground: 1 / (width + 2 * height) };
}
