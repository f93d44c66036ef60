/** A patch alone, driven by a gap across its middle: what the solver is checked with, since no line disturbs its balance. */
import { type Complex, complex, inverse } from '../../numerics/complex.js';
import { complexVector, gmres } from '../../numerics/gmres.js';
import type { FarField, PowerBudget, Slab } from '../column/engine.js';
import type { FaceImpedances } from '../line/index.js';
import { blockInverse } from './block-inverse.js';
import { cutBlocks } from './blocks.js';
import { boardCurrents } from './board-currents.js';
import { boardOperator } from './board-operator.js';
import { boardPower } from './board-power.js';
import { edgeTrims, NATURAL_EDGE } from './edge-trim.js';
import { drawMesh } from './mesh.js';
import type { MetalRectangle } from './outline.js';
import type { FullWaveProblem } from './problem.js';
import { reactionProduct } from './reaction-product.js';
import { sheetField } from './sheet-field.js';
import { losslessMedium } from './slab-medium.js';
import { prepareReactions } from './slab-reactions.js';
import { drawnSquares, solvedStrip, stripSheet } from './strip-sheet.js';

export interface GapPatch {
  /** m */
  readonly length: number;
  readonly width: number;
  readonly slab: Slab;
  readonly cover?: FullWaveProblem['cover'];
}

export interface GapPatchSolution {
  /** Seen by the gap, ohm. */
  readonly impedance: Complex;
  /** For 1 V peak across the gap; `accepted` is what the gap delivers. */
  readonly power: PowerBudget;
  readonly field: FarField;
}

/**
 * @param band  Hz
 * @param cells along and across; along must be even, so that an edge lies in the middle
 * @throws RangeError where it is odd
 */
export function gapPatch(
  patch: GapPatch,
  band: { readonly low: number; readonly high: number },
  cells: { readonly along: number; readonly across: number } = { along: 18, across: 14 },
): (frequency: number, faces: FaceImpedances) => GapPatchSolution {
  if (cells.along % 2 !== 0) throw new RangeError(`gapPatch: an even number of cells is needed, got ${cells.along}`);
  const { length, width, slab } = patch;
  const dx = length / (cells.along - 2 * NATURAL_EDGE);
  const dy = width / (cells.across - 2 * NATURAL_EDGE);
  const metal: MetalRectangle = {
    x0: NATURAL_EDGE * dx,
    x1: NATURAL_EDGE * dx + length,
    y0: NATURAL_EDGE * dy,
    y1: NATURAL_EDGE * dy + width,
    kind: 'patch',
    width,
    column: 0,
    patch: 0,
  };
  const mesh = drawMesh(
    [metal],
    { dx, dy, x0: 0, y0: 0, beyond: 0 },
    edgeTrims({ ...slab, ...(patch.cover && { cover: patch.cover }) }, 0),
  );
  const blocks = cutBlocks(mesh, 0);
  const [drawn] = mesh.rectangles;
  const squares = [drawnSquares(cells.across, dy, slab.height, [drawn.trims.y0, drawn.trims.y1])];
  const setup = {
    mesh,
    ports: [],
    driven: 0,
    misfit: { length: 0, width: 0 },
    blocks,
    reactions: prepareReactions({ dx, dy, nx: mesh.nx, ny: mesh.ny }, band, mediumWith(patch, complex(0))),
    product: reactionProduct(mesh),
    squares,
  };
  const gap = Array.from({ length: cells.across }, (_, j) => mesh.xEdge[j * mesh.nx + cells.along / 2 - 1]);
  return (frequency, faces) => {
    const medium = mediumWith(patch, faces.ground);
    const sheets = [stripSheet(solvedStrip(patch, slab, 0, width, frequency), faces, frequency, squares[0])];
    const operator = boardOperator(
      setup,
      medium,
      frequency,
      sheets.map((s) => s.impedance),
    );
    const b = complexVector(mesh.unknowns);
    for (const u of gap) b.re[u] = 1;
    const x = complexVector(mesh.unknowns);
    gmres(operator.apply, blockInverse(mesh, blocks, operator.reactions, operator.local), b, x, 1e-10, 20);
    let [re, im] = [0, 0];
    for (const u of gap) {
      re += x.re[u];
      im += x.im[u];
    }
    const source = boardCurrents(mesh, x, []);
    const field = sheetField(losslessMedium(medium), frequency, source);
    const power = boardPower({
      setup,
      medium,
      frequency,
      current: x,
      sheets,
      field,
      source,
      incident: [],
      reflected: [],
      leaving: [],
      feeds: [],
    });
    return { impedance: inverse(complex(re, im)), power: { ...power, incident: re / 2, accepted: re / 2 }, field };
  };
}

const mediumWith = ({ slab, cover }: GapPatch, groundImpedance: Complex) => ({
  permittivity: slab.permittivity,
  lossTangent: slab.lossTangent,
  height: slab.height,
  groundImpedance,
  ...(cover && { cover }),
});
