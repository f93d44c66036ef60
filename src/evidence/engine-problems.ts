/** The references' layouts as problems for either engine; engines and what they solved are kept within a run. */
import { type Complex, complex } from '../numerics/complex.js';
import { type ColumnEngine, type ColumnGeometry, type ColumnProblem, edgeNetwork } from '../physics/column/index.js';
import { fullWave } from '../physics/full-wave/index.js';
import { surfaceResistance } from '../physics/material/index.js';
import type { ColumnReference } from './column-references.js';

export type EngineName = 'network' | 'full wave';
export type SheetCopper = 'none' | 'smooth' | 'rough';

export const MPIE =
  'independent full-wave solutions of the columns (mixed-potential integral equation), made for this project, not measured';

/** Sheet impedances of the references at a frequency in Hz. */
export function sheetFaces(copper: SheetCopper, frequency: number) {
  const rs = surfaceResistance(frequency, 5.8e7);
  const z: Complex = { none: complex(0), smooth: complex(rs, rs), rough: complex(2 * rs, 3 * rs) }[copper];
  return { underside: z, top: z, edges: z, ground: z };
}

type Layout = Pick<
  ColumnReference,
  'permittivity' | 'lossTangent' | 'height' | 'lineWidthMm' | 'patchWidthMm' | 'patchLengthMm' | 'linkLengthsMm'
>;

const columnOf = (layout: Layout, y: number): ColumnGeometry => ({
  x: 0,
  y,
  feedLineWidth: layout.lineWidthMm * 1e-3,
  patches: [...layout.linkLengthsMm, 0].map(() => ({
    width: layout.patchWidthMm * 1e-3,
    length: layout.patchLengthMm * 1e-3,
  })),
  links: layout.linkLengthsMm.map((length) => ({ width: layout.lineWidthMm * 1e-3, length: length * 1e-3 })),
});

/** Columns of a layout side by side, `pitch` m apart; loss in the slab unless `lossless`. */
export function columnsProblem(layout: Layout, count = 1, pitch = 0, lossless = false): ColumnProblem {
  return {
    slab: {
      permittivity: layout.permittivity,
      lossTangent: lossless ? 0 : layout.lossTangent,
      height: layout.height,
    },
    stripThickness: 0,
    referenceImpedance: 'line',
    columns: Array.from({ length: count }, (_, c) => columnOf(layout, c * pitch)),
  };
}

/** One patch fed by a line; a line of the same width goes on after it where `through`. */
export function patchProblem(
  patch: {
    readonly permittivity: number;
    readonly lossTangent?: number;
    readonly height: number;
    readonly width: number;
    readonly length: number;
    readonly lineWidth: number;
  },
  through = false,
): ColumnProblem {
  return {
    slab: { permittivity: patch.permittivity, lossTangent: patch.lossTangent ?? 0, height: patch.height },
    stripThickness: 0,
    referenceImpedance: 'line',
    columns: [
      {
        x: 0,
        y: 0,
        feedLineWidth: patch.lineWidth,
        patches: [{ width: patch.width, length: patch.length }],
        links: [],
        ...(through ? { termination: { width: patch.lineWidth } } : {}),
      },
    ],
  };
}

/** Prepared for `band` (Hz); engines are not kept, solutions are the callers' to keep. */
export const prepare = (
  engine: EngineName,
  problem: ColumnProblem,
  band: { readonly low: number; readonly high: number },
): ColumnEngine => (engine === 'network' ? edgeNetwork(problem, band.high) : fullWave(problem, band));

export const rms = (values: readonly number[]): number =>
  Math.sqrt(values.reduce((sum, v) => sum + v * v, 0) / values.length);
